package org.wintersill.io.netcdf.write;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.grid.Crs;
import org.wintersill.grid.Envelope;
import org.wintersill.grid.GridGeometry;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.time.Season;

/**
 * Everything that is known of a file of winter layers before the first value.
 *
 * @param grid the cells
 * @param globe the area in degrees of longitude and latitude, for catalogues
 * @param winters the winters in order, all of one calendar
 * @param layers the layers, each a variable named by {@link LayerDefinition#column}
 * @param gridMapping attributes of the grid mapping: {@code grid_mapping_name}, its parameters and {@code crs_wkt}; values
 *                    are texts, numbers or {@code double[]}. For a rotated pole {@code crs_wkt} is that of the derived
 *                    system (WKT 2), or is left out
 * @param attributes global attributes by name: those in {@link #REQUIRED}, and any more. {@code Conventions}, the area and
 *                   the period are written by the writer. {@code date_created} is a fixed date, never the clock
 */
public record WinterFile(GridGeometry grid, Envelope globe, List<Season> winters, List<LayerDefinition> layers,
                         Map<String, Object> gridMapping, Map<String, String> attributes) {

    /** Global attributes that catalogues ask for (ACDD 1.3, highly recommended and recommended). */
    public static final List<String> REQUIRED = List.of("title", "summary", "keywords", "id", "naming_authority", "history",
            "source", "institution", "license", "creator_name", "date_created");

    public WinterFile {
        winters = List.copyOf(winters);
        layers = List.copyOf(layers);
        gridMapping = Collections.unmodifiableMap(new LinkedHashMap<>(gridMapping));
        attributes = Collections.unmodifiableMap(new LinkedHashMap<>(attributes));
        if (winters.isEmpty() || layers.isEmpty()) {
            throw new IllegalArgumentException("a file needs winters and layers");
        }
        for (int i = 1; i < winters.size(); i++) {
            if (winters.get(i).calendar() != winters.get(0).calendar()
                    || winters.get(i).firstDay() <= winters.get(i - 1).firstDay()) {
                throw new IllegalArgumentException("winters must ascend in one calendar: " + winters.get(i).label());
            }
        }
        if (layers.stream().map(LayerDefinition::id).distinct().count() != layers.size()) {
            throw new IllegalArgumentException("two layers have one name");
        }
        if (!gridMapping.containsKey("grid_mapping_name")) {
            throw new IllegalArgumentException("the grid mapping has no grid_mapping_name");
        }
        if (grid.crs().kind() == Crs.Kind.ROTATED_POLE && gridMapping.get("crs_wkt") instanceof String wkt
                && !wkt.contains("BASEGEO")) {
            // GDAL believes crs_wkt more than the parameters, and would put the map beside Africa.
            throw new IllegalArgumentException("crs_wkt must be that of the rotated system, or be left out");
        }
        for (String name : REQUIRED) {
            if (attributes.getOrDefault(name, "").isBlank()) {
                throw new IllegalArgumentException("global attribute " + name + " is missing");
            }
        }
    }
}
