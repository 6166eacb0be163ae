package org.wintersill.io.style;

import java.time.LocalDate;
import java.time.YearMonth;
import org.wintersill.time.CfDate;

/**
 * The days that a layer stands for, on the calendar of the time slider.
 *
 * @param first first day
 * @param last last day, counted in
 */
public record TemporalRange(LocalDate first, LocalDate last) {

    public TemporalRange {
        if (last.isBefore(first)) {
            throw new IllegalArgumentException(last + " is before " + first);
        }
    }

    /** Range between days of any calendar; a day that the common calendar lacks becomes the last of its month. */
    public static TemporalRange of(CfDate first, CfDate last) {
        return new TemporalRange(common(first), common(last));
    }

    private static LocalDate common(CfDate date) {
        YearMonth month = YearMonth.of(date.year(), date.month());
        return month.atDay(Math.min(date.day(), month.lengthOfMonth()));
    }

    /** First second, {@code 2003-10-01T00:00:00Z}. */
    String start() {
        return first + "T00:00:00Z";
    }

    /** Last second, {@code 2004-05-31T23:59:59Z}. */
    String end() {
        return last + "T23:59:59Z";
    }
}
