package org.wintersill.season;

import java.util.Arrays;
import org.wintersill.damage.ToleranceCurve;

/**
 * The running values of one cultivar in one lane of cells through one winter (science 16.3): lowest margin to LT50 and to the
 * lethal temperature of each further level, the earliest night of the lowest margin, and the damage of the worst night.
 *
 * <p>Damage needs no exponential in the day loop: p falls with T on each side of the split curve, so the lowest standardised
 * margin of each side is kept, and the curve is applied once a winter. If any night was colder than LT50 the cold side
 * decides, otherwise the warm side; that is exact.
 *
 * <p>Arrays are {@code [cell of the lane]}; a missing night is positive infinity and changes nothing. Not thread-safe: a lane
 * belongs to one worker at a time.
 */
public final class WinterAccumulator {
    private final int cells;
    private final float[][] lowestMargin;
    private final float[] warm;
    private final float[] cold;
    private final short[] worstNight;
    private ToleranceCurve tolerance = ToleranceCurve.SPLIT_LOGISTIC;

    /** @param levels number of levels, LT50 being the first */
    public WinterAccumulator(int levels, int cells) {
        this.cells = cells;
        lowestMargin = new float[levels][cells];
        warm = new float[cells];
        cold = new float[cells];
        worstNight = new short[cells];
        begin();
    }

    /** Makes ready for the next winter. */
    public void begin() {
        for (float[] values : lowestMargin) {
            Arrays.fill(values, Float.POSITIVE_INFINITY);
        }
        Arrays.fill(warm, Float.POSITIVE_INFINITY);
        Arrays.fill(cold, Float.POSITIVE_INFINITY);
        Arrays.fill(worstNight, (short) -1);
    }

    /**
     * Takes a stretch of nights, in their order.
     *
     * @param nights {@code [night of the stretch][cell of the lane]}, degrees Celsius, positive infinity for missing
     * @param count number of nights
     * @param positions {@code [night of the stretch]}, position in the window, ascending
     * @param before room for one value a cell, overwritten
     * @param reached room for one value a cell, overwritten
     */
    public void accept(NightCurve curve, float[][] nights, int count, int[] positions, float[] before, float[] reached) {
        tolerance = curve.tolerance();
        float[] margin = lowestMargin[0];
        System.arraycopy(margin, 0, before, 0, cells);
        LowestValues.ofDifference(nights, count, curve.lethal()[0], positions, margin, cells);
        noteWorstNights(curve.lethal()[0], nights, count, positions, before, reached);
        for (int level = 1; level < lowestMargin.length; level++) {
            LowestValues.ofDifference(nights, count, curve.lethal()[level], positions, lowestMargin[level], cells);
        }
        LowestValues.ofBothSides(nights, count, curve.lethal()[0], curve.warmInverse(), curve.coldInverse(), positions, warm, cold,
                cells);
    }

    /** Where the stretch lowered the margin, finds the first night that reaches it: the same subtraction gives the same float. */
    private void noteWorstNights(float[] lt50, float[][] nights, int count, int[] positions, float[] before, float[] reached) {
        float[] margin = lowestMargin[0];
        int first = 0;
        while (first < cells && !(margin[first] < before[first])) {
            first++;
        }
        if (first == cells) {
            return;
        }
        LowestValues.firstNightOf(margin, nights, count, lt50, positions, reached, cells);
        for (int i = first; i < cells; i++) {
            if (margin[i] < before[i]) {
                worstNight[i] = (short) positions[(int) reached[i]];
            }
        }
    }

    /** Lowest margin to the lethal temperature of a level, K; positive infinity where no night had a value. */
    public float margin(int level, int cell) {
        return lowestMargin[level][cell];
    }

    /** Position in the window of the earliest night with the lowest margin to LT50; -1 where no night had a value. */
    public int worstNight(int cell) {
        return worstNight[cell];
    }

    /** Fraction of buds killed by the worst night, 0..1; 0 where no night had a value. */
    public double damage(int cell) {
        return tolerance.fractionOfDeficit(-(double) (cold[cell] < 0 ? cold[cell] : warm[cell]));
    }
}
