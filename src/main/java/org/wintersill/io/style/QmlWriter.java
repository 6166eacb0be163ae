package org.wintersill.io.style;

import java.util.List;
import java.util.Optional;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;

/** Writes styles for QGIS 3: beside a raster as {@code NAME.qml}, or as text in a GeoPackage's table of styles. */
public final class QmlWriter {
    private static final String VERSION = "3.22.0";
    private static final String OUTLINE = "#4a4a4a";

    private QmlWriter() {
    }

    /**
     * Style of a raster: a ramp becomes a colour ramp with its stops, classes become a legend of the real classes.
     * Missing cells are transparent, as the missing value of the file says.
     *
     * @param style the looks
     * @param range days on the time slider; empty for layers that stand for no particular time
     */
    public static String raster(LayerStyle style, Optional<TemporalRange> range) {
        XmlText xml = root(range.isPresent() ? "Symbology|Temporal" : "Symbology");
        if (range.isPresent()) {
            xml.open("temporal", "enabled", "1", "mode", "0", "fetchMode", "0").open("fixedRange")
                    .element("start", range.get().start()).element("end", range.get().end()).close().close();
        }
        xml.open("pipe");
        xml.open("provider").empty("resampling", "enabled", "false", "zoomedInResamplingMethod", "nearestNeighbour",
                "zoomedOutResamplingMethod", "nearestNeighbour", "maxOversampling", "2").close();
        if (style instanceof LayerStyle.Ramp ramp) {
            ramp(xml, ramp);
        } else if (style instanceof LayerStyle.Classes classes) {
            classes(xml, classes);
        }
        xml.empty("brightnesscontrast", "brightness", "0", "contrast", "0", "gamma", "1");
        xml.empty("huesaturation", "saturation", "0", "grayscaleMode", "0", "colorizeOn", "0");
        xml.empty("rasterresampler", "maxOversampling", "2");
        xml.close();
        xml.element("blendMode", "0");
        return xml.close().finish();
    }

    private static void ramp(XmlText xml, LayerStyle.Ramp ramp) {
        List<LayerStyle.Stop> stops = ramp.stops();
        String lowest = XmlText.number(stops.get(0).value());
        String highest = XmlText.number(stops.get(stops.size() - 1).value());
        xml.open("rasterrenderer", "type", "singlebandpseudocolor", "band", "1", "opacity", "1", "alphaBand", "-1",
                "nodataColor", "", "classificationMin", lowest, "classificationMax", highest);
        xml.empty("rasterTransparency");
        xml.open("rastershader").open("colorrampshader", "colorRampType", "INTERPOLATED", "classificationMode", "1",
                "clip", "0", "minimumValue", lowest, "maximumValue", highest, "labelPrecision", "2");
        for (LayerStyle.Stop stop : stops) {
            xml.empty("item", "value", XmlText.number(stop.value()), "label", stop.label(),
                    "color", stop.colour().hex(), "alpha", "255");
        }
        // A stepless legend would show only the two ends: the stops carry the meaning.
        xml.empty("rampLegendSettings", "useContinuousLegend", "0");
        xml.close().close().close();
    }

    private static void classes(XmlText xml, LayerStyle.Classes classes) {
        xml.open("rasterrenderer", "type", "paletted", "band", "1", "opacity", "1", "alphaBand", "-1",
                "nodataColor", "");
        xml.empty("rasterTransparency");
        xml.open("colorPalette");
        for (LayerStyle.Entry entry : classes.entries()) {
            xml.empty("paletteEntry", "value", Integer.toString(entry.code()), "color", entry.colour().hex(),
                    "alpha", "255", "label", entry.label());
        }
        xml.close().close();
    }

    /**
     * Style of polygons by the name of their class.
     *
     * @param classes the classes; a polygon takes the colour of the one whose name stands in the column
     * @param column name of the text column
     */
    public static String polygons(LayerStyle.Classes classes, String column) {
        return categorized(classes, column, Shape.FILL);
    }

    /** Style of lines by the name of their class; as {@link #polygons}. */
    public static String lines(LayerStyle.Classes classes, String column) {
        return categorized(classes, column, Shape.LINE);
    }

    private static String categorized(LayerStyle.Classes classes, String column, Shape shape) {
        XmlText xml = root("Symbology");
        xml.open("renderer-v2", "type", "categorizedSymbol", "attr", attribute(column), "symbollevels", "0",
                "enableorderby", "0", "forceraster", "0");
        xml.open("categories");
        List<LayerStyle.Entry> entries = classes.entries();
        for (int i = 0; i < entries.size(); i++) {
            xml.empty("category", "value", entries.get(i).name(), "type", "string", "symbol", Integer.toString(i),
                    "label", entries.get(i).label(), "render", "true");
        }
        xml.close();
        symbols(xml, entries.stream().map(LayerStyle.Entry::colour).toList(), shape);
        return end(xml, shape);
    }

