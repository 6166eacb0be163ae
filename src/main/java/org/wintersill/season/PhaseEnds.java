package org.wintersill.season;

import java.util.Arrays;
import java.util.function.IntToDoubleFunction;
import org.wintersill.hardiness.HardinessTrajectory;

/**
 * The damage that was reached when autumn and midwinter ended, in a lane of cells whose hardiness model may say itself when spring
 * begins. Spring never begins before midwinter: where endodormancy ends that early, midwinter is empty.
 */
final class PhaseEnds {
    private final int cells;
    /** {@code [boundary][cell]}. */
    private final float[][] reached;
    /** Number of boundaries that each cell has passed. */
    private final byte[] passed;
    private Phases phases;

    PhaseEnds(int cells) {
        this.cells = cells;
        reached = new float[Phases.BOUNDARIES][cells];
        passed = new byte[cells];
    }

    /** @param winter where the phases begin by the date */
    void begin(Phases winter) {
        phases = winter;
        Arrays.fill(passed, (byte) 0);
    }

    /**
     * Keeps the damage of the cells in which a phase ended before a night.
     *
     * @param state says where spring begins; null where the model does not know and the date decides
     * @param damage of a cell, nights before this one taken together
     */
    void close(int night, HardinessTrajectory state, IntToDoubleFunction damage) {
        if (night < phases.midwinter()) {
            return;
        }
        for (int i = 0; i < cells; i++) {
            if (passed[i] == 0) {
                reached[0][i] = (float) damage.applyAsDouble(i);
                passed[i] = 1;
            }
            if (passed[i] == 1 && night >= (state == null ? phases.spring() : state.phaseSwitch(i))) {
                reached[1][i] = (float) damage.applyAsDouble(i);
                passed[i] = 2;
            }
        }
    }

    /** Damage reached at the end of autumn (0) or midwinter (1); that of the whole winter where the phase did not end. */
    double damageAt(int boundary, int cell, IntToDoubleFunction damage) {
        return boundary < passed[cell] ? reached[boundary][cell] : damage.applyAsDouble(cell);
    }
}
