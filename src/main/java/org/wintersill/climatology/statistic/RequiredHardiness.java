package org.wintersill.climatology.statistic;

import java.util.Arrays;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * By how many K the whole curve would have to be hardier so that at most a target share of winters kills: with margins
 * ascending, d = -M(k+1), k = floor(target n + 1e-9); signed, negative is hardiness to spare (science 16.7).
 */
public final class RequiredHardiness implements ClimatologyStatistic {
    /** Keeps a target such as 0.10 of 20 winters from falling to 1 by round-off. */
    private static final double ROUND_OFF = 1e-9;

    private final int level;
    private final double target;

    /**
     * @param level position of the killing level among the record's levels
     * @param target share of killing winters that is accepted, 0..1
     */
    public RequiredHardiness(int level, double target) {
        this.level = level;
        this.target = target;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("required-hardiness", "Required hardiness",
                "How much hardier the curve must be so that at most a share " + target
                        + " of winters kills; negative is hardiness to spare",
                "K", SampleType.FLOAT32, "", LayerStyles.requiredHardiness());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        double[] margins = new double[record.winters()];
        for (int cell = from; cell < to; cell++) {
            int n = WinterRecord.valid(record.margins(level), cell, margins);
            out[cell] = n == 0 ? Float.NaN : (float) of(margins, n, target);
        }
    }

    /**
     * The shift for one place.
     *
     * @param margins sorted by this method, the first n count
     */
    static double of(double[] margins, int n, double target) {
        Arrays.sort(margins, 0, n);
        int accepted = Math.min(n - 1, (int) Math.floor(target * n + ROUND_OFF));
        return -margins[accepted];
    }
}
