package org.wintersill.climatology.statistic;

import java.util.Arrays;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.Percentiles;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** 10th percentile over winters of the winter's lowest margin, K; type 7. */
public final class MarginLow implements ClimatologyStatistic {
    private static final double SHARE = 0.10;

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("margin-low", "Margin, one winter in ten",
                "10th percentile over winters of the lowest Tmin - LT50 of the winter: one winter in ten is worse",
                "K", SampleType.FLOAT32, "time: minimum within years", LayerStyles.margin());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        double[] margins = new double[record.winters()];
        for (int cell = from; cell < to; cell++) {
            int n = WinterRecord.valid(record.margins(0), cell, margins);
            Arrays.sort(margins, 0, n);
            out[cell] = n == 0 ? Float.NaN : (float) Percentiles.type7(margins, n, SHARE);
        }
    }
}
