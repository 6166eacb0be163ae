package org.wintersill.io.style;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

class SldWriterTest {

    private static void valid(String sld) throws Exception {
        assertEquals(List.of(), OgcSchemas.complaints(OgcSchemas.GEOSERVER, sld));
        List<String> strict = OgcSchemas.complaints(OgcSchemas.OGC, sld);
        // GeoServer's addition, which QGIS writes too; OGC 02-070 does not have it.
        assertEquals(List.of(), strict.stream()
                .filter(line -> !line.contains("Attribute 'type' is not allowed to appear in element 'ColorMap'"))
                .toList());
    }

    @Test
    void everyStyleIsValidAsRaster() throws Exception {
        for (LayerStyle style : LayerStyles.all()) {
            valid(SldWriter.raster(style));
        }
    }

    @Test
    void everyStyleIsValidForPolygons() throws Exception {
        for (LayerStyle style : LayerStyles.all()) {
            valid(style instanceof LayerStyle.Ramp ramp ? SldWriter.graduatedPolygons(ramp, "value")
                    : SldWriter.polygons((LayerStyle.Classes) style, "class"));
        }
    }

    @Test
    void namesFromOutsideStayInTheirPlace() throws Exception {
        String hostile = "</Title><Rule>&\"'\u0000\u001b\n";
        LayerStyle.Classes classes = new LayerStyle.Classes(hostile, hostile,
                List.of(new LayerStyle.Entry(1, hostile, hostile, Colour.hex("#102030"))));
        String sld = SldWriter.polygons(classes, "\"; DROP <x>");
        valid(sld);
        Document document = Xml.parse(sld);
        assertEquals(1, document.getElementsByTagName("Rule").getLength());
        assertEquals("</Title><Rule>&\"'   ", document.getElementsByTagName("ogc:Literal").item(0).getTextContent());
        assertEquals("\"; DROP <x>", document.getElementsByTagName("ogc:PropertyName").item(0).getTextContent());
        valid(SldWriter.raster(classes));
    }

    @Test
    void aRampHasItsStopsAfterTheTransparentMissingValue() throws Exception {
        NodeList entries = Xml.parse(SldWriter.raster(LayerStyles.margin())).getElementsByTagName("ColorMapEntry");
        List<LayerStyle.Stop> stops = LayerStyles.margin().stops();
        assertEquals(stops.size() + 1, entries.getLength());
        assertEquals("-9999", ((Element) entries.item(0)).getAttribute("quantity"));
        assertEquals("0", ((Element) entries.item(0)).getAttribute("opacity"));
        for (int i = 0; i < stops.size(); i++) {
            Element entry = (Element) entries.item(i + 1);
            assertEquals(stops.get(i).value(), Double.parseDouble(entry.getAttribute("quantity")));
            assertEquals(stops.get(i).colour().hex(), entry.getAttribute("color"));
            assertEquals(stops.get(i).label(), entry.getAttribute("label"));
            assertEquals("1", entry.getAttribute("opacity"));
        }
    }
}
