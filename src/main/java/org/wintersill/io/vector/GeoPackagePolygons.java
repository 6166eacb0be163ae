package org.wintersill.io.vector;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.io.ParseException;
import org.locationtech.jts.io.WKBReader;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.parcel.PolygonFeature;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Polygons of one table of a GeoPackage (OGC 12-128r17). Layers are those of {@code gpkg_contents} whose geometries can be
 * polygons; the one to read must be named where there are several.
 */
final class GeoPackagePolygons implements PolygonReader {
    private static final Set<String> POLYGON_TYPES = Set.of("POLYGON", "MULTIPOLYGON", "GEOMETRY", "GEOMETRYCOLLECTION", "SURFACE",
            "MULTISURFACE");
    private static final List<String> STANDARD_TABLES = List.of("gpkg_contents", "gpkg_geometry_columns", "gpkg_spatial_ref_sys");
    private static final int HEADER = 8;
    private static final int[] ENVELOPE_BYTES = {0, 32, 48, 48, 64};

    private final Path file;
    private final PackageDatabase database;
    private final String table;
    private final Crs crs;
    private final NamedColumns named;
    private final PreparedStatement statement;
    private final ResultSet rows;
    private final WKBReader wkb = new WKBReader();

    private GeoPackagePolygons(Path file, PackageDatabase database, PolygonRequest request, CrsParser parser) throws SQLException {
        this.file = file;
        this.database = database;
        for (String standard : STANDARD_TABLES) {
            if (!database.hasPlainTable(standard)) {
                throw Problem.input("the file is a database without the table " + standard + ", so no GeoPackage", file.toString(),
                        "Make one with ogr2ogr -f GPKG").asException();
            }
        }
        Map<String, Object> layer = layer(request.layer());
        table = layer.get("table_name").toString();
        if (!database.hasPlainTable(table)) {
            throw Problem.input("the layer " + table + " is a view or a virtual table; only plain tables are read", file.toString(),
                    "Save it as a layer of its own").asException();
        }
        crs = new SystemOfFile(file, parser).settle(system((Number) layer.get("srs_id")), request.crs());
        List<String> columns = new ArrayList<>();
        String key = "rowid";
        for (Map<String, Object> column : database.rows("PRAGMA table_info(" + PackageDatabase.quoted(table) + ")")) {
            columns.add(column.get("name").toString());
            if (((Number) column.get("pk")).intValue() == 1 && "INTEGER".equalsIgnoreCase(String.valueOf(column.get("type")))) {
                key = column.get("name").toString();
            }
        }
        String geometry = layer.get("column_name").toString();
        String found = columns.stream().filter(geometry::equalsIgnoreCase).findFirst().orElseThrow(() -> Problem.input("the layer "
                + table + " has no column " + geometry + " for its geometries", file.toString(), "Make the file again").asException());
        columns.remove(found);
        named = NamedColumns.of(file, columns, request);
        statement = database.prepare("SELECT " + PackageDatabase.quoted(key) + ", " + PackageDatabase.quoted(found) + ", "
                + named.id().map(PackageDatabase::quoted).orElse("NULL") + ", " + named.name().map(PackageDatabase::quoted).orElse("NULL")
                + " FROM " + PackageDatabase.quoted(table));
        rows = statement.executeQuery();
    }

    static GeoPackagePolygons open(Path file, PolygonRequest request, CrsParser parser) {
        PackageDatabase database = PackageDatabase.open(file);
        try {
            return new GeoPackagePolygons(file, database, request, parser);
        } catch (SQLException e) {
            database.close();
            throw PackageDatabase.damaged(file, e);
        } catch (RuntimeException e) {
            database.close();
            throw e;
        }
    }

    private Map<String, Object> layer(Optional<String> asked) {
        List<Map<String, Object>> layers = database.rows("SELECT c.table_name, g.column_name, g.geometry_type_name, g.srs_id "
                + "FROM gpkg_contents c JOIN gpkg_geometry_columns g ON g.table_name = c.table_name COLLATE NOCASE "
                + "WHERE c.data_type = 'features' ORDER BY c.table_name");
        layers.removeIf(row -> row.values().stream().anyMatch(value -> value == null));
        List<String> names = layers.stream().map(row -> row.get("table_name").toString()).toList();
        if (asked.isPresent()) {
            return layers.stream().filter(row -> asked.get().equals(row.get("table_name").toString())).findFirst()
                    .or(() -> layers.stream().filter(row -> asked.get().equalsIgnoreCase(row.get("table_name").toString())).findFirst())
                    .orElseThrow(() -> Problem.usage("there is no layer '" + asked.get() + "'; layers are " + String.join(", ", names),
                            file.toString(), NearestName.of(asked.get(), names).map(near -> "Did you mean " + near + "?").orElse("")).asException());
        }
        layers.removeIf(row -> !POLYGON_TYPES.contains(row.get("geometry_type_name").toString().toUpperCase(Locale.ROOT)));
        if (layers.size() != 1) {
            throw Problem.usage(layers.isEmpty() ? "no layer holds polygons" + (names.isEmpty() ? "" : "; layers are " + String.join(", ", names))
                            : "several layers hold polygons: " + String.join(", ", layers.stream().map(row -> row.get("table_name").toString()).toList()),
                    file.toString(), layers.isEmpty() ? "Give a file with polygons" : "Name one of them as layer").asException();
        }
        return layers.get(0);
    }

