package org.wintersill.io.netcdf;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.grid.Block;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.temperature.StorageLayout;

/**
 * Where the cells of a file lie on the grid that readers deliver: north-up, longitudes -180..180 where that is possible.
 *
 * @param grid the grid as delivered
 * @param southUp whether the first row of the file is the southernmost
 * @param eastFirst whether the first column of the file is the easternmost
 * @param roll column of the file, counted from the west, that is column 0 of the grid
 * @param remarks what was turned round, for people
 */
record GridPlacement(GridGeometry grid, boolean southUp, boolean eastFirst, int roll, List<String> remarks) {
    private static final double SLACK = 1e-3;

    /**
     * @param x axis of columns in units of the reference system
     * @param y axis of rows
     */
    static GridPlacement of(EvenAxis x, EvenAxis y, Crs crs) {
        double cellWidth = x.size();
        double cellHeight = y.size();
        double firstX = x.smallest();
        int roll = 0;
        List<String> remarks = new ArrayList<>();
        if (crs.angular()) {
            double turns = Math.floor((firstX + 180) / 360 + SLACK * cellWidth / 360);
            firstX -= 360 * turns;
            double east = firstX + (x.count() - 0.5) * cellWidth;
            if (east > 180 + SLACK * cellWidth && Math.abs(x.count() * cellWidth - 360) < SLACK * 360) {
                roll = (int) Math.ceil((180 - firstX) / cellWidth - SLACK) % x.count();
                firstX += roll == 0 ? 0 : roll * cellWidth - 360;
            } else if (east > 180 + SLACK * cellWidth) {
                remarks.add("the grid crosses the date line; its longitudes go on beyond 180");
            }
            if (roll != 0) {
                remarks.add("longitudes were rolled to -180..180");
            } else if (turns != 0) {
                remarks.add("longitudes were shifted to -180..180");
            }
        }
        boolean southUp = !y.descends() && y.count() > 1;
        if (southUp) {
            remarks.add("rows were turned north-up");
        }
        if (x.descends()) {
            remarks.add("columns were turned west-first");
        }
        GridGeometry grid = new GridGeometry(x.count(), y.count(), firstX - cellWidth / 2, y.largest() + cellHeight / 2,
                cellWidth, cellHeight, crs);
        return new GridPlacement(grid, southUp, x.descends(), roll, List.copyOf(remarks));
    }

    /**
     * Copies a block of the grid, at most two boxes of the file (two where the roll cuts it).
     *
     * @param out value of record r, row j, column i of the block goes to {@code out[base + r * recordStep + j * columns + i]}
     * @return number of implausible values
     */
    long copy(Slabs slabs, int record, int records, Block block, float[] out, int base, int recordStep) {
        long wild = 0;
        int done = 0;
        while (done < block.columns()) {
            int fromWest = (block.column() + done + roll) % grid.columns();
            int run = Math.min(block.columns() - done, grid.columns() - fromWest);
            int column = eastFirst ? grid.columns() - fromWest - run : fromWest;
            int row = southUp ? grid.rows() - block.rowEnd() : block.row();
            int start = base + done + (eastFirst ? run - 1 : 0) + (southUp ? (block.rows() - 1) * block.columns() : 0);
            wild += slabs.copy(new Slabs.Box(record, records, row, block.rows(), column, run), out, start, recordStep,
                    southUp ? -block.columns() : block.columns(), eastFirst ? -1 : 1);
            done += run;
        }
        return wild;
    }

    /**
     * The layout of the storage as seen on the grid.
     *
     * @param inOrder whether records follow each other in time
     */
    StorageLayout layout(CdfVariable variable, Slabs.Order order, boolean inOrder) {
        if (variable.storage() instanceof Storage.Chunked chunked) {
            int days = order.time() < 0 || !inOrder ? 1 : inside(chunked.chunk()[order.time()], variable.shape()[order.time()]);
            int rows = inside(chunked.chunk()[order.y()], grid.rows());
            int columns = inside(chunked.chunk()[order.x()], grid.columns());
            boolean cutByRoll = roll % columns != 0 || (roll != 0 || eastFirst) && grid.columns() % columns != 0;
            return new StorageLayout(days, rows, cutByRoll ? grid.columns() : columns, southUp ? grid.rows() % rows : 0);
        }
        if (order.time() > Math.min(order.x(), order.y()) && inOrder) {
            // time varies fastest, or faster than one of the axes: long reads of few cells
            return new StorageLayout(Math.max(1, variable.shape()[order.time()]), 1,
                    order.time() > Math.max(order.x(), order.y()) ? 1 : grid.columns(), 0);
        }
        return new StorageLayout(1, 1, grid.columns(), 0);
    }

    private static int inside(int chunk, int length) {
        return Math.max(1, Math.min(chunk, length));
    }
}
