package org.wintersill.season;

import org.wintersill.time.CfDate;
import org.wintersill.time.Season;

/**
 * Counts, cell by cell of the source grid, the missing days of each month of a winter's complete part, and says at the end
 * where the winter counts. An absent day and a masked cell both are missing days, but only the first is known for all cells
 * at once.
 *
 * <p>Days come in order, each exactly once. Cells are split between workers: a worker only touches its own range,
 * and calls {@link #accept} or {@link #absent} for it for every day. No locks, no shared counters.
 */
public final class CompletenessTally {
    private final Season season;
    private final MissingDayPolicy policy;
    private final byte[] missing;
    private final byte[] run;
    private final byte[] longest;
    private final boolean[] failed;
    /** Whether a month ends with the given position of the window, or the complete part does. */
    private final boolean[] monthEnds;

    /** @param cells number of source cells */
    public CompletenessTally(Season season, MissingDayPolicy policy, int cells) {
        this.season = season;
        this.policy = policy;
        missing = new byte[cells];
        run = new byte[cells];
        longest = new byte[cells];
        failed = new boolean[cells];
        monthEnds = new boolean[season.days()];
        for (int night = 0; night < season.days(); night++) {
            CfDate date = season.date(night);
            monthEnds[night] = night == season.completeTo() || season.calendar().date(season.firstDay() + night + 1).month() != date.month();
        }
    }

    private boolean counts(int night) {
        return night >= season.completeFrom() && night <= season.completeTo();
    }

    /**
     * Takes one night of the cells {@code from} to {@code to}.
     *
     * @param night position in the window
     * @param values temperatures, NaN for missing; the value of cell {@code i} is at {@code offset + i}
     */
    public void accept(int night, float[] values, int offset, int from, int to) {
        if (!counts(night)) {
            return;
        }
        for (int i = from; i < to; i++) {
            if (Float.isNaN(values[offset + i])) {
                miss(i);
            } else {
                run[i] = 0;
            }
        }
        if (monthEnds[night]) {
            closeMonth(from, to);
        }
    }

    /** Takes a night that the source has no record of. */
    public void absent(int night, int from, int to) {
        if (!counts(night)) {
            return;
        }
        for (int i = from; i < to; i++) {
            miss(i);
        }
        if (monthEnds[night]) {
            closeMonth(from, to);
        }
    }

    private void miss(int cell) {
        missing[cell]++;
        if (++run[cell] > longest[cell]) {
            longest[cell] = run[cell];
        }
    }

    private void closeMonth(int from, int to) {
        for (int i = from; i < to; i++) {
            if (missing[i] != 0) {
                if (!policy.monthCounts(missing[i], longest[i])) {
                    failed[i] = true;
                }
                missing[i] = 0;
            }
            run[i] = 0;
            longest[i] = 0;
        }
    }

    /** Whether the winter counts in a source cell; asked after the last night. */
    public boolean isComplete(int cell) {
        return !failed[cell];
    }
}
