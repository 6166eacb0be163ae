package org.wintersill.io.vector;

import java.io.BufferedInputStream;
import java.io.DataInputStream;
import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.LinearRing;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.parcel.PolygonFeature;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Polygons of a Shapefile (ESRI Shapefile Technical Description, 1998): shapes from the {@code .shp}, columns from the {@code .dbf},
 * the reference system from the {@code .prj}, the code page from the {@code .cpg}. Z and M are left out. The files beside it are found
 * in upper and lower case.
 */
final class ShapefilePolygons implements PolygonReader {
    static final int FILE_CODE = 9994;
    private static final int FILE_HEADER = 100;
    private static final int RECORD_HEADER = 8;
    private static final int POLYGON_HEADER = 44;
    private static final int LONGEST_PRJ = 1 << 16;

    private final Path file;
    private final long size;
    private final DataInputStream shapes;
    private final DbfTable table;
    private final Crs crs;
    private final NamedColumns named;
    private long position = FILE_HEADER;
    private long count;

    private ShapefilePolygons(Path file, PolygonRequest request, CrsParser parser) throws IOException {
        this.file = file;
        request.layer().ifPresent(layer -> {
            throw Problem.usage("a Shapefile has no layers, and layer " + layer + " is asked for", file.toString(), "Take the layer out")
                    .asException();
        });
        Optional<Path> prj = companion(".prj");
        Optional<String> wkt = prj.isPresent() ? Optional.of(new String(head(prj.get()), StandardCharsets.UTF_8)).filter(text -> !text.isBlank())
                : Optional.empty();
        crs = new SystemOfFile(file, parser).settle(wkt, request.crs());
        size = Files.size(file);
        Optional<Path> dbf = companion(".dbf");
        table = dbf.isPresent() ? DbfTable.open(dbf.get(), companion(".cpg")) : null;
        try {
            named = NamedColumns.of(file, table == null ? List.of() : table.columns(), request);
            shapes = new DataInputStream(new BufferedInputStream(Files.newInputStream(file), 1 << 16));
            checkHeader(shapes.readNBytes(FILE_HEADER));
        } catch (IOException | RuntimeException e) {
            if (table != null) {
                table.close();
            }
            throw e;
        }
    }

    static ShapefilePolygons open(Path file, PolygonRequest request, CrsParser parser) {
        try {
            return new ShapefilePolygons(file, request, parser);
        } catch (IOException e) {
            throw damaged(file, String.valueOf(e.getMessage()), e);
        }
    }

    static ProblemException damaged(Path file, String what, Exception cause) {
        return Problem.input("the Shapefile is damaged or cut short: " + what, file.toString(), "Fetch or make it again, with all its files")
                .asException(cause);
    }

    private static byte[] head(Path path) throws IOException {
        try (var in = Files.newInputStream(path)) {
            return in.readNBytes(LONGEST_PRJ);
        }
    }

    /** The file of the same name with another ending. */
    private Optional<Path> companion(String ending) throws IOException {
        String name = file.getFileName().toString();
        int dot = name.lastIndexOf('.');
        String stem = dot < 0 ? name : name.substring(0, dot);
        Path exact = file.resolveSibling(stem + ending);
        if (Files.isRegularFile(exact)) {
            return Optional.of(exact);
        }
        Path folder = file.toAbsolutePath().getParent();
        try (Stream<Path> siblings = Files.list(folder)) {
            return siblings.filter(path -> path.getFileName().toString().equalsIgnoreCase(stem + ending)).sorted().findFirst();
        }
    }

    private void checkHeader(byte[] bytes) throws EOFException {
        if (bytes.length < FILE_HEADER) {
            throw new EOFException("its header has " + bytes.length + " bytes");
        }
        ByteBuffer header = ByteBuffer.wrap(bytes);
        long said = 2L * header.getInt(24);
        if (said > size) {
            throw damaged(file, "it says it has " + said + " bytes and has " + size, null);
        }
        int type = header.order(ByteOrder.LITTLE_ENDIAN).getInt(32);
        if (!isPolygon(type) && type != 0) {
            throw Problem.input("the Shapefile holds " + kind(type) + ", no polygons", file.toString(), "Give a file with polygons").asException();
        }
    }

