package org.wintersill.temperature;

import java.io.Serializable;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * How one input file was understood; shown by {@code inspect} and kept in the record.
 *
 * @param path path as it was given
 * @param format format and its version, such as {@code netCDF-4} or {@code GeoTIFF}
 * @param variable variable or band set that is read
 * @param unit unit as the file (or the run file) says it
 * @param calendar CF name of the calendar
 * @param firstDate first day, ISO
 * @param lastDate last day, ISO
 * @param dayCount number of days that have a record
 * @param grid one line on the grid as it is used, north-up
 * @param storage chunks, strips or tiles, compression, packing: one line
 * @param details anything else worth knowing, in order: what was assumed, what was turned round
 */
public record SourceFile(String path, String format, String variable, String unit, String calendar,
                         String firstDate, String lastDate, int dayCount, String grid, String storage,
                         Map<String, String> details) implements Serializable {

    public SourceFile {
        details = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(details));
    }
}
