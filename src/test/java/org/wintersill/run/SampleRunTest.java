package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.File;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.io.crs.CellAreas;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.grid.GridGeometry;

/** The outputs of the sample run agree with each other and with what is said about them. */
class SampleRunTest {
    private static final List<String> CULTIVARS = List.of("amber", "slate", "fern");
    private static final List<String> WINTERS = List.of("2005-06", "2006-07", "2007-08", "2008-09", "2009-10", "2010-11", "2011-12",
            "2012-13", "2013-14", "2014-15", "2016-17", "2017-18");
    private static final double[] CLASSES = {0.05, 0.10, 0.20};
    private static final Path OUT = SampleRun.folder();

    private static JsonNode json(String name) throws Exception {
        return new ObjectMapper().readTree(OUT.resolve(name).toFile());
    }

    @Test
    void theFolderHoldsWhatIsPromisedAndNothingElse() {
        TreeSet<String> expected = new TreeSet<>(List.of("record.json", "summary.csv", "summary.json", "layers.gpkg",
                "shared/choice.tif.aux.xml"));
        for (String cultivar : CULTIVARS) {
            List.of("margin-mean", "margin-low", "margin-worst", "worst-winter", "damage-mean", "damage-probability-10",
                    "damage-probability-10-lower", "damage-probability-10-upper", "damage-probability-50",
                    "damage-probability-50-lower", "damage-probability-50-upper", "damage-probability-90",
                    "damage-probability-90-lower", "damage-probability-90-upper", "killing-winter-return",
                    "killing-winter-return-lower", "required-hardiness", "suitability", "autumn-share", "midwinter-share",
                    "spring-share", "winters/margin", "winters/damage",
                    "winters/worst-night").forEach(layer -> add(expected, cultivar + "/" + layer));
            expected.add(cultivar + "/suitability.tif.aux.xml");
        }
        List.of("choice", "elevation", "height-change", "mean-minimum", "valid-winters", "variance-winter", "variance-cultivar",
                "variance-interaction", "winters/minimum")
                .forEach(layer -> add(expected, "shared/" + layer));
        assertEquals(expected, new TreeSet<>(RunFolder.files(OUT).keySet()));
        assertFalse(Files.exists(OUT.resolve(".unfinished")));
    }

    private static void add(TreeSet<String> names, String layer) {
        names.add(layer + ".tif");
        names.add(layer + ".qml");
    }

