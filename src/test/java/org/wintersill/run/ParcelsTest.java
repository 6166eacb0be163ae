package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.climatology.FrequencyInterval;

/** Parcels on the finished outputs of the sample basin. */
class ParcelsTest {
    private static final double STEP = 0.005;

    private static final Path RUN = SampleRun.folder();

    @TempDir
    private Path folder;

    private Program.Ended parcels(Path file, String name, String... more) {
        String[] arguments = {"parcels", RUN.toString(), "--parcels", file.toString(), "--out", folder.resolve(name).toString(), "--quiet"};
        return Program.run(Stream.concat(Stream.of(arguments), Stream.of(more)).toArray(String[]::new));
    }

    /** @param box west, south, east, north */
    private static String feature(String id, String name, double... box) {
        return String.format(Locale.ROOT, "{\"type\":\"Feature\",\"properties\":{\"id\":%s,\"name\":%s},\"geometry\":{\"type\":\"Polygon\",\"coordinates\":[["
                + "[%3$.10f,%4$.10f],[%5$.10f,%4$.10f],[%5$.10f,%6$.10f],[%3$.10f,%6$.10f],[%3$.10f,%4$.10f]]]}}", quoted(id), quoted(name), box[0],
                box[1], box[2], box[3]);
    }

    private static String quoted(String text) {
        return '"' + text.replace("\\", "\\\\").replace("\"", "\\\"") + '"';
    }

    private Path file(String name, String... features) throws IOException {
        return Files.writeString(folder.resolve(name), "{\"type\":\"FeatureCollection\",\"features\":[" + String.join(",", features) + "]}");
    }

    private JsonNode result(String name) throws IOException {
        return new ObjectMapper().readTree(folder.resolve(name).resolve("parcels.json").toFile()).get("parcels");
    }

    /** Edges of a cell of the grid of outputs. */
    private static double[] cell(int row, int column) {
        RasterFile grid = RasterFile.read(RUN.resolve("slate/margin-mean.tif"));
        return new double[] {grid.west() + column * STEP, grid.north() - (row + 1) * STEP, grid.west() + (column + 1) * STEP, grid.north() - row * STEP};
    }

    @Test
    void aParcelThatIsACellHasTheCellsValues() throws IOException {
        Path file = file("one.geojson", feature("one", "", cell(90, 100)));
        parcels(file, "one").expect(0);
        JsonNode parcel = result("one").get(0);
        assertEquals(1, parcel.get("covered-share").asDouble(), 1e-6);
        for (JsonNode cultivar : parcel.get("cultivars")) {
            String id = cultivar.get("id").asText();
            RasterFile damage = RasterFile.read(RUN.resolve(id + "/winters/damage.tif"));
            RasterFile margin = RasterFile.read(RUN.resolve(id + "/winters/margin.tif"));
            int cell = 90 * damage.columns() + 100;
            for (int winter = 0; winter < damage.bands().length; winter++) {
                assertEquals(damage.bands()[winter][cell], cultivar.get("damage").get(winter).asDouble(Double.NaN), 1e-6);
                assertEquals(margin.bands()[winter][cell], cultivar.get("margin").get(winter).asDouble(Double.NaN), 1e-4);
            }
            for (String layer : List.of("margin-low", "damage-mean", "required-hardiness", "damage-probability-50-upper")) {
                float value = RasterFile.read(RUN.resolve(id + "/" + layer + ".tif")).bands()[0][cell];
                for (String kind : List.of("mean", "lowest", "highest")) {
                    assertEquals(value, cultivar.get("layers").get(layer).get(kind).asDouble(), 2e-6, layer);
                }
            }
            assertEquals(RasterFile.read(RUN.resolve(id + "/damage-probability-50.tif")).bands()[0][cell],
                    cultivar.get("killing-probability").asDouble(), 1e-6);
        }
    }

