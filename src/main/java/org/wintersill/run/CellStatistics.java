package org.wintersill.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.Gev;
import org.wintersill.climatology.extreme.LowExtreme;
import org.wintersill.climatology.extreme.MaximumLikelihood;
import org.wintersill.climatology.extreme.ProfileLikelihood;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.climatology.statistic.TrendSignificance;
import org.wintersill.engine.WinterPlanes;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.layer.LayerDefinition;

/**
 * What the winters of one cell say: every summary layer of the run at the cell, by the very code of the map and with its random
 * streams, and beside them the maximum likelihood fit with profile intervals, which take too long for a map.
 *
 * @param winters number of winters that count
 * @param interval probability that the bounds enclose, 0..1
 * @param shared layers that belong to no cultivar
 * @param minimum fit of the winters' lowest minima; empty for short records
 * @param cultivars in the order of the explanation
 */
public record CellStatistics(int winters, double interval, List<Value> shared, Optional<Fit> minimum, List<CultivarStatistics> cultivars) {

    /** A layer and its value at the cell; NaN for missing. */
    public record Value(LayerDefinition layer, float value) {
    }

    /**
     * @param margins lowest margin to LT50 of each winter that counts, in the order of time, K
     * @param cell number of the cell in the grid
     * @param margin fit of the margins; empty for short records
     */
    public record CultivarStatistics(Cultivar cultivar, List<Value> values, double[] margins, long cell, Optional<Fit> margin) {
    }

    /**
     * Maximum likelihood with profile intervals.
     *
     * @param gev of the negated lows
     * @param shape bounds of xi
     * @param levels by return period: level, lower and upper bound; infinite where the likelihood gives none
     */
    public record Fit(Gev gev, double logLikelihood, double[] shape, Map<Integer, double[]> levels) {
    }

    /**
     * The statistics of an explained cell.
     *
     * @param cell explained with all winters of the run
     */
    public static CellStatistics of(RunPlan plan, CellExplanation cell) {
        long number = (long) plan.target().rowAt(cell.y()) * plan.target().columns() + plan.target().columnAt(cell.x());
        WinterPlanes planes = (plane, season, row, count) -> cell.values().get(season).plane(plane);
        WinterRecord all = StoredWinters.record(plan, planes, Optional.empty(), 0, 1, number);
        double[] room = new double[all.winters()];
        int n = WinterRecord.valid(all.minimum(), 0, room);
        Optional<Fit> minimum = fit(plan, room, n);
        List<CultivarStatistics> cultivars = new ArrayList<>();
        for (CellExplanation.CultivarCourse course : cell.cultivars()) {
            int position = plan.cultivars().indexOf(course.cultivar());
            WinterRecord record = StoredWinters.record(plan, planes, Optional.of(position), 0, 1, number);
            double[] margins = new double[record.winters()];
            int count = WinterRecord.valid(record.margins(0), 0, margins);
            cultivars.add(new CultivarStatistics(course.cultivar(), values(ClimatologyStatistics.ofCultivar(plan.choices()), record),
                    java.util.Arrays.copyOf(margins, count), number, fit(plan, margins, count)));
        }
        return new CellStatistics(n, plan.choices().confidence(), values(ClimatologyStatistics.shared(plan.choices()), all), minimum, cultivars);
    }

    /** All but the classes that only the whole map can give. */
    private static List<Value> values(List<ClimatologyStatistic> statistics, WinterRecord record) {
        List<Value> values = new ArrayList<>();
        for (ClimatologyStatistic statistic : statistics) {
            if (!(statistic instanceof TrendSignificance)) {
                float[] value = new float[1];
                statistic.summarise(record, value, 0, 1);
                values.add(new Value(statistic.layer(), value[0]));
            }
        }
        return values;
    }

    private static Optional<Fit> fit(RunPlan plan, double[] lows, int n) {
        double[] maxima = java.util.Arrays.copyOf(lows, n);
        LowExtreme.toSortedMaxima(maxima, n);
        if (plan.choices().extremes().method().isEmpty()
                || ExtremeFit.of(maxima, n, ExtremeFit.Method.L_MOMENTS).kind() == ExtremeFit.Kind.NONE) {
            return Optional.empty();
        }
        double confidence = plan.choices().confidence();
        Gev gev = MaximumLikelihood.fit(maxima, n);
        ProfileLikelihood profile = new ProfileLikelihood(maxima, n, gev);
        Map<Integer, double[]> levels = new LinkedHashMap<>();
        for (int period : plan.choices().extremes().returnPeriods()) {
            double[] bounds = profile.returnLevel(period, confidence);
            levels.put(period, new double[] {LowExtreme.returnLevel(gev, period), -bounds[1], -bounds[0]});
        }
        return Optional.of(new Fit(gev, gev.logLikelihood(maxima, n), profile.shape(confidence), levels));
    }
}
