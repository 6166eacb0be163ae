package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Number of winters that passed the completeness rule: the n of every other summary. */
public final class ValidWinters implements ClimatologyStatistic {
    private final int winters;

    /** @param winters number of winters of the run, for the colours */
    public ValidWinters(int winters) {
        this.winters = winters;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("valid-winters", "Valid winters",
                "Number of winters that passed the completeness rule; missing where none did",
                "1", SampleType.INT16, "", LayerStyles.count(winters));
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        int[] counts = record.counts();
        for (int cell = from; cell < to; cell++) {
            out[cell] = counts[cell] == 0 ? Float.NaN : counts[cell];
        }
    }
}
