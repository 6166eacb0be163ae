package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import javax.xml.stream.XMLOutputFactory;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamWriter;
import org.wintersill.layer.LayerStyle;
import org.wintersill.problem.Problem;

/**
 * The names of the classes of a layer, in the file {@code NAME.tif.aux.xml} where GDAL and QGIS look for them: TIFF itself
 * has no place for them.
 */
public final class CategorySidecar {
    private CategorySidecar() {
    }

    /**
     * Writes the names beside a finished file, whole or not at all.
     *
     * @param tif final name of the GeoTIFF
     * @param classes its classes; names of numbers without a class stay empty
     * @return the file written
     * @throws org.wintersill.problem.ProblemException when it cannot be written
     */
    public static Path write(Path tif, LayerStyle.Classes classes) {
        Path file = tif.resolveSibling(tif.getFileName() + ".aux.xml");
        Path begun = tif.resolveSibling("." + tif.getFileName() + ".aux.xml.tmp");
        try {
            try {
                Files.writeString(begun, xml(classes));
                Files.move(begun, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
            } finally {
                Files.deleteIfExists(begun);
            }
        } catch (IOException e) {
            throw Problem.output("the class names cannot be written: " + e.getMessage(), file.toString(),
                    "Make room, or choose a folder that can be written").asException(e);
        }
        return file;
    }

    private static String xml(LayerStyle.Classes classes) {
        StringWriter text = new StringWriter();
        try {
            XMLStreamWriter xml = XMLOutputFactory.newDefaultFactory().createXMLStreamWriter(text);
            xml.writeStartElement("PAMDataset");
            xml.writeStartElement("PAMRasterBand");
            xml.writeAttribute("band", "1");
            xml.writeStartElement("CategoryNames");
            int code = 0;
            for (LayerStyle.Entry entry : classes.entries()) {
                for (; code < entry.code(); code++) {
                    category(xml, "");
                }
                category(xml, entry.name());
                code++;
            }
            xml.writeEndElement();
            xml.writeEndElement();
            xml.writeEndElement();
            xml.writeCharacters("\n");
            xml.close();
        } catch (XMLStreamException e) {
            throw new IllegalStateException("XML cannot be written to memory", e);
        }
        return text.toString();
    }

    private static void category(XMLStreamWriter xml, String name) throws XMLStreamException {
        xml.writeCharacters("\n  ");
        xml.writeStartElement("Category");
        xml.writeCharacters(BandMetadata.printable(name));
        xml.writeEndElement();
    }
}
