/**
 * <b>Purpose.</b> Reads daily temperatures and ground heights from netCDF files that follow the CF conventions, more or
 * less: classic, 64-bit offset, 64-bit data (CDF-5) and netCDF-4/HDF5.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code temperature}, {@code elevation}, {@code problem}; jHDF,
 * which nobody else sees.
 *
 * <p><b>Conventions.</b> A header ({@link org.wintersill.io.netcdf.CdfHeader}) is read first and kept; values are read
 * later, piece by piece, in the file's own order and type, and become north-up degrees Celsius with NaN for missing in
 * one place each: {@link org.wintersill.io.netcdf.Unpacker} for values, {@link org.wintersill.io.netcdf.GridPlacement}
 * for places. "Record" is an index along the file's time dimension, "position" one on the sorted day axis. Words of the
 * formats: a classic variable and an HDF5 contiguous dataset are {@link org.wintersill.io.netcdf.Storage.Contiguous}, an
 * HDF5 chunked dataset is {@link org.wintersill.io.netcdf.Storage.Chunked}. Sources: netCDF classic format
 * specification, HDF5 file format specification 3.0, CF conventions 1.8. Start at
 * {@link org.wintersill.io.netcdf.NetcdfTemperatureFormat}.
 */
package org.wintersill.io.netcdf;
