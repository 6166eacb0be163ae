package org.wintersill.run;

import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Layers of all cultivars together and of none, besides the statistics over winters. */
final class SharedLayers {
    static final String CHOICE = "choice";
    static final String ELEVATION = "elevation";
    static final String HEIGHT_CHANGE = "height-change";

    private SharedLayers() {
    }

    /** How many cultivars meet the target, and the best margin among all. */
    static LayerDefinition choice(int cultivars, double target) {
        return new LayerDefinition(CHOICE, "Choice of cultivars",
                "Number of cultivars whose frequency of killing winters is at most " + target
                        + ", and the best 10th percentile of the winter margin among all cultivars",
                "1", SampleType.FLOAT32, "", LayerStyles.choice(cultivars));
    }

    /** Ground height of the cells, for tables by height that are made from the outputs alone. */
    static LayerDefinition elevation() {
        return new LayerDefinition(ELEVATION, "Elevation", "Height of the cell's ground in the terrain model", "m", SampleType.FLOAT32, "",
                LayerStyles.elevation());
    }

    static LayerDefinition heightChange() {
        return new LayerDefinition(HEIGHT_CHANGE, "Height change",
                "Height of the cell minus the height that the interpolated source temperature stands for; positive is higher, "
                        + "so colder for a positive lapse rate", "m", SampleType.FLOAT32, "", LayerStyles.heightChange());
    }
}
