package org.wintersill.time;

import java.io.Serializable;
import java.util.ArrayList;
import java.util.List;

/**
 * What a winter is: the first and last day of the window by month and day, and the part of it that must be complete.
 *
 * <p>Windows go by month and day, never by day number, so they hold in every calendar; a window that ends on
 * 29 or 30 February ends on the last day of February. A window whose last day comes before its first crosses the
 * new year. The label is the year in which the winter ends: {@code 2003-04} for the north, {@code 2004} for the south.
 *
 * @param from first day of the window
 * @param to last day of the window
 * @param completeFrom first day of the part that must be complete (science: the default is 1 November)
 * @param completeTo last day of that part
 * @param hemisphere decides the label, and the start of models that begin by date
 */
public record SeasonWindow(MonthDay from, MonthDay to, MonthDay completeFrom, MonthDay completeTo,
                           Hemisphere hemisphere) implements Serializable {

    /** Which half of the globe, for labels and defaults. */
    public enum Hemisphere { NORTH, SOUTH }

    /** 1 September - 31 May with November - April complete; project default for the northern hemisphere. */
    public static SeasonWindow north() {
        return new SeasonWindow(new MonthDay(9, 1), new MonthDay(5, 31), new MonthDay(11, 1), new MonthDay(4, 30),
                Hemisphere.NORTH);
    }

    /** 1 March - 30 November with May - October complete; project default for the southern hemisphere. */
    public static SeasonWindow south() {
        return new SeasonWindow(new MonthDay(3, 1), new MonthDay(11, 30), new MonthDay(5, 1), new MonthDay(10, 31),
                Hemisphere.SOUTH);
    }

    public static SeasonWindow of(Hemisphere hemisphere) {
        return hemisphere == Hemisphere.NORTH ? north() : south();
    }

    /** Whether a day of the year lies in the window. */
    public boolean contains(MonthDay day) {
        return span(ordinal(from), ordinal(day)) <= span(ordinal(from), ordinal(to));
    }

    /** Whether the window runs over the new year. */
    public boolean crossesNewYear() {
        return to.compareTo(from) < 0;
    }

    /**
     * Whether the part that must be complete lies inside the window, in order.
     */
    public boolean isConsistent() {
        int start = ordinal(from);
        int length = span(start, ordinal(to));
        int completeStart = span(start, ordinal(completeFrom));
        int completeEnd = span(start, ordinal(completeTo));
        return completeStart <= completeEnd && completeEnd <= length;
    }

    /** The winter whose window begins in the given year. */
    public Season beginningIn(int year, CfCalendar calendar) {
        long first = calendar.dayNumber(from.in(year, calendar));
        int endYear = crossesNewYear() ? year + 1 : year;
        long last = calendar.dayNumber(to.in(endYear, calendar));
        String label = hemisphere == Hemisphere.NORTH ? northLabel(endYear) : Integer.toString(endYear);
        return new Season(label, endYear, calendar, first, (int) (last - first + 1),
                (int) (dayInside(completeFrom, year, calendar) - first), (int) (dayInside(completeTo, year, calendar) - first),
                hemisphere);
    }

    private long dayInside(MonthDay monthDay, int firstYear, CfCalendar calendar) {
        int year = monthDay.compareTo(from) < 0 ? firstYear + 1 : firstYear;
        return calendar.dayNumber(monthDay.in(year, calendar));
    }

    /** {@code 2003-04}; {@code 1999-2000} would break the pattern, so a century is written {@code 1999-00}. */
    private static String northLabel(int endYear) {
        int short2 = Math.floorMod(endYear, 100);
        return (endYear - 1) + "-" + (short2 < 10 ? "0" : "") + short2;
    }

    /**
     * The winters whose window shares at least one day with the axis, in order. Whether a winter is complete
     * enough to be used is decided elsewhere, from the days that are there.
     */
    public List<Season> seasons(DayAxis axis) {
        List<Season> seasons = new ArrayList<>();
        if (axis.size() == 0) {
            return seasons;
        }
        int firstYear = axis.date(0).year() - 1;
        int lastYear = axis.date(axis.size() - 1).year();
        for (int year = firstYear; year <= lastYear; year++) {
            Season season = beginningIn(year, axis.calendar());
            int index = axis.firstIndexFrom(season.firstDay());
            if (index < axis.size() && axis.day(index) < season.firstDay() + season.days()) {
                seasons.add(season);
            }
        }
        return seasons;
    }

    private static int ordinal(MonthDay day) {
        return day.month() * 31 + day.day();
    }

    private static int span(int from, int to) {
        return Math.floorMod(to - from, 12 * 31);
    }
}
