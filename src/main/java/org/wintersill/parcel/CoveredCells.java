package org.wintersill.parcel;

import java.util.Arrays;
import java.util.List;
import org.wintersill.grid.Block;

/**
 * The covered cells of many parcels, put in the order of the tiles in which a map is stored: every tile is read once and gives its
 * values to all parcels that meet it. Runs of cells are kept, not single cells. Built by one thread; afterwards read by any.
 */
public final class CoveredCells {
    /** A cell of which less is covered, and which holds less than {@link #SLIVER} of the parcel, is left out: its edge lies on the border. */
    private static final double THIN = 1e-6;
    private static final double SLIVER = 1e-4;

    private final OutlinePlacement placement;
    private final int tile;
    private final int tilesAcross;
    private final CellCover cover;
    private final double[] cellAreas;
    private int[] parcel = new int[1024];
    private int[] row = new int[1024];
    private int[] column = new int[1024];
    private int[] length = new int[1024];
    private float[] share = new float[1024];
    private int runs;
    private int parcels;
    private int[] tileStarts;

    /**
     * What one parcel covers.
     *
     * @param areaKm2 area of the whole parcel; NaN where it cannot be brought to the grid's system
     * @param onGridKm2 area that lies on the grid's cells
     * @param cells number of cells that it meets
     * @param largestShare largest part of a cell that it covers
     */
    public record Extent(double areaKm2, double onGridKm2, long cells, double largestShare) {
    }

    /** @param tile width and height of the tiles of the maps */
    public CoveredCells(OutlinePlacement placement, int tile) {
        this.placement = placement;
        this.tile = tile;
        tilesAcross = (placement.grid().columns() + tile - 1) / tile;
        cover = new CellCover(placement.grid().columns(), placement.grid().rows());
        cellAreas = new double[placement.grid().rows()];
        for (int r = 0; r < cellAreas.length; r++) {
            cellAreas[r] = placement.cellAreaKm2(r);
        }
    }

    /** Adds a parcel; it gets the next number, from 0. */
    public Extent add(Outline outline) {
        OutlinePlacement.Placed placed = placement.place(outline);
        int first = runs;
        int number = parcels++;
        double whole = Math.max(0, placed.areaKm2());
        cover.find(placed.rings(), (r, c, n, part) -> {
            if (part >= THIN || part * cellAreas[r] >= SLIVER * whole) {
                addRun(number, r, c, n, part);
            }
        });
        if (runs == first) {
            addPoint(number, placed.rings(), whole);
        }
        double onGrid = 0;
        double largest = 0;
        long cells = 0;
        for (int run = first; run < runs; run++) {
            onGrid += length[run] * (double) share[run] * cellAreas[row[run]];
            largest = Math.max(largest, share[run]);
            cells += length[run];
        }
        return new Extent(placed.areaKm2(), Math.min(onGrid, Math.max(whole, 0)), cells, largest);
    }

    /** A parcel too small for its area to be told from rounding still lies in a cell. */
    private void addPoint(int number, List<double[]> rings, double whole) {
        if (rings.isEmpty() || !(whole > 0)) {
            return;
        }
        double c = rings.get(0)[0];
        double r = rings.get(0)[1];
        if (c >= 0 && r >= 0 && c < placement.grid().columns() && r < placement.grid().rows() && whole < THIN * cellAreas[(int) r]) {
            addRun(number, (int) r, (int) c, 1, Math.max(whole / cellAreas[(int) r], Float.MIN_NORMAL));
        }
    }

    /** Cuts a run at the borders of tiles. */
    private void addRun(int number, int r, int c, int n, double part) {
        for (int from = c; from < c + n; ) {
            int to = Math.min(c + n, (from / tile + 1) * tile);
            if (runs == parcel.length) {
                grow();
            }
            parcel[runs] = number;
            row[runs] = r;
            column[runs] = from;
            length[runs] = to - from;
            share[runs] = (float) part;
            runs++;
            from = to;
        }
    }

    private void grow() {
        int size = Math.addExact(runs, runs / 2);
        parcel = Arrays.copyOf(parcel, size);
        row = Arrays.copyOf(row, size);
        column = Arrays.copyOf(column, size);
        length = Arrays.copyOf(length, size);
        share = Arrays.copyOf(share, size);
    }

    public int parcels() {
        return parcels;
    }

    public int runs() {
        return runs;
    }

    /** Ends the adding and sorts the runs by tile; those of a tile stay in the order of the parcels. */
    public void sortByTile() {
        int tiles = tilesAcross * ((placement.grid().rows() + tile - 1) / tile);
        tileStarts = new int[tiles + 1];
        for (int run = 0; run < runs; run++) {
            tileStarts[tileOf(run) + 1]++;
        }
        for (int i = 1; i <= tiles; i++) {
            tileStarts[i] += tileStarts[i - 1];
        }
        int[] next = Arrays.copyOf(tileStarts, tiles);
        int[] order = new int[runs];
        for (int run = 0; run < runs; run++) {
            order[run] = next[tileOf(run)]++;
        }
        parcel = moved(parcel, order);
        row = moved(row, order);
        column = moved(column, order);
        length = moved(length, order);
        float[] shares = new float[runs];
        for (int run = 0; run < runs; run++) {
            shares[order[run]] = share[run];
        }
        share = shares;
    }

    private static int[] moved(int[] values, int[] order) {
        int[] moved = new int[order.length];
        for (int run = 0; run < order.length; run++) {
            moved[order[run]] = values[run];
        }
        return moved;
    }

    private int tileOf(int run) {
        return row[run] / tile * tilesAcross + column[run] / tile;
    }

    /** Number of tiles, with parcels in them or not. */
    public int tiles() {
        return tileStarts.length - 1;
    }

    public boolean isEmpty(int tileNumber) {
        return tileStarts[tileNumber] == tileStarts[tileNumber + 1];
    }

    /** The cells of a tile. */
    public Block block(int tileNumber) {
        int firstColumn = tileNumber % tilesAcross * tile;
        int firstRow = tileNumber / tilesAcross * tile;
        return new Block(firstColumn, firstRow, Math.min(tile, placement.grid().columns() - firstColumn),
                Math.min(tile, placement.grid().rows() - firstRow));
    }

    /** Takes the runs of a tile. */
    @FunctionalInterface
    public interface RunTaker {
        /**
         * @param from position of the run's first value in the tile's values
         * @param count number of cells
         * @param weightKm2 covered area of each of the cells
         */
        void run(int parcel, int from, int count, double weightKm2);
    }

    /** Gives the runs of a tile, always in the same order. */
    public void eachRun(int tileNumber, RunTaker taker) {
        Block block = block(tileNumber);
        for (int run = tileStarts[tileNumber]; run < tileStarts[tileNumber + 1]; run++) {
            int from = (row[run] - block.row()) * block.columns() + column[run] - block.column();
            taker.run(parcel[run], from, length[run], share[run] * cellAreas[row[run]]);
        }
    }
}
