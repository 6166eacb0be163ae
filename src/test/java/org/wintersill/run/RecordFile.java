package org.wintersill.run;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** A form in which a record can be stored as netCDF; each method changes one thing about it. */
final class RecordFile {
    private static final double MISSING = -32768;

    private final ColdRecord record;
    private boolean southUp;
    private List<String> order = List.of("time", "lat", "lon");
    private Class<?> type = short.class;
    private double scale = 0.1;
    private String unit = "degC";
    private String calendar;
    private int turnedColumns;
    private double turn;
    private boolean unlimited;
    private String quantity = "minimum";
    private String timeUnit = "days since 1990-01-01";

    RecordFile(ColdRecord record) {
        this.record = record;
        calendar = record.calendar().cfName();
    }

    RecordFile southUp() {
        southUp = true;
        return this;
    }

    RecordFile order(String... names) {
        order = List.of(names);
        return this;
    }

    /** Plain numbers of a unit instead of packed tenths. */
    RecordFile plain(Class<?> floating, String newUnit) {
        type = floating;
        unit = newUnit;
        return this;
    }

    /** Packed with another step; 0.05 holds tenths exactly, too. */
    RecordFile scale(double step) {
        scale = step;
        return this;
    }

    RecordFile calendar(String name) {
        calendar = name;
        return this;
    }

    /** Adds 360 to every longitude. */
    RecordFile eastwards() {
        turn = 360;
        return this;
    }

    /** Begins with another column of a grid that goes round the globe, longitudes from 0 to 360. */
    RecordFile rolled(int columns) {
        turnedColumns = columns;
        return this;
    }

    RecordFile unlimited() {
        unlimited = true;
        return this;
    }

    /** Says that the values are maxima or means. */
    RecordFile quantity(String word) {
        quantity = word;
        return this;
    }

    RecordFile hours() {
        timeUnit = "hours since 1990-01-01 00:00:00";
        return this;
    }

    void write(Path path) {
        Map<String, Object> values = new LinkedHashMap<>();
        values.put("standard_name", "air_temperature");
        values.put("units", unit);
        values.put("cell_methods", "time: " + quantity);
        if (type == short.class) {
            values.put("scale_factor", scale);
            values.put("_FillValue", (short) MISSING);
        } else {
            values.put("_FillValue", type == float.class ? (Object) (float) MISSING : (Object) MISSING);
        }
        Map<String, Integer> lengths = Map.of("time", record.days().length, "lat", record.rows(), "lon", record.columns());
        ClassicFile file = new ClassicFile();
        order.forEach(name -> file.dimension(name, lengths.get(name)));
        if (unlimited) {
            file.unlimited("time");
        }
        file.variable("time", List.of("time"), double.class, attributes("time", timeUnit, "calendar", calendar), times())
                .variable("lat", List.of("lat"), double.class, attributes("latitude", "degrees_north", "axis", "Y"), latitudes())
                .variable("lon", List.of("lon"), double.class, attributes("longitude", "degrees_east", "axis", "X"), longitudes())
                .variable("t" + quantity.substring(0, 3), order, type, values, values(lengths)).write(path);
    }

    private static Map<String, Object> attributes(String standardName, String unit, String name, String value) {
        Map<String, Object> attributes = new LinkedHashMap<>();
        attributes.put("standard_name", standardName);
        attributes.put("units", unit);
        attributes.put(name, value);
        return attributes;
    }

    private double[] times() {
        long start = record.calendar().dayNumber(new org.wintersill.time.CfDate(1990, 1, 1));
        return Arrays.stream(record.days()).mapToDouble(day -> (day - start) * (timeUnit.startsWith("hours") ? 24 : 1)).toArray();
    }

    private double[] latitudes() {
        double[] latitudes = new double[record.rows()];
        for (int i = 0; i < latitudes.length; i++) {
            latitudes[i] = record.north() - record.step() * (row(i) + 0.5);
        }
        return latitudes;
    }

    private double[] longitudes() {
        double[] longitudes = new double[record.columns()];
        for (int i = 0; i < longitudes.length; i++) {
            longitudes[i] = record.west() + record.step() * (column(i) + 0.5) + turn;
            longitudes[i] += turnedColumns > 0 && longitudes[i] < 0 ? 360 : 0;
        }
        return longitudes;
    }

    private int row(int stored) {
        return southUp ? record.rows() - 1 - stored : stored;
    }

    private int column(int stored) {
        return (stored + turnedColumns) % record.columns();
    }

    private double[] values(Map<String, Integer> lengths) {
        double[] stored = new double[record.days().length * record.rows() * record.columns()];
        int[] at = new int[3];
        int i = 0;
        for (at[0] = 0; at[0] < lengths.get(order.get(0)); at[0]++) {
            for (at[1] = 0; at[1] < lengths.get(order.get(1)); at[1]++) {
                for (at[2] = 0; at[2] < lengths.get(order.get(2)); at[2]++) {
                    int day = at[order.indexOf("time")];
                    int cell = row(at[order.indexOf("lat")]) * record.columns() + column(at[order.indexOf("lon")]);
                    stored[i++] = stored(record.tenths()[day][cell]);
                }
            }
        }
        return stored;
    }

    private double stored(int tenths) {
        if (tenths == ColdRecord.MISSING) {
            return MISSING;
        }
        double celsius = tenths / 10.0;
        double value = switch (unit) {
            case "K" -> celsius + 273.15;
            case "degF" -> celsius * 1.8 + 32;
            default -> celsius;
        };
        return type == short.class ? value / scale : value;
    }
}
