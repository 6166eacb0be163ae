package org.wintersill.io.geopackage;

import java.util.List;

/** The statements that make the tables of the standard (OGC 12-128r17, annex C and the extensions of annex F). */
final class StandardTables {

    private static final String EXTENSION = "http://www.geopackage.org/spec130/#extension_";
    private static final String NOW = "DEFAULT (strftime('%Y-%m-%dT%H:%M:%fZ','now'))";

    static final String CRS_WKT = EXTENSION + "crs_wkt";
    static final String RTREE = EXTENSION + "rtree";
    static final String SCHEMA = EXTENSION + "schema";
    static final String METADATA = EXTENSION + "metadata";

    /** Tables that every file has, in the order of their references. */
    static final List<String> CORE = List.of(
            "CREATE TABLE gpkg_spatial_ref_sys (srs_name TEXT NOT NULL, srs_id INTEGER NOT NULL PRIMARY KEY, "
                    + "organization TEXT NOT NULL, organization_coordsys_id INTEGER NOT NULL, definition TEXT NOT NULL, "
                    + "description TEXT, definition_12_063 TEXT NOT NULL)",
            "CREATE TABLE gpkg_contents (table_name TEXT NOT NULL PRIMARY KEY, data_type TEXT NOT NULL, "
                    + "identifier TEXT UNIQUE, description TEXT DEFAULT '', last_change DATETIME NOT NULL " + NOW + ", "
                    + "min_x DOUBLE, min_y DOUBLE, max_x DOUBLE, max_y DOUBLE, srs_id INTEGER, "
                    + "CONSTRAINT fk_gc_r_srs_id FOREIGN KEY (srs_id) REFERENCES gpkg_spatial_ref_sys(srs_id))",
            "CREATE TABLE gpkg_geometry_columns (table_name TEXT NOT NULL, column_name TEXT NOT NULL, "
                    + "geometry_type_name TEXT NOT NULL, srs_id INTEGER NOT NULL, z TINYINT NOT NULL, m TINYINT NOT NULL, "
                    + "CONSTRAINT pk_geom_cols PRIMARY KEY (table_name, column_name), "
                    + "CONSTRAINT uk_gc_table_name UNIQUE (table_name), "
                    + "CONSTRAINT fk_gc_tn FOREIGN KEY (table_name) REFERENCES gpkg_contents(table_name), "
                    + "CONSTRAINT fk_gc_srs FOREIGN KEY (srs_id) REFERENCES gpkg_spatial_ref_sys (srs_id))",
            "CREATE TABLE gpkg_extensions (table_name TEXT, column_name TEXT, extension_name TEXT NOT NULL, "
                    + "definition TEXT NOT NULL, scope TEXT NOT NULL, "
                    + "CONSTRAINT ge_tce UNIQUE (table_name, column_name, extension_name))",
            "CREATE TABLE gpkg_data_columns (table_name TEXT NOT NULL, column_name TEXT NOT NULL, name TEXT, title TEXT, "
                    + "description TEXT, mime_type TEXT, constraint_name TEXT, "
                    + "CONSTRAINT pk_gdc PRIMARY KEY (table_name, column_name), "
                    + "CONSTRAINT gdc_tn UNIQUE (table_name, name))",
            "CREATE TABLE gpkg_data_column_constraints (constraint_name TEXT NOT NULL, constraint_type TEXT NOT NULL, "
                    + "value TEXT, min NUMERIC, min_is_inclusive BOOLEAN, max NUMERIC, max_is_inclusive BOOLEAN, "
                    + "description TEXT, CONSTRAINT gdcc_ntv UNIQUE (constraint_name, constraint_type, value))");

    static final List<String> PROVENANCE = List.of(
            "CREATE TABLE gpkg_metadata (id INTEGER CONSTRAINT m_pk PRIMARY KEY ASC NOT NULL, "
                    + "md_scope TEXT NOT NULL DEFAULT 'dataset', md_standard_uri TEXT NOT NULL, "
                    + "mime_type TEXT NOT NULL DEFAULT 'text/xml', metadata TEXT NOT NULL DEFAULT '')",
            "CREATE TABLE gpkg_metadata_reference (reference_scope TEXT NOT NULL, table_name TEXT, column_name TEXT, "
                    + "row_id_value INTEGER, timestamp DATETIME NOT NULL " + NOW + ", md_file_id INTEGER NOT NULL, "
                    + "md_parent_id INTEGER, "
                    + "CONSTRAINT crmr_mfi_fk FOREIGN KEY (md_file_id) REFERENCES gpkg_metadata(id), "
                    + "CONSTRAINT crmr_mpi_fk FOREIGN KEY (md_parent_id) REFERENCES gpkg_metadata(id))");

    /** Not of the standard: where QGIS and GeoServer look for styles. */
    static final String STYLES = "CREATE TABLE layer_styles (id INTEGER PRIMARY KEY AUTOINCREMENT NOT NULL, "
            + "f_table_catalog TEXT(256), f_table_schema TEXT(256), f_table_name TEXT(256), f_geometry_column TEXT(256), "
            + "styleName TEXT(30), styleQML TEXT, styleSLD TEXT, useAsDefault BOOLEAN, description TEXT, owner TEXT(30), "
            + "ui TEXT(30), update_time DATETIME " + NOW + ")";

    private StandardTables() {
    }
}
