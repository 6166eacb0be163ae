package org.wintersill.io.geopackage;

import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.SQLException;
import java.util.List;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.geom.Geometry;
import org.wintersill.parcel.Outline;

/** A table that is being filled, in the one transaction of its {@link GeoPackageWriter}. Used by one thread. */
public final class FeatureTable {

    private final GeoPackageWriter owner;
    private final TableDefinition definition;
    private final PreparedStatement row;
    private final PreparedStatement box;
    private final Envelope extent = new Envelope();
    private long count;

    FeatureTable(GeoPackageWriter owner, Connection connection, TableDefinition definition) throws SQLException {
        this.owner = owner;
        this.definition = definition;
        StringBuilder create = new StringBuilder("CREATE TABLE \"" + definition.name()
                + "\" (\"fid\" INTEGER PRIMARY KEY AUTOINCREMENT NOT NULL");
        StringBuilder insert = new StringBuilder("INSERT INTO \"" + definition.name() + "\" VALUES (?");
        if (definition.hasGeometry()) {
            create.append(", \"geom\" ").append(definition.geometryType());
            insert.append(", ?");
        }
        for (Column column : definition.columns()) {
            create.append(", \"").append(column.name()).append("\" ").append(column.type().name());
            insert.append(", ?");
        }
        owner.execute(create.append(')').toString());
        if (definition.hasGeometry()) {
            owner.execute(SpatialIndex.create(definition.name()));
        }
        row = connection.prepareStatement(insert.append(')').toString());
        box = definition.hasGeometry() ? connection.prepareStatement(SpatialIndex.insert(definition.name())) : null;
    }

    public TableDefinition definition() {
        return definition;
    }

    /** Number of rows so far; the last row has this number as its {@code fid}. */
    public long count() {
        return count;
    }

    /**
     * Adds a row with a geometry.
     *
     * @param geometry of the declared type, in the table's reference system; null for none
     * @param values one a column: text, numbers or booleans; null and NaN for no value
     * @throws org.wintersill.problem.ProblemException when the disk is full or the file cannot be written
     */
    public void add(Geometry geometry, Object... values) {
        if (geometry != null && !definition.geometryType().equals("GEOMETRY")
                && !geometry.getGeometryType().equalsIgnoreCase(definition.geometryType())) {
            throw new IllegalArgumentException(geometry.getGeometryType() + " in a table of " + definition.geometryType());
        }
        if (geometry == null) {
            write(null, null, values);
        } else {
            write(GeometryBlob.of(geometry, definition.srsId()), geometry.getEnvelopeInternal(), values);
        }
    }

    /** Adds a row with lines; see {@link #add}. */
    public void addLines(MergedLines lines, Object... values) {
        add(lines.geometry(), values);
    }

    /** Adds a row with an outline as a multipolygon, none where it is empty; see {@link #add}. */
    public void addOutline(Outline outline, Object... values) {
        add(OutlineGeometry.of(outline), values);
    }

    /** Adds a row with a point; see {@link #add}. */
    public void addPoint(double x, double y, Object... values) {
        if (!definition.geometryType().equals("POINT")) {
            throw new IllegalArgumentException("a point in a table of " + definition.geometryType());
        }
        write(GeometryBlob.point(x, y, definition.srsId()), new Envelope(x, x, y, y), values);
    }

    /** Adds a row to a table without geometry; see {@link #add}. */
    public void addAttributes(Object... values) {
        if (definition.hasGeometry()) {
            throw new IllegalArgumentException(definition.name() + " has a geometry");
        }
        write(null, null, values);
    }

    private void write(byte[] blob, Envelope bounds, Object[] values) {
        List<Column> columns = definition.columns();
        if (values.length != columns.size()) {
            throw new IllegalArgumentException(values.length + " values for " + columns.size() + " columns");
        }
        owner.requireOpen();
        try {
            int position = 1;
            row.setLong(position++, ++count);
            if (definition.hasGeometry()) {
                row.setBytes(position++, blob);
            }
            for (Object value : values) {
                bind(position++, value);
            }
            row.executeUpdate();
            if (bounds != null && !bounds.isNull()) {
                extent.expandToInclude(bounds);
                box.setLong(1, count);
                box.setDouble(2, bounds.getMinX());
                box.setDouble(3, bounds.getMaxX());
                box.setDouble(4, bounds.getMinY());
                box.setDouble(5, bounds.getMaxY());
                box.executeUpdate();
            }
        } catch (SQLException e) {
            throw owner.problem(e);
        }
    }

    private void bind(int position, Object value) throws SQLException {
        if (value == null) {
            row.setObject(position, null);
        } else if (value instanceof String text) {
            row.setString(position, text);
        } else if (value instanceof Float number) {
            bindNumber(position, number.isNaN() || number.isInfinite() ? Double.NaN : readable(number));
        } else if (value instanceof Double number) {
            bindNumber(position, number);
        } else if (value instanceof Boolean flag) {
            row.setInt(position, flag ? 1 : 0);
        } else if (value instanceof Number number) {
            row.setLong(position, number.longValue());
        } else {
            throw new IllegalArgumentException("a column cannot hold a " + value.getClass().getSimpleName());
        }
    }

    private void bindNumber(int position, double value) throws SQLException {
        if (Double.isFinite(value)) {
            row.setDouble(position, value);
        } else {
            row.setObject(position, null);
        }
    }

    /** The decimal that a float stands for: tables show 0.3, not 0.30000001192. */
    private static double readable(float value) {
        return value == Math.rint(value) ? value : Double.parseDouble(Float.toString(value));
    }

    /** Ends the statements and stores what only the full table knows. */
    void complete(PreparedStatement extents) throws SQLException {
        row.close();
        if (box == null) {
            return;
        }
        box.close();
        if (!extent.isNull()) {
            extents.setDouble(1, extent.getMinX());
            extents.setDouble(2, extent.getMinY());
            extents.setDouble(3, extent.getMaxX());
            extents.setDouble(4, extent.getMaxY());
            extents.setString(5, definition.name());
            extents.executeUpdate();
        }
    }
}
