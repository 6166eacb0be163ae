package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfTimeUnits;
import org.wintersill.time.DayAxis;

/**
 * The days of the records of a file: with bounds the day that contains their middle, otherwise the day of the stamp.
 *
 * @param axis days in order
 * @param records {@code [position on the axis]}: record of the file
 * @param unit unit of time as the file gives it
 * @param fromBounds whether bounds decided
 */
record RecordDays(DayAxis axis, int[] records, String unit, boolean fromBounds) {
    private static final long DAY = 86400;
    /** A record of more than this many seconds is no daily one: a day and a half, room for odd bounds. */
    private static final long LONGEST = 129_600;
    /** Steps below this are sub-daily: 23 hours, room for the change of summer time. */
    private static final long SHORTEST = 82_800;
    /** Records that are all at least this far apart are monthly: 27 days. */
    private static final long MONTHLY = 27 * DAY;

    static RecordDays read(CdfHeader header, RawReader reader, CdfVariable time, int records) {
        Path path = header.path();
        String where = CdfProblems.at(path, time.name());
        if (records == 0) {
            throw Problem.input("The file has no records: zero days", where, "Give a file that has data").asException();
        }
        String calendarName = time.text("calendar").orElse("standard");
        CfCalendar calendar = CfCalendar.named(calendarName).orElseThrow(() ->
                Problem.input("The calendar '" + calendarName + "' is unknown; standard, gregorian, proleptic_gregorian,"
                        + " noleap, all_leap, 360_day and julian are read", where, "Correct the calendar attribute").asException());
        String unit = time.text("units").orElseThrow(() ->
                Problem.input("Time has no units attribute", where, "Give it one, such as 'days since 1950-01-01'").asException());
        if (time.text("climatology").isPresent()) {
            throw Problem.input("The records are a climatology, not days", where, "Give daily data").asException();
        }
        CfTimeUnits units = units(unit, calendar, where);
        double[] stamps = reader.all(time);
        if (stamps.length != records) {
            throw Problem.input("Time has " + stamps.length + " entries for " + records + " records", where, "Repair the file")
                    .asException();
        }
        double[] bounds = time.text("bounds").flatMap(header::variable)
                .filter(b -> b.size() == 2L * records && b.type().isNumeric()).map(reader::all).orElse(null);
        CfTimeUnits boundUnits = time.text("bounds").flatMap(header::variable).flatMap(b -> b.text("units"))
                .map(text -> units(text, calendar, where)).orElse(units);
        long[] moments = new long[records];
        boolean bounded = bounds != null;
        for (int i = 0; i < records; i++) {
            moments[i] = moment(stamps[i], bounds, i, units, boundUnits, where);
        }
        Integer[] order = IntStream.range(0, records).boxed().toArray(Integer[]::new);
        Arrays.sort(order, Comparator.<Integer>comparingLong(i -> moments[i]).thenComparing(Comparator.naturalOrder()));
        int[] sorted = Arrays.stream(order).mapToInt(Integer::intValue).toArray();
        long[] days = Arrays.stream(sorted).mapToLong(i -> Math.floorDiv(moments[i], DAY)).toArray();
        refuseOtherSteps(sorted, moments, days, calendar, where);
        return new RecordDays(new DayAxis(calendar, days), sorted, unit, bounded);
    }

    private static CfTimeUnits units(String text, CfCalendar calendar, String where) {
        try {
            return CfTimeUnits.parse(text, calendar);
        } catch (IllegalArgumentException e) {
            throw Problem.input(capital(e.getMessage()), where, "Correct the units, for example to 'days since 1950-01-01'")
                    .asException(e);
        }
    }

    private static String capital(String clause) {
        return Character.toUpperCase(clause.charAt(0)) + clause.substring(1);
    }

    /** The second that decides the day of a record. */
    private static long moment(double stamp, double[] bounds, int i, CfTimeUnits units, CfTimeUnits boundUnits, String where) {
        try {
            if (bounds != null && Double.isFinite(bounds[2 * i]) && bounds[2 * i] != bounds[2 * i + 1]) {
                long from = boundUnits.seconds(bounds[2 * i]);
                long to = boundUnits.seconds(bounds[2 * i + 1]);
                if (Math.abs(to - from) > LONGEST) {
                    throw Problem.input("Record " + (i + 1) + " covers " + Math.round(Math.abs(to - from) / 8640.0) / 10.0
                            + " days; only daily data are read", where, "Give daily data").asException();
                }
                return from + Math.floorDiv(to - from, 2L);
            }
            return units.seconds(stamp);
        } catch (IllegalArgumentException e) {
            throw Problem.input("Record " + (i + 1) + " has no date: " + e.getMessage(), where, "Repair the time axis")
                    .asException(e);
        }
    }

    private static void refuseOtherSteps(int[] sorted, long[] moments, long[] days, CfCalendar calendar, String where) {
        List<String> twice = new ArrayList<>();
        long shortest = Long.MAX_VALUE;
        int doubled = 0;
        for (int i = 1; i < days.length; i++) {
            long step = moments[sorted[i]] - moments[sorted[i - 1]];
            shortest = Math.min(shortest, step);
            if (days[i] == days[i - 1]) {
                doubled++;
                String date = calendar.date(days[i]).toString();
                if (twice.size() < 5 && !twice.contains(date)) {
                    twice.add(date);
                }
            }
        }
        if (doubled > 0) {
            throw doubled * 2 >= days.length && shortest > 0 && shortest < SHORTEST ? subDaily(shortest, where)
                    : Problem.input("Two records fall on the same day: " + String.join(", ", twice)
                            + (doubled > twice.size() ? " and others" : ""), where, "Remove one of each, or give time bounds if"
                            + " the stamps lie at the end of the day").asException();
        }
        if (days.length > 2 && shortest >= MONTHLY) {
            throw Problem.input("The records are " + shortest / DAY + " days or more apart; only daily data are read", where,
                    "Give daily data").asException();
        }
    }

    private static ProblemException subDaily(long seconds, String where) {
        String step = seconds % 3600 == 0 ? seconds / 3600 + " hours" : seconds / 60 + " minutes";
        return Problem.input("The records are " + step + " apart: hourly or sub-daily data; only daily data are read", where,
                "Make daily values first, for example with 'cdo daymin'").asException();
    }

    /** Whether records follow each other in time as they do in the file. */
    boolean inOrder() {
        for (int i = 0; i < records.length; i++) {
            if (records[i] != i) {
                return false;
            }
        }
        return true;
    }

    /** The time coordinate of a variable without time dimension: a single value that is a time. */
    static Optional<CdfVariable> scalarTime(CdfHeader header) {
        return header.all().stream().filter(v -> v.type().isNumeric() && v.rank() <= 1 && v.size() == 1
                && v.word("units").contains(" since ")).findFirst();
    }
}
