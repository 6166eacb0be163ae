package org.wintersill.elevation.terrain;

import org.wintersill.grid.Block;

/**
 * Where a cell's height stands among those in its window, the cell itself among them:
 * <pre>
 * percentile = (number of lower cells + half the number of equal ones) / number of cells      0 lowest, 1 highest
 * above lowest = height minus the lowest height in the window, m
 * </pre>
 * Both are NaN for a void; voids and cells beyond the terrain model are no neighbours.
 *
 * <p>A block is cut into tiles. In a tile heights become ranks, and the counts of ranks in the window are carried along a row: one
 * step lets the cells of one edge of the window go and takes those of the other in. Ranks are exact, however close two heights lie.
 * Work a cell grows with the height of the window, not with its area; memory a thread with the area of tile and window.
 *
 * @param percentile 0..1, of a block
 * @param aboveLowest m, at least 0, of a block
 */
public record LocalHeights(float[] percentile, float[] aboveLowest) {
    /** Side of a tile in cells, unless the window is larger; its ranks with a window of 30 cells stay in the second-level cache. */
    private static final int TILE = 192;

    /** The values of a block. */
    public static LocalHeights of(Relief relief, Window window, Block block, Tasks tasks) {
        LocalHeights out = new LocalHeights(new float[block.cells()], new float[block.cells()]);
        int side = Math.max(TILE, 2 * window.rowReach(relief, block.row()));
        int across = (block.columns() + side - 1) / side;
        int down = (block.rows() + side - 1) / side;
        tasks.forEach(across * down, task -> {
            int column = block.column() + task % across * side;
            int row = block.row() + task / across * side;
            Block tile = new Block(column, row, Math.min(side, block.columnEnd() - column), Math.min(side, block.rowEnd() - row));
            new Sweep(relief, window, tile).run(block, out);
        });
        return out;
    }

    /** One tile in work. */
    private static final class Sweep {
        private final Relief relief;
        private final Window window;
        private final Block tile;
        private final int high;
        private final int wide;
        private final int stride;
        private final RankedHeights ranked;
        private final int[] fine;
        private final int[] coarse;
        private final int shift;

        Sweep(Relief relief, Window window, Block tile) {
            this.relief = relief;
            this.window = window;
            this.tile = tile;
            int reachHigh = 0;
            int reachWide = 0;
            for (int row = tile.row(); row < tile.rowEnd(); row++) {
                reachHigh = Math.max(reachHigh, window.rowReach(relief, row));
                reachWide = Math.max(reachWide, window.columnReach(relief, row));
            }
            high = reachHigh;
            // One column more in the west, so that the first step of a row is a step like the others.
            wide = reachWide + 1;
            stride = tile.columns() + 2 * wide;
            ranked = RankedHeights.of(relief, tile.row() - high, tile.column() - wide, tile.rows() + 2 * high, stride);
            shift = (33 - Integer.numberOfLeadingZeros(ranked.distinct())) / 2;
            fine = new int[ranked.distinct() + 1];
            coarse = new int[(ranked.distinct() >> shift) + 1];
        }

        void run(Block block, LocalHeights out) {
            for (int row = tile.row(); row < tile.rowEnd(); row++) {
                int[] halfWidths = window.halfWidths(relief, row);
                int[] leaving = new int[halfWidths.length];
                int[] entering = new int[halfWidths.length];
                int cells = 0;
                int line = row - tile.row() + high - halfWidths.length / 2;
                for (int k = 0; k < halfWidths.length; k++) {
                    leaving[k] = (line + k) * stride + wide - halfWidths[k] - 1;
                    entering[k] = (line + k) * stride + wide + halfWidths[k];
                    cells += 2 * halfWidths[k] + 1;
                }
                row(row, leaving, entering, cells, (row - block.row()) * block.columns() + tile.column() - block.column(), out);
            }
        }

        private void row(int row, int[] leaving, int[] entering, int cells, int start, LocalHeights out) {
            java.util.Arrays.fill(fine, 0);
            java.util.Arrays.fill(coarse, 0);
            int[] ranks = ranked.ranks();
            for (int k = 0; k < leaving.length; k++) {
                for (int i = leaving[k]; i < entering[k]; i++) {
                    fine[ranks[i]]++;
                    coarse[ranks[i] >> shift]++;
                }
            }
            int centre = (row - tile.row() + high) * stride + wide;
            int none = ranked.distinct();
            for (int x = 0; x < tile.columns(); x++) {
                step(ranks, leaving, entering, x, shift, fine, coarse);
                int rank = ranks[centre + x];
                if (rank == none) {
                    out.percentile[start + x] = Float.NaN;
                    out.aboveLowest[start + x] = Float.NaN;
                } else {
                    double below = below(rank) + fine[rank] / 2.0;
                    out.percentile[start + x] = (float) (below / (cells - fine[none]));
                    out.aboveLowest[start + x] = ranked.metres()[rank] - ranked.metres()[lowest()];
                }
            }
        }

        /** Moves the window one column to the east. */
        private static void step(int[] ranks, int[] leaving, int[] entering, int x, int shift, int[] fine, int[] coarse) {
            for (int k = 0; k < leaving.length; k++) {
                int gone = ranks[leaving[k] + x];
                int come = ranks[entering[k] + x];
                fine[gone]--;
                coarse[gone >> shift]--;
                fine[come]++;
                coarse[come >> shift]++;
            }
        }

        /** Number of cells of a lower rank in the window. */
        private int below(int rank) {
            int group = rank >> shift;
            int count = 0;
            for (int i = 0; i < group; i++) {
                count += coarse[i];
            }
            for (int i = group << shift; i < rank; i++) {
                count += fine[i];
            }
            return count;
        }

        /** Lowest rank in the window, which holds at least one. */
        private int lowest() {
            int group = 0;
            while (coarse[group] == 0) {
                group++;
            }
            int rank = group << shift;
            while (fine[rank] == 0) {
                rank++;
            }
            return rank;
        }
    }
}
