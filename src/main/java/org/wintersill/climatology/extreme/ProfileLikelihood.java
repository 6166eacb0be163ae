package org.wintersill.climatology.extreme;

import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.distribution.ChiSquaredDistribution;

/**
 * Intervals from the profile of the likelihood: all values of one quantity for which the best fit loses no more than half the
 * chi-squared quantile with one degree of freedom (Coles 2001, section 2.6.6, from memory). They are not symmetric, as they
 * should not be.
 */
public final class ProfileLikelihood {
    private static final int MOST_STEPS = 60;

    private final double[] values;
    private final int n;
    private final Gev best;
    private final double lowest;

    /** @param best the maximum likelihood fit of the first n values */
    public ProfileLikelihood(double[] values, int n, Gev best) {
        this.values = values.clone();
        this.n = n;
        this.best = best;
        lowest = -best.logLikelihood(values, n);
    }

    /** Bounds of the level that is exceeded once in so many winters; infinite where the likelihood gives none. */
    public double[] returnLevel(double winters, double confidence) {
        double e = -Math.log1p(-1 / winters);
        return interval(best.returnLevel(winters), best.scale() / 4, confidence, new double[] {0.2, 0.1}, (level, point) -> {
            Gev standard = new Gev(0, Math.exp(point[0]), point[1]);
            return MaximumLikelihood.negative(values, n, level - standard.ofExponential(e), standard.scale(), standard.shape());
        }, new double[] {Math.log(best.scale()), best.shape()}, new double[] {Math.log(best.scale()), 0});
    }

    /** Bounds of xi, within the limits of the search. */
    public double[] shape(double confidence) {
        double range = Arrays.stream(values, 0, n).max().orElseThrow() - Arrays.stream(values, 0, n).min().orElseThrow();
        return interval(best.shape(), 0.05, confidence, new double[] {best.scale() / 4, 0.2},
                (shape, point) -> MaximumLikelihood.negative(values, n, point[0], Math.exp(point[1]), shape),
                new double[] {best.location(), Math.log(best.scale())}, new double[] {best.location(), Math.log(range)});
    }

    /** Negative log-likelihood at a value of the quantity and of the other parameters. */
    private interface Loss {
        double of(double quantity, double[] others);
    }

    /**
     * @param likely where the search for the other parameters begins
     * @param possible where it begins when the likely point is impossible at the quantity
     */
    private double[] interval(double estimate, double step, double confidence, double[] simplex, Loss loss, double[] likely,
                              double[] possible) {
        double bearable = new ChiSquaredDistribution(null, 1).inverseCumulativeProbability(confidence) / 2;
        DoubleUnaryOperator excess = quantity -> {
            double[] start = Double.isFinite(loss.of(quantity, likely)) ? likely : possible;
            double[] found = Likelihood.lowest(point -> loss.of(quantity, point), start, simplex);
            return loss.of(quantity, found) - lowest - bearable;
        };
        return new double[] {end(estimate, -step, excess), end(estimate, step, excess)};
    }

    /** Goes outwards in growing steps until the loss is too large, then halves. */
    private static double end(double estimate, double firstStep, DoubleUnaryOperator excess) {
        double inside = estimate;
        double step = firstStep;
        double outside = estimate + step;
        for (int i = 0; !(excess.applyAsDouble(outside) > 0); i++) {
            if (i == MOST_STEPS) {
                return firstStep < 0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
            }
            inside = outside;
            step *= 1.5;
            outside += step;
        }
        for (int i = 0; i < MOST_STEPS && Math.abs(outside - inside) > 1e-7 * Math.abs(firstStep); i++) {
            double middle = (inside + outside) / 2;
            if (excess.applyAsDouble(middle) > 0) {
                outside = middle;
            } else {
                inside = middle;
            }
        }
        return (inside + outside) / 2;
    }
}
