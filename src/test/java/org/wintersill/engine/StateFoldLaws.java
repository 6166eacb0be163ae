package org.wintersill.engine;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import java.util.TreeSet;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.damage.Uncertainty;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.SourcePositions;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.model.ThermalTimeModel;
import org.wintersill.hardiness.model.ThermalTimeModel.Phase;
import org.wintersill.problem.Notices;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.NightCurve;
import org.wintersill.season.Phases;
import org.wintersill.season.StateCultivar;
import org.wintersill.season.WinterValues;
import org.wintersill.temperature.AlignedTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.MemoryTemperatureSource;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Laws of the fold of state models: cutting it up changes nothing, and it equals the definition, gaps included. */
class StateFoldLaws {
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);
    private static final double[] LEVELS = {50, 10, 90, 25};
    private static final double LN_9 = Math.log(9);
    private static final List<DamageReckoning> RECKONINGS = List.of(DamageReckoning.PLAIN,
            new DamageReckoning(NightJoining.WORST_NIGHT, Uncertainty.none(), true, false),
            new DamageReckoning(NightJoining.WORST_NIGHT, new Uncertainty(new TreeMap<>(Map.of("model", 1.5))), true, false),
            new DamageReckoning(new NightJoining(NightJoining.Rule.INDEPENDENT, 0), Uncertainty.none(), true, false));
    /** Invented; one begins inside the window, one before it. No mean and no sum of tenths meets their limits exactly. */
    private static final ThermalTimeModel SEPTEMBER = new ThermalTimeModel(null, -9, -2, -24, new Phase(12.013, 0.1, 0.06),
            new Phase(4.013, 0.05, 0.12), 5, -300.013, -2.2, 2, 3);
    private static final ThermalTimeModel AUGUST = new ThermalTimeModel(new MonthDay(8, 20), -6, -1.5, -27, new Phase(11.013, 0.08, 0.05),
            new Phase(3.013, 0.06, 0.1), 5.5, -400.013, -2.2, 1.5, 2.5);

    /** Two and a bit winters of minima and maxima on different days, with masked cells and some long gaps. */
    private static final class Sample {
        final GridGeometry grid;
        final DayAxis minimumDays;
        final DayAxis maximumDays;
        final DayAxis days;
        final float[][] minima;
        final float[][] maxima;
        final List<Season> seasons;
        final List<NightCurve[]> curves = new ArrayList<>();
        final DamageReckoning reckoning;

        Sample(long seed, int rows, int columns) {
            Random random = new Random(seed);
            reckoning = RECKONINGS.get((int) Math.floorMod(seed, RECKONINGS.size()));
            grid = new GridGeometry(columns, rows, -38, 50, 0.5, 0.25, CRS);
            CfCalendar calendar = CfCalendar.STANDARD;
            long start = calendar.dayNumber(new CfDate(1999, 7, 1));
            TreeSet<Long> absentMinima = new TreeSet<>();
            TreeSet<Long> absentMaxima = new TreeSet<>();
            for (int gap = 0; gap < 12; gap++) {
                long day = start + random.nextInt(900);
                for (int i = random.nextInt(random.nextInt(4) == 0 ? 5 : 3); i >= 0; i--) {
                    (random.nextBoolean() ? absentMinima : absentMaxima).add(day + i);
                }
            }
            minimumDays = axis(calendar, start, absentMinima);
            maximumDays = axis(calendar, start, absentMaxima);
            days = AlignedTemperatureSource.union(minimumDays, maximumDays);
            minima = new float[minimumDays.size()][rows * columns];
            maxima = new float[maximumDays.size()][rows * columns];
            fill(minima, minimumDays, start, 2, random);
            fill(maxima, maximumDays, start, 12, random);
            seasons = SeasonWindow.north().seasons(minimumDays);
            for (Season season : seasons) {
                double[][] lt = new double[3][season.days()];
                for (int d = 0; d < season.days(); d++) {
                    lt[1][d] = -4 - 16 * Math.sin(Math.PI * d / (season.days() - 1));
                    lt[0][d] = lt[1][d] + 2;
                    lt[2][d] = lt[1][d] - 3;
                }
                curves.add(new NightCurve[] {null, NightCurve.of(new LethalTemperatures(lt[0], lt[1], lt[2]),
                        ToleranceCurve.SPLIT_LOGISTIC, new double[] {10, 90, 25}, Phases.of(season, false)), null});
            }
        }

        private static DayAxis axis(CfCalendar calendar, long start, TreeSet<Long> absent) {
            List<Long> days = new ArrayList<>();
            for (long day = start; day < start + 900; day++) {
                if (!absent.contains(day)) {
                    days.add(day);
                }
            }
            return new DayAxis(calendar, days.stream().mapToLong(Long::longValue).toArray());
        }

        private static void fill(float[][] values, DayAxis axis, long start, double level, Random random) {
            for (int d = 0; d < values.length; d++) {
                double season = level - 14 * Math.cos(2 * Math.PI * (axis.day(d) - start - 200) / 365.25);
                for (int i = 0; i < values[d].length; i++) {
                    boolean missing = i % 11 == 3 || i % 3 == 1 && random.nextInt(150) == 0;
                    values[d][i] = missing ? Float.NaN : Math.round(10 * (season + 4 * random.nextGaussian())) / 10f;
                }
            }
        }

        List<StateCultivar> cultivars() {
            return List.of(new StateCultivar(0, SEPTEMBER, ToleranceCurve.SPLIT_LOGISTIC, LEVELS),
                    new StateCultivar(2, AUGUST, ToleranceCurve.SPLIT_LOGISTIC, LEVELS));
        }

        FoldJob job(ElevationAdjustment adjustment, StorageLayout layout, StorageLayout second) {
            List<int[]> firstDays = seasons.stream()
                    .map(season -> new int[] {SEPTEMBER.firstDay(season), AUGUST.firstDay(season)}).toList();
            StateForcing states = new StateForcing(cultivars(), firstDays, AlignedTemperatureSource.on(days,
                    new MemoryTemperatureSource(grid, maximumDays, second, maxima, ForcingVariable.MAXIMUM)), 0,
                    CoordinateOperation.identity());
            return new FoldJob(AlignedTemperatureSource.on(days, new MemoryTemperatureSource(grid, minimumDays, layout, minima)),
                    grid.whole(), adjustment, seasons, MissingDayPolicy.MONTH_10_5, curves, LEVELS.length, reckoning, states);
        }
    }

    /** Winters' planes, {@code [season][plane][cell]}, and what was noticed. */
    private record Result(float[][][] planes, Map<String, Long> notices) {
    }

    private static Result run(FoldJob job, FoldPlan plan) {
        int cells = job.targetRows() * job.targetColumns();
        int planes = job.planes();
        float[][][] all = new float[job.seasons().size()][planes][cells];
        Notices notices = new Notices();
        try (Workers workers = new Workers(plan.threads(), () -> false)) {
            new LocalEngine(job, plan).run((season, firstRow, values) -> {
                for (int plane = 0; plane < planes; plane++) {
                    float[] lane = values.plane(plane);
                    System.arraycopy(lane, 0, all[season][plane], firstRow * job.targetColumns(), lane.length);
                }
            }, workers, Progress.silent(), notices);
        }
        return new Result(all, notices.counts());
    }

    private static Result run(FoldJob job) {
        return run(job, new FoldPlanner(job, 1, 1L << 30).plan());
    }

    private static ElevationAdjustment fine(GridGeometry source, long seed) {
        Random random = new Random(seed);
        GridGeometry target = new GridGeometry(source.columns() * 2 + 1, source.rows() * 3, source.west() - 0.01, source.north() + 0.01,
                source.cellWidth() / 2, source.cellHeight() / 3, CRS);
        float[] heights = new float[(int) target.cells()];
        for (int i = 0; i < heights.length; i++) {
            heights[i] = random.nextInt(30) == 0 ? Float.NaN : 200 + 900 * random.nextFloat();
        }
        float[] sourceHeights = new float[(int) source.cells()];
        for (int i = 0; i < sourceHeights.length; i++) {
            sourceHeights[i] = 300 + 500 * random.nextFloat();
        }
        return ElevationAdjustment.toHeights(new SourcePositions(source, target, CoordinateOperation.identity()), sourceHeights,
                new ElevationField(target, heights, "random"), LapseRates.constant(5));
    }

    @Property(tries = 30)
    void cuttingTheWorkUpChangesNothing(@ForAll long seed, @ForAll @IntRange(min = 1, max = 7) int rows,
                                        @ForAll @IntRange(min = 1, max = 7) int columns,
                                        @ForAll @IntRange(min = 1, max = 200) int chunkDays,
                                        @ForAll @IntRange(min = 1, max = 200) int secondDays,
                                        @ForAll @IntRange(min = 1, max = 4) int threads, @ForAll boolean withDem) {
        Sample sample = new Sample(seed, rows, columns);
        ElevationAdjustment adjustment = withDem ? fine(sample.grid, seed) : ElevationAdjustment.none(sample.grid);
        StorageLayout daily = new StorageLayout(1, rows, columns, 0);
        Result expected = run(sample.job(adjustment, daily, daily));
        FoldJob chunked = sample.job(adjustment, new StorageLayout(chunkDays, 1, columns, 0),
                new StorageLayout(secondDays, rows, columns, 0));
        long most = new FoldPlanner(chunked, threads, 1L << 30).plan().memory().total();
        boolean anyCut = false;
        for (long budget : new long[] {1L << 30, most - 1, most / 2, most / 3}) {
            for (FoldJob job : List.of(sample.job(adjustment, daily, daily), chunked)) {
                FoldPlan plan;
                try {
                    plan = new FoldPlanner(job, threads, budget).plan();
                } catch (org.wintersill.problem.ProblemException tooSmall) {
                    assertEquals(5, tooSmall.exitCode());
                    continue;
                }
                anyCut |= plan.bands().size() > 1 || !plan.wholeWinters();
                Result result = run(job, plan);
                for (int s = 0; s < expected.planes.length; s++) {
                    for (int p = 0; p < expected.planes[s].length; p++) {
                        assertArrayEquals(expected.planes[s][p], result.planes[s][p], "winter " + s + " plane " + p);
                    }
                }
                assertEquals(expected.notices, result.notices);
            }
        }
        assertTrue(anyCut || rows * columns < 9);
    }

    @Property(tries = 30)
    void theFoldEqualsTheDefinition(@ForAll long seed) {
        Sample sample = new Sample(seed, 3, 5);
        StorageLayout daily = new StorageLayout(1, 3, 5, 0);
        float[][][] fold = run(sample.job(ElevationAdjustment.none(sample.grid), daily, daily)).planes;
        for (int s = 0; s < sample.seasons.size(); s++) {
            for (int cell = 0; cell < 15; cell++) {
                for (StateCultivar cultivar : sample.cultivars()) {
                    boolean counts = !Float.isNaN(fold[s][WinterValues.minimumPlane()][cell]);
                    double[] expected = definition(sample, sample.seasons.get(s), cell, (ThermalTimeModel) cultivar.model());
                    int c = cultivar.index();
                    for (int level = 0; level < LEVELS.length; level++) {
                        float found = fold[s][WinterValues.marginPlane(c, level, LEVELS.length)][cell];
                        assertEquals(counts ? expected[level] : Double.NaN, found, 2e-5, "level " + level);
                    }
                    assertDamage(sample, c, cell, fold[s], counts, expected);
                    assertEquals(counts ? expected[5] : Double.NaN, fold[s][WinterValues.worstNightPlane(c, LEVELS.length)][cell]);
                }
            }
        }
    }

    private static void assertDamage(Sample sample, int c, int cell, float[][] planes, boolean counts, double[] expected) {
        DamageReckoning reckoning = sample.reckoning;
        int cultivars = sample.curves.get(0).length;
        boolean worst = reckoning.nights().isWorst();
        assertEquals(counts ? expected[worst ? 4 : 6] : Double.NaN, planes[WinterValues.damagePlane(c, LEVELS.length)][cell], 1e-5);
        for (int end = 0; reckoning.phases() && end < 2; end++) {
            assertEquals(counts ? expected[(worst ? 7 : 9) + end] : Double.NaN,
                    planes[WinterValues.damageAtPlane(c, end, cultivars, LEVELS.length, reckoning)][cell], 1e-5);
        }
        if (reckoning.keepsExpected()) {
            double mean = Uncertainty.expectedFraction(ToleranceCurve.SPLIT_LOGISTIC, expected[11], expected[12], expected[13],
                    reckoning.uncertainty().sd());
            assertEquals(counts ? mean : Double.NaN,
                    planes[WinterValues.expectedDamagePlane(c, cultivars, LEVELS.length, reckoning)][cell], 1e-5);
        }
    }

    private static float value(float[][] values, DayAxis axis, long day, int cell) {
        int position = axis.indexOf(day);
        return position < 0 ? Float.NaN : values[position][cell];
    }

    /**
     * Science 3.1, 9 and 16 in double precision, night by night: margins to the levels, damage, worst night; NaN after a long gap.
     * Then the damage of independent nights, the damage when autumn and midwinter ended by the worst night and by independent nights, and
     * margin and inverse spreads of the deadliest night.
     */
    private static double[] definition(Sample sample, Season season, int cell, ThermalTimeModel model) {
        int first = model.firstDay(season);
        int days = season.days() - first;
        double[] mean = new double[days];
        for (int d = 0; d < days; d++) {
            long day = season.firstDay() + first + d;
            mean[d] = ((double) value(sample.minima, sample.minimumDays, day, cell)
                    + value(sample.maxima, sample.maximumDays, day, cell)) / 2;
        }
        double[] filled = filled(mean);
        double[] lowest = {1e9, 1e9, 1e9, 1e9};
        double damage = 0;
        double alive = 1;
        double[] reached = {Double.NaN, Double.NaN, Double.NaN, Double.NaN};
        double[] deadliest = new double[3];
        int midwinter = season.position(new CfDate(season.year() - 1, 12, 1));
        double worst = -1;
        double h = model.initial();
        double cooling = 0;
        double chill = 0;
        boolean eco = false;
        boolean out = false;
        boolean lost = false;
        for (int d = 0; d < days; d++) {
            double t = value(sample.minima, sample.minimumDays, season.firstDay() + first + d, cell);
            for (int end = 0; end < 2; end++) {
                if (Double.isNaN(reached[end]) && first + d >= midwinter && (end == 0 || eco)) {
                    reached[end] = damage;
                    reached[2 + end] = 1 - alive;
                }
            }
            if (first + d >= 0 && !Double.isNaN(t)) {
                lost |= Double.isNaN(h);
                double lt50 = out ? model.tender() : h;
                double margin = t - lt50;
                if (margin < lowest[0] - 2e-6) {
                    worst = first + d;
                }
                lowest[0] = Math.min(lowest[0], margin);
                lowest[1] = Math.min(lowest[1], margin - model.toLt10());
                lowest[2] = Math.min(lowest[2], margin + model.toLt90());
                lowest[3] = Math.min(lowest[3], margin - model.toLt10() * Math.log(3) / LN_9);
                double spread = (margin > 0 ? model.toLt10() : model.toLt90()) / LN_9;
                double killed = 1 / (1 + Math.exp(margin / spread));
                if (killed > damage) {
                    deadliest = new double[] {margin, LN_9 / model.toLt10(), LN_9 / model.toLt90()};
                }
                damage = Math.max(damage, killed);
                alive *= 1 - killed;
            }
            Phase phase = eco ? model.ecodormancy() : model.endodormancy();
            double warm = Math.max(0, filled[d] - phase.threshold());
            double cold = Math.min(0, filled[d] - phase.threshold());
            double span = model.tender() - model.hardy();
            double loss = phase.loss() * warm * (1 - Math.pow((h - model.hardy()) / span, eco ? model.power() : 1));
            double gain = phase.gain() * cold * (1 - (model.tender() - h) / span);
            double next = Math.min(model.tender(), Math.max(model.hardy(), h + (cooling == 0 ? 0 : loss) + gain));
            out |= h < model.budbreak() && model.budbreak() <= next;
            h = next;
            cooling += cold;
            chill += Math.min(0, filled[d] - 10);
            eco |= chill <= model.chilling();
        }
        double nothing = lost ? Double.NaN : 0;
        return new double[] {lowest[0] + nothing, lowest[1] + nothing, lowest[2] + nothing, lowest[3] + nothing, damage + nothing,
            worst + nothing, 1 - alive + nothing, nothing + (Double.isNaN(reached[0]) ? damage : reached[0]),
            nothing + (Double.isNaN(reached[1]) ? damage : reached[1]), nothing + (Double.isNaN(reached[2]) ? 1 - alive : reached[2]),
            nothing + (Double.isNaN(reached[3]) ? 1 - alive : reached[3]), deadliest[0] + nothing, deadliest[1], deadliest[2]};
    }

    private static double[] filled(double[] mean) {
        double[] filled = mean.clone();
        int d = 0;
        while (d < mean.length) {
            int end = d;
            while (end < mean.length && Double.isNaN(mean[end])) {
                end++;
            }
            if (end > d && end - d <= 3) {
                for (int i = d; i < end; i++) {
                    filled[i] = d == 0 ? mean[end] : end == mean.length ? mean[d - 1]
                            : mean[d - 1] + (mean[end] - mean[d - 1]) * (i - d + 1) / (end - d + 1);
                }
            }
            d = Math.max(end, d + 1);
        }
        return filled;
    }

    /** A cultivar of fixed dates has the same values with and without neighbours that follow a state. */
    @Property(tries = 10)
    void fixedDatesDoNotSeeTheState(@ForAll long seed) {
        Sample sample = new Sample(seed, 3, 4);
        StorageLayout daily = new StorageLayout(1, 3, 4, 0);
        float[][][] both = run(sample.job(ElevationAdjustment.none(sample.grid), daily, daily)).planes;
        List<NightCurve[]> alone = sample.curves.stream().map(curves -> new NightCurve[] {curves[1]}).toList();
        float[][][] one = run(new FoldJob(new MemoryTemperatureSource(sample.grid, sample.minimumDays, daily, sample.minima),
                sample.grid.whole(), ElevationAdjustment.none(sample.grid), sample.seasons, MissingDayPolicy.MONTH_10_5, alone,
                LEVELS.length, sample.reckoning)).planes;
        for (int s = 0; s < one.length; s++) {
            for (int p = 0; p < LEVELS.length + 2; p++) {
                assertArrayEquals(one[s][WinterValues.marginPlane(0, p, LEVELS.length)],
                        both[s][WinterValues.marginPlane(1, p, LEVELS.length)]);
            }
        }
    }
}
