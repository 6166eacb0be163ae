package org.wintersill.climatology;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;

/** The highest value of a disc is the one that looking at every cell finds, whatever part of the raster is asked for. */
class DiscMaximumLaws {

    @Property(tries = 300)
    void aDiscHoldsWhatLookingAtEveryCellFinds(@ForAll long seed, @ForAll @IntRange(min = 1, max = 12) int rows,
            @ForAll @IntRange(min = 1, max = 15) int columns, @ForAll @DoubleRange(min = 0, max = 20) double radius,
            @ForAll boolean around) {
        Random random = new Random(seed);
        float[][] values = new float[rows][columns];
        double[] width = new double[rows];
        double[] height = new double[rows];
        for (int row = 0; row < rows; row++) {
            width[row] = 1 + 2 * random.nextDouble();
            height[row] = 1 + random.nextDouble();
            for (int column = 0; column < columns; column++) {
                values[row][column] = random.nextInt(4) == 0 ? Float.NaN : random.nextInt(50) - 20;
            }
        }
        DiscMaximum discs = new DiscMaximum(columns, radius, width, height, around);
        float[] whole = new float[rows * columns];
        discs.fill(0, rows, row -> values[row], whole);
        int part = 1 + random.nextInt(rows);
        float[] pieces = new float[rows * columns];
        for (int first = 0; first < rows; first += part) {
            int count = Math.min(part, rows - first);
            float[] piece = new float[count * columns];
            discs.fill(first, count, row -> values[row], piece);
            System.arraycopy(piece, 0, pieces, first * columns, piece.length);
        }
        assertEquals(Arrays.toString(whole), Arrays.toString(pieces));
        for (int row = 0; row < rows; row++) {
            for (int column = 0; column < columns; column++) {
                assertEquals(highest(values, row, column, radius, width[row], height[row], around), whole[row * columns + column],
                        row + ", " + column);
            }
        }
    }

    private static float highest(float[][] values, int row, int column, double radius, double width, double height, boolean around) {
        float highest = Float.NEGATIVE_INFINITY;
        int columns = values[0].length;
        for (int y = 0; y < values.length; y++) {
            for (int x = 0; x < columns; x++) {
                int apart = Math.abs(x - column);
                apart = around ? Math.min(apart, columns - apart) : apart;
                boolean inside = Math.hypot(apart * width, (y - row) * height) <= radius * (1 + 1e-12);
                if (inside && values[y][x] > highest) {
                    highest = values[y][x];
                }
            }
        }
        return highest;
    }
}
