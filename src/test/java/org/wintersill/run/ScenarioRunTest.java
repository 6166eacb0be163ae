package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.config.ConfigReader;
import org.wintersill.config.RunConfig;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.grid.Block;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.scenario.ScenarioSource;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** Whole runs on scenarios whose outcome is known. */
class ScenarioRunTest {
    @TempDir
    Path folder;
    private final ColdRecord observed = ColdRecord.made(4, 5, CfCalendar.STANDARD, new CfDate(2001, 8, 1), new CfDate(2007, 7, 31), false, 3);

    private RunFolder run(ColdRecord past, ColdRecord future, String more) {
        RunFolder run = RunFolder.of(folder, new RecordFile(observed));
        new RecordFile(past).write(folder.resolve("past.nc"));
        new RecordFile(future).write(folder.resolve("future.nc"));
        String outputs = "outputs: {layers: [margin, damage, minimum, margin-mean, required-hardiness], geopackage: false}\n";
        run.text("run.yaml", "temperature: {minimum: daily}\ncultivars: cultivars.yaml\n" + outputs);
        return run.text("scenario.yaml", "temperature: {minimum: daily}\ncultivars: cultivars.yaml\n"
                + "scenario: {historical: past.nc, future: future.nc" + more + "}\n" + outputs);
    }

    private float[][] margins(String runFile, String out) {
        Program.run("map", folder.resolve(runFile).toString(), "--out", folder.resolve(out).toString()).expect(0);
        return RasterFile.read(folder.resolve(out).resolve("oat/winters/margin.tif")).bands();
    }

    @Test
    void aFutureLikeThePastChangesNothingToTheBit() {
        for (String method : List.of("quantile-delta", "monthly-delta")) {
            run(observed, observed, ", method: " + method);
            float[][] base = margins("run.yaml", "base-" + method);
            float[][] same = margins("scenario.yaml", "same-" + method);
            for (int winter = 0; winter < base.length; winter++) {
                assertEquals(0, Arrays.compare(base[winter], same[winter]), method + " winter " + winter);
            }
        }
    }

    @Test
    void aUniformWarmingMovesEveryMarginByAsMuch() {
        ColdRecord warmer = observed.changed((day, cell, tenths) -> tenths + 20);
        for (String more : List.of(", method: quantile-delta", ", method: monthly-delta", ", method: quantile-delta, pool: 31-days")) {
            run(observed, warmer, more);
            float[][] base = margins("run.yaml", "base" + more.hashCode());
            float[][] warm = margins("scenario.yaml", "warm" + more.hashCode());
            for (int winter = 0; winter < base.length; winter++) {
                for (int cell = 0; cell < base[winter].length; cell++) {
                    assertEquals(base[winter][cell] + 2, warm[winter][cell], 1e-5, more);
                }
            }
            float[] before = RasterFile.read(folder.resolve("base" + more.hashCode() + "/oat/required-hardiness.tif")).bands()[0];
            float[] after = RasterFile.read(folder.resolve("warm" + more.hashCode() + "/oat/required-hardiness.tif")).bands()[0];
            for (int cell = 0; cell < before.length; cell++) {
                assertEquals(before[cell] - 2, after[cell], 1e-5, more);
            }
        }
    }

    @Test
    void neitherMemoryNorThreadsShowInTheOutputs() {
        ColdRecord past = ColdRecord.made(4, 5, CfCalendar.NOLEAP, new CfDate(2001, 8, 1), new CfDate(2007, 7, 31), false, 4);
        ColdRecord future = ColdRecord.made(4, 5, CfCalendar.NOLEAP, new CfDate(2051, 8, 1), new CfDate(2057, 7, 31), false, 5);
        run(past, future, "");
        List<String[]> ways = List.of(new String[] {"--threads", "1"}, new String[] {"--threads", "3"}, new String[] {"--memory", "32m"});
        float[][] first = null;
        for (int way = 0; way < ways.size(); way++) {
            String out = folder.resolve("way" + way).toString();
            Program.run("map", folder.resolve("scenario.yaml").toString(), "--out", out, ways.get(way)[0], ways.get(way)[1]).expect(0);
            float[][] margins = RasterFile.read(Path.of(out, "oat/winters/margin.tif")).bands();
            first = first == null ? margins : first;
            for (int winter = 0; winter < first.length; winter++) {
                assertEquals(0, Arrays.compare(first[winter], margins[winter]));
            }
        }
        assertEquals(6, first.length);
    }

