package org.wintersill.climatology.statistic;

import java.util.Arrays;
import java.util.concurrent.ConcurrentHashMap;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.FrequencyInterval;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Bounds of the required hardiness: the shifts whose number of killing winters is compatible with the target, by the very bounds that the
 * frequency has. A shift d leaves k(d) of n winters at or below zero; it is compatible where the bounds of k(d) of n enclose the target.
 * So the ends are order statistics of the margins. A record too short to bound a side leaves it missing: with 12 winters and a target of
 * 0.10, not one killing winter is still compatible, and nothing says how much hardier would be hardy enough.
 */
final class RequiredHardinessBound implements ClimatologyStatistic {
    private final int level;
    private final double target;
    private final FrequencyInterval interval;
    private final double confidence;
    private final boolean upper;
    /** By n: fewest and most events that are compatible with the target. */
    private final ConcurrentHashMap<Integer, int[]> compatible = new ConcurrentHashMap<>();

    RequiredHardinessBound(int level, double target, FrequencyInterval interval, double confidence, boolean upper) {
        this.level = level;
        this.target = target;
        this.interval = interval;
        this.confidence = confidence;
        this.upper = upper;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("required-hardiness-" + (upper ? "upper" : "lower"), "Required hardiness, " + (upper ? "upper" : "lower") + " bound",
                "Shifts of the curve beyond this are not compatible with a share " + target + " of killing winters (" + interval.key() + ", "
                        + Math.round(confidence * 1000) / 10.0 + " % two-sided); missing where the record is too short to say",
                "K", SampleType.FLOAT32, "", LayerStyles.requiredHardiness());
    }

    @Override
    public LayerGroup group() {
        return LayerGroup.BOUNDS;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        double[] margins = new double[record.winters()];
        for (int cell = from; cell < to; cell++) {
            int n = WinterRecord.valid(record.margins(level), cell, margins);
            double[] bounds = n == 0 ? new double[] {Double.NaN, Double.NaN} : of(margins, n);
            out[cell] = (float) bounds[upper ? 1 : 0];
        }
    }

    /**
     * Lower and upper bound; NaN where there is none.
     *
     * @param margins sorted by this method, the first n count
     */
    double[] of(double[] margins, int n) {
        Arrays.sort(margins, 0, n);
        int[] events = compatible.computeIfAbsent(n, this::compatibleEvents);
        return new double[] {events[1] == n ? Double.NaN : -margins[events[1]], events[0] == 0 ? Double.NaN : -margins[events[0] - 1]};
    }

    private int[] compatibleEvents(int n) {
        int fewest = 0;
        while (fewest < n && interval.bounds(fewest, n, confidence)[1] < target) {
            fewest++;
        }
        int most = n;
        while (most > 0 && interval.bounds(most, n, confidence)[0] > target) {
            most--;
        }
        return new int[] {fewest, most};
    }
}
