package org.wintersill.run;

import java.util.Arrays;
import java.util.Random;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/**
 * Invented daily minima in exact tenths of a degree.
 *
 * @param north outer edge
 * @param step cell size, degrees
 * @param days day numbers of the calendar, ascending
 * @param tenths {@code [day][row * columns + column]}, north-west first
 */
record ColdRecord(int rows, int columns, double west, double north, double step, CfCalendar calendar, long[] days, int[][] tenths) {
    /** Stands for a missing value. */
    static final int MISSING = Short.MIN_VALUE;

    /** A record of whole days between two dates, with the cold at the turn of the year, or in July where south. */
    static ColdRecord made(int rows, int columns, CfCalendar calendar, CfDate first, CfDate last, boolean south, long seed) {
        long from = calendar.dayNumber(first);
        int count = (int) (calendar.dayNumber(last) - from) + 1;
        Random random = new Random(seed);
        int[] offsets = random.ints(rows * columns, -40, 41).toArray();
        int[][] tenths = new int[count][rows * columns];
        double spell = 0;
        for (int day = 0; day < count; day++) {
            CfDate date = calendar.date(from + day);
            double turn = 2 * Math.PI * (30.4 * (date.month() - 1) + date.day() - 20) / 365 + (south ? Math.PI : 0);
            spell = 0.8 * spell + 25 * random.nextGaussian();
            for (int cell = 0; cell < offsets.length; cell++) {
                tenths[day][cell] = (int) Math.round(65 - 120 * Math.cos(turn) + spell + 10 * random.nextGaussian()) + offsets[cell];
            }
        }
        return new ColdRecord(rows, columns, south ? 20 : -10, south ? -30 : 50, 0.5, calendar,
                IntStream.range(0, count).mapToLong(day -> from + day).toArray(), tenths);
    }

    /** Three northern winters on a small grid, with some days before and after. */
    static ColdRecord threeWinters(int rows, int columns) {
        return made(rows, columns, CfCalendar.STANDARD, new CfDate(2001, 8, 20), new CfDate(2004, 6, 10), false, 7);
    }

    ColdRecord keep(IntPredicate wanted) {
        int[] kept = IntStream.range(0, days.length).filter(wanted).toArray();
        return new ColdRecord(rows, columns, west, north, step, calendar, Arrays.stream(kept).mapToLong(day -> days[day]).toArray(),
                Arrays.stream(kept).mapToObj(day -> tenths[day]).toArray(int[][]::new));
    }

    ColdRecord between(CfDate first, CfDate last) {
        return keep(day -> days[day] >= calendar.dayNumber(first) && days[day] <= calendar.dayNumber(last));
    }

    ColdRecord without(CfDate date) {
        return keep(day -> days[day] != calendar.dayNumber(date));
    }

    /** What a value becomes. */
    interface Change {
        int of(int day, int cell, int tenths);
    }

    ColdRecord changed(Change change) {
        int[][] result = new int[days.length][];
        for (int day = 0; day < days.length; day++) {
            int at = day;
            result[day] = IntStream.range(0, rows * columns).map(cell -> change.of(at, cell, tenths[at][cell])).toArray();
        }
        return new ColdRecord(rows, columns, west, north, step, calendar, days, result);
    }

    ColdRecord at(double newWest, double newNorth, double newStep) {
        return new ColdRecord(rows, columns, newWest, newNorth, newStep, calendar, days, tenths);
    }

    /** Position of a day in the record. */
    int day(CfDate date) {
        return Arrays.binarySearch(days, calendar.dayNumber(date));
    }

    /** The same cells within a wider grid that is missing around them. */
    ColdRecord framed(int width) {
        int wide = columns + 2 * width;
        int[][] result = new int[days.length][(rows + 2 * width) * wide];
        for (int day = 0; day < days.length; day++) {
            Arrays.fill(result[day], MISSING);
            for (int row = 0; row < rows; row++) {
                System.arraycopy(tenths[day], row * columns, result[day], (row + width) * wide + width, columns);
            }
        }
        return new ColdRecord(rows + 2 * width, wide, west - width * step, north + width * step, step, calendar, days, result);
    }
}
