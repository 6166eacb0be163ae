package org.wintersill.io.style;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.time.CfDate;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

class QmlWriterTest {

    private static Element first(Document document, String name) {
        return (Element) document.getElementsByTagName(name).item(0);
    }

    @Test
    void aRampCarriesItsStops() throws Exception {
        Document document = Xml.parse(QmlWriter.raster(LayerStyles.probability(), Optional.empty()));
        assertEquals("Symbology", document.getDocumentElement().getAttribute("styleCategories"));
        assertEquals("singlebandpseudocolor", first(document, "rasterrenderer").getAttribute("type"));
        assertEquals("INTERPOLATED", first(document, "colorrampshader").getAttribute("colorRampType"));
        NodeList items = document.getElementsByTagName("item");
        List<LayerStyle.Stop> stops = LayerStyles.probability().stops();
        assertEquals(stops.size(), items.getLength());
        for (int i = 0; i < stops.size(); i++) {
            Element item = (Element) items.item(i);
            assertEquals(stops.get(i).value(), Double.parseDouble(item.getAttribute("value")));
            assertEquals(stops.get(i).colour().hex(), item.getAttribute("color"));
            assertEquals(stops.get(i).label(), item.getAttribute("label"));
        }
    }

    @Test
    void classesCarryOnlyTheRealOnes() throws Exception {
        Document document = Xml.parse(QmlWriter.raster(LayerStyles.suitability(), Optional.empty()));
        assertEquals("paletted", first(document, "rasterrenderer").getAttribute("type"));
        NodeList entries = document.getElementsByTagName("paletteEntry");
        assertEquals(4, entries.getLength());
        assertEquals("secure", ((Element) entries.item(0)).getAttribute("label"));
        assertEquals("1", ((Element) entries.item(0)).getAttribute("value"));
    }

    @Test
    void aWinterStandsOnTheTimeSlider() throws Exception {
        TemporalRange winter = TemporalRange.of(new CfDate(2003, 10, 1), new CfDate(2004, 5, 31));
        Document document = Xml.parse(QmlWriter.raster(LayerStyles.margin(), Optional.of(winter)));
        assertEquals("Symbology|Temporal", document.getDocumentElement().getAttribute("styleCategories"));
        assertEquals("1", first(document, "temporal").getAttribute("enabled"));
        assertEquals("2003-10-01T00:00:00Z", first(document, "start").getTextContent());
        assertEquals("2004-05-31T23:59:59Z", first(document, "end").getTextContent());
    }

    @Test
    void daysThatOnlyOtherCalendarsHaveAreBroughtBack() {
        TemporalRange range = TemporalRange.of(new CfDate(2003, 2, 30), new CfDate(2004, 2, 30));
        assertEquals(LocalDate.of(2003, 2, 28), range.first());
        assertEquals(LocalDate.of(2004, 2, 29), range.last());
    }

    @Test
    void polygonsAreStyledByClassName() throws Exception {
        Document document = Xml.parse(QmlWriter.polygons(LayerStyles.suitability(), "class"));
        assertEquals("categorizedSymbol", first(document, "renderer-v2").getAttribute("type"));
        assertEquals("class", first(document, "renderer-v2").getAttribute("attr"));
        assertEquals("secure", first(document, "category").getAttribute("value"));
        assertEquals(4, document.getElementsByTagName("symbol").getLength());
        assertEquals("29,78,137,255", first(document, "prop").getAttribute("v"));
    }

    @Test
    void rangesOfPolygonsJoinWithoutGap() throws Exception {
        Document document = Xml.parse(QmlWriter.graduatedPolygons(LayerStyles.damage(), "damage"));
        NodeList ranges = document.getElementsByTagName("range");
        assertEquals(LayerStyles.damage().stops().size() - 1, ranges.getLength());
        for (int i = 1; i < ranges.getLength(); i++) {
            assertEquals(((Element) ranges.item(i - 1)).getAttribute("upper"),
                    ((Element) ranges.item(i)).getAttribute("lower"));
        }
    }

    @Test
    void namesFromOutsideStayInTheirPlace() throws Exception {
        String hostile = "\"/><x>&amp;'\u0007 \ud800 \ud83c\udf47";
        LayerStyle.Classes classes = new LayerStyle.Classes(hostile, hostile,
                List.of(new LayerStyle.Entry(1, hostile, hostile, Colour.hex("#102030"))));
        Document document = Xml.parse(QmlWriter.polygons(classes, "a\"b"));
        assertEquals("\"a\"\"b\"", first(document, "renderer-v2").getAttribute("attr"));
        assertEquals("\"/><x>&amp;'    \ud83c\udf47", first(document, "category").getAttribute("value"));
        Document raster = Xml.parse(QmlWriter.raster(classes, Optional.empty()));
        assertEquals(1, raster.getElementsByTagName("paletteEntry").getLength());
        assertEquals(0, raster.getElementsByTagName("x").getLength());
    }

    @Test
    void numbersAreTheSameInEveryLocale() {
        Locale locale = Locale.getDefault();
        try {
            Locale.setDefault(Locale.ROOT);
            String plain = QmlWriter.raster(LayerStyles.probability(), Optional.empty());
            Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
            assertEquals(plain, QmlWriter.raster(LayerStyles.probability(), Optional.empty()));
            Locale.setDefault(Locale.forLanguageTag("tr-TR"));
            assertEquals(plain, QmlWriter.raster(LayerStyles.probability(), Optional.empty()));
            assertTrue(plain.contains("value=\"0.02\""));
            assertFalse(plain.contains("\r"));
        } finally {
            Locale.setDefault(locale);
        }
    }
}
