package org.wintersill.hardiness.model;

import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow.Hemisphere;

/** Where a day of the year lies in a winter. */
final class StartDay {
    /** A day of the year may lie this long before the window's first day; otherwise it is the one in the winter. Project choice. */
    private static final int LONGEST_LEAD = 120;

    private StartDay() {
    }

    /** Position of a day in the window: its first occurrence from 120 days before the window's first day on. */
    static int position(Season season, MonthDay day) {
        int year = season.first().year() - 1;
        int position = season.position(day.in(year, season.calendar()));
        while (position < -LONGEST_LEAD) {
            year++;
            position = season.position(day.in(year, season.calendar()));
        }
        return position;
    }

    /** The same for a day that may be null, which stands for one day in the north and another in the south. */
    static int position(Season season, MonthDay day, MonthDay north, MonthDay south) {
        return position(season, day != null ? day : season.hemisphere() == Hemisphere.NORTH ? north : south);
    }
}
