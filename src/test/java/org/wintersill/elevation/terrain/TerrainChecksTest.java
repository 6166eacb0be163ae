package org.wintersill.elevation.terrain;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.grid.Block;

/** Values: checks/elevation.json, computed outside of this program. */
class TerrainChecksTest {
    private static final JsonNode TABLE = CheckTables.json("elevation.json");

    private static Relief tabled() {
        JsonNode rows = TABLE.get("topographic_indices").get("dem");
        float[] metres = new float[25];
        for (int i = 0; i < metres.length; i++) {
            metres[i] = (float) rows.get(i / 5).get(i % 5).asDouble();
        }
        return flatEarth(5, 5, metres, TABLE.get("topographic_indices").get("cell_size_m").asDouble());
    }

    static Relief flatEarth(int columns, int rows, float[] metres, double cell) {
        double[] sizes = new double[rows];
        Arrays.fill(sizes, cell);
        return new Relief(columns, rows, metres, sizes, sizes);
    }

    @Test
    void indicesOfTheSmallReliefAreAsTabled() {
        JsonNode expected = TABLE.get("topographic_indices");
        Relief relief = tabled();
        Window five = new Window(Window.Shape.SQUARE, 200);
        Block whole = relief.whole();
        LocalHeights heights = LocalHeights.of(relief, five, whole, Tasks.inOrder());
        assertEquals(expected.get("percentile_midrank_in_5x5").asDouble(), heights.percentile()[12], 1e-7);
        assertEquals(expected.get("height_above_window_min").asDouble(), heights.aboveLowest()[12], 0);
        assertEquals(expected.get("tpi_mean_of_24_neighbours").asDouble(),
                PositionIndex.of(relief, five, whole, Tasks.inOrder())[12], 1e-5);
        assertEquals(expected.get("slope_deg_horn").asDouble(), SurfaceForm.slope(relief, whole, Tasks.inOrder())[12], 1e-6);
        assertEquals(expected.get("laplacian_per_m").asDouble(), SurfaceForm.curvature(relief, whole, Tasks.inOrder())[12], 1e-8);
        // The table ranks further cells among all 25, which a wider window does too. Its 0.26 for (1, 1) leaves out the two other cells
        // of 470 m; with half of all three, as its rule says, it is (6 + 3 / 2) / 25.
        LocalHeights all = LocalHeights.of(relief, new Window(Window.Shape.SQUARE, 400), whole, Tasks.inOrder());
        assertEquals(0.30, all.percentile()[6], 1e-7);
        assertEquals(expected.get("percentile_of_0_0").asDouble(), all.percentile()[0], 1e-7);
    }

    @Test
    void coolingIsAsTabled() {
        for (JsonNode row : TABLE.get("cold_pool").get("values")) {
            assertEquals(row.get("dT").asDouble(), ColdPools.change(row.get("A").asDouble(), row.get("I").asDouble(),
                    row.get("h").asDouble(), row.get("D").asDouble()), 1e-9);
        }
        assertEquals(1, ColdPools.index(0), 0);
        assertEquals(0.4f, ColdPools.index(0.3f), 1e-7);
        assertEquals(0, ColdPools.index(0.8f), 0);
    }

    @Test
    void classesFollowTheLimits() {
        assertEquals(Optional.of(ColdAirClass.PRONE), ColdAirClass.of(29, 0.29f, 1e-5f));
        assertEquals(Optional.of(ColdAirClass.NEUTRAL), ColdAirClass.of(29, 0.29f, -1e-5f));
        assertEquals(Optional.of(ColdAirClass.NEUTRAL), ColdAirClass.of(5, 0.5f, 1e-5f));
        assertEquals(Optional.of(ColdAirClass.NOT_PRONE), ColdAirClass.of(31, 0.1f, 1e-5f));
        assertEquals(Optional.of(ColdAirClass.NOT_PRONE), ColdAirClass.of(5, 0.71f, 1e-5f));
        assertEquals(Optional.empty(), ColdAirClass.of(Float.NaN, 0.1f, 1e-5f));
    }

    @Test
    void aHollowIsProneAndItsRimIsNot() {
        int n = 41;
        float[] bowl = new float[n * n];
        for (int i = 0; i < bowl.length; i++) {
            bowl[i] = (float) (0.002 * 900 * (Math.pow(i / n - 20, 2) + Math.pow(i % n - 20, 2)));
        }
        Relief relief = flatEarth(n, n, bowl, 30);
        ColdPools pools = new ColdPools(4, 60, new Window(Window.Shape.DISC, 300), false);
        ColdPools.Ground ground = pools.over(relief, relief.whole(), Tasks.inOrder());
        int centre = 20 * n + 20;
        assertEquals(ColdAirClass.PRONE.code(), ground.classes()[centre]);
        assertEquals(-4, ground.change()[centre], 0.05);
        assertEquals(ColdAirClass.NOT_PRONE.code(), ground.classes()[2 * n + 2]);
        assertEquals(0, ground.change()[2 * n + 2], 0);
        assertEquals(0, ground.classes()[0]);
    }

    @Test
    void voidsAreMissingAndNoNeighbours() {
        float[] metres = {10, 20, 30, 40, Float.NaN, 60, 70, 80, 90};
        Relief relief = flatEarth(3, 3, metres, 10);
        Window window = new Window(Window.Shape.SQUARE, 10);
        LocalHeights heights = LocalHeights.of(relief, window, relief.whole(), Tasks.inOrder());
        assertTrue(Float.isNaN(heights.percentile()[4]) && Float.isNaN(heights.aboveLowest()[4]));
        assertEquals(0.5 / 3, heights.percentile()[0], 1e-7);
        assertEquals(10, heights.aboveLowest()[1], 0);
        assertTrue(Float.isNaN(PositionIndex.of(relief, window, relief.whole(), Tasks.inOrder())[4]));
        assertArrayEquals(new float[] {-20}, PositionIndex.of(relief, window, new Block(0, 0, 1, 1), Tasks.inOrder()), 1e-6f);
    }
}
