package org.wintersill.run;

import java.util.Optional;
import org.wintersill.config.ElevationConfig;
import org.wintersill.config.LocalLapseConfig;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.LocalLapse;
import org.wintersill.elevation.SourceHeights;
import org.wintersill.elevation.SourcePositions;
import org.wintersill.elevation.TargetTerms;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CellSizes;
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
     * @param area the part of the target to work on
     * @param hasMaxima whether the run has daily maxima beside the minima
     */
    static TargetPlan of(GridGeometry source, String sourceName, Optional<ElevationConfig> elevation, AreaCut.Wanted area,
                         boolean hasMaxima, InputFormats formats, CoordinateOperations operations, Notices notices) {
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
        Optional<AreaCut> cut = area.of(whole.grid());
        ElevationField dem = cut.map(part -> cropped(whole, part.block())).orElse(whole);
        SourcePositions used = dem == whole ? positions : new SourcePositions(source, dem.grid(), toSource);
        Block needed = used.window().orElseThrow(() -> Problem.input("the terrain model nowhere meets the temperature grid: it covers "
                        + dem.grid().describe() + "; the temperatures cover " + source.describe(), config.dem().file().toString(),
                "Check both reference systems, and whether x and y are swapped").asException());
        Optional<LocalLapse> wholeLapse = config.localLapse().map(local -> localLapse(local, source, new LapseRates(config.lapseRate())));
        Block window = wholeLapse.map(lapse -> withHalo(needed, lapse, source)).orElse(needed);
        ElevationAdjustment adjustment = ElevationAdjustment.toHeights(used.within(window), part(heights, source, window), dem,
                new LapseRates(config.lapseRate()));
        warnOfEqualHeights(adjustment, notices);
        TargetTerms terms = new NightTermsPlan(config, formats, operations, notices)
                .terms(adjustment, whole, cut.map(AreaCut::block).orElse(whole.grid().whole()), source, hasMaxima);
        return new TargetPlan(window, AreaCut.masked(adjustment, cut).with(wholeLapse.map(lapse -> lapse.rows(window.row(), window.rowEnd())), terms));
    }

    private static LocalLapse localLapse(LocalLapseConfig config, GridGeometry source, LapseRates prior) {
        CellSizes sizes = CellSizes.of(source);
        return new LocalLapse(config.radius(), prior, config.priorSd(), sizes.width(), sizes.height());
    }

    /** A part of the source with the cells around it that its lapse rates are fitted to. */
    private static Block withHalo(Block part, LocalLapse lapse, GridGeometry source) {
        int row = Math.max(0, part.row() - lapse.haloRows());
        int column = Math.max(0, part.column() - lapse.haloColumns());
        return new Block(column, row, Math.min(source.columns(), part.columnEnd() + lapse.haloColumns()) - column,
                Math.min(source.rows(), part.rowEnd() + lapse.haloRows()) - row);
    }

    private static TargetPlan withoutHeights(GridGeometry source, AreaCut.Wanted area, CoordinateOperations operations,
                                             Notices notices) {
        if (source.crs().kind() != Crs.Kind.ROTATED_POLE) {
            Optional<AreaCut> cut = area.of(source);
            Block window = cut.map(AreaCut::block).orElse(source.whole());
            return new TargetPlan(window, AreaCut.masked(ElevationAdjustment.none(source.crop(window)), cut));
        }
        GridGeometry regular = RotatedTarget.covering(source, operations);
        Optional<AreaCut> cut = area.of(regular);
        GridGeometry target = cut.map(part -> regular.crop(part.block())).orElse(regular);
        notices.add("the temperature grid has a rotated pole, which GeoTIFF cannot hold: layers are written on "
                + target.describe());
        CoordinateOperation toSource = operations.between(target.crs(), source.crs());
        SourcePositions positions = new SourcePositions(source, target, toSource);
        Block window = positions.window().orElse(source.whole());
        return new TargetPlan(window, AreaCut.masked(ElevationAdjustment.interpolation(positions.within(window)), cut));
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

    private static ElevationField cropped(ElevationField dem, Block block) {
        return new ElevationField(dem.grid().crop(block), part(dem.metres(), dem.grid(), block), dem.description());
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
