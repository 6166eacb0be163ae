package org.wintersill.elevation;

/**
 * Regression of temperature on height in one window, and its shrinkage to a prior (science 7.3)
 * <pre>
 * g = -slope      se^2 = s^2 / Sxx, s^2 = residual sum of squares / (n - 2)
 * w = t0^2 / (t0^2 + se^2)      g* = w g + (1 - w) g0, within the bounds of {@link LapseRates}
 * </pre>
 *
 * @param lapse g, K/km, positive when higher is colder
 * @param squaredError se^2, (K/km)^2
 * @param atSeaLevel intercept, degC
 * @param determination r^2, 0..1
 */
public record LapseFit(double lapse, double squaredError, double atSeaLevel, double determination) {

    /**
     * The fit from sums over at least three cells of not all the same height.
     *
     * @param z km
     * @param t degC
     */
    public static LapseFit of(double n, double z, double t, double zz, double zt, double tt) {
        double sxx = zz - z * z / n;
        double sxy = zt - z * t / n;
        double syy = tt - t * t / n;
        double slope = sxy / sxx;
        double residual = Math.max(0, syy - slope * sxy);
        return new LapseFit(-slope, residual / (n - 2) / sxx, (t - slope * z) / n, syy > 0 ? 1 - residual / syy : 0);
    }

    /**
     * g*, K/km.
     *
     * @param prior g0, K/km
     * @param priorSd t0, K/km, positive
     */
    public double shrunk(double prior, double priorSd) {
        double weight = weight(priorSd);
        return bounded(weight * lapse + (1 - weight) * prior);
    }

    /** w, 0..1: how much the window's own regression counts. */
    public double weight(double priorSd) {
        return priorSd * priorSd / (priorSd * priorSd + squaredError);
    }

    /** A lapse rate within the bounds of estimates. */
    public static double bounded(double lapse) {
        return Math.max(LapseRates.LOWEST, Math.min(LapseRates.HIGHEST, lapse));
    }
}
