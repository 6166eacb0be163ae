package org.wintersill.elevation;

import java.util.Arrays;

/**
 * Works out the lapse rates of one night on rows of the source grid. Run of a {@link LocalLapse}, with room of its own: one a worker.
 *
 * <p>Sums of a window are carried from row to row and from column to column. They are whole numbers (2^-16 K, 2^-6 m), so that carrying
 * them leaves no trace: a rate is the same to the last bit however rows are cut.
 */
public final class LapseField {
    /** Memory that one of these takes for each of its cells. */
    public static final long BYTES_PER_CELL = 18;
    private static final double KELVIN = 1 << 16;
    private static final double METRE = 1 << 6;
    private static final double RATE = 1 << 24;
    private static final int SUMS = 6;

    private final LocalLapse definition;
    private final int rows;
    private final int columns;
    /** {@code [cell]} in units of 2^-6 m; {@link Long#MIN_VALUE} for none. */
    private final long[] heights;
    private final boolean[] rugged;
    private final long[][] columnSums;
    private final long[] total = new long[SUMS];
    private final long[] rates;
    private final boolean[] present;

    /**
     * @param definition its rows are the rows worked on
     * @param heights {@code [row * columns + column]} of these rows, m, NaN for none
     */
    public LapseField(LocalLapse definition, int columns, float[] heights) {
        this.definition = definition;
        this.columns = columns;
        rows = definition.cellWidth().length;
        this.heights = new long[heights.length];
        for (int i = 0; i < heights.length; i++) {
            this.heights[i] = Float.isNaN(heights[i]) ? Long.MIN_VALUE : Math.round(heights[i] * METRE);
        }
        rugged = new boolean[heights.length];
        for (int i = 0; i < heights.length; i++) {
            rugged[i] = isRugged(i / columns, i % columns);
        }
        columnSums = new long[SUMS][columns];
        rates = new long[heights.length];
        present = new boolean[heights.length];
    }

    /** Another for the same rows: what does not change from night to night is shared. */
    public LapseField another() {
        return new LapseField(this);
    }

    private LapseField(LapseField other) {
        definition = other.definition;
        rows = other.rows;
        columns = other.columns;
        heights = other.heights;
        rugged = other.rugged;
        columnSums = new long[SUMS][columns];
        rates = new long[heights.length];
        present = new boolean[heights.length];
    }

    /** Whether the heights of the window span enough; of all its cells with a height, whether or not the night has a value there. */
    private boolean isRugged(int row, int column) {
        long low = Long.MAX_VALUE;
        long high = Long.MIN_VALUE;
        for (int r = Math.max(0, row - definition.halfRows(row)); r <= Math.min(rows - 1, row + definition.halfRows(row)); r++) {
            int to = Math.min(columns - 1, column + definition.halfColumns(row));
            for (int c = Math.max(0, column - definition.halfColumns(row)); c <= to; c++) {
                long z = heights[r * columns + c];
                if (z != Long.MIN_VALUE) {
                    low = Math.min(low, z);
                    high = Math.max(high, z);
                }
            }
        }
        return high > low && (high - low) / METRE >= LocalLapse.LEAST_RANGE;
    }

    /**
     * Lapse rates of the rows {@code from} to {@code to - 1}.
     *
     * @param night temperatures of all rows, degC, NaN for missing; cell {@code i} at {@code offset + i}
     * @param month month of the night, for the prior
     * @param out K/km, cell {@code i} at {@code offset + i}; never NaN; other rows are not touched
     */
    public void compute(float[] night, int offset, int month, int from, int to, float[] out) {
        if (from >= to) {
            return;
        }
        for (int i = 0; i < heights.length; i++) {
            present[i] = heights[i] != Long.MIN_VALUE && !Float.isNaN(night[offset + i]);
        }
        double prior = definition.prior().ofMonth(month);
        int first = from;
        int end = to;
        for (int row = from; row < to; row++) {
            first = Math.max(0, Math.min(first, row - definition.halfRows(row)));
            end = Math.min(rows, Math.max(end, row + definition.halfRows(row) + 1));
        }
        carry(first, end, row -> takeRow(night, offset, row, 1), row -> takeRow(night, offset, row, -1), row -> fitRow(row, prior));
        carry(from, to, row -> takeRates(row, 1), row -> takeRates(row, -1), row -> smoothRow(row, prior, offset, out));
    }

