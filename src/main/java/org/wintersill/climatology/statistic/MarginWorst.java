package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Lowest margin of all winters, K. */
public final class MarginWorst implements ClimatologyStatistic {

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("margin-worst", "Margin, worst winter",
                "Lowest Tmin - LT50 of all winters; below zero more than half of the buds died in the worst winter",
                "K", SampleType.FLOAT32, "time: minimum within years time: minimum over years", LayerStyles.margin());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        for (int cell = from; cell < to; cell++) {
            int worst = worstWinter(record, cell);
            out[cell] = worst < 0 ? Float.NaN : record.margins(0)[worst][cell];
        }
    }

    /** Number of the earliest winter with the lowest margin; -1 where no winter counts. */
    static int worstWinter(WinterRecord record, int cell) {
        int worst = -1;
        for (int w = 0; w < record.winters(); w++) {
            float margin = record.margins(0)[w][cell];
            if (margin == margin && (worst < 0 || margin < record.margins(0)[worst][cell])) {
                worst = w;
            }
        }
        return worst;
    }
}
