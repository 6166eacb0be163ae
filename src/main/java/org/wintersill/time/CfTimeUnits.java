package org.wintersill.time;

import java.io.Serializable;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A unit of time such as {@code hours since 1900-01-01 00:00:0.0} in a calendar (CF conventions 1.8, section 4.4).
 * Months and years are refused: they have no fixed length.
 */
public final class CfTimeUnits implements Serializable {
    private static final long serialVersionUID = 1L;
    private static final long DAY = 86400;
    private static final Pattern SHAPE = Pattern.compile("\\s*(\\S+)\\s+(?:since|after|from|ref)\\s+(.*)",
            Pattern.CASE_INSENSITIVE);
    private static final Pattern REFERENCE = Pattern.compile(
            "([+-]?\\d{1,6})-(\\d{1,2})(?:-(\\d{1,2}))?"
            + "(?:(?:\\s+|[tT]\\s*)(\\d{1,2})(?::(\\d{1,2}))?(?::(\\d{1,2})(?:\\.\\d*)?)?)?"
            + "\\s*(?:(Z|UTC|GMT)|([+-]?)(\\d{1,2})(?::?(\\d{2}))?)?", Pattern.CASE_INSENSITIVE);

    private final CfCalendar calendar;
    private final double secondsPerUnit;
    private final long reference;

    private CfTimeUnits(CfCalendar calendar, double secondsPerUnit, long reference) {
        this.calendar = calendar;
        this.secondsPerUnit = secondsPerUnit;
        this.reference = reference;
    }

    /**
     * Reads the text of a {@code units} attribute.
     *
     * @throws IllegalArgumentException with a clause for people, when it is no such unit or one that cannot be used
     */
    public static CfTimeUnits parse(String text, CfCalendar calendar) {
        Matcher shape = SHAPE.matcher(text);
        if (!shape.matches()) {
            throw new IllegalArgumentException("the unit of time '" + text + "' is not of the form 'days since 1950-01-01'");
        }
        double seconds = secondsPer(shape.group(1), text);
        Matcher matcher = REFERENCE.matcher(shape.group(2).trim());
        if (!matcher.matches()) {
            throw new IllegalArgumentException("the reference date '" + shape.group(2).trim()
                    + "' is not of the form 1950-01-01 00:00:00");
        }
        int year = Integer.parseInt(matcher.group(1));
        if (year == 0 && (calendar == CfCalendar.STANDARD || calendar == CfCalendar.JULIAN)) {
            throw new IllegalArgumentException("the reference date '" + matcher.group().trim() + "' lies in year 0, which the "
                    + calendar.cfName() + " calendar does not have (1 BC is followed by AD 1), so that programs differ by days"
                    + " about it");
        }
        CfDate date = new CfDate(year, Integer.parseInt(matcher.group(2)), number(matcher, 3, 1));
        if (!calendar.isValid(date)) {
            throw new IllegalArgumentException("the reference date " + date + " does not exist in the " + calendar.cfName()
                    + " calendar");
        }
        int hour = number(matcher, 4, 0);
        int minute = number(matcher, 5, 0);
        int second = number(matcher, 6, 0);
        if (hour > 24 || minute > 59 || second > 60) {
            throw new IllegalArgumentException("the reference time in '" + text + "' does not exist");
        }
        long zone = number(matcher, 9, 0) * 3600L + number(matcher, 10, 0) * 60L;
        if ("-".equals(matcher.group(8))) {
            zone = -zone;
        }
        long reference = calendar.dayNumber(date) * DAY + hour * 3600L + minute * 60L + second - zone;
        return new CfTimeUnits(calendar, seconds, reference);
    }

    private static int number(Matcher matcher, int group, int otherwise) {
        return matcher.group(group) == null ? otherwise : Integer.parseInt(matcher.group(group));
    }

    private static double secondsPer(String unit, String text) {
        return switch (unit.toLowerCase(Locale.ROOT)) {
            case "days", "day", "d" -> DAY;
            case "hours", "hour", "hrs", "hr", "h" -> 3600;
            case "minutes", "minute", "mins", "min" -> 60;
            case "seconds", "second", "secs", "sec", "s" -> 1;
            case "milliseconds", "millisecond", "millisecs", "millisec", "msecs", "msec", "ms" -> 1e-3;
            case "months", "month", "mon", "years", "year", "yr", "common_years", "common_year" ->
                    throw new IllegalArgumentException("the unit of time '" + text + "' counts " + unit
                            + ", which have no fixed length; days, hours, minutes and seconds are read");
            default -> throw new IllegalArgumentException("the unit of time '" + text
                    + "' is unknown; days, hours, minutes and seconds since a date are read");
        };
    }

    public CfCalendar calendar() {
        return calendar;
    }

    /**
     * Seconds since 1970-01-01T00:00 of the calendar, rounded to whole ones: a stamp of 23.9999999 hours means 24.
     *
     * @throws IllegalArgumentException for a value that is no time, such as NaN or a fill value
     */
    public long seconds(double value) {
        double seconds = value * secondsPerUnit;
        // 400 000 years; a fill value of 9.97e36 or 1e20 is far beyond
        if (!(Math.abs(seconds) < 1.3e13)) {
            throw new IllegalArgumentException("the time value " + value + " is no time");
        }
        return reference + Math.round(seconds);
    }

    /** Day number of the day that contains a time value. */
    public long day(double value) {
        return Math.floorDiv(seconds(value), DAY);
    }
}