    @Test
    void rowsWorkedOutOneByOneAreTheSame() {
        ColdRecord past = ColdRecord.made(3, 4, CfCalendar.DAYS_360, new CfDate(2001, 8, 1), new CfDate(2007, 7, 30), false, 4).at(-10.5, 50.5, 1);
        run(past, past.changed((day, cell, tenths) -> tenths + day % 30), "");
        InputFormats formats = new InputFormats(new GeoToolsCrs());
        for (String pool : List.of("month", "31-days")) {
            RunConfig config = ConfigReader.read(folder.resolve("scenario.yaml"), Map.of("scenario.pool", pool, "scenario.regrid",
                    pool.equals("month") ? "bilinear" : "conservative"));
            ScenarioSource source = ScenarioPlan.of(config.scenario().orElseThrow(), formats.open(config.temperature().minimum(),
                    new Notices()), formats, new GeoToolsCrs(), new Notices());
            Block block = new Block(1, 1, 3, 2);
            float[] asked = read(source, block);
            try (Workers workers = new Workers(2, () -> false)) {
                source.prepare(folder.resolve(pool + ".tmp"), source.grid().whole(), 1 << 18, workers, Progress.silent());
                assertEquals(0, Arrays.compare(asked, read(source, block)));
            } finally {
                source.release();
            }
            assertTrue(IntStream.range(0, asked.length).noneMatch(i -> Float.isNaN(asked[i])));
            assertFalse(Files.exists(folder.resolve(pool + ".tmp")));
        }
    }

    private static float[] read(DailyTemperatureSource source, Block block) {
        float[] values = new float[source.days().size() * block.cells()];
        try (DailyTemperatureReader reader = source.open()) {
            reader.read(0, source.days().size(), block, values, 0, block.cells());
        }
        return values;
    }

    @Test
    void eachMemberIsARunOfItsOwn() throws Exception {
        run(observed, observed, "");
        for (String member : List.of("alder", "birch")) {
            Files.copy(folder.resolve("past.nc"), folder.resolve("past-" + member + ".nc"));
            Files.copy(folder.resolve("future.nc"), folder.resolve("future-" + member + ".nc"));
        }
        Files.writeString(folder.resolve("members.yaml"), Files.readString(folder.resolve("scenario.yaml"))
                .replace("past.nc", "'past-<member>.nc'").replace("future.nc", "'future-<member>.nc'"));
        Program.run("map", folder.resolve("members.yaml").toString(), "--out", folder.resolve("all").toString()).expect(0);
        for (String member : List.of("alder", "birch")) {
            assertTrue(Files.readString(folder.resolve("all/" + member + "/record.json")).contains("\"member\" : \"" + member + "\""));
        }
        Program.Ended unknown = Program.run("map", folder.resolve("members.yaml").toString(), "--set", "scenario.member=brich").expect(2);
        assertTrue(unknown.err().contains("Did you mean birch?"), unknown.err());
    }

    @Test
    void thePlanCountsTheDiskOfTheScenario() throws Exception {
        run(observed, observed, "");
        long[] bytes = new long[2];
        for (int i = 0; i < 2; i++) {
            Program.Ended plan = Program.run("plan", folder.resolve(i == 0 ? "run.yaml" : "scenario.yaml").toString(), "--json").expect(0);
            bytes[i] = new com.fasterxml.jackson.databind.ObjectMapper().readTree(plan.out()).findValue("working-disk-bytes").longValue();
        }
        assertEquals(4L * observed.days().length * 20, bytes[1] - bytes[0]);
    }

    @Test
    void aModelElsewhereIsRefused() {
        run(observed.at(100, 20, 0.5), observed.at(100, 20, 0.5), "");
        Program.Ended refused = Program.run("map", folder.resolve("scenario.yaml").toString()).expect(3);
        assertTrue(refused.err().contains("the model's grid nowhere meets the observed one"), refused.err());
    }
}
