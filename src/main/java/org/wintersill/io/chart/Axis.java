package org.wintersill.io.chart;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;

/**
 * From a value to a share of an axis.
 *
 * @param label quantity and unit
 * @param logarithmic whether equal factors take equal room; both ends are then above zero
 * @param from value at the left or lower end
 * @param to value at the other end, larger
 * @param ticks in ascending order
 * @param labelsBetween whether a tick's label stands in the middle between it and the next one, as names of months do
 */
public record Axis(String label, boolean logarithmic, double from, double to, List<Tick> ticks, boolean labelsBetween) {
    private static final int MOST_STEPS = 8;
    private static final double[] STEPS = {1, 2, 5};
    private static final String[] MONTHS = {"Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"};
    private static final String MINUS = "\u2212";

    /** @param label may be empty */
    public record Tick(double value, String label) {
    }

    public Axis {
        ticks = List.copyOf(ticks);
        checkEnds(from, to, logarithmic);
    }

    private static void checkEnds(double from, double to, boolean logarithmic) {
        if (!(from < to) || logarithmic && !(from > 0) || Double.isInfinite(to - from)) {
            throw new IllegalArgumentException("not an axis: " + from + " to " + to);
        }
    }

    /** A plain axis with exactly these ends. */
    public static Axis linear(String label, double from, double to) {
        checkEnds(from, to, false);
        double step = step(to - from);
        List<Tick> ticks = new ArrayList<>();
        for (long i = (long) Math.ceil(from / step - 1e-9); i * step <= to + 1e-9 * step; i++) {
            ticks.add(new Tick(i * step, number(i * step, decimals(step))));
        }
        return new Axis(label, false, from, to, ticks, false);
    }

    /** A plain axis that holds all values, widened to whole ticks; values that are NaN do not count. */
    public static Axis around(String label, double[]... values) {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double[] series : values) {
            for (double value : series) {
                if (!Double.isNaN(value)) {
                    low = Math.min(low, value);
                    high = Math.max(high, value);
                }
            }
        }
        if (low > high) {
            return linear(label, 0, 1);
        }
        if (high - low < 1e-6 * Math.max(1, Math.abs(high))) {
            low -= 1;
            high += 1;
        }
        double step = step(high - low);
        return linear(label, step * Math.floor(low / step - 0.05), step * Math.ceil(high / step + 0.05));
    }

    /** A logarithmic axis with ticks at 1, 2 and 5 times the powers of ten. */
    public static Axis logarithmic(String label, double from, double to) {
        checkEnds(from, to, true);
        List<Tick> ticks = new ArrayList<>();
        for (int power = (int) Math.floor(StrictMath.log10(from)); power <= StrictMath.log10(to); power++) {
            for (double step : STEPS) {
                double value = power < 0 ? step / power(-power) : step * power(power);
                if (value >= from * (1 - 1e-9) && value <= to * (1 + 1e-9)) {
                    ticks.add(new Tick(value, number(value, Math.max(0, -power))));
                }
            }
        }
        return new Axis(label, true, from, to, ticks, false);
    }

    /** The days of a winter: the value is the position in its window, a tick the first of a month. */
    public static Axis winter(Season season) {
        List<Tick> ticks = new ArrayList<>();
        for (int position = 0; position < season.days(); position++) {
            CfDate date = season.date(position);
            if (position == 0 || date.day() == 1) {
                int left = Math.min(season.days() - position, season.calendar().daysInMonth(date.year(), date.month()) - date.day());
                ticks.add(new Tick(position, left < 10 ? "" : MONTHS[date.month() - 1]));
            }
        }
        return new Axis("", false, 0, Math.max(1, season.days() - 1), ticks, true);
    }

    /** {@code 14 Jan 2010}. */
    public static String words(CfDate date) {
        return date.day() + " " + MONTHS[date.month() - 1] + " " + date.year();
    }

    /** A number with a fixed count of decimals and a typographic minus. */
    public static String number(double value, int decimals) {
        String text = String.format(java.util.Locale.ROOT, "%." + decimals + "f", value);
        return text.startsWith("-") ? text.matches("-0\\.?0*") ? text.substring(1) : MINUS + text.substring(1) : text;
    }

    /** A number that always shows its sign. */
    public static String signed(double value, int decimals) {
        String text = number(value, decimals);
        return text.startsWith(MINUS) ? text : "+" + text;
    }

    /** Share of the way from the lower end, 0..1; values beyond are put on the ends, NaN stays NaN. */
    double share(double value) {
        double share = logarithmic ? StrictMath.log(value / from) / StrictMath.log(to / from) : (value - from) / (to - from);
        return Double.isNaN(share) ? share : Math.max(0, Math.min(1, share));
    }

    private static double step(double width) {
        double most = width / MOST_STEPS;
        int power = (int) Math.floor(StrictMath.log10(most));
        double unit = power < 0 ? 1 / power(-power) : power(power);
        for (double step : STEPS) {
            if (step * unit >= most * (1 - 1e-9)) {
                return step * unit;
            }
        }
        return 10 * unit;
    }

    private static int decimals(double step) {
        return Math.max(0, (int) -Math.floor(StrictMath.log10(step) + 1e-9));
    }

    private static double power(int exponent) {
        return StrictMath.pow(10, exponent);
    }
}
