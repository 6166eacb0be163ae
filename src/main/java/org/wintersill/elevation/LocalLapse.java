package org.wintersill.elevation;

/**
 * Lapse rates of each night and source cell by regression in a window around the cell, shrunk to a prior and smoothed by the same
 * window (science 7.3). Definition; {@link LapseField} does the work.
 *
 * <p>The window is a rectangle of cells: half its sides are the radius in rows and columns, at least two, so that it never holds fewer
 * than 25 cells away from the border; at the border it is cut. Gridded temperatures already hold a lapse rate of their makers: a
 * local regression recovers theirs, not nature's.
 *
 * @param radius m
 * @param prior g0 by month, K/km
 * @param priorSd t0, K/km
 * @param cellWidth {@code [row]} of the source window, m
 * @param cellHeight {@code [row]} likewise
 */
public record LocalLapse(double radius, LapseRates prior, double priorSd, double[] cellWidth, double[] cellHeight) {
    /** Default radius, m; sd of the prior, K/km (science 7.3, project choices). */
    public static final double DEFAULT_RADIUS = 50_000;
    public static final double DEFAULT_PRIOR_SD = 1.5;
    /** Fewest cells and least range of heights, m, that a regression is done with (project choices). */
    static final int FEWEST_CELLS = 8;
    static final double LEAST_RANGE = 150;
    private static final int LEAST_HALF_SIDE = 2;
    /** Half sides beyond this could overflow the sums of a window. */
    private static final int MOST_HALF_SIDE = 180;

    /** Rows to either side of a cell of a row. */
    int halfRows(int row) {
        return halfSide(cellHeight[row]);
    }

    /** Columns to either side of a cell of a row. */
    int halfColumns(int row) {
        return halfSide(cellWidth[row]);
    }

    private int halfSide(double cell) {
        return Math.max(LEAST_HALF_SIDE, (int) Math.min(MOST_HALF_SIDE, Math.floor(radius / cell + 1e-9)));
    }

    /** Rows beside those a target needs that its lapse rates look at: window and smoothing. */
    public int haloRows() {
        int most = 0;
        for (int row = 0; row < cellHeight.length; row++) {
            most = Math.max(most, halfRows(row));
        }
        return 2 * most;
    }

    /** Columns likewise. */
    public int haloColumns() {
        int most = 0;
        for (int row = 0; row < cellWidth.length; row++) {
            most = Math.max(most, halfColumns(row));
        }
        return 2 * most;
    }

    /** The same for rows {@code from} to {@code to - 1} alone. */
    public LocalLapse rows(int from, int to) {
        return new LocalLapse(radius, prior, priorSd, java.util.Arrays.copyOfRange(cellWidth, from, to),
                java.util.Arrays.copyOfRange(cellHeight, from, to));
    }
}
