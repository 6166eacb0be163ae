package org.wintersill.season;

import java.util.Arrays;
import org.wintersill.damage.ToleranceCurve;

/**
 * The running values of one cultivar in one lane of cells through one winter (science 16.3): lowest margin to LT50 and to the
 * lethal temperature of each further level, the earliest night of the lowest margin, and the damage of the worst night.
 *
 * <p>Damage of the worst night needs no exponential in the day loop: p falls with T on each side of the split curve, so the lowest
 * standardised margin of each side is kept, and the curve is applied once a winter. If any night was colder than LT50 the cold side
 * decides, otherwise the warm side; that is exact. Where more than that is asked for, a {@link DamageFold} takes the nights one by one.
 *
 * <p>Where phases are asked for, the damage reached at the end of autumn and of midwinter is kept: since a night adds what it raises the
 * running damage, the shares of the phases are the differences (science 16.12).
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
    /** Takes the nights one by one; null where the lowest values of both sides suffice. */
    private final DamageFold nightly;
    /** {@code [boundary][cell]}: damage reached when a phase ended; no rows where phases are not asked for. */
    private final float[][] reachedAt;
    private final boolean keepsExpected;
    private int boundary;
    private ToleranceCurve tolerance = ToleranceCurve.SPLIT_LOGISTIC;

    /** @param levels number of levels, LT50 being the first */
    public WinterAccumulator(int levels, DamageReckoning reckoning, int cells) {
        this.cells = cells;
        lowestMargin = new float[levels][cells];
        keepsExpected = reckoning.keepsExpected();
        nightly = reckoning.nightByNight() ? new DamageFold(reckoning, cells) : null;
        warm = new float[nightly == null ? cells : 0];
        cold = new float[nightly == null ? cells : 0];
        reachedAt = new float[reckoning.phases() ? Phases.BOUNDARIES : 0][cells];
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
        boundary = 0;
        if (nightly != null) {
            nightly.begin();
        }
    }

    /**
     * Takes a stretch of nights, in their order; nights of a later phase never come before nights of an earlier one.
     *
     * @param nights {@code [night of the stretch][cell of the lane]}, degrees Celsius, positive infinity for missing
     * @param count number of nights
     * @param positions {@code [night of the stretch]}, position in the window, ascending
     * @param before room for one value a cell, overwritten
     * @param reached room for one value a cell, overwritten
     */
    public void accept(NightCurve curve, float[][] nights, int count, int[] positions, float[] before, float[] reached) {
        tolerance = curve.tolerance();
        int from = 0;
        while (boundary < reachedAt.length) {
            int end = from;
            while (end < count && positions[end] < curve.phases().start(boundary)) {
                end++;
            }
            if (end == count) {
                break;
            }
            acceptPart(curve, nights, from, end, positions, before, reached);
            keepDamage(reachedAt[boundary]);
            boundary++;
            from = end;
        }
        acceptPart(curve, nights, from, count, positions, before, reached);
    }

    /** Takes the nights from..to of a stretch; a stretch is cut only where a phase ends. */
    private void acceptPart(NightCurve curve, float[][] nights, int from, int to, int[] positions, float[] before, float[] reached) {
        if (from > 0) {
            foldNights(curve, Arrays.copyOfRange(nights, from, to), to - from, Arrays.copyOfRange(positions, from, to), before, reached);
        } else {
            foldNights(curve, nights, to, positions, before, reached);
        }
    }

    private void keepDamage(float[] out) {
        for (int i = 0; i < cells; i++) {
            out[i] = (float) damage(i);
        }
    }

    private void foldNights(NightCurve curve, float[][] nights, int count, int[] positions, float[] before, float[] reached) {
        float[] margin = lowestMargin[0];
        System.arraycopy(margin, 0, before, 0, cells);
        LowestValues.ofDifference(nights, count, curve.lethal()[0], positions, margin, cells);
        noteWorstNights(curve.lethal()[0], nights, count, positions, before, reached);
        for (int level = 1; level < lowestMargin.length; level++) {
            LowestValues.ofDifference(nights, count, curve.lethal()[level], positions, lowestMargin[level], cells);
        }
        if (nightly != null) {
            for (int n = 0; n < count; n++) {
                int position = positions[n];
                nightly.accept(tolerance, nights[n], curve.lethal()[0][position], curve.warmInverse()[position],
                        curve.coldInverse()[position]);
            }
            return;
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

    /**
     * Hands the winter's values over: NaN where the winter does not count or no night had a value.
     *
     * @param valid whether the winter counts, by cell of the lane
     * @param cultivar number of the cultivar in {@code values}
     */
    void finish(boolean[] valid, WinterValues values, int cultivar) {
        boolean[] known = new boolean[cells];
        for (int i = 0; i < cells; i++) {
            known[i] = valid[i] && worstNight[i] >= 0;
        }
        for (int level = 0; level < lowestMargin.length; level++) {
            float[] lowest = lowestMargin[level];
            float[] margin = values.margin(cultivar, level);
            for (int i = 0; i < cells; i++) {
                margin[i] = known[i] ? lowest[i] : Float.NaN;
            }
        }
        float[] damage = values.damage(cultivar);
        float[] night = values.worstNight(cultivar);
        for (int i = 0; i < cells; i++) {
            damage[i] = known[i] ? (float) damage(i) : Float.NaN;
            night[i] = known[i] ? worstNight[i] : Float.NaN;
        }
        for (int i = 0; keepsExpected && i < cells; i++) {
            values.expectedDamage(cultivar)[i] = known[i] ? (float) nightly.expected(i) : Float.NaN;
        }
        for (int end = 0; end < reachedAt.length; end++) {
            for (int i = 0; i < cells; i++) {
                values.damageAt(cultivar, end)[i] = known[i] ? (float) damageAt(end, i) : Float.NaN;
            }
        }
    }

    /** Fraction of buds killed, 0..1, without uncertainty; 0 where no night had a value. */
    double damage(int cell) {
        if (nightly != null) {
            return nightly.damage(cell);
        }
        return tolerance.fractionOfDeficit(-(double) (cold[cell] < 0 ? cold[cell] : warm[cell]));
    }

    /** Damage reached when autumn (0) or midwinter (1) ended; that of the whole winter where no night came after. */
    double damageAt(int phaseEnd, int cell) {
        return phaseEnd < boundary ? reachedAt[phaseEnd][cell] : damage(cell);
    }
}
