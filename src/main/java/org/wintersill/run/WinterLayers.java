package org.wintersill.run;

import java.util.List;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** The list of layers that have one value a winter. */
final class WinterLayers {
    static final LayerDefinition MARGIN = new LayerDefinition("margin", "Margin of the winter",
            "Lowest Tmin - LT50 over the nights of the winter; below zero more than half of the buds die", "K", SampleType.FLOAT32,
            "time: minimum within years", LayerStyles.margin());
    static final LayerDefinition DAMAGE = new LayerDefinition("damage", "Damage of the winter",
            "Fraction of buds killed by the worst night of the winter", "1", SampleType.FLOAT32, "time: maximum within years",
            LayerStyles.damage());
    static final LayerDefinition WORST_NIGHT = new LayerDefinition("worst-night", "Worst night of the winter",
            "Earliest night of the lowest margin, in days since the first day of the winter window", "days", SampleType.INT16, "time: point within years",
            LayerStyles.night());
    static final LayerDefinition MINIMUM = new LayerDefinition("minimum", "Lowest minimum of the winter",
            "Lowest Tmin of the winter at the cell's own elevation", "degC", SampleType.FLOAT32, "time: minimum within years",
            LayerStyles.temperature());

    static final String COLD_NIGHTS = "cold-nights";
    static final String COLD_SPELL = "cold-spell";

    private WinterLayers() {
    }

    static List<String> ids() {
        return List.of(MARGIN.id(), DAMAGE.id(), WORST_NIGHT.id(), MINIMUM.id(), COLD_NIGHTS, COLD_SPELL);
    }

    /** Number of nights below a threshold, degrees Celsius. */
    static LayerDefinition coldNights(float threshold) {
        return new LayerDefinition(COLD_NIGHTS, "Cold nights of the winter", "Number of nights of the winter with Tmin below " + threshold
                + " degC", "days", SampleType.INT16, "", LayerStyles.count());
    }

    /** Longest run of such nights. */
    static LayerDefinition coldSpell(float threshold) {
        return new LayerDefinition(COLD_SPELL, "Longest cold spell of the winter", "Longest run of nights with Tmin below " + threshold
                + " degC; a missing night ends a run", "days", SampleType.INT16, "", LayerStyles.count());
    }
}
