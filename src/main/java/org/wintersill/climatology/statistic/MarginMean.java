package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Mean over winters of the winter's lowest margin, K. */
public final class MarginMean implements ClimatologyStatistic {

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("margin-mean", "Margin, mean winter",
                "Mean over winters of the lowest Tmin - LT50 of the winter; below zero more than half of the buds die",
                "K", SampleType.FLOAT32, "time: minimum within years time: mean over years", LayerStyles.margin());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        MeanOverWinters.of(record.margins(0), out, from, to);
    }
}
