package org.wintersill.climatology;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.distribution.BetaDistribution;
import org.apache.commons.math3.distribution.NormalDistribution;

/**
 * Bounds of a frequency: k winters out of n (Brown, Cai and DasGupta 2001, Statistical Science 16:101; definitions from memory,
 * values checked against scipy).
 */
public enum FrequencyInterval {
    /** Quantiles of Beta(k + 1/2, n - k + 1/2); the lower bound is 0 for k = 0, the upper 1 for k = n. */
    JEFFREYS("jeffreys") {
        @Override
        public double[] bounds(double k, int n, double level) {
            double tail = (1 - level) / 2;
            BetaDistribution beta = new BetaDistribution(null, k + 0.5, n - k + 0.5, 1e-12);
            return new double[] {k == 0 ? 0 : beta.inverseCumulativeProbability(tail),
                k == n ? 1 : beta.inverseCumulativeProbability(1 - tail)};
        }
    },
    /** Wilson's score interval. */
    WILSON("wilson") {
        @Override
        public double[] bounds(double k, int n, double level) {
            double z = new NormalDistribution(null, 0, 1).inverseCumulativeProbability(1 - (1 - level) / 2);
            double centre = (k + z * z / 2) / (n + z * z);
            double half = z * Math.sqrt(k * (n - k) / n + z * z / 4) / (n + z * z);
            return new double[] {Math.max(0, centre - half), Math.min(1, centre + half)};
        }
    };

    private final String key;

    FrequencyInterval(String key) {
        this.key = key;
    }

    /** Word of the run file. */
    public String key() {
        return key;
    }

    public static Optional<FrequencyInterval> named(String key) {
        return Arrays.stream(values()).filter(interval -> interval.key.equals(key)).findFirst();
    }

    public static List<String> keys() {
        return Arrays.stream(values()).map(FrequencyInterval::key).toList();
    }

    /**
     * Lower and upper bound, two-sided.
     *
     * @param k number of events; need not be whole
     * @param n number of trials, at least 1
     * @param level 0..1, such as 0.90
     */
    public abstract double[] bounds(double k, int n, double level);
}
