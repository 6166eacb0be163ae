package org.wintersill.engine;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.damage.Uncertainty;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.SourcePositions;
import org.wintersill.elevation.TargetTile;
import org.wintersill.elevation.TargetTiles;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.problem.Notices;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.NightCurve;
import org.wintersill.season.Phases;
import org.wintersill.temperature.MemoryTemperatureSource;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Folding tile by tile over the nights that matter gives the bits of the plain loop over all nights. */
class TiledFoldLaws {
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);
    private static final int LEVELS = 3;

    enum Gaps { NONE, SEA, SCATTERED, BOTH }

    enum Terrain { FLAT, HILLS, ABYSS, VOIDS }

    private static float[] smooth(Random random, int rows, int columns, double roughness) {
        float[] field = new float[rows * columns];
        double a = random.nextGaussian();
        double b = random.nextGaussian();
        for (int i = 0; i < field.length; i++) {
            field[i] = (float) (a * (i / columns) + b * (i % columns) + roughness * random.nextGaussian());
        }
        return field;
    }

    /** Weather in tenths (so that ties are common), with days that repeat earlier ones. */
    private static float[][] weather(Random random, DayAxis axis, int rows, int columns, double roughness, Gaps gaps) {
        float[][] values = new float[axis.size()][];
        for (int d = 0; d < values.length; d++) {
            if (d > 0 && random.nextInt(4) == 0) {
                values[d] = values[Math.max(0, d - 1 - random.nextInt(20))].clone();
                continue;
            }
            values[d] = smooth(random, rows, columns, roughness);
            double level = 4 - 14 * Math.cos(2 * Math.PI * (axis.day(d) - axis.day(0) - 200) / 365.25) + 5 * random.nextGaussian();
            for (int i = 0; i < values[d].length; i++) {
                boolean sea = (gaps == Gaps.SEA || gaps == Gaps.BOTH) && i % columns < columns / 3 + i / columns % 2;
                boolean gap = (gaps == Gaps.SCATTERED || gaps == Gaps.BOTH) && random.nextInt(40) == 0;
                values[d][i] = sea || gap ? Float.NaN : Math.round(10 * (level + values[d][i])) / 10f;
            }
        }
        return values;
    }

    private static ElevationAdjustment adjustment(Random random, GridGeometry source, int factor, Terrain terrain, boolean monthly,
                                                  CoordinateOperation operation) {
        GridGeometry target = new GridGeometry(source.columns() * factor + 3, source.rows() * factor + 2,
                source.west() - source.cellWidth() / factor, source.north() + 0.01, source.cellWidth() / factor,
                source.cellHeight() / factor, CRS);
        SourcePositions positions = new SourcePositions(source, target, operation);
        float[] heights = new float[(int) target.cells()];
        float[] sourceHeights = new float[(int) source.cells()];
        double range = terrain == Terrain.FLAT ? 0 : terrain == Terrain.ABYSS ? 9000 : 400;
        for (int i = 0; i < heights.length; i++) {
            heights[i] = terrain == Terrain.VOIDS && random.nextInt(30) == 0 ? Float.NaN : (float) (range * random.nextDouble());
        }
        for (int i = 0; i < sourceHeights.length; i++) {
            sourceHeights[i] = terrain == Terrain.VOIDS && random.nextInt(15) == 0 ? Float.NaN : (float) (range * random.nextDouble());
        }
        double[] months = new double[12];
        for (int m = 0; m < 12; m++) {
            months[m] = monthly ? 2 + 6 * random.nextDouble() : 4.5;
        }
        return random.nextInt(5) == 0 ? ElevationAdjustment.interpolation(positions) : ElevationAdjustment.toHeights(positions, sourceHeights,
                new ElevationField(target, heights, "random"), new LapseRates(months));
    }

    private static NightCurve curve(Random random, int days, Phases phases, double shift) {
        double[][] lt = new double[3][days];
        for (int d = 0; d < days; d++) {
            // A plateau in midwinter: there equal temperatures are equal margins.
            double depth = Math.min(0.7, Math.sin(Math.PI * d / (days - 1)));
            lt[1][d] = -4 - 16 * depth + shift;
            lt[0][d] = lt[1][d] + 1 + 1.5 * depth;
            lt[2][d] = lt[1][d] - 0.8 - 2 * depth - 0.01 * random.nextInt(3);
        }
        ToleranceCurve form = random.nextBoolean() ? ToleranceCurve.SPLIT_LOGISTIC : ToleranceCurve.SPLIT_PROBIT;
        return NightCurve.of(new LethalTemperatures(lt[0], lt[1], lt[2]), form, new double[] {10, 90}, phases);
    }

    private static FoldJob job(long seed, int rows, int columns, int factor, double roughness, Gaps gaps, Terrain terrain,
                               boolean monthly, CoordinateOperation operation) {
        Random random = new Random(seed);
        GridGeometry grid = new GridGeometry(columns, rows, -38, 50, 0.5, 0.25, CRS);
        long start = CfCalendar.STANDARD.dayNumber(new CfDate(1999, 7, 1));
        long[] days = random.longs(900, 0, 60).toArray();
        int size = 0;
        for (int d = 0; d < days.length; d++) {
            if (days[d] != 0) {
                days[size++] = start + d;
            }
        }
        DayAxis axis = new DayAxis(CfCalendar.STANDARD, java.util.Arrays.copyOf(days, size));
        List<Season> seasons = SeasonWindow.north().seasons(axis);
        List<NightCurve[]> curves = new ArrayList<>();
        for (Season season : seasons) {
            curves.add(new NightCurve[] {curve(random, season.days(), Phases.of(season, false), 0),
                curve(random, season.days(), Phases.of(season, false), 4)});
        }
        MemoryTemperatureSource source = new MemoryTemperatureSource(grid, axis, new StorageLayout(1, rows, columns, 0),
                weather(random, axis, rows, columns, roughness, gaps));
        return new FoldJob(source, grid.whole(), adjustment(random, grid, factor, terrain, monthly, operation), seasons,
                MissingDayPolicy.MONTH_10_5, curves, LEVELS, RECKONINGS.get((int) Math.floorMod(seed, RECKONINGS.size())));
    }

    private static final List<DamageReckoning> RECKONINGS = List.of(DamageReckoning.PLAIN,
            new DamageReckoning(NightJoining.WORST_NIGHT, Uncertainty.none(), true, false),
            new DamageReckoning(NightJoining.WORST_NIGHT, new Uncertainty(new TreeMap<>(Map.of("model", 1.2))), true, false));

    /** Bits of all values, {@code [season][plane][cell]}. */
    private static int[][][] run(FoldJob job, FoldPlan plan) {
        int planes = job.planes();
        int[][][] all = new int[job.seasons().size()][planes][job.targetRows() * job.targetColumns()];
        try (Workers workers = new Workers(plan.threads(), () -> false)) {
            new LocalEngine(job, plan).run((season, firstRow, values) -> {
                for (int plane = 0; plane < planes; plane++) {
                    float[] lane = values.plane(plane);
                    for (int i = 0; i < lane.length; i++) {
                        all[season][plane][firstRow * job.targetColumns() + i] = Float.floatToIntBits(lane[i]);
                    }
                }
            }, workers, Progress.silent(), new Notices());
        }
        return all;
    }

    private static void assertTilesEqualPlain(FoldJob job, FoldPlan plan) {
        int[][][] expected = run(job, plan.plain());
        int[][][] actual = run(job, plan);
        for (int s = 0; s < expected.length; s++) {
            for (int p = 0; p < expected[s].length; p++) {
                assertArrayEquals(expected[s][p], actual[s][p], "winter " + s + " plane " + p);
            }
        }
    }

    @Property(tries = 80)
    void tilesGiveTheBitsOfThePlainLoop(@ForAll long seed, @ForAll @IntRange(min = 2, max = 5) int rows,
                                        @ForAll @IntRange(min = 1, max = 6) int columns, @ForAll @IntRange(min = 4, max = 14) int factor,
                                        @ForAll Gaps gaps, @ForAll Terrain terrain, @ForAll boolean monthly, @ForAll boolean rough,
                                        @ForAll boolean separable) {
        CoordinateOperation operation = separable ? CoordinateOperation.identity() : (xy, points) -> { };
        FoldJob job = job(seed, rows, columns, factor, rough ? 3 : 0.05, gaps, terrain, monthly, operation);
        FoldPlan plan = new FoldPlanner(job, 2, 1L << 30).plan();
        assertTrue(plan.tiled());
        assertTilesEqualPlain(job, plan);
    }

    @Property(tries = 25)
    void splitWintersToo(@ForAll long seed, @ForAll Gaps gaps, @ForAll Terrain terrain) {
        FoldJob job = job(seed, 4, 5, 9, 0.2, gaps, terrain, true, CoordinateOperation.identity());
        FoldPlan whole = new FoldPlanner(job, 1, 1L << 30).plan();
        List<FoldPlan.Batch> batches = new ArrayList<>();
        for (FoldPlan.Batch batch : whole.batches()) {
            for (FoldPlan.Piece piece : batch.pieces()) {
                for (int from = 0; from < piece.count(); from += 50) {
                    int count = Math.min(50, piece.count() - from);
                    batches.add(new FoldPlan.Batch(piece.first() + from, count, List.of(new FoldPlan.Piece(piece.season(), piece.first() + from,
                            count, from == 0, from + count == piece.count()))));
                }
            }
        }
        assertTilesEqualPlain(job, new FoldPlan(whole.bands(), batches, whole.laneRows(), 1, false, true, whole.memory()));
    }

    /** Otherwise the laws above could hold because nothing is ever left out. */
    @Test
    void fewNightsOfSmoothWeatherAreKept() {
        FoldJob job = job(5, 6, 6, 10, 0.2, Gaps.NONE, Terrain.HILLS, false, CoordinateOperation.identity());
        TargetTiles tiles = TargetTiles.of(job.adjustment(), 0, job.targetRows()).orElseThrow();
        long all = 0;
        for (List<TargetTile> row : tiles.rows()) {
            for (TargetTile tile : row) {
                all += (long) tile.cells() * job.seasons().get(0).days();
            }
        }
        TiledFold fold = new TiledFold(job, tiles, 1, true);
        MemoryTemperatureSource source = (MemoryTemperatureSource) job.source();
        Season season = job.seasons().get(0);
        int first = source.days().firstIndexFrom(season.firstDay());
        int count = source.days().firstIndexFrom(season.firstDay() + season.days()) - first;
        float[] slab = new float[count * 36];
        int[] nights = new int[count];
        int[] offsets = new int[count];
        try (var reader = source.open()) {
            reader.read(first, count, job.window(), slab, 0, 36);
        }
        for (int n = 0; n < count; n++) {
            nights[n] = (int) (source.days().day(first + n) - season.firstDay());
            offsets[n] = 36 * n;
        }
        for (int row = 0; row < fold.rows(); row++) {
            fold.accept(0, row, new TiledFold.Nights(0, nights, slab, offsets, true, true), cell -> true);
        }
        long kept = fold.cellNights();
        assertTrue(kept > 0 && kept < all / 10, kept + " of " + all);
    }
}
