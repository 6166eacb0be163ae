package org.wintersill.io.crs;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

class CellAreasTest {
    private static final GeoToolsCrs SYSTEMS = new GeoToolsCrs();

    private static double cell(Crs crs, double north) {
        return CellAreas.rowAreasKm2(new GridGeometry(3, 1, 0, north, 0.5, 0.5, crs))[0];
    }

    /** GeographicLib's PolygonArea (pyproj 3.4.1 Geod WGS 84) of half-degree cells whose parallels were cut into 20000 pieces. */
    @Test
    void geographicCellsHaveTheAreaOnTheEllipsoid() {
        Crs wgs84 = SYSTEMS.wgs84();
        assertEquals(3077.2300079131583, cell(wgs84, 0.5), 1e-4);
        assertEquals(2181.1388632811436, cell(wgs84, 45.5), 1e-4);
        assertEquals(13.608615242984134, cell(wgs84, 90), 1e-4);
        assertEquals(1542.5138983606055, cell(wgs84, -60), 1e-4);
    }

    /** R^2 dlon (sin lat2 - sin lat1). */
    @Test
    void onASphereTheFormulaIsTheSphericalOne() {
        Crs sphere = SYSTEMS.fromGridMapping(Map.of("grid_mapping_name", "latitude_longitude", "earth_radius", 6371008.8), 1);
        double expected = 6371.0088 * 6371.0088 * Math.toRadians(0.5) * (Math.sin(Math.toRadians(45.5)) - Math.sin(Math.toRadians(45)));
        assertEquals(expected, cell(sphere, 45.5), 1e-9);
        Crs rotated = SYSTEMS.fromGridMapping(Map.of("grid_mapping_name", "rotated_latitude_longitude", "grid_north_pole_latitude", 39.25,
                "grid_north_pole_longitude", -162.0), 1);
        assertEquals(expected, cell(rotated, 45.5), 1e-9);
    }

    @Test
    void allRowsOfTheGlobeMakeTheSurfaceOfTheEllipsoid() {
        double[] rows = CellAreas.rowAreasKm2(new GridGeometry(360, 180, -180, 90, 1, 1, SYSTEMS.wgs84()));
        // Surface of the WGS 84 ellipsoid, 510065621.724 km2: NIMA TR8350.2 gives the authalic radius 6371007.1809 m.
        assertEquals(4 * Math.PI * 6371.0071809 * 6371.0071809, 360 * Arrays.stream(rows).sum(), 10);
    }

    @Test
    void projectedCellsCountInTheirUnit() {
        assertArrayEquals(new double[] {0.25, 0.25}, CellAreas.rowAreasKm2(new GridGeometry(1, 2, 0, 0, 500, 500, SYSTEMS.fromCode("EPSG:3035"))), 1e-12);
        Crs feet = SYSTEMS.fromCode("EPSG:2263");
        assertEquals(1e-6 * 1000 * 1000 * Math.pow(1200.0 / 3937, 2), CellAreas.rowAreasKm2(new GridGeometry(1, 1, 0, 0, 1000, 1000, feet))[0], 1e-9);
    }
}
