package org.wintersill.engine;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
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
import org.wintersill.problem.Notices;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.NightCurve;
import org.wintersill.season.Phases;
import org.wintersill.season.WinterValues;
import org.wintersill.temperature.MemoryTemperatureSource;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Laws of the fold: how the work is cut up changes nothing; colder is never safer; missing stays missing. */
class FoldLaws {
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);
    private static final double[] OTHER_LEVELS = {10, 90};
    private static final int LEVELS = 3;
    private static final List<DamageReckoning> RECKONINGS = List.of(DamageReckoning.PLAIN,
            new DamageReckoning(NightJoining.WORST_NIGHT, Uncertainty.none(), true, false),
            new DamageReckoning(NightJoining.WORST_NIGHT, new Uncertainty(new TreeMap<>(Map.of("model", 1.2, "site", 0.5))), true, false),
            new DamageReckoning(new NightJoining(NightJoining.Rule.INDEPENDENT, 0), Uncertainty.none(), true, false),
            new DamageReckoning(new NightJoining(NightJoining.Rule.CORRELATED, 0.6), Uncertainty.none(), true, false));

    /** A random record of two and a bit winters with gaps, masked cells and a sea. */
    private static final class Sample {
        final GridGeometry grid;
        final DayAxis axis;
        final float[][] values;
        final List<Season> seasons;
        final List<NightCurve[]> curves = new ArrayList<>();
        final DamageReckoning reckoning;
        final List<LethalTemperatures> courses = new ArrayList<>();

        Sample(long seed, int rows, int columns, CfCalendar calendar, boolean south) {
            Random random = new Random(seed);
            reckoning = RECKONINGS.get((int) Math.floorMod(seed, RECKONINGS.size()));
            grid = new GridGeometry(columns, rows, -38, 50, 0.5, 0.25, CRS);
            long start = calendar.dayNumber(new CfDate(1999, 7, 1));
            List<Long> days = new ArrayList<>();
            for (long day = start; day < start + 900; day++) {
                if (random.nextInt(60) != 0) {
                    days.add(day);
                }
            }
            axis = new DayAxis(calendar, days.stream().mapToLong(Long::longValue).toArray());
            values = new float[axis.size()][rows * columns];
            for (int d = 0; d < values.length; d++) {
                double season = 4 - 14 * Math.cos(2 * Math.PI * (axis.day(d) - start - (south ? 0 : 200)) / 365.25);
                for (int i = 0; i < rows * columns; i++) {
                    boolean missing = i % 11 == 3 || random.nextInt(40) == 0;
                    values[d][i] = missing ? Float.NaN : Math.round(10 * (season + 5 * random.nextGaussian())) / 10f;
                }
            }
            SeasonWindow window = south ? SeasonWindow.south() : SeasonWindow.north();
            seasons = window.seasons(axis);
            for (Season season : seasons) {
                LethalTemperatures course = course(season.days());
                Phases phases = Phases.of(season, south);
                courses.add(course);
                curves.add(new NightCurve[] {NightCurve.of(course, ToleranceCurve.SPLIT_LOGISTIC, OTHER_LEVELS, phases),
                    NightCurve.of(shifted(course, 4), ToleranceCurve.SPLIT_PROBIT, OTHER_LEVELS, phases)});
            }
        }

        static LethalTemperatures course(int days) {
            double[][] lt = new double[3][days];
            for (int d = 0; d < days; d++) {
                double depth = Math.sin(Math.PI * d / (days - 1));
                lt[1][d] = -4 - 16 * depth;
                lt[0][d] = lt[1][d] + 1 + 1.5 * depth;
                lt[2][d] = lt[1][d] - 0.8 - 2 * depth;
            }
            return new LethalTemperatures(lt[0], lt[1], lt[2]);
        }

        FoldJob job(ElevationAdjustment adjustment, StorageLayout layout, MissingDayPolicy policy) {
            return new FoldJob(new MemoryTemperatureSource(grid, axis, layout, values), grid.whole(), adjustment, seasons, policy,
                    curves, LEVELS, reckoning);
        }
    }

    private static LethalTemperatures shifted(LethalTemperatures course, double shift) {
        return new LethalTemperatures(plus(course.lt10(), shift), plus(course.lt50(), shift), plus(course.lt90(), shift));
    }

    private static double[] plus(double[] values, double shift) {
        double[] moved = values.clone();
        for (int i = 0; i < moved.length; i++) {
            moved[i] += shift;
        }
        return moved;
    }

    /** {@code [season][plane][cell]}. */
    private static float[][][] run(FoldJob job, FoldPlan plan) {
        int cells = job.targetRows() * job.targetColumns();
        int planes = job.planes();
        float[][][] all = new float[job.seasons().size()][planes][cells];
        try (Workers workers = new Workers(plan.threads(), () -> false)) {
            new LocalEngine(job, plan).run((season, firstRow, values) -> {
                for (int plane = 0; plane < planes; plane++) {
                    float[] lane = values.plane(plane);
                    System.arraycopy(lane, 0, all[season][plane], firstRow * job.targetColumns(), lane.length);
                }
            }, workers, Progress.silent(), new Notices());
        }
        return all;
    }

    private static float[][][] run(FoldJob job) {
        return run(job, new FoldPlanner(job, 1, 1L << 30).plan());
    }

    private static void assertSame(float[][][] expected, float[][][] actual) {
        for (int s = 0; s < expected.length; s++) {
            for (int p = 0; p < expected[s].length; p++) {
                assertArrayEquals(expected[s][p], actual[s][p], "winter " + s + " plane " + p);
            }
        }
    }

    private static ElevationAdjustment fine(Sample sample, long seed, CoordinateOperation operation) {
        Random random = new Random(seed);
        GridGeometry source = sample.grid;
        int factor = 3;
        GridGeometry target = new GridGeometry(source.columns() * factor + 2, source.rows() * factor,
                source.west() - source.cellWidth() / factor, source.north() + 0.01, source.cellWidth() / factor,
                source.cellHeight() / factor, CRS);
        float[] heights = new float[(int) target.cells()];
        for (int i = 0; i < heights.length; i++) {
            heights[i] = random.nextInt(30) == 0 ? Float.NaN : 200 + 900 * random.nextFloat();
        }
        float[] sourceHeights = new float[(int) source.cells()];
        for (int i = 0; i < sourceHeights.length; i++) {
            sourceHeights[i] = random.nextInt(20) == 0 ? Float.NaN : 300 + 500 * random.nextFloat();
        }
        double[] months = new double[12];
        for (int m = 0; m < 12; m++) {
            months[m] = 3 + 0.3 * m;
        }
        return ElevationAdjustment.toHeights(new SourcePositions(source, target, operation), sourceHeights,
                new ElevationField(target, heights, "random"), new LapseRates(months));
    }

    @Property(tries = 40)
    void cuttingTheWorkUpChangesNothing(@ForAll long seed, @ForAll @IntRange(min = 1, max = 9) int rows,
                                        @ForAll @IntRange(min = 1, max = 9) int columns,
                                        @ForAll @IntRange(min = 1, max = 200) int chunkDays,
                                        @ForAll @IntRange(min = 1, max = 9) int chunkRows,
                                        @ForAll @IntRange(min = 1, max = 4) int threads, @ForAll boolean withDem) {
        Sample sample = new Sample(seed, rows, columns, CfCalendar.STANDARD, false);
        ElevationAdjustment adjustment = withDem ? fine(sample, seed, CoordinateOperation.identity())
                : ElevationAdjustment.none(sample.grid);
        FoldJob plain = sample.job(adjustment, new StorageLayout(1, rows, columns, 0), MissingDayPolicy.MONTH_10_5);
        float[][][] expected = run(plain);
        int usedRows = Math.min(chunkRows, rows);
        FoldJob chunked = sample.job(adjustment, new StorageLayout(chunkDays, usedRows, columns, (int) Math.floorMod(seed, usedRows)),
                MissingDayPolicy.MONTH_10_5);
        long most = new FoldPlanner(chunked, threads, 1L << 30).plan().memory().total();
        for (long budget : new long[] {1L << 30, most - 1, most / 2, most / 3}) {
            for (FoldJob job : List.of(plain, chunked)) {
                try {
                    FoldPlan plan = new FoldPlanner(job, threads, budget).plan();
                    assertTrue(plan.memory().total() <= budget);
                    assertSame(expected, run(job, plan));
                } catch (org.wintersill.problem.ProblemException tooSmall) {
                    assertEquals(5, tooSmall.exitCode());
                }
            }
        }
    }

    @Property(tries = 30)
    void theFoldEqualsThePlainDefinition(@ForAll long seed, @ForAll boolean south, @ForAll boolean days360) {
        Sample sample = new Sample(seed, 3, 5, days360 ? CfCalendar.DAYS_360 : CfCalendar.NOLEAP, south);
        float[][][] fold = run(sample.job(ElevationAdjustment.none(sample.grid), new StorageLayout(1, 3, 5, 0), MissingDayPolicy.MONTH_5_3));
        for (int s = 0; s < sample.seasons.size(); s++) {
            for (int cell = 0; cell < 15; cell++) {
                assertCellEqualsDefinition(sample, s, cell, fold[s]);
            }
        }
    }

    /** Science 16.3 in double precision, night by night. */
    private static void assertCellEqualsDefinition(Sample sample, int s, int cell, float[][] planes) {
        Season season = sample.seasons.get(s);
        double[] lowest = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
        double minimum = Double.POSITIVE_INFINITY;
        double damage = 0;
        double untouched = 1;
        double[] reached = {Double.NaN, Double.NaN};
        Phases phases = sample.curves.get(s)[0].phases();
        int deadliest = -1;
        int worst = -1;
        LethalTemperatures lt = sample.courses.get(s);
        for (int night = 0; night < season.days(); night++) {
            int position = sample.axis.indexOf(season.firstDay() + night);
            double t = position < 0 ? Double.NaN : sample.values[position][cell];
            if (Double.isNaN(t)) {
                continue;
            }
            for (int end = 0; end < 2; end++) {
                if (Double.isNaN(reached[end]) && night >= (end == 0 ? phases.midwinter() : phases.spring())) {
                    reached[end] = sample.reckoning.nights().isWorst() ? damage : 1 - untouched;
                }
            }
            minimum = Math.min(minimum, t);
            if (t - lt.lt50()[night] < lowest[0] - 1e-6) {
                worst = night;
            }
            lowest[0] = Math.min(lowest[0], t - lt.lt50()[night]);
            lowest[1] = Math.min(lowest[1], t - lt.lt10()[night]);
            lowest[2] = Math.min(lowest[2], t - lt.lt90()[night]);
            double killed = ToleranceCurve.SPLIT_LOGISTIC.killedFraction(t, lt.lt10()[night], lt.lt50()[night], lt.lt90()[night]);
            deadliest = killed > damage ? night : deadliest;
            damage = Math.max(damage, killed);
            untouched *= 1 - killed;
        }
        if (!complete(sample, season, cell)) {
            assertTrue(Float.isNaN(planes[0][cell]) && Float.isNaN(planes[1][cell]), "an incomplete winter has no value");
            return;
        }
        assertEquals(minimum, planes[0][cell], 1e-6);
        for (int level = 0; level < LEVELS; level++) {
            assertEquals(lowest[level], planes[WinterValues.marginPlane(0, level, LEVELS)][cell], 1e-5);
        }
        float kept = planes[WinterValues.damagePlane(0, LEVELS)][cell];
        switch (sample.reckoning.nights().rule()) {
            case WORST -> assertEquals(damage, kept, 1e-5);
            case INDEPENDENT -> assertEquals(1 - untouched, kept, 1e-5);
            default -> assertTrue(kept >= damage - 1e-6 && kept <= 1 - untouched + 1e-6, "the copula lies between worst and independent");
        }
        if (sample.reckoning.keepsExpected()) {
            double t = sample.values[sample.axis.indexOf(season.firstDay() + deadliest)][cell];
            assertEquals(expected(t, lt, deadliest, sample.reckoning.uncertainty().sd()),
                    planes[WinterValues.expectedDamagePlane(0, 2, LEVELS, sample.reckoning)][cell], 2e-3);
        }
        for (int end = 0; sample.reckoning.phases() && end < 2; end++) {
            float at = planes[WinterValues.damageAtPlane(0, end, 2, LEVELS, sample.reckoning)][cell];
            if (sample.reckoning.nights().rule() != NightJoining.Rule.CORRELATED) {
                assertEquals(reached[end], at, 1e-5);
            }
            assertTrue(at >= 0 && at <= kept);
        }
        float found = planes[WinterValues.worstNightPlane(0, LEVELS)][cell];
        double marginThere = sample.values[sample.axis.indexOf(season.firstDay() + (long) found)][cell] - lt.lt50()[(int) found];
        assertEquals(lowest[0], marginThere, 1e-5);
        assertTrue(found <= worst + 1e-9 || Math.abs(marginThere - lowest[0]) < 1e-5);
    }

    /** E p(T - e) by the trapezoidal rule on a fine net; the quadrature of 32 points is coarser where the curve is steep. */
    private static double expected(double t, LethalTemperatures lt, int night, double sd) {
        double sum = 0;
        double weights = 0;
        for (double u = -8; u <= 8; u += 0.002) {
            double weight = Math.exp(-u * u / 2);
            weights += weight;
            sum += weight * ToleranceCurve.SPLIT_LOGISTIC.killedFraction(t - sd * u, lt.lt10()[night], lt.lt50()[night], lt.lt90()[night]);
        }
        return sum / weights;
    }

    private static boolean complete(Sample sample, Season season, int cell) {
        int missing = 0;
        int run = 0;
        int longest = 0;
        for (int night = season.completeFrom(); night <= season.completeTo(); night++) {
            int position = sample.axis.indexOf(season.firstDay() + night);
            boolean absent = position < 0 || Float.isNaN(sample.values[position][cell]);
            missing += absent ? 1 : 0;
            run = absent ? run + 1 : 0;
            longest = Math.max(longest, run);
            boolean monthEnds = night == season.completeTo() || season.date(night + 1).month() != season.date(night).month();
            if (monthEnds) {
                if (missing > 5 || longest > 3) {
                    return false;
                }
                missing = 0;
                run = 0;
                longest = 0;
            }
        }
        return true;
    }

    @Property(tries = 30)
    void colderIsNeverSafer(@ForAll long seed, @ForAll @IntRange(min = 1, max = 80) int tenths) {
        Sample sample = new Sample(seed, 3, 4, CfCalendar.STANDARD, false);
        StorageLayout layout = new StorageLayout(1, 3, 4, 0);
        float[][][] before = run(sample.job(fine(sample, seed, CoordinateOperation.identity()), layout, MissingDayPolicy.MONTH_10_5));
        Random random = new Random(seed);
        for (float[] day : sample.values) {
            for (int i = 0; i < day.length; i++) {
                day[i] -= random.nextInt(3) == 0 ? tenths / 10f : 0;
            }
        }
        float[][][] after = run(sample.job(fine(sample, seed, CoordinateOperation.identity()), layout, MissingDayPolicy.MONTH_10_5));
        for (int s = 0; s < before.length; s++) {
            for (int i = 0; i < before[s][0].length; i++) {
                int margin = WinterValues.marginPlane(1, 0, LEVELS);
                int damage = WinterValues.damagePlane(1, LEVELS);
                assertEquals(Float.isNaN(before[s][margin][i]), Float.isNaN(after[s][margin][i]));
                assertTrue(!(after[s][margin][i] > before[s][margin][i] + 1e-5));
                assertTrue(!(after[s][damage][i] < before[s][damage][i] - 1e-5));
            }
        }
    }

    @Property(tries = 30)
    void maskingOneSourceCellChangesOnlyItsNeighbourhood(@ForAll long seed) {
        Sample sample = new Sample(seed, 6, 6, CfCalendar.STANDARD, false);
        ElevationAdjustment adjustment = ElevationAdjustment.none(sample.grid);
        StorageLayout layout = new StorageLayout(1, 6, 6, 0);
        float[][][] before = run(sample.job(adjustment, layout, MissingDayPolicy.MONTH_10_5));
        int masked = (int) Math.floorMod(seed, 36);
        for (float[] day : sample.values) {
            day[masked] = Float.NaN;
        }
        float[][][] after = run(sample.job(adjustment, layout, MissingDayPolicy.MONTH_10_5));
        for (int s = 0; s < before.length; s++) {
            for (int p = 0; p < before[s].length; p++) {
                before[s][p][masked] = Float.NaN;
            }
        }
        assertSame(before, after);
    }

    @Property(tries = 20)
    void aGeneralPositionGivesTheSameAsASeparableOne(@ForAll long seed) {
        Sample sample = new Sample(seed, 4, 5, CfCalendar.STANDARD, false);
        StorageLayout layout = new StorageLayout(1, 4, 5, 0);
        CoordinateOperation slow = (xy, points) -> { };
        float[][][] separable = run(sample.job(fine(sample, seed, CoordinateOperation.identity()), layout, MissingDayPolicy.MONTH_10_5));
        float[][][] general = run(sample.job(fine(sample, seed, slow), layout, MissingDayPolicy.MONTH_10_5));
        for (int s = 0; s < separable.length; s++) {
            int margin = WinterValues.marginPlane(0, 0, LEVELS);
            assertArrayEquals(separable[s][margin], general[s][margin], 2e-5f);
        }
    }
}