    /**
     * Style of polygons by a number: one colour between each two stops of the ramp, the upper stop counted in.
     *
     * @param ramp the looks
     * @param column name of the numeric column
     */
    public static String graduatedPolygons(LayerStyle.Ramp ramp, String column) {
        return graduated(ramp, column, Shape.FILL);
    }

    /** Style of points by a number; as {@link #graduatedPolygons}. */
    public static String graduatedPoints(LayerStyle.Ramp ramp, String column) {
        return graduated(ramp, column, Shape.MARKER);
    }

    private static String graduated(LayerStyle.Ramp ramp, String column, Shape shape) {
        XmlText xml = root("Symbology");
        xml.open("renderer-v2", "type", "graduatedSymbol", "attr", attribute(column), "graduatedMethod",
                "GraduatedColor", "symbollevels", "0", "enableorderby", "0", "forceraster", "0");
        xml.open("ranges");
        List<Interval> intervals = Interval.of(ramp);
        for (int i = 0; i < intervals.size(); i++) {
            Interval interval = intervals.get(i);
            xml.empty("range", "lower", XmlText.number(interval.lowerOr(-Interval.FAR)),
                    "upper", XmlText.number(interval.upperOr(Interval.FAR)), "symbol", Integer.toString(i),
                    "label", interval.label(), "render", "true");
        }
        xml.close();
        symbols(xml, intervals.stream().map(Interval::colour).toList(), shape);
        return end(xml, shape);
    }

    /** What a symbol is drawn with, in the words of QGIS. */
    private enum Shape {
        FILL("fill", "SimpleFill", "2"), LINE("line", "SimpleLine", "1"), MARKER("marker", "SimpleMarker", "0");

        private final String symbol;
        private final String layer;
        private final String geometryType;

        Shape(String symbol, String layer, String geometryType) {
            this.symbol = symbol;
            this.layer = layer;
            this.geometryType = geometryType;
        }
    }

    /** A field name as it is when it is plain; otherwise in the quotes of QGIS's expressions. */
    private static String attribute(String column) {
        return column.matches("[A-Za-z_][A-Za-z0-9_]*") ? column : '"' + column.replace("\"", "\"\"") + '"';
    }

    private static XmlText root(String categories) {
        return new XmlText().open("qgis", "version", VERSION, "styleCategories", categories);
    }

    private static void symbols(XmlText xml, List<Colour> colours, Shape shape) {
        xml.open("symbols");
        for (int i = 0; i < colours.size(); i++) {
            xml.open("symbol", "type", shape.symbol, "name", Integer.toString(i), "alpha", "1", "clip_to_extent", "1",
                    "force_rhr", "0");
            xml.open("layer", "class", shape.layer, "enabled", "1", "locked", "0", "pass", "0");
            if (shape == Shape.LINE) {
                property(xml, "line_color", rgba(colours.get(i)));
                property(xml, "line_width", "0.6");
                property(xml, "line_width_unit", "MM");
                property(xml, "joinstyle", "round");
                xml.close().close();
                continue;
            }
            property(xml, "color", rgba(colours.get(i)));
            if (shape == Shape.FILL) {
                property(xml, "style", "solid");
            } else {
                property(xml, "name", "square");
                property(xml, "size", "1.2");
                property(xml, "size_unit", "MM");
            }
            property(xml, "outline_color", rgba(Colour.hex(OUTLINE)));
            property(xml, "outline_style", shape == Shape.FILL ? "solid" : "no");
            property(xml, "outline_width", "0.1");
            property(xml, "outline_width_unit", "MM");
            property(xml, "joinstyle", "bevel");
            xml.close().close();
        }
        xml.close();
    }

    /** QGIS up to 3.24 reads {@code prop}, later ones read both forms. */
    private static void property(XmlText xml, String key, String value) {
        xml.empty("prop", "k", key, "v", value);
    }

    private static String rgba(Colour colour) {
        return colour.red() + "," + colour.green() + "," + colour.blue() + ",255";
    }

    private static String end(XmlText xml, Shape shape) {
        xml.close();
        xml.element("blendMode", "0").element("featureBlendMode", "0").element("layerGeometryType", shape.geometryType);
        return xml.close().finish();
    }
}
