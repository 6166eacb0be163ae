package org.wintersill.climatology.extreme;

import java.util.Arrays;
import java.util.concurrent.ConcurrentHashMap;
import org.wintersill.climatology.Percentiles;

/**
 * Correlation of the probability plot that 19 of 20 samples exceed when the fitted kind of distribution is the right one: the 5th
 * percentile over samples of a Gumbel distribution, each fitted by L-moments. Tables of the literature hold for other plotting positions.
 */
public final class PlotCorrelationLimit {
    private static final int SAMPLES = 999;
    private static final double SHARE = 0.05;

    private final long seed;
    private final ConcurrentHashMap<Integer, Double> known = new ConcurrentHashMap<>();

    /** @param seed of the run */
    public PlotCorrelationLimit(long seed) {
        this.seed = seed;
    }

    /** The limit for a record of n winters; any number of threads may ask. */
    public double of(int n) {
        return known.computeIfAbsent(n, winters -> {
            Gev gumbel = new Gev(0, 1, 0);
            double[] exponentials = new double[winters];
            double[] correlations = new double[SAMPLES];
            for (int sample = 0; sample < SAMPLES; sample++) {
                RandomStream.of(seed, -winters, sample).descendingExponentials(exponentials, winters);
                double[] values = Arrays.stream(exponentials).map(gumbel::ofExponential).toArray();
                correlations[sample] = FitQuality.plotCorrelation(values, winters,
                        ExtremeFit.of(values, winters, ExtremeFit.Method.L_MOMENTS).gev());
            }
            Arrays.sort(correlations);
            return Percentiles.type7(correlations, SAMPLES, SHARE);
        });
    }
}
