package org.wintersill.climatology;

import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;
import org.wintersill.damage.ToleranceCurve;

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
    private final long firstCell;
    private final Optional<ToleranceCurve> tolerance;
    private final Map<Object, Object> derived = new HashMap<>();
    private int[] counts;
    private final int[][] events;

    /**
     * @param years year in which each winter ends
     * @param minimum lowest minimum, degrees Celsius; empty where only margins and damage are asked for
     * @param margins {@code [level][winter][cell]}, K; level 0 is LT50. Empty where only {@code minimum} is asked for
     * @param damage fraction of buds killed; empty where only {@code minimum} is asked for
     * @param cells number of cells
     * @param firstCell number of the first cell in the grid, row-major
     * @param tolerance form of the cultivar's tolerance curve; empty where only {@code minimum} is asked for
     */
    public WinterRecord(int[] years, float[][] minimum, float[][][] margins, float[][] damage, int cells, long firstCell,
                        Optional<ToleranceCurve> tolerance) {
        this.years = years;
        this.minimum = minimum;
        this.margins = margins;
        this.damage = damage;
        this.cells = cells;
        this.firstCell = firstCell;
        this.tolerance = tolerance;
        events = new int[margins.length][];
    }

    /** Number of winters of the run, whether they count at a cell or not. */
    public int winters() {
        return years.length;
    }

    /** Number of cells. */
    public int cells() {
        return cells;
    }

    /** Form of the tolerance curve; only where margins are. */
    public ToleranceCurve tolerance() {
        return tolerance.orElseThrow();
    }

    /** Number of the first cell in the grid, row-major: what random streams begin with. */
    public long firstCell() {
        return firstCell;
    }

    /**
     * Something that several statistics need and that takes long, such as fits: made when first asked for, then kept.
     *
     * @param key what it is, with everything that it depends on
     */
    @SuppressWarnings("unchecked")
    public <T> T derived(Object key, Supplier<T> maker) {
        Object known = derived.get(key);
        if (known == null) {
            known = maker.get();
            derived.put(key, known);
        }
        return (T) known;
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
