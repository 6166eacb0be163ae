/**
 * <b>Purpose.</b> Polygons as values, the part of each grid cell that they cover, and what the values of a map amount to inside
 * them.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code problem}.
 *
 * <p><b>Conventions.</b> Rings are {@code x0, y0, x1, y1, ...}, closed, x first; shells run counter-clockwise, holes clockwise.
 * On a grid, positions are columns from the western and rows from the northern edge. Areas of cells with longitude and latitude are
 * those on the ellipsoid. NaN is no value. Start reading in {@link org.wintersill.parcel.OutlinePlacement}.
 */
package org.wintersill.parcel;
