package org.wintersill.climatology.statistic;

import java.util.List;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ParametricBootstrap;
import org.wintersill.layer.LayerDefinition;

/** Lower or upper bound of a number that follows from a fit, by parametric bootstrap (science 6.2, intervals of rasters). */
final class FittedBound implements ClimatologyStatistic {
    private final LayerDefinition layer;
    private final WinterField field;
    private final ExtremeChoices choices;
    private final double confidence;
    private final List<ParametricBootstrap.Quantity> quantities;
    private final int quantity;
    private final boolean upper;

    /**
     * @param quantities all that are bounded for the field, the same list for all layers of the field
     * @param quantity position of the one that is meant
     */
    FittedBound(LayerDefinition layer, WinterField field, ExtremeChoices choices, double confidence,
                List<ParametricBootstrap.Quantity> quantities, int quantity, boolean upper) {
        this.layer = layer;
        this.field = field;
        this.choices = choices;
        this.confidence = confidence;
        this.quantities = quantities;
        this.quantity = quantity;
        this.upper = upper;
    }

    @Override
    public LayerDefinition layer() {
        return layer;
    }

    @Override
    public LayerGroup group() {
        return LayerGroup.BOUNDS;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        FieldBounds bounds = FieldBounds.of(record, field, choices, confidence, quantities);
        for (int cell = from; cell < to; cell++) {
            float value = upper ? bounds.upper(quantity, cell) : bounds.lower(quantity, cell);
            out[cell] = Float.isInfinite(value) ? Float.NaN : value;
        }
    }
}
