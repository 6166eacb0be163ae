package org.wintersill.climatology;

import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.damage.Uncertainty;
import org.wintersill.season.DamageReckoning;

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
    private final Details details;
    private int[] counts;
    private final double[][] events;

    /**
     * What is kept besides margins and damage.
     *
     * @param reckoning how damage was reckoned
     * @param levels percent of buds of each level
     * @param expectedDamage {@code [winter][cell]}, expected fraction killed with uncertainty; empty where nothing is uncertain
     * @param damageAt {@code [phase end][winter][cell]}, fraction killed when autumn (0) and midwinter (1) ended; empty where not kept
     * @param coldNights {@code [0 number, 1 longest run][winter][cell]}; empty where not kept
     */
    public record Details(DamageReckoning reckoning, int[] levels, float[][] expectedDamage, float[][][] damageAt, float[][][] coldNights) {
    }

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
                        Optional<ToleranceCurve> tolerance, Details details) {
        this.years = years;
        this.minimum = minimum;
        this.margins = margins;
        this.damage = damage;
        this.cells = cells;
        this.firstCell = firstCell;
        this.tolerance = tolerance;
        this.details = details;
        events = new double[margins.length][];
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

    /** Expected fraction of buds killed, {@code [winter][cell]}: with the uncertainty of the margin where there is any. */
    public float[][] expectedDamage() {
        return details.reckoning().keepsExpected() ? details.expectedDamage() : damage;
    }

    /** Fraction of buds killed when autumn (0) or midwinter (1) ended, {@code [winter][cell]}. */
    public float[][] damageAt(int phaseEnd) {
        return details.damageAt()[phaseEnd];
    }

    /** Number of cold nights, {@code [winter][cell]}; only where they are counted. */
    public float[][] coldNights() {
        return details.coldNights()[0];
    }

    /** Longest run of cold nights, {@code [winter][cell]}; likewise. */
    public float[][] coldSpell() {
        return details.coldNights()[1];
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
     * Number of winters at each cell that kill at least a level's share of the buds; where margins are uncertain, the sum of their
     * probabilities (science 16.4). Where the worst night decides, such a winter is one whose margin to the lethal temperature of the
     * level is not above zero; where nights are joined, one whose damage is not below the share.
     */
    public double[] events(int level) {
        if (events[level] == null) {
            double sd = details.reckoning().uncertainty().sd();
            double[] sum = new double[cells];
            for (int winter = 0; winter < years.length; winter++) {
                if (!details.reckoning().nights().isWorst()) {
                    addAtLeast(damage[winter], (float) (details.levels()[level] / 100.0), sum);
                } else {
                    addNotAbove(margins[level][winter], sd, sum);
                }
            }
            events[level] = sum;
        }
        return events[level];
    }

    private static void addAtLeast(float[] damage, float share, double[] sum) {
        for (int cell = 0; cell < sum.length; cell++) {
            sum[cell] += damage[cell] >= share ? 1 : 0;
        }
    }

    private static void addNotAbove(float[] margins, double sd, double[] sum) {
        for (int cell = 0; cell < sum.length; cell++) {
            float margin = margins[cell];
            if (margin == margin) {
                sum[cell] += Uncertainty.probabilityNotAbove(margin, sd);
            }
        }
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
