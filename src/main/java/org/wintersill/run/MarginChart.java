package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.ToDoubleFunction;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.chart.Axis;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartColours;
import org.wintersill.io.chart.Mark;
import org.wintersill.io.chart.Panel;
import org.wintersill.problem.Problem;
import org.wintersill.run.CellExplanation.Night;
import org.wintersill.run.CellExplanation.Winter;
import org.wintersill.time.Season;

/**
 * One winter of one cultivar as a picture: each night's margin as a drop from the line of zero, the worst night marked, and under it
 * the temperatures against the band from LT10 to LT90.
 */
public final class MarginChart {
    private static final double MARGIN_HEIGHT = 230;
    private static final double BAND_HEIGHT = 210;

    private MarginChart() {
    }

    /**
     * The only winter of the only cultivar of a cell.
     *
     * @throws org.wintersill.problem.ProblemException when the cell has several cultivars
     */
    public static Chart of(RunPlan plan, CellExplanation cell) {
        checkOne(cell.cultivars());
        CellExplanation.CultivarCourse course = cell.cultivars().get(0);
        Winter winter = course.winters().get(0);
        Season season = plan.seasons().stream().filter(candidate -> candidate.label().equals(winter.label())).findFirst().orElseThrow();
        String place = String.format(Locale.ROOT, "Cell at %.6f, %.6f (%s)%s", cell.x(), cell.y(), cell.crs(),
                Float.isNaN(cell.elevation()) ? "" : String.format(Locale.ROOT, ", elevation %.0f m", cell.elevation()));
        return of(place, course.cultivar(), winter, season);
    }

    /**
     * Refuses a picture of several cultivars.
     *
     * @throws org.wintersill.problem.ProblemException when there is not exactly one
     */
    public static void checkOne(List<CellExplanation.CultivarCourse> courses) {
        if (courses.size() != 1) {
            throw Problem.usage("a chart shows one cultivar, and there are " + courses.size(), "--chart", "Choose with "
                    + "--cultivar one of " + String.join(", ", courses.stream().map(course -> course.cultivar().id()).toList()))
                    .asException();
        }
    }

    /**
     * @param place where and what, for the line under the title
     * @param season the winter, for its days; as many as the winter has nights
     */
    public static Chart of(String place, Cultivar cultivar, Winter winter, Season season) {
        List<Night> nights = winter.nights();
        double[] days = java.util.stream.IntStream.range(0, nights.size()).asDoubleStream().toArray();
        double[] margin = values(nights, Night::margin);
        int worst = lowest(margin);
        List<Mark> drops = new ArrayList<>();
        Axis vertical = marginAxis(margin);
        if (vertical.from() < 0) {
            drops.add(new Mark.Zone(vertical.from(), 0, ChartColours.DANGER, ""));
        }
        drops.add(new Mark.Drops(days, margin, 0, ChartColours.SAFE, ChartColours.DANGER, "a night: above zero, below zero"));
        drops.add(new Mark.Rule(0, ChartColours.INK, Mark.Stroke.THIN, ""));
        String verdict = verdict(winter, season, margin, worst);
        if (worst >= 0) {
            drops.add(new Mark.Callout(worst, margin[worst], "worst night " + Axis.words(season.date(worst)) + ": "
                    + Axis.signed(margin[worst], 2) + " K", margin[worst] < 0 ? ChartColours.DANGER : ChartColours.SAFE));
        }
        double[] lt10 = values(nights, Night::lt10);
        double[] lt50 = values(nights, Night::lt50);
        double[] lt90 = values(nights, Night::lt90);
        double[] tmin = values(nights, Night::tmin);
        List<Mark> band = new ArrayList<>(List.of(
                new Mark.Band(days, lt90, lt10, ChartColours.HARDINESS, "LT10 to LT90"),
                new Mark.Line(days, lt50, ChartColours.HARDINESS, Mark.Stroke.STRONG, "LT50"),
                new Mark.Line(days, tmin, ChartColours.COLD, Mark.Stroke.THIN, "minimum temperature")));
        if (worst >= 0) {
            band.add(new Mark.Callout(worst, tmin[worst], Axis.number(tmin[worst], 1) + " \u00b0C", ChartColours.COLD));
        }
        return new Chart(cultivar.name() + ", winter " + winter.label(),
                List.of(place, about(cultivar)), "Margins of the nights of winter " + winter.label() + " for " + cultivar.name() + ". "
                        + verdict, Axis.winter(season),
                List.of(new Panel("Margin: minimum temperature above LT50", vertical, MARGIN_HEIGHT, drops),
                        new Panel("Temperature and hardiness", Axis.around("\u00b0C", lt10, lt90, tmin), BAND_HEIGHT, band)),
                List.of(verdict, Caution.of(List.of(cultivar))));
    }

    /** Species, organ, model and status of a cultivar in one line. */
    static String about(Cultivar cultivar) {
        List<String> parts = new ArrayList<>();
        if (!cultivar.species().isEmpty()) {
            parts.add(cultivar.species());
        }
        if (!cultivar.organ().isEmpty()) {
            parts.add(cultivar.organ());
        }
        parts.add(cultivar.model().describe());
        parts.add("status: " + cultivar.status().word() + " (" + cultivar.source() + ")");
        return String.join("; ", parts);
    }

    private static String verdict(Winter winter, Season season, double[] margin, int worst) {
        if (worst < 0) {
            return "No night of this winter has a margin.";
        }
        long below = java.util.Arrays.stream(margin).filter(value -> value < 0).count();
        return String.format(Locale.ROOT, "Lowest margin %s K on %s; %s below zero. %s", Axis.signed(margin[worst], 2),
                Axis.words(season.date(worst)), below == 1 ? "1 night" : below + " nights", winter.valid()
                        ? "Damage of the worst night: " + Axis.number(100 * winter.damage(), 1) + " % of the buds."
                        : "Too many days are missing for this winter to count.");
    }

    private static Axis marginAxis(double[] margin) {
        return Axis.around("K", margin, new double[] {0});
    }

    /** Position of the earliest lowest value; -1 where all are NaN. */
    private static int lowest(double[] values) {
        int lowest = -1;
        for (int i = 0; i < values.length; i++) {
            if (!Double.isNaN(values[i]) && (lowest < 0 || values[i] < values[lowest])) {
                lowest = i;
            }
        }
        return lowest;
    }

    private static double[] values(List<Night> nights, ToDoubleFunction<Night> value) {
        return nights.stream().mapToDouble(value).toArray();
    }
}
