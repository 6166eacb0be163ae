package org.wintersill.climatology.statistic;

import java.util.Arrays;
import java.util.Optional;

/** How a required hardiness is found (science section 8). */
public enum HardinessRule {
    /** At most a target share of winters kills. */
    FREQUENCY("frequency"),
    /** The target's percentile of the margins is raised to zero. */
    QUANTILE("quantile"),
    /** The expected fraction of buds killed falls to the target. */
    EXPECTED_DAMAGE("expected-damage");

    private final String key;

    HardinessRule(String key) {
        this.key = key;
    }

    /** The rule of a word of the run file. */
    public static Optional<HardinessRule> named(String key) {
        return Arrays.stream(values()).filter(rule -> rule.key.equals(key)).findFirst();
    }
}
