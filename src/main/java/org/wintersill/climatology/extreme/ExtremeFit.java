package org.wintersill.climatology.extreme;

import java.util.Optional;

/**
 * A fit of maxima with the rules for short records (science 6.2, project choices): nothing below 20 winters; from 20 to 39 winters
 * L-moments, and a Gumbel distribution in place of a GEV whose |xi| is above 0.4; from 40 winters either estimator.
 *
 * @param gev the distribution; {@link Gev#NONE} where nothing could be fitted
 * @param kind what it is
 * @param general the GEV itself, even where a Gumbel distribution took its place: intervals must not hide how little a short
 *                record says of the shape
 */
public record ExtremeFit(Gev gev, Kind kind, Gev general) {
    /** Fewest winters for a fit. */
    public static final int FEWEST_WINTERS = 20;
    /** Fewest winters for maximum likelihood. */
    public static final int FEWEST_FOR_LIKELIHOOD = 40;
    /** Largest |xi| that a short record is believed. */
    public static final double LARGEST_SHAPE = 0.4;

    /** What was fitted. */
    public enum Kind { NONE, GUMBEL_FALLBACK, L_MOMENTS, MAXIMUM_LIKELIHOOD }

    /** How the parameters are estimated. */
    public enum Method {
        L_MOMENTS("l-moments"), MAXIMUM_LIKELIHOOD("maximum-likelihood");

        private final String key;

        Method(String key) {
            this.key = key;
        }

        /** The method of a word of the run file; {@code auto} is L-moments. */
        public static Optional<Method> named(String key) {
            for (Method method : values()) {
                if (method.key.equals(key)) {
                    return Optional.of(method);
                }
            }
            return key.equals("auto") ? Optional.of(L_MOMENTS) : Optional.empty();
        }

        public String key() {
            return key;
        }
    }

    private static final ExtremeFit NOTHING = new ExtremeFit(Gev.NONE, Kind.NONE, Gev.NONE);

    /**
     * Fits a sample.
     *
     * @param sorted maxima, ascending; the first n count
     */
    public static ExtremeFit of(double[] sorted, int n, Method method) {
        if (n < FEWEST_WINTERS) {
            return NOTHING;
        }
        LMoments moments = LMoments.of(sorted, n);
        if (!(moments.second() > 0)) {
            return NOTHING;
        }
        if (n >= FEWEST_FOR_LIKELIHOOD && method == Method.MAXIMUM_LIKELIHOOD) {
            Gev likeliest = MaximumLikelihood.fit(sorted, n);
            return new ExtremeFit(likeliest, Kind.MAXIMUM_LIKELIHOOD, likeliest);
        }
        Gev gev = moments.gev();
        if (!gev.isFitted() || n < FEWEST_FOR_LIKELIHOOD && Math.abs(gev.shape()) > LARGEST_SHAPE) {
            return new ExtremeFit(moments.gumbel(), Kind.GUMBEL_FALLBACK, gev.isFitted() ? gev : moments.gumbel());
        }
        return new ExtremeFit(gev, Kind.L_MOMENTS, gev);
    }
}
