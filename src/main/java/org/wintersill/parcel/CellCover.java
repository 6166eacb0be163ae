package org.wintersill.parcel;

import java.util.Arrays;
import java.util.List;

/**
 * The part of each cell that an outline covers, by the signed areas beside its edges.
 *
 * <p>In a row of cells, a piece of an edge that goes down by d at the mean position m of a cell covers the part d (1 - m) of that cell
 * and d of each cell further east; a piece that goes up takes as much away. The sum over all edges of a valid outline is the covered
 * part, exactly but for rounding. Only cells that an edge meets are written down; between them the sum does not change, so time and room
 * grow with the length of the outline and with the number of runs, not with its bounding box. Used by one thread; its room is used again.
 */
public final class CellCover {
    /** Parts below are rounding: a thousandth of a square millimetre of a cell of 100 m. */
    private static final double NOTHING = 1e-11;
    private static final double WHOLE = 1 - 1e-11;
    private static final int INDEX_BITS = 28;

    private final int columns;
    private final int rows;
    private long[] keys = new long[1024];
    private double[] parts = new double[1024];
    private double[] downs = new double[1024];
    private int events;

    /** Takes what was found. */
    @FunctionalInterface
    public interface Sink {
        /**
         * A run of cells of a row with the same part covered; rows come from the north, runs of a row from the west.
         *
         * @param share part of each cell that is covered, above 0, at most 1
         */
        void run(int row, int column, int length, double share);
    }

    public CellCover(int columns, int rows) {
        this.columns = columns;
        this.rows = rows;
    }

    /**
     * Finds the covered cells of an outline.
     *
     * @param rings positions in columns and rows as {@link OutlinePlacement} gives them; may reach beyond the grid
     */
    public void find(List<double[]> rings, Sink sink) {
        events = 0;
        for (double[] ring : rings) {
            for (int i = 0; i + 3 < ring.length; i += 2) {
                edge(ring[i], ring[i + 1], ring[i + 2], ring[i + 3]);
            }
        }
        if (events >= 1 << INDEX_BITS) {
            throw new IllegalStateException("an outline meets more than " + events + " cells");
        }
        for (int i = 0; i < events; i++) {
            keys[i] = keys[i] << INDEX_BITS | i;
        }
        Arrays.sort(keys, 0, events);
        sweep(sink);
    }

    private void edge(double x0, double y0, double x1, double y1) {
        double top = Math.max(0, Math.min(y0, y1));
        double bottom = Math.min(rows, Math.max(y0, y1));
        if (!(top < bottom)) {
            return;
        }
        double sense = y1 > y0 ? 1 : -1;
        double slope = (x1 - x0) / (y1 - y0);
        for (int row = (int) top; row < bottom; row++) {
            double from = Math.max(top, row);
            double to = Math.min(bottom, row + 1);
            if (from < to) {
                double left = from == y0 ? x0 : from == y1 ? x1 : x0 + (from - y0) * slope;
                double right = to == y0 ? x0 : to == y1 ? x1 : x0 + (to - y0) * slope;
                piece(row, Math.min(left, right), Math.max(left, right), sense * (to - from));
            }
        }
    }

    /** A piece within one row, from west to east, that goes down by {@code down} in all. */
    private void piece(int row, double west, double east, double down) {
        if (west >= columns) {
            return;
        }
        if (east <= 0) {
            event(row, -1, 0, down);
            return;
        }
        int first = (int) Math.floor(west);
        if (east <= first + 1 && first >= 0) {
            event(row, first, down * (1 - ((west + east) / 2 - first)), down);
            return;
        }
        double perColumn = down / (east - west);
        if (west < 0) {
            event(row, -1, 0, -west * perColumn);
        }
        for (int column = Math.max(0, first); column < columns && column < east; column++) {
            double from = Math.max(west, column);
            double to = Math.min(east, column + 1);
            double here = (to - from) * perColumn;
            event(row, column, here * (1 - ((from + to) / 2 - column)), here);
        }
    }

    private void event(int row, int column, double part, double down) {
        if (events == keys.length) {
            keys = Arrays.copyOf(keys, 2 * events);
            parts = Arrays.copyOf(parts, 2 * events);
            downs = Arrays.copyOf(downs, 2 * events);
        }
        keys[events] = (long) row * (columns + 1) + column + 1;
        parts[events] = part;
        downs[events] = down;
        events++;
    }

    private void sweep(Sink sink) {
        int at = 0;
        while (at < events) {
            int row = (int) ((keys[at] >> INDEX_BITS) / (columns + 1));
            double sum = 0;
            int next = 0;
            while (at < events) {
                long key = keys[at] >> INDEX_BITS;
                if (key / (columns + 1) != row) {
                    break;
                }
                int column = (int) (key % (columns + 1)) - 1;
                give(sink, row, next, column, sum);
                double part = sum;
                for (; at < events && keys[at] >> INDEX_BITS == key; at++) {
                    int event = (int) (keys[at] & (1L << INDEX_BITS) - 1);
                    part += parts[event];
                    sum += downs[event];
                }
                if (column >= 0) {
                    give(sink, row, column, column + 1, part);
                }
                next = column + 1;
            }
            give(sink, row, next, columns, sum);
        }
    }

    private static void give(Sink sink, int row, int from, int to, double share) {
        if (from < to && share > NOTHING) {
            sink.run(row, from, to - from, share > WHOLE ? 1 : share);
        }
    }
}
