package org.wintersill.run;

import java.util.Arrays;
import java.util.BitSet;
import java.util.Optional;
import org.wintersill.config.ColdPoolConfig;
import org.wintersill.config.ElevationConfig;
import org.wintersill.config.WaterConfig;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.InversionChange;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.PoolChange;
import org.wintersill.elevation.StableNights;
import org.wintersill.elevation.TargetTerms;
import org.wintersill.elevation.WaterWarming;
import org.wintersill.elevation.terrain.ColdPools;
import org.wintersill.elevation.terrain.DistanceToWater;
import org.wintersill.elevation.terrain.PoolGround;
import org.wintersill.elevation.terrain.Relief;
import org.wintersill.elevation.terrain.Tasks;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CellSizes;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;

/** What a run adds to its nights beside the height: pools of cold air, water and offsets, from configuration to {@link TargetTerms}. */
final class NightTermsPlan {
    /** Reaches of the water beyond which nothing is looked for: less than 1 % of the warming is left. */
    private static final int REACHES = 5;
    /** Most cells of the grid that distances to water are taken on. */
    private static final long MOST_CELLS = 1L << 29;

    private final ElevationConfig config;
    private final InputFormats formats;
    private final CoordinateOperations operations;
    private final Notices notices;

    NightTermsPlan(ElevationConfig config, InputFormats formats, CoordinateOperations operations, Notices notices) {
        this.config = config;
        this.formats = formats;
        this.operations = operations;
        this.notices = notices;
    }

    /**
     * The terms.
     *
     * @param adjustment without terms, for the target
     * @param whole terrain model, larger than the target where an area is cut out of it
     * @param block the target's cells in it
     * @param source the temperatures' whole grid
     * @param hasMaxima whether the run has daily maxima to tell stable nights by
     */
    TargetTerms terms(ElevationAdjustment adjustment, ElevationField whole, Block block, GridGeometry source, boolean hasMaxima) {
        PoolChange pools = null;
        StableNights nights = new StableNights.All();
        if (config.coldPool().isPresent()) {
            ColdPoolConfig wanted = config.coldPool().get();
            nights = nights(wanted, hasMaxima);
            pools = wanted.hollows().<PoolChange>map(hollows -> ground(hollows, wanted.evenIfResolved(), whole, block, source))
                    .orElseGet(() -> new InversionChange(wanted.inversion().orElseThrow(), adjustment));
        }
        float[][] water = config.water().map(wanted -> water(wanted, whole.grid(), block)).orElse(null);
        return new TargetTerms(pools, water, config.offset(), nights, config.water().map(WaterConfig::frozen)
                .orElse(TargetTerms.FrozenPeriod.NEVER));
    }

    private StableNights nights(ColdPoolConfig wanted, boolean hasMaxima) {
        if (wanted.everyNight()) {
            return new StableNights.All();
        }
        if (config.localLapse().isPresent()) {
            return new StableNights.ByLapse(wanted.reference().map(LapseRates::constant).orElse(new LapseRates(config.lapseRate())));
        }
        if (hasMaxima) {
            return wanted.range();
        }
        throw Problem.usage("nothing tells stable nights from others: pools form on clear calm nights only, which the lapse rate fitted to "
                        + "a night or the range from its minimum to the day's maximum would tell", "elevation.cold-pool.nights",
                "Set elevation.lapse-rate: {method: daily-local}, or give temperature.maximum, or say nights: all to add the pools to every "
                        + "night").asException();
    }

    private PoolGround ground(ColdPools pools, boolean evenIfResolved, ElevationField whole, Block block, GridGeometry source) {
        GridGeometry grid = whole.grid();
        CellSizes sizes = CellSizes.of(grid);
        Relief relief = new Relief(grid.columns(), grid.rows(), whole.metres(), sizes.width(), sizes.height());
        int middle = block.row() + block.rows() / 2;
        double radius = pools.window().radius();
        if (!pools.window().hasNeighbours(relief, middle)) {
            throw Problem.usage("a radius of " + Math.round(radius) + " m holds no neighbour: the cells of the terrain model measure "
                            + Math.round(sizes.width()[middle]) + " x " + Math.round(sizes.height()[middle]) + " m",
                    "elevation.cold-pool.radius", "Give a larger radius, or a finer terrain model").asException();
        }
        checkResolved(radius, evenIfResolved, source);
        Block around = pools.window().around(relief, block);
        boolean all = around.equals(grid.whole());
        return new PoolGround(pools, all ? relief : relief.crop(around),
                new Block(block.column() - around.column(), block.row() - around.row(), block.columns(), block.rows()));
    }