    @Test
    void aParcelsDamageIsTheMeanOfItsCellsByCoveredArea() throws IOException {
        double[] first = cell(60, 80);
        double[] last = cell(63, 84);
        Path file = file("box.geojson", feature("box", "", first[0] + 0.3 * STEP, last[1], last[2], first[3]));
        parcels(file, "box").expect(0);
        JsonNode slate = result("box").get(0).get("cultivars").get(1);
        RasterFile damage = RasterFile.read(RUN.resolve("slate/winters/damage.tif"));
        double[] expected = new double[damage.bands().length];
        int killing = 0;
        for (int winter = 0; winter < expected.length; winter++) {
            double sum = 0;
            double weights = 0;
            for (int row = 60; row <= 63; row++) {
                double latitude = damage.north() - (row + 0.5) * STEP;
                for (int column = 80; column <= 84; column++) {
                    float value = damage.bands()[winter][row * damage.columns() + column];
                    double weight = (column == 80 ? 0.7 : 1) * Math.cos(Math.toRadians(latitude));
                    sum += value == value ? weight * value : 0;
                    weights += value == value ? weight : 0;
                }
            }
            expected[winter] = sum / weights;
            killing += expected[winter] >= 0.5 ? 1 : 0;
        }
        double[] found = IntStream.range(0, expected.length).mapToDouble(winter -> slate.get("damage").get(winter).asDouble(Double.NaN)).toArray();
        assertArrayEquals(expected, found, 2e-6);
        int winters = (int) Arrays.stream(expected).filter(Double::isFinite).count();
        double[] bounds = FrequencyInterval.JEFFREYS.bounds(killing, winters, 0.9);
        assertEquals(killing, slate.get("killing-winters").asInt());
        assertEquals(bounds[0], slate.get("killing-probability-lower").asDouble(), 1e-6);
        assertEquals(bounds[1], slate.get("killing-probability-upper").asDouble(), 1e-6);
        assertEquals(Arrays.stream(expected).filter(Double::isFinite).average().orElseThrow(), slate.get("mean-damage").asDouble(), 2e-6);
    }

    @Test
    void hardierCultivarsRankFirstAndTiesAreSaid() throws IOException {
        parcels(Path.of("sample-grids/parcels.gpkg"), "all").expect(0);
        for (JsonNode parcel : result("all")) {
            if (parcel.get("cultivars").get(0).get("winters").asInt() == 0) {
                continue;
            }
            assertEquals("amber", parcel.get("best").get(0).asText());
            for (JsonNode cultivar : parcel.get("cultivars")) {
                assertEquals(cultivar.get("rank").asInt() == 1, contains(parcel.get("best"), cultivar.get("id").asText()));
                for (JsonNode other : cultivar.get("tied-with")) {
                    JsonNode partner = find(parcel.get("cultivars"), other.asText());
                    assertTrue(contains(partner.get("tied-with"), cultivar.get("id").asText()), "ties are mutual");
                }
            }
        }
    }

    private static boolean contains(JsonNode list, String text) {
        for (JsonNode item : list) {
            if (item.asText().equals(text)) {
                return true;
            }
        }
        return false;
    }

    private static JsonNode find(JsonNode list, String id) {
        for (JsonNode item : list) {
            if (item.get("id").asText().equals(id)) {
                return item;
            }
        }
        throw new AssertionError(id);
    }

    @Test
    void outsideAndPartlyCoveredParcelsAreSaid() throws IOException {
        RasterFile grid = RasterFile.read(RUN.resolve("slate/margin-mean.tif"));
        double[] inside = cell(50, 50);
        Path file = file("mixed.geojson", feature("in", "", inside), feature("out", "", 10, 45, 10.1, 45.1),
                feature("half", "", grid.west() - 0.02, inside[1], grid.west() + 0.02, inside[3]), feature("swapped", "", inside[1], inside[0], inside[3], inside[2]),
                feature("in", "", inside));
        Program.Ended ended = Program.run("parcels", RUN.toString(), "--parcels", file.toString(), "--out", folder.resolve("mixed").toString());
        assertTrue(ended.expect(0).err().contains("parcels outside of the grid have no values"), ended.err());
        JsonNode parcels = result("mixed");
        assertEquals("[\"the parcel lies outside of the grid\"]", parcels.get(1).get("warnings").toString());
        assertTrue(parcels.get(1).get("cultivars").get(0).get("mean-damage").isNull());
        assertTrue(parcels.get(2).get("warnings").toString().contains("only 50 % of the parcel") || parcels.get(2).get("warnings").toString().contains("only 49 %"),
                parcels.get(2).toString());
        assertTrue(parcels.get(3).get("warnings").toString().contains("x and y seem to be swapped"));
        assertTrue(parcels.get(4).get("warnings").toString().contains("the id stands in the file more than once"));
        Program.Ended nowhere = parcels(file("nowhere.geojson", feature("s", "", inside[1], inside[0], inside[3], inside[2])), "nowhere");
        assertTrue(nowhere.expect(3).err().contains("x and y seem to be swapped in the parcels"), nowhere.err());
        assertFalse(Files.exists(folder.resolve("nowhere")));
    }

