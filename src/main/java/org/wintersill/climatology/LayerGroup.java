package org.wintersill.climatology;

/** Summary layers that are asked for together under {@code outputs.layers}. */
public enum LayerGroup {
    /** Written unless other layers are named. */
    DEFAULT("default"),
    /** Distributions fitted to the winters, and what follows from them. */
    EXTREMES("extremes"),
    /** Bounds that are drawn or searched for, and tests of fit. */
    BOUNDS("bounds"),
    /** Change over the years. */
    TRENDS("trends"),
    /** How cold the winters were, whatever stands in them. */
    SEVERITY("severity");

    private final String word;

    LayerGroup(String word) {
        this.word = word;
    }

    /** Word of the run file. */
    public String word() {
        return word;
    }
}
