package org.wintersill.io.vector;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.parcel.Outline;
import org.wintersill.parcel.PolygonFeature;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.ProblemException;

/** Files made by GDAL ({@code src/test/python/make_vector_fixtures.py}), and damaged and hostile ones. */
class VectorReadingTest {
    private static final Path FIXTURES = Path.of("src/test/resources/vector");
    private static final PolygonFiles FILES = new PolygonFiles(new GeoToolsCrs());

    @TempDir
    private Path folder;

    /** A file that was read to its end. */
    private record Content(String crs, String layer, String idColumn, List<PolygonFeature> features) {
        PolygonFeature of(String id) {
            return features.stream().filter(feature -> feature.id().equals(id)).findFirst().orElseThrow();
        }
    }

    private static Content read(Path file, PolygonRequest request) {
        try (PolygonReader reader = FILES.open(file, request)) {
            List<PolygonFeature> features = new ArrayList<>();
            for (PolygonFeature feature = reader.next(); feature != null; feature = reader.next()) {
                features.add(feature);
            }
            return new Content(reader.crs().label(), reader.layer(), reader.idColumn(), features);
        }
    }

    private static Content read(String name) {
        return read(FIXTURES.resolve(name), PolygonRequest.PLAIN);
    }

    private static PolygonRequest request(String layer, String id, String crs) {
        return new PolygonRequest(Optional.ofNullable(layer), Optional.ofNullable(id), Optional.empty(), Optional.ofNullable(crs));
    }

    private static double area(Outline outline) {
        double twice = 0;
        for (double[] ring : outline.rings()) {
            for (int i = 0; i + 3 < ring.length; i += 2) {
                twice += ring[i] * ring[i + 3] - ring[i + 2] * ring[i + 1];
            }
        }
        return twice / 2;
    }

    private static String refusal(Path file, PolygonRequest request, int code) {
        ProblemException refused = assertThrows(ProblemException.class, () -> read(file, request));
        assertEquals(code, refused.exitCode(), refused.getMessage());
        return refused.getMessage();
    }

    @ParameterizedTest
    @CsvSource({"plain.gpkg, EPSG:3857, plots", "plain.geojson, EPSG:4326, plain.geojson", "plain.shp, EPSG:25832, plain"})
    void theSamePolygonsComeFromEveryFormat(String name, String crs, String layer) {
        Content content = read(name);
        assertTrue(crs.equals(content.crs()) || content.crs().contains("ETRS89 / UTM zone 32N") || content.crs().contains("ETRS_1989_UTM_Zone_32N"),
                content.crs());
        assertEquals(layer, content.layer());
        assertEquals("parcel_id", content.idColumn());
        assertEquals(8, area(content.of("a").outline()), 1e-12);
        assertEquals(100 - 36, area(content.of("b").outline()), 1e-12);
        assertEquals(2, content.of("b").outline().rings().size());
        assertEquals(1 + 4, area(content.of("c").outline()), 1e-12);
        assertEquals("Two parts", content.of("c").name());
        assertTrue(content.of("d").outline().isEmpty());
        assertEquals("no polygon is stored", content.of("d").remark());
        assertEquals("", content.of("a").remark());
    }

    @Test
    void emptyFlatAndCrossingRingsAreNamed() {
        Content content = read("plain.gpkg");
        assertTrue(content.of("e").outline().isEmpty());
        assertEquals(8, area(content.of("f").outline()), 1e-12);
        assertTrue(content.of("f").remark().startsWith("the polygon was repaired (self-intersection near 52, 2"), content.of("f").remark());
        assertTrue(content.of("g").outline().isEmpty());
        assertTrue(content.of("g").remark().startsWith("the polygon encloses nothing"), content.of("g").remark());
    }

    @Test
    void heightsAndMeasuresAreLeftOut() {
        Content content = read("heights.gpkg");
        assertEquals("EPSG:2056", content.crs());
        assertEquals(List.of("z", "m", "zm"), content.features().stream().map(PolygonFeature::id).toList());
        content.features().forEach(feature -> assertEquals(8, area(feature.outline()), 1e-12));
    }

