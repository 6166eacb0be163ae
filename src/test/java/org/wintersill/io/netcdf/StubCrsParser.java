package org.wintersill.io.netcdf;

import java.util.Map;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;

/** Understands just enough of reference systems for the tests of this room, without the tables of the real one. */
final class StubCrsParser implements CrsParser {

    @Override
    public Crs fromCode(String code) {
        Crs.Kind kind = code.equals("EPSG:4326") ? Crs.Kind.GEOGRAPHIC : Crs.Kind.PROJECTED;
        return new Crs(code, code, "WKT of " + code, kind, 1, null);
    }

    @Override
    public Crs fromWkt(String wkt) {
        return new Crs("", "from WKT", wkt, wkt.startsWith("GEOG") ? Crs.Kind.GEOGRAPHIC : Crs.Kind.PROJECTED, 1, null);
    }

    @Override
    public Crs fromGridMapping(Map<String, Object> attributes, double metresPerAxisUnit) {
        String name = (String) attributes.get("grid_mapping_name");
        return switch (name) {
            case "latitude_longitude" -> fromCode("EPSG:4326");
            case "rotated_latitude_longitude" -> new Crs("", name, "sphere", Crs.Kind.ROTATED_POLE, 1, new Crs.RotatedPole(
                    (Double) attributes.get("grid_north_pole_latitude"), (Double) attributes.get("grid_north_pole_longitude"), 0));
            default -> new Crs("", name, name + ((double[]) attributes.get("standard_parallel"))[1], Crs.Kind.PROJECTED, 1, null);
        };
    }
}
