package org.wintersill.io.geotiff.write;

import java.util.ArrayList;
import java.util.List;

/**
 * One level of detail: the full grid or an overview, cut into square tiles.
 *
 * @param columns cells across
 * @param rows cells down
 */
record PyramidLevel(int columns, int rows) {
    /** Cells along a side of a tile. */
    static final int TILE = 256;

    /** The full grid first, then halves rounded up until the longer side fits one tile. */
    static List<PyramidLevel> of(int columns, int rows) {
        List<PyramidLevel> levels = new ArrayList<>();
        levels.add(new PyramidLevel(columns, rows));
        int across = columns;
        int down = rows;
        while (Math.max(across, down) > TILE) {
            across = across / 2 + across % 2;
            down = down / 2 + down % 2;
            levels.add(new PyramidLevel(across, down));
        }
        return List.copyOf(levels);
    }

    int tilesAcross() {
        return (columns - 1) / TILE + 1;
    }

    int tilesDown() {
        return (rows - 1) / TILE + 1;
    }

    /** Tiles of one band. */
    int tiles() {
        return Math.multiplyExact(tilesAcross(), tilesDown());
    }
}
