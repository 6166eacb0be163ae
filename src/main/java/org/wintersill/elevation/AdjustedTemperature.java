package org.wintersill.elevation;

/**
 * What is brought to the target cells, and how much of what belongs to the night it gets. Cooling by pools, warming by water and the
 * night's own lapse rate belong to the minimum (science 7.3 to 7.5); the maximum of the day keeps the prior lapse rate and gets none of
 * it, and the daily mean, half of the sum of both, gets half. The exposure of buds belongs to no temperature of the air.
 */
public enum AdjustedTemperature {
    /** Tmin as the plant meets it. */
    MINIMUM(1, true),
    /** Tmin of the air, for daily means. */
    AIR_MINIMUM(1, false),
    MEAN(0.5f, false),
    MAXIMUM(0, false);

    private final float share;
    private final boolean exposed;

    AdjustedTemperature(float share, boolean exposed) {
        this.share = share;
        this.exposed = exposed;
    }

    /** Share of what belongs to the night, 0..1. */
    float share() {
        return share;
    }

    boolean isExposed() {
        return exposed;
    }
}
