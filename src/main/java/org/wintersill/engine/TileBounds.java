package org.wintersill.engine;

import java.util.Arrays;
import java.util.List;
import org.wintersill.elevation.TargetTile;

/**
 * Lowest and highest temperature at the nodes of each tile of a row of tiles, night by night. Room of one worker, used again and
 * again.
 *
 * <p>Nights are only comparable where the same nodes have values: otherwise neighbours stand in for missing ones, with other weights
 * and other height gains. So a night that lacks a node which another night has is infinitely cold (it is always looked at), its
 * {@link #high} infinite (it never makes another needless); a night without any value is infinitely warm.
 */
final class TileBounds {
    private final int mostNights;
    private List<TargetTile> tiles = List.of();
    private int nights;
    /** {@code [night][tile]}. */
    private float[][] low = new float[0][];
    private float[][] high = new float[0][];
    private byte[][] present = new byte[0][];
    private long[] seen = new long[0];
    private float[] lowGain = new float[0];
    private float[] highGain = new float[0];
    private float[] largest = new float[0];

    TileBounds(int mostNights) {
        this.mostNights = mostNights;
    }

    /** Begins a row of tiles. */
    void begin(List<TargetTile> row) {
        tiles = row;
        nights = 0;
        if (seen.length < row.size()) {
            low = new float[mostNights][row.size()];
            high = new float[mostNights][row.size()];
            present = new byte[mostNights][row.size()];
            seen = new long[row.size()];
            lowGain = new float[row.size()];
            highGain = new float[row.size()];
            largest = new float[row.size()];
        }
        Arrays.fill(seen, 0);
        Arrays.fill(largest, 0);
    }

    /**
     * Takes the next night.
     *
     * @param values source values; source cell {@code c} is at {@code offset + c}
     * @param sourceColumns columns of the source
     */
    void add(float[] values, int offset, int sourceColumns) {
        for (int t = 0; t < tiles.size(); t++) {
            TargetTile tile = tiles.get(t);
            if (tile.nodes() == 4 && tile.sourceRows() == 2 && tile.withHeight() == 15 && addFour(values,
                    offset + tile.sourceRow() * sourceColumns + tile.sourceColumn(), sourceColumns, t)) {
                continue;
            }
            float lowest = Float.POSITIVE_INFINITY;
            float highest = Float.NEGATIVE_INFINITY;
            int count = 0;
            long bit = 1;
            long found = 0;
            for (int r = 0; r < tile.sourceRows(); r++) {
                int from = offset + (tile.sourceRow() + r) * sourceColumns + tile.sourceColumn();
                for (int c = 0; c < tile.sourceColumns(); c++, bit <<= 1) {
                    float value = values[from + c];
                    if (value == value && (tile.withHeight() & bit) != 0) {
                        lowest = Math.min(lowest, value);
                        highest = Math.max(highest, value);
                        found |= bit;
                        count++;
                    }
                }
            }
            seen[t] |= found;
            low[nights][t] = lowest;
            high[nights][t] = highest;
            present[nights][t] = (byte) count;
            if (count > 0) {
                largest[t] = Math.max(largest[t], Math.max(Math.abs(lowest), Math.abs(highest)));
            }
        }
        nights++;
    }

    /** The usual tile: four nodes, all with values; false where one is missing. */
    private boolean addFour(float[] values, int from, int sourceColumns, int t) {
        float a = values[from];
        float b = values[from + 1];
        float c = values[from + sourceColumns];
        float d = values[from + sourceColumns + 1];
        float lowest = Math.min(Math.min(a, b), Math.min(c, d));
        float highest = Math.max(Math.max(a, b), Math.max(c, d));
        if (lowest != lowest) {
            return false;
        }
        seen[t] |= 15;
        low[nights][t] = lowest;
        high[nights][t] = highest;
        present[nights][t] = 4;
        largest[t] = Math.max(largest[t], Math.max(-lowest, highest));
        return true;
    }

    /** Ends the row: all nights are known. */
    void complete() {
        for (int t = 0; t < tiles.size(); t++) {
            TargetTile tile = tiles.get(t);
            int nodes = Long.bitCount(seen[t]);
            boolean whole = nodes == tile.nodes();
            lowGain[t] = whole ? tile.lowGain() : tile.lowWideGain();
            highGain[t] = whole ? tile.highGain() : tile.highWideGain();
            for (int night = 0; night < nights; night++) {
                int count = present[night][t];
                if (count < nodes || count == 0) {
                    high[night][t] = Float.POSITIVE_INFINITY;
                    low[night][t] = count > 0 ? Float.NEGATIVE_INFINITY : Float.POSITIVE_INFINITY;
                }
            }
        }
    }

    int tiles() {
        return tiles.size();
    }

    TargetTile tile(int t) {
        return tiles.get(t);
    }

    int nights() {
        return nights;
    }

    /** Lowest node of each tile in a night, degrees Celsius; not to be changed. */
    float[] low(int night) {
        return low[night];
    }

    /** Highest node of each tile in a night; infinite where the night makes no other needless. */
    float[] high(int night) {
        return high[night];
    }

    /** Nodes of a tile that have a value in any night, one bit each. */
    long seen(int t) {
        return seen[t];
    }

    /** Least height gain of each tile, km. */
    float[] lowGain() {
        return lowGain;
    }

    float[] highGain() {
        return highGain;
    }

    /** Greatest absolute temperature of a tile's nodes. */
    float largest(int t) {
        return largest[t];
    }
}
