package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.FittedDamage;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Expected fraction of buds killed in a winter by the fitted distribution of the margin: the tolerance curve, with the mean of the
 * winters' spreads, integrated over it; beside {@link DamageMean}, which knows only the winters of the record (science section 5, 6.2).
 */
final class DamageMeanFitted implements ClimatologyStatistic {
    private final ExtremeChoices choices;
    private final Spreads spreads;

    DamageMeanFitted(ExtremeChoices choices, int[] levels) {
        this.choices = choices;
        spreads = new Spreads(levels);
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("damage-mean-fitted", "Expected damage by the fitted extremes",
                "Expected fraction of buds killed in a winter: the tolerance curve integrated over the fitted distribution of the winter's "
                        + "lowest margin", "1", SampleType.FLOAT32, "", LayerStyles.damage());
    }

    @Override
    public LayerGroup group() {
        return choices.byDefault() ? LayerGroup.DEFAULT : LayerGroup.EXTREMES;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        FieldFits fits = FieldFits.of(record, WinterField.margin(), choices);
        float[][] margins = record.margins(0);
        for (int cell = from; cell < to; cell++) {
            double warm = 0;
            double cold = 0;
            int n = 0;
            for (int winter = 0; winter < margins.length; winter++) {
                if (margins[winter][cell] == margins[winter][cell]) {
                    warm += spreads.warm(record, winter, cell);
                    cold += spreads.cold(record, winter, cell);
                    n++;
                }
            }
            out[cell] = (float) FittedDamage.expected(fits.at(cell).gev(), record.tolerance(), warm / n, cold / n);
        }
    }
}
