package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

class DatedHardinessCurveTest {
    private static final Row[] WINTER = {row("10-10", -7.5, -9, -11), row("12-01", -15, -18.5, -21), row("01-20", -21, -24, -26.5),
        row("03-05", -13, -16, -18.5), row("04-30", -2, -3.1, -4)};
    private static final Map<String, DatedHardinessCurve> CURVES = Map.of(
            "wide", curve(false, row("08-15", 1, -2, -4), WINTER[0], WINTER[1], WINTER[2], WINTER[3], WINTER[4],
                    row("06-15", 0, -1.5, -3)),
            "held", curve(true, WINTER),
            "leap", curve(false, row("09-01", -3, -5, -7), row("02-28", -18, -20, -22), row("02-29", -10, -12, -15),
                    row("05-31", -1, -2, -3)),
            "south", curve(false, row("03-01", -3, -5, -7), row("05-10", -8, -10, -12.5), row("07-15", -17, -20, -22),
                    row("09-30", -6, -8, -9.5), row("11-30", -1, -2, -3)));

    /** Against numpy.interp in the calendars of cftime; recipe in src/test/python/dated_curve.py. */
    @Test
    void valuesEqualAnIndependentInterpolationInEveryCalendar() throws IOException {
        int compared = 0;
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(
                getClass().getResourceAsStream("/hardiness/dated-curve.csv"), StandardCharsets.UTF_8))) {
            for (String line : reader.lines().skip(2).toList()) {
                String[] cells = line.split(",");
                CfCalendar calendar = CfCalendar.named(cells[1]).orElseThrow();
                SeasonWindow window = cells[0].equals("south") ? SeasonWindow.south() : SeasonWindow.north();
                Season season = window.beginningIn(Integer.parseInt(cells[2]), calendar);
                LethalTemperatures values = CURVES.get(cells[0]).overSeason(season);
                assertEquals(season.days(), values.days());
                String[] date = cells[3].split("-");
                int position = season.position(new CfDate(Integer.parseInt(date[0]), Integer.parseInt(date[1]),
                        Integer.parseInt(date[2])));
                assertEquals(Double.parseDouble(cells[4]), values.lt10()[position], 1e-12, line);
                assertEquals(Double.parseDouble(cells[5]), values.lt50()[position], 1e-12, line);
                assertEquals(Double.parseDouble(cells[6]), values.lt90()[position], 1e-12, line);
                compared++;
            }
        }
        assertTrue(compared > 300, "compared " + compared);
    }

    @Test
    void rowsOfDaysThatTheCalendarLacksLieAtTheEndOfTheirMonth() {
        Season season = SeasonWindow.north().beginningIn(2019, CfCalendar.NOLEAP);
        double[] lt50 = CURVES.get("leap").overSeason(season).lt50();
        assertEquals(-20, lt50[season.position(new CfDate(2020, 2, 28))], "the row of the 28th keeps its own day");
        Season months30 = SeasonWindow.north().beginningIn(2019, CfCalendar.DAYS_360);
        double[] ends = CURVES.get("leap").overSeason(months30).lt50();
        assertEquals(-2, ends[months30.days() - 1], "31 May lies on 30 May");
    }

    @Test
    void aCurveFromJanuaryToDecemberCrossesTheNewYear() {
        DatedHardinessCurve listed = curve(false, row("01-20", -21, -24, -26.5), row("03-05", -13, -16, -18.5),
                row("06-15", 0, -1.5, -3), row("08-15", 1, -2, -4), row("10-10", -7.5, -9, -11), row("12-01", -15, -18.5, -21));
        DatedHardinessCurve winterOrder = curve(false, row("08-15", 1, -2, -4), row("10-10", -7.5, -9, -11),
                row("12-01", -15, -18.5, -21), row("01-20", -21, -24, -26.5), row("03-05", -13, -16, -18.5), row("06-15", 0, -1.5, -3));
        Season season = SeasonWindow.north().beginningIn(2019, CfCalendar.STANDARD);
        assertTrue(listed.notCovering(SeasonWindow.north()).isEmpty());
        assertEquals(0, Arrays.compare(winterOrder.overSeason(season).lt50(), listed.overSeason(season).lt50()));
    }

    @Test
    void aCurveThatDoesNotCoverTheWindowSaysWhereItFallsShort() {
        DatedHardinessCurve winter = curve(false, WINTER);
        assertEquals(Optional.of("its first date in the winter is 10-10 and its last date in the winter is 04-30"),
                winter.notCovering(SeasonWindow.north()));
        SeasonWindow inside = new SeasonWindow(MonthDay.parse("10-10"), MonthDay.parse("04-30"), MonthDay.parse("11-01"),
                MonthDay.parse("03-31"), SeasonWindow.Hemisphere.NORTH);
        assertTrue(winter.notCovering(inside).isEmpty());
        assertTrue(curve(true, WINTER).notCovering(SeasonWindow.north()).isEmpty());
        assertTrue(CURVES.get("wide").notCovering(SeasonWindow.north()).isEmpty());
        assertTrue(CURVES.get("south").notCovering(SeasonWindow.south()).isEmpty());
        DatedHardinessCurve early = curve(false, row("02-15", -3, -5, -7), row("07-15", -17, -20, -22), row("11-15", -1, -2, -3));
        assertEquals(Optional.of("its last date in the winter is 11-15"), early.notCovering(SeasonWindow.south()));
    }

    @Test
    void outsideItsRowsACurveThatDoesNotHoldSaysNothing() {
        Season season = SeasonWindow.north().beginningIn(2020, CfCalendar.STANDARD);
        double[] lt50 = curve(false, WINTER).overSeason(season).lt50();
        assertTrue(Double.isNaN(lt50[0]) && Double.isNaN(lt50[season.days() - 1]));
        assertEquals(-9, lt50[season.position(new CfDate(2020, 10, 10))]);
        double[] held = curve(true, WINTER).overSeason(season).lt50();
        assertEquals(-9, held[0]);
        assertEquals(-3.1, held[season.days() - 1]);
    }

    @Test
    void oneRowHoldsAllWinterOrOnItsDay() {
        assertThrows(IllegalArgumentException.class, () -> curve(true));
        Season season = SeasonWindow.north().beginningIn(2019, CfCalendar.STANDARD);
        assertTrue(Arrays.stream(curve(true, WINTER[2]).overSeason(season).lt50()).allMatch(lt50 -> lt50 == -24));
        assertEquals(1, Arrays.stream(curve(false, WINTER[2]).overSeason(season).lt50()).filter(lt50 -> lt50 == -24).count());
    }

    private static DatedHardinessCurve curve(boolean hold, Row... rows) {
        return new DatedHardinessCurve(List.of(rows), hold);
    }

    private static Row row(String date, double lt10, double lt50, double lt90) {
        return new Row(MonthDay.parse(date), lt10, lt50, lt90);
    }
}
