package org.wintersill.hardiness;

/**
 * Temperatures that kill 10, 50 and 90 percent of the organs, day by day through one winter.
 *
 * <p>The arrays are not copied: whoever makes the record gives them away, whoever reads it leaves them alone.
 *
 * @param lt10 {@code [position]}, degC; 0 = first day of the winter's window; NaN where the model says nothing
 * @param lt50 likewise
 * @param lt90 likewise
 */
public record LethalTemperatures(double[] lt10, double[] lt50, double[] lt90) {

    public LethalTemperatures {
        if (lt10.length != lt50.length || lt50.length != lt90.length) {
            throw new IllegalArgumentException("lengths differ: " + lt10.length + ", " + lt50.length + ", " + lt90.length);
        }
    }

    /** Number of days of the window. */
    public int days() {
        return lt50.length;
    }
}
