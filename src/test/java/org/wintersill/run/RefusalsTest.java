package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeSet;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** Bad input and bad places get one message, the right exit code, and leave nothing behind. */
class RefusalsTest {
    private static final ColdRecord RECORD = ColdRecord.made(3, 4, CfCalendar.STANDARD, new CfDate(2001, 9, 1),
            new CfDate(2002, 5, 31), false, 5);
    @TempDir
    Path folder;
    private RunFolder run;

    @BeforeEach
    void makeInputs() {
        run = RunFolder.of(folder.resolve("work"), new RecordFile(RECORD));
    }

    /** Runs, and checks code, words, the absence of a trace, and that no file came, went or changed. */
    private void assertRefused(int code, String words, String... more) {
        Map<String, byte[]> before = RunFolder.files(folder);
        boolean there = Files.exists(run.path("out"));
        Program.Ended ended = run.end(more).expect(code);
        for (String word : words.split("\\|")) {
            assertTrue(ended.err().toLowerCase(Locale.ROOT).contains(word.trim().toLowerCase(Locale.ROOT)),
                    word + " is not in: " + ended.err());
        }
        assertFalse(ended.err().contains("\tat "), ended.err());
        assertTrue(ended.err().matches("(?s).*(remedy:|accepted:|needed|such as).*"), ended.err());
        assertEquals("", ended.out());
        assertEquals(List.of(), RunFolder.differing(before, RunFolder.files(folder)));
        assertEquals(there, Files.exists(run.path("out")), "the output folder");
    }

    @Test
    void finishedOutputsAreKept() {
        run.map();
        assertRefused(4, "exists and is not empty | --overwrite");
    }

    @Test
    void aFolderOfSomeoneElseIsKept() throws Exception {
        Files.createDirectories(run.path("out"));
        Files.writeString(run.path("out/notes.txt"), "mine");
        assertRefused(4, "exists and is not empty");
    }

    @Test
    void aFileInPlaceOfTheFolderIsKept() {
        run.text("out", "mine");
        assertRefused(4, "is a file");
    }

    @Test
    void aFolderThatCannotBeMadeIsAnOutputProblem() {
        assertRefused(4, "cannot be written", "--out", run.path("run.yaml").resolve("out").toString());
    }

