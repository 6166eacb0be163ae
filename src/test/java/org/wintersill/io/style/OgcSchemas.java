package org.wintersill.io.style;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.Reader;
import java.io.StringReader;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import javax.xml.XMLConstants;
import javax.xml.transform.stream.StreamSource;
import javax.xml.validation.Schema;
import javax.xml.validation.SchemaFactory;
import javax.xml.validation.Validator;
import org.w3c.dom.ls.LSInput;
import org.w3c.dom.ls.LSResourceResolver;
import org.xml.sax.ErrorHandler;
import org.xml.sax.SAXException;
import org.xml.sax.SAXParseException;

/**
 * The schemas of org.jvnet.ogc:ogc-schemas, compiled without network. The artifact has them on the class path under
 * {@code ogc/} and {@code geoserver/}; what it lacks (XLink and the {@code xml:} attributes) is given here in the least form
 * that the others refer to.
 */
final class OgcSchemas {
    static final String OGC = "ogc/sld/1.0.0/StyledLayerDescriptor.xsd";
    static final String GEOSERVER = "geoserver/sld/StyledLayerDescriptor.xsd";
    private static final String PREFIX = "classpath:/";
    private static final Map<String, String> STUBS = Map.of(
            "xlink", xlink(),
            "xml", "<schema xmlns='http://www.w3.org/2001/XMLSchema' "
                    + "targetNamespace='http://www.w3.org/XML/1998/namespace'>"
                    + "<attribute name='lang' type='language'/><attribute name='base' type='anyURI'/></schema>");

    private OgcSchemas() {
    }

    private static String xlink() {
        String[] names = {"type", "href", "role", "arcrole", "title", "show", "actuate", "label", "from", "to"};
        StringBuilder text = new StringBuilder("<schema xmlns='http://www.w3.org/2001/XMLSchema' "
                + "xmlns:x='http://www.w3.org/1999/xlink' targetNamespace='http://www.w3.org/1999/xlink'>");
        for (String name : names) {
            text.append("<attribute name='").append(name).append("' type='string'/>");
        }
        for (String group : new String[] {"simpleLink", "extendedLink", "locatorLink", "arcLink", "resourceLink",
            "titleLink", "emptyLink", "simpleAttrs"}) {
            text.append("<attributeGroup name='").append(group).append("'>");
            for (String name : names) {
                text.append("<attribute ref='x:").append(name).append("'/>");
            }
            text.append("</attributeGroup>");
        }
        return text.append("</schema>").toString();
    }

    /** Complaints about a document; empty when it is valid. */
    static List<String> complaints(String schema, String document) throws SAXException, IOException {
        SchemaFactory factory = SchemaFactory.newDefaultInstance();
        factory.setResourceResolver(new ClassPath());
        StreamSource source = new StreamSource(open(schema), PREFIX + schema);
        Schema compiled = factory.newSchema(source);
        Validator validator = compiled.newValidator();
        validator.setProperty(XMLConstants.ACCESS_EXTERNAL_DTD, "");
        validator.setProperty(XMLConstants.ACCESS_EXTERNAL_SCHEMA, "");
        List<String> complaints = new ArrayList<>();
        validator.setErrorHandler(new ErrorHandler() {
            @Override
            public void warning(SAXParseException e) {
                complaints.add(e.getMessage());
            }

            @Override
            public void error(SAXParseException e) {
                complaints.add(e.getMessage());
            }

            @Override
            public void fatalError(SAXParseException e) throws SAXException {
                throw e;
            }
        });
        validator.validate(new StreamSource(new StringReader(document)));
        return complaints;
    }

    private static InputStream open(String name) throws IOException {
        InputStream stream = OgcSchemas.class.getClassLoader().getResourceAsStream(name);
        if (stream == null) {
            throw new IOException("no schema " + name);
        }
        return stream;
    }

    private static final class ClassPath implements LSResourceResolver {
        @Override
        public LSInput resolveResource(String type, String space, String publicId, String systemId, String base) {
            try {
                if ("http://www.w3.org/XML/1998/namespace".equals(space)) {
                    return new Text("xml", STUBS.get("xml").getBytes(StandardCharsets.UTF_8));
                }
                if (systemId == null) {
                    return null;
                }
                if (systemId.contains("xlink")) {
                    return new Text("xlink", STUBS.get("xlink").getBytes(StandardCharsets.UTF_8));
                }
                String name = systemId.startsWith("http://schemas.opengis.net/")
                        ? "ogc/" + systemId.substring("http://schemas.opengis.net/".length())
                        : URI.create(base.substring(PREFIX.length() - 1)).resolve(systemId).getPath().substring(1);
                try (InputStream stream = open(name)) {
                    return new Text(PREFIX + name, stream.readAllBytes());
                }
            } catch (IOException e) {
                throw new IllegalStateException(e);
            }
        }
    }

    /** A schema text with its name. */
    private record Text(String name, byte[] bytes) implements LSInput {
        @Override
        public Reader getCharacterStream() {
            return null;
        }

        @Override
        public void setCharacterStream(Reader reader) {
            throw new UnsupportedOperationException();
        }

        @Override
        public InputStream getByteStream() {
            return new ByteArrayInputStream(bytes);
        }

        @Override
        public void setByteStream(InputStream stream) {
            throw new UnsupportedOperationException();
        }

        @Override
        public String getStringData() {
            return null;
        }

        @Override
        public void setStringData(String data) {
            throw new UnsupportedOperationException();
        }

        @Override
        public String getSystemId() {
            return name;
        }

        @Override
        public void setSystemId(String id) {
            throw new UnsupportedOperationException();
        }

        @Override
        public String getPublicId() {
            return null;
        }

        @Override
        public void setPublicId(String id) {
            throw new UnsupportedOperationException();
        }

        @Override
        public String getBaseURI() {
            return name;
        }

        @Override
        public void setBaseURI(String uri) {
            throw new UnsupportedOperationException();
        }

        @Override
        public String getEncoding() {
            return null;
        }

        @Override
        public void setEncoding(String encoding) {
            throw new UnsupportedOperationException();
        }

        @Override
        public boolean getCertifiedText() {
            return false;
        }

        @Override
        public void setCertifiedText(boolean certified) {
            throw new UnsupportedOperationException();
        }
    }
}
