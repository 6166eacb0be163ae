package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.model.ResponseModel;
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
    /** Limbs of a response. */
    static final String AUTUMN = "autumn";
    static final String SPRING = "spring";
    /** Trailing means that a response is shown for, degC. */
    static final int COLDEST_MEAN = -20;
    static final int WARMEST_MEAN = 20;

    /** What lethal temperatures are listed against. */
    public enum Kind {
        /** Every day of the winter's window. */
        DATE,
        /** The trailing mean temperature, for each limb of a response. */
        MEAN,
        /** Nothing: the model needs a temperature series. */
        STATE
    }

    /**
     * @param at month and day; limb of a response
     * @param position day of the window from 0; trailing mean, degC
     * @param lt10 degC; NaN where the model says nothing
     */
    public record Row(String at, double position, double lt10, double lt50, double lt90) {
    }

    public CultivarCurve {
        rows = List.copyOf(rows);
    }

    /** The curve through a window of a year without leap day. */
    public static CultivarCurve of(Cultivar cultivar, SeasonWindow window) {
        if (cultivar.model() instanceof ResponseModel response) {
            return new CultivarCurve(cultivar, Kind.MEAN, limbs(response));
        }
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

    private static List<Row> limbs(ResponseModel response) {
        List<Row> rows = new ArrayList<>();
        for (String limb : List.of(AUTUMN, SPRING)) {
            for (int mean = COLDEST_MEAN; mean <= WARMEST_MEAN; mean++) {
                double lt50 = (limb.equals(AUTUMN) ? response.autumn() : response.spring()).at(mean);
                rows.add(new Row(limb, mean, lt50 + response.toLt10(), lt50, lt50 - response.toLt90()));
            }
        }
        return rows;
    }

    /** The rows of one limb of a response. */
    List<Row> limb(String name) {
        return rows.stream().filter(row -> row.at().equals(name)).toList();
    }

    /** The winter that stands for all winters of a window. */
    static Season season(SeasonWindow window) {
        return window.beginningIn(ANY_YEAR, CfCalendar.NOLEAP);
    }
}
