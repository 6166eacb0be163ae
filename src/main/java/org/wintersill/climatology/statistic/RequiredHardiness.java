package org.wintersill.climatology.statistic;

import java.math.BigDecimal;
import java.util.Arrays;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.Percentiles;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * By how many K the whole curve would have to be hardier to meet a target; signed, negative is hardiness to spare (science section 8 and
 * 16.7). With margins of the killing level ascending: frequency rule d = -M(k+1), k = floor(target n + 1e-9); quantile rule d = minus the
 * target's percentile. Expected-damage rule: the mean over winters of p at M + d, margins to LT50, is the target.
 */
public final class RequiredHardiness implements ClimatologyStatistic {
    /** Keeps a target such as 0.10 of 20 winters from falling to 1 by round-off. */
    private static final double ROUND_OFF = 1e-9;

    private final String id;
    private final HardinessRule rule;
    private final int level;
    private final double target;
    private final Spreads spreads;

    /**
     * @param id {@code required-hardiness}, or with the target where there are several
     * @param level position of the killing level among the record's levels
     * @param levels percent of buds of each level
     * @param target accepted share of killing winters, or accepted expected damage, 0..1
     */
    RequiredHardiness(String id, HardinessRule rule, int level, int[] levels, double target) {
        this.id = id;
        this.rule = rule;
        this.level = level;
        this.target = target;
        spreads = rule == HardinessRule.EXPECTED_DAMAGE ? new Spreads(levels) : null;
    }

    /** Id of the layer of a further target, such as {@code required-hardiness-at-2-5} for 0.025. */
    static String idAt(double target) {
        return "required-hardiness-at-" + BigDecimal.valueOf(target).movePointRight(2).stripTrailingZeros().toPlainString().replace('.', '-');
    }

    @Override
    public LayerDefinition layer() {
        String aim = switch (rule) {
            case FREQUENCY -> "so that at most a share " + target + " of winters kills";
            case QUANTILE -> "so that the margin's percentile " + 100 * target + " is zero";
            case EXPECTED_DAMAGE -> "so that the expected fraction of buds killed in a winter is " + target;
        };
        return new LayerDefinition(id, "Required hardiness", "How much hardier the curve must be " + aim + "; negative is hardiness to spare",
                "K", SampleType.FLOAT32, "", LayerStyles.requiredHardiness());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        double[] margins = new double[record.winters()];
        for (int cell = from; cell < to; cell++) {
            int n = WinterRecord.valid(record.margins(level), cell, margins);
            out[cell] = n == 0 ? Float.NaN : (float) switch (rule) {
                case FREQUENCY -> of(margins, n, target);
                case QUANTILE -> ofQuantile(margins, n, target);
                case EXPECTED_DAMAGE -> ofDamage(record, cell);
            };
        }
    }

    /**
     * The shift by the frequency rule.
     *
     * @param margins sorted by this method, the first n count
     */
    static double of(double[] margins, int n, double target) {
        Arrays.sort(margins, 0, n);
        int accepted = Math.min(n - 1, (int) Math.floor(target * n + ROUND_OFF));
        return -margins[accepted];
    }

    /** The shift by the quantile rule; likewise. */
    static double ofQuantile(double[] margins, int n, double target) {
        Arrays.sort(margins, 0, n);
        return -Percentiles.type7(margins, n, target);
    }

    private double ofDamage(WinterRecord record, int cell) {
        float[][] values = record.margins(0);
        double[] margins = new double[values.length];
        double[] warm = new double[values.length];
        double[] cold = new double[values.length];
        int n = 0;
        for (int winter = 0; winter < values.length; winter++) {
            if (values[winter][cell] == values[winter][cell]) {
                margins[n] = values[winter][cell];
                warm[n] = spreads.warm(record, winter, cell);
                cold[n++] = spreads.cold(record, winter, cell);
            }
        }
        return ofDamage(record.tolerance(), margins, warm, cold, n, target);
    }

    /** The shift by the expected-damage rule, by halving: the mean damage falls with the shift. */
    static double ofDamage(ToleranceCurve curve, double[] margins, double[] warm, double[] cold, int n, double target) {
        double low = 0;
        double high = 0;
        for (double step = 1; meanDamage(curve, margins, warm, cold, n, low) < target; step *= 2) {
            low -= step;
        }
        for (double step = 1; meanDamage(curve, margins, warm, cold, n, high) > target; step *= 2) {
            high += step;
        }
        while (high - low > 1e-9 * Math.max(1, Math.abs(low))) {
            double middle = (low + high) / 2;
            if (meanDamage(curve, margins, warm, cold, n, middle) > target) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + high) / 2;
    }

    private static double meanDamage(ToleranceCurve curve, double[] margins, double[] warm, double[] cold, int n,
                                     double shift) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            double margin = margins[i] + shift;
            sum += curve.fractionOfDeficit(-margin / (margin > 0 ? warm[i] : cold[i]));
        }
        return sum / n;
    }
}
