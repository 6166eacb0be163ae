package org.wintersill.time;

import java.io.Serializable;

/**
 * One winter of one calendar: its first and last day and its name.
 *
 * @param label {@code 2003-04} in the north, {@code 2004} in the south
 * @param year the year in which the winter ends; the winter as a number
 * @param calendar calendar of the days
 * @param firstDay day number of the first day of the window
 * @param days number of days of the window
 * @param completeFrom position in the window (0 = first day) where the part that must be complete begins
 * @param completeTo position in the window of the last day of that part
 * @param hemisphere half of the globe that it is a winter of
 */
public record Season(String label, int year, CfCalendar calendar, long firstDay, int days,
                     int completeFrom, int completeTo, SeasonWindow.Hemisphere hemisphere) implements Serializable {

    /** The date of a position in the window; 0 is the first day. */
    public CfDate date(int position) {
        return calendar.date(firstDay + position);
    }

    public CfDate first() {
        return date(0);
    }

    public CfDate last() {
        return date(days - 1);
    }

    /** Position of a date in the window; may lie outside 0..days-1. */
    public int position(CfDate date) {
        return (int) (calendar.dayNumber(date) - firstDay);
    }
}
