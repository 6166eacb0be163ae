package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.layer.LayerDefinition;

/**
 * A number that follows from a cell's fit alone: return levels, return periods, the lowest possible value, parameters (science 6.2).
 * Missing where fewer than 20 winters count.
 */
final class FittedLayer implements ClimatologyStatistic {

    /** What is asked of a fit; NaN where there is none. */
    interface Question {
        double of(ExtremeFit fit);
    }

    private final LayerDefinition layer;
    private final WinterField field;
    private final ExtremeChoices choices;
    private final Question question;

    FittedLayer(LayerDefinition layer, WinterField field, ExtremeChoices choices, Question question) {
        this.layer = layer;
        this.field = field;
        this.choices = choices;
        this.question = question;
    }

    @Override
    public LayerDefinition layer() {
        return layer;
    }

    @Override
    public LayerGroup group() {
        return choices.byDefault() ? LayerGroup.DEFAULT : LayerGroup.EXTREMES;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        FieldFits fits = FieldFits.of(record, field, choices);
        for (int cell = from; cell < to; cell++) {
            double value = question.of(fits.at(cell));
            out[cell] = Double.isInfinite(value) ? Float.NaN : (float) value;
        }
    }
}
