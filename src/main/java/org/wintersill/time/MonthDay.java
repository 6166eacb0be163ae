package org.wintersill.time;

import java.io.Serializable;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A day of the year without a year, written {@code 11-01}. 02-29 and 02-30 mean the last day of February. */
public record MonthDay(int month, int day) implements Comparable<MonthDay>, Serializable {
    private static final Pattern FORM = Pattern.compile("(\\d{1,2})-(\\d{1,2})");
    /** Longest that each month is in any calendar: the 360-day calendar gives February 30 days. */
    private static final int[] LONGEST = {31, 30, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31};

    public MonthDay {
        if (month < 1 || month > 12 || day < 1 || day > LONGEST[month - 1]) {
            throw new IllegalArgumentException("no such day of the year: " + month + "-" + day);
        }
    }

    /**
     * Reads {@code MM-DD}.
     *
     * @throws IllegalArgumentException when it is not one
     */
    public static MonthDay parse(String text) {
        Matcher matcher = FORM.matcher(text.trim());
        if (!matcher.matches()) {
            throw new IllegalArgumentException("not a month-day like 11-01: " + text);
        }
        return new MonthDay(Integer.parseInt(matcher.group(1)), Integer.parseInt(matcher.group(2)));
    }

    /** The date in a year; a day beyond the end of the month is the last day of that month in that calendar. */
    public CfDate in(int year, CfCalendar calendar) {
        return new CfDate(year, month, Math.min(day, calendar.daysInMonth(year, month)));
    }

    @Override
    public int compareTo(MonthDay other) {
        return month != other.month ? Integer.compare(month, other.month) : Integer.compare(day, other.day);
    }

    @Override
    public String toString() {
        return (month < 10 ? "0" : "") + month + "-" + (day < 10 ? "0" : "") + day;
    }
}
