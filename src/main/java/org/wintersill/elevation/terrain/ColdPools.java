package org.wintersill.elevation.terrain;

import java.util.Optional;
import org.wintersill.grid.Block;

/**
 * Cooling of low ground by pools of cold air on a calm clear night (science 7.4)
 * <pre>
 * dT = -A I exp(-h / D)
 * I = min(1, max(0, (0.5 - percentile) / 0.5)), or 1 on ground of the class prone and 0 elsewhere
 * </pre>
 * with h the height above the lowest ground in the window. Strengths of 2 to 6 K and depths of 30 to 100 m are typical; extreme sinkholes
 * are far colder (common practice, no single source).
 *
 * @param strength A, K, at least 0
 * @param depth D, m, positive
 * @param window the neighbourhood; about half the distance from ridge to valley
 * @param byClass whether I follows from the class
 */
public record ColdPools(double strength, double depth, Window window, boolean byClass) {

    /** K added to the minimum, never positive; NaN where one of the two is. */
    public static double change(double strength, double index, double aboveLowest, double depth) {
        return -strength * index * Math.exp(-aboveLowest / depth);
    }

    /** I of a percentile: 1 at the bottom, 0 from the middle up. */
    public static float index(float percentile) {
        return Math.min(1, Math.max(0, (0.5f - percentile) / 0.5f));
    }

    /**
     * What the ground of a block does to cold air.
     *
     * @param index I, 0..1, NaN for a void
     * @param change K on a night of full strength, NaN for a void
     * @param classes code of a {@link ColdAirClass}, 0 where there is none
     */
    public record Ground(float[] index, float[] change, byte[] classes) {
    }

    /** The ground of a block. A missing class, along the border, gives no pool. */
    public Ground over(Relief relief, Block block, Tasks tasks) {
        LocalHeights heights = LocalHeights.of(relief, window, block, tasks);
        float[] slope = SurfaceForm.slope(relief, block, tasks);
        float[] curvature = SurfaceForm.curvature(relief, block, tasks);
        Ground ground = new Ground(heights.percentile(), heights.aboveLowest(), new byte[block.cells()]);
        tasks.forEach(block.rows(), row -> {
            for (int i = row * block.columns(); i < (row + 1) * block.columns(); i++) {
                Optional<ColdAirClass> found = ColdAirClass.of(slope[i], heights.percentile()[i], curvature[i]);
                ground.classes[i] = (byte) found.map(ColdAirClass::code).orElse(0).intValue();
                if (heights.percentile()[i] == heights.percentile()[i]) {
                    ground.index[i] = !byClass ? index(heights.percentile()[i]) : found.equals(Optional.of(ColdAirClass.PRONE)) ? 1 : 0;
                }
                ground.change[i] = (float) change(strength, ground.index[i], heights.aboveLowest()[i], depth);
            }
        });
        return ground;
    }
}
