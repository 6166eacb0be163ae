package org.wintersill.season;

import org.wintersill.time.CfDate;
import org.wintersill.time.Season;

/**
 * Where the phases of a winter begin by the date (science 16.12, project choice): midwinter on 1 December and spring on 1 March, in the
 * south on 1 June and 1 September. With a hardiness model that knows when endodormancy ends, spring begins there instead, cell by cell.
 *
 * @param midwinter position in the window of the first night of midwinter; the number of days where the window ends before
 * @param spring likewise of spring, not before midwinter
 */
public record Phases(int midwinter, int spring) {
    /** Number of boundaries between phases. */
    static final int BOUNDARIES = 2;
    private static final int LENGTH_OF_PHASE = 3;
    private static final int MONTHS = 12;

    /** @param south whether the seasons are those of the southern hemisphere */
    public static Phases of(Season season, boolean south) {
        int month = south ? 6 : 12;
        int spring = (month + LENGTH_OF_PHASE) % MONTHS;
        int since = Math.floorMod(season.first().month() - month, MONTHS);
        boolean inMidwinter = since < LENGTH_OF_PHASE;
        boolean inSpring = !inMidwinter && since < 2 * LENGTH_OF_PHASE + 1;
        int midwinter = inMidwinter || inSpring ? 0 : firstOf(season, month, 0);
        return new Phases(midwinter, inSpring ? 0 : firstOf(season, spring, midwinter));
    }

    private static int firstOf(Season season, int month, int from) {
        for (int position = from; position < season.days(); position++) {
            CfDate date = season.date(position);
            if (date.month() == month && date.day() == 1) {
                return position;
            }
        }
        return season.days();
    }

    /** Phase of a night: 0 autumn, 1 midwinter, 2 spring. */
    public int of(int position) {
        return position < midwinter ? 0 : position < spring ? 1 : 2;
    }

    /** First night of the phase after boundary 0 or 1. */
    int start(int boundary) {
        return boundary == 0 ? midwinter : spring;
    }
}
