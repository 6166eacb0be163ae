package org.wintersill.season;

import java.util.Arrays;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.StandardNormal;
import org.wintersill.damage.ToleranceCurve;

/**
 * Running survival of a lane of cells where all nights of a winter count: independent, or correlated through a Gaussian copula (science
 * 4). Nights must come one by one in the order of time, so that the last digits do not depend on how the work was cut up.
 *
 * <p>The integral over u is the trapezoidal sum from -6.5 to 6.5, whose steps follow the width sqrt((1 - rho) / rho) of the integrand:
 * the sum differs from the integral by less than 1e-9. Nights that kill less than 1e-12 of the buds are left out of it, which
 * changes the damage by less than 1e-9 in all.
 */
final class JoinedNights {
    private static final double FARTHEST = 6.5;
    private static final double WIDEST_STEP = 0.4;
    private static final double STEPS_OF_WIDTH = 0.22;
    private static final double NEGLIGIBLE = 1e-12;

    private final boolean correlated;
    private final int points;
    /** sqrt(rho / (1 - rho)) u of each point. */
    private final double[] shifts;
    private final double[] weights;
    private final double scale;
    /** {@code [cell * points + point]}: product over the nights of the fraction that survives. */
    private final double[] alive;

    /** @param nights independent or correlated */
    JoinedNights(NightJoining nights, int cells) {
        correlated = nights.rule() == NightJoining.Rule.CORRELATED;
        points = points(nights);
        shifts = new double[points];
        weights = new double[points];
        double rho = nights.correlation();
        scale = 1 / Math.sqrt(1 - rho);
        weights[0] = 1;
        for (int k = 0; correlated && k < points; k++) {
            double u = (k - points / 2) * step(rho);
            shifts[k] = Math.sqrt(rho) * scale * u;
            weights[k] = step(rho) * Math.exp(-u * u / 2) / Math.sqrt(2 * Math.PI);
        }
        alive = new double[Math.multiplyExact(points, cells)];
        begin();
    }

    private static double step(double rho) {
        return Math.min(WIDEST_STEP, STEPS_OF_WIDTH * Math.sqrt((1 - rho) / rho));
    }

    /** Running values of a cell. */
    static int points(NightJoining nights) {
        return nights.rule() == NightJoining.Rule.CORRELATED ? 2 * (int) Math.ceil(FARTHEST / step(nights.correlation())) + 1 : 1;
    }

    void begin() {
        Arrays.fill(alive, 1);
    }

    /**
     * Takes one night.
     *
     * @param margin {@code [cell]}: standardised, (T - LT50) / spread; infinite or NaN where the night has no value
     */
    void accept(ToleranceCurve curve, float[] margin, int cells) {
        for (int i = 0; i < cells; i++) {
            double survive = curve.fractionOfDeficit(margin[i]);
            if (!(survive < 1)) {
                continue;
            }
            if (correlated) {
                acceptCorrelated(curve, margin[i], survive, i * points);
            } else {
                alive[i] *= survive;
            }
        }
    }

    private void acceptCorrelated(ToleranceCurve curve, float margin, double survive, int first) {
        double killed = curve.fractionOfDeficit(-(double) margin);
        if (killed < NEGLIGIBLE) {
            return;
        }
        double z = curve.isProbit() ? -(double) margin : killed <= 0.5 ? StandardNormal.quantile(killed) : -StandardNormal.quantile(survive);
        for (int k = 0; k < points; k++) {
            alive[first + k] *= StandardNormal.probability(shifts[k] - z * scale);
        }
    }

    /** Fraction of buds killed so far, 0..1. */
    double damage(int cell) {
        double killed = 0;
        for (int k = 0; k < points; k++) {
            killed += weights[k] * (1 - alive[cell * points + k]);
        }
        return Math.min(1, killed);
    }
}
