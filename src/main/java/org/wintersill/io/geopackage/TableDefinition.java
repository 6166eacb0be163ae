package org.wintersill.io.geopackage;

import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * A table of features or, without geometry, of attributes.
 *
 * @param name table name: lower-case letters, digits and underscores, at most 30
 * @param identifier title; differs from those of all other tables of the file
 * @param description abstract
 * @param geometryType {@code POINT}, {@code POLYGON}, {@code MULTIPOLYGON} ...; null for a table of attributes
 * @param srsId reference system of the geometries, a row given by {@link GeoPackageWriter#addCrs}
 * @param columns the columns after {@code fid} and {@code geom}
 */
public record TableDefinition(String name, String identifier, String description, String geometryType, int srsId,
                              List<Column> columns) {

    private static final Set<String> GEOMETRY_TYPES = Set.of("POINT", "LINESTRING", "POLYGON", "MULTIPOINT",
            "MULTILINESTRING", "MULTIPOLYGON", "GEOMETRY");

    public TableDefinition {
        requireName(name);
        columns = List.copyOf(columns);
        if (geometryType != null && !GEOMETRY_TYPES.contains(geometryType)) {
            throw new IllegalArgumentException("not a geometry type: " + geometryType);
        }
        Set<String> seen = new HashSet<>(Set.of("fid", "geom"));
        for (Column column : columns) {
            if (!seen.add(column.name())) {
                throw new IllegalArgumentException("column " + column.name() + " of " + name + " stands twice");
            }
        }
    }

    /** A table without geometry. */
    public static TableDefinition attributes(String name, String identifier, String description, List<Column> columns) {
        return new TableDefinition(name, identifier, description, null, 0, columns);
    }

    public boolean hasGeometry() {
        return geometryType != null;
    }

    /** Names are ours, never the user's: anything else is a mistake in the program. */
    static void requireName(String name) {
        if (!name.matches("[a-z][a-z0-9_]{0,29}")) {
            throw new IllegalArgumentException("not a table, column or constraint name: " + name);
        }
    }
}
