package org.wintersill.climatology.statistic;

import java.util.List;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.FitQuality;
import org.wintersill.climatology.extreme.ParametricBootstrap;

/**
 * Bounds of what follows from the fits of a field, by one set of replicates a cell for all quantities; and the p-value of the fit,
 * which is drawn for separately since it takes longer than all bounds.
 */
final class FieldBounds {
    private final float[][] lower;
    private final float[][] upper;

    private record Key(int level, boolean test) {
    }

    private FieldBounds(int quantities, int cells) {
        lower = new float[quantities][cells];
        upper = new float[quantities][cells];
    }

    /** The bounds of all quantities of a field, {@code NaN} where there is no fit. */
    static FieldBounds of(WinterRecord record, WinterField field, ExtremeChoices choices, double confidence,
                          List<ParametricBootstrap.Quantity> quantities) {
        return record.derived(new Key(field.level(), false), () -> {
            FieldBounds bounds = new FieldBounds(quantities.size(), record.cells());
            FieldFits fits = FieldFits.of(record, field, choices);
            ParametricBootstrap bootstrap = new ParametricBootstrap(choices.replicates(), choices.seed(), record.winters());
            for (int cell = 0; cell < record.cells(); cell++) {
                ExtremeFit fit = fits.at(cell);
                ParametricBootstrap.Replicates replicates = fit.kind() == ExtremeFit.Kind.NONE ? null
                        : bootstrap.of(fit, fits.sortedMaxima(cell), record.firstCell() + cell, false);
                for (int q = 0; q < quantities.size(); q++) {
                    double[] pair = replicates == null ? new double[] {Double.NaN, Double.NaN}
                            : replicates.bounds(quantities.get(q), confidence);
                    bounds.lower[q][cell] = (float) pair[0];
                    bounds.upper[q][cell] = (float) pair[1];
                }
            }
            return bounds;
        });
    }

    float lower(int quantity, int cell) {
        return lower[quantity][cell];
    }

    float upper(int quantity, int cell) {
        return upper[quantity][cell];
    }

    /** p-values of the fits by Anderson and Darling's distance, {@code [cell]}. */
    static float[] pValues(WinterRecord record, WinterField field, ExtremeChoices choices) {
        return record.derived(new Key(field.level(), true), () -> {
            float[] pValues = new float[record.cells()];
            FieldFits fits = FieldFits.of(record, field, choices);
            ParametricBootstrap bootstrap = new ParametricBootstrap(choices.replicates(), choices.seed(), record.winters());
            for (int cell = 0; cell < pValues.length; cell++) {
                ExtremeFit fit = fits.at(cell);
                int n = fits.sortedMaxima(cell);
                pValues[cell] = fit.kind() == ExtremeFit.Kind.NONE ? Float.NaN
                        : (float) bootstrap.of(fit, n, record.firstCell() + cell, true)
                        .pValue(FitQuality.andersonDarling(fits.room(), n, fit.general()));
            }
            return pValues;
        });
    }
}
