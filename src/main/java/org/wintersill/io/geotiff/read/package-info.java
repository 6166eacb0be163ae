/**
 * <b>Purpose.</b> Daily temperatures and ground heights read from GeoTIFF files.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code temperature}, {@code elevation}, {@code problem},
 * {@code io.crs}; the Zstandard decoder that comes with GeoTools.
 *
 * <p><b>Conventions.</b> The header is read first and values later, one strip or tile at a time. Nothing that a file says of
 * its own size is believed before it was held against the size of the file. No-data values are compared in the file's
 * own type before any scale is applied. Strips and tiles are both called chunks. Start reading at
 * {@link org.wintersill.io.geotiff.read.GeotiffHeader}. Format: TIFF 6.0, its technical notes 1 to 3, BigTIFF,
 * OGC GeoTIFF 1.1, and the tags 42112 and 42113 of GDAL.
 */
package org.wintersill.io.geotiff.read;
