package org.wintersill.comparison;

import org.wintersill.grid.GridGeometry;

/**
 * The line along which a field has a given value, between cell centres (marching squares, linear along the sides of each square of
 * four centres). Squares with a missing corner have no line. Where two opposite corners lie on each side, the mean of the four
 * decides which are joined. Rows come from the north, each once; used by one thread.
 */
public final class LimitLine {
    /** Told of each piece: from x1, y1 to x2, y2 in coordinates of the grid. */
    public interface Sink {
        void piece(double x1, double y1, double x2, double y2);
    }

    private final GridGeometry grid;
    private final double level;
    private final Sink sink;
    private float[] above;
    private int row = -1;

    public LimitLine(GridGeometry grid, double level, Sink sink) {
        this.grid = grid;
        this.level = level;
        this.sink = sink;
    }

    /** Takes the next row; the array is copied. */
    public void row(float[] values, int offset) {
        float[] below = java.util.Arrays.copyOfRange(values, offset, offset + grid.columns());
        if (++row > 0) {
            for (int column = 0; column + 1 < grid.columns(); column++) {
                square(column, above[column], above[column + 1], below[column + 1], below[column]);
            }
        }
        above = below;
    }

    /** Corners clockwise from the north-west; sides likewise from the north. */
    private void square(int column, float nw, float ne, float se, float sw) {
        float sum = nw + ne + se + sw;
        if (sum != sum) {
            return;
        }
        // A corner on the level counts as inside, as a frequency that equals the target meets it.
        int inside = (nw <= level ? 1 : 0) + (ne <= level ? 2 : 0) + (se <= level ? 4 : 0) + (sw <= level ? 8 : 0);
        if (inside == 0 || inside == 15) {
            return;
        }
        double[][] side = {crossing(column, 0, nw, 1, 0, ne), crossing(column + 1, 0, ne, 0, 1, se),
            crossing(column, 1, sw, 1, 0, se), crossing(column, 0, nw, 0, 1, sw)};
        switch (inside) {
            case 1, 14 -> piece(side[3], side[0]);
            case 2, 13 -> piece(side[0], side[1]);
            case 4, 11 -> piece(side[1], side[2]);
            case 8, 7 -> piece(side[2], side[3]);
            case 3, 12 -> piece(side[3], side[1]);
            case 6, 9 -> piece(side[0], side[2]);
            default -> {
                boolean joined = sum / 4 <= level;
                boolean northWest = inside == 5;
                // Either the two inside corners are joined, and the line cuts off the others, or it cuts off each of them.
                if (joined == northWest) {
                    piece(side[0], side[1]);
                    piece(side[2], side[3]);
                } else {
                    piece(side[3], side[0]);
                    piece(side[1], side[2]);
                }
            }
        }
    }

    /** Where a side between two centres crosses the level; null where it does not. */
    private double[] crossing(int column, int down, float from, int right, int low, float to) {
        if (from <= level == to <= level) {
            return null;
        }
        double part = (level - from) / ((double) to - from);
        int top = row - 1 + down;
        return new double[] {grid.centreX(column) + part * right * grid.cellWidth(), grid.centreY(top) - part * low * grid.cellHeight()};
    }

    private void piece(double[] a, double[] b) {
        if (a[0] != b[0] || a[1] != b[1]) {
            sink.piece(a[0], a[1], b[0], b[1]);
        }
    }
}
