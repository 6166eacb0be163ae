package org.wintersill.io.style;

import java.util.function.BiConsumer;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.SampleType;

/** Writes styles as SLD 1.0.0 for map servers. */
public final class SldWriter {
    private static final String OUTLINE = "#4a4a4a";

    private SldWriter() {
    }

    /**
     * Style of a raster: a ramp becomes a {@code ramp}, classes become {@code values}. The missing value of the numeric
     * types is a transparent first entry of a ramp in the colour of its lowest stop, so that values beyond the end keep
     * that colour; classes without an entry, such as the missing one, are not drawn at all.
     */
    public static String raster(LayerStyle style) {
        XmlText xml = begin(style);
        xml.open("Rule").element("Name", style.id()).element("Title", style.title());
        xml.open("RasterSymbolizer").element("Opacity", "1");
        if (style instanceof LayerStyle.Ramp ramp) {
            xml.open("ColorMap", "type", "ramp");
            entry(xml, ramp.stops().get(0).colour(), XmlText.number(SampleType.FLOAT32.nodata()), "no data", "0");
            for (LayerStyle.Stop stop : ramp.stops()) {
                entry(xml, stop.colour(), XmlText.number(stop.value()), stop.label(), "1");
            }
            xml.close();
        } else if (style instanceof LayerStyle.Classes classes) {
            xml.open("ColorMap", "type", "values");
            for (LayerStyle.Entry entry : classes.entries()) {
                entry(xml, entry.colour(), Integer.toString(entry.code()), entry.label(), "1");
            }
            xml.close();
        }
        xml.close().close();
        return end(xml);
    }

    private static void entry(XmlText xml, Colour colour, String quantity, String label, String opacity) {
        xml.empty("ColorMapEntry", "color", colour.hex(), "quantity", quantity, "label", label, "opacity", opacity);
    }

    /**
     * Style of polygons by the name of their class.
     *
     * @param classes the classes; one rule each
     * @param column name of the text column
     */
    public static String polygons(LayerStyle.Classes classes, String column) {
        return categorized(classes, column, SldWriter::fill);
    }

    /** Style of lines by the name of their class; as {@link #polygons}. */
    public static String lines(LayerStyle.Classes classes, String column) {
        return categorized(classes, column, SldWriter::stroke);
    }

    private static String categorized(LayerStyle.Classes classes, String column, BiConsumer<XmlText, Colour> symbol) {
        XmlText xml = begin(classes);
        for (LayerStyle.Entry entry : classes.entries()) {
            xml.open("Rule").element("Name", entry.name()).element("Title", entry.label());
            xml.open("ogc:Filter");
            comparison(xml, "ogc:PropertyIsEqualTo", column, entry.name());
            xml.close();
            symbol.accept(xml, entry.colour());
            xml.close();
        }
        return end(xml);
    }

    /**
     * Style of polygons by a number: one rule between each two stops of the ramp, the upper stop counted in.
     *
     * @param ramp the looks
     * @param column name of the numeric column
     */
    public static String graduatedPolygons(LayerStyle.Ramp ramp, String column) {
        return graduated(ramp, column, SldWriter::fill);
    }

    /** Style of points by a number; as {@link #graduatedPolygons}. */
    public static String graduatedPoints(LayerStyle.Ramp ramp, String column) {
        return graduated(ramp, column, SldWriter::mark);
    }

    private static String graduated(LayerStyle.Ramp ramp, String column, BiConsumer<XmlText, Colour> symbol) {
        XmlText xml = begin(ramp);
        for (Interval interval : Interval.of(ramp)) {
            xml.open("Rule").element("Name", interval.label()).element("Title", interval.label());
            xml.open("ogc:Filter").open("ogc:And");
            comparison(xml, "ogc:PropertyIsGreaterThan", column,
                    XmlText.number(interval.lowerOr(-Interval.FAR)));
            comparison(xml, "ogc:PropertyIsLessThanOrEqualTo", column, XmlText.number(interval.upperOr(Interval.FAR)));
            xml.close().close();
            symbol.accept(xml, interval.colour());
            xml.close();
        }
        return end(xml);
    }

    private static void comparison(XmlText xml, String operator, String column, String value) {
        xml.open(operator).element("ogc:PropertyName", column).element("ogc:Literal", value).close();
    }

    private static void fill(XmlText xml, Colour colour) {
        xml.open("PolygonSymbolizer");
        xml.open("Fill").element("CssParameter", colour.hex(), "name", "fill").close();
        xml.open("Stroke").element("CssParameter", OUTLINE, "name", "stroke")
                .element("CssParameter", "0.3", "name", "stroke-width").close();
        xml.close();
    }

    private static void stroke(XmlText xml, Colour colour) {
        xml.open("LineSymbolizer").open("Stroke").element("CssParameter", colour.hex(), "name", "stroke")
                .element("CssParameter", "2", "name", "stroke-width").close().close();
    }

    private static void mark(XmlText xml, Colour colour) {
        xml.open("PointSymbolizer").open("Graphic").open("Mark").element("WellKnownName", "square");
        xml.open("Fill").element("CssParameter", colour.hex(), "name", "fill").close().close();
        xml.element("Size", "4").close().close();
    }

    private static XmlText begin(LayerStyle style) {
        XmlText xml = new XmlText();
        xml.open("StyledLayerDescriptor", "version", "1.0.0",
                "xsi:schemaLocation", "http://www.opengis.net/sld "
                        + "http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd",
                "xmlns", "http://www.opengis.net/sld", "xmlns:ogc", "http://www.opengis.net/ogc",
                "xmlns:xlink", "http://www.w3.org/1999/xlink",
                "xmlns:xsi", "http://www.w3.org/2001/XMLSchema-instance");
        xml.open("NamedLayer").element("Name", style.id());
        xml.open("UserStyle").element("Name", style.id()).element("Title", style.title());
        return xml.open("FeatureTypeStyle");
    }

    private static String end(XmlText xml) {
        return xml.close().close().close().close().finish();
    }
}
