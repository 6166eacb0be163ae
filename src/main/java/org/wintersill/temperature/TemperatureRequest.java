package org.wintersill.temperature;

import java.util.Optional;
import org.wintersill.time.CfDate;

/**
 * What a run file says about a set of temperature files, where the files do not say it themselves. Every part but the
 * forcing variable may be absent. What a file says and what the request says may not contradict silently: the reader
 * refuses, naming both, unless they agree.
 *
 * @param forcing which daily quantity is wanted; a reader never takes a maximum for a minimum
 * @param variable name of the NetCDF variable
 * @param unit unit of the values after scale and offset
 * @param scale factor on stored values; for files that do not carry their own
 * @param offset summand after the factor
 * @param dates pattern of the date in file names, such as {@code yyyyMMdd}, {@code yyyy_MM} or {@code yyyyDDD}
 * @param firstDay date of the first band of a file whose bands have no dates
 * @param member number (from 1) or label of the ensemble member
 * @param crs reference system of files that carry none, such as {@code EPSG:2056}
 */
public record TemperatureRequest(ForcingVariable forcing, Optional<String> variable, Optional<TemperatureUnit> unit,
                                 Optional<Double> scale, Optional<Double> offset, Optional<String> dates,
                                 Optional<CfDate> firstDay, Optional<String> member, Optional<String> crs) {

    /** A request that leaves everything to the files. */
    public static TemperatureRequest of(ForcingVariable forcing) {
        return new TemperatureRequest(forcing, Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty(),
                Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
    }
}
