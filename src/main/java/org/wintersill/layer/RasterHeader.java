package org.wintersill.layer;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.grid.GridGeometry;

/**
 * Everything a raster writer must know before the first value.
 *
 * @param grid the cells
 * @param layer the field
 * @param bands one description a band, naming quantity and season: {@code 2003-04} for winter layers
 * @param metadata further name and value pairs, in order: cultivar, status, period, version; names are
 *                 letters, digits and underscores, values are any text
 * @param dateTime {@code YYYY:MM:DD HH:MM:SS}, the end of the period covered; never the clock
 * @param software program and version
 */
public record RasterHeader(GridGeometry grid, LayerDefinition layer, List<Band> bands,
                           Map<String, String> metadata, String dateTime, String software) {

    /**
     * One band of a file.
     *
     * @param description what it shows
     * @param unit its unit; usually the layer's
     */
    public record Band(String description, String unit) {
    }

    public RasterHeader {
        bands = List.copyOf(bands);
        metadata = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(metadata));
    }
}
