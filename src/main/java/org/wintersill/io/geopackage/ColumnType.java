package org.wintersill.io.geopackage;

/** Column types of the standard (table 1 of OGC 12-128r17) that the program uses. */
public enum ColumnType {
    BOOLEAN, SMALLINT, MEDIUMINT, INTEGER, DOUBLE, TEXT, DATE, DATETIME
}
