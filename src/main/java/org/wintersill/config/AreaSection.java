package org.wintersill.config;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.grid.Envelope;
import org.wintersill.io.yaml.YamlSection;

/** Reads {@code area}. */
final class AreaSection {
    /** Beyond any coordinate in any unit of length. */
    private static final double FARTHEST = 1e9;

    private AreaSection() {
    }

    /** The area, as far as it is given and right. */
    static Optional<AreaConfig> read(YamlSection section, InputFinder finder, Map<String, Object> tree) {
        Optional<Envelope> box = section.value("bbox").flatMap(value -> section.checks().numbers(value, section.path("bbox"), 4, -FARTHEST,
                FARTHEST, "coordinates in the reference system of the target grid")).flatMap(list -> box(list, section, tree));
        Map<String, Object> polygonTree = new LinkedHashMap<>();
        Optional<PolygonEntry> polygons = section.value("polygons")
                .flatMap(value -> finder.polygons(value, section.path("polygons"), polygonTree));
        polygons.ifPresent(entry -> tree.put("polygons", InputFinder.shortest(polygonTree, "file")));
        if (section.value("bbox").isEmpty() && section.value("polygons").isEmpty()) {
            section.checks().problem(section.place(), "area", "an area needs a box or polygons", "Give bbox: [west, south, east, north] in the "
                    + "reference system of the target grid, or polygons: and a file; or leave area out");
        }
        section.finish();
        return box.isEmpty() && polygons.isEmpty() ? Optional.empty() : Optional.of(new AreaConfig(box, polygons));
    }

    private static Optional<Envelope> box(List<Double> list, YamlSection section, Map<String, Object> tree) {
        tree.put("bbox", list);
        if (list.get(0) < list.get(2) && list.get(1) < list.get(3)) {
            return Optional.of(new Envelope(list.get(0), list.get(1), list.get(2), list.get(3)));
        }
        section.problem("bbox", list + " is no box: west must be less than east and south less than north",
                "Give them in the order west, south, east, north");
        return Optional.empty();
    }
}
