package org.wintersill.hardiness.model;

import java.io.Serializable;
import java.util.List;
import java.util.Optional;
import java.util.TreeMap;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Lethal temperatures listed by month and day, linear in between.
 *
 * <p>With rows at days a &lt; b of the winter, {@code LTq(d) = LTq(a) + (LTq(b) - LTq(a)) (d - a) / (b - a)} for q = 10, 50, 90,
 * each by itself; days are counted in the calendar of the temperatures, so 29 February lies one day after the 28th where it
 * exists. A row whose day the calendar lacks (29 February, or the 31st of a 360-day month) lies on the last day of its month,
 * unless another row has that day already. Project choice: linear in time, science section 16, item 2.
 *
 * <p>Rows are placed into the two calendar years of a winter: from the window's first day on in the first, before it in the
 * second. Rows that lie outside the window and head the list come before the winter, so a list that begins on 15 August covers a
 * winter that begins on 1 September. If the list begins and ends inside the window, as a list from January to December does, its
 * rows outside the window hold both before and after the winter.
 *
 * <p>Outside its rows the curve says nothing (NaN), unless it holds its first and last row.
 *
 * @param rows at least one, ascending around the year, no two on one day
 * @param holdOutside whether the first and the last row are kept outside the dates of the curve
 */
public record DatedHardinessCurve(List<Row> rows, boolean holdOutside) implements CalendarModel {

    /** Longer than any month, so that month * this + day orders the days of a year. */
    private static final int MONTH_STRIDE = 31;
    private static final int YEAR_STRIDE = 12 * MONTH_STRIDE;

    /**
     * Lethal temperatures on one day of the year.
     *
     * @param lt10 degC, warmer than lt50
     * @param lt50 degC, warmer than lt90
     * @param lt90 degC
     */
    public record Row(MonthDay date, double lt10, double lt50, double lt90) implements Serializable {
    }

    public DatedHardinessCurve {
        rows = List.copyOf(rows);
        if (rows.isEmpty()) {
            throw new IllegalArgumentException("a dated curve needs a row");
        }
    }

    @Override
    public String id() {
        return "dated";
    }

    @Override
    public String describe() {
        return "dated curve of " + rows.size() + " rows from " + rows.get(0).date() + " to " + rows.get(rows.size() - 1).date()
                + (holdOutside ? ", first and last row held outside" : "");
    }

    @Override
    public LethalTemperatures overSeason(Season season) {
        TreeMap<Long, Row> placed = placed(season);
        double[] lt10 = new double[season.days()];
        double[] lt50 = new double[season.days()];
        double[] lt90 = new double[season.days()];
        for (int position = 0; position < season.days(); position++) {
            long day = season.firstDay() + position;
            Long before = placed.floorKey(day);
            Long after = placed.ceilingKey(day);
            if (holdOutside) {
                before = before == null ? after : before;
                after = after == null ? before : after;
            }
            if (before == null || after == null) {
                lt10[position] = Double.NaN;
                lt50[position] = Double.NaN;
                lt90[position] = Double.NaN;
                continue;
            }
            Row a = placed.get(before);
            Row b = placed.get(after);
            double share = before.equals(after) ? 0 : (double) (day - before) / (after - before);
            lt10[position] = between(a.lt10(), b.lt10(), share);
            lt50[position] = between(a.lt50(), b.lt50(), share);
            lt90[position] = between(a.lt90(), b.lt90(), share);
        }
        return new LethalTemperatures(lt10, lt50, lt90);
    }

    @Override
    public Optional<String> notCovering(SeasonWindow window) {
        if (holdOutside) {
            return Optional.empty();
        }
        int length = offset(window.to(), window.from());
        int first = Integer.MAX_VALUE;
        int last = Integer.MIN_VALUE;
        MonthDay firstDate = null;
        MonthDay lastDate = null;
        for (Row row : rows) {
            int offset = offset(row.date(), window.from());
            Place place = place(offset, offset(rows.get(0).date(), window.from()),
                    offset(rows.get(rows.size() - 1).date(), window.from()), length);
            if (place.before() && offset - YEAR_STRIDE < first || offset < first && place.after()) {
                first = place.before() ? offset - YEAR_STRIDE : offset;
                firstDate = row.date();
            }
            if (place.after() && offset > last) {
                last = offset;
                lastDate = row.date();
            }
        }
        String early = first > 0 ? "its first date in the winter is " + firstDate : "";
        String late = last < length ? "its last date in the winter is " + lastDate : "";
        String reason = early + (early.isEmpty() || late.isEmpty() ? "" : " and ") + late;
        return reason.isEmpty() ? Optional.empty() : Optional.of(reason);
    }

    /** Day number and row, in order of time. */
    private TreeMap<Long, Row> placed(Season season) {
        CfCalendar calendar = season.calendar();
        CfDate firstDay = season.first();
        MonthDay from = new MonthDay(firstDay.month(), firstDay.day());
        MonthDay to = new MonthDay(season.last().month(), season.last().day());
        int length = offset(to, from);
        int first = offset(rows.get(0).date(), from);
        int last = offset(rows.get(rows.size() - 1).date(), from);
        TreeMap<Long, Row> placed = new TreeMap<>();
        for (Row row : rows) {
            int year = row.date().compareTo(from) < 0 ? firstDay.year() + 1 : firstDay.year();
            Place place = place(offset(row.date(), from), first, last, length);
            if (place.before()) {
                put(placed, row, calendar.dayNumber(row.date().in(year - 1, calendar)), calendar);
            }
            if (place.after()) {
                put(placed, row, calendar.dayNumber(row.date().in(year, calendar)), calendar);
            }
        }
        return placed;
    }

    /** A row on its own day goes before one that was moved to the end of its month. */
    private static void put(TreeMap<Long, Row> placed, Row row, long day, CfCalendar calendar) {
        Row there = placed.get(day);
        if (there == null || calendar.date(day).day() == row.date().day()) {
            placed.put(day, row);
        }
    }

    /** Whether a row stands before the winter, in or after it, or both. */
    private record Place(boolean before, boolean after) {
    }

    /**
     * @param offset days (in strides) from the window's first day to the row
     * @param first the same for the first row of the list
     * @param last the same for the last row
     * @param length the same for the window's last day
     */
    private static Place place(int offset, int first, int last, int length) {
        boolean outside = offset > length;
        if (!outside || first <= last) {
            return new Place(false, true);
        }
        if (first <= length) {
            return new Place(true, true);
        }
        boolean heads = offset >= first;
        return new Place(heads, !heads);
    }

    private static int offset(MonthDay date, MonthDay from) {
        return Math.floorMod(ordinal(date) - ordinal(from), YEAR_STRIDE);
    }

    private static int ordinal(MonthDay date) {
        return date.month() * MONTH_STRIDE + date.day();
    }

    private static double between(double a, double b, double share) {
        return a + (b - a) * share;
    }
}
