/**
 * <b>Purpose.</b> Writes GeoPackage files: tables with their titles, units and legal values, spatial indexes, styles and
 * provenance; and turns rasters of classes into polygons for them.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code layer}, {@code parcel}, {@code problem}; the SQLite driver and JTS.
 *
 * <p><b>Conventions.</b> Version 1.3 of the standard (OGC 12-128r17). x is easting or longitude and comes first, whatever
 * the reference system says. NaN and null become NULL. Nothing in a file comes from the clock, so the same calls give the
 * same bytes. Table and column names are chosen by the program; names from outside travel as bound values only. Start
 * reading at {@link org.wintersill.io.geopackage.GeoPackageWriter}, for polygons at
 * {@link org.wintersill.io.geopackage.ClassPolygons}.
 */
package org.wintersill.io.geopackage;
