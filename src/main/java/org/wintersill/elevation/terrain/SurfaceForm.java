package org.wintersill.elevation.terrain;

import org.wintersill.grid.Block;

/**
 * Slope and curvature of the ground from a cell and its eight neighbours
 * <pre>
 * a b c
 * d e f      w, h: width and height of a cell, m
 * g i j
 * dz/dx = ((c + 2 f + j) - (a + 2 d + g)) / (8 w)      dz/dy likewise with h      slope = atan(sqrt(dz/dx^2 + dz/dy^2))
 * curvature = (d + f - 2 e) / w^2 + (b + i - 2 e) / h^2, the Laplacian: positive in a hollow, negative on a crest
 * </pre>
 * after Horn 1981, Proceedings of the IEEE 69:14 (from memory; values compared with GDAL). Both are NaN where one of the nine
 * heights is missing, so along the border of the terrain model too.
 */
public final class SurfaceForm {
    private SurfaceForm() {
    }

    /** Slope in degrees, 0 to 90, of a block. */
    public static float[] slope(Relief relief, Block block, Tasks tasks) {
        float[] out = new float[block.cells()];
        tasks.forEach(block.rows(), r -> {
            int row = block.row() + r;
            for (int c = 0; c < block.columns(); c++) {
                out[r * block.columns() + c] = slope(relief, row, block.column() + c);
            }
        });
        return out;
    }

    /** Curvature in 1/m of a block. */
    public static float[] curvature(Relief relief, Block block, Tasks tasks) {
        float[] out = new float[block.cells()];
        tasks.forEach(block.rows(), r -> {
            int row = block.row() + r;
            for (int c = 0; c < block.columns(); c++) {
                out[r * block.columns() + c] = curvature(relief, row, block.column() + c);
            }
        });
        return out;
    }

    private static boolean onBorder(Relief relief, int row, int column) {
        return row < 1 || row >= relief.rows() - 1 || column < 1 || column >= relief.columns() - 1;
    }

    private static float slope(Relief relief, int row, int column) {
        if (onBorder(relief, row, column)) {
            return Float.NaN;
        }
        float[] z = relief.metres();
        int e = row * relief.columns() + column;
        int b = e - relief.columns();
        int i = e + relief.columns();
        double east = (double) z[b + 1] + 2.0 * z[e + 1] + z[i + 1] - z[b - 1] - 2.0 * z[e - 1] - z[i - 1];
        double south = (double) z[i - 1] + 2.0 * z[i] + z[i + 1] - z[b - 1] - 2.0 * z[b] - z[b + 1];
        double dx = east / (8 * relief.cellWidth()[row]);
        double dy = south / (8 * relief.cellHeight()[row]);
        return Float.isNaN(z[e]) ? Float.NaN : (float) Math.toDegrees(Math.atan(Math.sqrt(dx * dx + dy * dy)));
    }

    private static float curvature(Relief relief, int row, int column) {
        if (Float.isNaN(slope(relief, row, column))) {
            return Float.NaN;
        }
        float[] z = relief.metres();
        int e = row * relief.columns() + column;
        double w = relief.cellWidth()[row];
        double h = relief.cellHeight()[row];
        double across = (double) z[e - 1] + z[e + 1] - 2.0 * z[e];
        double along = (double) z[e - relief.columns()] + z[e + relief.columns()] - 2.0 * z[e];
        return (float) (across / (w * w) + along / (h * h));
    }
}
