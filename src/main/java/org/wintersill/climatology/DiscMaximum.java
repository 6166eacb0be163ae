package org.wintersill.climatology;

import java.util.Arrays;

/**
 * Highest value within a distance of each cell, for any part of a raster at a time.
 *
 * <p>A disc is made of the cells whose centres lie within the distance; sizes of cells are those of the disc's own row, so that discs
 * follow the latitude. Each row of a disc is a window, and the highest value of a window is the higher one of two windows whose length
 * is a power of two: work grows with the number of rows of a disc, not of its cells. Missing cells (NaN) are skipped. Immutable; any
 * number of threads may use it.
 */
public final class DiscMaximum {
    /** Share of a cell that distances may exceed the radius by. */
    private static final double ROUND_OFF = 1e-9;

    private final int columns;
    private final double radius;
    private final double[] cellWidth;
    private final double[] cellHeight;
    private final boolean around;

    /** Gives the values of a row; they are not changed and not kept. */
    public interface Rows {
        /** @return {@code [column]}, NaN for missing */
        float[] row(int row);
    }

    /**
     * @param radius in the unit of the sizes, not negative
     * @param cellWidth {@code [row]}, positive
     * @param cellHeight {@code [row]}, positive
     * @param around whether the last column is a neighbour of the first, as on a grid around the globe
     */
    public DiscMaximum(int columns, double radius, double[] cellWidth, double[] cellHeight, boolean around) {
        this.columns = columns;
        this.radius = radius;
        this.cellWidth = cellWidth.clone();
        this.cellHeight = cellHeight.clone();
        this.around = around;
    }

    private int reach(int row) {
        return (int) Math.min(cellHeight.length - 1, Math.floor(radius / cellHeight[row] + ROUND_OFF));
    }

    /** Columns to either side in the row {@code across} rows away. */
    private int halfWidth(int row, int across) {
        double away = across * cellHeight[row];
        double half = Math.floor(Math.sqrt(Math.max(0, radius * radius - away * away)) / cellWidth[row] + ROUND_OFF);
        return (int) Math.min(around ? columns / 2 : columns - 1, half);
    }

    /**
     * Fills some rows.
     *
     * @param out {@code [(row - first) * columns + column]}; negative infinity where a disc holds no value
     */
    public void fill(int first, int count, Rows rows, float[] out) {
        Arrays.fill(out, 0, count * columns, Float.NEGATIVE_INFINITY);
        int from = first;
        int to = first;
        int margin = 0;
        for (int row = first; row < first + count; row++) {
            from = Math.min(from, Math.max(0, row - reach(row)));
            to = Math.max(to, Math.min(cellHeight.length - 1, row + reach(row)));
            margin = Math.max(margin, halfWidth(row, 0));
        }
        int levels = 32 - Integer.numberOfLeadingZeros(2 * margin + 1);
        float[][] highest = new float[levels][columns + 2 * margin];
        for (int source = from; source <= to; source++) {
            build(rows.row(source), margin, highest);
            for (int row = first; row < first + count; row++) {
                int across = Math.abs(source - row);
                if (across <= reach(row)) {
                    int half = halfWidth(row, across);
                    int level = 31 - Integer.numberOfLeadingZeros(2 * half + 1);
                    raise(highest[level], margin - half, margin + half + 1 - (1 << level), out, (row - first) * columns);
                }
            }
        }
    }

    /** {@code highest[k][i]}: highest value of 2^k columns from {@code i - margin} on. */
    private void build(float[] values, int margin, float[][] highest) {
        int length = columns + 2 * margin;
        for (int i = 0; i < length; i++) {
            int column = i - margin;
            boolean inside = column >= 0 && column < columns;
            float value = inside ? values[column] : around ? values[Math.floorMod(column, columns)] : Float.NaN;
            highest[0][i] = value == value ? value : Float.NEGATIVE_INFINITY;
        }
        for (int level = 1; level < highest.length; level++) {
            int step = 1 << level - 1;
            float[] shorter = highest[level - 1];
            for (int i = 0; i + 2 * step <= length; i++) {
                highest[level][i] = Math.max(shorter[i], shorter[i + step]);
            }
        }
    }

    private void raise(float[] highest, int left, int right, float[] out, int start) {
        for (int column = 0; column < columns; column++) {
            out[start + column] = Math.max(out[start + column], Math.max(highest[column + left], highest[column + right]));
        }
    }
}
