package org.wintersill.elevation.terrain;

import java.util.Arrays;
import org.wintersill.grid.Block;

/**
 * Topographic position index: height of a cell minus the mean height of its neighbours in the window, the cell itself left out, m.
 * Positive on rises, negative in hollows; NaN for a void and for a cell without neighbours.
 *
 * <p>Sums along each row are taken once as running totals, so a row of the window costs two looks whatever its width. Heights are
 * summed as whole numbers of 2^-16 m: exact above 128 m for floats, off by at most 8 micrometres below, and without order.
 */
public final class PositionIndex {
    private static final double UNIT = 1 << 16;
    /** Rows that a task takes: large against the rows of a window it has to total beside them. */
    private static final int TASK_ROWS = 64;

    private PositionIndex() {
    }

    /** The index of a block. */
    public static float[] of(Relief relief, Window window, Block block, Tasks tasks) {
        float[] out = new float[block.cells()];
        tasks.forEach((block.rows() + TASK_ROWS - 1) / TASK_ROWS, task -> {
            int first = block.row() + task * TASK_ROWS;
            rows(relief, window, block, first, Math.min(block.rowEnd(), first + TASK_ROWS), out);
        });
        return out;
    }

    private static void rows(Relief relief, Window window, Block block, int first, int end, float[] out) {
        int high = 0;
        int wide = 0;
        for (int row = first; row < end; row++) {
            high = Math.max(high, window.rowReach(relief, row));
            wide = Math.max(wide, window.columnReach(relief, row));
        }
        int from = Math.max(0, first - high);
        int to = Math.min(relief.rows(), end + high);
        long[][] totals = new long[to - from][];
        int[][] counts = new int[to - from][];
        for (int row = from; row < to; row++) {
            totals[row - from] = new long[block.columns() + 2 * wide + 1];
            counts[row - from] = new int[block.columns() + 2 * wide + 1];
            total(relief, row, block.column() - wide, totals[row - from], counts[row - from]);
        }
        long[] sum = new long[block.columns()];
        int[] count = new int[block.columns()];
        for (int row = first; row < end; row++) {
            Arrays.fill(sum, 0);
            Arrays.fill(count, 0);
            int[] halfWidths = window.halfWidths(relief, row);
            int north = row - halfWidths.length / 2;
            for (int k = 0; k < halfWidths.length; k++) {
                int line = north + k - from;
                if (line >= 0 && line < totals.length) {
                    addLine(totals[line], counts[line], wide - halfWidths[k], wide + halfWidths[k] + 1, sum, count);
                }
            }
            difference(relief, row, block, sum, count, out);
        }
    }

    /** Running totals of a row: entry i holds the cells from {@code firstColumn} up to but without {@code firstColumn + i}. */
    private static void total(Relief relief, int row, int firstColumn, long[] totals, int[] counts) {
        for (int i = 1; i < totals.length; i++) {
            float z = relief.at(row, firstColumn + i - 1);
            boolean present = z == z;
            totals[i] = totals[i - 1] + (present ? fixed(z) : 0);
            counts[i] = counts[i - 1] + (present ? 1 : 0);
        }
    }

    private static void addLine(long[] totals, int[] counts, int from, int to, long[] sum, int[] count) {
        for (int i = 0; i < sum.length; i++) {
            sum[i] += totals[i + to] - totals[i + from];
            count[i] += counts[i + to] - counts[i + from];
        }
    }

    private static void difference(Relief relief, int row, Block block, long[] sum, int[] count, float[] out) {
        int start = (row - block.row()) * block.columns();
        for (int i = 0; i < sum.length; i++) {
            float z = relief.at(row, block.column() + i);
            boolean alone = !(z == z) || count[i] < 2;
            out[start + i] = alone ? Float.NaN : (float) (z - (sum[i] - fixed(z)) / UNIT / (count[i] - 1));
        }
    }

    private static long fixed(float metres) {
        return Math.round(metres * UNIT);
    }
}
