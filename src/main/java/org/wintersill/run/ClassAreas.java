package org.wintersill.run;

import org.wintersill.elevation.ElevationAdjustment;

/**
 * Area, number of cells and ground heights of each class of one cultivar. Index 0 of the arrays is not used.
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
     * Adds up, row by row from the north, so that the sums are the same whatever the work was cut into.
     *
     * @param classes {@code [cell]}, 1 to 4, 0 for missing
     * @param rowAreasKm2 area of a cell in each row
     */
    static ClassAreas of(byte[] classes, int columns, double[] rowAreasKm2, ElevationAdjustment adjustment) {
        long[] cells = new long[CLASSES + 1];
        double[] area = new double[CLASSES + 1];
        double[] lowest = filled(Double.NaN);
        double[] highest = filled(Double.NaN);
        double[] weighted = new double[CLASSES + 1];
        for (int cell = 0; cell < classes.length; cell++) {
            int code = classes[cell];
            double cellArea = rowAreasKm2[cell / columns];
            cells[code]++;
            area[code] += cellArea;
            float height = adjustment.targetHeight(cell);
            if (height == height) {
                weighted[code] += cellArea * height;
                lowest[code] = lowest[code] <= height ? lowest[code] : height;
                highest[code] = highest[code] >= height ? highest[code] : height;
            }
        }
        double[] mean = filled(Double.NaN);
        for (int code = 1; code <= CLASSES; code++) {
            mean[code] = Double.isNaN(lowest[code]) ? Double.NaN : weighted[code] / area[code];
        }
        return new ClassAreas(cells, area, lowest, mean, highest);
    }

    private static double[] filled(double value) {
        double[] values = new double[CLASSES + 1];
        java.util.Arrays.fill(values, value);
        return values;
    }

    /** Area of all cells that have a class, km2. */
    double total() {
        double total = 0;
        for (int code = 1; code <= CLASSES; code++) {
            total += areaKm2[code];
        }
        return total;
    }

    /** Share of the classed area; NaN where there is none. */
    double share(int code) {
        return areaKm2[code] / total();
    }
}
