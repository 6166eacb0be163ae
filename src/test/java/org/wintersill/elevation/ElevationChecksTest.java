package org.wintersill.elevation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/** Values: checks/elevation.json, computed; laws of signs and identity. */
class ElevationChecksTest {
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);

    @Test
    void simpleAdjustmentsAreAsTabled() {
        JsonNode table = CheckTables.json("elevation.json");
        int checked = 0;
        for (JsonNode list : table) {
            if (list.isArray() && list.size() > 0 && list.get(0).has("lapse_K_per_km") && list.get(0).has("T_src")) {
                for (JsonNode row : list) {
                    assertEquals(row.get("T").asDouble(), LapseRates.atHeight(row.get("T_src").asDouble(),
                            row.get("lapse_K_per_km").asDouble(), row.get("z_src").asDouble(), row.get("z_dem").asDouble()), 1e-9);
                    checked++;
                }
            }
        }
        assertTrue(checked >= 3, "rows checked: " + checked);
    }

    @Test
    void reduceInterpolateRestoreIsAsTabled() {
        JsonNode example = CheckTables.json("elevation.json").get("reduce_interpolate_restore");
        float[] temperatures = flat(example.get("T"));
        float[] heights = flat(example.get("z"));
        // Source centres at x 0.5 and 1.5, y 1.5 and 0.5; the target cell's centre lies fx, fy between them.
        GridGeometry source = new GridGeometry(2, 2, 0, 2, 1, 1, CRS);
        double x = 0.5 + example.get("fx").asDouble();
        double y = 1.5 - example.get("fy").asDouble();
        GridGeometry target = new GridGeometry(1, 1, x - 0.05, y + 0.05, 0.1, 0.1, CRS);
        ElevationField dem = new ElevationField(target, new float[] {(float) example.get("z_dem").asDouble()}, "");
        ElevationAdjustment adjustment = ElevationAdjustment.toHeights(new SourcePositions(source, target, CoordinateOperation.identity()),
                heights, dem, LapseRates.constant(example.get("lapse").asDouble()));
        float[] out = new float[1];
        new LaneAdjuster(adjustment).adjust(temperatures, 0, example.get("lapse").asDouble(), 0, 1, out);
        assertEquals(example.get("T_out").asDouble(), out[0], 1e-4);
    }

    private static float[] flat(JsonNode rows) {
        return new float[] {(float) rows.get(0).get(0).asDouble(), (float) rows.get(0).get(1).asDouble(),
            (float) rows.get(1).get(0).asDouble(), (float) rows.get(1).get(1).asDouble()};
    }

    @Test
    void higherIsColderForAPositiveLapseRate() {
        assertEquals(-12.075, LapseRates.atHeight(-15, 6.5, 800, 350), 1e-12);
        assertTrue(LapseRates.atHeight(-10, 4.5, 500, 900) < -10);
        assertTrue(LapseRates.atHeight(-10, -3, 500, 900) > -10);
        assertEquals(-10, LapseRates.atHeight(-10, 6.5, 700, 700), 0);
    }

    @Test
    void sourceHeightIsTheMeanOfTheTerrainInTheCellAndMissingWithFewerThanHalf() {
        GridGeometry source = new GridGeometry(2, 1, 0, 1, 1, 1, CRS);
        GridGeometry fine = new GridGeometry(4, 2, 0, 1, 0.5, 0.5, CRS);
        float nan = Float.NaN;
        float[] heights = {100, 200, nan, nan, 300, nan, nan, 50};
        float[] means = SourceHeights.blockMeans(new ElevationField(fine, heights, ""),
                new SourcePositions(source, fine, CoordinateOperation.identity()));
        assertEquals(200, means[0], 1e-4);
        assertTrue(Float.isNaN(means[1]));
    }
}
