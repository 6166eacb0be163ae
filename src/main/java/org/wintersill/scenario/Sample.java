package org.wintersill.scenario;

import java.util.Arrays;

/**
 * A sample of values, its type-7 quantile function and the inverse of it (science 8, 12). Room that is filled again for every
 * cell; used by one thread.
 */
final class Sample {
    private final float[] values;
    private int size;
    private double sum;

    /** @param most values that it may have to hold */
    Sample(int most) {
        values = new float[most];
    }

    void clear() {
        size = 0;
        sum = 0;
    }

    /** Takes a value; NaN is left out. */
    void add(float value) {
        if (value == value) {
            values[size++] = value;
            sum += value;
        }
    }

    void sort() {
        Arrays.sort(values, 0, size);
    }

    int size() {
        return size;
    }

    double mean() {
        return sum / size;
    }

    /**
     * Quantile of type 7: between the sorted values number (n - 1) tau, linear. The sample must be sorted and not empty.
     *
     * @param tau 0..1
     */
    double quantile(double tau) {
        double position = (size - 1) * tau;
        int lower = Math.min((int) position, size - 1);
        int upper = Math.min(lower + 1, size - 1);
        return values[lower] + (position - lower) * ((double) values[upper] - values[lower]);
    }

    /**
     * The inverse of {@link #quantile}: the tau whose quantile is x, 0 below the lowest and 1 above the highest value. Where
     * several values are equal, the tau of the last of them.
     */
    double probability(double x) {
        if (size == 1) {
            return x < values[0] ? 0 : 1;
        }
        if (x < values[0]) {
            return 0;
        }
        if (x >= values[size - 1]) {
            return 1;
        }
        int low = 0;
        int high = size - 1;
        while (high - low > 1) {
            int middle = (low + high) >>> 1;
            if (values[middle] <= x) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + (x - values[low]) / ((double) values[high] - values[low])) / (size - 1);
    }
}