    @ParameterizedTest
    @ValueSource(strings = {"amber", "slate", "fern"})
    void winterLayersHaveOneNamedBandAWinterAndAgreeWhereTheyAreMissing(String cultivar) {
        RasterFile margin = SampleRun.raster(cultivar + "/winters/margin");
        RasterFile damage = SampleRun.raster(cultivar + "/winters/damage");
        RasterFile night = SampleRun.raster(cultivar + "/winters/worst-night");
        RasterFile minimum = SampleRun.raster("shared/winters/minimum");
        for (RasterFile file : List.of(margin, damage, night, minimum)) {
            assertEquals(WINTERS, List.of(file.names()));
            assertEquals(240, file.columns());
            assertEquals(180, file.rows());
        }
        for (int winter = 0; winter < WINTERS.size(); winter++) {
            for (int cell = 0; cell < 240 * 180; cell++) {
                float m = margin.bands()[winter][cell];
                float d = damage.bands()[winter][cell];
                float n = night.bands()[winter][cell];
                boolean missing = m != m;
                assertEquals(missing, d != d);
                assertEquals(missing, n != n);
                assertEquals(missing, Float.isNaN(minimum.bands()[winter][cell]));
                if (!missing) {
                    assertTrue(d >= 0 && d <= 1 && n >= 0 && n < 274 && n == Math.rint(n), "damage " + d + ", night " + n);
                    // the worst night decides both: more than half are killed exactly where the margin is negative
                    assertTrue(m > 1e-5 ? d <= 0.5f : m >= -1e-5 || d >= 0.5f, "margin " + m + ", damage " + d);
                }
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"amber", "slate", "fern"})
    void summariesFollowFromTheWinters(String cultivar) {
        float[][] margin = SampleRun.raster(cultivar + "/winters/margin").bands();
        float[][] damage = SampleRun.raster(cultivar + "/winters/damage").bands();
        float[] valid = SampleRun.raster("shared/valid-winters").band();
        float[] mean = band(cultivar, "margin-mean");
        float[] worst = band(cultivar, "margin-worst");
        float[] low = band(cultivar, "margin-low");
        float[] year = band(cultivar, "worst-winter");
        float[] damageMean = band(cultivar, "damage-mean");
        float[] frequency = band(cultivar, "damage-probability-50");
        float[] period = band(cultivar, "killing-winter-return");
        for (int cell = 0; cell < mean.length; cell++) {
            int n = 0;
            int killing = 0;
            double sum = 0;
            double damageSum = 0;
            int worstAt = -1;
            for (int winter = 0; winter < margin.length; winter++) {
                float value = margin[winter][cell];
                if (value == value) {
                    n++;
                    sum += value;
                    damageSum += damage[winter][cell];
                    killing += value <= 0 ? 1 : 0;
                    worstAt = worstAt < 0 || value < margin[worstAt][cell] ? winter : worstAt;
                }
            }
            if (n == 0) {
                assertTrue(Float.isNaN(mean[cell]) && Float.isNaN(worst[cell]) && Float.isNaN(low[cell]) && Float.isNaN(year[cell])
                        && Float.isNaN(damageMean[cell]) && Float.isNaN(frequency[cell]) && Float.isNaN(period[cell]));
                assertTrue(Float.isNaN(valid[cell]) || valid[cell] == 0, "no winter counts");
                continue;
            }
            assertEquals(n, valid[cell]);
            assertEquals((float) (sum / n), mean[cell]);
            assertEquals((float) (damageSum / n), damageMean[cell]);
            assertEquals(margin[worstAt][cell], worst[cell]);
            assertEquals(Integer.parseInt(WINTERS.get(worstAt).substring(0, 4)) + 1, year[cell]);
            assertTrue(low[cell] >= worst[cell] && low[cell] <= mean[cell]);
            assertEquals((float) ((double) killing / n), frequency[cell]);
            assertEquals(killing == 0 ? Float.NaN : (float) ((double) n / killing), period[cell]);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"amber", "slate", "fern"})
    void probabilitiesLieBetweenTheirBoundsAndFallWithTheLevel(String cultivar) {
        float[] more = null;
        for (int level : new int[] {10, 50, 90}) {
            float[] value = band(cultivar, "damage-probability-" + level);
            float[] lower = band(cultivar, "damage-probability-" + level + "-lower");
            float[] upper = band(cultivar, "damage-probability-" + level + "-upper");
            for (int cell = 0; cell < value.length; cell++) {
                boolean missing = Float.isNaN(value[cell]);
                assertEquals(missing, Float.isNaN(lower[cell]));
                assertEquals(missing, Float.isNaN(upper[cell]));
                assertTrue(missing || 0 <= lower[cell] && lower[cell] <= value[cell] && value[cell] <= upper[cell] && upper[cell] <= 1);
                assertTrue(missing || more == null || value[cell] <= more[cell], "LT90 is never reached more often than LT50");
            }
            more = value;
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"amber", "slate", "fern"})
    void classesFollowFromTheFrequencyAndTheLimits(String cultivar) {
        float[] frequency = band(cultivar, "damage-probability-50");
        float[] classes = band(cultivar, "suitability");
        float[] valid = SampleRun.raster("shared/valid-winters").band();
        for (int cell = 0; cell < classes.length; cell++) {
            if (Float.isNaN(frequency[cell]) || valid[cell] < 5) {
                assertTrue(Float.isNaN(classes[cell]));
                continue;
            }
            int expected = 1;
            for (double limit : CLASSES) {
                // float32 holds a frequency to seven digits
                expected += frequency[cell] > limit + 1e-6 ? 1 : 0;
            }
            assertEquals(expected, classes[cell]);
        }
    }

    @Test
    void theSummaryCountsWhatTheMapsShow() throws Exception {
        JsonNode summary = json("summary.json");
        assertEquals(WINTERS, texts(summary.get("winters")));
        GridGeometry grid = new GridGeometry(240, 180, -38, 50.5, 0.005, 0.005, new GeoToolsCrs().wgs84());
        double[] rowAreas = CellAreas.rowAreasKm2(grid);
        List<String> csv = Files.readAllLines(OUT.resolve("summary.csv"), StandardCharsets.UTF_8);
        assertEquals(1 + 4 * CULTIVARS.size(), csv.size());
        for (int c = 0; c < CULTIVARS.size(); c++) {
            JsonNode entry = summary.get("cultivars").get(c);
            assertEquals(CULTIVARS.get(c), entry.get("id").asText());
            float[] classes = band(CULTIVARS.get(c), "suitability");
            int[] cells = new int[5];
            double[] areas = new double[5];
            for (int cell = 0; cell < classes.length; cell++) {
                int code = Float.isNaN(classes[cell]) ? 0 : (int) classes[cell];
                cells[code]++;
                areas[code] += rowAreas[cell / 240];
            }
            assertEquals(cells[0], entry.get("cells-without-class").asInt());
            double whole = Arrays.stream(areas).skip(1).sum();
            double shares = 0;
            for (int code = 1; code <= 4; code++) {
                JsonNode row = entry.get("classes").get(code - 1);
                assertEquals(cells[code], row.get("cells").asInt());
                assertEquals(areas[code], row.get("area-km2").asDouble(), 1e-6 * whole);
                assertEquals(areas[code] / whole, row.get("share").asDouble(), 1e-9);
                shares += row.get("share").asDouble();
                assertEquals(cells[code] == 0, row.get("elevation-mean").isNull());
                String line = csv.get(4 * c + code);
                String[] columns = line.split(",");
                assertEquals(List.of(CULTIVARS.get(c), row.get("class").asText(), Integer.toString(cells[code])),
                        List.of(columns[0], columns[4], columns[5]), line);
                assertEquals(row.get("area-km2").asDouble(), Double.parseDouble(columns[6]), 5.1e-5, line);
                assertEquals(row.get("share").asDouble(), Double.parseDouble(columns[7]), 5.1e-7, line);
            }
            assertEquals(1, shares, 1e-12);
        }
    }

    @Test
    void theRecordNamesEveryFileWithItsFingerprintAndNothingPrivate() throws Exception {
        JsonNode record = json("record.json");
        Map<String, byte[]> files = RunFolder.files(OUT);
        List<String> named = new ArrayList<>();
        for (JsonNode output : record.get("outputs")) {
            byte[] bytes = files.get(output.get("path").asText());
            assertEquals(sha256(bytes), output.get("sha256").asText());
            assertEquals(bytes.length, output.get("bytes").asLong());
            named.add(output.get("path").asText());
        }
        files.remove("record.json");
        assertEquals(new ArrayList<>(files.keySet()), named);
        for (JsonNode input : record.get("inputs")) {
            assertEquals(sha256(Files.readAllBytes(Path.of("sample-grids", input.get("path").asText()))), input.get("sha256").asText());
        }
        assertEquals(WINTERS, texts(record.get("winters")));
        assertEquals(List.of("2004-05", "2015-16", "2018-19"), names(record.get("winters-not-used")));
        String text = Files.readString(OUT.resolve("record.json"));
        assertPrivate(text, System.getProperty("user.dir"));
        assertPrivate(text, System.getProperty("java.io.tmpdir"));
        assertPrivate(text, OUT.getParent().getFileName().toString());
        assertFalse(text.contains("\"" + System.getProperty("user.name") + "\""));
        assertFalse(text.matches("(?s).*\\d\\d:\\d\\d:\\d\\d.*"), "a clock");
        assertFalse(text.contains("\"" + java.time.LocalDate.now().getYear() + "-"), "a date of today");
    }

    private static void assertPrivate(String text, String place) {
        assertFalse(text.contains(place) || text.contains(place.replace(File.separatorChar, '/')), "the record shows " + place);
    }

    @Test
    void everyLayerSaysWhatItIs() {
        for (String name : RunFolder.files(OUT).keySet()) {
            if (!name.endsWith(".tif")) {
                continue;
            }
            RasterFile file = SampleRun.raster(name.replaceFirst("\\.tif$", ""));
            assertEquals("2005-06 to 2017-18", file.items().get("WINTERS"), name);
            assertTrue(file.items().get("CAUTION").startsWith("Screening at the grid's scale"), name);
            assertEquals(-38, file.west(), 1e-9);
            assertEquals(50.5, file.north(), 1e-9);
            assertEquals(0.005, file.cellWidth(), 1e-12);
            String first = name.substring(0, name.indexOf('/'));
            assertEquals(first.equals("shared") ? null : first, file.items().get("CULTIVAR"), name);
            assertEquals(first.equals("shared") ? null : "invented", file.items().get("CURVE_STATUS"), name);
        }
    }

    @Test
    void theHardierCultivarIsNowhereWorseOff() {
        float[] amber = band("amber", "required-hardiness");
        float[] slate = band("slate", "required-hardiness");
        int better = 0;
        for (int cell = 0; cell < amber.length; cell++) {
            better += amber[cell] < slate[cell] ? 1 : 0;
        }
        assertTrue(better > 0.9 * SampleRun.raster("amber/required-hardiness").valid(0));
    }

    @Test
    void heightChangeExplainsTheMeanMinimum() {
        // higher than its surroundings means colder: the two layers go in opposite directions over the whole map
        float[] change = SampleRun.raster("shared/height-change").band();
        float[] minimum = SampleRun.raster("shared/mean-minimum").band();
        double sum = 0;
        double[] means = new double[2];
        int n = 0;
        for (int cell = 0; cell < change.length; cell++) {
            if (change[cell] == change[cell] && minimum[cell] == minimum[cell]) {
                means[0] += change[cell];
                means[1] += minimum[cell];
                n++;
            }
        }
        for (int cell = 0; cell < change.length; cell++) {
            if (change[cell] == change[cell] && minimum[cell] == minimum[cell]) {
                sum += (change[cell] - means[0] / n) * (minimum[cell] - means[1] / n);
            }
        }
        assertTrue(sum < 0);
    }

    @Test
    void choiceCountsTheCultivarsThatMeetTheTarget() {
        RasterFile choice = SampleRun.raster("shared/choice");
        float[] best = choice.bands()[1];
        for (int cell = 0; cell < best.length; cell++) {
            float highest = Float.NaN;
            int meeting = 0;
            for (String cultivar : CULTIVARS) {
                float low = band(cultivar, "margin-low")[cell];
                highest = highest >= low ? highest : low;
                meeting += band(cultivar, "damage-probability-50")[cell] <= 0.1f ? 1 : 0;
            }
            assertEquals(highest, best[cell]);
            assertEquals(Float.isNaN(highest) ? Float.NaN : meeting, choice.bands()[0][cell]);
        }
    }

    @Test
    void theSeaAndTheHolesOfTheTerrainModelStayMissing() {
        RasterFile margin = SampleRun.raster("amber/winters/margin");
        assertTrue(Float.isNaN(margin.value(0, 179, 239)), "the south-eastern corner is sea");
        assertTrue(margin.valid(0) > 40_000 && margin.valid(0) < 240 * 180);
    }

    private static float[] band(String cultivar, String layer) {
        return SampleRun.raster(cultivar + "/" + layer).band();
    }

    private static List<String> texts(JsonNode array) {
        List<String> texts = new ArrayList<>();
        array.forEach(item -> texts.add(item.asText()));
        return texts;
    }

    private static List<String> names(JsonNode object) {
        List<String> names = new ArrayList<>();
        object.fieldNames().forEachRemaining(names::add);
        return names;
    }

    private static String sha256(byte[] bytes) throws Exception {
        return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    }
}
