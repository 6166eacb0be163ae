package org.wintersill.io.crs;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.wintersill.grid.Crs;
import org.wintersill.problem.ProblemException;

/** Each form that is written reads back as the same system. */
class CrsFormsTest {
    private static final GeoToolsCrs SYSTEMS = new GeoToolsCrs();

    private static List<Crs> all() {
        List<Crs> out = new ArrayList<>(CoordinateOperationTest.systems().values());
        for (String code : List.of("4326", "4258", "2056", "3035", "32632", "3857", "31287", "28992", "2263", "3031", "32661", "5070")) {
            out.add(SYSTEMS.fromCode("EPSG:" + code));
        }
        return out;
    }

    private static void assertSame(Crs expected, Crs actual) {
        assertTrue(SystemDefinition.of(expected).samePlaces(SystemDefinition.of(actual)), () -> expected + " became " + actual);
        assertEquals(expected.kind(), actual.kind());
        assertEquals(expected.metresPerUnit(), actual.metresPerUnit(), 1e-12);
    }

    @Test
    void wkt1ReadsBackAsTheSameSystem() {
        for (Crs crs : all()) {
            if (crs.pole() == null) {
                assertEquals(crs, SYSTEMS.fromWkt(CrsDefinitions.wkt1(crs)));
            }
        }
    }

    @Test
    void wkt2ReadsBackAsTheSameSystem() {
        for (Crs crs : all()) {
            Crs back = SYSTEMS.fromWkt(CrsDefinitions.wkt2(crs));
            assertEquals(crs.code(), back.code());
            assertSame(crs, back);
        }
    }

    @Test
    void gridMappingAttributesReadBackAsTheSameSystem() {
        for (Crs crs : all()) {
            Map<String, Object> attributes = new LinkedHashMap<>(CrsDefinitions.gridMapping(crs));
            assertSame(crs, SYSTEMS.fromGridMapping(attributes, crs.metresPerUnit()));
            if (attributes.containsKey("grid_mapping_name") && SystemDefinition.of(crs).base().toWgs84().isEmpty()) {
                attributes.remove("crs_wkt");
                Crs byNumbers = SYSTEMS.fromGridMapping(attributes, crs.metresPerUnit());
                assertTrue(SYSTEMS.between(crs, byNumbers) != null);
                assertEquals(SystemDefinition.of(crs).parameters(), SystemDefinition.of(byNumbers).parameters());
            }
        }
    }

    @Test
    void geoKeysReadBackAsTheSameSystem() {
        for (Crs crs : all()) {
            if (crs.pole() == null) {
                assertSame(crs, GeoKeys.toCrs(GeoKeys.of(crs), SYSTEMS));
            }
        }
    }

    @Test
    void geoKeysAscendAndSayPixelIsArea() {
        GeoKeys keys = GeoKeys.of(CoordinateOperationTest.systems().get("aea"));
        assertEquals(1, keys.number(1025, 0));
        assertEquals((keys.directory().length - 4) / 4, keys.directory()[3]);
        for (int i = 8; i < keys.directory().length; i += 4) {
            assertTrue(keys.directory()[i] > keys.directory()[i - 4]);
        }
    }

    @Test
    void rotatedPoleHasNoGeoTiffForm() {
        ProblemException e = assertThrows(ProblemException.class, () -> GeoKeys.of(CoordinateOperationTest.systems().get("rotated")));
        assertEquals(4, e.exitCode());
        assertTrue(e.getMessage().contains("rotated pole") && e.getMessage().contains("NetCDF"), e.getMessage());
    }

    @Test
    void spellingsOfOtherProgramsAreTheSameSystems() {
        Crs esri = SYSTEMS.fromWkt("GEOGCS[\"GCS_WGS_1984\",DATUM[\"D_WGS_1984\",SPHEROID[\"WGS_1984\",6378137.0,298.257223563]],"
                + "PRIMEM[\"Greenwich\",0.0],UNIT[\"Degree\",0.0174532925199433]]");
        assertEquals("EPSG:4326", esri.code());
        Crs polar = SYSTEMS.fromWkt("PROJCS[\"x\",GEOGCS[\"GCS_WGS_1984\",DATUM[\"D_WGS_1984\",SPHEROID[\"WGS_1984\",6378137.0,298.257223563]],"
                + "PRIMEM[\"Greenwich\",0.0],UNIT[\"Degree\",0.0174532925199433]],PROJECTION[\"Stereographic_South_Pole\"],"
                + "PARAMETER[\"False_Easting\",0],PARAMETER[\"False_Northing\",0],PARAMETER[\"Central_Meridian\",0],"
                + "PARAMETER[\"Standard_Parallel_1\",-71],UNIT[\"Meter\",1]]");
        assertTrue(SYSTEMS.between(polar, SYSTEMS.fromCode("EPSG:3031")).isIdentity());
        assertTrue(CrsDefinitions.sameSystem(polar, SYSTEMS.fromWkt(polar.wkt() + ",VERTCS[\"h\",VDATUM[\"h\"],UNIT[\"Meter\",1]]")));
        Crs compound = SYSTEMS.fromWkt("COMPD_CS[\"c\"," + SYSTEMS.fromCode("EPSG:3035").wkt()
                + ",VERT_CS[\"h\",VERT_DATUM[\"h\",2005],UNIT[\"metre\",1],AXIS[\"Up\",UP]]]");
        assertEquals("EPSG:3035", compound.code());
    }

    @Test
    void whatIsUnknownIsRefusedInWords() {
        assertRefused(() -> SYSTEMS.fromCode("EPSG:999999"), "EPSG:999999");
        assertRefused(() -> SYSTEMS.fromCode("wgs84"), "EPSG:4326");
        assertRefused(() -> SYSTEMS.fromCode("EPSG:5514"), "not known", "gdalwarp");
        assertRefused(() -> SYSTEMS.fromWkt("PROJCS[\"cut\",GEOGCS["), "refused");
        assertRefused(() -> SYSTEMS.fromWkt("LOCAL_CS[\"here\"]"), "LOCAL_CS");
        assertRefused(() -> CoordinateOperationTest.mapping(1, "grid_mapping_name", "sinusoidal"), "sinusoidal", "lambert_conformal_conic");
        assertRefused(() -> CoordinateOperationTest.mapping(1, "grid_mapping_name", "albers_conical_equal_area",
                "latitude_of_projection_origin", 23, "longitude_of_central_meridian", -96), "standard_parallel");
        assertRefused(() -> CoordinateOperationTest.mapping(1, "grid_mapping_name", "mercator", "longitude_of_projection_origin", "west"), "west");
    }

    private static void assertRefused(Runnable step, String... words) {
        ProblemException e = assertThrows(ProblemException.class, step::run);
        for (String word : words) {
            assertTrue(e.getMessage().contains(word), e.getMessage());
        }
    }
}
