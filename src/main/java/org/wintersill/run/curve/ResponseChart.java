package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.chart.Axis;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartColours;
import org.wintersill.io.chart.Mark;
import org.wintersill.io.chart.Panel;
import org.wintersill.layer.Colour;
import org.wintersill.run.Caution;
import org.wintersill.run.curve.CultivarCurve.Row;

/** The autumn and the spring limb of responses, each with its band from LT10 to LT90, against the trailing mean temperature. */
final class ResponseChart {
    private ResponseChart() {
    }

    static Chart of(List<CultivarCurve> curves) {
        double[][] limits = curves.stream().flatMap(curve -> java.util.stream.Stream.of(
                curve.rows().stream().mapToDouble(Row::lt10).toArray(), curve.rows().stream().mapToDouble(Row::lt90).toArray()))
                .toArray(double[][]::new);
        Axis vertical = Axis.around("\u00b0C", limits);
        List<Panel> panels = new ArrayList<>();
        for (CultivarCurve curve : curves) {
            List<Mark> marks = new ArrayList<>();
            limb(marks, curve, CultivarCurve.AUTUMN, ChartColours.series(1), Mark.Stroke.STRONG);
            limb(marks, curve, CultivarCurve.SPRING, ChartColours.HARDINESS, Mark.Stroke.DASHED);
            panels.add(new Panel(CurveChart.label(curve.cultivar()), vertical, curves.size() == 1 ? CurveChart.ALONE
                    : CurveChart.AMONG_OTHERS, marks));
        }
        List<Cultivar> cultivars = curves.stream().map(CultivarCurve::cultivar).toList();
        return new Chart(cultivars.size() == 1 ? cultivars.get(0).name() + ": response to temperature" : "Response to temperature",
                List.of("Temperatures that kill 10 to 90 % (band) and 50 % (line) of the organs"),
                "Lethal temperatures in autumn and in spring against the trailing mean temperature, of "
                        + String.join(", ", cultivars.stream().map(Cultivar::name).toList()) + ".",
                Axis.linear("trailing mean temperature (\u00b0C)", CultivarCurve.COLDEST_MEAN, CultivarCurve.WARMEST_MEAN), panels,
                List.of(CurveChart.sources(cultivars), Caution.of(cultivars)));
    }

    private static void limb(List<Mark> marks, CultivarCurve curve, String name, Colour colour, Mark.Stroke stroke) {
        List<Row> rows = curve.limb(name);
        double[] x = rows.stream().mapToDouble(Row::position).toArray();
        marks.add(new Mark.Band(x, rows.stream().mapToDouble(Row::lt90).toArray(), rows.stream().mapToDouble(Row::lt10).toArray(), colour,
                ""));
        marks.add(new Mark.Line(x, rows.stream().mapToDouble(Row::lt50).toArray(), colour, stroke, "LT50, " + name));
    }
}
