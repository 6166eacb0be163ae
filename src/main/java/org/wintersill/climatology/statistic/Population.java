package org.wintersill.climatology.statistic;

import java.util.Arrays;
import org.wintersill.climatology.Percentiles;
import org.wintersill.damage.StandardNormal;
import org.wintersill.damage.Uncertainty;

/**
 * The variants that a cultivar stands for, by what is added to its lethal temperatures: a list of offsets, or a normal distribution
 * around zero. A variant with offset o has the margin M - o in every winter, exactly.
 *
 * @param sd standard deviation of the offsets, K; of a list divided by its number (science 16.8)
 * @param offsets of the listed variants, K, negative is hardier; empty for a normal distribution
 */
public record Population(double sd, double[] offsets) {
    /** Of a normal distribution the hardiest tenth stands for the hardiest variant, since there is no hardiest (project choice). */
    private static final double HARDIEST = 0.1;

    /** Share of the population for which a margin is not above zero, with an uncertainty of standard deviation {@code uncertain}, K. */
    public double shareNotAbove(double margin, double uncertain) {
        if (offsets.length == 0) {
            return Uncertainty.probabilityNotAbove(margin, Math.sqrt(uncertain * uncertain + sd * sd));
        }
        double sum = 0;
        for (double offset : offsets) {
            sum += Uncertainty.probabilityNotAbove(margin - offset, uncertain);
        }
        return sum / offsets.length;
    }

    /** How much hardier the hardiest variant is than the middle one, K. */
    public double hardierGain() {
        if (offsets.length == 0) {
            return -sd * StandardNormal.quantile(HARDIEST);
        }
        double[] sorted = offsets.clone();
        Arrays.sort(sorted);
        return Percentiles.type7(sorted, sorted.length, 0.5) - sorted[0];
    }
}
