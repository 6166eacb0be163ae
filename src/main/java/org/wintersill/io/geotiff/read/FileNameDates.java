package org.wintersill.io.geotiff.read;

import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.problem.Problem;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/**
 * Dates in file names by a pattern of {@code yyyy}, {@code MM}, {@code dd} and {@code DDD} (day of the year), with any other
 * letters between them standing for themselves.
 */
final class FileNameDates {
    /** How much time a date in a name covers. */
    enum Span { DAY, MONTH, YEAR }

    /** First day of the time that the name gives, and how long it is. */
    record Named(CfDate first, Span span) {
        int days(CfCalendar calendar) {
            return switch (span) {
                case DAY -> 1;
                case MONTH -> calendar.daysInMonth(first.year(), first.month());
                case YEAR -> calendar.dayOfYear(new CfDate(first.year(), 12, 31));
            };
        }
    }

    private static final String ACCEPTED = "Write it with yyyy, MM, dd or DDD, such as yyyyMMdd, yyyy_MM_dd, yyyy_MM or yyyyDDD";
    private static final Pattern DAY_ITSELF = Pattern.compile("(?<![0-9])([0-9]{4})([-_.]?)([0-9]{2})\\2([0-9]{2})(?![0-9])");

    private FileNameDates() {
    }

    /** @throws org.wintersill.problem.ProblemException for a pattern that is none and a name that does not fit it */
    static Named byPattern(String pattern, String fileName, String where, CfCalendar calendar) {
        boolean month = pattern.contains("MM");
        boolean day = pattern.contains("dd");
        boolean dayOfYear = pattern.contains("DDD");
        String rest = pattern.replaceFirst("yyyy", "").replaceFirst("MM", "").replaceFirst("dd", "").replaceFirst("DDD", "");
        if (!pattern.contains("yyyy") || day && !month || dayOfYear && (month || day) || rest.matches("(?s).*(yy|YYYY|mm|MM|dd|DD).*")) {
            throw Problem.usage("The pattern dates: '" + pattern + "' names no date", where, ACCEPTED).asException();
        }
        Set<Named> found = new TreeSet<>(java.util.Comparator.comparing(Named::first));
        Matcher matcher = compile(pattern).matcher(fileName);
        for (int from = 0; matcher.find(from); from = matcher.start() + 1) {
            int year = Integer.parseInt(matcher.group("y"));
            if (dayOfYear) {
                int number = Integer.parseInt(matcher.group("D"));
                if (number >= 1 && number <= calendar.dayOfYear(new CfDate(year, 12, 31))) {
                    found.add(new Named(calendar.date(calendar.dayNumber(new CfDate(year, 1, 1)) + number - 1), Span.DAY));
                }
                continue;
            }
            CfDate date = new CfDate(year, month ? Integer.parseInt(matcher.group("M")) : 1, day ? Integer.parseInt(matcher.group("d")) : 1);
            if (calendar.isValid(date)) {
                found.add(new Named(date, day ? Span.DAY : month ? Span.MONTH : Span.YEAR));
            }
        }
        if (found.size() == 1) {
            return found.iterator().next();
        }
        throw Problem.input(found.isEmpty() ? "The file name '" + fileName + "' holds no date of the form " + pattern
                : "The file name '" + fileName + "' holds " + found.size() + " dates of the form " + pattern, where,
                "Set dates: to the form that the names have, with the letters around it if need be, such as tmin_" + pattern).asException();
    }

    private static Pattern compile(String pattern) {
        String quoted = Pattern.quote(pattern).replaceFirst("yyyy", "\\\\E(?<y>[0-9]{4})\\\\Q").replaceFirst("MM", "\\\\E(?<M>[0-9]{2})\\\\Q")
                .replaceFirst("DDD", "\\\\E(?<D>[0-9]{3})\\\\Q").replaceFirst("dd", "\\\\E(?<d>[0-9]{2})\\\\Q");
        return Pattern.compile("(?<![0-9])" + quoted + "(?![0-9])");
    }

    /** The one day that a name holds as eight digits, or as 4, 2 and 2 with the same sign between; empty if none or several. */
    static Optional<CfDate> unambiguousDay(String text, CfCalendar calendar) {
        Set<CfDate> found = new TreeSet<>();
        Matcher matcher = DAY_ITSELF.matcher(text);
        while (matcher.find()) {
            CfDate date = new CfDate(Integer.parseInt(matcher.group(1)), Integer.parseInt(matcher.group(3)), Integer.parseInt(matcher.group(4)));
            if (calendar.isValid(date) && date.year() >= 1000) {
                found.add(date);
            }
        }
        return found.size() == 1 ? Optional.of(found.iterator().next()) : Optional.empty();
    }
}
