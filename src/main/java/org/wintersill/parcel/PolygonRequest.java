package org.wintersill.parcel;

import java.util.Optional;

/**
 * What a file of polygons may not say itself.
 *
 * @param layer the layer to read; needed where a file has several
 * @param id column that identifies a row
 * @param name column with a name for people
 * @param crs code of the reference system
 */
public record PolygonRequest(Optional<String> layer, Optional<String> id, Optional<String> name, Optional<String> crs) {
    /** Nothing beyond what the file says. */
    public static final PolygonRequest PLAIN = new PolygonRequest(Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
}
