package org.wintersill.hardiness;

/**
 * The state of a {@link StateModel} in a run of cells through one winter. Arrays are {@code [cell]}. Used by one thread; days come
 * in order, each exactly once, beginning with {@link StateModel#firstDay}: for each day first {@link #tolerance} is asked for the
 * night that ends on it, then {@link #advance} is told its mean.
 */
public interface HardinessTrajectory {

    /**
     * Tolerance in the night of a day: the state at the end of the day before.
     *
     * @param day position in the season's window, not negative
     * @param out filled for every cell; NaN in lt50 where the model says nothing, such as before its first day or after a long gap
     */
    void tolerance(int day, NightTolerance out);

    /**
     * Takes the mean temperature of a day.
     *
     * @param day position in the season's window; may be negative
     * @param mean {@code [cell]}, degC; NaN where it is missing even after short gaps were filled: the cell has no
     *     hardiness from there on
     */
    void advance(int day, float[] mean);

    /**
     * Position of the first day in spring phase (after endodormancy) in a cell; {@code Integer.MAX_VALUE} while it has not come, or
     * where the model knows no phases.
     */
    int phaseSwitch(int cell);

    /**
     * Position of the day of budbreak in a cell; {@code Integer.MAX_VALUE} while it has not come, or where the model knows none.
     */
    default int budbreak(int cell) {
        return Integer.MAX_VALUE;
    }
}
