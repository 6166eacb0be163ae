package org.wintersill.scenario;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;

/**
 * Which days of a series are pooled for a time of the year. Series of different calendars are matched by their place in the year:
 * the same calendar month, or the same fraction of the year.
 */
public enum YearPools {
    /** Twelve pools, one a calendar month; a day belongs to its own. */
    MONTH("month", 12) {
        @Override
        int poolOf(CfDate date, CfCalendar calendar) {
            return date.month() - 1;
        }

        @Override
        boolean holds(int pool, CfDate date, CfCalendar calendar) {
            return poolOf(date, calendar) == pool;
        }
    },
    /** A pool for each of 365 places in the year, with the days at most 15 days before or after. */
    DAYS_31("31-days", 365) {
        @Override
        int poolOf(CfDate date, CfCalendar calendar) {
            return (int) (place(date, calendar) * 365);
        }

        @Override
        boolean holds(int pool, CfDate date, CfCalendar calendar) {
            double distance = Math.abs(place(date, calendar) * 365 - (pool + 0.5));
            return Math.min(distance, 365 - distance) <= 15.5;
        }
    };

    private final String key;
    private final int count;

    YearPools(String key, int count) {
        this.key = key;
        this.count = count;
    }

    /** Word of the run file. */
    public String key() {
        return key;
    }

    public static Optional<YearPools> named(String key) {
        return Arrays.stream(values()).filter(pools -> pools.key.equals(key)).findFirst();
    }

    public static List<String> keys() {
        return Arrays.stream(values()).map(YearPools::key).toList();
    }

    /** The pool that gives a day's result. */
    abstract int poolOf(CfDate date, CfCalendar calendar);

    /** Whether a day is one of a pool's values. */
    abstract boolean holds(int pool, CfDate date, CfCalendar calendar);

    int count() {
        return count;
    }

    /** Middle of a day as a fraction of its year, 0..1. */
    static double place(CfDate date, CfCalendar calendar) {
        int length = calendar.dayOfYear(new CfDate(date.year(), 12, calendar.daysInMonth(date.year(), 12)));
        return (calendar.dayOfYear(date) - 0.5) / length;
    }

    /** {@code [pool]}: places of its values among the positions first..first + count - 1 of an axis, counted from 0. */
    int[][] values(DayAxis axis, int first, int count) {
        return lists(axis, first, count, false);
    }

    /** {@code [pool]}: places of the days whose result it gives. */
    int[][] results(DayAxis axis, int first, int count) {
        return lists(axis, first, count, true);
    }

    private int[][] lists(DayAxis axis, int first, int days, boolean own) {
        List<List<Integer>> lists = new ArrayList<>();
        for (int pool = 0; pool < count; pool++) {
            lists.add(new ArrayList<>());
        }
        for (int day = 0; day < days; day++) {
            CfDate date = axis.date(first + day);
            if (own) {
                lists.get(poolOf(date, axis.calendar())).add(day);
            } else {
                for (int pool = 0; pool < count; pool++) {
                    if (holds(pool, date, axis.calendar())) {
                        lists.get(pool).add(day);
                    }
                }
            }
        }
        return lists.stream().map(list -> list.stream().mapToInt(Integer::intValue).toArray()).toArray(int[][]::new);
    }
}
