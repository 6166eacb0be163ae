package org.wintersill.climatology;

import java.util.concurrent.atomic.AtomicReferenceArray;

/**
 * Bounds of the frequencies that occur in one run, kept so that a quantile of the beta distribution is not sought in every
 * cell. Between whole numbers of events, which occur with an uncertain margin, the bounds are interpolated by cubics
 * through {@link #STEPS} values a winter, exact at those; the error is below 1e-6. Any number of threads may ask.
 *
 * <p>A lower bound is never above the frequency itself, nor an upper bound below it: for a fraction of an event, where the formula could
 * say otherwise, it is cut there.
 */
public final class FrequencyBounds {
    private static final int STEPS = 32;
    /** Stands for no event where the formula sets the bound itself to zero, which no neighbour continues. */
    private static final double HARDLY_ANY = 1e-9;

    private final FrequencyInterval interval;
    private final double level;
    /** Lower and upper bound of each n and k, one after the other; filled as they are asked for. */
    private final AtomicReferenceArray<double[]> known;
    /** The same where all or none of n are events, which is a case of its own in the formula. */
    private final AtomicReferenceArray<double[]> ends;

    /**
     * @param winters most winters that count at a cell
     * @param level probability that the bounds enclose, 0..1
     */
    public FrequencyBounds(FrequencyInterval interval, int winters, double level) {
        this.interval = interval;
        this.level = level;
        known = new AtomicReferenceArray<>(place(winters + 1, 0));
        ends = new AtomicReferenceArray<>(2 * (winters + 1));
    }

    private static int place(int n, int step) {
        return n * (n - 1) / 2 * STEPS + n + step;
    }

    /** What the bounds are, such as {@code Jeffreys, 90.0 % two-sided}. */
    public String words() {
        return (interval == FrequencyInterval.JEFFREYS ? "Jeffreys" : "Wilson") + ", " + Math.round(level * 1000) / 10.0
                + " % two-sided";
    }

    /** @param k number of events, 0..n; need not be whole */
    public double lower(double k, int n) {
        return k == 0 || k == n ? end(k, n)[0] : Math.min(k / n, between(k, n, 0));
    }

    /** @param k number of events, 0..n; need not be whole */
    public double upper(double k, int n) {
        return k == 0 || k == n ? end(k, n)[1] : Math.max(k / n, between(k, n, 1));
    }

    private double[] end(double k, int n) {
        int place = 2 * n + (k == 0 ? 0 : 1);
        double[] bounds = ends.get(place);
        if (bounds == null) {
            bounds = interval.bounds(k, n, level);
            ends.set(place, bounds);
        }
        return bounds;
    }

    private double between(double k, int n, int side) {
        double position = k * STEPS;
        int nearest = (int) Math.rint(position);
        if (position == nearest) {
            return at(nearest, n)[side];
        }
        int first = Math.max(0, Math.min(n * STEPS - 3, (int) Math.floor(position) - 1));
        double t = position - first;
        return at(first, n)[side] * (t - 1) * (t - 2) * (t - 3) / -6 + at(first + 1, n)[side] * t * (t - 2) * (t - 3) / 2
                + at(first + 2, n)[side] * t * (t - 1) * (t - 3) / -2 + at(first + 3, n)[side] * t * (t - 1) * (t - 2) / 6;
    }

    private double[] at(int step, int n) {
        int place = place(n, step);
        double[] bounds = known.get(place);
        if (bounds == null) {
            double k = Math.max(HARDLY_ANY, Math.min(n - HARDLY_ANY, (double) step / STEPS));
            bounds = interval.bounds(k, n, level);
            known.set(place, bounds);
        }
        return bounds;
    }
}
