package org.wintersill.config;

import java.nio.file.Path;
import java.util.List;

/**
 * What is written.
 *
 * @param folder where to
 * @param layers ids of the layers; empty for the default ones
 * @param winters whether the layers of each winter are written
 * @param netcdf whether layers are also written as CF netCDF
 * @param geopackage whether {@code layers.gpkg} is written
 * @param parts whether each separate part of a class is a polygon of its own
 * @param cells whether the GeoPackage gets the cells as points
 * @param keepWinters whether the winters stay in the folder, so that statistics can be made anew without the daily temperatures
 */
public record OutputConfig(Path folder, List<String> layers, boolean winters, boolean netcdf, boolean geopackage,
                           boolean parts, boolean cells, boolean keepWinters) {
    public OutputConfig {
        layers = List.copyOf(layers);
    }
}
