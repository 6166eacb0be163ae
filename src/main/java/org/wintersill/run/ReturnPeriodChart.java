package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.FitQuality;
import org.wintersill.climatology.extreme.LowExtreme;
import org.wintersill.climatology.extreme.ParametricBootstrap;
import org.wintersill.climatology.statistic.ExtremeChoices;
import org.wintersill.io.chart.Axis;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartColours;
import org.wintersill.io.chart.Mark;
import org.wintersill.io.chart.Panel;
import org.wintersill.problem.Problem;
import org.wintersill.run.CellStatistics.CultivarStatistics;

/** Return periods of the winters' lowest margins at one cell as a picture: each winter, the fitted distribution and its bounds. */
public final class ReturnPeriodChart {
    private static final double HEIGHT = 330;
    private static final double SHORTEST = 1.02;
    private static final double LONGEST = 200;
    private static final int STEPS = 60;

    private ReturnPeriodChart() {
    }

    /**
     * The margins of the only cultivar.
     *
     * @throws org.wintersill.problem.ProblemException when there are several cultivars
     */
    public static Chart of(RunPlan plan, CellExplanation cell, CellStatistics statistics) {
        if (statistics.cultivars().size() != 1) {
            throw Problem.usage("a chart shows one cultivar, and the run has " + statistics.cultivars().size(), "--chart", "Choose with "
                    + "--cultivar one of " + String.join(", ", statistics.cultivars().stream().map(course -> course.cultivar().id()).toList()))
                    .asException();
        }
        CultivarStatistics cultivar = statistics.cultivars().get(0);
        double[] maxima = cultivar.margins().clone();
        int n = maxima.length;
        LowExtreme.toSortedMaxima(maxima, n);
        double[] periods = new double[n];
        double[] margins = new double[n];
        for (int i = 0; i < n; i++) {
            periods[i] = 1 / (1 - FitQuality.plottingPosition(i, n));
            margins[i] = -maxima[i];
        }
        ExtremeChoices extremes = plan.choices().extremes();
        ExtremeFit fit = ExtremeFit.of(maxima, n, extremes.method().orElse(ExtremeFit.Method.L_MOMENTS));
        boolean fitted = extremes.method().isPresent() && fit.kind() != ExtremeFit.Kind.NONE;
        List<Mark> marks = new ArrayList<>();
        List<double[]> shown = new ArrayList<>(List.of(margins, new double[] {0}));
        if (fitted) {
            double[] x = new double[STEPS];
            double[] level = new double[STEPS];
            double[] lower = new double[STEPS];
            double[] upper = new double[STEPS];
            ParametricBootstrap.Replicates replicates = new ParametricBootstrap(extremes.replicates(), extremes.seed(), n)
                    .of(fit, n, cultivar.cell(), false);
            for (int i = 0; i < STEPS; i++) {
                double period = SHORTEST * Math.pow(LONGEST / SHORTEST, i / (STEPS - 1.0));
                x[i] = period;
                level[i] = LowExtreme.returnLevel(fit.gev(), period);
                double[] bounds = replicates.bounds(gev -> LowExtreme.returnLevel(gev, period), plan.choices().confidence());
                lower[i] = bounds[0];
                upper[i] = bounds[1];
            }
            marks.add(new Mark.Band(x, lower, upper, ChartColours.HARDINESS, String.format(Locale.ROOT, "bounds, %.3g %%",
                    100 * plan.choices().confidence())));
            marks.add(new Mark.Line(x, level, ChartColours.HARDINESS, Mark.Stroke.STRONG, "fitted distribution"));
            shown.addAll(List.of(lower, upper));
        }
        marks.add(new Mark.Rule(0, ChartColours.DANGER, Mark.Stroke.DASHED, "half of the buds die"));
        marks.add(new Mark.Points(periods, margins, ChartColours.SAFE, Mark.Shape.DISC, "a winter of the record"));
        if (n > 0) {
            marks.add(new Mark.Callout(periods[n - 1], margins[n - 1], Axis.signed(margins[n - 1], 1) + " K", ChartColours.SAFE));
        }
        String verdict = verdict(n, fit, fitted);
        String place = String.format(Locale.ROOT, "Cell at %.6f, %.6f (%s)", cell.x(), cell.y(), cell.crs());
        return new Chart(cultivar.cultivar().name() + ", lowest margin of a winter",
                List.of(place, MarginChart.about(cultivar.cultivar())),
                "Lowest margins of " + n + " winters against their return period. " + verdict,
                Axis.logarithmic("once in so many winters the margin is lower", 1, LONGEST),
                List.of(new Panel("Lowest margin to LT50", Axis.around("K", shown.toArray(double[][]::new)), HEIGHT, marks)),
                List.of(verdict, Caution.of(List.of(cultivar.cultivar()))));
    }

    private static String verdict(int n, ExtremeFit fit, boolean fitted) {
        if (!fitted) {
            return n + " winters: too few for a distribution, so nothing is drawn beyond them.";
        }
        double years = 1 / LowExtreme.probabilityAtOrBelow(fit.gev(), 0);
        String often = years > 1000 ? "By the fit, a margin below zero comes less than once in 1000 winters"
                : String.format(Locale.ROOT, "By the fit, a margin below zero comes once in %.3g winters", years);
        return often + (fit.kind() == ExtremeFit.Kind.GUMBEL_FALLBACK ? " (Gumbel, since the record's shape is beyond belief)." : ".")
                + " Periods much longer than " + n + " winters are the distribution's word, not the record's.";
    }
}
