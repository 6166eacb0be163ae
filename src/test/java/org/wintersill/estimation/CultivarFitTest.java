package org.wintersill.estimation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.wintersill.estimation.CultivarFit.Task;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.problem.ProblemException;
import org.wintersill.season.PointCourse;
import org.wintersill.temperature.DailySeries;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Parameters that made invented samples are found again. */
class CultivarFitTest {
    private static final SeasonWindow NORTH = SeasonWindow.north();
    private static final int FIRST_YEAR = 2001;
    private static final int WINTERS = 6;
    private static final DailySeries SERIES = weather(7);
    private static final TrialFit.Way WAY = new TrialFit.Way(2, 2e-3, 60, 0.98, 1, () -> { });

    /** Invented weather: a year's wave and a noise that remembers yesterday. */
    private static DailySeries weather(long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        int days = 365 * WINTERS + 200;
        long first = CfCalendar.STANDARD.dayNumber(new CfDate(FIRST_YEAR, 7, 1));
        float[] minima = new float[days];
        float[] means = new float[days];
        double noise = 0;
        for (int day = 0; day < days; day++) {
            noise = 0.75 * noise + 2.6 * (random.nextDouble() + random.nextDouble() + random.nextDouble() - 1.5) * 1.15;
            double mean = 9.5 + 9.5 * Math.cos(2 * Math.PI * (day - 15) / 365.25) + noise;
            means[day] = (float) mean;
            minima[day] = (float) (mean - 5);
        }
        return new DailySeries(CfCalendar.STANDARD, first, minima, means);
    }

    /** A sample every so many days of every winter, from a true model and a measuring error. */
    private static List<MeasuredTolerance> samples(HardinessModel truth, int every, double error, long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        List<MeasuredTolerance> samples = new ArrayList<>();
        for (int year = FIRST_YEAR; year < FIRST_YEAR + WINTERS; year++) {
            Season season = NORTH.beginningIn(year, CfCalendar.STANDARD);
            double[] lt50 = PointCourse.of(truth, season, NORTH, SERIES, 46).lt50();
            for (int night = 20; night < 235; night += every) {
                double value = lt50[night] + error * 2 * (random.nextDouble() + random.nextDouble() + random.nextDouble() - 1.5);
                samples.add(new MeasuredTolerance("Demo", season.date(night), value + 2.1, value, value - 1.7, Double.NaN));
            }
        }
        return samples;
    }

    private static void foundAgain(FitModel model, double[] truth, CultivarFit fit) {
        for (TrialFit.Estimate estimate : fit.fit().estimates()) {
            int i = model.settings().stream().map(setting -> setting.parameter().name()).toList().indexOf(estimate.parameter().name());
            assertTrue(estimate.lower() <= truth[i] && truth[i] <= estimate.upper(), estimate.parameter().name() + ": " + truth[i]
                    + " is not from " + estimate.lower() + " to " + estimate.upper());
        }
    }

    private static double kept(CultivarFit fit, String name) {
        return fit.kept().stream().filter(kept -> kept.parameter().name().equals(name)).findFirst().orElseThrow().value();
    }

    @Test
    void rowsOfADatedCurveAreFoundAgain() {
        Map<String, Double> truth = new LinkedHashMap<>();
        List<MeasuredTolerance> samples = new ArrayList<>();
        SplittableRandom random = new SplittableRandom(3);
        String[] dates = {"10-01", "11-15", "12-20", "02-10", "03-20", "04-20"};
        double[] lt50 = {-9, -16, -21.5, -22, -14, -6};
        for (int i = 0; i < dates.length; i++) {
            truth.put("lt50 on " + dates[i], lt50[i]);
            for (int year = 2010; year < 2014; year++) {
                CfDate date = new CfDate(i < 3 ? year : year + 1, Integer.parseInt(dates[i].substring(0, 2)),
                        Integer.parseInt(dates[i].substring(3)));
                double value = lt50[i] + 1.2 * (random.nextDouble() - 0.5);
                samples.add(new MeasuredTolerance("Demo", date, value + 2, value, value - 1.5, 20 + i));
            }
        }
        CultivarFit fit = CultivarFit.of(samples, new Task("dated", NORTH, null, 45, Map.of()), "t.csv", WAY);
        assertEquals(2.0, fit.spread().toLt10(), 1e-9);
        assertEquals(1.5, fit.spread().toLt90(), 1e-9);
        assertTrue(fit.fit().rmse() < 3, "half as many rows as days");
        assertEquals(4, fit.fit().estimates().size());
        // as many rows as days when every day has a row of its own: the rows are then the means of their days
        List<MeasuredTolerance> three = samples.stream().filter(sample -> sample.date().month() == 10 || sample.date().month() == 12)
                .toList();
        CultivarFit exact = CultivarFit.of(three, new Task("dated", NORTH, null, 45, Map.of()), "t.csv", WAY);
        for (TrialFit.Estimate estimate : exact.fit().estimates()) {
            double known = truth.get(estimate.parameter().name());
            double mean = three.stream().filter(sample -> Math.abs(sample.lt50() - known) < 1).mapToDouble(MeasuredTolerance::lt50)
                    .average().orElseThrow();
            assertEquals(mean, estimate.value(), 1e-6);
            assertTrue(estimate.lower() <= known && known <= estimate.upper(), estimate.toString());
        }
    }

