package org.wintersill.time;

import java.util.Locale;
import java.util.Optional;

/**
 * The calendars of CF 1.8 section 4.4.1. Day numbers count days since 1970-01-01 of the same calendar.
 *
 * <p>{@code standard} is the mixed calendar: Julian up to 1582-10-04, followed by Gregorian 1582-10-15.
 * Conversion between dates and day numbers uses integer arithmetic on years that begin in March
 * (so that the leap day is the last of the year), a form common to many textbooks.
 */
public enum CfCalendar {
    STANDARD("standard"),
    PROLEPTIC_GREGORIAN("proleptic_gregorian"),
    JULIAN("julian"),
    NOLEAP("noleap"),
    ALL_LEAP("all_leap"),
    DAYS_360("360_day");

    private static final int[] MONTH_LENGTHS = {31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31};
    private static final CfDate FIRST_GREGORIAN = new CfDate(1582, 10, 15);
    private static final CfDate LAST_JULIAN = new CfDate(1582, 10, 4);
    /** Day number of 1582-10-15 Gregorian, counted from 1970-01-01 Gregorian. */
    private static final long FIRST_GREGORIAN_DAY = gregorianDay(1582, 10, 15);
    /** 1970-01-01 Gregorian is 1969-12-19 Julian: 13 days apart. */
    private static final long JULIAN_SHIFT = julianCount(1970, 1, 1) - julianCount(1969, 12, 19);

    private final String cfName;

    CfCalendar(String cfName) {
        this.cfName = cfName;
    }

    /** Name as the CF conventions write it. */
    public String cfName() {
        return cfName;
    }

    /** The calendar of a CF {@code calendar} attribute, in any case; empty if the name is unknown. */
    public static Optional<CfCalendar> named(String text) {
        return switch (text.trim().toLowerCase(Locale.ROOT)) {
            case "standard", "gregorian" -> Optional.of(STANDARD);
            case "proleptic_gregorian" -> Optional.of(PROLEPTIC_GREGORIAN);
            case "julian" -> Optional.of(JULIAN);
            case "noleap", "365_day", "no_leap" -> Optional.of(NOLEAP);
            case "all_leap", "366_day" -> Optional.of(ALL_LEAP);
            case "360_day" -> Optional.of(DAYS_360);
            default -> Optional.empty();
        };
    }

    public boolean isLeapYear(int year) {
        return switch (this) {
            case NOLEAP, DAYS_360 -> false;
            case ALL_LEAP -> true;
            case JULIAN -> Math.floorMod(year, 4) == 0;
            case PROLEPTIC_GREGORIAN -> gregorianLeap(year);
            case STANDARD -> year <= 1582 ? Math.floorMod(year, 4) == 0 : gregorianLeap(year);
        };
    }

    /** Length of a month; October 1582 of the standard calendar ends on the 31st and lacks days inside. */
    public int daysInMonth(int year, int month) {
        if (this == DAYS_360) {
            return 30;
        }
        return month == 2 && isLeapYear(year) ? 29 : MONTH_LENGTHS[month - 1];
    }

    public boolean isValid(CfDate date) {
        return date.month() >= 1 && date.month() <= 12 && date.day() >= 1
                && date.day() <= daysInMonth(date.year(), date.month())
                && !(this == STANDARD && date.compareTo(LAST_JULIAN) > 0 && date.compareTo(FIRST_GREGORIAN) < 0);
    }

    /**
     * Days since 1970-01-01 of this calendar.
     *
     * @throws IllegalArgumentException for a date that this calendar does not have
     */
    public long dayNumber(CfDate date) {
        if (!isValid(date)) {
            throw new IllegalArgumentException(date + " does not exist in the " + cfName + " calendar");
        }
        int year = date.year();
        return switch (this) {
            case DAYS_360 -> 360L * (year - 1970) + 30L * (date.month() - 1) + date.day() - 1;
            case NOLEAP -> 365L * (year - 1970) + dayOfYear(date) - 1;
            case ALL_LEAP -> 366L * (year - 1970) + dayOfYear(date) - 1;
            case JULIAN -> julianCount(year, date.month(), date.day()) - julianCount(1970, 1, 1);
            case PROLEPTIC_GREGORIAN -> gregorianDay(year, date.month(), date.day());
            case STANDARD -> date.compareTo(FIRST_GREGORIAN) >= 0
                    ? gregorianDay(year, date.month(), date.day())
                    : julianCount(year, date.month(), date.day()) - julianCount(1970, 1, 1) + JULIAN_SHIFT;
        };
    }

