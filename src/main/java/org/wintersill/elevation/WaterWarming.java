package org.wintersill.elevation;

/**
 * Warming of the minimum near open water, dT = warming exp(-d / reach) (science 7.5). The form is a project choice; near the southern shore
 * of Lake Superior winters are about 1 K warmer than 5 km inland (Hinkel and Nelson 2012), and the effect grows with the lake (Scott
 * and Huff 1997).
 */
public final class WaterWarming {
    /** Defaults, K and m (project choices). */
    public static final double DEFAULT_WARMING = 1.5;
    public static final double DEFAULT_REACH = 5_000;

    private WaterWarming() {
    }

    /**
     * K added to the minimum.
     *
     * @param warming at the shore, K
     * @param distance to the shore, m; infinite where there is no water
     * @param reach distance at which 1/e of the warming is left, m
     */
    public static double change(double warming, double distance, double reach) {
        return warming * Math.exp(-distance / reach);
    }
}
