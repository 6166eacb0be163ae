package org.wintersill.damage;

import java.io.Serializable;

/**
 * How the nights of a winter are joined to the damage of the winter (science 4), p_i being the fraction that night i alone would kill.
 *
 * <p>{@code WORST}: D = max p_i; a bud keeps its rank in the tolerance distribution all winter. {@code INDEPENDENT}:
 * D = 1 - prod(1 - p_i); each night draws fresh tolerances, an upper bound for sensitivity studies. {@code CORRELATED}: between the two,
 * an exchangeable Gaussian copula, D = 1 - integral of prod Phi((sqrt(rho) u - z_i) / sqrt(1 - rho)) phi(u) du, z_i = Phi^-1(p_i).
 *
 * @param rule which of the three
 * @param correlation rho, above 0 and up to {@link #HIGHEST_CORRELATION} where the rule is {@code CORRELATED}; otherwise 0
 */
public record NightJoining(Rule rule, double correlation) implements Serializable {
    /** Beyond it the integral needs ever more points, and the worst night is as good an answer (project choice). */
    public static final double HIGHEST_CORRELATION = 0.99;
    /** The damage of the worst night. */
    public static final NightJoining WORST_NIGHT = new NightJoining(Rule.WORST, 0);

    /** The three rules. */
    public enum Rule {
        WORST, INDEPENDENT, CORRELATED;

        /** Word of the run file. */
        public String key() {
            return name().toLowerCase(java.util.Locale.ROOT);
        }
    }

    public NightJoining {
        boolean inside = correlation > 0 && correlation <= HIGHEST_CORRELATION;
        if (rule == Rule.CORRELATED ? !inside : correlation != 0) {
            throw new IllegalArgumentException(rule + " with correlation " + correlation);
        }
    }

    /** Whether one night decides. */
    public boolean isWorst() {
        return rule == Rule.WORST;
    }
}
