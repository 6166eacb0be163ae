package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Mean over winters of the number of cold nights, or of the longest run of them (science section 10). */
final class ColdNightsMean implements ClimatologyStatistic {
    private final float threshold;
    private final boolean spell;

    /**
     * @param threshold degrees Celsius
     * @param spell whether the longest run is meant
     */
    ColdNightsMean(float threshold, boolean spell) {
        this.threshold = threshold;
        this.spell = spell;
    }

    @Override
    public LayerDefinition layer() {
        return spell
                ? new LayerDefinition("cold-spell-mean", "Longest cold spell, mean", "Mean over winters of the longest run of nights with Tmin below "
                        + threshold + " degC; a missing night ends a run", "days", SampleType.FLOAT32, "", LayerStyles.count())
                : new LayerDefinition("cold-nights-mean", "Cold nights, mean", "Mean over winters of the number of nights with Tmin below "
                        + threshold + " degC", "days", SampleType.FLOAT32, "", LayerStyles.count());
    }

    @Override
    public LayerGroup group() {
        return LayerGroup.SEVERITY;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        MeanOverWinters.of(spell ? record.coldSpell() : record.coldNights(), out, from, to);
    }
}
