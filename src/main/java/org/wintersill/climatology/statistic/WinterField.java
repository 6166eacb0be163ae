package org.wintersill.climatology.statistic;

import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;

/**
 * A quantity with one low a winter: the lowest minimum, or the lowest margin to the lethal temperature of a level.
 *
 * @param id last part of layer ids
 * @param words for descriptions
 * @param unit of its values
 * @param style of its values
 * @param level position of the level among the record's; -1 for the minimum
 */
record WinterField(String id, String words, String unit, LayerStyle style, int level) {

    static WinterField minimum() {
        return new WinterField("minimum", "lowest Tmin of the winter", "degC", LayerStyles.temperature(), -1);
    }

    /** Lowest margin to LT50. */
    static WinterField margin() {
        return killing(50, 0);
    }

    /** Lowest margin to the lethal temperature that makes a killing winter. */
    static WinterField killing(int percent, int level) {
        return new WinterField("margin", "lowest Tmin - LT" + percent + " of the winter", "K", LayerStyles.margin(), level);
    }

    /** {@code [winter][cell]}, NaN where a winter does not count. */
    float[][] values(WinterRecord record) {
        return level < 0 ? record.minimum() : record.margins(level);
    }
}
