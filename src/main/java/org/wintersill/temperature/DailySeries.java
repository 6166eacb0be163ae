package org.wintersill.temperature;

import java.io.Serializable;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/**
 * Daily temperatures at one place, day after day. Arrays are {@code [day]}, degC, NaN for missing; they are not copied.
 *
 * @param calendar of the days
 * @param firstDay day number of the first one
 * @param minima daily minima
 * @param means daily means
 */
public record DailySeries(CfCalendar calendar, long firstDay, float[] minima, float[] means) implements Serializable {

    public DailySeries {
        if (minima.length != means.length || minima.length == 0) {
            throw new IllegalArgumentException(minima.length + " minima and " + means.length + " means");
        }
    }

    /** Number of days from the first to the last, missing ones included. */
    public int days() {
        return minima.length;
    }

    /** Minimum of a day; NaN where it is missing or outside of the series. */
    public float minimum(long day) {
        return value(minima, day);
    }

    /** Mean of a day; NaN where it is missing or outside of the series. */
    public float mean(long day) {
        return value(means, day);
    }

    private float value(float[] values, long day) {
        long position = day - firstDay;
        return position < 0 || position >= values.length ? Float.NaN : values[(int) position];
    }

    public CfDate first() {
        return calendar.date(firstDay);
    }

    public CfDate last() {
        return calendar.date(firstDay + minima.length - 1);
    }
}
