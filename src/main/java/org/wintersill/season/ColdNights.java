package org.wintersill.season;

import java.util.Arrays;

/**
 * Severity of a winter in a lane of cells (science section 10): nights whose minimum is below a threshold, and the longest run of
 * such nights. A missing night is no cold night, so it ends a run.
 *
 * <p>Arrays are {@code [cell of the lane]}; a missing night is positive infinity. A lane belongs to one worker at a time.
 */
final class ColdNights {
    private final float threshold;
    private final int cells;
    private final float[] below;
    private final float[] run;
    private final float[] longest;
    private int last;

    /** @param threshold degrees Celsius */
    ColdNights(float threshold, int cells) {
        this.threshold = threshold;
        this.cells = cells;
        below = new float[cells];
        run = new float[cells];
        longest = new float[cells];
    }

    /** Makes ready for the next winter. */
    void begin() {
        Arrays.fill(below, 0);
        Arrays.fill(run, 0);
        Arrays.fill(longest, 0);
        last = -1;
    }

    /** Takes nights in their order; {@code positions} as those of {@link WinterLane#accept}. */
    void accept(float[][] nights, int count, int[] positions) {
        for (int n = 0; n < count; n++) {
            if (positions[n] != last + 1) {
                Arrays.fill(run, 0);
            }
            last = positions[n];
            accept(nights[n], threshold, below, run, longest, cells);
        }
    }

    private static void accept(float[] night, float threshold, float[] below, float[] run, float[] longest, int cells) {
        for (int i = 0; i < cells; i++) {
            float cold = night[i] < threshold ? 1 : 0;
            below[i] += cold;
            run[i] = (run[i] + cold) * cold;
            longest[i] = Math.max(longest[i], run[i]);
        }
    }

    float below(int cell) {
        return below[cell];
    }

    float longest(int cell) {
        return longest[cell];
    }
}
