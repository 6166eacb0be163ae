package org.wintersill.io.geopackage;

import java.sql.SQLException;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;

/** Fills the tables of the schema extension: titles, units and legal values of columns (OGC 12-128r17, annex F.9). */
final class ColumnDescriptions {

    private static final String CONSTRAINT = "INSERT INTO gpkg_data_column_constraints VALUES (?, ?, ?, ?, ?, ?, ?, ?)";

    private final GeoPackageWriter writer;
    private final Map<String, Constraint> constraints = new LinkedHashMap<>();

    ColumnDescriptions(GeoPackageWriter writer) {
        this.writer = writer;
    }

    void describe(TableDefinition table) throws SQLException {
        Set<String> names = new HashSet<>();
        for (Column column : table.columns()) {
            // Some programs show "name" as heading, some "title"; the former must differ from column to column.
            String name = names.add(column.heading()) ? column.heading() : column.name();
            Constraint constraint = column.constraint();
            writer.insert("INSERT INTO gpkg_data_columns VALUES (?, ?, ?, ?, ?, NULL, ?)", table.name(), column.name(), name,
                    column.heading(), column.fullDescription(), constraint == null ? null : constraint.name());
            if (constraint != null) {
                define(constraint);
            }
        }
    }

    private void define(Constraint constraint) throws SQLException {
        Constraint present = constraints.putIfAbsent(constraint.name(), constraint);
        if (present != null) {
            if (!present.equals(constraint)) {
                throw new IllegalArgumentException("two constraints are called " + constraint.name());
            }
        } else if (constraint instanceof Constraint.Range range) {
            writer.insert(CONSTRAINT, range.name(), "range", null, range.min(), 1, range.max(), 1, range.description());
        } else if (constraint instanceof Constraint.Enumeration list) {
            for (Constraint.Value value : list.values()) {
                writer.insert(CONSTRAINT, list.name(), "enum", value.value(), null, null, null, null, value.description());
            }
        }
    }
}
