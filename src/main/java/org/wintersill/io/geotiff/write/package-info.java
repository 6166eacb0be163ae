/**
 * <b>Purpose.</b> Writes layers as Cloud Optimized GeoTIFF, in one pass and in bounded memory.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code layer}, {@code problem}; no library. The keys of a reference system come
 * in as a function, so that this room knows no projections.
 *
 * <p><b>Conventions.</b> Little-endian, tiles of 256 cells a side, Deflate, one plane a band. NaN comes in, the
 * {@link org.wintersill.layer.SampleType}'s missing value goes out; an infinite value counts as missing. Bytes depend on
 * the values and the header alone, never on threads, clock, locale or time zone. A file is made in this order:
 * tiles are compressed as their rows arrive and wait in a hidden file beside the target
 * ({@link org.wintersill.io.geotiff.write.TileSpool}); {@code finish()} makes the overviews from those tiles, level by
 * level, and puts the whole together ({@link org.wintersill.io.geotiff.write.CogAssembly}). Start reading at
 * {@link org.wintersill.io.geotiff.write.CogWriter}.
 *
 * <p>Sources: TIFF Revision 6.0 (Adobe, 1992); TIFF Technical Note 3 (floating point predictor, Adobe, 2005); BigTIFF
 * design (libtiff); OGC 19-008r4 GeoTIFF 1.1; OGC 21-026 Cloud Optimized GeoTIFF 1.0; the documentation of GDAL's GTiff
 * and COG drivers for tags 42112 and 42113 and for the block of structural metadata.
 */
package org.wintersill.io.geotiff.write;
