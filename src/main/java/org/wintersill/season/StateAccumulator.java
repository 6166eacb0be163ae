package org.wintersill.season;

import java.util.Arrays;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.NightTolerance;

/**
 * The running values of one cultivar with a state model in one lane of cells through one winter (science 16.3): lowest margin to
 * LT50 and to the lethal temperature of each further level, the earliest night of the lowest margin, and the damage of the
 * worst night, each with the lethal temperatures of the night and cell. As in {@link WinterAccumulator} no exponential is computed
 * by night: the lowest standardised margin of each side is kept.
 *
 * <p>Arrays are {@code [cell of the lane]}. A cell that has a temperature in a night for which its state is lost has no winter.
 */
final class StateAccumulator {
    /** Above any margin; finite, so that differences between margins are numbers. */
    private static final float NONE = 1e30f;
    /** Lifts any difference between two margins above 1. */
    private static final float FAR = 1e30f;

    private final StateCultivar cultivar;
    private final int cells;
    private final float spreadsToTenth;
    private final float[] shares;
    private final float[][] lowest;
    private final float[] warm;
    private final float[] cold;
    private final float[] worstNight;
    private final boolean[] lost;
    private final float[] margin;
    /** Takes the nights one by one; null where the lowest values of both sides suffice. */
    private final DamageFold nightly;
    private final float[] warmInverse;
    private final float[] coldInverse;
    private final boolean expected;
    private final PhaseEnds ends;

    StateAccumulator(StateCultivar cultivar, DamageReckoning reckoning, int cells) {
        this.cultivar = cultivar;
        this.cells = cells;
        spreadsToTenth = (float) cultivar.tolerance().spreadsToTenth();
        shares = cultivar.shares();
        lowest = new float[shares.length][cells];
        warm = new float[cells];
        cold = new float[cells];
        worstNight = new float[cells];
        lost = new boolean[cells];
        margin = new float[cells];
        nightly = reckoning.nightByNight() ? new DamageFold(reckoning, cells) : null;
        warmInverse = new float[nightly == null ? 0 : cells];
        coldInverse = new float[nightly == null ? 0 : cells];
        expected = reckoning.keepsExpected();
        ends = reckoning.phases() ? new PhaseEnds(cells) : null;
    }

    static long bytesPerCell(int levels, DamageReckoning reckoning) {
        return (levels + 4L) * Float.BYTES + 1 + reckoning.bytesPerCell() + (reckoning.nightByNight() ? 2L * Float.BYTES : 0)
                + (reckoning.phases() ? 1 : 0);
    }

    /** @param phases where the phases of the winter begin by the date */
    void begin(Phases phases) {
        for (float[] values : lowest) {
            Arrays.fill(values, NONE);
        }
        Arrays.fill(warm, NONE);
        Arrays.fill(cold, NONE);
        Arrays.fill(worstNight, -1);
        Arrays.fill(lost, false);
        if (nightly != null) {
            nightly.begin();
        }
        if (ends != null) {
            ends.begin(phases);
        }
    }

    /** Keeps the damage of the cells in which a phase ended before the night; called before {@link #accept}. */
    void closePhases(int night, HardinessTrajectory state) {
        if (ends != null) {
            ends.close(night, cultivar.model().knowsPhases() ? state : null, this::damage);
        }
    }

    private double damage(int cell) {
        return nightly != null ? nightly.damage(cell)
                : cultivar.tolerance().fractionOfDeficit(-(double) (cold[cell] < 0 ? cold[cell] : warm[cell]));
    }

