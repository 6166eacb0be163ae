package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Expected fraction of buds killed in a winter: the mean over winters of the damage, with the uncertainty of the margin where there is
 * any (science 16.4).
 */
public final class DamageMean implements ClimatologyStatistic {

    private final String words;

    /** @param words how the damage of a winter was reckoned, such as {@code the damage of the worst night} */
    public DamageMean(String words) {
        this.words = words;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("damage-mean", "Expected damage",
                "Expected fraction of buds killed in a winter: mean over winters of " + words,
                "1", SampleType.FLOAT32, "time: maximum within years time: mean over years", LayerStyles.damage());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        MeanOverWinters.of(record.expectedDamage(), out, from, to);
    }
}
