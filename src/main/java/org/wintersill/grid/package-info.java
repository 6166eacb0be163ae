/**
 * <b>Purpose.</b> Regular grids as values: extent, cell size, cell to coordinate and back, blocks of cells.
 *
 * <p><b>May depend on.</b> The JDK only.
 *
 * <p><b>Conventions.</b> Cells are rows from the north, columns from the west; the cell index is
 * {@code row * columns + column}. x is easting or longitude, y is northing or latitude, always in that order,
 * whatever a coordinate reference system says of its axes. "West", "north" and so on of a grid are the outer
 * edges of its border cells, never their centres. Axis order and codes are known to {@code io.crs} alone.
 */
package org.wintersill.grid;
