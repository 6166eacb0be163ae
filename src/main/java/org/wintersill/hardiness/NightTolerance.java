package org.wintersill.hardiness;

/**
 * Tolerance of one night in a run of cells: LT50 and the distances from it to LT10 and LT90. Arrays are {@code [cell]}; room to be
 * filled again every night.
 *
 * @param lt50 degC; NaN where there is none
 * @param toLt10 LT10 - LT50, K, positive
 * @param toLt90 LT50 - LT90, K, positive
 */
public record NightTolerance(float[] lt50, float[] toLt10, float[] toLt90) {

    /** Room for a number of cells. */
    public static NightTolerance of(int cells) {
        return new NightTolerance(new float[cells], new float[cells], new float[cells]);
    }
}