    /** Where the temperature grid is as fine as the valleys, its minima hold the pools already. */
    private void checkResolved(double radius, boolean evenIfResolved, GridGeometry source) {
        CellSizes sizes = CellSizes.of(source);
        int middle = source.rows() / 2;
        double cell = Math.sqrt(sizes.width()[middle] * sizes.height()[middle]);
        String what = "the temperature grid has cells of about " + Math.round(cell) + " m; pools are looked for within "
                + Math.round(radius) + " m";
        if (cell <= radius && !evenIfResolved) {
            throw Problem.usage(what + ": the grid resolves such valleys, and their cold would be counted twice",
                    "elevation.cold-pool.radius", "Leave cold-pool out, give a radius below " + Math.round(cell)
                            + ", or say resolved: add if the grid is known to hold no pools").asException();
        }
        if (cell <= 2 * radius) {
            notices.add(what + ": the grid resolves the larger of such valleys, and part of their cold may be counted twice");
        }
    }

    /** Warming of the target's cells, K. */
    private float[][] water(WaterConfig wanted, GridGeometry dem, Block block) {
        CellSizes target = CellSizes.of(dem.crop(block));
        double reach = REACHES * wanted.reach();
        int high = (int) Math.min(1 << 20, Math.ceil(reach / smallest(target.height())));
        int wide = (int) Math.min(1 << 20, Math.ceil(reach / smallest(target.width())));
        GridGeometry grid = new GridGeometry(block.columns() + 2 * wide, block.rows() + 2 * high,
                dem.west() + (block.column() - wide) * dem.cellWidth(), dem.north() - (block.row() - high) * dem.cellHeight(),
                dem.cellWidth(), dem.cellHeight(), dem.crs());
        if (grid.cells() > MOST_CELLS) {
            throw Problem.limit("the distance to water would be taken on " + grid.columns() + " x " + grid.rows() + " cells",
                    "elevation.water.reach-km", "Give a smaller reach or a smaller area").asException();
        }
        boolean[] mask = mask(wanted, grid);
        CellSizes sizes = CellSizes.of(grid);
        float[] distance = DistanceToWater.of(mask, grid.columns(), sizes.width(), sizes.height(), Tasks.inOrder());
        float[][] change = new float[block.rows()][block.columns()];
        boolean any = false;
        for (int row = 0; row < block.rows(); row++) {
            for (int column = 0; column < block.columns(); column++) {
                float metres = distance[(row + high) * grid.columns() + column + wide];
                any |= metres <= reach;
                change[row][column] = (float) WaterWarming.change(wanted.warming(), metres, wanted.reach());
            }
        }
        if (!any) {
            notices.add("no water of " + wanted.file().getFileName() + " lies within " + Math.round(reach / 1000)
                    + " km of any cell: it warms nothing");
        }
        return change;
    }

    private static double smallest(double[] values) {
        return Arrays.stream(values).min().orElseThrow();
    }

    private boolean[] mask(WaterConfig wanted, GridGeometry grid) {
        boolean[] mask = new boolean[Math.toIntExact(grid.cells())];
        if (wanted.polygons().isPresent()) {
            BitSet inside = PolygonMask.of(grid, wanted.polygons().get(), formats, operations, notices).inside();
            inside.stream().forEach(cell -> mask[cell] = true);
            return mask;
        }
        ElevationField raster = formats.heights(wanted.raster().orElseThrow(), new Notices());
        for (float value : raster.metres()) {
            if (value == value && value != 0 && value != 1) {
                throw Problem.input("a mask of water holds 1 on water and 0 or nothing on land; found " + value, wanted.file().toString(),
                        "Make a mask of zeros and ones, or give the outlines of the water").asException();
            }
        }
        CoordinateOperation toRaster = grid.crs().sameAs(raster.grid().crs()) ? CoordinateOperation.identity()
                : operations.between(grid.crs(), raster.grid().crs());
        double[] places = new double[2 * grid.columns()];
        for (int row = 0; row < grid.rows(); row++) {
            for (int column = 0; column < grid.columns(); column++) {
                places[2 * column] = grid.centreX(column);
                places[2 * column + 1] = grid.centreY(row);
            }
            toRaster.transform(places, grid.columns());
            for (int column = 0; column < grid.columns(); column++) {
                int x = raster.grid().columnAt(places[2 * column]);
                int y = raster.grid().rowAt(places[2 * column + 1]);
                mask[row * grid.columns() + column] = x >= 0 && y >= 0 && raster.metres()[y * raster.grid().columns() + x] == 1;
            }
        }
        return mask;
    }
}
