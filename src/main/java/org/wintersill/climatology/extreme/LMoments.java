package org.wintersill.climatology.extreme;

/**
 * Sample L-moments by unbiased probability-weighted moments (science 6.2; Hosking 1990, Journal of the Royal Statistical Society B
 * 52:105, from memory).
 *
 * @param first l1, the mean
 * @param second l2, half of Gini's mean difference
 * @param skewness t3 = l3 / l2; NaN where all values are equal
 */
public record LMoments(double first, double second, double skewness) {

    /**
     * L-moments of a sample.
     *
     * @param sorted ascending; the first n count
     * @param n at least 3
     */
    public static LMoments of(double[] sorted, int n) {
        double b0 = 0;
        double b1 = 0;
        double b2 = 0;
        for (int i = 0; i < n; i++) {
            double x = sorted[i];
            double once = i * x;
            b0 += x;
            b1 += once;
            b2 += (i - 1) * once;
        }
        b0 /= n;
        b1 /= (double) n * (n - 1);
        b2 /= (double) n * (n - 1) * (n - 2);
        double l2 = 2 * b1 - b0;
        double l3 = 6 * b2 - 6 * b1 + b0;
        return new LMoments(b0, l2, l2 > 0 ? l3 / l2 : Double.NaN);
    }

    /** Gumbel distribution (xi = 0) with the first two L-moments. */
    public Gev gumbel() {
        double scale = second / LN_2;
        return second > 0 ? new Gev(first - EULER * scale, scale, 0) : Gev.NONE;
    }

    /** GEV with these L-moments, by {@link #shapeOf}. */
    public Gev gev() {
        return withShape(shapeOf(skewness));
    }

    private static final double LN_2 = Math.log(2);
    /** Euler's constant. */
    private static final double EULER = 0.57721566490153286;
    /** Below this the formulas of the general case lose their digits. */
    private static final double NEARLY_GUMBEL = 1e-6;

    /** GEV with the first two L-moments and Hosking's k = -xi. */
    Gev withShape(double k) {
        if (!(second > 0) || !(k > -1)) {
            return Gev.NONE;
        }
        if (Math.abs(k) < NEARLY_GUMBEL) {
            return gumbel();
        }
        double gamma = org.apache.commons.math3.special.Gamma.gamma(1 + k);
        double scale = second * k / (-Math.expm1(-k * LN_2) * gamma);
        return new Gev(first - scale * (1 - gamma) / k, scale, -k);
    }

    /**
     * Hosking's k from t3: the four-term form where it holds, -0.1 &lt;= t3 &lt;= 0.5, the two-term form of Hosking, Wallis and Wood
     * elsewhere.
     */
    static double shapeOf(double t3) {
        return t3 >= -0.1 && t3 <= 0.5 ? fourTermShape(t3) : twoTermShape(t3);
    }

    /** Hosking, Wallis and Wood 1985, Technometrics 27:251; coefficients from memory, within 1e-3 of the exact root. */
    static double twoTermShape(double t3) {
        double c = 2 / (3 + t3) - LN_2 / Math.log(3);
        return c * (7.8590 + 2.9554 * c);
    }

    /** Four-term refinement, printed in the documentation of an R package on L-moments; for -0.1 &lt;= t3 &lt;= 0.5. */
    static double fourTermShape(double t3) {
        double c = 2 / (3 + t3) - LN_2 / Math.log(3);
        return c * (7.817740 + c * (2.930462 + c * (13.641492 + 17.206675 * c)));
    }
}
