package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.FrequencyBounds;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Return period of a killing winter, years: 1 / frequency, missing where no winter was killing; or its lower bound,
 * 1 / upper bound of the frequency, which exists everywhere (science 16.6).
 */
public final class KillingWinterReturn implements ClimatologyStatistic {
    /** Frequencies below are as good as none: with an uncertain margin no winter is ever quite safe (project choice). */
    private static final double SELDOM = 1e-6;

    private final int percent;
    private final int level;
    private final boolean bound;
    private final FrequencyBounds bounds;

    /**
     * @param percent share of the buds that makes a killing winter
     * @param level position of that share among the record's levels
     * @param bound whether the lower bound is meant
     */
    public KillingWinterReturn(int percent, int level, boolean bound, FrequencyBounds bounds) {
        this.percent = percent;
        this.level = level;
        this.bound = bound;
        this.bounds = bounds;
    }

    @Override
    public LayerDefinition layer() {
        return bound
                ? new LayerDefinition("killing-winter-return-lower", "Return period of a killing winter, lower bound",
                        "One divided by the upper bound (" + bounds.words() + ") of the frequency of winters that kill at least "
                                + percent + " % of the buds: the return period is hardly shorter, even where none was seen",
                        "year", SampleType.FLOAT32, "", LayerStyles.returnPeriod())
                : new LayerDefinition("killing-winter-return", "Return period of a killing winter",
                        "One divided by the frequency of winters that kill at least " + percent
                                + " % of the buds; missing where none was seen, see the lower bound",
                        "year", SampleType.FLOAT32, "", LayerStyles.returnPeriod());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        int[] counts = record.counts();
        double[] events = record.events(level);
        for (int cell = from; cell < to; cell++) {
            int n = counts[cell];
            double k = events[cell];
            if (n == 0 || !bound && k / n < SELDOM) {
                out[cell] = Float.NaN;
            } else {
                out[cell] = (float) (bound ? 1 / bounds.upper(k, n) : n / k);
            }
        }
    }
}
