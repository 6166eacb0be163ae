package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Expected fraction of buds killed in a winter: the mean over winters of the damage of the worst night. */
public final class DamageMean implements ClimatologyStatistic {

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("damage-mean", "Expected damage",
                "Expected fraction of buds killed in a winter: mean over winters of the damage of the worst night",
                "1", SampleType.FLOAT32, "time: maximum within years time: mean over years", LayerStyles.damage());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        MeanOverWinters.of(record.damage(), out, from, to);
    }
}
