package org.wintersill.climatology.extreme;

/**
 * Generalised extreme value distribution of maxima (science 6.2; Coles 2001, An Introduction to Statistical Modeling of Extreme
 * Values, from memory; values checked against R evd and scipy):
 *
 * <pre>G(x) = exp(-(1 + xi z)^(-1/xi)),  z = (x - location) / scale;   xi = 0: exp(-exp(-z))</pre>
 *
 * <p>Written with {@code expm1} and {@code log1p}, so that it passes smoothly through xi = 0.
 *
 * @param location in the unit of the values
 * @param scale in the unit of the values, positive
 * @param shape xi; negative: bounded above
 */
public record Gev(double location, double scale, double shape) {
    /** Stands where nothing could be fitted. */
    public static final Gev NONE = new Gev(Double.NaN, Double.NaN, Double.NaN);

    public boolean isFitted() {
        return scale > 0;
    }

    /** Reduced variate w with G = exp(-exp(-w)): -infinity below, +infinity above the support. */
    double reduced(double x) {
        return reduced(x, location, scale, shape);
    }

    /** The same for parameters that are being searched for. */
    static double reduced(double x, double location, double scale, double shape) {
        double z = (x - location) / scale;
        if (shape == 0) {
            return z;
        }
        double y = shape * z;
        if (y <= -1) {
            return shape > 0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
        }
        return Math.log1p(y) / shape;
    }

    /** G(x): probability that a winter's maximum is not above x. */
    public double probability(double x) {
        return Math.exp(-Math.exp(-reduced(x)));
    }

    /** 1 - G(x), exact where it is small. */
    public double exceedance(double x) {
        return -Math.expm1(-Math.exp(-reduced(x)));
    }

    /** The value that is not exceeded with probability p, 0..1; the ends of the support for 0 and 1. */
    public double quantile(double p) {
        return ofExponential(-Math.log(p));
    }

    /**
     * The value whose non-exceedance is exp(-e): quantile of a standard exponential variate, the largest e giving the lowest
     * value.
     */
    double ofExponential(double e) {
        double w = -Math.log(e);
        return location + scale * (shape == 0 ? w : Math.expm1(shape * w) / shape);
    }

    /** Value exceeded on average once in so many winters, more than one. */
    public double returnLevel(double winters) {
        return ofExponential(-Math.log1p(-1 / winters));
    }

    /** Natural logarithm of the density; -infinity outside of the support. */
    public double logDensity(double x) {
        double w = reduced(x);
        return Double.isInfinite(w) ? Double.NEGATIVE_INFINITY : -Math.log(scale) - (1 + shape) * w - Math.exp(-w);
    }

    /** Log-likelihood of the first n values. */
    public double logLikelihood(double[] values, int n) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += logDensity(values[i]);
        }
        return sum;
    }

    /** Highest possible value; infinite unless xi is negative. */
    public double upperEnd() {
        return shape < 0 ? location - scale / shape : isFitted() ? Double.POSITIVE_INFINITY : Double.NaN;
    }
}
