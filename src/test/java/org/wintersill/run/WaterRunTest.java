package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A lake from its outline: warm at the shore, less so further away, and not at all while it is frozen. */
class WaterRunTest {
    @TempDir
    private Path folder;

    private Path lake() throws IOException {
        return Files.writeString(folder.resolve("lake.geojson"), """
                {"type":"FeatureCollection","features":[{"type":"Feature","properties":{},"geometry":{"type":"Polygon",
                "coordinates":[[[-37.5,50.0],[-37.4,50.0],[-37.4,50.05],[-37.5,50.05],[-37.5,50.0]]]}}]}""");
    }

    @Test
    void warmingFallsWithTheDistanceToTheShore() throws IOException {
        Path out = folder.resolve("out");
        Program.run("map", "sample-grids/run.yaml", "--quiet", "--set", "elevation.water.mask=" + lake(), "--set", "cultivars.use=slate",
                "--set", "outputs.winters=false", "--set", "outputs.geopackage=false", "--set", "outputs.layers=[water-change]",
                "--out", out.toString()).expect(0);
        RasterFile change = RasterFile.read(out.resolve("shared/water-change.tif"));
        assertEquals(1.5, change.value(0, 95, 110), 0);
        for (int column = 120; column < 200; column++) {
            assertTrue(change.value(0, 95, column) < change.value(0, 95, column - 1));
        }
        // Five columns east of the last water column: 4.5 cells of 0.005 degrees at 50.0225 N, 358.31 m each on WGS 84.
        assertEquals(1.5 * Math.exp(-4.5 * 358.31 / 5000), change.value(0, 95, 124), 1e-4);
    }

    @Test
    void frozenWaterWarmsNothing() throws IOException {
        String out = Program.run("explain", "sample-grids/run.yaml", "--quiet", "--json", "--set", "elevation.water.mask=" + lake(), "--set",
                "elevation.water.frozen=12-20..03-10", "--cultivar", "slate", "--winter", "2009-10", "--at", "-37.38,50.02").expect(0).out();
        for (JsonNode night : new ObjectMapper().readTree(out).get("cultivars").get(0).get("winters").get(0).get("nights")) {
            String day = night.get("date").asText().substring(5);
            boolean frozen = day.compareTo("12-20") >= 0 || day.compareTo("03-10") <= 0;
            if (night.has("steps")) {
                assertEquals(frozen, night.get("steps").get("water").asDouble() == 0, day);
            }
        }
    }
}
