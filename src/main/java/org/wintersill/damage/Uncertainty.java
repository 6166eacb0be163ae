package org.wintersill.damage;

import java.io.Serializable;
import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Normal uncertainty of a winter's margin, common to all buds of a cell and applied once a winter, to its worst night (science 5 and
 * 16.4): independent components such as the model's error and the site's, whose variances add up.
 *
 * @param components standard deviations by name, K; empty for none
 */
public record Uncertainty(SortedMap<String, Double> components) implements Serializable {
    /** Points of the quadrature (science 16.4). */
    private static final int POINTS = 32;
    private static final double[] SHIFTS;
    private static final double[] WEIGHTS;

    static {
        GaussHermite rule = new GaussHermite(POINTS);
        SHIFTS = rule.nodes();
        WEIGHTS = rule.weights();
        for (int j = 0; j < POINTS; j++) {
            SHIFTS[j] *= Math.sqrt(2);
            WEIGHTS[j] /= Math.sqrt(Math.PI);
        }
    }

    public Uncertainty {
        components = Collections.unmodifiableSortedMap(new TreeMap<>(components));
        components.forEach((name, sd) -> {
            if (!(sd >= 0) || Double.isInfinite(sd)) {
                throw new IllegalArgumentException(name + " has no standard deviation of " + sd);
            }
        });
    }

    /** No uncertainty. */
    public static Uncertainty none() {
        return new Uncertainty(new TreeMap<>());
    }

    /** All components together: root of the sum of squares, K. */
    public double sd() {
        double squares = 0;
        for (double sd : components.values()) {
            squares += sd * sd;
        }
        return Math.sqrt(squares);
    }

    /** Whether there is none. */
    public boolean isNone() {
        // Asked for every cell of a winter.
        return components.isEmpty() || sd() == 0;
    }

    /**
     * Probability that a margin is not above zero once the uncertainty is added: Phi(-margin / sd); with none, 1 for a margin up to
     * zero and 0 above.
     *
     * @param margin K
     */
    public static double probabilityNotAbove(double margin, double sd) {
        return sd == 0 ? margin <= 0 ? 1 : 0 : StandardNormal.probability(-margin / sd);
    }

    /**
     * Expected fraction killed, E p(T - e) with e normal of mean 0: 32-point Gauss-Hermite quadrature.
     *
     * @param margin T - LT50, K
     * @param warmInverse 1 / spread of the warm side, per K
     * @param coldInverse 1 / spread of the cold side, per K
     * @param sd standard deviation of e, K
     */
    public static double expectedFraction(ToleranceCurve curve, double margin, double warmInverse, double coldInverse, double sd) {
        double sum = 0;
        for (int j = 0; j < POINTS; j++) {
            double shifted = margin - sd * SHIFTS[j];
            sum += WEIGHTS[j] * curve.fractionOfDeficit(-shifted * (shifted > 0 ? warmInverse : coldInverse));
        }
        return sum;
    }
}
