package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * What a cultivar's model says without any weather.
 *
 * @param kind against what the lethal temperatures stand
 * @param rows ascending; empty for {@link Kind#STATE}
 */
public record CultivarCurve(Cultivar cultivar, Kind kind, List<Row> rows) {
    /** A year of 365 days that belongs to no winter in particular. */
    private static final int ANY_YEAR = 2001;

    /** What lethal temperatures are listed against. */
    public enum Kind {
        /** Every day of the winter's window. */
        DATE,
        /** Nothing: the model needs a temperature series. */
        STATE
    }

    /**
     * @param at month and day
     * @param position day of the window from 0
     * @param lt10 degC; NaN where the model says nothing
     */
    public record Row(String at, double position, double lt10, double lt50, double lt90) {
    }

    public CultivarCurve {
        rows = List.copyOf(rows);
    }

    /** The curve through a window of a year without leap day. */
    public static CultivarCurve of(Cultivar cultivar, SeasonWindow window) {
        if (!(cultivar.model() instanceof CalendarModel model)) {
            return new CultivarCurve(cultivar, Kind.STATE, List.of());
        }
        Season season = season(window);
        LethalTemperatures course = model.overSeason(season);
        List<Row> rows = new ArrayList<>();
        for (int day = 0; day < season.days(); day++) {
            CfDate date = season.date(day);
            rows.add(new Row(new MonthDay(date.month(), date.day()).toString(), day, course.lt10()[day], course.lt50()[day],
                    course.lt90()[day]));
        }
        return new CultivarCurve(cultivar, Kind.DATE, rows);
    }

    /** The winter that stands for all winters of a window. */
    static Season season(SeasonWindow window) {
        return window.beginningIn(ANY_YEAR, CfCalendar.NOLEAP);
    }
}
