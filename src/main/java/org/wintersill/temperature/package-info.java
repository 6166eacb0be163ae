/**
 * <b>Purpose.</b> Daily temperature grids as the science sees them, and the port that readers implement.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code problem}.
 *
 * <p><b>Conventions.</b> Degrees Celsius in float arrays, NaN where there is no value, rows from the north, columns
 * from the west. Whatever a file does differently (packing, fill values, units, south-up rows, 0..360 longitudes)
 * is undone by its reader and known to nobody else.
 */
package org.wintersill.temperature;
