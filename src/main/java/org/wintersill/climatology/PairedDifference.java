package org.wintersill.climatology;

import org.apache.commons.math3.distribution.TDistribution;

/**
 * How much two series of the same winters differ, and how sure that is: mean of the differences, with Student's interval for pairs
 * (Student 1908, Biometrika 6:1; mean +- t s / sqrt(n), s the standard deviation of the differences).
 *
 * <p>Both cultivars meet the same cold, so that the pairs say more than two intervals that overlap. Winters are few and damage is far from
 * normal: the interval is a rule of thumb against reading too much into small differences, no test.
 *
 * @param winters number of winters with both values
 * @param mean mean of first minus second; NaN without winters
 * @param halfWidth half of the interval; infinite with fewer than two winters
 */
public record PairedDifference(int winters, double mean, double halfWidth) {

    /**
     * Compares.
     *
     * @param first and {@code second}: values of the same winters, NaN where a winter does not count
     * @param level probability of the interval, 0..1
     */
    public static PairedDifference of(double[] first, double[] second, double level) {
        int n = 0;
        double sum = 0;
        for (int i = 0; i < first.length; i++) {
            double difference = first[i] - second[i];
            if (!Double.isNaN(difference)) {
                n++;
                sum += difference;
            }
        }
        double mean = n == 0 ? Double.NaN : sum / n;
        if (n < 2) {
            return new PairedDifference(n, mean, Double.POSITIVE_INFINITY);
        }
        double squares = 0;
        for (int i = 0; i < first.length; i++) {
            double off = first[i] - second[i] - mean;
            squares += Double.isNaN(off) ? 0 : off * off;
        }
        double error = Math.sqrt(squares / (n - 1) / n);
        double t = error == 0 ? 0 : new TDistribution(null, n - 1).inverseCumulativeProbability((1 + level) / 2);
        return new PairedDifference(n, mean, t * error);
    }

    /** Whether the first is lower by more than the interval is wide on one side. */
    public boolean clearlyLower() {
        return mean < 0 && -mean > halfWidth;
    }
}
