package org.wintersill.elevation.terrain;

import java.util.Arrays;

/**
 * The heights of a rectangle as ranks: equal heights have the same, the lowest has 0, voids and cells beyond the relief have the
 * number of distinct heights.
 *
 * @param ranks {@code [row of the rectangle * columns + column]}
 * @param metres {@code [rank]}, ascending
 */
record RankedHeights(int[] ranks, float[] metres) {

    int distinct() {
        return metres.length;
    }

    /** @param row first row, may lie outside of the relief, as may all others */
    static RankedHeights of(Relief relief, int row, int column, int rows, int columns) {
        long[] keys = new long[Math.multiplyExact(rows, columns)];
        int present = 0;
        int[] ranks = new int[keys.length];
        for (int i = 0; i < keys.length; i++) {
            float z = relief.at(row + i / columns, column + i % columns);
            if (z == z) {
                // + 0f makes one zero of the two; integers of floats ascend for positive and descend for negative ones.
                int bits = Float.floatToRawIntBits(z + 0f);
                keys[present++] = (long) (bits < 0 ? bits ^ 0x7fffffff : bits) << 32 | i;
            }
        }
        Arrays.sort(keys, 0, present);
        float[] metres = new float[present];
        int distinct = 0;
        Arrays.fill(ranks, -1);
        for (int k = 0; k < present; k++) {
            int at = (int) keys[k];
            float z = relief.at(row + at / columns, column + at % columns);
            if (distinct == 0 || metres[distinct - 1] != z) {
                metres[distinct++] = z;
            }
            ranks[at] = distinct - 1;
        }
        for (int i = 0; i < ranks.length; i++) {
            if (ranks[i] < 0) {
                ranks[i] = distinct;
            }
        }
        return new RankedHeights(ranks, Arrays.copyOf(metres, distinct));
    }
}
