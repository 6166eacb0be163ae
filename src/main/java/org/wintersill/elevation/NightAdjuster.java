package org.wintersill.elevation;

/**
 * Brings the temperatures of a night to a lane of target rows with everything that the adjustment holds
 * <pre>
 * T = I(T_src) + height + s (w pool + water) + offset
 * height = G gain, or with rates of each source cell  sum of weights times G_k (z_k - z) / 1000, G_k = s g_k + (1 - s) prior
 * </pre>
 * with s the share of an {@link AdjustedTemperature} and w the interpolated weight of the night. The plain adjustment is that of
 * {@link LaneAdjuster}, bit by bit. One a worker.
 */
public final class NightAdjuster {
    private final ElevationAdjustment adjustment;
    private final SourcePositions positions;
    private final LaneAdjuster plain;
    private final FieldInterpolator interpolator;
    private final float[] sourceKilometres;
    private final float[] rates;
    private final float[] lifted;
    private final float[] weights;
    private final float[] row;

    public NightAdjuster(ElevationAdjustment adjustment) {
        this.adjustment = adjustment;
        positions = adjustment.positions();
        plain = new LaneAdjuster(adjustment);
        boolean more = !adjustment.isPlain();
        int columns = more ? positions.target().columns() : 0;
        interpolator = more ? new FieldInterpolator(positions) : null;
        rates = new float[columns];
        lifted = new float[columns];
        weights = new float[columns];
        row = new float[columns];
        sourceKilometres = new float[adjustment.localLapse().isPresent() ? adjustment.sourceHeights().length : 0];
        for (int i = 0; i < sourceKilometres.length; i++) {
            sourceKilometres[i] = adjustment.sourceHeights()[i] / 1000;
        }
    }

    /**
     * Fills the target rows {@code firstRow} to {@code firstRow + rows - 1}.
     *
     * @param night source values, NaN for missing; source cell {@code c} is at {@code offset + c}, as in the fields; not changed
     * @param out {@code [row of the lane * columns + column]}, degrees Celsius; positive infinity where there is no value
     */
    public void adjust(float[] night, int offset, NightFields fields, AdjustedTemperature kind, int firstRow, int rows, float[] out) {
        if (fields.lapseField == null || kind.share() == 0) {
            plain.adjust(night, offset, fields.lapse, firstRow, rows, out);
        } else {
            for (int r = 0; r < rows; r++) {
                localRow(night, offset, fields, kind.share(), firstRow + r);
                System.arraycopy(row, 0, out, r * row.length, row.length);
            }
        }
        TargetTerms terms = adjustment.terms();
        if (terms.isNone()) {
            return;
        }
        int columns = positions.target().columns();
        for (int r = 0; r < rows; r++) {
            if (kind.share() > 0) {
                addNight(offset, fields, kind.share(), firstRow + r, out, r * columns);
            }
            if (kind.isExposed() && terms.offset() != 0) {
                addOffset((float) terms.offset(), out, r * columns, columns);
            }
        }
    }

    /** Between source cells, before any change: {@link #adjust} without height and terms. */
    public void interpolate(float[] night, int offset, int firstRow, int rows, float[] out) {
        plain.adjust(night, offset, 0, firstRow, rows, out);
    }

    /** A field of the source cells between them, for one target row: NaN beside a cell without value, of no use beyond the source. */
    public void interpolateField(float[] field, int targetRow, float[] out) {
        interpolator.row(field, 0, null, targetRow, out);
    }

    /** Lapse rate of the night at a target cell, K/km; NaN beyond the source. */
    public float lapse(int offset, NightFields fields, int targetRow, int column) {
        if (fields.lapseField == null) {
            return (float) fields.lapse;
        }
        interpolator.row(fields.lapseField, offset, null, targetRow, rates);
        return positions.containing(targetRow, column) < 0 ? Float.NaN : rates[column];
    }

    /** Change by pools at a target cell, K, with the weight of the night. */
    public float poolChange(int offset, NightFields fields, int targetRow, int column) {
        if (!adjustment.terms().hasPools()) {
            return 0;
        }
        takeWeights(offset, fields, targetRow);
        return positions.containing(targetRow, column) < 0 ? Float.NaN : weights[column] * adjustment.terms().pool(targetRow, column);
    }

