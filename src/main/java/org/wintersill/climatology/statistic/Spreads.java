package org.wintersill.climatology.statistic;

import org.wintersill.climatology.WinterRecord;
import org.wintersill.damage.StandardNormal;

/**
 * Spreads of the tolerance curve that a winter's margins imply: the margins to two lethal temperatures of one night differ by
 * s z_x, z_x = ln(x / (100 - x)) or the normal quantile, so s = (M_x - M_50) / z_x, from the lowest level for the warm side and the highest for the cold side;
 * a side without a level takes the other's. Exact where the same night decides for all levels, and near it elsewhere.
 */
final class Spreads {
    private final int warmLevel;
    private final int coldLevel;
    private final double warmShare;
    private final double coldShare;

    /** @param levels percent of buds of each level, 50 first, at least one other */
    Spreads(int[] levels) {
        int lowest = 0;
        int highest = 0;
        for (int i = 1; i < levels.length; i++) {
            lowest = levels[i] < levels[lowest] ? i : lowest;
            highest = levels[i] > levels[highest] ? i : highest;
        }
        warmLevel = lowest == 0 ? highest : lowest;
        coldLevel = highest == 0 ? lowest : highest;
        warmShare = levels[warmLevel] / 100.0;
        coldShare = levels[coldLevel] / 100.0;
    }

    private static double of(WinterRecord record, int level, double share, int winter, int cell) {
        double steps = record.tolerance().isProbit() ? StandardNormal.quantile(share) : Math.log(share / (1 - share));
        return ((double) record.margins(level)[winter][cell] - record.margins(0)[winter][cell]) / steps;
    }

    /** Spread of the warm side, K. */
    double warm(WinterRecord record, int winter, int cell) {
        return of(record, warmLevel, warmShare, winter, cell);
    }

    /** Spread of the cold side, K. */
    double cold(WinterRecord record, int winter, int cell) {
        return of(record, coldLevel, coldShare, winter, cell);
    }
}
