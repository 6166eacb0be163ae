/**
 * <b>Purpose.</b> Writes winter layers as CF NetCDF: one file a cultivar, all layers and winters of it, value by value as
 * they come.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code layer}, {@code problem}; the NetCDF library.
 *
 * <p><b>Conventions.</b> CF 1.8 and ACDD 1.3 in the classic format with 64-bit offsets, which every NetCDF program reads.
 * Dimensions are (time, y, x), rows from north to south. Coordinates are cell centres. NaN becomes the missing value of
 * the layer's type. The clock is never read. Start reading at
 * {@link org.wintersill.io.netcdf.write.CfWinterWriter}.
 */
package org.wintersill.io.netcdf.write;
