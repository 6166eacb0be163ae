package org.wintersill.run;

import java.util.BitSet;
import java.util.Optional;
import org.wintersill.config.AreaConfig;
import org.wintersill.config.PolygonEntry;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.Envelope;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;

/**
 * The part of a grid that an area leaves: the cells whose centres lie in its box and in one of its polygons.
 *
 * @param block smallest block that holds them
 * @param inside those cells by their numbers in the block; empty where the block has no others
 */
record AreaCut(Block block, Optional<BitSet> inside) {

    /** The adjustment with values inside of the cut alone. */
    static ElevationAdjustment masked(ElevationAdjustment adjustment, Optional<AreaCut> cut) {
        return cut.flatMap(AreaCut::inside).map(adjustment::only).orElse(adjustment);
    }

    /** What is asked for, and what it takes to find it on a grid. */
    record Wanted(Optional<AreaConfig> area, InputFormats formats, CoordinateOperations operations, Notices notices) {

        /**
         * The cut of a grid; empty where all of it is wanted.
         *
         * @throws org.wintersill.problem.ProblemException when no cell is left, or the polygons cannot be read
         */
        Optional<AreaCut> of(GridGeometry grid) {
            return area.map(config -> {
                Block box = config.box().map(edges -> box(grid, edges)).orElse(grid.whole());
                return config.polygons().map(entry -> polygons(grid, box, entry)).orElse(new AreaCut(box, Optional.empty()));
            });
        }

        private AreaCut polygons(GridGeometry grid, Block box, PolygonEntry entry) {
            PolygonMask mask = PolygonMask.of(grid, entry, formats, operations, notices);
            BitSet inside = mask.inside();
            int west = box.columnEnd();
            int east = -1;
            int north = box.rowEnd();
            int south = -1;
            for (int row = box.row(); row < box.rowEnd(); row++) {
                int from = row * grid.columns() + box.column();
                int first = inside.nextSetBit(from);
                int last = inside.previousSetBit(from + box.columns() - 1);
                if (first >= 0 && first < from + box.columns()) {
                    west = Math.min(west, first - row * grid.columns());
                    east = Math.max(east, last - row * grid.columns());
                    north = Math.min(north, row);
                    south = row;
                }
            }
            if (east < 0) {
                throw Problem.usage("no cell of the target grid has its centre in one of the polygons"
                                + (area.get().box().isPresent() ? " and in the box" : "") + "; the grid is " + grid.describe(),
                        entry.file().toString(), mask.swapped() ? "x and y seem to be swapped in the polygons"
                                : "Check the reference system of the polygons, " + mask.system()).asException();
            }
            Block block = new Block(west, north, east - west + 1, south - north + 1);
            BitSet part = new BitSet(block.cells());
            for (int row = 0; row < block.rows(); row++) {
                int from = (block.row() + row) * grid.columns() + block.column();
                for (int cell = inside.nextSetBit(from); cell >= 0 && cell < from + block.columns(); cell = inside.nextSetBit(cell + 1)) {
                    part.set(row * block.columns() + cell - from);
                }
            }
            return new AreaCut(block, part.cardinality() == block.cells() ? Optional.empty() : Optional.of(part));
        }

        /** The cells whose centres lie in a box. */
        private static Block box(GridGeometry grid, Envelope edges) {
            int west = Math.max(0, (int) Math.ceil(grid.columnPosition(edges.west()) - 0.5));
            int east = Math.min(grid.columns() - 1, (int) Math.floor(grid.columnPosition(edges.east()) - 0.5));
            int north = Math.max(0, (int) Math.ceil(grid.rowPosition(edges.north()) - 0.5));
            int south = Math.min(grid.rows() - 1, (int) Math.floor(grid.rowPosition(edges.south()) - 0.5));
            if (east < west || south < north) {
                throw Problem.usage("no cell of the target grid has its centre in the area; the grid is " + grid.describe(), "area.bbox",
                        "Give west, south, east, north in the coordinates of " + grid.crs().label()).asException();
            }
            return new Block(west, north, east - west + 1, south - north + 1);
        }
    }
}