    @Test
    void aResponseIsFoundAgain() {
        List<MeasuredTolerance> some = List.of(new MeasuredTolerance("a", new CfDate(2001, 12, 1), -20, -24, -26, 1),
                new MeasuredTolerance("a", new CfDate(2001, 12, 1), -1, -4, -6, 1));
        FitModel model = new ResponseFit(some);
        double[] truth = {-3, -25, 0.55, 6, 0.75, 2, 600, 900, 10};
        List<MeasuredTolerance> samples = samples(model.model(truth, 2, 2), 12, 0.5, 11);
        CultivarFit fit = CultivarFit.of(samples, new Task("response", NORTH, SERIES, 46, Map.of()), "t.csv", WAY);
        foundAgain(new ResponseFit(samples), truth, fit);
        assertEquals(2.1, fit.spread().toLt10(), 1e-9);
        assertTrue(fit.fit().rmse() < 0.7 && fit.fit().r2() > 0.97, fit.fit().rmse() + " " + fit.fit().r2());
    }

    @Test
    void thermalTimeIsFoundAgain() {
        FitModel model = new ThermalTimeFit(List.of(new MeasuredTolerance("a", new CfDate(2001, 12, 1), -20, -23, -26, 1)));
        double[] truth = {-10, -1.5, -24, 12, 0.1, 0.06, 4, 0.05, 0.12, 5, -600, -2.2};
        List<MeasuredTolerance> samples = samples(model.model(truth, 2, 2), 12, 0.4, 13);
        CultivarFit fit = CultivarFit.of(samples, new Task("thermal-time", NORTH, SERIES, 46, Map.of()), "t.csv",
                new TrialFit.Way(0, 2e-3, 50, 0.98, 1, () -> { }));
        foundAgain(new ThermalTimeFit(samples), truth, fit);
        assertEquals(-600, kept(fit, "chilling"), 50.1);
        assertTrue(fit.fit().rmse() < 0.6 && fit.fit().r2() > 0.98, fit.fit().rmse() + " " + fit.fit().r2());
    }

    @Test
    void tooFewSamplesAreRefusedByName() {
        HardinessModel truth = new ThermalTimeFit(List.of(new MeasuredTolerance("a", new CfDate(2001, 12, 1), -20, -23, -26, 1)))
                .model(new double[] {-10, -1.5, -24, 12, 0.1, 0.06, 4, 0.05, 0.12, 5, -600, -2.2}, 2, 2);
        List<MeasuredTolerance> few = samples(truth, 12, 0.4, 13).subList(0, 10);
        String message = assertThrows(ProblemException.class, () -> CultivarFit.of(few, new Task("thermal-time", NORTH, SERIES, 46,
                Map.of()), "t.csv", WAY)).getMessage();
        assertTrue(message.contains("Demo has 10 usable samples") && message.contains("At least 11"), message);
    }

    @Test
    void keptParametersKeepTheirValue() {
        FitModel model = new ResponseFit(List.of(new MeasuredTolerance("a", new CfDate(2001, 12, 1), -20, -24, -26, 1)));
        double[] truth = {-3, -25, 0.55, 6, 0.75, 2, 600, 900, 10};
        List<MeasuredTolerance> samples = samples(model.model(truth, 2, 2), 25, 0.5, 11);
        Task task = new Task("response", NORTH, SERIES, 46, Map.of("tender-limit", -3.0, "mean-days", 12.0));
        CultivarFit fit = CultivarFit.of(samples, task, "t.csv", new TrialFit.Way(0, 2e-3, 0, 0.9, 1, () -> { }));
        assertEquals(-3, kept(fit, "tender-limit"));
        assertEquals(5, fit.fit().estimates().size());
        assertTrue(fit.model().describe().contains("mean of 12 days"), fit.model().describe());
        for (Map<String, Double> wrong : List.of(Map.of("tender-limt", -3.0), Map.of("mean-days", 40.0))) {
            assertThrows(ProblemException.class, () -> CultivarFit.of(samples, new Task("response", NORTH, SERIES, 46, wrong), "t.csv", WAY));
        }
    }

    @Test
    void samplesWithoutTemperaturesBeforeThemAreLeftOutAndTold() {
        FitModel model = new ResponseFit(List.of(new MeasuredTolerance("a", new CfDate(2001, 12, 1), -20, -24, -26, 1)));
        List<MeasuredTolerance> samples = new ArrayList<>(samples(model.model(new double[] {-3, -25, 0.55, 6, 0.75, 2, 600, 900, 10}, 2, 2),
                12, 0.5, 11));
        int before = samples.size();
        samples.add(new MeasuredTolerance("Demo", new CfDate(1990, 1, 15), -18, -20, -22, Double.NaN));
        CultivarFit fit = CultivarFit.of(samples, new Task("response", NORTH, SERIES, 46, Map.of()), "t.csv",
                new TrialFit.Way(0, 2e-3, 0, 0.9, 1, () -> { }));
        assertEquals(before, fit.samples().size());
        assertTrue(fit.remarks().get(0).contains("1990-01-15"), fit.remarks().toString());
    }
}
