package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.FitQuality;
import org.wintersill.climatology.extreme.LowExtreme;
import org.wintersill.climatology.extreme.ParametricBootstrap;
import org.wintersill.climatology.extreme.RankTrend;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** Layers of fits, bounds and trends over 30 invented winters, against the estimators on the winters that the same run wrote. */
class WinterStatisticsTest {
    private static final String RUN = "temperature: {minimum: daily}\ncultivars: {files: cultivars.yaml, use: [oat]}\n"
            + "statistics: {target: [0.1, 0.05], bootstrap: {replicates: 40, seed: 9}, return-periods: [20], cold-night: -7.5}\n"
            + "outputs: {layers: [%s], geopackage: false}\n";
    @TempDir
    static Path shared;
    private static RunFolder run;
    private static ColdRecord record;

    @BeforeAll
    static void mapOnce() {
        record = ColdRecord.made(3, 5, CfCalendar.STANDARD, new CfDate(1970, 8, 20), new CfDate(2000, 6, 10), false, 3)
                .changed((day, cell, tenths) -> cell == 7 && day < 400 ? ColdRecord.MISSING : tenths + (cell % 5 == 0 ? day / 150 : 0));
        run = RunFolder.of(shared, new RecordFile(record)).text("run.yaml", RUN.formatted("all")).map();
    }

    /** Values of a cell over the winters that count. */
    private static double[] lows(String layer, int cell) {
        RasterFile file = run.raster(layer);
        return Arrays.stream(file.bands()).mapToDouble(band -> band[cell]).filter(v -> !Double.isNaN(v)).toArray();
    }

    private static float value(String layer, int cell) {
        return run.raster(layer).band()[cell];
    }

    @Test
    void fitsAreThoseOfTheWintersWritten() {
        ParametricBootstrap bootstrap = new ParametricBootstrap(40, 9, 30);
        for (int cell = 0; cell < 15; cell++) {
            for (String field : new String[] {"minimum", "margin"}) {
                String place = field.equals("minimum") ? "shared/" : "oat/";
                double[] values = lows(place + "winters/" + field, cell);
                int n = values.length;
                assertEquals(cell == 7 ? 29 : 30, n);
                LowExtreme.toSortedMaxima(values, n);
                ExtremeFit fit = ExtremeFit.of(values, n, ExtremeFit.Method.L_MOMENTS);
                String level = place + "return-level-" + field + "-20";
                assertEquals(LowExtreme.returnLevel(fit.gev(), 20), value(level, cell), 1e-4);
                double[] bounds = bootstrap.of(fit, n, cell, false).bounds(gev -> LowExtreme.returnLevel(gev, 20), 0.9);
                assertEquals(bounds[0], value(level + "-lower", cell), 1e-4);
                assertEquals(bounds[1], value(level + "-upper", cell), 1e-4);
                assertTrue(bounds[0] < value(level, cell) && value(level, cell) < bounds[1]);
                assertEquals(fit.gev().shape(), value(place + "extreme-shape-" + field, cell), 1e-6);
                assertEquals(-fit.gev().location(), value(place + "extreme-location-" + field, cell), 1e-4);
                assertEquals(FitQuality.plotCorrelation(values, n, fit.gev()), value(place + "fit-correlation-" + field, cell), 1e-6);
                float lowest = value(place + "lowest-possible-" + field, cell);
                assertEquals(fit.gev().shape() >= 0, Float.isNaN(lowest));
                float flag = value(place + "fit-flag-" + field, cell);
                assertTrue(flag >= 1 && flag <= 4);
                assertTrue(flag == 3 || flag == 4 || !(lowest > -values[n - 1]));
                assertTrue(value(place + "fit-test-" + field, cell) > 0.02);
            }
        }
    }

    @Test
    void theFittedReturnPeriodLiesInItsBoundsAndNearTheCounts() {
        int near = 0;
        for (int cell = 0; cell < 15; cell++) {
            float period = value("oat/return-period-killing", cell);
            assertTrue(value("oat/return-period-killing-lower", cell) <= period);
            float upper = value("oat/return-period-killing-upper", cell);
            assertTrue(Float.isNaN(upper) || period <= upper);
            float counted = value("oat/damage-probability-50", cell);
            near += Math.abs(1 / period - counted) < 0.12 ? 1 : 0;
            float fitted = value("oat/damage-mean-fitted", cell);
            assertEquals(value("oat/damage-mean", cell), fitted, 0.05);
            assertTrue(value("oat/damage-mean-lower", cell) < value("oat/damage-mean", cell));
            assertTrue(value("oat/damage-mean", cell) < value("oat/damage-mean-upper", cell));
            assertTrue(value("oat/required-hardiness-lower", cell) <= value("oat/required-hardiness", cell));
            assertTrue(value("oat/required-hardiness", cell) <= value("oat/required-hardiness-upper", cell));
            assertTrue(value("oat/required-hardiness", cell) <= value("oat/required-hardiness-at-5", cell));
        }
        assertTrue(near >= 13, near + " of 15 cells agree");
    }

