package org.wintersill.damage;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fraction of buds killed by a temperature, through LT10, LT50 and LT90 (science 1.3).
 *
 * <p>Logistic: p(T) = 1 / (1 + exp((T - LT50) / s)), s = (LT10 - LT50) / ln 9 on the warm side of LT50 and s = (LT50 - LT90) / ln 9 on the
 * cold side. Probit: p(T) = Phi((LT50 - T) / sigma), sigma likewise with 1.2815516 (the distance of the 90th percentile from the middle)
 * for ln 9. Both are exact at the three points, continuous, and fall as T rises. The forms are textbook material; splitting them at
 * LT50 is the project's choice, so that a measured triple is reproduced. Logistic tails are heavier than probit ones; neither is cut off.
 *
 * <p>The symmetric curves are those of one spread: LT50 lies midway between LT10 and LT90, which is for the reader of a cultivar to see
 * to ({@link #isSymmetric}); from there on they are computed as split ones.
 */
public enum ToleranceCurve {
    /** Logistic with a spread of its own on each side. */
    SPLIT_LOGISTIC("split-logistic", false) {
        @Override
        public double fractionOfDeficit(double z) {
            return logistic(z);
        }
    },
    /** Logistic of one spread, from LT10 and LT90. */
    LOGISTIC("logistic", true) {
        @Override
        public double fractionOfDeficit(double z) {
            return logistic(z);
        }
    },
    /** Probit with a spread of its own on each side. */
    SPLIT_PROBIT("split-probit", false) {
        @Override
        public double fractionOfDeficit(double z) {
            return StandardNormal.probability(z);
        }
    },
    /** Probit of one spread, from LT10 and LT90. */
    PROBIT("probit", true) {
        @Override
        public double fractionOfDeficit(double z) {
            return StandardNormal.probability(z);
        }
    };

    /** ln 9: distance from 10 % to 50 % on the logit scale. */
    public static final double LN_9 = Math.log(9);
    /** Distance from 10 % to 50 % on the probit scale. */
    public static final double PROBIT_OF_90 = StandardNormal.quantile(0.9);
    /** Narrowest spread s of a logistic curve that is accepted, K (science 1.3, project choice). */
    public static final double NARROWEST_SPREAD = 0.05;

    private final String key;
    private final boolean symmetric;

    ToleranceCurve(String key, boolean symmetric) {
        this.key = key;
        this.symmetric = symmetric;
    }

    /** Word of the cultivar file. */
    public String key() {
        return key;
    }

    public static Optional<ToleranceCurve> named(String key) {
        return Arrays.stream(values()).filter(curve -> curve.key.equals(key)).findFirst();
    }

    public static List<String> keys() {
        return Arrays.stream(values()).map(ToleranceCurve::key).toList();
    }

    /** Whether LT50 is bound to lie midway between LT10 and LT90. */
    public boolean isSymmetric() {
        return symmetric;
    }

    /** Whether the curve is made of normal distributions. */
    public boolean isProbit() {
        return this == SPLIT_PROBIT || this == PROBIT;
    }

    /** Distance of LT10 or LT90 from LT50 in spreads: ln 9 or 1.2815516. */
    public double spreadsToTenth() {
        return isProbit() ? PROBIT_OF_90 : LN_9;
    }

    /** Spread of the warm side, s or sigma, K. */
    public double warmSpread(double lt10, double lt50) {
        return (lt10 - lt50) / spreadsToTenth();
    }

    /** Spread of the cold side, s or sigma, K. */
    public double coldSpread(double lt50, double lt90) {
        return (lt50 - lt90) / spreadsToTenth();
    }

    /** Fraction killed at temperature t, 0..1; NaN if anything is NaN. */
    public double killedFraction(double t, double lt10, double lt50, double lt90) {
        double spread = t > lt50 ? warmSpread(lt10, lt50) : coldSpread(lt50, lt90);
        return fractionOfDeficit((lt50 - t) / spread);
    }

    /** Fraction killed for a standardised deficit z = (LT50 - T) / spread: the logistic function or the normal probability. */
    public abstract double fractionOfDeficit(double z);

    /** The logistic function of z, in the form that cannot overflow. */
    static double logistic(double z) {
        double small = Math.exp(-Math.abs(z));
        return z >= 0 ? 1 / (1 + small) : small / (1 + small);
    }

    /**
     * Temperature that kills q percent: LT50 - s ln(q / (100 - q)), or LT50 - sigma z_q, with the spread of its side. Returns the given
     * LT10, LT50 and LT90 themselves for 10, 50 and 90, free of round-off.
     *
     * @param percent between 0 and 100, both excluded
     */
    public double lethalTemperature(double percent, double lt10, double lt50, double lt90) {
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
        return lt50 - spread * (isProbit() ? StandardNormal.quantile(percent / 100) : Math.log(percent / (100 - percent)));
    }
}
