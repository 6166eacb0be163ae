package org.wintersill.config;

import java.util.Optional;
import org.wintersill.grid.Envelope;

/**
 * The part of the target grid to work on: cells whose centres lie in the box and in a polygon, where these are given.
 *
 * @param box in the target's reference system
 * @param polygons a file of polygons in any reference system
 */
public record AreaConfig(Optional<Envelope> box, Optional<PolygonEntry> polygons) {
}
