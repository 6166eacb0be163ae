package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.wintersill.config.ConfigReader;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** What is explained of a cell is what the map shows there, to the bit. */
class ExplainAgreesWithMapTest {
    private static final int COLUMNS = 240;
    private static final int ROWS = 180;
    private static RunPlan plan;

    @BeforeAll
    static void planTheSampleRun() {
        GeoToolsCrs crs = new GeoToolsCrs();
        plan = new RunPlanner(new InputFormats(crs), crs).plan(ConfigReader.read(SampleRun.RUN_FILE, Map.of()), new Notices());
    }

    /** Corners, borders, the sea, holes of the terrain model, a cell with a dropped winter, and cells in between. */
    private static List<int[]> cells() {
        List<int[]> cells = new ArrayList<>(List.of(new int[] {0, 0}, new int[] {0, COLUMNS - 1}, new int[] {ROWS - 1, 0},
                new int[] {ROWS - 1, COLUMNS - 1}, new int[] {0, 117}, new int[] {ROWS - 1, 60}, new int[] {90, 0},
                new int[] {90, COLUMNS - 1}, new int[] {4, 5}, new int[] {5, 4}));
        float[] heights = SampleRun.raster("shared/height-change").band();
        float[] valid = SampleRun.raster("shared/valid-winters").band();
        int holes = 0;
        int fewer = 0;
        for (int cell = 0; cell < heights.length; cell++) {
            if (Float.isNaN(heights[cell]) && cell % COLUMNS < 150 && holes++ < 2
                    || valid[cell] == 11 && fewer++ % 400 == 0 && fewer < 1200) {
                cells.add(new int[] {cell / COLUMNS, cell % COLUMNS});
            }
        }
        for (int i = 1; cells.size() < 30; i++) {
            cells.add(new int[] {37 * i % ROWS, 101 * i % COLUMNS});
        }
        return cells;
    }

    @Test
    void everyWinterOfEveryCultivarAgreesToTheBit() throws Exception {
        int missing = 0;
        int dropped = 0;
        for (int[] cell : cells()) {
            double x = plan.target().centreX(cell[1]);
            double y = plan.target().centreY(cell[0]);
            JsonNode document = new ObjectMapper().readTree(ExplanationText.json(CellExplanation.of(plan, x, y, null)));
            int known = agree(document, cell);
            missing += known == 0 ? 1 : 0;
            dropped += known == 11 ? 1 : 0;
        }
        assertTrue(missing >= 2 && dropped >= 1, "cells without value " + missing + ", with a dropped winter " + dropped);
    }

    /** Number of winters with a value of the first cultivar. */
    private static int agree(JsonNode document, int[] cell) {
        int known = 0;
        for (JsonNode cultivar : document.get("cultivars")) {
            String id = cultivar.get("id").asText();
            for (int w = 0; w < cultivar.get("winters").size(); w++) {
                JsonNode winter = cultivar.get("winters").get(w);
                RasterFile margin = SampleRun.raster(id + "/winters/margin");
                String where = id + " " + winter.get("winter") + " row " + cell[0] + " column " + cell[1];
                assertEquals(margin.names()[w], winter.get("winter").asText());
                assertSame(margin.value(w, cell[0], cell[1]), winter.get("margin"), where);
                assertSame(SampleRun.raster(id + "/winters/damage").value(w, cell[0], cell[1]), winter.get("damage"), where);
                float night = SampleRun.raster(id + "/winters/worst-night").value(w, cell[0], cell[1]);
                assertEquals(!Float.isNaN(night), winter.get("valid").asBoolean(), where);
                assertEquals(Float.isNaN(night) ? "null" : date(winter.get("winter").asText(), (int) night),
                        winter.get("worst-night").asText(), where);
                known += id.equals("amber") && winter.get("valid").asBoolean() ? 1 : 0;
                nightsAgree(winter, SampleRun.raster("shared/winters/minimum").value(w, cell[0], cell[1]), where);
            }
        }
        return known;
    }

    private static void assertSame(float expected, JsonNode actual, String where) {
        assertEquals(Float.isNaN(expected), actual.isNull(), where);
        if (!actual.isNull()) {
            assertEquals(expected, (float) actual.asDouble(), where);
        }
    }

    private static String date(String winter, int night) {
        CfCalendar calendar = CfCalendar.STANDARD;
        return calendar.date(calendar.dayNumber(new CfDate(Integer.parseInt(winter.substring(0, 4)), 9, 1)) + night).toString();
    }

