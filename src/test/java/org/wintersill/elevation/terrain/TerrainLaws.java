package org.wintersill.elevation.terrain;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.LongRange;
import org.wintersill.grid.Block;

/** Indices on random reliefs with voids and ties, against their definition, and laws of cutting and lifting. */
class TerrainLaws {
    private static final Tasks THREADS = (count, task) -> IntStream.range(0, count).parallel().forEach(task);

    /** Cells that narrow towards the north, heights with ties, some voids. */
    private static Relief relief(long seed, int columns, int rows) {
        Random random = new Random(seed);
        float[] metres = new float[columns * rows];
        for (int i = 0; i < metres.length; i++) {
            metres[i] = random.nextInt(12) == 0 ? Float.NaN : random.nextInt(3) == 0 ? 100 + random.nextInt(5) : 300 * random.nextFloat() - 50;
        }
        double[] width = IntStream.range(0, rows).mapToDouble(row -> 20 + 0.5 * row).toArray();
        double[] height = IntStream.range(0, rows).mapToDouble(row -> 30 + 0.1 * row).toArray();
        return new Relief(columns, rows, metres, width, height);
    }

    private static boolean within(Relief relief, Window window, int row, int column, int otherRow, int otherColumn) {
        double dx = (otherColumn - column) * relief.cellWidth()[row];
        double dy = (otherRow - row) * relief.cellHeight()[row];
        double radius = window.radius() + 1e-6;
        return window.shape() == Window.Shape.DISC ? dx * dx + dy * dy <= radius * radius : Math.abs(dx) <= radius && Math.abs(dy) <= radius;
    }

    @Property(tries = 60)
    void indicesAreWhatTheirDefinitionsSay(@ForAll @LongRange(min = 0, max = 1 << 20) long seed, @ForAll @IntRange(min = 1, max = 23) int columns,
                                           @ForAll @IntRange(min = 1, max = 19) int rows, @ForAll @IntRange(min = 1, max = 400) int radius,
                                           @ForAll Window.Shape shape) {
        Relief relief = relief(seed, columns, rows);
        Window window = new Window(shape, radius);
        LocalHeights heights = LocalHeights.of(relief, window, relief.whole(), Tasks.inOrder());
        float[] position = PositionIndex.of(relief, window, relief.whole(), Tasks.inOrder());
        for (int cell = 0; cell < relief.metres().length; cell++) {
            float z = relief.metres()[cell];
            int lower = 0;
            int equal = 0;
            int count = 0;
            double sum = 0;
            float lowest = Float.POSITIVE_INFINITY;
            for (int other = 0; other < relief.metres().length; other++) {
                float o = relief.metres()[other];
                if (Float.isNaN(o) || !within(relief, window, cell / columns, cell % columns, other / columns, other % columns)) {
                    continue;
                }
                lower += o < z ? 1 : 0;
                equal += o == z ? 1 : 0;
                count++;
                sum += o;
                lowest = Math.min(lowest, o);
            }
            boolean present = !Float.isNaN(z);
            assertEquals(present ? (float) ((lower + equal / 2.0) / count) : Float.NaN, heights.percentile()[cell], 0);
            assertEquals(present ? z - lowest : Float.NaN, heights.aboveLowest()[cell], 0);
            assertEquals(present && count > 1 ? z - (sum - z) / (count - 1) : Double.NaN, position[cell], 2e-4);
        }
    }

    @Property(tries = 20)
    void blocksAndThreadsChangeNoBit(@ForAll @LongRange(min = 0, max = 1 << 20) long seed, @ForAll @IntRange(min = 40, max = 300) int radius) {
        Relief relief = relief(seed, 410, 230);
        ColdPools pools = new ColdPools(4, 60, new Window(Window.Shape.DISC, radius), false);
        ColdPools.Ground whole = pools.over(relief, relief.whole(), THREADS);
        Block part = new Block(97, 55, 250, 101);
        ColdPools.Ground cut = pools.over(relief, part, Tasks.inOrder());
        float[] position = PositionIndex.of(relief, pools.window(), relief.whole(), THREADS);
        float[] cutPosition = PositionIndex.of(relief, pools.window(), part, Tasks.inOrder());
        for (int row = 0; row < part.rows(); row++) {
            int from = (part.row() + row) * 410 + part.column();
            for (int i = 0; i < part.columns(); i++) {
                assertEquals(whole.change()[from + i], cut.change()[row * part.columns() + i], 0);
                assertEquals(whole.classes()[from + i], cut.classes()[row * part.columns() + i]);
                assertEquals(position[from + i], cutPosition[row * part.columns() + i], 0);
            }
        }
    }

    @Property(tries = 20)
    void liftingTheGroundChangesNoIndex(@ForAll @LongRange(min = 0, max = 1 << 20) long seed) {
        Relief low = relief(seed, 30, 30);
        float[] lifted = low.metres().clone();
        for (int i = 0; i < lifted.length; i++) {
            lifted[i] = Math.round(lifted[i]) + 512;
            low.metres()[i] = Float.isNaN(low.metres()[i]) ? Float.NaN : Math.round(low.metres()[i]);
            lifted[i] = Float.isNaN(low.metres()[i]) ? Float.NaN : lifted[i];
        }
        Relief high = new Relief(30, 30, lifted, low.cellWidth(), low.cellHeight());
        Window window = new Window(Window.Shape.DISC, 120);
        LocalHeights a = LocalHeights.of(low, window, low.whole(), Tasks.inOrder());
        LocalHeights b = LocalHeights.of(high, window, high.whole(), Tasks.inOrder());
        assertArrayEquals(a.percentile(), b.percentile(), 0);
        assertArrayEquals(a.aboveLowest(), b.aboveLowest(), 0);
        assertArrayEquals(SurfaceForm.slope(low, low.whole(), THREADS), SurfaceForm.slope(high, high.whole(), THREADS), 1e-5f);
    }

    @Property(tries = 60)
    void distanceToWaterIsTheShortestOfAll(@ForAll @LongRange(min = 0, max = 1 << 20) long seed, @ForAll @IntRange(min = 1, max = 25) int columns,
                                           @ForAll @IntRange(min = 1, max = 21) int rows, @ForAll @IntRange(min = 1, max = 60) int rarity) {
        Relief relief = relief(seed, columns, rows);
        Random random = new Random(seed + 1);
        boolean[] water = new boolean[columns * rows];
        for (int i = 0; i < water.length; i++) {
            water[i] = random.nextInt(rarity) == 0;
        }
        float[] distance = DistanceToWater.of(water, columns, relief.cellWidth(), relief.cellHeight(), THREADS);
        for (int cell = 0; cell < water.length; cell++) {
            double nearest = Double.POSITIVE_INFINITY;
            for (int other = 0; other < water.length; other++) {
                if (water[other]) {
                    nearest = Math.min(nearest, Math.hypot(across(relief, cell, other), along(relief, cell, other)));
                }
            }
            assertEquals(nearest, distance[cell], 1e-3);
        }
    }

    private static double across(Relief relief, int cell, int other) {
        int columns = Math.abs(cell % relief.columns() - other % relief.columns());
        return Math.max(0, columns - 0.5) * relief.cellWidth()[cell / relief.columns()];
    }

    private static double along(Relief relief, int cell, int other) {
        int row = cell / relief.columns();
        int otherRow = other / relief.columns();
        double sum = row == otherRow ? 0 : relief.cellHeight()[row] / 2;
        for (int between = Math.min(row, otherRow) + 1; between < Math.max(row, otherRow); between++) {
            sum += relief.cellHeight()[between];
        }
        return sum;
    }
}
