package org.wintersill.run;

import java.util.Optional;
import org.wintersill.config.AreaConfig;
import org.wintersill.config.ElevationConfig;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.SourceHeights;
import org.wintersill.elevation.SourcePositions;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;

/**
 * The target grid of a run and how temperatures get there: the terrain model's grid where one is given, else the source's own,
 * else (for a source with a rotated pole) a longitude-latitude grid of the same cell size.
 *
 * @param window part of the source's grid that the target needs
 * @param adjustment from that part to the target
 */
record TargetPlan(Block window, ElevationAdjustment adjustment) {
    /** Heights that differ by less everywhere mean that both came from the same file, m. */
    private static final float SAME_HEIGHT = 0.5f;

    GridGeometry target() {
        return adjustment.positions().target();
    }

    /**
     * Decides.
     *
     * @param source the temperatures' grid
     * @param sourceName file that carries it, for messages
     */
    static TargetPlan of(GridGeometry source, String sourceName, Optional<ElevationConfig> elevation, Optional<AreaConfig> area,
                         InputFormats formats, CoordinateOperations operations, Notices notices) {
        if (elevation.isEmpty()) {
            return withoutHeights(source, area, operations, notices);
        }
        ElevationConfig config = elevation.get();
        ElevationField whole = formats.heights(config.dem(), notices);
        CoordinateOperation toSource = operation(whole.grid(), source, operations);
        SourcePositions positions = new SourcePositions(source, whole.grid(), toSource);
        // The area must not change a value inside it, so mean heights are taken before it is cut out.
        float[] heights = config.sourceHeight().isPresent() ? sourceHeights(config, source, sourceName, formats, notices)
                : SourceHeights.blockMeans(whole, positions);
        ElevationField dem = cropped(whole, area);
        SourcePositions used = dem == whole ? positions : new SourcePositions(source, dem.grid(), toSource);
        Block window = used.window().orElseThrow(() -> Problem.input("the terrain model nowhere meets the temperature grid: it covers "
                        + dem.grid().describe() + "; the temperatures cover " + source.describe(), config.dem().file().toString(),
                "Check both reference systems, and whether x and y are swapped").asException());
        ElevationAdjustment adjustment = ElevationAdjustment.toHeights(used.within(window), part(heights, source, window), dem,
                new LapseRates(config.lapseRate()));
        warnOfEqualHeights(adjustment, notices);
        return new TargetPlan(window, adjustment);
    }

    private static TargetPlan withoutHeights(GridGeometry source, Optional<AreaConfig> area, CoordinateOperations operations,
                                             Notices notices) {
        if (source.crs().kind() != Crs.Kind.ROTATED_POLE) {
            Block window = area.map(config -> block(source, config)).orElse(source.whole());
            return new TargetPlan(window, ElevationAdjustment.none(source.crop(window)));
        }
        GridGeometry regular = RotatedTarget.covering(source, operations);
        GridGeometry target = area.map(config -> regular.crop(block(regular, config))).orElse(regular);
        notices.add("the temperature grid has a rotated pole, which GeoTIFF cannot hold: layers are written on "
                + target.describe());
        CoordinateOperation toSource = operations.between(target.crs(), source.crs());
        SourcePositions positions = new SourcePositions(source, target, toSource);
        Block window = positions.window().orElse(source.whole());
        return new TargetPlan(window, ElevationAdjustment.interpolation(positions.within(window)));
    }

    private static CoordinateOperation operation(GridGeometry target, GridGeometry source, CoordinateOperations operations) {
        return target.crs().sameAs(source.crs()) ? CoordinateOperation.identity() : operations.between(target.crs(), source.crs());
    }

    private static float[] sourceHeights(ElevationConfig config, GridGeometry source, String sourceName,
                                         InputFormats formats, Notices notices) {
        ElevationField field = formats.heights(config.sourceHeight().get(), notices);
        if (!field.grid().sameAs(source)) {
            throw Problem.input("the source heights are on another grid than the temperatures: " + field.grid().describe()
                            + "; the temperatures of " + sourceName + " are on " + source.describe(),
                    config.sourceHeight().get().file().toString(),
                    "Give the orography file that belongs to the temperatures, or set elevation.source-height: dem-mean").asException();
        }
        return field.metres();
    }

    /** The values of a block of a grid. */
    private static float[] part(float[] values, GridGeometry grid, Block block) {
        float[] part = new float[block.cells()];
        for (int row = 0; row < block.rows(); row++) {
            System.arraycopy(values, (block.row() + row) * grid.columns() + block.column(), part, row * block.columns(), block.columns());
        }
        return part;
    }

    private static ElevationField cropped(ElevationField dem, Optional<AreaConfig> area) {
        if (area.isEmpty()) {
            return dem;
        }
        Block block = block(dem.grid(), area.get());
        return new ElevationField(dem.grid().crop(block), part(dem.metres(), dem.grid(), block), dem.description());
    }

    /** The cells whose centres lie in the area. */
    private static Block block(GridGeometry grid, AreaConfig area) {
        int west = Math.max(0, (int) Math.ceil(grid.columnPosition(area.west()) - 0.5));
        int east = Math.min(grid.columns() - 1, (int) Math.floor(grid.columnPosition(area.east()) - 0.5));
        int north = Math.max(0, (int) Math.ceil(grid.rowPosition(area.north()) - 0.5));
        int south = Math.min(grid.rows() - 1, (int) Math.floor(grid.rowPosition(area.south()) - 0.5));
        if (east < west || south < north) {
            throw Problem.usage("no cell of the target grid has its centre in the area; the grid is " + grid.describe(), "area.bbox",
                    "Give west, south, east, north in the coordinates of " + grid.crs().label()).asException();
        }
        return new Block(west, north, east - west + 1, south - north + 1);
    }

    private static void warnOfEqualHeights(ElevationAdjustment adjustment, Notices notices) {
        GridGeometry target = adjustment.positions().target();
        boolean any = false;
        for (int row = 0; row < target.rows(); row++) {
            for (int column = 0; column < target.columns(); column++) {
                float change = adjustment.heightChange(row, column);
                if (Math.abs(change) >= SAME_HEIGHT) {
                    return;
                }
                any |= change == change;
            }
        }
        if (any) {
            notices.add("source and target heights are the same everywhere: the elevation adjustment changes nothing; check that "
                    + "elevation.source-height and elevation.dem are different files");
        }
    }
}
