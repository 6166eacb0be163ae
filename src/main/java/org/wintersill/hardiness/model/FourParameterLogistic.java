package org.wintersill.hardiness.model;

import java.io.Serializable;

/**
 * Logistic on the plain scale: {@code f(x) = c + (d - c) / (1 + exp(b (x - e)))}; f(e) = (c + d) / 2, slope there -b (d - c) / 4.
 *
 * <p>Source: Ritz et al. 2015, PLoS ONE 10:e0146021, whose log-logistic form is this one in ln x (science 2.1). Defined for every x.
 * Here x is a trailing mean temperature and f a lethal temperature, both degC: c is the tender limit of warm weather, d the hardy limit
 * of cold weather.
 *
 * @param b steepness, 1/K, positive
 * @param c limit for large x
 * @param d limit for small x
 * @param e x of the middle
 */
public record FourParameterLogistic(double b, double c, double d, double e) implements Serializable {
    /** Beyond it the logistic function is 0 or 1 to the last digit. */
    private static final double FARTHEST = 40;
    /** exp(z) = exp(z / 64)^64, six squarings. */
    private static final double PART = 1.0 / 64;

    /** Value at x. */
    public double at(double x) {
        return c + (d - c) / (1 + Math.exp(b * (x - e)));
    }

    /** x where the value is y: {@code e + ln((d - c) / (y - c) - 1) / b}; NaN unless y lies strictly between c and d. */
    public double inverse(double y) {
        double ratio = (d - c) / (y - c);
        return ratio > 1 ? e + Math.log(ratio - 1) / b : Double.NaN;
    }

    /** values[i] = f(x[i]), to about 1e-13 of (d - c); NaN stays NaN. */
    void at(double[] x, double[] values, int cells) {
        exponents(x, b * PART, e, values, cells);
        values(values, c, d - c, cells);
    }

    /** The exponential of the exponent's 64th part, at most 0.625, by its Taylor series to degree 13: 1 / k!, exact to 2e-14. */
    private static void exponents(double[] x, double steepness, double middle, double[] exp, int cells) {
        for (int i = 0; i < cells; i++) {
            double u = Math.min(FARTHEST * PART, Math.max(-FARTHEST * PART, steepness * (x[i] - middle)));
            double high = 1.0 / 40320 + u * (1.0 / 362880 + u * (1.0 / 3628800 + u * (1.0 / 39916800 + u * (1.0 / 479001600
                    + u * (1.0 / 6227020800L)))));
            double low = 1.0 / 24 + u * (1.0 / 120 + u * (1.0 / 720 + u * (1.0 / 5040 + u * high)));
            exp[i] = 1 + u * (1 + u * (1.0 / 2 + u * (1.0 / 6 + u * low)));
        }
    }

    private static void values(double[] exp, double limit, double span, int cells) {
        for (int i = 0; i < cells; i++) {
            double y = exp[i] * exp[i];
            y *= y;
            y *= y;
            y *= y;
            y *= y;
            y *= y;
            exp[i] = limit + span / (1 + y);
        }
    }
}
