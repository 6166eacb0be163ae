package org.wintersill.damage;

/**
 * Fraction of buds killed by a temperature, through LT10, LT50 and LT90 (science 1.3).
 *
 * <p>Split logistic: p(T) = 1 / (1 + exp((T - LT50) / s)) with s = s_w = (LT10 - LT50) / ln 9 on the warm side of LT50 and
 * s = s_c = (LT50 - LT90) / ln 9 on the cold side. It is exact at the three points, continuous, and falls as T rises.
 * The logistic form is textbook material; splitting it at LT50 is the project's choice, so that a measured triple is
 * reproduced. Tails are not cut off.
 */
public final class ToleranceCurve {
    /** ln 9: distance from 10 % to 50 % on the logit scale. */
    public static final double LN_9 = Math.log(9);
    /** Narrowest spread that is accepted, K (science 1.3, project choice). */
    public static final double NARROWEST_SPREAD = 0.05;

    private ToleranceCurve() {
    }

    /** Spread s_w of the warm side, K. */
    public static double warmSpread(double lt10, double lt50) {
        return (lt10 - lt50) / LN_9;
    }

    /** Spread s_c of the cold side, K. */
    public static double coldSpread(double lt50, double lt90) {
        return (lt50 - lt90) / LN_9;
    }

    /** Fraction killed at temperature t, 0..1; NaN if anything is NaN. */
    public static double killedFraction(double t, double lt10, double lt50, double lt90) {
        double spread = t > lt50 ? warmSpread(lt10, lt50) : coldSpread(lt50, lt90);
        return fractionOfDeficit((lt50 - t) / spread);
    }

    /**
     * Fraction killed for a standardised deficit z = (LT50 - T) / s: the logistic function, in the form that cannot
     * overflow.
     */
    public static double fractionOfDeficit(double z) {
        double small = Math.exp(-Math.abs(z));
        return z >= 0 ? 1 / (1 + small) : small / (1 + small);
    }

    /**
     * Temperature that kills q percent: LT50 - s ln(q / (100 - q)) with the spread of its side. Returns the given
     * LT10, LT50 and LT90 themselves for 10, 50 and 90, free of round-off.
     *
     * @param percent between 0 and 100, both excluded
     */
    public static double lethalTemperature(double percent, double lt10, double lt50, double lt90) {
        if (percent == 10) {
            return lt10;
        }
        if (percent == 50) {
            return lt50;
        }
        if (percent == 90) {
            return lt90;
        }
        double spread = percent < 50 ? warmSpread(lt10, lt50) : coldSpread(lt50, lt90);
        return lt50 - spread * Math.log(percent / (100 - percent));
    }
}
