package org.wintersill.io.geopackage;

import java.util.Arrays;

/**
 * Closed rings on the corners of cells, packed. A corner is (column, row) with (0, 0) in the north-west; the first corner
 * of a ring is not repeated at its end.
 */
final class Rings {

    private int[] corners = new int[256];
    private int used;
    private int[] starts = new int[16];
    private int[] parts = new int[16];
    private int count;

    /** Adds the corners from {@code from} on of a list {column, row, column, row ...} as a ring of a part. */
    void add(int part, int[] list, int from, int to) {
        int length = to - from;
        if (used + length > corners.length) {
            corners = Arrays.copyOf(corners, Math.max(used + length, grown(corners.length)));
        }
        if (count + 1 == starts.length) {
            starts = Arrays.copyOf(starts, grown(count + 1));
            parts = Arrays.copyOf(parts, starts.length);
        }
        System.arraycopy(list, from, corners, used, length);
        starts[count] = used;
        parts[count] = part;
        used += length;
        count++;
        starts[count] = used;
    }

    private static int grown(int length) {
        return Math.max(length + (length >> 1), length);
    }

    int count() {
        return count;
    }

    int part(int ring) {
        return parts[ring];
    }

    /** Number of corners. */
    int size(int ring) {
        return (starts[ring + 1] - starts[ring]) / 2;
    }

    int column(int ring, int corner) {
        return corners[starts[ring] + 2 * corner];
    }

    int row(int ring, int corner) {
        return corners[starts[ring] + 2 * corner + 1];
    }

    /** Whether the ring runs clockwise on the map, which those around holes do. */
    boolean isHole(int ring) {
        long twiceArea = 0;
        int last = size(ring) - 1;
        for (int i = 0, before = last; i <= last; before = i++) {
            twiceArea += (long) column(ring, before) * row(ring, i) - (long) column(ring, i) * row(ring, before);
        }
        // Rows count downwards: the sign is that of the mirrored map.
        return twiceArea > 0;
    }
}
