package org.wintersill.scenario;

import java.util.Optional;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.time.DayAxis;

/**
 * A part of a record, on the observed grid.
 *
 * @param source the record
 * @param regridding from its grid to the observed one; empty where it is the observed one
 * @param first position of the first day on the record's axis
 * @param count number of positions
 */
public record Series(DailyTemperatureSource source, Optional<Regridding> regridding, int first, int count) {

    DayAxis axis() {
        return source.days();
    }

    /** The days as an axis of their own. */
    public DayAxis days() {
        long[] days = new long[count];
        for (int i = 0; i < count; i++) {
            days[i] = axis().day(first + i);
        }
        return new DayAxis(axis().calendar(), days);
    }
}
