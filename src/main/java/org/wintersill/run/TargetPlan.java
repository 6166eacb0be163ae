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
        ElevationField dem = cropped(formats.heights(config.dem(), notices), area);
        CoordinateOperation toSource = operation(dem.grid(), source, operations);
        Block window = window(source, dem.grid(), toSource);
        if (window == null) {
            throw Problem.input("the terrain model nowhere meets the temperature grid: it covers " + dem.grid().describe()
                            + "; the temperatures cover " + source.describe(), config.dem().file().toString(),
                    "Check both reference systems, and whether x and y are swapped").asException();
        }
        GridGeometry used = source.crop(window);
        float[] heights = config.sourceHeight().isPresent()
                ? sourceHeights(config, source, sourceName, window, formats, notices)
                : SourceHeights.blockMeans(dem, used, toSource);
        ElevationAdjustment adjustment = ElevationAdjustment.toHeights(used, heights, dem, toSource, new LapseRates(config.lapseRate()));
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
        Block window = window(source, target, toSource);
        return new TargetPlan(window == null ? source.whole() : window,
                ElevationAdjustment.interpolation(window == null ? source : source.crop(window), target, toSource));
    }

    private static CoordinateOperation operation(GridGeometry target, GridGeometry source, CoordinateOperations operations) {
        return target.crs().sameAs(source.crs()) ? CoordinateOperation.identity() : operations.between(target.crs(), source.crs());
    }

    /** The source rows and columns that interpolation to the target needs; null if the two do not meet. */
    private static Block window(GridGeometry source, GridGeometry target, CoordinateOperation toSource) {
        SourcePositions positions = new SourcePositions(source, target, toSource);
        int west = Integer.MAX_VALUE;
        int east = -1;
        int north = Integer.MAX_VALUE;
        int south = -1;
        for (int row = 0; row < target.rows(); row++) {
            for (int column = 0; column < target.columns(); column++) {
                if (positions.containing(row, column) < 0) {
                    continue;
                }
                west = Math.min(west, positions.west(row, column));
                east = Math.max(east, positions.west(row, column));
                north = Math.min(north, positions.north(row, column));
                south = Math.max(south, positions.north(row, column));
            }
        }
        if (east < 0) {
            return null;
        }
        return new Block(west, north, Math.min(source.columns(), east + 2) - west, Math.min(source.rows(), south + 2) - north);
    }

    private static float[] sourceHeights(ElevationConfig config, GridGeometry source, String sourceName, Block window,
                                         InputFormats formats, Notices notices) {
        ElevationField field = formats.heights(config.sourceHeight().get(), notices);
        if (!field.grid().sameAs(source)) {
            throw Problem.input("the source heights are on another grid than the temperatures: " + field.grid().describe()
                            + "; the temperatures of " + sourceName + " are on " + source.describe(),
                    config.sourceHeight().get().file().toString(),
                    "Give the orography file that belongs to the temperatures, or set elevation.source-height: dem-mean").asException();
        }
        float[] heights = new float[window.cells()];
        for (int row = 0; row < window.rows(); row++) {
            System.arraycopy(field.metres(), (window.row() + row) * source.columns() + window.column(), heights,
                    row * window.columns(), window.columns());
        }
        return heights;
    }

    private static ElevationField cropped(ElevationField dem, Optional<AreaConfig> area) {
        if (area.isEmpty()) {
            return dem;
        }
        Block block = block(dem.grid(), area.get());
        float[] metres = new float[block.cells()];
        for (int row = 0; row < block.rows(); row++) {
            System.arraycopy(dem.metres(), (block.row() + row) * dem.grid().columns() + block.column(), metres,
                    row * block.columns(), block.columns());
        }
        return new ElevationField(dem.grid().crop(block), metres, dem.description());
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
