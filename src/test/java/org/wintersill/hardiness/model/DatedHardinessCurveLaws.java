package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

class DatedHardinessCurveLaws {

    @Property(tries = 200)
    void orderAndBoundsOfTheRowsHoldOnEveryNight(@ForAll @Size(min = 2, max = 8) List<@IntRange(min = 0, max = 335) Integer> days,
                                                 @ForAll @DoubleRange(min = -40, max = 0) double level,
                                                 @ForAll CfCalendar calendar, @ForAll @IntRange(min = 1900, max = 2100) int year,
                                                 @ForAll boolean south) {
        TreeSet<Integer> distinct = new TreeSet<>(days);
        if (distinct.size() < 2) {
            return;
        }
        List<Row> rows = new ArrayList<>();
        for (int day : distinct) {
            MonthDay date = new MonthDay(day / 28 + 1, day % 28 + 1);
            double lt50 = level - day % 7;
            rows.add(new Row(date, lt50 + 1 + day % 3, lt50, lt50 - 2 - day % 2));
        }
        Season season = (south ? SeasonWindow.south() : SeasonWindow.north()).beginningIn(year, calendar);
        LethalTemperatures values = new DatedHardinessCurve(rows, true).overSeason(season);
        for (int night = 0; night < values.days(); night++) {
            assertTrue(values.lt10()[night] > values.lt50()[night] && values.lt50()[night] > values.lt90()[night]);
            assertTrue(values.lt50()[night] <= level + 1e-9 && values.lt50()[night] >= level - 6 - 1e-9);
        }
    }

    @Property(tries = 100)
    void whatCoversTheWindowHasAValueOnEveryNight(@ForAll @IntRange(min = 0, max = 335) int first,
                                                  @ForAll @IntRange(min = 1, max = 11) int step,
                                                  @ForAll CfCalendar calendar, @ForAll boolean south) {
        List<Row> rows = new ArrayList<>();
        for (int offset = 0; offset < 336; offset += 28 * step) {
            int day = (first + offset) % 336;
            rows.add(new Row(new MonthDay(day / 28 + 1, day % 28 + 1), -1, -2, -3));
        }
        if (rows.size() < 2) {
            return;
        }
        SeasonWindow window = south ? SeasonWindow.south() : SeasonWindow.north();
        DatedHardinessCurve curve = new DatedHardinessCurve(rows, false);
        double[] lt50 = curve.overSeason(window.beginningIn(2019, calendar)).lt50();
        long silent = java.util.Arrays.stream(lt50).filter(Double::isNaN).count();
        assertEquals(curve.notCovering(window).isEmpty(), silent == 0, rows.toString());
    }
}
