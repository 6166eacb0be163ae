package org.wintersill.climatology.extreme;

import java.util.Arrays;
import org.wintersill.climatology.Percentiles;

/**
 * Bounds and tests by samples drawn from a fitted distribution and fitted anew (science 6.2).
 *
 * <p>A replicate errs from the distribution it was drawn from as the fit errs from the truth; so the truth is looked for where the
 * errors, turned round, lead from the fit: scale sigma^2 / sigma*, location mu - (mu* - mu) sigma / sigma*, shape 2 xi - xi* (exact for
 * location and scale if the shape were known). Bounds are percentiles of a quantity over these, widened where the Gumbel distribution
 * took the place of the fit and lies outside. Plain percentiles of the replicates cover the truth less evenly for 30 winters: see the
 * table of coverage in DEVELOPERS.md.
 *
 * <p>A replicate is the fitted distribution's values of sorted standard exponentials, so nothing is sorted; exponentials come from
 * {@link RandomStream} by seed, cell and replicate. Used by one thread.
 */
public final class ParametricBootstrap {
    /** A quantity of a distribution. */
    public interface Quantity {
        double of(Gev gev);
    }

    private final int replicates;
    private final long seed;
    private final double[] exponentials;
    private final double[] sample;

    /**
     * @param replicates number of samples, at least 1
     * @param seed of the run
     * @param winters longest record
     */
    public ParametricBootstrap(int replicates, long seed, int winters) {
        this.replicates = replicates;
        this.seed = seed;
        exponentials = new double[winters];
        sample = new double[winters];
    }

    /**
     * What the replicates of a fit give.
     *
     * @param fit where the samples come from; it is fitted
     * @param n size of each sample
     * @param cell number of the cell in the grid
     * @param test whether {@link Replicates#pValue} will be asked, which takes longer than all else
     */
    public Replicates of(ExtremeFit fit, int n, long cell, boolean test) {
        Gev[] mirrored = new Gev[replicates];
        double[] distances = new double[test ? replicates : 0];
        for (int replicate = 0; replicate < replicates; replicate++) {
            RandomStream.of(seed, cell, replicate).descendingExponentials(exponentials, n);
            for (int i = 0; i < n; i++) {
                sample[i] = fit.general().ofExponential(exponentials[i]);
            }
            Gev again = fit.kind() == ExtremeFit.Kind.MAXIMUM_LIKELIHOOD ? MaximumLikelihood.fit(sample, n)
                    : LMoments.of(sample, n).gev();
            mirrored[replicate] = mirror(fit.general(), again);
            if (test) {
                distances[replicate] = FitQuality.andersonDarling(sample, n, again);
            }
        }
        return new Replicates(fit, mirrored, distances);
    }

    private static Gev mirror(Gev fit, Gev replicate) {
        double scale = fit.scale() / replicate.scale();
        return new Gev(fit.location() - (replicate.location() - fit.location()) * scale, fit.scale() * scale,
                2 * fit.shape() - replicate.shape());
    }

    /** Distributions that may be true, and each replicate's distance to its own sample. */
    public static final class Replicates {
        private final ExtremeFit fit;
        private final Gev[] mirrored;
        private final double[] distances;

        private Replicates(ExtremeFit fit, Gev[] mirrored, double[] distances) {
            this.fit = fit;
            this.mirrored = mirrored;
            this.distances = distances;
        }

        /** Percentiles of a quantity that leave the same share on both sides, and enclose the fit's own. */
        public double[] bounds(Quantity quantity, double confidence) {
            double[] values = new double[mirrored.length];
            for (int i = 0; i < values.length; i++) {
                values[i] = quantity.of(mirrored[i]);
            }
            Arrays.sort(values);
            double tail = (1 - confidence) / 2;
            double estimate = quantity.of(fit.gev());
            return new double[] {Math.min(estimate, Percentiles.type7(values, values.length, tail)),
                Math.max(estimate, Percentiles.type7(values, values.length, 1 - tail))};
        }

        /** Share of replicates that lie at least as far from their fit as the record does, by Anderson and Darling. */
        public double pValue(double distance) {
            long farther = Arrays.stream(distances).filter(d -> d >= distance).count();
            return (farther + 1.0) / (distances.length + 1);
        }
    }
}
