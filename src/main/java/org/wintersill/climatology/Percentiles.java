package org.wintersill.climatology;

/** Percentiles of type 7 (Hyndman and Fan 1996, American Statistician 50:361): linear between order statistics. */
public final class Percentiles {
    private Percentiles() {
    }

    /**
     * The percentile of the first n values.
     *
     * @param sorted ascending
     * @param n number of values that count, at least 1
     * @param share 0..1
     */
    public static double type7(double[] sorted, int n, double share) {
        double position = (n - 1) * share;
        int lower = (int) Math.floor(position);
        int upper = Math.min(lower + 1, n - 1);
        return sorted[lower] + (position - lower) * (sorted[upper] - sorted[lower]);
    }
}
