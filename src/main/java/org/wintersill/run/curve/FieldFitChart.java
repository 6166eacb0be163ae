package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.estimation.CultivarFit;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.io.chart.Axis;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartColours;
import org.wintersill.io.chart.Mark;
import org.wintersill.io.chart.Panel;
import org.wintersill.layer.Colour;
import org.wintersill.run.Caution;

/** Measured against fitted LT50 of trial fits, and the residuals under it. */
public final class FieldFitChart {
    private static final double SCATTER = 340;
    private static final double RESIDUALS = 150;

    private FieldFitChart() {
    }

    public static Chart of(FieldFit field) {
        List<double[]> all = new ArrayList<>();
        List<double[]> residuals = new ArrayList<>(List.of(new double[] {0}));
        List<Mark> points = new ArrayList<>();
        List<Mark> remains = new ArrayList<>(List.of(new Mark.Rule(0, ChartColours.INK, Mark.Stroke.THIN, "")));
        int i = 0;
        for (Map.Entry<String, CultivarFit> entry : field.fits().entrySet()) {
            CultivarFit fit = entry.getValue();
            double[] measured = fit.samples().stream().mapToDouble(MeasuredTolerance::lt50).toArray();
            all.add(measured);
            all.add(fit.fit().fitted());
            residuals.add(fit.fit().residuals());
            Colour colour = ChartColours.series(i);
            Mark.Shape shape = Mark.Shape.values()[i++ % Mark.Shape.values().length];
            points.add(new Mark.Points(fit.fit().fitted(), measured, colour, shape, String.format(Locale.ROOT, "%s: RMSE %.2f K, n %d",
                    fit.samples().get(0).cultivar(), fit.fit().rmse(), fit.samples().size())));
            remains.add(new Mark.Points(fit.fit().fitted(), fit.fit().residuals(), colour, shape, ""));
        }
        Axis fitted = Axis.around("fitted LT50 (\u00b0C)", all.toArray(double[][]::new));
        double[] ends = {fitted.from(), fitted.to()};
        points.add(0, new Mark.Line(ends, ends, ChartColours.FAINT, Mark.Stroke.STRONG, "measured = fitted"));
        return new Chart("Trial fit of " + field.request().model(), List.copyOf(field.fits().values().stream().map(field::source).toList()),
                "Measured LT50 against fitted LT50 of " + field.fits().size() + " cultivars, with the residuals.", fitted,
                List.of(new Panel("Measured against fitted LT50", Axis.around("measured LT50 (\u00b0C)", all.toArray(double[][]::new)),
                        SCATTER, points), new Panel("Residuals: measured minus fitted", Axis.around("K", residuals.toArray(double[][]::new)),
                        RESIDUALS, remains)), List.of(Caution.SHORT));
    }
}
