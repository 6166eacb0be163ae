package org.wintersill.io.geotiff.write;

import java.io.StringWriter;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Map;
import javax.xml.stream.XMLOutputFactory;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamWriter;
import org.wintersill.layer.RasterHeader;

/**
 * Text of tag 42112: own items, and description, unit and statistics of each band, as GDAL's GTiff driver reads them.
 *
 * <p>That reader resolves entities once more after parsing and cuts a text off at an ampersand that begins none (seen in
 * GDAL 3.6). So an ampersand is escaped twice, as that driver does when it writes.
 */
final class BandMetadata {
    /** Enough digits to give back any double; trailing zeros are dropped. */
    private static final MathContext DIGITS = new MathContext(17);

    private BandMetadata() {
    }

    /**
     * The document.
     *
     * @param header what the file holds
     * @param statistics of the valid cells, one a band
     */
    static String xml(RasterHeader header, List<ValueStatistics> statistics) {
        StringWriter text = new StringWriter();
        try {
            XMLStreamWriter xml = XMLOutputFactory.newDefaultFactory().createXMLStreamWriter(text);
            xml.writeStartElement("GDALMetadata");
            xml.writeCharacters("\n");
            for (Map.Entry<String, String> item : header.metadata().entrySet()) {
                item(xml, item.getKey(), -1, null, item.getValue());
            }
            for (int band = 0; band < header.bands().size(); band++) {
                RasterHeader.Band shown = header.bands().get(band);
                item(xml, "DESCRIPTION", band, "description", shown.description());
                item(xml, "UNITTYPE", band, "unittype", shown.unit());
                statistics(xml, band, statistics.get(band), header.grid().cells());
            }
            xml.writeEndElement();
            xml.writeCharacters("\n");
            xml.close();
        } catch (XMLStreamException e) {
            throw new IllegalStateException("XML cannot be written to memory", e);
        }
        return text.toString();
    }

    private static void statistics(XMLStreamWriter xml, int band, ValueStatistics values, long cells)
            throws XMLStreamException {
        if (values.count() > 0) {
            item(xml, "STATISTICS_MAXIMUM", band, null, number(values.maximum()));
            item(xml, "STATISTICS_MEAN", band, null, number(values.mean()));
            item(xml, "STATISTICS_MINIMUM", band, null, number(values.minimum()));
            item(xml, "STATISTICS_STDDEV", band, null, number(values.standardDeviation()));
        }
        item(xml, "STATISTICS_VALID_PERCENT", band, null, number(100.0 * values.count() / cells));
    }

    private static void item(XMLStreamWriter xml, String name, int band, String role, String value)
            throws XMLStreamException {
        xml.writeCharacters("  ");
        xml.writeStartElement("Item");
        xml.writeAttribute("name", name);
        if (band >= 0) {
            xml.writeAttribute("sample", Integer.toString(band));
        }
        if (role != null) {
            xml.writeAttribute("role", role);
        }
        xml.writeCharacters(printable(value).replace("&", "&amp;"));
        xml.writeEndElement();
        xml.writeCharacters("\n");
    }

    /** The text with a blank for each character that XML 1.0 cannot carry. */
    static String printable(String text) {
        StringBuilder kept = new StringBuilder(text.length());
        text.codePoints().forEach(c -> kept.appendCodePoint(
                c >= 0x20 && c < 0xD800 || c == '\n' || c == '\t' || c >= 0xE000 && c < 0xFFFE || c > 0xFFFF ? c : ' '));
        return kept.toString();
    }

    private static String number(double value) {
        return value == 0 ? "0" : new BigDecimal(value).round(DIGITS).stripTrailingZeros().toPlainString();
    }
}
