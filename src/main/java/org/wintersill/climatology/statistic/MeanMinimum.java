package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Mean over winters of the winter's lowest minimum, degrees Celsius. Winters by label year, not calendar years. */
public final class MeanMinimum implements ClimatologyStatistic {

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("mean-minimum", "Mean of the winters' lowest minima",
                "Mean over winters (not calendar years) of the lowest Tmin of the winter at the cell's own elevation",
                "degC", SampleType.FLOAT32, "time: minimum within years time: mean over years", LayerStyles.temperature());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        MeanOverWinters.of(record.minimum(), out, from, to);
    }
}
