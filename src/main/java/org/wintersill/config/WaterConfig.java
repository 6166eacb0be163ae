package org.wintersill.config;

import java.nio.file.Path;
import java.util.Optional;
import org.wintersill.elevation.TargetTerms;

/**
 * Warming near open water.
 *
 * @param raster 1 on water, 0 or nothing on land; empty where polygons are given instead
 * @param polygons outlines of the water
 * @param warming at the shore, K
 * @param reach distance at which 1/e of it is left, m
 * @param frozen when it warms nothing
 */
public record WaterConfig(Optional<FileEntry> raster, Optional<PolygonEntry> polygons, double warming, double reach,
                          TargetTerms.FrozenPeriod frozen) {

    /** The file of the mask. */
    public Path file() {
        return raster.map(FileEntry::file).or(() -> polygons.map(PolygonEntry::file)).orElseThrow();
    }
}