    private static boolean isPolygon(int type) {
        return type == 5 || type == 15 || type == 25;
    }

    private static String kind(int type) {
        return switch (type) {
            case 1, 11, 21 -> "points";
            case 3, 13, 23 -> "lines";
            case 8, 18, 28 -> "groups of points";
            case 31 -> "multipatches";
            default -> "shapes of type " + type;
        };
    }

    @Override
    public Crs crs() {
        return crs;
    }

    @Override
    public String layer() {
        String name = file.getFileName().toString();
        return name.toLowerCase(Locale.ROOT).endsWith(".shp") ? name.substring(0, name.length() - 4) : name;
    }

    @Override
    public String idColumn() {
        return named.id().orElse("");
    }

    @Override
    public PolygonFeature next() {
        try {
            while (position + RECORD_HEADER <= size) {
                count++;
                ByteBuffer content = record();
                DbfTable.Row row = table == null ? DbfTable.Row.NONE : table.next(named);
                if (!row.deleted()) {
                    RingRepair.Repaired repaired = RingRepair.of(shape(content));
                    return new PolygonFeature(count, row.id().isEmpty() ? Long.toString(count) : row.id(), row.name(), repaired.outline(),
                            repaired.remark());
                }
            }
            return null;
        } catch (IOException e) {
            throw damaged(file, "record " + count + ": " + e.getMessage(), e);
        }
    }

    private ByteBuffer record() throws IOException {
        shapes.readInt();
        long length = 2L * shapes.readInt();
        position += RECORD_HEADER;
        if (length < 4 || length > size - position || length > Integer.MAX_VALUE - 16) {
            throw new EOFException("it says it has " + length + " bytes");
        }
        byte[] content = shapes.readNBytes((int) length);
        if (content.length < length) {
            throw new EOFException("it ends early");
        }
        position += length;
        return ByteBuffer.wrap(content).order(ByteOrder.LITTLE_ENDIAN);
    }

    private org.locationtech.jts.geom.Geometry shape(ByteBuffer content) throws IOException {
        int type = content.getInt(0);
        if (type == 0) {
            return null;
        }
        if (!isPolygon(type) || content.limit() < POLYGON_HEADER) {
            throw new IOException(isPolygon(type) ? "it is too short" : "it holds " + kind(type));
        }
        int parts = content.getInt(36);
        int points = content.getInt(40);
        long pointsAt = POLYGON_HEADER + 4L * parts;
        if (parts < 0 || points < 0 || pointsAt + 16L * points > content.limit()) {
            throw new IOException("it says it has " + parts + " rings and " + points + " points");
        }
        List<LinearRing> rings = new ArrayList<>();
        for (int part = 0; part < parts; part++) {
            int from = content.getInt(POLYGON_HEADER + 4 * part);
            int to = part + 1 < parts ? content.getInt(POLYGON_HEADER + 4 * part + 4) : points;
            if (from < 0 || to < from || to > points) {
                throw new IOException("its ring " + (part + 1) + " begins at point " + from + " and ends at " + to);
            }
            Coordinate[] ring = new Coordinate[to - from];
            for (int i = 0; i < ring.length; i++) {
                int at = (int) pointsAt + 16 * (from + i);
                ring[i] = new Coordinate(content.getDouble(at), content.getDouble(at + 8));
            }
            if (ring.length > 0) {
                rings.add(GeoJsonFeature.ring(ring));
            }
        }
        return RingNesting.polygons(rings);
    }

    @Override
    public void close() {
        try {
            shapes.close();
            if (table != null) {
                table.close();
            }
        } catch (IOException e) {
            throw damaged(file, String.valueOf(e.getMessage()), e);
        }
    }
}
