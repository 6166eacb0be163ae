package org.wintersill.io.geotiff.write;

/**
 * Exact count, extremes, mean and spread of values that come in groups.
 *
 * <p>Within a group the mean is the sum over the count and the squared deviations are summed around that mean; groups
 * join by n = n1 + n2, d = mean2 - mean1, mean = mean1 + d n2 / n, m2 = m2_1 + m2_2 + d^2 n1 n2 / n (Chan, Golub and
 * LeVeque 1979, Updating formulae and a pairwise algorithm for computing sample variances, STAN-CS-79-773, equation
 * 2.1). Groups are tiles, joined in the order of their index, so that the last digit does not depend on threads.
 */
final class ValueStatistics {
    private long count;
    private double minimum = Double.POSITIVE_INFINITY;
    private double maximum = Double.NEGATIVE_INFINITY;
    private double mean;
    private double squares;

    /** Takes the values of one group in their order, {@code [cell]}; NaN is left out. Replaces what was held. */
    void of(float[] values) {
        count = 0;
        minimum = Double.POSITIVE_INFINITY;
        maximum = Double.NEGATIVE_INFINITY;
        mean = 0;
        squares = 0;
        double sum = 0;
        for (float value : values) {
            if (value == value) {
                count++;
                sum += value;
                minimum = Math.min(minimum, value);
                maximum = Math.max(maximum, value);
            }
        }
        if (count == 0) {
            return;
        }
        mean = sum / count;
        for (float value : values) {
            if (value == value) {
                double deviation = value - mean;
                squares += deviation * deviation;
            }
        }
    }

    /** Joins a further group to this. */
    void add(ValueStatistics next) {
        if (next.count == 0) {
            return;
        }
        long total = count + next.count;
        double difference = next.mean - mean;
        squares += next.squares + difference * difference * ((double) count * next.count / total);
        mean += difference * next.count / total;
        count = total;
        minimum = Math.min(minimum, next.minimum);
        maximum = Math.max(maximum, next.maximum);
    }

    /** Number of values. */
    long count() {
        return count;
    }

    double minimum() {
        return minimum;
    }

    double maximum() {
        return maximum;
    }

    /** Never outside the extremes, whatever rounding does. */
    double mean() {
        return Math.max(minimum, Math.min(maximum, mean));
    }

    /** Spread of all values: divided by n, as GIS programs do. */
    double standardDeviation() {
        return Math.sqrt(squares / count);
    }
}
