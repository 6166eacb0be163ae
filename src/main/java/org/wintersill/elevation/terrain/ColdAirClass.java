package org.wintersill.elevation.terrain;

import java.util.Arrays;
import java.util.Optional;

/**
 * Whether ground is prone to cold-air pools: flat, low among its neighbours and concave. The idea is that of Lundquist, Pepin and
 * Rochford 2008, JGR 113 D22107; the limits are ours (science 7.4): their own were not verified.
 */
public enum ColdAirClass {
    /** Slope below 30 degrees, percentile below 0.3 and curvature above 0. */
    PRONE(1, "prone"),
    /** Neither of the two. */
    NEUTRAL(2, "neutral"),
    /** Slope above 30 degrees or percentile above 0.7. */
    NOT_PRONE(3, "not-prone");

    /** Degrees (from memory). */
    public static final double STEEP = 30;
    /** Percentile below which ground is low (project choice). */
    public static final double LOW = 0.3;
    /** Percentile above which ground is high (project choice). */
    public static final double HIGH = 0.7;

    private final int code;
    private final String word;

    ColdAirClass(int code, String word) {
        this.code = code;
        this.word = word;
    }

    /** Stored value, from 1. */
    public int code() {
        return code;
    }

    public String word() {
        return word;
    }

    public static Optional<ColdAirClass> ofCode(int code) {
        return Arrays.stream(values()).filter(known -> known.code == code).findFirst();
    }

    /**
     * The class; empty where one of the three is missing, so along the border of a terrain model and around its voids.
     *
     * @param slope degrees
     * @param percentile 0..1
     * @param curvature 1/m, positive in a hollow
     */
    public static Optional<ColdAirClass> of(float slope, float percentile, float curvature) {
        if (Float.isNaN(slope) || Float.isNaN(percentile) || Float.isNaN(curvature)) {
            return Optional.empty();
        }
        if (slope > STEEP || percentile > HIGH) {
            return Optional.of(NOT_PRONE);
        }
        return Optional.of(slope < STEEP && percentile < LOW && curvature > 0 ? PRONE : NEUTRAL);
    }
}
