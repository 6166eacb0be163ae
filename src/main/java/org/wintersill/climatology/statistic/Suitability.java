package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Class by the frequency of killing winters: 1 secure up to and including the first limit, 2 workable, 3 marginal, 4 unfit;
 * missing with fewer than five winters (science 16.6; limits are the project's choice, similar cut-offs are common practice).
 */
public final class Suitability implements ClimatologyStatistic {
    /** Fewest winters for a class. */
    public static final int FEWEST_WINTERS = 5;
    /** A frequency of 2 in 40 must not miss a limit of 0.05 by round-off. */
    private static final double ROUND_OFF = 1e-9;

    private final int level;
    private final double[] limits;

    /**
     * @param level position of the killing level among the record's levels
     * @param limits three frequencies, ascending
     */
    public Suitability(int level, double[] limits) {
        this.level = level;
        this.limits = limits.clone();
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("suitability", "Suitability",
                "Class from the frequency of killing winters: secure up to " + limits[0] + ", workable up to " + limits[1]
                        + ", marginal up to " + limits[2] + ", else unfit; missing with fewer than " + FEWEST_WINTERS + " winters",
                "1", SampleType.BYTE, "", LayerStyles.suitability());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        int[] counts = record.counts();
        double[] events = record.events(level);
        for (int cell = from; cell < to; cell++) {
            int n = counts[cell];
            out[cell] = n < FEWEST_WINTERS ? Float.NaN
                    : classOf(events[cell] / n, limits);
        }
    }

    /** 1 to 4. */
    static int classOf(double frequency, double[] limits) {
        int code = 1;
        while (code <= limits.length && frequency > limits[code - 1] + ROUND_OFF) {
            code++;
        }
        return code;
    }
}
