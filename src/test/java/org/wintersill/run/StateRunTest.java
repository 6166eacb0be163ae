package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** Whole runs with cultivars that follow the temperatures: bytes, gaps, explanations, refusals. All numbers are invented. */
class StateRunTest {
    private static final ColdRecord MINIMA = ColdRecord.threeWinters(6, 5).changed((day, cell, value) ->
            cell == 7 && day % 41 == 0 ? ColdRecord.MISSING : value);
    private static final ColdRecord MAXIMA = MINIMA.changed((day, cell, value) ->
            cell == 7 && day % 53 == 0 ? ColdRecord.MISSING : value == ColdRecord.MISSING ? 90 : value + 70 + (day * 7 + cell * 3) % 50);
    private static final String VINE = "  - {id: vine, name: Test vine, species: none, organ: bud, model: thermal-time, source: made up, "
            + "status: own data, initial: -10, hardy-limit: -24, tender-limit: -2, endodormancy: {threshold: 12, acclimation: 0.1, "
            + "deacclimation: 0.06}, ecodormancy: {threshold: 4, acclimation: 0.05, deacclimation: 0.12, power: 5}, chilling: -600, "
            + "budbreak: -2.2, lt10-above: 2, lt90-below: 3}\n";
    @TempDir
    static Path shared;
    @TempDir
    Path folder;
    private static RunFolder inputs;
    private static Map<String, byte[]> expected;

    private static RunFolder prepared(Path folder, ColdRecord minima, ColdRecord maxima) {
        RunFolder run = RunFolder.of(folder, new RecordFile(minima));
        new RecordFile(maxima).quantity("maximum").write(run.path("tmax.nc"));
        run.text("cultivars.yaml", RunFolder.cultivars(0) + VINE);
        run.text("run.yaml", "title: Following\ntemperature: {minimum: daily, maximum: tmax.nc}\ncultivars: cultivars.yaml\n");
        return run;
    }