    @Test
    void hostileNamesDoNoHarm() throws IOException, SQLException {
        List<String> ids = List.of("../../../evil", "=cmd|' /C calc'!A0", "<script>alert(1)</script>", "'; DROP TABLE parcels; --", "a".repeat(300), "CON", "con");
        Path file = file("hostile.geojson", ids.stream().map(id -> feature(id, "<img src=x onerror=alert(2)> & \u202e", cell(40, 40))).toArray(String[]::new));
        parcels(file, "hostile", "--sheets", "all").expect(0);
        Map<String, byte[]> files = RunFolder.files(folder.resolve("hostile"));
        assertEquals(ids.size(), files.keySet().stream().filter(name -> name.matches("sheets/parcel-0000\\d[a-z0-9-]*\\.html")).count(), files.keySet().toString());
        for (Map.Entry<String, byte[]> written : files.entrySet()) {
            String text = new String(written.getValue(), StandardCharsets.UTF_8);
            if (written.getKey().endsWith(".html")) {
                assertFalse(text.contains("<script") || text.contains("<img") || text.contains("\u202e"), written.getKey());
                assertTrue(text.contains("&lt;img src=x onerror=alert(2)&gt; &amp;"));
            } else if (written.getKey().endsWith(".csv")) {
                assertFalse(text.lines().anyMatch(line -> line.startsWith("=") || line.startsWith("\"=")), written.getKey());
            }
        }
        try (Stream<Path> beside = Files.walk(folder)) {
            assertTrue(beside.noneMatch(path -> path.getFileName().toString().equals("evil")));
        }
        try (Connection database = DriverManager.getConnection("jdbc:sqlite:" + folder.resolve("hostile/parcels.gpkg"));
                ResultSet rows = database.createStatement().executeQuery("SELECT parcel_id FROM parcels ORDER BY fid")) {
            for (String id : ids) {
                assertTrue(rows.next());
                assertEquals(id, rows.getString(1));
            }
        }
    }

    @Test
    void theSameBytesForAnyThreadsAndTheRunStaysAsItIs() throws IOException {
        Map<String, byte[]> before = new TreeMap<>(RunFolder.files(RUN));
        Path sample = Path.of("sample-grids/parcels.gpkg");
        parcels(sample, "one", "--threads", "1").expect(0);
        parcels(sample, "three", "--threads", "3").expect(0);
        assertEquals(List.of(), RunFolder.differing(RunFolder.files(folder.resolve("one")), RunFolder.files(folder.resolve("three"))));
        assertEquals(List.of(), RunFolder.differing(before, RunFolder.files(RUN)));
        assertTrue(parcels(sample, "one").expect(4).err().contains("--overwrite"));
        parcels(sample, "one", "--overwrite", "--sheets", "P03").expect(0);
        try (Stream<Path> sheets = Files.list(folder.resolve("one/sheets"))) {
            assertEquals(List.of("parcel-00003-p03.html"), sheets.map(path -> path.getFileName().toString()).toList());
        }
        assertTrue(parcels(sample, "none", "--sheets", "P99").expect(2).err().contains("the file has no parcel P99"));
    }

    @Test
    void theKeyOfTheRunFileGivesTheTablesOfTheCommand() throws IOException, SQLException {
        Path sample = Path.of("sample-grids/parcels.gpkg").toAbsolutePath();
        Path other = folder.resolve("with");
        Program.run("map", SampleRun.RUN_FILE.toString(), "--out", other.toString(), "--quiet", "--set", "parcels=" + sample).expect(0);
        parcels(sample, "command").expect(0);
        for (String name : List.of("parcels.csv", "parcel-cultivars.csv", "parcel-winters.csv", "parcel-classes.csv", "parcels.json")) {
            assertEquals(Files.readString(folder.resolve("command").resolve(name)), Files.readString(other.resolve("parcels").resolve(name)), name);
        }
        String record = Files.readString(other.resolve("record.json"));
        assertTrue(record.contains("\"path\" : \"parcels/parcels.csv\"") && record.contains("\"role\" : \"parcels\""));
        try (Connection database = DriverManager.getConnection("jdbc:sqlite:" + other.resolve("layers.gpkg"));
                ResultSet rows = database.createStatement().executeQuery("SELECT count(*), count(DISTINCT cultivar) FROM parcel_cultivars")) {
            assertEquals(36, rows.getInt(1));
            assertEquals(3, rows.getInt(2));
        }
        Program.Ended again = Program.run("parcels", other.toString(), "--parcels", sample.toString(), "--overwrite", "--quiet");
        assertTrue(again.expect(4).err().contains("outputs of the run itself"), again.err());
    }

    @Test
    void whatIsNoFinishedRunIsRefused() throws IOException {
        Path sample = Path.of("sample-grids/parcels.gpkg");
        Program.Ended nothing = Program.run("parcels", folder.resolve("no").toString(), "--parcels", sample.toString());
        assertTrue(nothing.expect(3).err().contains("there is no such folder"), nothing.err());
        Program.Ended noFile = Program.run("parcels", RUN.toString(), "--parcels", folder.resolve("no.gpkg").toString());
        assertTrue(noFile.expect(3).err().contains("there is no file"), noFile.err());
    }
}
