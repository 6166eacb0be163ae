package org.wintersill.config;

import java.nio.file.Path;
import org.wintersill.parcel.PolygonRequest;

/**
 * A file of polygons, and what the run file says about it.
 *
 * @param file the file
 * @param request layer, columns and reference system, as far as they are given
 */
public record PolygonEntry(Path file, PolygonRequest request) {
}
