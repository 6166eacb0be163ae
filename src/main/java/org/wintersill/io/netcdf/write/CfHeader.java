package org.wintersill.io.netcdf.write;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.SampleType;
import org.wintersill.time.Season;
import ucar.ma2.Array;
import ucar.ma2.DataType;
import ucar.nc2.Attribute;
import ucar.nc2.NetcdfFileWriter;
import ucar.nc2.Variable;

/** Defines dimensions, variables and attributes of a file of winter layers. */
final class CfHeader {

    static final String TIME = "time";
    static final String TIME_BOUNDS = "time_bnds";
    static final String WINTER_YEAR = "winter";
    private static final String BOUNDS_LENGTH = "bnds";
    private static final String GRID_MAPPING = "crs";

    private final NetcdfFileWriter writer;
    private final WinterFile file;
    private final Axes axes;

    CfHeader(NetcdfFileWriter writer, WinterFile file) {
        this.writer = writer;
        this.file = file;
        this.axes = Axes.of(file.grid().crs());
    }

    void define() {
        globals();
        writer.addDimension(null, TIME, file.winters().size());
        writer.addDimension(null, axes.y(), file.grid().rows());
        writer.addDimension(null, axes.x(), file.grid().columns());
        writer.addDimension(null, BOUNDS_LENGTH, 2);
        time();
        coordinate(axes.y(), "Y", axes.yStandardName(), axes.yUnits());
        coordinate(axes.x(), "X", axes.xStandardName(), axes.xUnits());
        gridMapping();
        file.layers().forEach(this::layer);
    }

    private void globals() {
        global("Conventions", "CF-1.8, ACDD-1.3");
        file.attributes().forEach(this::global);
        global("geospatial_lat_min", file.globe().south());
        global("geospatial_lat_max", file.globe().north());
        global("geospatial_lon_min", file.globe().west());
        global("geospatial_lon_max", file.globe().east());
        List<Season> winters = file.winters();
        global("time_coverage_start", winters.get(0).first().toString());
        global("time_coverage_end", winters.get(winters.size() - 1).last().toString());
        global("winters", winters.stream().map(Season::label).collect(Collectors.joining(" ")));
    }

    private void global(String name, Object value) {
        writer.addGroupAttribute(null, attribute(name, value));
    }

    private void time() {
        Variable time = writer.addVariable(null, TIME, DataType.DOUBLE, TIME);
        put(time, "standard_name", "time");
        put(time, "long_name", "last day of the winter");
        put(time, "units", Axes.TIME_UNITS);
        put(time, "calendar", file.winters().get(0).calendar().cfName());
        put(time, "axis", "T");
        put(time, "bounds", TIME_BOUNDS);
        put(time, "coverage_content_type", "coordinate");
        writer.addVariable(null, TIME_BOUNDS, DataType.DOUBLE, TIME + " " + BOUNDS_LENGTH);
        // Not named by "coordinates": CDO knows no such coordinate of time and complains.
        Variable year = writer.addVariable(null, WINTER_YEAR, DataType.INT, TIME);
        put(year, "long_name", "year in which the winter ends");
        put(year, "units", "1");
        put(year, "coverage_content_type", "coordinate");
    }

    private void coordinate(String name, String axis, String standardName, String units) {
        Variable variable = writer.addVariable(null, name, DataType.DOUBLE, name);
        put(variable, "standard_name", standardName);
        put(variable, "long_name", standardName.replace('_', ' ') + " of the cell centre");
        put(variable, "units", units);
        put(variable, "axis", axis);
        put(variable, "coverage_content_type", "coordinate");
    }

    private void gridMapping() {
        Variable mapping = writer.addVariable(null, GRID_MAPPING, DataType.INT, "");
        for (Map.Entry<String, Object> entry : file.gridMapping().entrySet()) {
            put(mapping, entry.getKey(), entry.getValue());
        }
    }

    private void layer(LayerDefinition layer) {
        Variable variable = writer.addVariable(null, layer.column(), type(layer.type()),
                TIME + " " + axes.y() + " " + axes.x());
        boolean classes = layer.style() instanceof LayerStyle.Classes;
        put(variable, "long_name", layer.title());
        put(variable, "comment", layer.description());
        put(variable, "units", classes ? "1" : layer.unit());
        if (layer.unit().equals("K")) {
            // Every layer in kelvin is a difference: temperatures are in degrees Celsius.
            put(variable, "units_metadata", "temperature: difference");
        }
        put(variable, "_FillValue", missing(layer.type()));
        put(variable, "coverage_content_type", classes ? "thematicClassification" : "modelResult");
        put(variable, "grid_mapping", GRID_MAPPING);
        if (!layer.cellMethods().isEmpty()) {
            put(variable, "cell_methods", layer.cellMethods());
        }
        if (layer.style() instanceof LayerStyle.Classes style) {
            flags(variable, layer, style.entries());
        }
    }

    private void flags(Variable variable, LayerDefinition layer, List<LayerStyle.Entry> entries) {
        Array values = Array.factory(type(layer.type()), new int[] {entries.size()});
        for (int i = 0; i < entries.size(); i++) {
            if (layer.type() == SampleType.BYTE && entries.get(i).code() > Byte.MAX_VALUE) {
                throw new IllegalArgumentException("bytes of the classic format end at 127: class " + entries.get(i));
            }
            values.setInt(i, entries.get(i).code());
        }
        writer.addVariableAttribute(variable, new Attribute("flag_values", values));
        // Meanings are separated by blanks.
        put(variable, "flag_meanings", entries.stream().map(entry -> entry.name().replace(' ', '_'))
                .collect(Collectors.joining(" ")));
    }

    static DataType type(SampleType type) {
        return switch (type) {
            case FLOAT32 -> DataType.FLOAT;
            case INT16 -> DataType.SHORT;
            case BYTE -> DataType.BYTE;
        };
    }

    private static Number missing(SampleType type) {
        return switch (type) {
            case FLOAT32 -> (float) type.nodata();
            case INT16 -> (short) type.nodata();
            case BYTE -> (byte) type.nodata();
        };
    }

    private void put(Variable variable, String name, Object value) {
        writer.addVariableAttribute(variable, attribute(name, value));
    }

    private static Attribute attribute(String name, Object value) {
        if (value instanceof String text) {
            return new Attribute(name, text);
        }
        if (value instanceof Number number) {
            return new Attribute(name, number);
        }
        if (value instanceof double[] numbers) {
            return new Attribute(name, Array.factory(double.class, new int[] {numbers.length}, numbers.clone()));
        }
        throw new IllegalArgumentException("attribute " + name + " cannot be a " + value.getClass().getSimpleName());
    }
}
