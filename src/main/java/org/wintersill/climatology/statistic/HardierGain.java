package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * K gained by the hardiest variant of a population over its middle one: the same wherever the cultivar has a value, to be held against
 * the gain by a milder site.
 */
public final class HardierGain implements ClimatologyStatistic {
    private final Population population;

    public HardierGain(Population population) {
        this.population = population;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("hardier-gain", "Gain by the hardiest variant",
                "Margin gained by the hardiest variant over the middle one" + (population.offsets().length == 0
                        ? "; of a spread, by the variant that a tenth of the population exceeds" : ""), "K", SampleType.FLOAT32, "",
                LayerStyles.gain());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        int[] counts = record.counts();
        for (int cell = from; cell < to; cell++) {
            out[cell] = counts[cell] == 0 ? Float.NaN : (float) population.hardierGain();
        }
    }
}
