package org.wintersill.io.geopackage;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.Set;
import org.sqlite.SQLiteConfig;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Writes one GeoPackage of version 1.3: everything in one transaction, spatial indexes filled row by row, triggers last.
 *
 * <p>The caller names the file (a temporary name) and renames it after {@link #finish}; closing earlier removes the file.
 * No journal is ever laid beside it: a file that is not finished is of no use to anyone. The bytes depend on the calls
 * alone, {@code lastChange} being the only time in the file. Used by one thread.
 *
 * <p>Order of calls: {@link #addCrs}, {@link #features}, rows, {@link #style}, {@link #metadata}, {@link #finish}.
 */
public final class GeoPackageWriter implements AutoCloseable {

    private static final int APPLICATION_ID = 0x47504B47;
    private static final int USER_VERSION = 10300;
    /** Pages kept in memory, in KiB; index pages are visited at random, so that more saves reading. */
    private static final int CACHE_KIB = 65536;
    private static final String NO_DEFINITION = "undefined";

    private final Path file;
    private final String lastChange;
    private final Connection connection;
    private final Map<Integer, CrsRow> systems = new LinkedHashMap<>();
    private final Map<String, FeatureTable> tables = new LinkedHashMap<>();
    private final ColumnDescriptions columns = new ColumnDescriptions(this);
    private final Set<String> styledTables = new LinkedHashSet<>();
    private boolean hasMetadata;
    private boolean closed;

    private GeoPackageWriter(Path file, String lastChange) throws SQLException {
        this.file = file;
        this.lastChange = lastChange;
        SQLiteConfig config = new SQLiteConfig();
        config.setJournalMode(SQLiteConfig.JournalMode.MEMORY);
        config.setSynchronous(SQLiteConfig.SynchronousMode.OFF);
        config.setLockingMode(SQLiteConfig.LockingMode.EXCLUSIVE);
        config.setTempStore(SQLiteConfig.TempStore.MEMORY);
        config.setPageSize(4096);
        config.setCacheSize(-CACHE_KIB);
        config.setGetGeneratedKeys(false);
        // As a URI, a name with ? or % in it stays a name.
        connection = config.createConnection("jdbc:sqlite:" + file.toAbsolutePath().toUri().toASCIIString());
    }

    /**
     * Begins a file; one that is there already is replaced.
     *
     * @param file where it is to be written
     * @param lastChange the time given as that of the last change, {@code YYYY-MM-DDTHH:MM:SS.SSSZ}: the end of the period
     *                   covered or the like, never the clock
     * @throws ProblemException when the file cannot be made
     */
    public static GeoPackageWriter create(Path file, String lastChange) {
        if (!lastChange.matches("\\d{4}-\\d\\d-\\d\\dT\\d\\d:\\d\\d:\\d\\d\\.\\d{3}Z")) {
            throw new IllegalArgumentException("not a time in UTC with milliseconds: " + lastChange);
        }
        GeoPackageWriter writer = null;
        try {
            Files.deleteIfExists(file);
            writer = new GeoPackageWriter(file, lastChange);
            writer.begin();
            return writer;
        } catch (IOException | SQLException e) {
            if (writer != null) {
                writer.close();
            }
            throw WritingProblem.of(file, e);
        }
    }

    private void begin() throws SQLException {
        execute("PRAGMA application_id = " + APPLICATION_ID);
        execute("PRAGMA user_version = " + USER_VERSION);
        connection.setAutoCommit(false);
        for (String statement : StandardTables.CORE) {
            execute(statement);
        }
        insertCrs(CrsRow.UNDEFINED_CARTESIAN);
        insertCrs(CrsRow.UNDEFINED_GEOGRAPHIC);
        insertCrs(CrsRow.WGS84);
        extension("gpkg_spatial_ref_sys", "definition_12_063", "gpkg_crs_wkt", StandardTables.CRS_WKT, "read-write");
        extension("gpkg_data_columns", null, "gpkg_schema", StandardTables.SCHEMA, "read-write");
        extension("gpkg_data_column_constraints", null, "gpkg_schema", StandardTables.SCHEMA, "read-write");
    }

    /**
     * Adds a reference system. Those that every file lists (-1, 0 and 4326) are there already and stay as they are.
     *
     * @return its number, for {@link TableDefinition#srsId}
     */
    public int addCrs(CrsRow row) {
        requireOpen();
        CrsRow present = systems.get(row.srsId());
        if (present == null) {
            try {
                insertCrs(row);
            } catch (SQLException e) {
                throw problem(e);
            }
        } else if (!present.equals(row) && row.srsId() != CrsRow.WGS84.srsId()) {
            throw new IllegalArgumentException("two reference systems are numbered " + row.srsId());
        }
        return row.srsId();
    }

    private void insertCrs(CrsRow row) throws SQLException {
        insert("INSERT INTO gpkg_spatial_ref_sys VALUES (?, ?, ?, ?, ?, ?, ?)", row.name(), row.srsId(), row.organization(),
                row.organizationId(), orUndefined(row.definitionWkt1()), row.description(),
                orUndefined(row.definitionWkt2()));
        systems.put(row.srsId(), row);
    }

    private static String orUndefined(String definition) {
        return definition.isEmpty() ? NO_DEFINITION : definition;
    }

    /**
     * Makes a table of features or attributes with the description of its columns.
     *
     * @throws ProblemException when the file cannot be written
     */
    public FeatureTable features(TableDefinition table) {
        requireOpen();
        if (tables.containsKey(table.name())) {
            throw new IllegalArgumentException("table " + table.name() + " is there already");
        }
        if (table.hasGeometry() && !systems.containsKey(table.srsId())) {
            throw new IllegalArgumentException("no reference system is numbered " + table.srsId());
        }
        try {
            insert("INSERT INTO gpkg_contents (table_name, data_type, identifier, description, last_change, srs_id) "
                            + "VALUES (?, ?, ?, ?, ?, ?)", table.name(), table.hasGeometry() ? "features" : "attributes",
                    table.identifier(), table.description(), lastChange, table.hasGeometry() ? table.srsId() : null);
            FeatureTable made = new FeatureTable(this, connection, table);
            if (table.hasGeometry()) {
                insert("INSERT INTO gpkg_geometry_columns VALUES (?, 'geom', ?, ?, 0, 0)", table.name(),
                        table.geometryType(), table.srsId());
                extension(table.name(), "geom", "gpkg_rtree_index", StandardTables.RTREE, "write-only");
            }
            columns.describe(table);
            tables.put(table.name(), made);
            return made;
        } catch (SQLException e) {
            throw problem(e);
        }
    }

    /**
     * Stores a style of a table; the first one of a table is its default.
     *
     * @param qml style as QGIS keeps it
     * @param sld style as SLD 1.1
     */
    public void style(String table, String styleName, String qml, String sld, String description) {
        requireOpen();
        FeatureTable styled = tables.get(table);
        if (styled == null || !styled.definition().hasGeometry()) {
            throw new IllegalArgumentException("no layer is called " + table);
        }
        try {
            if (styledTables.isEmpty()) {
                execute(StandardTables.STYLES);
                insert("INSERT INTO gpkg_contents (table_name, data_type, identifier, description, last_change) "
                        + "VALUES ('layer_styles', 'attributes', 'layer_styles', 'Styles of the layers', ?)", lastChange);
            }
            insert("INSERT INTO layer_styles (f_table_catalog, f_table_schema, f_table_name, f_geometry_column, styleName, "
                            + "styleQML, styleSLD, useAsDefault, description, owner, update_time) "
                            + "VALUES ('', '', ?, 'geom', ?, ?, ?, ?, ?, '', ?)",
                    table, styleName, qml, sld, styledTables.add(table) ? 1 : 0, description, lastChange);
        } catch (SQLException e) {
            throw problem(e);
        }
    }

    /**
     * Stores what made the file.
     *
     * @param vocabulary URI of the vocabulary of the record
     * @param json the record
     */
    public void metadata(String vocabulary, String json) {
        requireOpen();
        if (hasMetadata) {
            throw new IllegalStateException("the file has its provenance already");
        }
        try {
            for (String statement : StandardTables.PROVENANCE) {
                execute(statement);
            }
            insert("INSERT INTO gpkg_metadata VALUES (1, 'dataset', ?, 'application/json', ?)", vocabulary, json);
            insert("INSERT INTO gpkg_metadata_reference VALUES ('geopackage', NULL, NULL, NULL, ?, 1, NULL)", lastChange);
            extension("gpkg_metadata", null, "gpkg_metadata", StandardTables.METADATA, "read-write");
            extension("gpkg_metadata_reference", null, "gpkg_metadata", StandardTables.METADATA, "read-write");
            hasMetadata = true;
        } catch (SQLException e) {
            throw problem(e);
        }
    }

    /**
     * Stores the extents, makes the triggers, ends the transaction and forces the file to disk.
     *
     * @throws ProblemException when the disk is full or the file cannot be written; the file is gone then
     */
    public void finish() {
        requireOpen();
        try {
            try (PreparedStatement extents = connection.prepareStatement(
                    "UPDATE gpkg_contents SET min_x = ?, min_y = ?, max_x = ?, max_y = ? WHERE table_name = ?")) {
                for (FeatureTable table : tables.values()) {
                    table.complete(extents);
                }
            }
            for (FeatureTable table : tables.values()) {
                if (table.definition().hasGeometry()) {
                    for (String trigger : SpatialIndex.triggers(table.definition().name())) {
                        execute(trigger);
                    }
                }
            }
            connection.commit();
            connection.close();
            try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
                channel.force(true);
            }
            closed = true;
        } catch (SQLException | IOException e) {
            close();
            throw WritingProblem.of(file, e);
        }
    }

    /** Ends the writer; removes the file unless it was finished. */
    @Override
    public void close() {
        if (closed) {
            return;
        }
        closed = true;
        try {
            connection.close();
        } catch (SQLException e) {
            // The file goes anyway; what went wrong before has been told.
        }
        try {
            Files.deleteIfExists(file);
        } catch (IOException e) {
            throw Problem.output("The unfinished file cannot be removed", file.toString(), "Delete it").asException(e);
        }
    }

    void requireOpen() {
        if (closed) {
            throw new IllegalStateException(file + " is closed");
        }
    }

    void execute(String sql) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            statement.execute(sql);
        }
    }

    private void extension(String table, String column, String name, String definition, String scope) throws SQLException {
        insert("INSERT INTO gpkg_extensions VALUES (?, ?, ?, ?, ?)", table, column, name, definition, scope);
    }

    void insert(String sql, Object... values) throws SQLException {
        try (PreparedStatement statement = connection.prepareStatement(sql)) {
            for (int i = 0; i < values.length; i++) {
                statement.setObject(i + 1, values[i]);
            }
            statement.executeUpdate();
        }
    }

    ProblemException problem(SQLException e) {
        return WritingProblem.of(file, e);
    }
}
