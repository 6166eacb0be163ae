package org.wintersill.parcel;

import java.util.Arrays;
import java.util.BitSet;
import java.util.List;

/**
 * The cells of a grid whose centres lie in any of several outlines. A centre on an outline counts as inside on its western and
 * northern side and as outside on the others, so that outlines that share an edge never share a cell.
 */
public final class CentreMask {
    private final int columns;
    private final int rows;
    private final BitSet inside;

    public CentreMask(int columns, int rows) {
        this.columns = columns;
        this.rows = rows;
        inside = new BitSet(Math.multiplyExact(columns, rows));
    }

    /** Cells found so far, {@code row * columns + column}. Shared, not copied. */
    public BitSet inside() {
        return inside;
    }

    /**
     * Adds an outline.
     *
     * @param rings positions in columns and rows, as {@link OutlinePlacement} gives them
     */
    public void add(List<double[]> rings) {
        double top = Double.POSITIVE_INFINITY;
        double bottom = Double.NEGATIVE_INFINITY;
        for (double[] ring : rings) {
            for (int i = 1; i < ring.length; i += 2) {
                top = Math.min(top, ring[i]);
                bottom = Math.max(bottom, ring[i]);
            }
        }
        int first = (int) Math.max(0, Math.ceil(top - 0.5));
        int end = (int) Math.min(rows, Math.ceil(bottom - 0.5));
        if (first >= end) {
            return;
        }
        double[][] crossings = crossings(rings, first, end);
        for (int row = first; row < end; row++) {
            double[] at = crossings[row - first];
            Arrays.sort(at);
            for (int pair = 0; pair + 1 < at.length; pair += 2) {
                int from = (int) Math.max(0, Math.ceil(at[pair] - 0.5));
                int to = (int) Math.min(columns, Math.ceil(at[pair + 1] - 0.5));
                if (from < to) {
                    inside.set(row * columns + from, row * columns + to);
                }
            }
        }
    }

    /** Where the outline crosses the middle line of each row. */
    private static double[][] crossings(List<double[]> rings, int first, int end) {
        int[] counts = new int[end - first];
        eachCrossing(rings, first, end, (row, x) -> counts[row - first]++);
        double[][] crossings = new double[end - first][];
        for (int i = 0; i < crossings.length; i++) {
            crossings[i] = new double[counts[i]];
        }
        int[] filled = new int[end - first];
        eachCrossing(rings, first, end, (row, x) -> crossings[row - first][filled[row - first]++] = x);
        return crossings;
    }

    private interface Crossing {
        void at(int row, double x);
    }

    private static void eachCrossing(List<double[]> rings, int first, int end, Crossing crossing) {
        for (double[] ring : rings) {
            for (int i = 0; i + 3 < ring.length; i += 2) {
                double y0 = ring[i + 1];
                double y1 = ring[i + 3];
                // A middle line belongs to the edge that begins on it and not to the one that ends on it.
                int from = (int) Math.max(first, Math.ceil(Math.min(y0, y1) - 0.5));
                int to = (int) Math.min(end, Math.ceil(Math.max(y0, y1) - 0.5));
                for (int row = from; row < to; row++) {
                    crossing.at(row, ring[i] + (row + 0.5 - y0) / (y1 - y0) * (ring[i + 2] - ring[i]));
                }
            }
        }
    }
}
