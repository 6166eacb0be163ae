package org.wintersill.io.vector;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import org.wintersill.grid.CrsParser;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.Problem;

/** Opens files of polygons; the first bytes decide the format, not the name. */
public final class PolygonFiles {
    private static final byte[] SQLITE = "SQLite format 3\0".getBytes(StandardCharsets.US_ASCII);
    private static final int HEAD = 512;

    private final CrsParser parser;

    /** @param parser turns the codes and texts in files into reference systems */
    public PolygonFiles(CrsParser parser) {
        this.parser = parser;
    }

    /**
     * Opens a file.
     *
     * @param file a GeoPackage, a GeoJSON file, or the {@code .shp} of a Shapefile
     * @throws org.wintersill.problem.ProblemException when it is none of these, is damaged, or does not have what was asked for
     */
    public PolygonReader open(Path file, PolygonRequest request) {
        byte[] head = head(file);
        if (startsWith(head, SQLITE)) {
            return GeoPackagePolygons.open(file, request, parser);
        }
        if (head.length >= 4 && ByteBuffer.wrap(head).getInt() == ShapefilePolygons.FILE_CODE) {
            return ShapefilePolygons.open(file, request, parser);
        }
        if (new String(head, StandardCharsets.UTF_8).replace("\ufeff", "").stripLeading().startsWith("{")) {
            return GeoJsonPolygons.open(file, request, parser);
        }
        throw Problem.input("the file holds no polygons that can be read; " + found(file, head), file.toString(),
                "Give a GeoPackage, a GeoJSON file, or the .shp of a Shapefile").asException();
    }

    private static String found(Path file, byte[] head) {
        String name = String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
        String text = new String(head, StandardCharsets.ISO_8859_1).stripLeading().toLowerCase(Locale.ROOT);
        if (head.length == 0) {
            return "it is empty";
        }
        if (text.startsWith("<!doctype html") || text.startsWith("<html")) {
            return "it is a web page, perhaps a login page that was saved instead of the file";
        }
        if (head.length > 1 && (head[0] & 255) == 0x1f && (head[1] & 255) == 0x8b || text.startsWith("pk\u0003\u0004")) {
            return "it is packed: unpack it first";
        }
        return name.endsWith(".dbf") || name.endsWith(".shx") || name.endsWith(".prj") ? "it is a companion of a .shp file"
                : "its format is not known";
    }

    private static byte[] head(Path file) {
        try (InputStream in = Files.newInputStream(file)) {
            return in.readNBytes(HEAD);
        } catch (IOException e) {
            throw Problem.input(Files.isDirectory(file) ? "a folder stands where a file of polygons is needed"
                    : "the file cannot be read: " + e.getMessage(), file.toString(), "Name one file").asException(e);
        }
    }

    private static boolean startsWith(byte[] bytes, byte[] start) {
        return bytes.length >= start.length && java.util.Arrays.equals(bytes, 0, start.length, start, 0, start.length);
    }
}
