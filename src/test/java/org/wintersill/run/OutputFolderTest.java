package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.config.ConfigReader;
import org.wintersill.engine.CancelledException;
import org.wintersill.engine.Progress;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** An output folder is complete or it is not there, whatever happens to the run. */
class OutputFolderTest {
    private static final ColdRecord RECORD = ColdRecord.made(3, 4, CfCalendar.STANDARD, new CfDate(2001, 9, 1),
            new CfDate(2003, 5, 31), false, 5);
    @TempDir
    Path folder;
    private RunFolder run;

    @BeforeEach
    void makeInputs() {
        run = RunFolder.of(folder, new RecordFile(RECORD));
    }

    private MapRun job(boolean overwrite) {
        GeoToolsCrs crs = new GeoToolsCrs();
        Notices notices = new Notices();
        RunPlan plan = new RunPlanner(new InputFormats(crs), crs).plan(ConfigReader.read(run.path("run.yaml"), Map.of()), notices);
        return new MapRun(plan, overwrite, new InputFormats(crs), crs, Progress.silent(), notices);
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 3, 8, 20})
    void anInterruptedRunLeavesNothing(int questions) {
        Map<String, byte[]> before = RunFolder.files(folder);
        AtomicInteger asked = new AtomicInteger();
        assertThrows(CancelledException.class, () -> job(false).execute(() -> asked.getAndIncrement() >= questions));
        assertFalse(Files.exists(run.path("out")));
        assertEquals(List.of(), RunFolder.differing(before, RunFolder.files(folder)));
    }

    @Test
    void anInterruptedRunKeepsWhatItWasToReplace() {
        run.map();
        Map<String, byte[]> before = RunFolder.files(folder);
        run.text("cultivars.yaml", RunFolder.cultivars(1));
        AtomicInteger asked = new AtomicInteger();
        assertThrows(CancelledException.class, () -> job(true).execute(() -> asked.getAndIncrement() >= 5));
        run.text("cultivars.yaml", RunFolder.cultivars(0));
        assertEquals(List.of(), RunFolder.differing(before, RunFolder.files(folder)));
    }

    @Test
    void overwritingReplaces() {
        run.map();
        float before = run.raster("oat/margin-mean").band()[0];
        run.text("cultivars.yaml", RunFolder.cultivars(1)).map("--overwrite");
        assertEquals(before + 1, run.raster("oat/margin-mean").band()[0], 1e-5);
    }

    @Test
    void overwritingTakesAwayTheLayersThatTheNewRunLacks() throws Exception {
        run.map();
        Files.writeString(run.path("out/notes.txt"), "mine");
        assertTrue(Files.exists(run.path("out/rye/margin-mean.tif")));
        run.map("--overwrite", "--set", "cultivars.use=[oat]");
        assertFalse(Files.exists(run.path("out/rye")), "layers of a cultivar that is not in the record");
        assertTrue(Files.exists(run.path("out/notes.txt")), "files of others stay");
        assertTrue(Files.exists(run.path("out/oat/margin-mean.tif")));
    }

    @Test
    void aForgedRecordReachesNothingOutside() throws Exception {
        run.map();
        Path outside = Files.createDirectories(run.path("elsewhere"));
        Files.writeString(outside.resolve("a.txt"), "mine");
        Files.createSymbolicLink(run.path("out/link"), outside);
        Files.writeString(run.path("out/record.json"), "{\"outputs\": [{\"path\": \"../elsewhere/a.txt\"}, {\"path\": \"link/a.txt\"}, "
                + "{\"path\": \"" + outside.resolve("a.txt") + "\"}, {\"path\": \"\\u0000\"}, {\"path\": \"..\"}, {\"path\": 3}, 7]}");
        run.map("--overwrite");
        assertEquals("mine", Files.readString(outside.resolve("a.txt")));
    }

    @Test
    void whatAKilledRunLeftBehindIsInNobodysWay() throws Exception {
        run.map();
        Map<String, byte[]> whole = RunFolder.files(run.path("out"));
        // killed while files were being moved: a part has its name, the record does not exist yet
        Files.delete(run.path("out/record.json"));
        Files.createDirectories(run.path("out/.unfinished/rye/winters"));
        Files.move(run.path("out/rye/winters/margin.tif"), run.path("out/.unfinished/rye/winters/margin.tif"));
        Files.write(run.path("out/.unfinished/winters.tmp"), new byte[1000]);
        run.map();
        assertEquals(List.of(), RunFolder.differing(whole, RunFolder.files(run.path("out"))));
    }

    @Test
    void anEmptyFolderMayBeUsed() throws Exception {
        Files.createDirectories(run.path("out"));
        run.map();
        assertTrue(Files.exists(run.path("out/record.json")));
    }

    @Test
    void inputsAreNeverTouched() {
        Map<String, byte[]> before = RunFolder.files(folder);
        run.map();
        Map<String, byte[]> after = RunFolder.files(folder);
        after.keySet().removeIf(name -> name.startsWith("out/"));
        assertEquals(List.of(), RunFolder.differing(before, after));
    }
}
