package org.wintersill.io.geotiff.read;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.xml.stream.XMLInputFactory;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;
import org.wintersill.grid.Block;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Problem;

/**
 * An open GeoTIFF of plain numbers, as this program writes its layers: no unit, date or height is made of them. Missing values are
 * NaN. Used by one thread.
 */
public final class PlainRaster implements AutoCloseable {
    private final TiffFile file;
    private final GeotiffHeader header;
    private final WindowReader window;
    private final GridWindow place;

    private PlainRaster(TiffFile file, GeotiffHeader header) {
        this.file = file;
        this.header = header;
        window = new WindowReader(file, header);
        place = new GridWindow(header.place());
    }

    /**
     * Opens a file.
     *
     * @throws org.wintersill.problem.ProblemException when it is no GeoTIFF or is damaged
     */
    public static PlainRaster open(Path path, CrsParser parser) {
        TiffFile file = TiffFile.open(path);
        try {
            return new PlainRaster(file, GeotiffHeader.read(file, new CrsLookup(parser), Optional.empty()));
        } catch (RuntimeException e) {
            file.close();
            throw e;
        }
    }

    public GridGeometry grid() {
        return header.place().grid();
    }

    public int bands() {
        return header.image().samples();
    }

    /** Description of a band; empty where it has none. */
    public String bandName(int band) {
        return header.metadata().item("description", band).orElse("");
    }

    /** Width of the tiles in which the file is stored. */
    public int tile() {
        return header.image().chunkWidth();
    }

    /** Unit of the first band; {@code 1} where it has none. */
    public String unit() {
        return header.metadata().item("unittype", 0).orElse("1");
    }

    /** A few words: what stands before the colon of the file's description. */
    public String title() {
        String text = description();
        int colon = text.indexOf(": ");
        return colon < 0 ? text : text.substring(0, colon);
    }

    /** What the values mean: what stands after the colon of the file's description. */
    public String meaning() {
        String text = description();
        int colon = text.indexOf(": ");
        return colon < 0 ? "" : text.substring(colon + 2);
    }

    private String description() {
        try {
            return file.directories().get(0).text(TiffDirectory.DESCRIPTION);
        } catch (IOException e) {
            throw Problem.input("the description cannot be read: " + e.getMessage(), file.path().toString(), "Make the outputs again").asException(e);
        }
    }

    /** Names of the classes by their number, from the file beside it; an empty list for a layer without classes. */
    public static List<String> classes(Path tif) {
        Path sidecar = tif.resolveSibling(tif.getFileName() + ".aux.xml");
        List<String> names = new ArrayList<>();
        if (!Files.isRegularFile(sidecar)) {
            return names;
        }
        XMLInputFactory factory = XMLInputFactory.newFactory();
        factory.setProperty(XMLInputFactory.SUPPORT_DTD, false);
        factory.setProperty(XMLInputFactory.IS_SUPPORTING_EXTERNAL_ENTITIES, false);
        try (InputStream in = Files.newInputStream(sidecar)) {
            XMLStreamReader reader = factory.createXMLStreamReader(in);
            while (reader.hasNext()) {
                if (reader.next() == XMLStreamConstants.START_ELEMENT && reader.getLocalName().equals("Category")) {
                    names.add(reader.getElementText());
                }
            }
        } catch (IOException | XMLStreamException e) {
            throw Problem.input("the names of classes cannot be read: " + String.valueOf(e.getMessage()).split("\n")[0], sidecar.toString(),
                    "Make the outputs again").asException(e);
        }
        return names;
    }

    /**
     * Reads a block of a band.
     *
     * @param band from 0
     * @param out {@code [row * columns + column]} of the block
     */
    public void read(int band, Block block, float[] out) {
        place.read(window, new int[] {band}, block, (position, row, column, stored, count) -> {
            int to = (row - block.row()) * block.columns() + column - block.column();
            for (int i = 0; i < count; i++) {
                out[to + i] = (float) stored[i];
            }
        });
    }

    @Override
    public void close() {
        file.close();
    }
}
