package org.wintersill.io.crs;

import static org.wintersill.io.crs.ProjectionParameter.EASTING;
import static org.wintersill.io.crs.ProjectionParameter.LATITUDE;
import static org.wintersill.io.crs.ProjectionParameter.LONGITUDE;
import static org.wintersill.io.crs.ProjectionParameter.NORTHING;
import static org.wintersill.io.crs.ProjectionParameter.SCALE;

import java.util.Map;
import java.util.Optional;

/**
 * Widespread systems by EPSG code without the EPSG database, whose first look-up takes longer than many a run.
 * Numbers from the EPSG dataset v11.
 */
final class KnownSystems {
    private KnownSystems() {
    }

    static Optional<SystemDefinition> of(int code) {
        return switch (code) {
            case 4326 -> Optional.of(SystemDefinition.geographic(GeographicSystem.WGS84));
            case 4258 -> Optional.of(SystemDefinition.geographic(GeographicSystem.ETRS89));
            case 4269 -> Optional.of(SystemDefinition.geographic(GeographicSystem.NAD83));
            case 3857 -> Optional.of(SystemDefinition.projected("WGS 84 / Pseudo-Mercator", 3857, GeographicSystem.WGS84,
                    ProjectionMethod.PSEUDO_MERCATOR, Map.of(), 1));
            case 3035 -> Optional.of(SystemDefinition.projected("ETRS89-extended / LAEA Europe", 3035, GeographicSystem.ETRS89,
                    ProjectionMethod.LAMBERT_EQUAL_AREA,
                    Map.of(LATITUDE, 52.0, LONGITUDE, 10.0, EASTING, 4321000.0, NORTHING, 3210000.0), 1));
            default -> utm(code);
        };
    }

    private static Optional<SystemDefinition> utm(int code) {
        int zone = code % 100;
        return switch (code / 100) {
            case 326 -> zone >= 1 && zone <= 60 ? zone("WGS 84", code, GeographicSystem.WGS84, zone, true) : Optional.empty();
            case 327 -> zone >= 1 && zone <= 60 ? zone("WGS 84", code, GeographicSystem.WGS84, zone, false) : Optional.empty();
            case 258 -> zone >= 28 && zone <= 38 ? zone("ETRS89", code, GeographicSystem.ETRS89, zone, true) : Optional.empty();
            case 269 -> zone >= 1 && zone <= 23 ? zone("NAD83", code, GeographicSystem.NAD83, zone, true) : Optional.empty();
            default -> Optional.empty();
        };
    }

    private static Optional<SystemDefinition> zone(String name, int code, GeographicSystem base, int zone, boolean north) {
        return Optional.of(SystemDefinition.projected(name + " / UTM zone " + zone + (north ? "N" : "S"), code, base,
                ProjectionMethod.TRANSVERSE_MERCATOR, utmParameters(zone, north), 1));
    }

    /** Universal Transverse Mercator: central meridian 6 zone - 183 degrees, scale 0.9996, false origin 500 km, 0 or 10000 km. */
    static Map<ProjectionParameter, Double> utmParameters(int zone, boolean north) {
        return Map.of(LATITUDE, 0.0, LONGITUDE, 6.0 * zone - 183, SCALE, 0.9996, EASTING, 500000.0, NORTHING, north ? 0.0 : 1e7);
    }
}