    /** The date of a day number: the inverse of {@link #dayNumber}. */
    public CfDate date(long dayNumber) {
        return switch (this) {
            case DAYS_360 -> {
                int rest = (int) Math.floorMod(dayNumber, 360L);
                yield new CfDate((int) (1970 + Math.floorDiv(dayNumber, 360L)), rest / 30 + 1, rest % 30 + 1);
            }
            case NOLEAP -> inEqualYears(dayNumber, 365);
            case ALL_LEAP -> inEqualYears(dayNumber, 366);
            case JULIAN -> julianDate(dayNumber + julianCount(1970, 1, 1));
            case PROLEPTIC_GREGORIAN -> gregorianDate(dayNumber);
            case STANDARD -> dayNumber >= FIRST_GREGORIAN_DAY ? gregorianDate(dayNumber)
                    : julianDate(dayNumber - JULIAN_SHIFT + julianCount(1970, 1, 1));
        };
    }

    /** Day of the year from 1. */
    public int dayOfYear(CfDate date) {
        int count = date.day();
        for (int month = 1; month < date.month(); month++) {
            count += daysInMonth(date.year(), month);
        }
        return count;
    }

    private CfDate inEqualYears(long dayNumber, int length) {
        int year = (int) (1970 + Math.floorDiv(dayNumber, (long) length));
        int rest = (int) Math.floorMod(dayNumber, (long) length);
        int month = 1;
        while (rest >= daysInMonth(year, month)) {
            rest -= daysInMonth(year, month);
            month++;
        }
        return new CfDate(year, month, rest + 1);
    }

    private static boolean gregorianLeap(int year) {
        return Math.floorMod(year, 4) == 0 && (Math.floorMod(year, 100) != 0 || Math.floorMod(year, 400) == 0);
    }

    /** Days from 1 March of year 0 to the given month and day, years beginning in March. */
    private static long daysFromMarch(long marchYear, int month, int day) {
        int monthsSinceMarch = (month + 9) % 12;
        return 365 * marchYear + Math.floorDiv(marchYear, 4L) + (153L * monthsSinceMarch + 2) / 5 + day - 1;
    }

    private static long julianCount(int year, int month, int day) {
        return daysFromMarch(month <= 2 ? year - 1L : year, month, day);
    }

    private static long gregorianCount(int year, int month, int day) {
        long marchYear = month <= 2 ? year - 1L : year;
        return daysFromMarch(marchYear, month, day) - Math.floorDiv(marchYear, 100L) + Math.floorDiv(marchYear, 400L);
    }

    private static long gregorianDay(int year, int month, int day) {
        return gregorianCount(year, month, day) - gregorianCount(1970, 1, 1);
    }

    private static CfDate julianDate(long count) {
        long cycle = Math.floorDiv(count, 1461L);
        long rest = Math.floorMod(count, 1461L);
        long yearInCycle = Math.min(rest / 365, 3);
        return fromMarch(4 * cycle + yearInCycle, (int) (rest - 365 * yearInCycle));
    }

    private static CfDate gregorianDate(long dayNumber) {
        long count = dayNumber + gregorianCount(1970, 1, 1);
        long cycle = Math.floorDiv(count, 146097L);
        long rest = Math.floorMod(count, 146097L);
        long century = Math.min(rest / 36524, 3);
        rest -= century * 36524;
        long quad = Math.min(rest / 1461, 24);
        rest -= quad * 1461;
        long yearInQuad = Math.min(rest / 365, 3);
        return fromMarch(400 * cycle + 100 * century + 4 * quad + yearInQuad, (int) (rest - 365 * yearInQuad));
    }

    /** @param dayOfMarchYear 0 on 1 March */
    private static CfDate fromMarch(long marchYear, int dayOfMarchYear) {
        int monthsSinceMarch = (5 * dayOfMarchYear + 2) / 153;
        int day = dayOfMarchYear - (153 * monthsSinceMarch + 2) / 5 + 1;
        int month = monthsSinceMarch < 10 ? monthsSinceMarch + 3 : monthsSinceMarch - 9;
        return new CfDate((int) (month <= 2 ? marchYear + 1 : marchYear), month, day);
    }
}
