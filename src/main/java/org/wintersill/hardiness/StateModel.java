package org.wintersill.hardiness;

import org.wintersill.time.Season;

/**
 * A model whose hardiness follows from the daily mean temperatures before a night, cell by cell. The hardiness of a night is
 * the state at the end of the day before (science 16.1).
 */
public interface StateModel extends HardinessModel {

    /**
     * First day whose mean temperature the model takes, as a position in the season's window; negative where it lies before the
     * window. Winters whose record begins later do not count.
     */
    int firstDay(Season season);

    /**
     * First day whose mean the model can use where the record has it, at most {@link #firstDay}: such as the days before the window that a
     * trailing mean reaches back to. A record that begins in between is taken from its first day.
     */
    default int earliestDay(Season season) {
        return firstDay(season);
    }

    /**
     * A fresh state for a run of cells in one winter; winters are independent.
     *
     * @param latitudes {@code [cell]}, degrees north; for models that ask for the length of the night
     */
    HardinessTrajectory begin(Season season, double[] latitudes);

    /** Whether {@link HardinessTrajectory#phaseSwitch} tells where spring begins; otherwise the date does. */
    default boolean knowsPhases() {
        return true;
    }

    /** Bytes that a state keeps for each cell, for the estimate of memory; at the most. */
    default int bytesPerCell() {
        return 128;
    }
}
