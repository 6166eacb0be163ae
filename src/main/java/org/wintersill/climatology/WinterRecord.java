package org.wintersill.climatology;

/**
 * The values of all winters in some cells, for one cultivar. Arrays are {@code [winter][cell]}, NaN where a winter does not
 * count; winters in the order of time. Used by one thread.
 */
public final class WinterRecord {
    private final int[] years;
    private final float[][] minimum;
    private final float[][][] margins;
    private final float[][] damage;
    private final int cells;
    private int[] counts;
    private final int[][] events;

    /**
     * @param years year in which each winter ends
     * @param minimum lowest minimum, degrees Celsius; empty where only margins and damage are asked for
     * @param margins {@code [level][winter][cell]}, K; level 0 is LT50. Empty where only {@code minimum} is asked for
     * @param damage fraction of buds killed; empty where only {@code minimum} is asked for
     * @param cells number of cells
     */
    public WinterRecord(int[] years, float[][] minimum, float[][][] margins, float[][] damage, int cells) {
        this.years = years;
        this.minimum = minimum;
        this.margins = margins;
        this.damage = damage;
        this.cells = cells;
        events = new int[margins.length][];
    }

    /** Number of winters of the run, whether they count at a cell or not. */
    public int winters() {
        return years.length;
    }

    /** Year in which each winter ends. */
    public int[] years() {
        return years;
    }

    /** Lowest minimum, {@code [winter][cell]}, degrees Celsius. */
    public float[][] minimum() {
        return minimum;
    }

    /** Lowest margins to the lethal temperature of a level, {@code [winter][cell]}, K; level 0 is LT50. */
    public float[][] margins(int level) {
        return margins[level];
    }

    /** Fraction of buds killed, {@code [winter][cell]}. */
    public float[][] damage() {
        return damage;
    }

    /** Number of winters that count at each cell, by the margins where there are any. */
    public int[] counts() {
        if (counts == null) {
            counts = new int[cells];
            for (float[] winter : margins.length > 0 ? margins[0] : minimum) {
                for (int cell = 0; cell < cells; cell++) {
                    counts[cell] += winter[cell] == winter[cell] ? 1 : 0;
                }
            }
        }
        return counts;
    }

    /**
     * Number of winters at each cell whose margin to the lethal temperature of a level is not above zero, so that the level's share
     * of buds died; a margin of exactly zero is such a winter.
     */
    public int[] events(int level) {
        if (events[level] == null) {
            events[level] = new int[cells];
            for (float[] winter : margins[level]) {
                for (int cell = 0; cell < cells; cell++) {
                    events[level][cell] += winter[cell] <= 0 ? 1 : 0;
                }
            }
        }
        return events[level];
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
