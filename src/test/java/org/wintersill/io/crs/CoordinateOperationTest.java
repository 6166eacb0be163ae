package org.wintersill.io.crs;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.Map;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;

/** Coordinates against PROJ: {@code src/test/resources/crs/points.csv}, made by {@code src/test/python/crs_points.py}. */
class CoordinateOperationTest {
    private static final GeoToolsCrs SYSTEMS = new GeoToolsCrs();

    /**
     * Metres. PROJ and the EPSG dataset of GeoTools choose different seven-parameter sets for the old datums of 28992 and
     * 31287; the oblique Mercator of GeoTools loses half the digits of its central meridian at an azimuth of 90 degrees (2056).
     */
    private static final Map<String, Double> TOLERANCES = Map.of("EPSG:28992", 0.05, "EPSG:31287", 1.0, "EPSG:2056", 0.05);

    static Map<String, Crs> systems() {
        Map<String, Crs> out = new LinkedHashMap<>();
        out.put("lcc2", mapping(1, "grid_mapping_name", "lambert_conformal_conic", "standard_parallel", new double[] {25, 60},
                "latitude_of_projection_origin", 42.5, "longitude_of_central_meridian", -100f, "semi_major_axis", 6378137.0,
                "inverse_flattening", 298.257223563));
        out.put("lcc1-sphere", mapping(1, "grid_mapping_name", "lambert_conformal_conic", "standard_parallel", 48.6,
                "latitude_of_projection_origin", 48.6, "longitude_of_central_meridian", 8, "false_easting", 2937018.5829291,
                "false_northing", 2937031.41074803, "earth_radius", 6371229.0));
        out.put("laea-sphere", mapping(1, "grid_mapping_name", "lambert_azimuthal_equal_area", "latitude_of_projection_origin", 54.9,
                "longitude_of_projection_origin", 357.5, "earth_radius", 6371229));
        out.put("aea", mapping(1, "grid_mapping_name", "albers_conical_equal_area", "standard_parallel", new float[] {29.5f, 45.5f},
                "latitude_of_projection_origin", 23, "longitude_of_central_meridian", -96, "semi_major_axis", 6378137.0,
                "inverse_flattening", 298.257222101));
        out.put("stere-north", mapping(1, "grid_mapping_name", "polar_stereographic", "latitude_of_projection_origin", 90,
                "straight_vertical_longitude_from_pole", 25, "standard_parallel", 60, "earth_radius", 6371229));
        out.put("stere", mapping(1, "grid_mapping_name", "stereographic", "latitude_of_projection_origin", 52,
                "longitude_of_projection_origin", 10, "scale_factor_at_projection_origin", 0.9999));
        out.put("tmerc-wide", mapping(1, "grid_mapping_name", "transverse_mercator", "latitude_of_projection_origin", 0,
                "longitude_of_central_meridian", 9, "scale_factor_at_central_meridian", 0.9996, "false_easting", 500000));
        out.put("merc", mapping(1, "grid_mapping_name", "mercator", "longitude_of_projection_origin", 110, "standard_parallel", 20));
        out.put("rotated", mapping(1, "grid_mapping_name", "rotated_latitude_longitude", "grid_north_pole_latitude", 39.25,
                "grid_north_pole_longitude", -162));
        // PROJ: o_lon_p is north_pole_grid_longitude, lon_0 is grid_north_pole_longitude + 180.
        out.put("rotated-turned", mapping(1, "grid_mapping_name", "rotated_latitude_longitude", "grid_north_pole_latitude", 40,
                "grid_north_pole_longitude", -170, "north_pole_grid_longitude", 35));
        return out;
    }

    static Crs mapping(double metresPerUnit, Object... attributes) {
        Map<String, Object> map = new LinkedHashMap<>();
        for (int i = 0; i < attributes.length; i += 2) {
            map.put((String) attributes[i], attributes[i + 1]);
        }
        return SYSTEMS.fromGridMapping(map, metresPerUnit);
    }

    @TestFactory
    java.util.List<DynamicTest> coordinatesAreThoseOfProjBothWays() throws IOException {
        Map<String, Crs> named = systems();
        try (InputStream in = getClass().getResourceAsStream("/crs/points.csv")) {
            return new String(in.readAllBytes(), StandardCharsets.US_ASCII).lines().filter(l -> !l.startsWith("#")).skip(1)
                    .map(line -> DynamicTest.dynamicTest(line, () -> check(line.split(","), named))).toList();
        }
    }