    /** Code or text of a reference system; empty for the undefined ones. */
    private Optional<String> system(Number srsId) {
        if (srsId.longValue() == 0 || srsId.longValue() == -1) {
            return Optional.empty();
        }
        List<Map<String, Object>> found = database.rows("SELECT organization, organization_coordsys_id, definition "
                + "FROM gpkg_spatial_ref_sys WHERE srs_id = ?", srsId);
        if (found.isEmpty()) {
            return Optional.empty();
        }
        Map<String, Object> row = found.get(0);
        if ("EPSG".equalsIgnoreCase(String.valueOf(row.get("organization"))) && row.get("organization_coordsys_id") instanceof Number code) {
            return Optional.of("EPSG:" + code);
        }
        return Optional.of(String.valueOf(row.get("definition"))).filter(text -> text.contains("["));
    }

    @Override
    public Crs crs() {
        return crs;
    }

    @Override
    public String layer() {
        return table;
    }

    @Override
    public String idColumn() {
        return named.id().orElse("");
    }

    @Override
    public PolygonFeature next() {
        try {
            if (!rows.next()) {
                return null;
            }
            long number = rows.getLong(1);
            Object blob = rows.getObject(2);
            if (blob != null && !(blob instanceof byte[])) {
                throw damagedRow(number, "its geometry is no blob", null);
            }
            RingRepair.Repaired repaired = RingRepair.of(blob == null ? null : geometry((byte[]) blob, number));
            String id = NamedColumns.text(rows.getObject(3));
            return new PolygonFeature(number, id.isEmpty() ? Long.toString(number) : id, NamedColumns.text(rows.getObject(4)), repaired.outline(),
                    repaired.remark());
        } catch (SQLException e) {
            throw database.damaged(e);
        }
    }

    /** Decodes the blob of clause 2.1.3: header, envelope, WKB. */
    private Geometry geometry(byte[] blob, long number) {
        if (blob.length < HEADER || blob[0] != 'G' || blob[1] != 'P') {
            throw damagedRow(number, "its geometry does not begin as a GeoPackage geometry does", null);
        }
        int flags = blob[3];
        int envelope = flags >> 1 & 7;
        if ((flags & 1 << 5) != 0 || envelope >= ENVELOPE_BYTES.length || blob.length < HEADER + ENVELOPE_BYTES[envelope]) {
            throw damagedRow(number, "the header of its geometry is not known", null);
        }
        if ((flags & 1 << 4) != 0) {
            return null;
        }
        int start = HEADER + ENVELOPE_BYTES[envelope];
        try {
            return wkb.read(Arrays.copyOfRange(blob, start, blob.length));
        } catch (ParseException | IllegalArgumentException | StackOverflowError e) {
            throw damagedRow(number, curve(blob, start) ? "its geometry is a curve; curves are not read"
                    : "its geometry is damaged: " + e.getMessage(), e);
        }
    }

    private static boolean curve(byte[] blob, int start) {
        if (blob.length < start + 5) {
            return false;
        }
        ByteBuffer buffer = ByteBuffer.wrap(blob).order(blob[start] == 1 ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
        int type = (buffer.getInt(start + 1) & 0xffff) % 1000;
        return type >= 8 && type <= 14;
    }

    private ProblemException damagedRow(long number, String what, Throwable cause) {
        return Problem.input("row " + number + " of layer " + table + " cannot be used: " + what, file.toString(),
                "Mend or remove the row, or make the file again with ogr2ogr -nlt CONVERT_TO_LINEAR").asException(cause);
    }

    @Override
    public void close() {
        try (database) {
            rows.close();
            statement.close();
        } catch (SQLException e) {
            throw database.damaged(e);
        }
    }
}