    /**
     * Takes one night.
     *
     * @param t degrees Celsius, positive infinity for missing
     * @param tolerance of the night, NaN where the model says nothing; changed
     * @param broken whether the state of a cell is lost since a long gap; null where that is so in no cell
     */
    void accept(int night, float[] t, NightTolerance tolerance, boolean[] broken) {
        if (broken != null) {
            noteLostStates(t, broken);
        }
        leaveOut(tolerance);
        margins(t, tolerance.lt50(), margin, cells);
        worst(margin, lowest[0], night, worstNight, cells);
        for (int level = 1; level < shares.length; level++) {
            below(margin, shares[level] > 0 ? tolerance.toLt10() : tolerance.toLt90(), shares[level], lowest[level], cells);
        }
        if (nightly != null) {
            invert(tolerance.toLt10(), warmInverse);
            invert(tolerance.toLt90(), coldInverse);
            nightly.accept(cultivar.tolerance(), t, tolerance.lt50(), warmInverse, coldInverse);
            return;
        }
        standardised(margin, tolerance.toLt10(), spreadsToTenth, warm, cells);
        standardised(margin, tolerance.toLt90(), spreadsToTenth, cold, cells);
    }

    private void invert(float[] distance, float[] inverse) {
        for (int i = 0; i < cells; i++) {
            inverse[i] = spreadsToTenth / distance[i];
        }
    }

    private void noteLostStates(float[] t, boolean[] broken) {
        for (int i = 0; i < cells; i++) {
            lost[i] |= broken[i] && t[i] < Float.POSITIVE_INFINITY;
        }
    }

    /** Where the model says nothing, no temperature of the night is near a lethal one. */
    private void leaveOut(NightTolerance tolerance) {
        float[] lt50 = tolerance.lt50();
        for (int i = 0; i < cells; i++) {
            if (lt50[i] != lt50[i]) {
                lt50[i] = Float.NEGATIVE_INFINITY;
                tolerance.toLt10()[i] = 1;
                tolerance.toLt90()[i] = 1;
            }
        }
    }

    private static void margins(float[] t, float[] lt50, float[] margin, int cells) {
        for (int i = 0; i < cells; i++) {
            margin[i] = t[i] - lt50[i];
        }
    }

    /** Lowest margin and its earliest night; a night that only equals the lowest margin changes nothing. */
    private static void worst(float[] margin, float[] lowest, float night, float[] worstNight, int cells) {
        for (int i = 0; i < cells; i++) {
            float lower = Math.min(1, Math.max(0, (lowest[i] - margin[i]) * FAR));
            worstNight[i] = worstNight[i] * (1 - lower) + night * lower;
            lowest[i] = Math.min(lowest[i], margin[i]);
        }
    }

    /** lowest = min(lowest, margin to LT50 - share * distance): the margin to the lethal temperature of a level. */
    private static void below(float[] margin, float[] distance, float share, float[] lowest, int cells) {
        for (int i = 0; i < cells; i++) {
            lowest[i] = Math.min(lowest[i], margin[i] - share * distance[i]);
        }
    }

    private static void standardised(float[] margin, float[] distance, float spreadsToTenth, float[] lowest, int cells) {
        for (int i = 0; i < cells; i++) {
            lowest[i] = Math.min(lowest[i], margin[i] * spreadsToTenth / distance[i]);
        }
    }

    /**
     * Writes the winter's values of the cultivar.
     *
     * @param valid {@code [cell]}, whether the winter is complete enough
     */
    void finish(boolean[] valid, WinterValues values) {
        int c = cultivar.index();
        for (int i = 0; i < cells; i++) {
            boolean known = valid[i] && !lost[i] && lowest[0][i] < NONE;
            for (int level = 0; level < lowest.length; level++) {
                values.margin(c, level)[i] = known ? lowest[level][i] : Float.NaN;
            }
            values.damage(c)[i] = known ? (float) damage(i) : Float.NaN;
            values.worstNight(c)[i] = known ? worstNight[i] : Float.NaN;
            if (expected) {
                values.expectedDamage(c)[i] = known ? (float) nightly.expected(i) : Float.NaN;
            }
            for (int end = 0; ends != null && end < Phases.BOUNDARIES; end++) {
                values.damageAt(c, end)[i] = known ? (float) ends.damageAt(end, i, this::damage) : Float.NaN;
            }
        }
    }
}
