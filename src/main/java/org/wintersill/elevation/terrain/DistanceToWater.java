package org.wintersill.elevation.terrain;

import java.util.Arrays;

/**
 * Distance from each cell's centre to the nearest water cell's nearest edge, m: exact, in two passes. The first goes down each column and
 * keeps the north-south distance to the nearest water of the column; the second takes along each row the lower envelope of the
 * parabolas that these distances give (Felzenszwalb and Huttenlocher 2012, Theory of Computing 8:415, from memory; checked against
 * all pairs).
 *
 * <p>East-west distances are those of the cell's own row; north-south distances add up the rows between. 0 on water; positive
 * infinity where there is no water at all.
 */
public final class DistanceToWater {
    private DistanceToWater() {
    }

    /**
     * @param water {@code [row * columns + column]}
     * @param cellWidth {@code [row]}, m
     * @param cellHeight {@code [row]}, m
     * @return {@code [row * columns + column]}, m
     */
    public static float[] of(boolean[] water, int columns, double[] cellWidth, double[] cellHeight, Tasks tasks) {
        int rows = cellWidth.length;
        float[] distance = new float[water.length];
        Arrays.fill(distance, Float.POSITIVE_INFINITY);
        downwards(water, columns, cellHeight, distance);
        upwards(water, columns, cellHeight, distance);
        tasks.forEach(rows, row -> alongRow(distance, row * columns, columns, cellWidth[row]));
        return distance;
    }

    private static void downwards(boolean[] water, int columns, double[] cellHeight, float[] distance) {
        double[] since = new double[columns];
        Arrays.fill(since, Double.POSITIVE_INFINITY);
        for (int row = 0; row < cellHeight.length; row++) {
            takeRow(water, row, columns, cellHeight[row], since, distance);
        }
    }

    private static void upwards(boolean[] water, int columns, double[] cellHeight, float[] distance) {
        double[] since = new double[columns];
        Arrays.fill(since, Double.POSITIVE_INFINITY);
        for (int row = cellHeight.length - 1; row >= 0; row--) {
            takeRow(water, row, columns, cellHeight[row], since, distance);
        }
    }

    /** @param since {@code [column]}, m from the row's edge to the last water; moved to the row's other edge */
    private static void takeRow(boolean[] water, int row, int columns, double height, double[] since, float[] distance) {
        for (int column = 0; column < columns; column++) {
            int cell = row * columns + column;
            if (water[cell]) {
                since[column] = 0;
                distance[cell] = 0;
            } else {
                distance[cell] = (float) Math.min(distance[cell], since[column] + height / 2);
                since[column] += height;
            }
        }
    }

    /**
     * The envelope along one row. Water of another column is as near as the nearer edge of that column, so every column gives two
     * parabolas, one at each edge, and its own distance below.
     */
    private static void alongRow(float[] distance, int start, int columns, double width) {
        double[] at = new double[2 * columns];
        double[] squared = new double[2 * columns];
        double[] from = new double[2 * columns + 1];
        int count = 0;
        for (int edge = 0; edge < 2 * columns; edge++) {
            float own = distance[start + edge / 2];
            if (own == Float.POSITIVE_INFINITY) {
                continue;
            }
            double place = (edge / 2 + edge % 2) * width;
            double height = (double) own * own;
            if (count > 0 && at[count - 1] == place) {
                if (squared[count - 1] <= height) {
                    continue;
                }
                count--;
            }
            double meets = count == 0 ? Double.NEGATIVE_INFINITY : meeting(at, squared, count - 1, place, height);
            while (count > 0 && meets <= from[count - 1]) {
                count--;
                meets = count == 0 ? Double.NEGATIVE_INFINITY : meeting(at, squared, count - 1, place, height);
            }
            at[count] = place;
            squared[count] = height;
            from[count] = meets;
            count++;
        }
        if (count == 0) {
            return;
        }
        from[count] = Double.POSITIVE_INFINITY;
        int k = 0;
        for (int column = 0; column < columns; column++) {
            double place = (column + 0.5) * width;
            while (from[k + 1] < place) {
                k++;
            }
            double away = place - at[k];
            distance[start + column] = (float) Math.min(distance[start + column], Math.sqrt(away * away + squared[k]));
        }
    }

    /** Where the parabola of a new place becomes the lower one. */
    private static double meeting(double[] at, double[] squared, int k, double place, double height) {
        return (height + place * place - squared[k] - at[k] * at[k]) / (2 * (place - at[k]));
    }
}
