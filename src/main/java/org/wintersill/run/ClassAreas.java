package org.wintersill.run;

import java.util.Arrays;
import java.util.function.IntUnaryOperator;
import org.wintersill.elevation.ElevationAdjustment;

/**
 * Area, number of cells and ground heights of each class of one cultivar, or of each connected part of a class. Index 0 is what
 * belongs to none.
 *
 * @param cells number of cells by class
 * @param areaKm2 area by class, km2
 * @param lowest lowest ground by class, m; NaN without heights
 * @param mean mean height by class, weighted by area, m
 * @param highest highest ground by class, m
 */
public record ClassAreas(long[] cells, double[] areaKm2, double[] lowest, double[] mean, double[] highest) {
    static final int CLASSES = 4;

    /**
     * Areas of the four classes.
     *
     * @param classes {@code [cell]}, 1 to 4, 0 for missing
     * @param rowAreasKm2 area of a cell in each row
     */
    static ClassAreas of(byte[] classes, int columns, double[] rowAreasKm2, ElevationAdjustment adjustment) {
        return of(CLASSES, cell -> classes[cell], columns, rowAreasKm2, adjustment);
    }

    /**
     * Adds up, row by row from the north, so that the sums are the same whatever the work was cut into.
     *
     * @param groups number of groups, numbered from 1
     * @param groupOf group of a cell, 0 for none
     */
    static ClassAreas of(int groups, IntUnaryOperator groupOf, int columns, double[] rowAreasKm2, ElevationAdjustment adjustment) {
        long[] cells = new long[groups + 1];
        double[] area = new double[groups + 1];
        double[] lowest = missing(groups + 1);
        double[] highest = missing(groups + 1);
        double[] weighted = new double[groups + 1];
        for (int cell = 0; cell < columns * rowAreasKm2.length; cell++) {
            int group = groupOf.applyAsInt(cell);
            double cellArea = rowAreasKm2[cell / columns];
            cells[group]++;
            area[group] += cellArea;
            float height = adjustment.targetHeight(cell);
            if (height == height) {
                weighted[group] += cellArea * height;
                lowest[group] = lowest[group] <= height ? lowest[group] : height;
                highest[group] = highest[group] >= height ? highest[group] : height;
            }
        }
        double[] mean = missing(groups + 1);
        for (int group = 1; group <= groups; group++) {
            mean[group] = Double.isNaN(lowest[group]) ? Double.NaN : weighted[group] / area[group];
        }
        return new ClassAreas(cells, area, lowest, mean, highest);
    }

    private static double[] missing(int count) {
        double[] values = new double[count];
        Arrays.fill(values, Double.NaN);
        return values;
    }

    /** Area of all cells that have a class, km2. */
    double total() {
        double total = 0;
        for (int code = 1; code < areaKm2.length; code++) {
            total += areaKm2[code];
        }
        return total;
    }

    /** Share of the classed area; NaN where there is none. */
    double share(int code) {
        return areaKm2[code] / total();
    }
}
