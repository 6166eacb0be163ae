package org.wintersill.damage;

/**
 * The normal distribution of mean 0 and standard deviation 1.
 *
 * <p>Sources, coefficients from memory, values held to scipy by a test: probability by Hart's rational approximation 5666 as given by
 * G. West, Better approximations to cumulative normal functions, Wilmott Magazine, May 2005; quantile by algorithm AS 241, PPND16,
 * M. J. Wichura, Applied Statistics 37 (1988), 477-484.
 */
public final class StandardNormal {
    /** Beyond this the probability is below the smallest double. */
    private static final double FARTHEST = 38;
    /** From here on the continued fraction is better than the rational approximation. */
    private static final double TAIL = 7.07106781186547;
    private static final double ROOT_OF_TWO_PI = Math.sqrt(2 * Math.PI);
    private static final double[] ABOVE = {3.52624965998911e-2, 0.700383064443688, 6.37396220353165, 33.912866078383, 112.079291497871,
        221.213596169931, 220.206867912376};
    private static final double[] BELOW = {8.83883476483184e-2, 1.75566716318264, 16.064177579207, 86.7807322029461, 296.564248779674,
        637.333633378831, 793.826512519948, 440.413735824752};

    private static final double[] CENTRE_ABOVE = {2.5090809287301226727e+3, 3.3430575583588128105e+4, 6.7265770927008700853e+4,
        4.5921953931549871457e+4, 1.3731693765509461125e+4, 1.9715909503065514427e+3, 1.3314166789178437745e+2, 3.3871328727963666080e0};
    private static final double[] CENTRE_BELOW = {5.2264952788528545610e+3, 2.8729085735721942674e+4, 3.9307895800092710610e+4,
        2.1213794301586595867e+4, 5.3941960214247511077e+3, 6.8718700749205790830e+2, 4.2313330701600911252e+1, 1};
    private static final double[] MIDDLE_ABOVE = {7.74545014278341407640e-4, 2.27238449892691845833e-2, 2.41780725177450611770e-1,
        1.27045825245236838258e0, 3.64784832476320460504e0, 5.76949722146069140550e0, 4.63033784615654529590e0, 1.42343711074968357734e0};
    private static final double[] MIDDLE_BELOW = {1.05075007164441684324e-9, 5.47593808499534494600e-4, 1.51986665636164571966e-2,
        1.48103976427480074590e-1, 6.89767334985100004550e-1, 1.67638483018380384940e0, 2.05319162663775882187e0, 1};
    private static final double[] TAIL_ABOVE = {2.01033439929228813265e-7, 2.71155556874348757815e-5, 1.24266094738807843860e-3,
        2.65321895265761230930e-2, 2.96560571828504891230e-1, 1.78482653991729133580e0, 5.46378491116411436990e0, 6.65790464350110377720e0};
    private static final double[] TAIL_BELOW = {2.04426310338993978564e-15, 1.42151175831644588870e-7, 1.84631831751005468180e-5,
        7.86869131145613259100e-4, 1.48753612908506148525e-2, 1.36929880922735805310e-1, 5.99832206555887937690e-1, 1};

    private StandardNormal() {
    }

    /** Probability of a value up to x, with an absolute error below 1e-15; NaN for NaN. */
    public static double probability(double x) {
        double far = Math.abs(x);
        double tail;
        if (far > FARTHEST) {
            tail = 0;
        } else if (far < TAIL) {
            tail = Math.exp(-far * far / 2) * polynomial(ABOVE, far) / polynomial(BELOW, far);
        } else {
            tail = Math.exp(-far * far / 2) / (far + 1 / (far + 2 / (far + 3 / (far + 4 / (far + 0.65))))) / ROOT_OF_TWO_PI;
        }
        return x > 0 ? 1 - tail : tail;
    }

    /** The value that is not exceeded with probability p, with a relative error below 1e-15; infinite for 0 and 1. */
    public static double quantile(double p) {
        double fromHalf = p - 0.5;
        if (Math.abs(fromHalf) <= 0.425) {
            double r = 0.180625 - fromHalf * fromHalf;
            return fromHalf * polynomial(CENTRE_ABOVE, r) / polynomial(CENTRE_BELOW, r);
        }
        double tail = Math.min(p, 1 - p);
        if (tail <= 0) {
            return fromHalf < 0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
        }
        double r = Math.sqrt(-Math.log(tail));
        double far = r <= 5 ? polynomial(MIDDLE_ABOVE, r - 1.6) / polynomial(MIDDLE_BELOW, r - 1.6)
                : polynomial(TAIL_ABOVE, r - 5) / polynomial(TAIL_BELOW, r - 5);
        return fromHalf < 0 ? -far : far;
    }

    /** Coefficients from the highest power down. */
    private static double polynomial(double[] coefficients, double x) {
        double sum = 0;
        for (double coefficient : coefficients) {
            sum = sum * x + coefficient;
        }
        return sum;
    }
}
