package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** Comparisons whose outcome is known. */
class ComparisonRunTest {
    @TempDir
    Path folder;
    private final ColdRecord record = ColdRecord.made(6, 7, CfCalendar.STANDARD, new CfDate(2001, 8, 1), new CfDate(2009, 7, 31), false, 3);

    @BeforeEach
    void makeRuns() {
        make("base", record);
        make("milder", record.changed((day, cell, tenths) -> tenths + 20));
        make("colder", record.changed((day, cell, tenths) -> tenths - 10 - cell % 3));
    }

    private void make(String name, ColdRecord record) {
        RunFolder.of(folder.resolve("in-" + name), new RecordFile(record)).text("run.yaml", "temperature: {minimum: daily}\n"
                + "cultivars: cultivars.yaml\n");
        Program.run("map", folder.resolve("in-" + name + "/run.yaml").toString(), "--out", path(name)).expect(0);
    }

    private String path(String name) {
        return folder.resolve(name).toString();
    }

    private float[] layer(String name) {
        return RasterFile.read(folder.resolve(name + ".tif")).bands()[0];
    }

    @Test
    void aUniformShiftIsFoundExactly() throws Exception {
        Program.run("compare", path("base"), path("milder"), "--out", path("change")).expect(0);
        for (String cultivar : List.of("oat", "rye")) {
            for (float change : layer("change/milder/" + cultivar + "/margin-change")) {
                assertEquals(2, change, 1e-5);
            }
            for (float shift : layer("change/milder/" + cultivar + "/tolerance-shift")) {
                assertEquals(-2, shift, 1e-5);
            }
            for (float code : layer("change/milder/" + cultivar + "/range-change")) {
                assertTrue(code != 3, "milder winters lose nothing");
            }
            assertArrayEquals(layer("base/" + cultivar + "/required-hardiness"),
                    RasterFile.read(folder.resolve("change/milder/" + cultivar + "/required-hardiness.tif")).bands()[0]);
        }
        JsonNode rows = new ObjectMapper().readTree(folder.resolve("change/changes.json").toFile()).get("changes");
        assertEquals(2, rows.size());
        assertEquals(2, rows.get(0).get("margin-change-mean").doubleValue(), 1e-5);
        double all = 0;
        for (String part : List.of("kept", "gained", "lost", "never-suitable")) {
            all += rows.get(0).get(part + "-km2").doubleValue();
        }
        JsonNode summary = new ObjectMapper().readTree(folder.resolve("base/summary.json").toFile()).get("cultivars").get(0).get("classes");
        double classes = 0;
        for (JsonNode row : summary) {
            classes += row.get("area-km2").doubleValue();
        }
        assertEquals(classes, all, 1e-6 * classes);
    }

    @Test
    void againstItselfNothingChanges() {
        Program.run("compare", path("base"), path("base"), "--out", path("change")).expect(0);
        for (String id : List.of("margin-change", "damage-change", "killing-frequency-change", "tolerance-shift")) {
            for (float change : layer("change/base/oat/" + id)) {
                assertEquals(0, change);
            }
        }
        for (float code : layer("change/base/oat/killing-frequency-significance")) {
            assertEquals(2, code);
        }
    }

    @Test
    void membersAreSummarised() {
        Program.run("compare", path("base"), path("milder"), path("colder"), "--out", path("change")).expect(0);
        float[] milder = layer("change/milder/oat/margin-change");
        float[] colder = layer("change/colder/oat/margin-change");
        float[] median = layer("change/ensemble/oat/margin-change-median");
        float[] low = layer("change/ensemble/oat/margin-change-low");
        for (int cell = 0; cell < median.length; cell++) {
            assertEquals((milder[cell] + colder[cell]) / 2, median[cell], 1e-5);
            assertEquals(colder[cell] + 0.1 * (milder[cell] - colder[cell]), low[cell], 1e-5);
        }
        for (float agreement : layer("change/ensemble/oat/margin-change-agreement")) {
            assertEquals(0.5, agreement);
        }
        // Both cultivars change alike, so all of the spread is between the members.
        for (float share : layer("change/ensemble/shared/variance-model")) {
            assertEquals(1, share, 1e-5);
        }
        Map<String, byte[]> first = RunFolder.files(folder.resolve("change"));
        Program.run("compare", path("base"), path("milder"), path("colder"), "--out", path("again"), "--threads", "3").expect(0);
        assertEquals(List.of(), RunFolder.differing(first, RunFolder.files(folder.resolve("again"))));
    }

    @Test
    void whatCannotBeComparedIsRefused() throws Exception {
        make("elsewhere", record.at(20, 40, 0.5));
        Program.Ended refused = Program.run("compare", path("base"), path("elsewhere"), "--out", path("change")).expect(3);
        assertTrue(refused.err().contains("the grids differ") && refused.err().contains("Run both on one grid"), refused.err());
        assertTrue(Program.run("compare", path("base"), path("milder"), "--out", path("change"), "--cultivar", "oats").expect(2).err()
                .contains("Did you mean oat?"));
        assertTrue(Program.run("compare", path("base"), path("in-base"), "--out", path("change")).expect(3).err()
                .contains("no finished outputs"));
        assertTrue(Files.notExists(folder.resolve("change")));
    }
}
