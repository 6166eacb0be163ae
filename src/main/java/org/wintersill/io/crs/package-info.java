/**
 * <b>Purpose.</b> Coordinate reference systems: read from codes, WKT, CF grid mappings and GeoTIFF keys, written in the
 * same forms, and coordinates changed from one to another.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code problem}; GeoTools referencing.
 *
 * <p><b>Conventions.</b> Every form is read into one {@link org.wintersill.io.crs.SystemDefinition} and written from it.
 * Angles in degrees, lengths in metres inside; x is longitude or easting, always first, whatever an authority says: axis
 * order is known in this room alone. The EPSG database costs more than a second a process, so it is asked only for codes
 * that the room does not know by itself. Start reading at {@link org.wintersill.io.crs.GeoToolsCrs}.
 */
package org.wintersill.io.crs;
