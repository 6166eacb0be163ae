package org.wintersill.io.crs;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.wintersill.grid.Crs;

/** The texts and attributes by which output files name their coordinate reference system. Stateless and thread-safe. */
public final class CrsDefinitions {
    private CrsDefinitions() {
    }

    /** WKT 1 in GDAL's flavour, for {@code definition} of a GeoPackage and for {@code .prj} files. */
    public static String wkt1(Crs crs) {
        return crs.wkt();
    }

    /** WKT 2:2019, for {@code definition_12_063} of a GeoPackage and {@code crs_wkt} of a NetCDF file. */
    public static String wkt2(Crs crs) {
        return Wkt2Writer.write(SystemDefinition.of(crs));
    }

    /** Whether two systems give the same place the same coordinates, whatever their names; costs no look-up. */
    public static boolean sameSystem(Crs a, Crs b) {
        return a.sameAs(b) || SystemDefinition.of(a).samePlaces(SystemDefinition.of(b));
    }

    /** The number of an EPSG code; empty for a system without one. */
    public static OptionalInt epsg(Crs crs) {
        return crs.code().matches("EPSG:[0-9]{1,9}") ? OptionalInt.of(Integer.parseInt(crs.code().substring(5)))
                : OptionalInt.empty();
    }

    /**
     * Attributes of the CF grid-mapping variable, in a fixed order: {@code String}, {@code Double} or {@code double[]}.
     * For a projection that CF has no name for, the map holds {@code crs_wkt} alone.
     */
    public static Map<String, Object> gridMapping(Crs crs) {
        SystemDefinition system = SystemDefinition.of(crs);
        Optional<Map<String, Object>> known = CfGridMapping.write(system);
        Map<String, Object> out = new LinkedHashMap<>(known.orElse(Map.of()));
        out.put("crs_wkt", Wkt2Writer.write(system));
        return out;
    }
}
