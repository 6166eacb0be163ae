package org.wintersill.io.table;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.DailySeries;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/**
 * Reads the temperatures of a station: {@code date}, {@code tmin} and {@code tmax} or {@code tmean}, degC, in any order of days. The
 * mean is (tmin + tmax) / 2, tmean, or tmin plus half of a given daily range, as in a run.
 */
public final class SeriesFile {
    private static final double COLDEST = -90;
    private static final double WARMEST = 60;
    /** Longest stretch from the first to the last day, about a thousand years: more is a slip in a date. */
    private static final int MOST_DAYS = 400_000;
    /** A median above it is no daily minimum in winter countries: Kelvin or Fahrenheit (assumed). */
    private static final double WARM_MEDIAN = 35;
    private static final String ACCEPTED = "degC from -90 to 60";

    private SeriesFile() {
    }

    /**
     * Reads the whole series.
     *
     * @param dailyRange tmax - tmin, K, where the table has neither tmax nor tmean; empty: means are then missing
     * @throws org.wintersill.problem.ProblemException with all problems of the table
     */
    public static DailySeries read(Path file, OptionalDouble dailyRange, Notices notices) {
        CsvTable table = new CsvTable(file, List.of("date", "tmin"), List.of("tmax", "tmean"), notices);
        boolean maxima = table.has("tmax");
        boolean means = table.has("tmean");
        if (maxima && means) {
            throw Problem.input("the table has both tmax and tmean", file + ":1", "Keep one of the two").asException();
        }
        Map<Long, float[]> days = new TreeMap<>();
        for (CsvTable.Row row : table.rows()) {
            CfDate date = row.date();
            float minimum = (float) row.number("tmin", COLDEST, WARMEST, ACCEPTED);
            float second = maxima || means ? (float) row.number(maxima ? "tmax" : "tmean", COLDEST, WARMEST, ACCEPTED) : Float.NaN;
            if (second < minimum) {
                row.problem((maxima ? "tmax " : "tmean ") + second + " is below tmin " + minimum, "Exchange the two, or leave them empty");
            }
            float mean = maxima ? (minimum + second) / 2 : means ? second
                    : dailyRange.isPresent() ? minimum + (float) (dailyRange.getAsDouble() / 2) : Float.NaN;
            if (date != null && days.putIfAbsent(CfCalendar.STANDARD.dayNumber(date), new float[] {minimum, mean}) != null) {
                row.problem("the day " + date + " is there twice", "Keep one of the two rows");
            }
        }
        table.throwIfAny();
        DailySeries series = series(file, days);
        checkUnit(file, series);
        return series;
    }

    private static DailySeries series(Path file, Map<Long, float[]> days) {
        long first = days.keySet().iterator().next();
        long last = first;
        for (long day : days.keySet()) {
            last = day;
        }
        if (last - first >= MOST_DAYS) {
            throw Problem.input("the days run from " + CfCalendar.STANDARD.date(first) + " to " + CfCalendar.STANDARD.date(last),
                    file.toString(), "Look for a mistake in a year").asException();
        }
        int count = (int) (last - first + 1);
        float[] minima = new float[count];
        float[] means = new float[count];
        Arrays.fill(minima, Float.NaN);
        Arrays.fill(means, Float.NaN);
        days.forEach((day, values) -> {
            minima[(int) (day - first)] = values[0];
            means[(int) (day - first)] = values[1];
        });
        return new DailySeries(CfCalendar.STANDARD, first, minima, means);
    }

    private static void checkUnit(Path file, DailySeries series) {
        float[] sorted = series.minima().clone();
        Arrays.sort(sorted);
        int valid = (int) java.util.stream.IntStream.range(0, sorted.length).filter(i -> !Float.isNaN(sorted[i])).count();
        if (valid == 0) {
            throw Problem.input("no day has a minimum", file.toString(), "Fill the column tmin").asException();
        }
        if (sorted[valid / 2] > WARM_MEDIAN) {
            throw Problem.input("the median of tmin is " + sorted[valid / 2] + " degC, which looks like Fahrenheit", file.toString(),
                    "Convert the temperatures: degC = (degF - 32) / 1.8").asException();
        }
    }
}
