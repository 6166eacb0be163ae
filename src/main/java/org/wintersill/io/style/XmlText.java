package org.wintersill.io.style;

import java.io.StringWriter;
import java.math.BigDecimal;
import java.math.MathContext;
import javax.xml.stream.XMLOutputFactory;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamWriter;

/** An XML document in the making, indented by two blanks a level. All escaping is that of the JDK's writer. */
final class XmlText {
    private static final MathContext DIGITS = new MathContext(12);

    private final StringWriter text = new StringWriter();
    private final XMLStreamWriter xml;
    private int depth;
    private boolean openedLast;

    XmlText() {
        try {
            xml = XMLOutputFactory.newDefaultFactory().createXMLStreamWriter(text);
        } catch (XMLStreamException e) {
            throw impossible(e);
        }
        text.append("<?xml version=\"1.0\" encoding=\"UTF-8\"?>");
    }

    /** Opens an element; attributes are names and values in turn. */
    XmlText open(String name, String... attributes) {
        try {
            newLine();
            xml.writeStartElement(name);
            attributes(attributes);
            depth++;
            openedLast = true;
            return this;
        } catch (XMLStreamException e) {
            throw impossible(e);
        }
    }

    /** An element without content. */
    XmlText empty(String name, String... attributes) {
        try {
            newLine();
            xml.writeEmptyElement(name);
            attributes(attributes);
            openedLast = false;
            return this;
        } catch (XMLStreamException e) {
            throw impossible(e);
        }
    }

    /** An element with text. */
    XmlText element(String name, String content, String... attributes) {
        open(name, attributes);
        try {
            xml.writeCharacters(printable(content));
        } catch (XMLStreamException e) {
            throw impossible(e);
        }
        return close();
    }

    XmlText close() {
        try {
            depth--;
            if (!openedLast) {
                newLine();
            }
            xml.writeEndElement();
            openedLast = false;
            return this;
        } catch (XMLStreamException e) {
            throw impossible(e);
        }
    }

    /** The finished document; all elements must be closed. */
    String finish() {
        try {
            xml.writeEndDocument();
            xml.close();
            return text + "\n";
        } catch (XMLStreamException e) {
            throw impossible(e);
        }
    }

    private void newLine() throws XMLStreamException {
        if (depth == 0) {
            text.append('\n');
        } else {
            xml.writeCharacters("\n" + "  ".repeat(depth));
        }
    }

    private void attributes(String... attributes) throws XMLStreamException {
        for (int i = 0; i < attributes.length; i += 2) {
            xml.writeAttribute(attributes[i], printable(attributes[i + 1]));
        }
    }

    /** The text on one line, with a blank for each character that XML 1.0 cannot carry. */
    private static String printable(String content) {
        StringBuilder kept = new StringBuilder(content.length());
        content.codePoints().forEach(c -> kept.appendCodePoint(
                c >= 0x20 && c < 0xD800 || c >= 0xE000 && c < 0xFFFE || c > 0xFFFF ? c : ' '));
        return kept.toString();
    }

    /** A number with a point and without exponent. */
    static String number(double value) {
        return value == 0 ? "0" : BigDecimal.valueOf(value).round(DIGITS).stripTrailingZeros().toPlainString();
    }

    private static IllegalStateException impossible(XMLStreamException e) {
        return new IllegalStateException("XML cannot be written to memory", e);
    }
}
