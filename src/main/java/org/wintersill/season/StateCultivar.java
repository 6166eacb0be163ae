package org.wintersill.season;

import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.StateModel;

/**
 * A cultivar whose hardiness follows the temperatures of each cell, as the fold sees it.
 *
 * @param index number of the cultivar in the run
 * @param model its rule
 * @param tolerance form of the curve through the lethal temperatures of a night
 * @param levels percent of buds of each level of damage; the first is 50
 */
public record StateCultivar(int index, StateModel model, ToleranceCurve tolerance, double[] levels) {

    /**
     * Lethal temperature of each level as a share of the way from LT50 to LT10 (above zero) or to LT90 (below zero): 1 for level 10,
     * 0 for 50, -1 for 90.
     */
    float[] shares() {
        float[] shares = new float[levels.length];
        for (int level = 0; level < shares.length; level++) {
            shares[level] = (float) tolerance.lethalTemperature(levels[level], 1, 0, -1);
        }
        return shares;
    }
}