    @Test
    void trendsAreFoundWhereTheyWereMade() {
        for (int cell = 0; cell < 15; cell++) {
            double[] values = lows("shared/winters/minimum", cell);
            int first = 30 - values.length;
            double[] years = new double[values.length];
            for (int i = 0; i < years.length; i++) {
                years[i] = 1971 + first + i;
            }
            RankTrend trend = RankTrend.of(years, values, values.length);
            assertEquals(10 * trend.slope(), value("shared/trend-minimum", cell), 1e-4);
            assertEquals(trend.pValue(), value("shared/trend-minimum-test", cell), 1e-6);
            boolean made = cell % 5 == 0;
            assertEquals(made ? 3 : 2, value("shared/trend-minimum-significant", cell), "cell " + cell);
            assertTrue(value("shared/trend-minimum-location", cell) > 0 || !made);
            assertTrue(value("shared/trend-minimum-location-test", cell) < 0.01 || !made);
        }
    }

    @Test
    void explainTellsTheVeryNumbersOfTheMap() throws Exception {
        for (int cell : new int[] {0, 7, 13}) {
            Program.Ended ended = Program.run("explain", run.path("run.yaml").toString(), "--at",
                    (-9.75 + 0.5 * (cell % 5)) + "," + (49.75 - 0.5 * (cell / 5)), "--statistics", "--json").expect(0);
            JsonNode document = new ObjectMapper().readTree(ended.out());
            assertEquals(cell == 7 ? 29 : 30, document.get("winters").asInt());
            int compared = agree(document.get("layers"), "shared/", cell) + agree(document.at("/cultivars/0/layers"), "oat/", cell);
            assertTrue(compared > 50, compared + " layers compared");
            JsonNode fit = document.at("/cultivars/0/margin-fit");
            JsonNode level = fit.at("/return-levels/20");
            assertTrue(level.get("lower").asDouble() < level.get("level").asDouble() && level.get("level").asDouble() < level.get("upper").asDouble());
            assertTrue(Math.abs(level.get("level").asDouble() - value("oat/return-level-margin-20", cell)) < 2, "both estimators are near each other");
        }
    }

    private static int agree(JsonNode layers, String place, int cell) {
        int compared = 0;
        for (java.util.Iterator<String> ids = layers.fieldNames(); ids.hasNext();) {
            String id = ids.next();
            float expected = value(place + id, cell);
            assertEquals(Float.isNaN(expected), layers.get(id).isNull(), id);
            assertTrue(Float.isNaN(expected) || expected == (float) layers.get(id).asDouble(), id + ": " + expected + " " + layers.get(id));
            compared++;
        }
        return compared;
    }

    @Test
    void aChartShowsReturnPeriodsAndTheTableIsForReaders() throws Exception {
        String[] words = {"explain", run.path("run.yaml").toString(), "--at", "-8.7,49.2", "--statistics"};
        List<String> drawn = new ArrayList<>(List.of(words));
        drawn.addAll(List.of("--chart", run.path("periods.svg").toString()));
        String table = Program.run(drawn.toArray(String[]::new)).expect(0).out();
        assertTrue(table.contains("Statistics over 29 winters") || table.contains("Statistics over 30 winters"), table);
        assertTrue(table.contains("maximum likelihood, profile intervals") && table.contains("return-level-margin-20"), table);
        String svg = Files.readString(run.path("periods.svg"));
        assertTrue(svg.contains("fitted distribution") && svg.contains("once in so many winters"), "the chart is one of return periods");
        List<String> rows = new ArrayList<>(List.of(words));
        rows.add("--csv");
        String csv = Program.run(rows.toArray(String[]::new)).expect(0).out();
        assertTrue(csv.startsWith("cultivar,layer,unit,value,lower,upper,winters\n"), csv);
        assertTrue(csv.contains("oat,required-hardiness,K,"), csv);
        List<String> both = new ArrayList<>(List.of(words));
        both.addAll(List.of("--winter", "1980-81"));
        Program.run(both.toArray(String[]::new)).expect(2);
    }

    @Test
    void statisticsAreMadeAnewFromKeptWintersWithTheSameBytes() {
        String[] keep = {"--set", "outputs.keep-winters=true", "--set", "outputs.geopackage=true", "--set", "outputs.layers=[default, trends]"};
        run.map(arguments(keep, "--out", run.path("kept").toString()));
        run.map(arguments(keep, "--out", run.path("again").toString(), "--winters-from", run.path("kept").toString()));
        assertEquals(List.of(), RunFolder.differing(RunFolder.files(run.path("kept")), RunFolder.files(run.path("again"))));
        String[] other = arguments(keep, "--set", "statistics.interval=0.8", "--set", "classes=[0.1, 0.2, 0.3]", "--set", "damage.killing=10");
        run.map(arguments(other, "--out", run.path("direct").toString()));
        run.map(arguments(other, "--out", run.path("anew").toString(), "--winters-from", run.path("kept").toString()));
        assertEquals(List.of(), RunFolder.differing(RunFolder.files(run.path("direct")), RunFolder.files(run.path("anew"))));
        assertTrue(RunFolder.differing(RunFolder.files(run.path("kept")), RunFolder.files(run.path("anew"))).contains("summary.csv"));
    }

