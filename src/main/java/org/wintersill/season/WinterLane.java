package org.wintersill.season;

import java.util.Arrays;
import java.util.function.IntPredicate;

/**
 * All running values of a lane of cells through one winter: the lowest minimum, and a {@link WinterAccumulator} for each
 * cultivar. Nights come in order; a lane belongs to one worker at a time.
 */
public final class WinterLane {
    /** Most nights that {@link #accept} takes at once; keeps a lane's temperatures in the processor's cache. */
    public static final int STRETCH = 16;

    private static final float[] NO_REFERENCE = new float[STRETCH];
    private static final int[] ANY_POSITION = new int[STRETCH];

    private final int cells;
    private final int levels;
    private final DamageReckoning reckoning;
    private final float[] minimum;
    private final float[] before;
    private final float[] reached;
    private final WinterAccumulator[] cultivars;
    /** Null where no cold nights are counted. */
    private final ColdNights cold;

    public WinterLane(int cultivarCount, int levels, DamageReckoning reckoning, int cells) {
        this.cells = cells;
        this.levels = levels;
        this.reckoning = reckoning;
        minimum = new float[cells];
        before = new float[cells];
        reached = new float[cells];
        cultivars = new WinterAccumulator[cultivarCount];
        for (int c = 0; c < cultivarCount; c++) {
            cultivars[c] = new WinterAccumulator(levels, reckoning, cells);
        }
        cold = reckoning.coldNight().map(threshold -> new ColdNights(threshold, cells)).orElse(null);
        begin();
    }

    public int cells() {
        return cells;
    }

    /** Bytes that a lane takes for each of its cells. */
    public static long bytesPerCell(int cultivarCount, int levels, DamageReckoning reckoning) {
        return 12 + (reckoning.coldNight().isPresent() ? 12 : 0) + cultivarCount * (4L * levels + 10 + reckoning.bytesPerCell());
    }

    /** Makes ready for the next winter. */
    public void begin() {
        Arrays.fill(minimum, Float.POSITIVE_INFINITY);
        for (WinterAccumulator cultivar : cultivars) {
            cultivar.begin();
        }
        if (cold != null) {
            cold.begin();
        }
    }

    /**
     * Takes nights in their order.
     *
     * @param curves one a cultivar; null for a cultivar with a state model, which {@link StateLane} follows
     * @param nights {@code [night of the stretch][cell]}, degrees Celsius, positive infinity for missing
     * @param count number of nights, at most {@link #STRETCH}
     * @param positions {@code [night of the stretch]}, position in the window, ascending
     */
    public void accept(NightCurve[] curves, float[][] nights, int count, int[] positions) {
        acceptMinimum(nights, count);
        if (cold != null) {
            cold.accept(nights, count, positions);
        }
        for (int c = 0; c < cultivars.length; c++) {
            if (curves[c] != null) {
                accept(c, curves[c], nights, count, positions);
            }
        }
    }

    /** Takes nights for the lowest minimum alone. */
    public void acceptMinimum(float[][] nights, int count) {
        LowestValues.ofDifference(nights, count, NO_REFERENCE, ANY_POSITION, minimum, cells);
    }

    /** Takes nights for one cultivar alone. */
    public void accept(int cultivar, NightCurve curve, float[][] nights, int count, int[] positions) {
        cultivars[cultivar].accept(curve, nights, count, positions, before, reached);
    }

    /**
     * The winter's values.
     *
     * @param counts whether the winter is complete enough at a cell of the lane
     * @return a fresh set; NaN where the winter does not count or no night had a value
     */
    public WinterValues finish(IntPredicate counts) {
        WinterValues values = new WinterValues(cultivars.length, levels, reckoning, cells);
        boolean[] valid = new boolean[cells];
        for (int i = 0; i < cells; i++) {
            valid[i] = minimum[i] < Float.POSITIVE_INFINITY && counts.test(i);
            values.minimum()[i] = valid[i] ? minimum[i] : Float.NaN;
            if (cold != null) {
                values.coldNights()[i] = valid[i] ? cold.below(i) : Float.NaN;
                values.coldSpell()[i] = valid[i] ? cold.longest(i) : Float.NaN;
            }
        }
        for (int c = 0; c < cultivars.length; c++) {
            cultivars[c].finish(valid, values, c);
        }
        return values;
    }
}
