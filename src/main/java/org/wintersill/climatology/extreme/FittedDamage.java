package org.wintersill.climatology.extreme;

import java.util.Arrays;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.wintersill.damage.ToleranceCurve;

/**
 * Expected fraction of buds killed in a winter whose lowest margin follows a fitted distribution: the tolerance curve integrated over it (science 6.2, E = integral of p over the quantiles; by parts: of the distribution over the curve).
 *
 * <p>With F(m) the probability that a winter's margin is at or below m, and q(m) the density of the tolerance curve,
 * E = integral of F(m) q(m) dm. Each side of the split curve is integrated by itself, in Gauss and Legendre panels whose joints lie
 * where curve and distribution bend, so that neither a steep curve nor a narrow distribution is stepped over.
 */
public final class FittedDamage {
    private static final GaussIntegrator RULE = new GaussIntegratorFactory().legendre(10, -1, 1);
    /** Joints in spreads of the curve; beyond the last less than 1e-15 of it is left. */
    private static final double[] CURVE_JOINTS = {0, 1, 2.5, 5, 10, 20, 36};
    private static final double[] DISTRIBUTION_JOINTS = {1e-9, 1e-6, 1e-4, 0.01, 0.1, 0.35, 0.7, 0.93, 0.99, 0.9999, 1};

    private static final double ROOT_OF_TWO_PI = Math.sqrt(2 * Math.PI);

    private FittedDamage() {
    }

    /**
     * Expected damage.
     *
     * @param negatedMargins distribution of -M
     * @param curve form of the tolerance curve
     * @param warmSpread of the tolerance curve above LT50, K
     * @param coldSpread below, K
     */
    public static double expected(Gev negatedMargins, ToleranceCurve curve, double warmSpread, double coldSpread) {
        if (!negatedMargins.isFitted() || !(warmSpread > 0) || !(coldSpread > 0)) {
            return Double.NaN;
        }
        return side(negatedMargins, curve, warmSpread) + side(negatedMargins, curve, -coldSpread);
    }

    /** @param spread positive for the warm side, margins above zero, negative for the cold side */
    private static double side(Gev gev, ToleranceCurve curve, double spread) {
        double[] joints = Arrays.copyOf(CURVE_JOINTS, CURVE_JOINTS.length + DISTRIBUTION_JOINTS.length);
        double last = CURVE_JOINTS[CURVE_JOINTS.length - 1];
        for (int i = 0; i < DISTRIBUTION_JOINTS.length; i++) {
            double steps = -gev.quantile(DISTRIBUTION_JOINTS[i]) / spread;
            joints[CURVE_JOINTS.length + i] = Math.max(0, Math.min(last, steps));
        }
        Arrays.sort(joints);
        double sum = 0;
        for (int panel = 1; panel < joints.length; panel++) {
            double half = (joints[panel] - joints[panel - 1]) / 2;
            double middle = (joints[panel] + joints[panel - 1]) / 2;
            if (half > 0) {
                for (int i = 0; i < RULE.getNumberOfPoints(); i++) {
                    double t = middle + half * RULE.getPoint(i);
                    sum += half * RULE.getWeight(i) * gev.exceedance(-spread * t) * density(curve, t);
                }
            }
        }
        return sum;
    }

    /** Slope of the curve, in spreads, at so many spreads from its middle. */
    private static double density(ToleranceCurve curve, double t) {
        if (curve.isProbit()) {
            return Math.exp(-t * t / 2) / ROOT_OF_TWO_PI;
        }
        double tail = Math.exp(-t);
        return tail / ((1 + tail) * (1 + tail));
    }
}