    private static void nightsAgree(JsonNode winter, float minimum, String where) {
        double lowest = Double.POSITIVE_INFINITY;
        double coldest = Double.POSITIVE_INFINITY;
        double most = 0;
        String worst = "null";
        String before = "";
        for (JsonNode night : winter.get("nights")) {
            String date = night.get("date").asText();
            assertTrue(date.compareTo(before) > 0, where);
            before = date;
            double lt50 = night.get("lt50").asDouble();
            assertTrue(night.get("lt10").asDouble() > lt50 && lt50 > night.get("lt90").asDouble(), where + " " + date);
            boolean missing = night.get("tmin").isNull();
            assertEquals(missing, night.get("margin").isNull(), where);
            assertEquals(missing, night.get("damage").isNull(), where);
            if (missing) {
                continue;
            }
            double margin = night.get("margin").asDouble();
            assertEquals(night.get("tmin").asDouble() - lt50, margin, 1e-5, where + " " + date);
            assertEquals(margin < 0, night.get("damage").asDouble() > 0.5, where + " " + date);
            if (margin < lowest) {
                lowest = margin;
                worst = date;
            }
            coldest = Math.min(coldest, night.get("tmin").asDouble());
            most = Math.max(most, night.get("damage").asDouble());
        }
        assertTrue(winter.get("nights").size() == 273 || winter.get("nights").size() == 274, where);
        if (winter.get("valid").asBoolean()) {
            assertEquals(lowest, winter.get("margin").asDouble(), where);
            assertEquals(most, winter.get("damage").asDouble(), 1e-5, where);
            assertEquals(minimum, (float) coldest, where);
            assertEquals(worst, winter.get("worst-night").asText(), where);
        }
    }

    @Test
    void theDocumentHasThePromisedShape() throws Exception {
        Program.Ended ended = Program.run("explain", SampleRun.RUN_FILE.toString(), "--at", "-37.5012,50.0011", "--winter", "2009-10",
                "--json").expect(0);
        JsonNode document = new ObjectMapper().readTree(ended.out());
        assertKeys(document, "version", "x", "y", "crs", "elevation", "cultivars");
        assertEquals(1, document.get("version").asInt());
        assertEquals(-37.5025, document.get("x").asDouble(), 1e-9);
        assertEquals(50.0025, document.get("y").asDouble(), 1e-9);
        assertEquals("EPSG:4326", document.get("crs").asText());
        assertEquals(3, document.get("cultivars").size());
        for (JsonNode cultivar : document.get("cultivars")) {
            assertKeys(cultivar, "id", "winters");
            assertEquals(1, cultivar.get("winters").size());
            JsonNode winter = cultivar.get("winters").get(0);
            assertKeys(winter, "winter", "valid", "margin", "damage", "worst-night", "autumn-share", "midwinter-share",
                    "spring-share", "nights");
            assertEquals(273, winter.get("nights").size());
            winter.get("nights").forEach(night ->
                    assertKeys(night, "date", "source", "tmin", "tmean", "phase", "lt10", "lt50", "lt90", "margin", "damage"));
        }
        int row = plan.target().rowAt(50.0011);
        int column = plan.target().columnAt(-37.5012);
        int winter = 4;
        assertSame(SampleRun.raster("amber/winters/margin").value(winter, row, column),
                document.get("cultivars").get(0).get("winters").get(0).get("margin"), "by the command");
    }

    private static void assertKeys(JsonNode object, String... keys) {
        List<String> names = new ArrayList<>();
        object.fieldNames().forEachRemaining(names::add);
        assertEquals(List.of(keys), names);
    }

    @Test
    void aPlaceByLongitudeAndLatitudeIsTheSameCell() {
        String[] common = {"explain", SampleRun.RUN_FILE.toString(), "--winter", "2016-17", "--cultivar", "slate", "--json"};
        String byGrid = Program.run(plus(common, "--at", "-37.2,49.8")).expect(0).out();
        String byGlobe = Program.run(plus(common, "--at-lonlat", "-37.2,49.8")).expect(0).out();
        assertEquals(byGrid, byGlobe);
    }

    private static String[] plus(String[] words, String... more) {
        List<String> all = new ArrayList<>(List.of(words));
        all.addAll(List.of(more));
        return all.toArray(String[]::new);
    }

    @Test
    void placesOutsideAreRefusedWithTheirReason() {
        Program.Ended swapped = Program.run("explain", SampleRun.RUN_FILE.toString(), "--at", "50,-37.5").expect(2);
        assertTrue(swapped.err().contains("swapped"), swapped.err());
        assertEquals("", swapped.out());
        Program.Ended winter = Program.run("explain", SampleRun.RUN_FILE.toString(), "--at", "-37.5,50", "--winter", "2015-16").expect(2);
        assertTrue(winter.err().contains("2014-15, 2016-17"), winter.err());
    }
}
