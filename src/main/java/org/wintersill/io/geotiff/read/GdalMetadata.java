package org.wintersill.io.geotiff.read;

import java.io.StringReader;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import javax.xml.stream.XMLInputFactory;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;

/** What the XML of tag 42112 says of each band: description, unit, scale and offset. */
final class GdalMetadata {
    private final Map<String, String> items = new HashMap<>();

    /** @throws XMLStreamException when the text is not well-formed */
    GdalMetadata(String xml) throws XMLStreamException {
        if (xml.isBlank()) {
            return;
        }
        XMLInputFactory factory = XMLInputFactory.newFactory();
        factory.setProperty(XMLInputFactory.SUPPORT_DTD, false);
        factory.setProperty(XMLInputFactory.IS_SUPPORTING_EXTERNAL_ENTITIES, false);
        XMLStreamReader reader = factory.createXMLStreamReader(new StringReader(xml.trim()));
        try {
            while (reader.hasNext()) {
                if (reader.next() == XMLStreamConstants.START_ELEMENT && reader.getLocalName().equals("Item")) {
                    String sample = reader.getAttributeValue(null, "sample");
                    String role = reader.getAttributeValue(null, "role");
                    if (sample != null && role != null) {
                        items.put(role + ' ' + sample, reader.getElementText().trim());
                    }
                }
            }
        } finally {
            reader.close();
        }
    }

    /** @param role {@code description}, {@code unittype}, {@code scale} or {@code offset}; @param band from 0 */
    Optional<String> item(String role, int band) {
        return Optional.ofNullable(items.get(role + ' ' + band)).filter(text -> !text.isEmpty());
    }
}
