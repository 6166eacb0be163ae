package org.wintersill.estimation;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.wintersill.estimation.CultivarFit.Spread;
import org.wintersill.estimation.CultivarFit.Task;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.season.PointCourse;
import org.wintersill.time.Season;

/** The fit in hand: free parameters among kept ones. */
final class FitWork {
    /** A prediction that the model does not give; far from any measurement. */
    private static final double NOWHERE = 100;

    private final FitModel model;
    private final double[] values;
    private final int[] free;
    private final Spread spread;
    private final Task task;
    private final List<MeasuredTolerance> samples;
    private final List<Season> winters;
    private double[] begin;

    FitWork(FitModel model, double[] values, boolean[] isFree, Spread spread, Task task, List<MeasuredTolerance> samples,
         List<Season> winters) {
        this.model = model;
        this.values = values;
        this.spread = spread;
        this.task = task;
        this.samples = samples;
        this.winters = winters;
        free = java.util.stream.IntStream.range(0, isFree.length).filter(i -> isFree[i]).toArray();
    }

    List<Parameter> parameters() {
        return Arrays.stream(free).mapToObj(i -> model.settings().get(i).parameter()).toList();
    }

    double[] start() {
        return begin != null ? begin : Arrays.stream(free).mapToDouble(i -> values[i]).toArray();
    }

    double[] all(double[] point) {
        double[] all = values.clone();
        for (int j = 0; j < free.length; j++) {
            all[free[j]] = point[j];
        }
        return all;
    }

    double[] observed() {
        return samples.stream().mapToDouble(MeasuredTolerance::lt50).toArray();
    }

    /** The number of organs over its mean; 1 where it is not told. */
    double[] weights() {
        double mean = samples.stream().mapToDouble(MeasuredTolerance::count).average().orElse(Double.NaN);
        return samples.stream().mapToDouble(sample -> Double.isNaN(mean) ? 1 : sample.count() / mean).toArray();
    }

    double[] predict(double[] point) {
        double[] predicted = predict(model.model(all(point), spread.toLt10(), spread.toLt90()), task, samples, winters);
        for (int i = 0; i < predicted.length; i++) {
            predicted[i] = Double.isNaN(predicted[i]) ? NOWHERE : predicted[i];
        }
        return predicted;
    }

    FitModel model() {
        return model;
    }

    /** Values of all parameters; those that are free are replaced by the points of the fit. */
    double[] values() {
        return values;
    }

    void beginAt(double[] point) {
        begin = point;
    }

    /** LT50 that a model gives for each sample; NaN where it says nothing. */
    static double[] predict(HardinessModel model, Task task, List<MeasuredTolerance> samples, List<Season> winters) {
        Map<Integer, double[]> courses = new TreeMap<>();
        double[] predicted = new double[samples.size()];
        for (int i = 0; i < predicted.length; i++) {
            Season winter = winters.get(i);
            double[] course = courses.computeIfAbsent(winter.year(), year ->
                    PointCourse.of(model, winter, task.window(), task.series(), task.latitude()).lt50());
            predicted[i] = course[winter.position(samples.get(i).date())];
        }
        return predicted;
    }
}
