package org.wintersill.time;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

class CfTimeUnitsTest {

    /** Source: cftime 1.6.2, see the column {@code source} of the table. */
    @ParameterizedTest
    @CsvFileSource(resources = "/checks/calendar.csv", useHeadersInDisplayName = true, numLinesToSkip = 1)
    void datesAreThoseOfCftime(String calendar, String units, double value, String date, int north, int south, String source) {
        CfTimeUnits parsed = CfTimeUnits.parse(units, CfCalendar.named(calendar).orElseThrow());
        CfDate found = parsed.calendar().date(parsed.day(value));
        long second = Math.floorMod(parsed.seconds(value), 86400L);
        assertEquals(date, found + "T" + two(second / 3600) + ":" + two(second / 60 % 60) + ":" + two(second % 60), source);
        assertEquals(parsed.day(value), parsed.calendar().dayNumber(found));
    }

    private static String two(long number) {
        return (number < 10 ? "0" : "") + number;
    }

    @ParameterizedTest
    @CsvSource({"days since 1990-1-1 0:0:0", "day since 1990-01-01", "d since 1990-01-01T00:00:00Z", "Days Since 1990-01-01",
        "days since 1990-01-01 00:00:00.0", "days since 1990-01-01 00:00:00 UTC", "days since 1990-01-01 00:00:00 +00:00",
        "days since 1990-01-01 06:00 +6:00", "days since 1990-01-01 00"})
    void spellingsOfOneUnitMeanTheSame(String text) {
        assertEquals(CfCalendar.STANDARD.dayNumber(new CfDate(1990, 1, 11)) * 86400,
                CfTimeUnits.parse(text, CfCalendar.STANDARD).seconds(10));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
            months since 1990-01-01 | no fixed length
            years since 1990-01-01 | no fixed length
            fortnights since 1990-01-01 | unknown
            1990-01-01 | not of the form
            days since yesterday | not of the form
            days since 1990-02-30 | does not exist
            hour since 0000-01-01 | year 0
            """)
    void otherUnitsAreRefusedWithTheReason(String text, String words) {
        String message = assertThrows(IllegalArgumentException.class, () -> CfTimeUnits.parse(text, CfCalendar.STANDARD))
                .getMessage();
        assertTrue(message.contains(words), message);
    }

    @Test
    void yearZeroExistsWhereNoCalendarReformDid() {
        assertEquals(new CfDate(0, 12, 31), CfCalendar.NOLEAP.date(
                CfTimeUnits.parse("days since 0000-01-01", CfCalendar.NOLEAP).day(364)));
    }

    @Test
    void roundOffNeverMovesAStampToTheDayBefore() {
        CfTimeUnits hours = CfTimeUnits.parse("hours since 1900-01-01", CfCalendar.STANDARD);
        assertEquals(hours.day(1_000_008), hours.day(1_000_008 - 1e-7));
    }

    @Test
    void fillIsNoTime() {
        CfTimeUnits days = CfTimeUnits.parse("days since 1900-01-01", CfCalendar.STANDARD);
        assertThrows(IllegalArgumentException.class, () -> days.day(9.96921e36));
        assertThrows(IllegalArgumentException.class, () -> days.day(Double.NaN));
    }
}