    /** What is done with a row. */
    private interface RowStep {
        void accept(int row);
    }

    /** Carries the column sums from row to row: their window is that of the row in work. */
    private void carry(int from, int to, RowStep add, RowStep remove, RowStep work) {
        for (long[] sums : columnSums) {
            Arrays.fill(sums, 0);
        }
        int top = Math.max(0, from - definition.halfRows(from));
        int bottom = top;
        for (int row = from; row < to; row++) {
            int north = Math.max(0, row - definition.halfRows(row));
            int south = Math.min(rows, row + definition.halfRows(row) + 1);
            for (; bottom < south; bottom++) {
                add.accept(bottom);
            }
            for (; bottom > south; bottom--) {
                remove.accept(bottom - 1);
            }
            for (; top < north; top++) {
                remove.accept(top);
            }
            for (; top > north; top--) {
                add.accept(top - 1);
            }
            work.accept(row);
        }
    }

    private void takeRow(float[] night, int offset, int row, long sign) {
        for (int c = 0; c < columns; c++) {
            int i = row * columns + c;
            if (present[i]) {
                long z = heights[i];
                long t = Math.round(night[offset + i] * KELVIN);
                columnSums[0][c] += sign;
                columnSums[1][c] += sign * z;
                columnSums[2][c] += sign * t;
                columnSums[3][c] += sign * z * z;
                columnSums[4][c] += sign * z * t;
                columnSums[5][c] += sign * t * t;
            }
        }
    }

    private void fitRow(int row, double prior) {
        Arrays.fill(total, 0);
        int half = definition.halfColumns(row);
        for (int c = 0; c < Math.min(half, columns); c++) {
            takeColumn(c, 1);
        }
        for (int c = 0; c < columns; c++) {
            if (c + half < columns) {
                takeColumn(c + half, 1);
            }
            if (c - half > 0) {
                takeColumn(c - half - 1, -1);
            }
            int i = row * columns + c;
            boolean enough = total[0] >= LocalLapse.FEWEST_CELLS && rugged[i];
            double rate = enough ? fit().shrunk(prior, definition.priorSd()) : LapseFit.bounded(prior);
            // Where all cells with a value lie at one height there is no slope.
            rates[i] = Math.round((rate == rate ? rate : prior) * RATE);
        }
    }

    private void takeColumn(int column, long sign) {
        for (int k = 0; k < SUMS; k++) {
            total[k] += sign * columnSums[k][column];
        }
    }

    private LapseFit fit() {
        double km = 1000 * METRE;
        return LapseFit.of(total[0], total[1] / km, total[2] / KELVIN, total[3] / (km * km), total[4] / (km * KELVIN),
                total[5] / (KELVIN * KELVIN));
    }

    private void takeRates(int row, long sign) {
        for (int c = 0; c < columns; c++) {
            int i = row * columns + c;
            if (present[i]) {
                columnSums[0][c] += sign;
                columnSums[1][c] += sign * rates[i];
            }
        }
    }

    private void smoothRow(int row, double prior, int offset, float[] out) {
        long count = 0;
        long sum = 0;
        int half = definition.halfColumns(row);
        for (int c = 0; c < Math.min(half, columns); c++) {
            count += columnSums[0][c];
            sum += columnSums[1][c];
        }
        for (int c = 0; c < columns; c++) {
            if (c + half < columns) {
                count += columnSums[0][c + half];
                sum += columnSums[1][c + half];
            }
            if (c - half > 0) {
                count -= columnSums[0][c - half - 1];
                sum -= columnSums[1][c - half - 1];
            }
            out[offset + row * columns + c] = (float) (count == 0 ? prior : sum / RATE / count);
        }
    }
}