    /** Change by water at a target cell on the night, K. */
    public float waterChange(NightFields fields, int targetRow, int column) {
        return fields.open ? adjustment.terms().water(targetRow, column) : 0;
    }

    private void localRow(float[] night, int offset, NightFields fields, float share, int targetRow) {
        interpolator.row(night, offset, null, targetRow, row);
        interpolator.row(fields.lapseField, offset, null, targetRow, rates);
        interpolator.row(fields.lapseField, offset, sourceKilometres, targetRow, lifted);
        float prior = (float) ((1 - share) * fields.lapse);
        addLocalHeight(rates, lifted, adjustment.targetHeights(), targetRow * row.length, adjustment.heightGain(targetRow), share, prior, row);
        for (int column = 0; column < row.length; column++) {
            if (Float.isNaN(row[column])) {
                int source = adjustment.containing(targetRow, column);
                boolean missing = source < 0 || Float.isNaN(night[offset + source]);
                row[column] = missing ? Float.POSITIVE_INFINITY : withoutMissingCorners(night, offset, fields, share, targetRow, column);
            }
        }
        for (int column : adjustment.missingColumns(targetRow)) {
            row[column] = Float.POSITIVE_INFINITY;
        }
    }

    private static void addLocalHeight(float[] rates, float[] lifted, float[] heights, int start, float[] gain, float share, float prior,
                                       float[] row) {
        for (int i = 0; i < row.length; i++) {
            row[i] += share * (lifted[i] - rates[i] * (heights[start + i] / 1000)) + prior * gain[i];
        }
    }

    /** The value of a cell whose own source cell has one: every source cell's profile at the cell's height, missing ones left out. */
    private float withoutMissingCorners(float[] night, int offset, NightFields fields, float share, int targetRow, int column) {
        int columns = positions.source().columns();
        int corner = positions.north(targetRow, column) * columns + positions.west(targetRow, column);
        double kilometres = adjustment.targetHeight(targetRow * row.length + column) / 1000.0;
        double total = 0;
        double sum = 0;
        for (int k = 0; k < 4; k++) {
            double weight = adjustment.cornerWeight(targetRow, column, k);
            if (weight > 0) {
                int source = corner + k / 2 * columns + k % 2;
                double rate = share * fields.lapseField[offset + source] + (1 - share) * fields.lapse;
                double value = night[offset + source] + rate * (sourceKilometres[source] - kilometres);
                if (!Double.isNaN(value)) {
                    total += weight * value;
                    sum += weight;
                }
            }
        }
        return (float) (total / sum);
    }

    private void takeWeights(int offset, NightFields fields, int targetRow) {
        if (fields.poolWeight == null) {
            java.util.Arrays.fill(weights, 1);
        } else {
            interpolator.row(fields.poolWeight, offset, null, targetRow, weights);
        }
    }

    private void addNight(int offset, NightFields fields, float share, int targetRow, float[] out, int start) {
        TargetTerms terms = adjustment.terms();
        if (terms.hasPools()) {
            takeWeights(offset, fields, targetRow);
            addProduct(share, weights, terms.poolRow(targetRow), out, start);
        }
        if (terms.hasWater() && fields.open) {
            addScaled(share, terms.waterRow(targetRow), out, start);
        }
    }

    /** A cell without value stays without: its weight may be anything. */
    private static void addProduct(float share, float[] weights, float[] change, float[] out, int start) {
        for (int i = 0; i < change.length; i++) {
            if (out[start + i] < Float.POSITIVE_INFINITY) {
                out[start + i] += share * weights[i] * change[i];
            }
        }
    }

    private static void addScaled(float share, float[] change, float[] out, int start) {
        for (int i = 0; i < change.length; i++) {
            out[start + i] += share * change[i];
        }
    }

    private static void addOffset(float kelvin, float[] out, int start, int count) {
        for (int i = start; i < start + count; i++) {
            out[i] += kelvin;
        }
    }
}
