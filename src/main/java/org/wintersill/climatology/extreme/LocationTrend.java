package org.wintersill.climatology.extreme;

import org.apache.commons.math3.special.Gamma;
import org.apache.commons.math3.stat.regression.SimpleRegression;

/**
 * A GEV whose location moves in a straight line, mu(t) = mu0 + mu1 (t - mean of t), against one that stands still: likelihood ratio
 * with one degree of freedom (science 6.2).
 *
 * @param gev the distribution at the mean time
 * @param slope mu1, unit of the values per unit of time
 * @param logLikelihood with trend
 * @param ratio twice the gain in log-likelihood
 * @param pValue probability of such a gain without a trend
 */
public record LocationTrend(Gev gev, double slope, double logLikelihood, double ratio, double pValue) {

    /**
     * Fits the trend.
     *
     * @param times not all equal
     * @param maxima the first n of both count
     * @param still maximum likelihood fit without a trend
     */
    public static LocationTrend of(double[] times, double[] maxima, int n, Gev still) {
        double mean = 0;
        for (int i = 0; i < n; i++) {
            mean += times[i] / n;
        }
        double spread = 0;
        SimpleRegression line = new SimpleRegression();
        for (int i = 0; i < n; i++) {
            spread += (times[i] - mean) * (times[i] - mean) / n;
            line.addData(times[i] - mean, maxima[i]);
        }
        double unit = Math.sqrt(spread);
        double[] moved = new double[n];
        double centre = mean;
        org.apache.commons.math3.analysis.MultivariateFunction loss = point -> {
            for (int i = 0; i < n; i++) {
                moved[i] = maxima[i] - point[3] * (times[i] - centre) / unit;
            }
            return MaximumLikelihood.negative(moved, n, point[0], Math.exp(point[1]), point[2]);
        };
        double[] level = {still.location(), Math.log(still.scale()), still.shape(), 0};
        double[] steps = {still.scale() / 4, 0.2, 0.1, still.scale() / 4};
        double[] best = Likelihood.lowest(loss, level, steps);
        for (int i = 0; i < n; i++) {
            moved[i] = maxima[i] - line.getSlope() * (times[i] - centre);
        }
        Gev start = MaximumLikelihood.start(moved, n);
        double[] other = Likelihood.lowest(loss, new double[] {start.location(), Math.log(start.scale()), start.shape(),
            line.getSlope() * unit}, steps);
        if (loss.value(other) < loss.value(best)) {
            best = other;
        }
        double likelihood = -loss.value(best);
        double ratio = Math.max(0, 2 * (likelihood - still.logLikelihood(maxima, n)));
        return new LocationTrend(new Gev(best[0], Math.exp(best[1]), best[2]), best[3] / unit, likelihood, ratio,
                Gamma.regularizedGammaQ(0.5, ratio / 2));
    }
}
