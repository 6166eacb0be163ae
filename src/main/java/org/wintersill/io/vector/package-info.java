/**
 * <b>Purpose.</b> Reads polygons from GeoPackage, GeoJSON and Shapefile, row by row, and repairs their rings.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code parcel}, {@code problem}; {@code io.crs} for the names of reference systems; the
 * SQLite driver, Jackson and JTS.
 *
 * <p><b>Conventions.</b> x is easting or longitude and comes first, whatever the reference system says. Z and M are left out. Files
 * are never changed and nothing that they refer to is opened; every length is held against the size of the file before room is made.
 * Start reading in {@link org.wintersill.io.vector.PolygonFiles}.
 */
package org.wintersill.io.vector;
