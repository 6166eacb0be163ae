package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Whole runs of the sample basin with everything that a night can bring, held to explain and to themselves. */
class ColdPoolRunTest {
    private static final List<String> LOCAL = List.of("--set", "elevation.cold-pool.radius=2000", "--set", "elevation.lapse-rate.method=daily-local",
            "--set", "elevation.lapse-rate.radius-km=20", "--set", "elevation.offsets.site=-0.25", "--set", "cultivars.use=slate");

    @TempDir
    private Path folder;

    private static List<String> with(List<String> first, String... more) {
        List<String> all = new ArrayList<>(first);
        all.addAll(List.of(more));
        return all;
    }

    private static Program.Ended run(List<String> arguments) {
        return Program.run(arguments.toArray(String[]::new));
    }

    private Path map(String name, List<String> settings) {
        Path out = folder.resolve(name);
        List<String> arguments = with(List.of("map", "sample-grids/run.yaml", "--quiet", "--out", out.toString()));
        arguments.addAll(settings);
        Program.Ended result = run(arguments);
        assertEquals(0, result.code(), result.err());
        return out;
    }

    /** Every step adds up, and the lowest margin of explain is that of the map, to the last bit. */
    @Test
    void explainAgreesWithTheMap() throws IOException {
        Path out = map("local", with(LOCAL, "--set", "outputs.geopackage=false"));
        RasterFile margins = RasterFile.read(out.resolve("slate/winters/margin.tif"));
        for (int[] cell : new int[][] {{60, 40}, {101, 133}, {150, 90}}) {
            double x = -38 + (cell[0] + 0.5) * 0.005;
            double y = 50.5 - (cell[1] + 0.5) * 0.005;
            List<String> arguments = with(List.of("explain", "sample-grids/run.yaml", "--json", "--quiet", "--at", x + "," + y, "--winter",
                    "2009-10"));
            arguments.addAll(LOCAL);
            Program.Ended result = run(arguments);
            assertEquals(0, result.code(), result.err());
            JsonNode winter = new ObjectMapper().readTree(result.out()).get("cultivars").get(0).get("winters").get(0);
            assertEquals(margins.value(4, cell[1], cell[0]), (float) winter.get("margin").asDouble(), 0);
            for (JsonNode night : winter.get("nights")) {
                JsonNode steps = night.get("steps");
                if (!night.get("tmin").isNull()) {
                    double sum = steps.get("interpolated").asDouble() + steps.get("height").asDouble() + steps.get("pool").asDouble()
                            + steps.get("water").asDouble() + steps.get("offset").asDouble();
                    assertEquals(night.get("tmin").asDouble(), sum, 1e-5);
                    assertEquals(-0.25, steps.get("offset").asDouble(), 0);
                    assertTrue(steps.get("pool").asDouble() <= 0);
                }
            }
        }
    }

    @Test
    void threadsMemoryAndAreaChangeNoValue() {
        List<String> settings = with(LOCAL, "--set", "outputs.geopackage=false", "--set", "outputs.winters=false");
        RasterFile one = RasterFile.read(map("one", with(settings, "--threads", "1")).resolve("slate/margin-low.tif"));
        RasterFile two = RasterFile.read(map("two", with(settings, "--threads", "2")).resolve("slate/margin-low.tif"));
        Path cut = map("cut", with(settings, "--set", "area.bbox=[-37.6, 49.9, -37.2, 50.2]"));
        RasterFile part = RasterFile.read(cut.resolve("slate/margin-low.tif"));
        RasterFile means = RasterFile.read(folder.resolve("one/shared/adjustment-mean.tif"));
        RasterFile partMeans = RasterFile.read(cut.resolve("shared/adjustment-mean.tif"));
        for (int row = 0; row < 180; row++) {
            for (int column = 0; column < 240; column++) {
                assertEquals(one.value(0, row, column), two.value(0, row, column), 0);
            }
        }
        for (int row = 0; row < 60; row++) {
            for (int column = 0; column < 80; column++) {
                assertEquals(one.value(0, row + 60, column + 80), part.value(0, row, column), 0);
                assertEquals(means.value(0, row + 60, column + 80), partMeans.value(0, row, column), 0);
            }
        }
    }

    @Test
    void whatCannotBeMeantIsRefused() {
        refused("elevation.cold-pool.nights", "nothing tells stable nights", "--set", "elevation.cold-pool.radius=2000");
        refused("resolved: add", "counted twice", "--set", "elevation.cold-pool.radius=6000", "--set", "elevation.cold-pool.nights=all");
        refused("larger radius", "holds no neighbour", "--set", "elevation.cold-pool.radius=100", "--set", "elevation.cold-pool.nights=all");
        refused("zeros and ones", "a mask of water", "--set", "elevation.water.mask=dem.tif");
    }

    private static void refused(String remedy, String what, String... settings) {
        Program.Ended result = run(with(List.of("plan", "sample-grids/run.yaml"), settings));
        assertTrue(result.code() == 2 || result.code() == 3, result.err());
        assertTrue(result.err().contains(what) && result.err().contains(remedy), result.err());
    }
}
