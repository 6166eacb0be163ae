package org.wintersill.elevation;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntUnaryOperator;

/**
 * Target rows cut into tiles: where both grids share their axes, along the lines between source cell centres, so that most tiles
 * lie between four of them; otherwise squares.
 */
public final class TargetTiles {
    /** Cells of a side of a tile at which its loops are long enough; only the last of a row is shorter. Assumed. */
    public static final int SHORTEST_SIDE = 8;
    private static final int LONGEST_SIDE = 48;
    private static final int SQUARE_SIDE = 16;
    /** Most cells of a row of tiles, so that its results stay small. */
    private static final int MOST_ROW_CELLS = 1 << 16;
    /** Nodes are bits of a long. */
    private static final int MOST_NODES = 64;
    /** Fewest cells a node on average: with fewer, looking at the nodes costs as much as looking at the cells. */
    private static final int FEWEST_CELLS_A_NODE = 5;

    private final ElevationAdjustment adjustment;
    private final SourcePositions positions;
    private final List<List<TargetTile>> rows = new ArrayList<>();

    private TargetTiles(ElevationAdjustment adjustment, int firstRow, int endRow) {
        this.adjustment = adjustment;
        positions = adjustment.positions();
        int columns = positions.target().columns();
        int[] columnCuts = positions.isSeparable() ? cuts(0, columns, column -> positions.west(0, column), LONGEST_SIDE)
                : even(0, columns, SQUARE_SIDE);
        int mostRows = mostRows(columns);
        int[] rowCuts = positions.isSeparable() ? cuts(firstRow, endRow, row -> positions.north(row, 0), mostRows)
                : even(firstRow, endRow, Math.min(SQUARE_SIDE, mostRows));
        for (int r = 1; r < rowCuts.length; r++) {
            List<TargetTile> tiles = new ArrayList<>();
            for (int c = 1; c < columnCuts.length; c++) {
                tiles.add(tile(rowCuts[r - 1], rowCuts[r], columnCuts[c - 1], columnCuts[c]));
            }
            rows.add(tiles);
        }
    }

    /** Tiles of a run of target rows; empty where the target is not so much finer than the source that tiles would gain anything. */
    public static Optional<TargetTiles> of(ElevationAdjustment adjustment, int firstRow, int endRow) {
        if (!mayGain(adjustment)) {
            return Optional.empty();
        }
        TargetTiles tiles = new TargetTiles(adjustment, firstRow, endRow);
        long cells = 0;
        long nodes = 0;
        for (List<TargetTile> row : tiles.rows) {
            for (TargetTile tile : row) {
                if (tile.nodes() > MOST_NODES) {
                    return Optional.empty();
                }
                cells += tile.cells();
                nodes += tile.nodes();
            }
        }
        return cells >= FEWEST_CELLS_A_NODE * nodes ? Optional.of(tiles) : Optional.empty();
    }

    /** Whether the adjustment is of the kind that tiles bound, and the target large enough for them to be tried. */
    public static boolean mayGain(ElevationAdjustment adjustment) {
        return adjustment.isPlain() && !adjustment.isPassThrough() && adjustment.positions().target().rows() > SHORTEST_SIDE;
    }

    /** Most target rows of a row of tiles, for a number of target columns. */
    public static int mostRows(int columns) {
        return Math.max(SHORTEST_SIDE, Math.min(LONGEST_SIDE, MOST_ROW_CELLS / columns));
    }

    /** Rows of tiles from the north, each from the west. */
    public List<List<TargetTile>> rows() {
        return rows;
    }

    /** Cuts where the neighbour changes, without pieces shorter than {@link #SHORTEST_SIDE} where possible, or longer than the most. */
    private static int[] cuts(int from, int to, IntUnaryOperator neighbour, int most) {
        List<Integer> cuts = new ArrayList<>(List.of(from));
        int start = from;
        for (int i = from + 1; i <= to; i++) {
            boolean change = i == to || neighbour.applyAsInt(i) != neighbour.applyAsInt(i - 1);
            if (change && (i - start >= Math.min(SHORTEST_SIDE, most) || i == to)) {
                int parts = (i - start + most - 1) / most;
                for (int part = 1; part <= parts; part++) {
                    cuts.add(start + (i - start) * part / parts);
                }
                start = i;
            }
        }
        return cuts.stream().mapToInt(Integer::intValue).toArray();
    }

    private static int[] even(int from, int to, int side) {
        int parts = Math.max(1, (to - from + side - 1) / side);
        int[] cuts = new int[parts + 1];
        for (int part = 0; part <= parts; part++) {
            cuts[part] = from + (int) ((long) (to - from) * part / parts);
        }
        return cuts;
    }

    private TargetTile tile(int row, int rowEnd, int column, int columnEnd) {
        int north = Integer.MAX_VALUE;
        int south = -1;
        int west = Integer.MAX_VALUE;
        int east = -1;
        boolean covered = true;
        boolean empty = true;
        float[] gain = {Float.POSITIVE_INFINITY, Float.NEGATIVE_INFINITY};
        float[] height = {Float.POSITIVE_INFINITY, Float.NEGATIVE_INFINITY};
        for (int r = row; r < rowEnd; r++) {
            for (int c = column; c < columnEnd; c++) {
                boolean has = adjustment.containing(r, c) >= 0;
                covered &= has;
                if (!has) {
                    continue;
                }
                empty = false;
                north = Math.min(north, positions.north(r, c));
                south = Math.max(south, positions.north(r, c));
                west = Math.min(west, positions.west(r, c));
                east = Math.max(east, positions.west(r, c));
                if (adjustment.hasHeights()) {
                    widen(gain, adjustment.heightGain(r)[c]);
                    widen(height, adjustment.targetHeight(r * positions.target().columns() + c));
                }
            }
        }
        if (empty) {
            return new TargetTile(row, rowEnd - row, column, columnEnd - column, 0, 0, 0, 0, 0, 0, 0, 0, 0, false, true);
        }
        int sourceRows = Math.min(south + 2, positions.source().rows()) - north;
        int sourceColumns = Math.min(east + 2, positions.source().columns()) - west;
        long withHeight = 0;
        float[] source = {Float.POSITIVE_INFINITY, Float.NEGATIVE_INFINITY};
        for (int node = 0; node < Math.min(MOST_NODES, sourceRows * sourceColumns); node++) {
            float z = adjustment.hasHeights() ? adjustment.sourceHeights()[(north + node / sourceColumns)
                    * positions.source().columns() + west + node % sourceColumns] : 0;
            withHeight |= z == z ? 1L << node : 0;
            widen(source, z);
        }
        float lowWide = 0;
        float highWide = 0;
        if (adjustment.hasHeights()) {
            // Rounded outwards, so that no cell's own difference lies beyond.
            lowWide = Math.nextDown((source[0] - height[1]) / 1000);
            highWide = Math.nextUp((source[1] - height[0]) / 1000);
        }
        boolean plain = adjustment.hasHeights() && gain[0] <= gain[1];
        return new TargetTile(row, rowEnd - row, column, columnEnd - column, north, sourceRows, west, sourceColumns, withHeight,
                plain ? gain[0] : lowWide, plain ? gain[1] : highWide, lowWide, highWide, covered, false);
    }

    private static void widen(float[] range, float value) {
        if (value == value) {
            range[0] = Math.min(range[0], value);
            range[1] = Math.max(range[1], value);
        }
    }
}