    @Test
    void aLayerIsChosenByNameWhereThereAreSeveral() {
        assertTrue(refusal(FIXTURES.resolve("two-layers.gpkg"), PolygonRequest.PLAIN, 2).contains("first_layer, order"));
        Content content = read(FIXTURES.resolve("two-layers.gpkg"), request("order", null, null));
        assertEquals(5, area(content.of("c").outline()), 1e-12);
        assertTrue(refusal(FIXTURES.resolve("two-layers.gpkg"), request("first_layr", null, null), 2).contains("Did you mean first_layer?"));
    }

    @Test
    void hostileNamesAreTextsAndNothingElse() {
        Content content = read("hostile.gpkg");
        assertEquals("select", content.layer());
        assertEquals(List.of("1; DROP TABLE plots; --", "=1+2"), content.features().stream().map(PolygonFeature::id).toList());
        assertEquals("<script>alert(1)</script>", content.features().get(0).name());
    }

    @Test
    void codePagesOfShapefiles() {
        assertEquals("Gr\u00fcnwiese", read("plain.shp").of("a").name());
        Content latin = read("latin.shp");
        assertEquals("\u00c5se", latin.of("z").name());
        assertEquals(8, area(latin.of("z").outline()), 1e-12);
    }

    @Test
    void theOlderMemberOfGeoJsonNamesTheSystem() {
        assertEquals("EPSG:3857", read("older.geojson").crs());
        assertTrue(refusal(FIXTURES.resolve("older.geojson"), request(null, null, "EPSG:2056"), 3).contains("the run says crs EPSG:2056"));
    }

    @Test
    void idsComeFromTheColumnThatIsAskedFor() {
        Content content = read(FIXTURES.resolve("plain.gpkg"), request(null, "rank", null));
        assertEquals(List.of("0.5", "1.5", "2.5"), content.features().stream().limit(3).map(PolygonFeature::id).toList());
        assertTrue(refusal(FIXTURES.resolve("plain.gpkg"), request(null, "parcelid", null), 2).contains("Did you mean parcel_id?"));
    }

    @Test
    @Timeout(20)
    void viewsAreNotAsked() {
        assertTrue(refusal(FIXTURES.resolve("view.gpkg"), PolygonRequest.PLAIN, 3).contains("is a view or a virtual table"));
    }

    @Test
    void curvesAreRefusedByName() {
        assertTrue(refusal(FIXTURES.resolve("curves.gpkg"), PolygonRequest.PLAIN, 3).contains("row 1 of layer plots cannot be used: its geometry is a curve"));
    }

    @Test
    void readingChangesNothingAndLeavesNothingBesideTheFile() throws IOException {
        Path copy = Files.copy(FIXTURES.resolve("plain.gpkg"), folder.resolve("copy ?%41.gpkg"));
        byte[] before = Files.readAllBytes(copy);
        assertEquals(7, read(copy, PolygonRequest.PLAIN).features().size());
        assertTrue(java.util.Arrays.equals(before, Files.readAllBytes(copy)));
        try (Stream<Path> files = Files.list(folder)) {
            assertEquals(1, files.count());
        }
    }

    @Test
    void changesThatWaitBesideTheFileAreNotOverlooked() throws IOException {
        Path copy = Files.copy(FIXTURES.resolve("plain.gpkg"), folder.resolve("open.gpkg"));
        Files.writeString(folder.resolve("open.gpkg-wal"), "changes");
        assertTrue(refusal(copy, PolygonRequest.PLAIN, 3).contains("another program has it open"));
    }

    @Test
    void aShapefileWithoutSystemNeedsOne() throws IOException {
        Files.copy(FIXTURES.resolve("plain.shp"), folder.resolve("bare.shp"));
        assertTrue(refusal(folder.resolve("bare.shp"), PolygonRequest.PLAIN, 3).contains("does not say in which reference system"));
        Content content = read(folder.resolve("bare.shp"), request(null, null, "EPSG:25832"));
        assertEquals(List.of("1", "2", "3", "4"), content.features().stream().map(PolygonFeature::id).toList());
    }