    @Test
    void wintersOfAnotherRunAreRefused() throws Exception {
        String kept = run.path("own").toString();
        run.map("--set", "outputs.keep-winters=true", "--out", kept);
        String out = run.path("refused").toString();
        Program.Ended other = run.end("--winters-from", kept, "--out", out, "--set", "missing-days=none").expect(3);
        assertTrue(other.err().contains("not those of this run"), other.err());
        Program.Ended none = run.end("--winters-from", run.path("out").toString(), "--out", out).expect(3);
        assertTrue(none.err().contains("outputs.keep-winters"), none.err());
        byte[] bytes = Files.readAllBytes(run.path("own/winters.planes"));
        bytes[bytes.length / 2] ^= 1;
        Files.write(run.path("own/winters.planes"), bytes);
        assertTrue(run.end("--winters-from", kept, "--out", out).expect(3).err().contains("not the one that the run wrote"));
        assertFalse(Files.exists(run.path("refused")));
    }

    private static String[] arguments(String[] first, String... more) {
        List<String> all = new ArrayList<>(List.of(first));
        all.addAll(List.of(more));
        return all.toArray(String[]::new);
    }

    /** Counted from the record itself: tenths of a degree on the source grid, winter 1980-81, no elevation. */
    @Test
    void coldNightsAndSpellsAreCountedFromTheRecord() {
        for (int cell : new int[] {0, 4, 7, 14}) {
            int below = 0;
            int streak = 0;
            int longest = 0;
            for (int day = record.day(new CfDate(1980, 9, 1)); day <= record.day(new CfDate(1981, 5, 31)); day++) {
                boolean cold = record.tenths()[day][cell] < -75;
                below += cold ? 1 : 0;
                streak = cold ? streak + 1 : 0;
                longest = Math.max(longest, streak);
            }
            assertTrue(below > 3);
            assertEquals(below, run.raster("shared/winters/cold-nights").value(10, cell / 5, cell % 5));
            assertEquals(longest, run.raster("shared/winters/cold-spell").value(10, cell / 5, cell % 5));
            assertEquals(Arrays.stream(lows("shared/winters/cold-nights", cell)).average().orElseThrow(), value("shared/cold-nights-mean", cell), 1e-4);
            assertEquals(Arrays.stream(lows("shared/winters/cold-spell", cell)).average().orElseThrow(), value("shared/cold-spell-mean", cell), 1e-4);
        }
    }

    @Test
    void threadsAndMemoryDoNotShow() {
        run.map("--threads", "1", "--out", run.path("one").toString());
        run.map("--threads", "3", "--memory", "64m", "--out", run.path("three").toString());
        Map<String, byte[]> expected = RunFolder.files(run.path("out"));
        assertEquals(List.of(), RunFolder.differing(expected, RunFolder.files(run.path("one"))));
        assertEquals(List.of(), RunFolder.differing(expected, RunFolder.files(run.path("three"))));
    }

    @Test
    void groupsAndTheDefaultLayersAreAskedForByWord() {
        run.text("words.yaml", RUN.formatted("default, trends, return-level-minimum-20"));
        Program.run("map", run.path("words.yaml").toString(), "--out", run.path("words").toString()).expect(0);
        assertTrue(Files.exists(run.path("words/oat/damage-mean.tif")));
        assertTrue(Files.exists(run.path("words/oat/trend-margin.tif")));
        assertTrue(Files.exists(run.path("words/shared/return-level-minimum-20.tif")));
        assertFalse(Files.exists(run.path("words/shared/return-level-minimum-20-lower.tif")));
        Program.run("map", run.path("words.yaml").toString(), "--out", run.path("likely").toString(), "--set", "outputs.layers=default",
                "--set", "statistics.extremes=maximum-likelihood").expect(0);
        assertTrue(Files.exists(run.path("likely/oat/return-level-margin-20.tif")), "an estimator that is named makes its layers default ones");
        Program.Ended none = Program.run("map", run.path("words.yaml").toString(), "--out", run.path("none").toString(), "--set",
                "statistics.extremes=none").expect(2);
        assertTrue(none.err().contains("return-level-minimum-20"), none.err());
    }

    @Test
    void fewerThanTwentyWintersAreFittedToNothingAndTheRunSaysSo(@TempDir Path folder) {
        RunFolder few = RunFolder.of(folder, new RecordFile(ColdRecord.threeWinters(2, 2)))
                .text("run.yaml", RUN.formatted("default, extremes"));
        Program.Ended ended = few.end();
        ended.expect(0);
        assertTrue(ended.err().contains("only 3 complete winters: no extreme value distribution"), ended.err());
        List<String> fits = new ArrayList<>(RunFolder.files(folder.resolve("out")).keySet());
        fits.removeIf(name -> !name.matches(".*(return-level|fit-).*"));
        assertEquals(List.of(), fits);
    }
}
