package org.wintersill.climatology.extreme;

import org.apache.commons.math3.analysis.MultivariateFunction;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Maximum likelihood of a GEV over location, ln scale and xi, begun at the L-moment fit; |xi| is held at or below 0.5 (science 6.2,
 * project choice): beyond, the estimator has no ordinary properties on the bounded side.
 */
public final class MaximumLikelihood {
    /** Largest |xi| that is looked at. */
    public static final double LARGEST_SHAPE = 0.5;

    private MaximumLikelihood() {
    }

    /** The fit of the first n values. */
    public static Gev fit(double[] values, int n) {
        Gev start = start(values, n);
        double[] best = Likelihood.lowest(point -> negative(values, n, point[0], Math.exp(point[1]), point[2]),
                new double[] {start.location(), Math.log(start.scale()), start.shape()}, new double[] {start.scale() / 4, 0.2, 0.1});
        return new Gev(best[0], Math.exp(best[1]), best[2]);
    }

    /** The L-moment fit, or where it cannot have given the values, the Gumbel fit, which can have given anything. */
    static Gev start(double[] values, int n) {
        double[] sorted = java.util.Arrays.copyOf(values, n);
        java.util.Arrays.sort(sorted);
        LMoments moments = LMoments.of(sorted, n);
        Gev gev = moments.gev();
        boolean possible = gev.isFitted() && Math.abs(gev.shape()) < LARGEST_SHAPE - 0.01
                && Double.isFinite(gev.logLikelihood(values, n));
        return possible ? gev : moments.gumbel();
    }

    /** Negative log-likelihood; infinite for impossible parameters. */
    static double negative(double[] values, int n, double location, double scale, double shape) {
        if (Math.abs(shape) > LARGEST_SHAPE || !(scale > 0)) {
            return Double.POSITIVE_INFINITY;
        }
        double sum = n * Math.log(scale);
        for (int i = 0; i < n; i++) {
            double w = Gev.reduced(values[i], location, scale, shape);
            if (Double.isInfinite(w)) {
                return Double.POSITIVE_INFINITY;
            }
            sum += (1 + shape) * w + Math.exp(-w);
        }
        return sum;
    }

    /**
     * Covariance of location, scale and xi: inverse of the observed information, by central differences.
     *
     * @param gev a maximum of the likelihood
     * @return {@code [3][3]}, or NaN where the information has no inverse, as at the limits of xi
     */
    public static double[][] covariance(double[] values, int n, Gev gev) {
        double[] at = {gev.location(), gev.scale(), gev.shape()};
        double[] step = {1e-4 * gev.scale(), 1e-4 * gev.scale(), 1e-4};
        MultivariateFunction function = p -> negative(values, n, p[0], p[1], p[2]);
        RealMatrix information = new Array2DRowRealMatrix(3, 3);
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                double sum = 0;
                for (int a = -1; a <= 1; a += 2) {
                    for (int b = -1; b <= 1; b += 2) {
                        double[] point = at.clone();
                        point[i] += a * step[i];
                        point[j] += b * step[j];
                        sum += a * b * function.value(point);
                    }
                }
                information.setEntry(i, j, sum / (4 * step[i] * step[j]));
            }
        }
        double[][] covariance = new double[3][3];
        LUDecomposition parts = new LUDecomposition(information);
        boolean regular = Double.isFinite(information.getNorm()) && parts.getSolver().isNonSingular();
        for (double[] row : covariance) {
            java.util.Arrays.fill(row, Double.NaN);
        }
        return regular ? parts.getSolver().getInverse().getData() : covariance;
    }

    /** Standard error of a return level by the delta method; symmetric, so too short on the far side for long periods. */
    public static double returnLevelError(Gev gev, double[][] covariance, double winters) {
        double[] gradient = new double[3];
        double[] at = {gev.location(), gev.scale(), gev.shape()};
        double[] step = {1e-5 * gev.scale(), 1e-5 * gev.scale(), 1e-5};
        for (int i = 0; i < 3; i++) {
            double[] up = at.clone();
            double[] down = at.clone();
            up[i] += step[i];
            down[i] -= step[i];
            gradient[i] = (new Gev(up[0], up[1], up[2]).returnLevel(winters) - new Gev(down[0], down[1], down[2]).returnLevel(winters))
                    / (2 * step[i]);
        }
        double variance = 0;
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                variance += gradient[i] * covariance[i][j] * gradient[j];
            }
        }
        return Math.sqrt(variance);
    }
}