    @ParameterizedTest
    @ValueSource(strings = {"plain.gpkg", "plain.shp", "plain.geojson"})
    void aFileThatIsCutShortIsRefused(String name) throws IOException {
        Path cut = folder.resolve(name);
        for (String ending : List.of(".prj", ".dbf", ".cpg")) {
            Path beside = FIXTURES.resolve(name.replaceFirst("\\.[a-z]+$", ending));
            if (Files.exists(beside)) {
                Files.copy(beside, folder.resolve(beside.getFileName()), StandardCopyOption.REPLACE_EXISTING);
            }
        }
        byte[] whole = Files.readAllBytes(FIXTURES.resolve(name));
        for (int share = 1; share <= 9; share++) {
            Files.write(cut, java.util.Arrays.copyOf(whole, whole.length * share / 10), StandardOpenOption.CREATE, StandardOpenOption.TRUNCATE_EXISTING);
            int size = whole.length * share / 10;
            try {
                Content content = read(cut, PolygonRequest.PLAIN);
                assertTrue(name.endsWith(".gpkg") && content.features().size() == 7, "cut to " + size + " bytes, the file was taken as whole");
            } catch (ProblemException e) {
                assertEquals(3, e.exitCode(), e.getMessage());
            }
        }
    }

    @Test
    void nestedCollectionsDoNotExhaustTheStack() throws IOException {
        String deep = "{\"type\":\"Feature\",\"geometry\":{\"type\":\"Polygon\",\"coordinates\":" + "[".repeat(100_000) + "}}";
        assertTrue(refusal(Files.writeString(folder.resolve("deep.geojson"), deep), PolygonRequest.PLAIN, 3).contains("damaged"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "<!DOCTYPE html><html>login</html> | it is a web page",
        "'' | it is empty",
        "{\"type\":\"Topology\"} | its type is 'Topology'",
        "{\"type\":\"Polygon\",\"coordinates\":[[[500000,5000000],[500001,5000000],[500001,5000001],[500000,5000000]]]} | no longitude and latitude",
        "{\"type\":\"Polygon\",\"coordinates\":[[[50,150],[51,150],[51,151],[50,150]]]} | seem to be swapped",
        "{\"type\":\"FeatureCollection\",\"crs\":{\"type\":\"link\",\"properties\":{\"href\":\"http://example.org\"}},\"features\":[]} | nothing is fetched",
        "{\"type\":\"FeatureCollection\",\"features\":[{\"type\":\"Feature\" | damaged or cut short",
    })
    void whatIsNoFileOfPolygonsIsRefusedByName(String text, String reason) throws IOException {
        Path file = Files.writeString(folder.resolve("some.geojson"), text);
        assertTrue(refusal(file, PolygonRequest.PLAIN, 3).contains(reason), refusal(file, PolygonRequest.PLAIN, 3));
    }

    @Test
    void coordinatesMayComeBeforeTheType() throws IOException {
        Path file = Files.writeString(folder.resolve("order.geojson"), "{\"features\":[{\"geometry\":{\"coordinates\":[[[0,0,7],[4,0,7],[4,2,7],[0,2,7],"
                + "[0,0,7]]],\"type\":\"Polygon\"},\"id\":17,\"properties\":null,\"type\":\"Feature\"},{\"type\":\"Feature\",\"geometry\":"
                + "{\"type\":\"LineString\",\"coordinates\":[[0,0],[1,1]]},\"properties\":{}}],\"type\":\"FeatureCollection\"}");
        Content content = read(file, PolygonRequest.PLAIN);
        assertEquals(8, area(content.of("17").outline()), 1e-12);
        assertEquals("the geometry is a LineString, no polygon", content.of("2").remark());
    }
}
