package org.wintersill.io.geotiff.write;

import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.SampleType;

/**
 * What a cell of an overview shows of the two by two cells under it.
 *
 * <p>Quantities: mean of the cells that have a value. Counts, years and day numbers: the first cell with a value in
 * reading order, since a mean of years is no year. Classes: the most frequent, the first in reading order among equals.
 * In each case missing only where all four are missing, and never a value outside those that went in: the mean is formed
 * in double from at most four floats, so its rounding to float cannot leave their range.
 */
final class OverviewRule {
    private static final int TILE = PyramidLevel.TILE;
    private static final int HALF = TILE / 2;

    private OverviewRule() {
    }

    /** The rules by name. */
    enum Choice {
        MEAN, FIRST, MODE;

        /** The rule of a layer; counts that are stored as floats beside a quantity are still counts. */
        static Choice of(LayerDefinition layer) {
            if (layer.type() == SampleType.BYTE) {
                return MODE;
            }
            return layer.type() == SampleType.INT16 || layer.style() instanceof LayerStyle.Classes ? FIRST : MEAN;
        }
    }

    /**
     * Halves a tile.
     *
     * @param choice which rule
     * @param below {@code [row * 256 + column]}, NaN for missing and beyond the edge of the grid
     * @param half receives {@code [row * 128 + column]}
     */
    static void halve(Choice choice, float[] below, float[] half) {
        for (int row = 0; row < HALF; row++) {
            for (int column = 0; column < HALF; column++) {
                int from = 2 * row * TILE + 2 * column;
                half[row * HALF + column] = cell(choice, below[from], below[from + 1], below[from + TILE], below[from + TILE + 1]);
            }
        }
    }

    /**
     * Puts a halved tile into a quarter of the tile above it.
     *
     * @param half {@code [row * 128 + column]}
     * @param above tile that receives it
     * @param right whether an eastern quarter is meant
     * @param lower whether a southern quarter is meant
     */
    static void place(float[] half, float[] above, boolean right, boolean lower) {
        int start = (lower ? HALF * TILE : 0) + (right ? HALF : 0);
        for (int row = 0; row < HALF; row++) {
            System.arraycopy(half, row * HALF, above, start + row * TILE, HALF);
        }
    }

    private static float cell(Choice choice, float a, float b, float c, float d) {
        return switch (choice) {
            case MEAN -> mean(a, b, c, d);
            case FIRST -> first(a, b, c, d);
            case MODE -> mode(a, b, c, d);
        };
    }

    static float mean(float a, float b, float c, float d) {
        double sum = 0;
        int count = 0;
        if (a == a) {
            sum += a;
            count++;
        }
        if (b == b) {
            sum += b;
            count++;
        }
        if (c == c) {
            sum += c;
            count++;
        }
        if (d == d) {
            sum += d;
            count++;
        }
        return count == 0 ? Float.NaN : (float) (sum / count);
    }

    static float first(float a, float b, float c, float d) {
        return a == a ? a : b == b ? b : c == c ? c : d;
    }

    static float mode(float a, float b, float c, float d) {
        int countA = (a == a ? 1 : 0) + (a == b ? 1 : 0) + (a == c ? 1 : 0) + (a == d ? 1 : 0);
        int countB = (b == b ? 1 : 0) + (b == c ? 1 : 0) + (b == d ? 1 : 0);
        int countC = (c == c ? 1 : 0) + (c == d ? 1 : 0);
        float best = a;
        int most = countA;
        if (countB > most) {
            best = b;
            most = countB;
        }
        if (countC > most) {
            best = c;
            most = countC;
        }
        return most == 0 ? d : best;
    }
}
