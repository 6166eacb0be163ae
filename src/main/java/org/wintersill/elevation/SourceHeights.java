package org.wintersill.elevation;

import org.wintersill.grid.GridGeometry;

/** The ground heights that the source's temperatures stand for, where only the terrain model is known. */
public final class SourceHeights {
    private SourceHeights() {
    }

    /**
     * Mean of the terrain model's cells whose centres lie in each source cell (science 16.10). Never the height at the
     * source cell's centre: that belongs to one point, not to the cell's mean temperature.
     *
     * @param dem heights of the target
     * @param positions where the terrain model's cells lie in the source grid
     * @return {@code [source cell]}, metres; NaN where fewer than half of the terrain cells in it have a height, or none lies
     *         in it
     */
    public static float[] blockMeans(ElevationField dem, SourcePositions positions) {
        int cells = Math.toIntExact(positions.source().cells());
        double[] sum = new double[cells];
        int[] valid = new int[cells];
        int[] inside = new int[cells];
        GridGeometry grid = dem.grid();
        for (int row = 0; row < grid.rows(); row++) {
            for (int column = 0; column < grid.columns(); column++) {
                int cell = positions.containing(row, column);
                if (cell < 0) {
                    continue;
                }
                inside[cell]++;
                float metres = dem.metres()[row * grid.columns() + column];
                if (!Float.isNaN(metres)) {
                    valid[cell]++;
                    sum[cell] += metres;
                }
            }
        }
        float[] means = new float[cells];
        for (int cell = 0; cell < cells; cell++) {
            boolean enough = valid[cell] > 0 && 2 * valid[cell] >= inside[cell];
            means[cell] = enough ? (float) (sum[cell] / valid[cell]) : Float.NaN;
        }
        return means;
    }
}
