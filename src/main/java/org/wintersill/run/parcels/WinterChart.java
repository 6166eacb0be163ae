package org.wintersill.run.parcels;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.wintersill.io.chart.Axis;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartColours;
import org.wintersill.io.chart.Mark;
import org.wintersill.io.chart.Panel;

/** The winters of a parcel as a picture: the margin of each cultivar over and under zero, and the damage under it. */
final class WinterChart {
    /** More would not be told apart by colour and form. */
    private static final int MOST_CULTIVARS = 6;
    private static final int MOST_LABELS = 13;
    private static final Mark.Shape[] SHAPES = Mark.Shape.values();

    private WinterChart() {
    }

    /** @param order positions of the cultivars, the best first */
    static Chart of(FinishedRun run, ParcelResult parcel, List<Integer> order) {
        int winters = run.winters().size();
        double[] x = IntStream.range(0, winters).asDoubleStream().toArray();
        List<Mark> margins = new ArrayList<>();
        List<Mark> damages = new ArrayList<>();
        List<double[]> values = new ArrayList<>(List.of(new double[] {0}));
        List<Integer> shown = order.stream().limit(MOST_CULTIVARS).toList();
        shown.forEach(cultivar -> values.add(parcel.cultivars().get(cultivar).margin()));
        Axis vertical = Axis.around("K", values.toArray(double[][]::new));
        if (vertical.from() < 0) {
            margins.add(new Mark.Zone(vertical.from(), 0, ChartColours.DANGER, ""));
        }
        margins.add(new Mark.Rule(0, ChartColours.INK, Mark.Stroke.THIN, ""));
        damages.add(new Mark.Rule(run.killing(), ChartColours.DANGER, Mark.Stroke.DASHED, "killing winter"));
        for (int i = 0; i < shown.size(); i++) {
            CultivarResult result = parcel.cultivars().get(shown.get(i));
            String name = run.cultivars().get(shown.get(i)).name();
            double[] percent = Arrays.stream(result.damage()).map(damage -> 100 * damage).toArray();
            margins.add(new Mark.Line(x, result.margin(), ChartColours.series(i), Mark.Stroke.FAINT, ""));
            margins.add(new Mark.Points(x, result.margin(), ChartColours.series(i), SHAPES[i % SHAPES.length], name));
            damages.add(new Mark.Line(x, percent, ChartColours.series(i), Mark.Stroke.FAINT, ""));
            damages.add(new Mark.Points(x, percent, ChartColours.series(i), SHAPES[i % SHAPES.length], ""));
        }
        String left = order.size() > MOST_CULTIVARS ? " The first " + MOST_CULTIVARS + " cultivars by rank are shown." : "";
        return new Chart("Winters of this parcel", List.of(), "Mean margin and damage of each winter by cultivar."
                + left, axis(run.winters()), List.of(new Panel("Mean margin: lowest minimum temperature above LT50", vertical, 190, margins),
                        new Panel("Damage: share of the buds killed", Axis.linear("%", 0, 100), 130, damages)),
                left.isEmpty() ? List.of() : List.of(left.strip()));
    }

    private static Axis axis(List<String> labels) {
        int step = (labels.size() + MOST_LABELS - 1) / MOST_LABELS;
        List<Axis.Tick> ticks = new ArrayList<>();
        for (int winter = 0; winter < labels.size(); winter += step) {
            ticks.add(new Axis.Tick(winter, labels.get(winter)));
        }
        return new Axis("", false, -0.5, labels.size() - 0.5, ticks, false);
    }
}