    @Test
    void aFolderWithoutPermissionIsAnOutputProblem() throws Exception {
        Path locked = Files.createDirectories(run.path("locked"));
        Assumptions.assumeTrue(locked.toFile().setWritable(false) && !Files.isWritable(locked), "this user may write everywhere");
        try {
            assertRefused(4, "cannot be written", "--out", locked.resolve("out").toString());
        } finally {
            locked.toFile().setWritable(true);
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '#', value = {
        "damage.nihgts=worst # 2 # nihgts | did you mean",
        "statistics.target=1.5 # 2 # target",
        "winter.from=13-01 # 2 # winter",
        "outputs.layers=[margni] # 2 # margni",
        "cultivars.use=[otter] # 2 # otter | oat",
        "area.bbox=[100, 10, 101, 11] # 2 # no cell"})
    void mistakesOfTheRunFileAreNamed(String setting, int code, String words) {
        assertRefused(code, words, "--set", setting.trim());
    }

    @Test
    void allMistakesOfARunFileComeTogether() {
        run.text("run.yaml", "temperature: {minimum: daily, unti: K}\ncultivars: cultivars.yaml\nclases: [0.1, 0.2, 0.3]\n"
                + "damage: {killing: 101}\n");
        assertRefused(2, "unti | clases | classes | killing | run.yaml:1 | run.yaml:3 | run.yaml:4");
    }

    @Test
    void lethalTemperaturesOutOfOrderAreRefused() {
        run.text("cultivars.yaml", RunFolder.cultivars(0).replaceFirst("lt90: [-0-9.]+", "lt90: 5"));
        Program.Ended ended = run.end();
        assertTrue(ended.code() == 2 || ended.code() == 3, ended.err());
        assertRefused(ended.code(), "lt90 | out of order | cultivars.yaml:2");
    }

    @Test
    void aTerrainModelElsewhereIsRefusedWithAHint() {
        float[] metres = new float[12];
        RecordInTiff.heights(run.path("dem.tif"), new GridGeometry(4, 3, 48, -8, 0.5, 0.5, new GeoToolsCrs().wgs84()), metres);
        run.text("run.yaml", "temperature: {minimum: daily}\ncultivars: cultivars.yaml\nelevation: {dem: dem.tif, source-height: dem-mean}\n");
        assertRefused(3, "nowhere meets | swapped | dem.tif");
    }

    @Test
    void aRecordWithoutAnyValueIsRefused() {
        new RecordFile(RECORD.changed((day, cell, value) -> ColdRecord.MISSING)).write(run.daily("tmin.nc"));
        assertRefused(3, "no cell | tmin.nc");
    }

    @Test
    void aTerrainModelWithoutAnyValueIsRefused() {
        float[] metres = new float[12];
        Arrays.fill(metres, Float.NaN);
        metres[0] = 100;
        RecordInTiff.heights(run.path("dem.tif"), new GridGeometry(4, 3, -10, 50, 0.5, 0.5, new GeoToolsCrs().wgs84()), metres);
        new RecordFile(RECORD.changed((day, cell, value) -> cell < 6 ? ColdRecord.MISSING : value)).write(run.daily("tmin.nc"));
        run.text("run.yaml", "temperature: {minimum: daily}\ncultivars: cultivars.yaml\nelevation: {dem: dem.tif, source-height: dem-mean}\n");
        assertRefused(3, "no cell | terrain");
    }

    @Test
    void aRecordWithoutAWholeWinterIsRefused() {
        new RecordFile(RECORD.between(new CfDate(2001, 9, 1), new CfDate(2002, 1, 31))).write(run.daily("tmin.nc"));
        assertRefused(3, "no winter | 2001-02");
    }

    @Test
    void tooLittleMemoryNamesTheLargestPart() {
        ColdRecord wide = ColdRecord.made(1, 2000, CfCalendar.STANDARD, new CfDate(2001, 9, 1), new CfDate(2002, 5, 31), false, 5);
        new RecordFile(wide.at(-10, 50, 0.01)).write(run.daily("tmin.nc"));
        assertRefused(5, "writing the layers | limits.memory", "--memory", "32m", "--set", "outputs.layers=default");
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.0, 0.002, 0.02, 0.3, 0.999})
    void aTruncatedFileIsRefused(double share) throws Exception {
        byte[] whole = Files.readAllBytes(run.daily("tmin.nc"));
        Files.write(run.daily("tmin.nc"), Arrays.copyOf(whole, (int) (whole.length * share)));
        assertRefused(3, "tmin.nc");
    }

    @Test
    void aDayThatComesTwiceIsRefused() {
        new RecordFile(RECORD.between(new CfDate(2002, 5, 30), new CfDate(2002, 5, 31))).write(run.daily("again.nc"));
        assertRefused(3, "2002-05-30 | tmin.nc | again.nc");
    }

    @Test
    void filesOnDifferentGridsAreRefused() {
        new RecordFile(RECORD.between(new CfDate(2001, 9, 1), new CfDate(2001, 12, 31))).write(run.daily("tmin.nc"));
        new RecordFile(RECORD.between(new CfDate(2002, 1, 1), new CfDate(2002, 5, 31)).at(-9.9, 50, 0.5)).write(run.daily("b.nc"));
        assertRefused(3, "grid | b.nc");
    }

    @Test
    void filesWithDifferentCalendarsAreRefused() {
        new RecordFile(RECORD.between(new CfDate(2001, 9, 1), new CfDate(2001, 12, 31))).write(run.daily("tmin.nc"));
        new RecordFile(RECORD.between(new CfDate(2002, 1, 1), new CfDate(2002, 5, 31))).calendar("noleap").write(run.daily("b.nc"));
        assertRefused(3, "calendar | noleap");
    }

    @ParameterizedTest
    @ValueSource(strings = {"../x", "a/b", "..", "/tmp/x", "A", "shared", "con", "a b", "<b>", "\"\""})
    void idsThatAreNoFolderNamesAreRefused(String id) {
        run.text("cultivars.yaml", RunFolder.cultivars(0).replace("id: oat", "id: " + (id.startsWith("\"") ? id : "'" + id + "'")));
        Program.Ended ended = run.end();
        assertTrue(ended.code() == 2 || ended.code() == 3, ended.err());
        assertRefused(ended.code(), "cultivars.yaml");
        assertEquals(List.of("work"), Arrays.asList(folder.toFile().list()));
        assertEquals(new TreeSet<>(List.of("cultivars.yaml", "daily", "run.yaml")), new TreeSet<>(List.of(run.path("").toFile().list())));
    }
}
