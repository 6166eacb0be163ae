package org.wintersill.season;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Rules: checks/completeness.csv (WMO-No. 1203 and the older 3/5 rule, as restated there). */
class CompletenessTest {

    @Test
    void monthsCountAsTabled() {
        for (CSVRecord row : CheckTables.csv("completeness.csv")) {
            int missing = Integer.parseInt(row.get("missing"));
            int run = Integer.parseInt(row.get("longest_run"));
            assertEquals("1".equals(row.get("ok_wmo1203")), MissingDayPolicy.MONTH_10_5.monthCounts(missing, run), row.toString());
            assertEquals("1".equals(row.get("ok_3_5_rule")), MissingDayPolicy.MONTH_5_3.monthCounts(missing, run), row.toString());
        }
    }

    private static CompletenessTally tally(MissingDayPolicy policy, String... missing) {
        Season season = SeasonWindow.north().beginningIn(2003, CfCalendar.STANDARD);
        CompletenessTally tally = new CompletenessTally(season, policy, 2);
        java.util.Set<String> dates = java.util.Set.of(missing);
        for (int night = 0; night < season.days(); night++) {
            boolean masked = dates.contains(season.date(night).toString());
            tally.accept(night, new float[] {masked ? Float.NaN : 1, 1}, 0, 0, 2);
        }
        return tally;
    }

    private static String[] days(int year, int month, int from, int to) {
        return java.util.stream.IntStream.rangeClosed(from, to).mapToObj(day -> new CfDate(year, month, day).toString())
                .toArray(String[]::new);
    }

    @Test
    void aMonthWithFiveMissingDaysInARowFailsTheWinterInThatCellOnly() {
        CompletenessTally tally = tally(MissingDayPolicy.MONTH_10_5, days(2004, 2, 3, 7));
        assertFalse(tally.isComplete(0));
        assertTrue(tally.isComplete(1));
        assertTrue(tally(MissingDayPolicy.MONTH_10_5, days(2004, 2, 3, 6)).isComplete(0));
    }

    @Test
    void missingDaysOutsideOfTheCompletePartDoNotCount() {
        assertTrue(tally(MissingDayPolicy.NONE, days(2003, 10, 1, 31)).isComplete(0));
        assertTrue(tally(MissingDayPolicy.NONE, days(2004, 5, 1, 31)).isComplete(0));
        assertFalse(tally(MissingDayPolicy.NONE, days(2003, 11, 1, 1)).isComplete(0));
        assertFalse(tally(MissingDayPolicy.NONE, days(2004, 4, 30, 30)).isComplete(0));
    }

    @Test
    void aRunOverTheEndOfAMonthIsJudgedMonthByMonth() {
        String[] run = {"2003-12-28", "2003-12-29", "2003-12-30", "2003-12-31", "2004-01-01", "2004-01-02", "2004-01-03", "2004-01-04"};
        assertTrue(tally(MissingDayPolicy.MONTH_10_5, run).isComplete(0));
    }
}