    @BeforeAll
    static void mapOnce() {
        inputs = prepared(shared, MINIMA, MAXIMA);
        int side = 3;
        float[] metres = new float[6 * side * 5 * side];
        for (int i = 0; i < metres.length; i++) {
            metres[i] = i % 47 == 0 ? Float.NaN : 300 + 250 * (float) Math.sin(i % (5 * side) * 0.7) + i % 13;
        }
        RecordInTiff.heights(inputs.path("dem.tif"), new GridGeometry(5 * side, 6 * side, MINIMA.west(), MINIMA.north(),
                MINIMA.step() / side, MINIMA.step() / side, new GeoToolsCrs().wgs84()), metres);
        inputs.text("run.yaml", "title: Following\ntemperature: {minimum: daily, maximum: tmax.nc}\ncultivars: cultivars.yaml\n"
                + "elevation: {dem: dem.tif, source-height: dem-mean, lapse-rate: 5.5}\n");
        inputs.map("--threads", "1");
        expected = RunFolder.files(inputs.path("out"));
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 8})
    void threadsDoNotShow(int threads) {
        inputs.map("--threads", Integer.toString(threads), "--out", inputs.path("threads-" + threads).toString());
        assertEquals(List.of(), RunFolder.differing(expected, RunFolder.files(inputs.path("threads-" + threads))));
    }

    @Test
    void theRecordNamesTheMaxima() throws Exception {
        JsonNode record = new ObjectMapper().readTree(expected.get("record.json"));
        JsonNode file = record.get("inputs").get(1);
        assertEquals("maximum temperature", file.get("role").asText());
        assertEquals("tmax.nc", file.get("path").asText());
        assertEquals(64, file.get("sha256").asText().length());
        assertEquals("thermal-time", record.get("cultivars").get(2).get("model").asText());
    }

    /** What is explained of a cell is what the map shows there, to the bit, and the nights lead to it. */
    @Test
    void explanationsAgreeWithTheMap() throws Exception {
        RasterFile margin = inputs.raster("vine/winters/margin");
        RasterFile damage = inputs.raster("vine/winters/damage");
        RasterFile worst = inputs.raster("vine/winters/worst-night");
        int known = 0;
        for (int cell = 0; cell < 18 * 15; cell += 23) {
            double x = MINIMA.west() + MINIMA.step() / 3 * (cell % 15 + 0.5);
            double y = MINIMA.north() - MINIMA.step() / 3 * (cell / 15 + 0.5);
            JsonNode winters = explain("--at", x + "," + y);
            for (int w = 0; w < winters.size(); w++) {
                JsonNode winter = winters.get(w);
                float expectedMargin = margin.value(w, cell / 15, cell % 15);
                assertEquals(!Float.isNaN(expectedMargin), winter.get("valid").asBoolean());
                assertEquals(Float.isNaN(expectedMargin), winter.get("margin").isNull());
                if (Float.isNaN(expectedMargin)) {
                    continue;
                }
                known++;
                assertEquals(expectedMargin, (float) winter.get("margin").asDouble());
                assertEquals(damage.value(w, cell / 15, cell % 15), (float) winter.get("damage").asDouble());
                double lowest = Double.POSITIVE_INFINITY;
                double most = 0;
                int lowestNight = -1;
                for (int night = 0; night < winter.get("nights").size(); night++) {
                    JsonNode row = winter.get("nights").get(night);
                    assertEquals(night < 6, row.get("lt50").isNull(), "the state begins on 7 September");
                    if (!row.get("margin").isNull()) {
                        assertEquals(row.get("tmin").asDouble() - row.get("lt50").asDouble(), row.get("margin").asDouble(), 1e-5);
                        assertEquals(2, row.get("lt10").asDouble() - row.get("lt50").asDouble(), 1e-5);
                        assertEquals(3, row.get("lt50").asDouble() - row.get("lt90").asDouble(), 1e-5);
                        most = Math.max(most, row.get("damage").asDouble());
                        if (row.get("margin").asDouble() < lowest) {
                            lowest = row.get("margin").asDouble();
                            lowestNight = night;
                        }
                    }
                }
                assertEquals(expectedMargin, (float) lowest);
                assertEquals(worst.value(w, cell / 15, cell % 15), lowestNight);
                assertEquals(most, winter.get("damage").asDouble(), 1e-5);
            }
        }
        assertTrue(known > 20, "winters with a value: " + known);
    }

    private JsonNode explain(String... place) throws Exception {
        return new ObjectMapper().readTree(Program.run("explain", inputs.path("run.yaml").toString(), place[0], place[1], "--cultivar",
                "vine", "--json").expect(0).out()).get("cultivars").get(0).get("winters");
    }

    /** The state of a night is that of the day before: what the step of the model makes of it stands in the next night. */
    @Test
    void nightsFollowTheMeanOfTheDayBefore() throws Exception {
        JsonNode nights = explain("--at", "-8.9,48.9").get(1).get("nights");
        boolean cooled = false;
        int checked = 0;
        for (int night = 6; night < 80; night++) {
            double h = nights.get(night).get("lt50").asDouble();
            double mean = nights.get(night).get("tmean").asDouble();
            double cold = Math.min(0, mean - 12);
            double loss = cooled ? 0.06 * Math.max(0, mean - 12) * (1 - (h + 24) / 22) : 0;
            double next = Math.min(-2, Math.max(-24, h + loss + 0.1 * cold * (1 - (-2 - h) / 22)));
            cooled |= cold < 0;
            assertEquals(next, nights.get(night + 1).get("lt50").asDouble(), 1e-5, "night " + (night + 1));
            checked += cooled ? 1 : 0;
        }
        assertTrue(checked > 10, "nights after the first cooling: " + checked);
    }

    /** Gaps of up to three days are filled; a longer one takes the winter from the cultivar that follows, and from no other. */
    @ParameterizedTest
    @CsvSource({"3, true", "4, false"})
    void longGapsTakeTheWinter(int length, boolean valid) {
        int gap = MAXIMA.day(new CfDate(2002, 12, 10));
        ColdRecord masked = MAXIMA.changed((day, cell, value) -> cell == 2 && day >= gap && day < gap + length ? ColdRecord.MISSING : value);
        RunFolder run = prepared(folder, MINIMA, masked).map();
        assertEquals(valid, !Float.isNaN(run.raster("vine/winters/margin").value(1, 0, 2)));
        assertFalse(Float.isNaN(run.raster("oat/winters/margin").value(1, 0, 2)));
        assertFalse(Float.isNaN(run.raster("vine/winters/margin").value(0, 0, 2)));
        assertFalse(Float.isNaN(run.raster("vine/winters/margin").value(1, 0, 3)));
        assertEquals(3, run.raster("shared/valid-winters").value(0, 0, 2));
    }

    @Test
    void maximaBelowMinimaAreCountedOnce() throws Exception {
        int first = MAXIMA.day(new CfDate(2002, 12, 10));
        ColdRecord odd = MAXIMA.changed((day, cell, value) -> day == first && cell < 4 ? MINIMA.tenths()[day][cell] - 5 : value);
        RunFolder run = prepared(folder, MINIMA, odd).map();
        JsonNode notices = new ObjectMapper().readTree(RunFolder.files(run.path("out")).get("record.json")).get("notices");
        assertEquals(4, notices.get("daily maxima lie below the minimum of their day; the mean is taken from them as they are").asInt());
    }

    /** With a constant range the mean is the minimum and half of it: the same bytes as from maxima that say so. */
    @Test
    void aDailyRangeStandsForMaxima() {
        RunFolder run = prepared(folder, MINIMA, MINIMA.changed((day, cell, value) -> value == ColdRecord.MISSING ? value : value + 90)).map();
        run.text("run.yaml", "title: Following\ntemperature: {minimum: daily, daily-range: 9}\ncultivars: cultivars.yaml\n");
        run.map("--out", run.path("range").toString());
        float[][] files = RasterFile.read(run.path("out/vine/winters/margin.tif")).bands();
        float[][] range = RasterFile.read(run.path("range/vine/winters/margin.tif")).bands();
        for (int w = 0; w < files.length; w++) {
            for (int cell = 0; cell < files[w].length; cell++) {
                assertEquals(files[w][cell], range[w][cell], 1e-5);
            }
        }
    }

    @Test
    void wintersThatBeginBeforeTheMeanIsKnownAreLeftOut() {
        RunFolder run = prepared(folder, MINIMA, MAXIMA.between(new CfDate(2001, 9, 8), new CfDate(2004, 6, 10)));
        Program.Ended ended = run.end().expect(0);
        assertTrue(ended.err().contains("winter 2001-02 is not used: cultivar vine begins on 2001-09-07, and the daily mean is only known "
                + "from 2001-09-08 on"), ended.err());
        assertEquals(2, run.raster("oat/winters/margin").bands().length);
    }

    @Test
    void absentDaysInARowAreToldBeforehand() {
        long from = CfCalendar.STANDARD.dayNumber(new CfDate(2003, 3, 1));
        RunFolder run = prepared(folder, MINIMA, MAXIMA.keep(day -> MAXIMA.days()[day] < from || MAXIMA.days()[day] > from + 4));
        Program.Ended ended = run.end().expect(0);
        assertTrue(ended.err().contains("winter 2002-03 has no values for cultivar vine: the daily mean is absent on 2003-03-01..2003-03-05"),
                ended.err());
        assertTrue(Float.isNaN(run.raster("vine/winters/margin").value(1, 1, 1)));
        assertFalse(Float.isNaN(run.raster("oat/winters/margin").value(1, 1, 1)));
    }

    @Test
    void refusesWhatDoesNotFit() {
        RunFolder run = prepared(folder, MINIMA, MAXIMA);
        run.text("run.yaml", "temperature: {minimum: daily}\ncultivars: cultivars.yaml\n");
        assertSays(run.end().expect(2), "cultivar vine has the model thermal-time", "temperature.daily-range");
        run.text("run.yaml", "temperature: {minimum: daily, maximum: tmax.nc, daily-range: 8}\ncultivars: cultivars.yaml\n");
        assertSays(run.end().expect(2), "daily-range and maximum are both given", "run.yaml:1");
        run.text("run.yaml", "temperature: {minimum: daily, daily-range: 80}\ncultivars: cultivars.yaml\n");
        assertSays(run.end().expect(2), "daily-range", "60");
        run.text("run.yaml", "temperature: {minimum: daily, maximum: tmax.nc}\ncultivars: cultivars.yaml\nwinter: {from: 11-01, to: 10-15, "
                + "complete: 11-01..04-30}\n");
        assertSays(run.end().expect(2), "cultivar vine needs daily means from 2001-09-07 on", "the winter before ends on");
        run.text("run.yaml", "temperature: {minimum: daily, maximum: tmax.nc}\ncultivars: cultivars.yaml\n");
        new RecordFile(MAXIMA.at(-9.5, 50, 0.5)).quantity("maximum").write(run.path("tmax.nc"));
        assertSays(run.end().expect(3), "the grid of the daily maximum is", "tmax.nc");
        new RecordFile(MAXIMA.keep(day -> day > 300)).calendar("proleptic_gregorian").quantity("maximum").write(run.path("tmax.nc"));
        assertSays(run.end().expect(3), "the calendar of the daily maximum is proleptic_gregorian", "tmax.nc");
        new RecordFile(MAXIMA).write(run.path("tmax.nc"));
        assertSays(run.end().expect(3), "tmax.nc");
    }

    private static void assertSays(Program.Ended ended, String... texts) {
        for (String text : texts) {
            assertTrue(ended.err().contains(text), ended.err());
        }
    }

    /** A run without such cultivars does not read the maxima. */
    @Test
    void maximaAreNotReadWhereNobodyNeedsThem() {
        RunFolder run = prepared(folder, MINIMA, MAXIMA);
        run.text("tmax.nc", "no netCDF at all");
        run.text("run.yaml", "temperature: {minimum: daily, maximum: tmax.nc}\ncultivars: {files: cultivars.yaml, use: [oat]}\n");
        assertTrue(run.end().expect(0).err().contains("no model of this run needs the daily mean"));
    }
}