    private static void check(String[] row, Map<String, Crs> named) {
        Crs crs = row[0].startsWith("EPSG") ? SYSTEMS.fromCode(row[0]) : named.get(row[0]);
        double lon = Double.parseDouble(row[1]);
        double lat = Double.parseDouble(row[2]);
        double x = Double.parseDouble(row[3]);
        double y = Double.parseDouble(row[4]);
        double tolerance = crs.angular() ? 2e-6 : TOLERANCES.getOrDefault(row[0], 0.002);
        Crs wgs84 = SYSTEMS.wgs84();
        double[] xy = {lon, lat};
        SYSTEMS.between(wgs84, crs).transform(xy, 1);
        assertEquals(x, xy[0], tolerance, "x");
        assertEquals(y, xy[1], tolerance, "y");
        SYSTEMS.between(crs, wgs84).transform(xy, 1);
        // Heights are dropped between datums, which costs up to some millimetres on the way back.
        assertEquals(lon, xy[0], 5e-8);
        assertEquals(lat, xy[1], 5e-8);
    }

    @Test
    void kilometreAxesHoldAThousandthOfTheMetres() {
        Crs metres = systems().get("lcc2");
        Crs kilometres = mapping(1000, "grid_mapping_name", "lambert_conformal_conic", "standard_parallel", new double[] {25, 60},
                "latitude_of_projection_origin", 42.5, "longitude_of_central_meridian", -100);
        double[] xy = {407.543879969, -252.704584807, 0, 0};
        SYSTEMS.between(kilometres, metres).transform(xy, 2);
        assertEquals(407543.879969, xy[0], 1e-3);
        assertEquals(-252704.584807, xy[1], 1e-3);
        assertEquals(1000, kilometres.metresPerUnit());
    }

    @Test
    void identicalSystemsNeedNoOperation() {
        assertTrue(SYSTEMS.between(SYSTEMS.wgs84(), SYSTEMS.fromCode("EPSG:4326")).isIdentity());
        Crs mapped = mapping(1, "grid_mapping_name", "latitude_longitude");
        assertEquals("EPSG:4326", mapped.code());
        assertTrue(SYSTEMS.between(mapped, SYSTEMS.wgs84()).isIdentity());
        Crs utm = SYSTEMS.fromCode("EPSG:32632");
        Crs sameByNumbers = mapping(1, "grid_mapping_name", "transverse_mercator", "latitude_of_projection_origin", 0,
                "longitude_of_central_meridian", 9, "scale_factor_at_central_meridian", 0.9996, "false_easting", 500000);
        assertTrue(SYSTEMS.between(utm, sameByNumbers).isIdentity());
        assertFalse(SYSTEMS.between(utm, SYSTEMS.fromCode("EPSG:32633")).isIdentity());
    }

    @Test
    void sphericalLatitudesAreUsedAsTheyAre() {
        double[] xy = {10, 50};
        SYSTEMS.between(mapping(1, "grid_mapping_name", "latitude_longitude", "earth_radius", 6371229.0), SYSTEMS.wgs84()).transform(xy, 1);
        assertEquals(10, xy[0], 1e-12);
        assertEquals(50, xy[1], 1e-12);
    }

    @Test
    void pointsWithoutImageAreNaN() {
        CoordinateOperation operation = SYSTEMS.between(SYSTEMS.wgs84(), systems().get("merc"));
        double[] xy = {Double.NaN, 10, 10, 91, 10, 10};
        operation.transform(xy, 3);
        assertTrue(Double.isNaN(xy[0]) && Double.isNaN(xy[1]) && Double.isNaN(xy[2]) && Double.isNaN(xy[3]));
        assertTrue(Double.isFinite(xy[4]));
    }

    @Test
    void anyNumberOfThreadsGetsTheSameCoordinates() {
        CoordinateOperation operation = SYSTEMS.between(SYSTEMS.wgs84(), SYSTEMS.fromCode("EPSG:2056"));
        double[] alone = {8.5, 47.3};
        operation.transform(alone, 1);
        long different = java.util.stream.IntStream.range(0, 4000).parallel().filter(i -> {
            double[] xy = {8.5, 47.3};
            operation.transform(xy, 1);
            return xy[0] != alone[0] || xy[1] != alone[1];
        }).count();
        assertEquals(0, different);
    }
}
