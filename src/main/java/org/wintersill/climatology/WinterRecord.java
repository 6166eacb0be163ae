package org.wintersill.climatology;

/**
 * The values of all winters in some cells, for one cultivar. Arrays are {@code [winter][cell]}, NaN where a winter does not
 * count; winters in the order of time.
 *
 * @param years year in which each winter ends
 * @param minimum lowest minimum, degrees Celsius
 * @param margins {@code [level][winter][cell]}, K; level 0 is LT50. Empty where only {@code minimum} is asked for
 * @param damage fraction of buds killed; empty where only {@code minimum} is asked for
 */
public record WinterRecord(int[] years, float[][] minimum, float[][][] margins, float[][] damage) {

    public int winters() {
        return years.length;
    }

    /** Copies the values of a cell that count into {@code room}, in the order of time, and says how many there are. */
    public static int valid(float[][] values, int cell, double[] room) {
        int n = 0;
        for (float[] winter : values) {
            float value = winter[cell];
            if (value == value) {
                room[n++] = value;
            }
        }
        return n;
    }
}
