package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.chart.Axis;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartColours;
import org.wintersill.io.chart.Mark;
import org.wintersill.io.chart.Panel;
import org.wintersill.problem.Problem;
import org.wintersill.run.Caution;
import org.wintersill.run.curve.CultivarCurve.Kind;
import org.wintersill.run.curve.CultivarCurve.Row;
import org.wintersill.time.SeasonWindow;

/**
 * Curves as a picture: a panel a cultivar with its band from LT10 to LT90, the LT50 of the others drawn faintly behind it, all on
 * one scale.
 */
public final class CurveChart {
    /** More panels than this nobody reads. */
    private static final int MOST_PANELS = 8;
    static final double ALONE = 360;
    static final double AMONG_OTHERS = 150;

    private CurveChart() {
    }

    /**
     * Lethal temperatures through a winter, or against the trailing mean.
     *
     * @throws org.wintersill.problem.ProblemException when there is nothing to draw, or too much
     */
    public static Chart of(List<CultivarCurve> curves, SeasonWindow window) {
        List<CultivarCurve> shown = curves.stream().filter(curve -> curve.kind() != Kind.STATE).toList();
        checkCount(shown.size(), curves.size());
        long responses = shown.stream().filter(curve -> curve.kind() == Kind.MEAN).count();
        if (responses == shown.size()) {
            return ResponseChart.of(shown);
        }
        if (responses > 0) {
            throw Problem.usage("curves by date and responses to temperature share no axis", "--chart", "Choose with --cultivar")
                    .asException();
        }
        Axis vertical = Axis.around("\u00b0C", shown.stream().flatMap(curve -> java.util.stream.Stream.of(
                values(curve, Row::lt10), values(curve, Row::lt90))).toArray(double[][]::new));
        List<Panel> panels = new ArrayList<>();
        for (CultivarCurve curve : shown) {
            panels.add(new Panel(label(curve.cultivar()), vertical, shown.size() == 1 ? ALONE : AMONG_OTHERS, marks(curve, shown)));
        }
        List<Cultivar> cultivars = shown.stream().map(CultivarCurve::cultivar).toList();
        return new Chart(shown.size() == 1 ? cultivars.get(0).name() + " through the winter" : "Hardiness through the winter",
                List.of("Temperatures that kill 10 to 90 % (band) and 50 % (line) of the organs, " + window.from() + " to " + window.to()),
                "Lethal temperatures by date of " + String.join(", ", cultivars.stream().map(Cultivar::name).toList()) + ".",
                Axis.winter(CultivarCurve.season(window)), panels, List.of(sources(cultivars), Caution.of(cultivars)));
    }

    private static void checkCount(int shown, int given) {
        if (shown == 0) {
            throw Problem.usage("none of the " + given + " cultivars has a curve that stands without weather", "--chart",
                    "Give --series SERIES.csv, one --winter and one --cultivar").asException();
        }
        if (shown > MOST_PANELS) {
            throw Problem.usage("a chart holds up to " + MOST_PANELS + " cultivars, and there are " + shown, "--chart",
                    "Choose with --cultivar, which may be given several times").asException();
        }
    }

    static String label(Cultivar cultivar) {
        List<String> parts = new ArrayList<>(List.of(cultivar.name(), cultivar.species(), cultivar.organ()));
        parts.removeIf(String::isEmpty);
        return String.join(", ", parts);
    }

    static String sources(List<Cultivar> cultivars) {
        return "Sources: " + String.join("; ", cultivars.stream().map(cultivar -> cultivar.id() + " - " + cultivar.source() + " ("
                + cultivar.status().word() + ")").toList()) + ".";
    }

    private static List<Mark> marks(CultivarCurve curve, List<CultivarCurve> all) {
        List<Mark> marks = new ArrayList<>();
        for (CultivarCurve other : all) {
            if (other != curve) {
                marks.add(new Mark.Line(values(other, Row::position), values(other, Row::lt50), ChartColours.FAINT, Mark.Stroke.THIN,
                        marks.isEmpty() ? "LT50 of the others" : ""));
            }
        }
        double[] x = values(curve, Row::position);
        double[] lt50 = values(curve, Row::lt50);
        marks.add(new Mark.Band(x, values(curve, Row::lt90), values(curve, Row::lt10), ChartColours.HARDINESS, "LT10 to LT90"));
        marks.add(new Mark.Line(x, lt50, ChartColours.HARDINESS, Mark.Stroke.STRONG, "LT50"));
        int hardiest = hardiest(lt50);
        if (hardiest >= 0) {
            marks.add(new Mark.Callout(x[hardiest], lt50[hardiest], "hardiest " + Axis.number(lt50[hardiest], 1) + " \u00b0C from "
                    + curve.rows().get(hardiest).at(), ChartColours.HARDINESS));
        }
        return marks;
    }

    private static int hardiest(double[] lt50) {
        int hardiest = -1;
        for (int i = 0; i < lt50.length; i++) {
            if (!Double.isNaN(lt50[i]) && (hardiest < 0 || lt50[i] < lt50[hardiest])) {
                hardiest = i;
            }
        }
        return hardiest;
    }

    private static double[] values(CultivarCurve curve, ToDoubleFunction<Row> value) {
        return curve.rows().stream().mapToDouble(value).toArray();
    }
}
