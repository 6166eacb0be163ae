package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TimeZone;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.config.ConfigReader;
import org.wintersill.config.RunConfig;
import org.wintersill.engine.FoldPlan;
import org.wintersill.engine.FoldPlanner;
import org.wintersill.engine.Progress;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

/** The same inputs give the same bytes of every file, however and wherever the work is done. */
class SameBytesLaws {
    private static final ColdRecord RECORD = ColdRecord.threeWinters(12, 10);
    @TempDir
    static Path shared;
    private static RunFolder inputs;
    private static Map<String, byte[]> expected;

    @BeforeAll
    static void mapOnce() {
        inputs = RunFolder.of(shared, new RecordFile(RECORD));
        int side = 4;
        float[] metres = new float[12 * side * 10 * side];
        for (int i = 0; i < metres.length; i++) {
            metres[i] = i % 97 == 0 ? Float.NaN : 300 + 250 * (float) Math.sin(i % (10 * side) * 0.7) + i % 13;
        }
        RecordInTiff.heights(inputs.path("dem.tif"), new GridGeometry(10 * side, 12 * side, RECORD.west(), RECORD.north(),
                RECORD.step() / side, RECORD.step() / side, new GeoToolsCrs().wgs84()), metres);
        inputs.text("run.yaml", "title: Same bytes\ntemperature: {minimum: daily}\ncultivars: cultivars.yaml\n"
                + "elevation: {dem: dem.tif, source-height: dem-mean, lapse-rate: 5.5}\noutputs: {netcdf: true, cells: true}\n");
        inputs.map("--threads", "1");
        expected = RunFolder.files(inputs.path("out"));
        assertTrue(expected.containsKey("layers.gpkg") && expected.containsKey("record.json"));
        assertTrue(expected.keySet().stream().anyMatch(name -> name.endsWith(".nc")), "the CF files are written");
    }

    private static void assertSameBytes(String folder) {
        assertEquals(List.of(), RunFolder.differing(expected, RunFolder.files(inputs.path(folder))));
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 8})
    void threadsAndFolderDoNotShow(int threads) {
        inputs.map("--threads", Integer.toString(threads), "--out", inputs.path("threads-" + threads).toString());
        assertSameBytes("threads-" + threads);
    }

    @ParameterizedTest
    @CsvSource({"tr, TR, Asia/Kathmandu", "ar, EG, Pacific/Kiritimati", "de, CH, America/St_Johns", "hi, IN, Pacific/Apia"})
    void languageAndTimeZoneDoNotShow(String language, String country, String zone) {
        Locale locale = Locale.getDefault();
        TimeZone timeZone = TimeZone.getDefault();
        try {
            Locale.setDefault(new Locale.Builder().setLanguage(language).setRegion(country)
                    .setUnicodeLocaleKeyword("nu", language.equals("ar") ? "arab" : language.equals("hi") ? "deva" : "latn").build());
            TimeZone.setDefault(TimeZone.getTimeZone(zone));
            inputs.map("--out", inputs.path(language).toString());
        } finally {
            Locale.setDefault(locale);
            TimeZone.setDefault(timeZone);
        }
        assertSameBytes(language);
    }

    @Test
    void bandsAndBatchesDoNotShow() {
        GeoToolsCrs crs = new GeoToolsCrs();
        RunConfig config = ConfigReader.read(inputs.path("run.yaml"), Map.of("outputs.folder", "bands"));
        Notices notices = new Notices();
        RunPlan whole = new RunPlanner(new InputFormats(crs), crs).plan(config, notices);
        List<FoldPlan> cuts = otherCuts(whole);
        assertTrue(cuts.size() >= 2, "the work can be cut in several ways");
        for (FoldPlan cut : List.of(cuts.get(0), cuts.get(cuts.size() / 2), cuts.get(cuts.size() - 1))) {
            RunPlan other = new RunPlan(config, whole.source(), whole.target(), whole.adjustment(), whole.window(), whole.dropped(),
                    whole.cultivars(), whole.choices(), whole.job(), cut, whole.estimate());
            new MapRun(other, true, new InputFormats(crs), crs, Progress.silent(), planNotices(config)).execute(() -> false);
            assertSameBytes("bands");
        }
    }

    /** Notices stand in the record; each run needs its own. */
    private static Notices planNotices(RunConfig config) {
        GeoToolsCrs crs = new GeoToolsCrs();
        Notices notices = new Notices();
        new RunPlanner(new InputFormats(crs), crs).plan(config, notices);
        return notices;
    }

    /** Plans for less and less memory, as far as any is found, each cut in another way than the one before. */
    private static List<FoldPlan> otherCuts(RunPlan whole) {
        List<FoldPlan> cuts = new ArrayList<>();
        FoldPlan last = whole.foldPlan();
        try {
            for (int percent = 98; percent > 0; percent -= 2) {
                FoldPlan cut = new FoldPlanner(whole.job(), 2, last.memory().total() * percent / 100).plan();
                if (cut.bands().size() != last.bands().size() || cut.batchDays() != last.batchDays()) {
                    cuts.add(cut);
                    last = cut;
                    percent = 100;
                }
            }
        } catch (ProblemException e) {
            // nothing smaller fits
        }
        return cuts;
    }

    @Test
    void limitsAndQuietDoNotShow() {
        inputs.map("--out", inputs.path("flags").toString(), "--memory", "200m", "--set", "limits.threads=3", "--quiet");
        assertSameBytes("flags");
    }

    @Test
    void aSecondRunInPlaceOfTheFirstGivesTheSame() throws Exception {
        inputs.map("--out", inputs.path("twice").toString());
        Files.writeString(inputs.path("twice/record.json"), "of another day");
        inputs.map("--out", inputs.path("twice").toString(), "--overwrite");
        assertSameBytes("twice");
    }
}
