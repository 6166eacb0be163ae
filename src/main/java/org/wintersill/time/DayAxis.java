package org.wintersill.time;

import java.io.Serializable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The days for which a source has a record, in order, with the gaps as a fact that can be told.
 * Index 0 is the earliest day whatever the order of the files was.
 */
public final class DayAxis implements Serializable {
    private static final long serialVersionUID = 1L;

    private final CfCalendar calendar;
    private final long[] days;

    /**
     * @param days day numbers of the calendar, strictly ascending
     * @throws IllegalArgumentException when they are not; readers check first and name the day and the file
     */
    public DayAxis(CfCalendar calendar, long[] days) {
        this.calendar = calendar;
        this.days = days.clone();
        for (int i = 1; i < days.length; i++) {
            if (days[i] <= days[i - 1]) {
                throw new IllegalArgumentException("days must ascend: " + calendar.date(days[i - 1])
                        + " is followed by " + calendar.date(days[i]));
            }
        }
    }

    public CfCalendar calendar() {
        return calendar;
    }

    public int size() {
        return days.length;
    }

    /** Day number of a position. */
    public long day(int index) {
        return days[index];
    }

    public CfDate date(int index) {
        return calendar.date(days[index]);
    }

    /** Position of a day number; negative if the day is absent. */
    public int indexOf(long day) {
        return Arrays.binarySearch(days, day);
    }

    /** Position of the first day that is not before the given one; {@link #size()} if there is none. */
    public int firstIndexFrom(long day) {
        int found = Arrays.binarySearch(days, day);
        return found >= 0 ? found : -found - 1;
    }

    /** Number of days between the first and the last that have no record. */
    public long missingCount() {
        return days.length == 0 ? 0 : days[days.length - 1] - days[0] + 1 - days.length;
    }

    /** The absent days as ranges such as {@code 2003-02-01..2003-02-14}, at most {@code limit} of them. */
    public List<String> gaps(int limit) {
        List<String> ranges = new ArrayList<>();
        for (int i = 1; i < days.length && ranges.size() < limit; i++) {
            if (days[i] != days[i - 1] + 1) {
                String first = calendar.date(days[i - 1] + 1).toString();
                String last = calendar.date(days[i] - 1).toString();
                ranges.add(first.equals(last) ? first : first + ".." + last);
            }
        }
        return ranges;
    }
}
