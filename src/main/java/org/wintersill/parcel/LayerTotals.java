package org.wintersill.parcel;

import java.util.Arrays;

/** Mean, lowest and highest value of one band in every parcel, weighted by covered area. Missing cells count for nothing. */
public final class LayerTotals {
    private final double[] sum;
    private final double[] weight;
    private final float[] lowest;
    private final float[] highest;

    public LayerTotals(int parcels) {
        sum = new double[parcels];
        weight = new double[parcels];
        lowest = new float[parcels];
        highest = new float[parcels];
        Arrays.fill(lowest, Float.POSITIVE_INFINITY);
        Arrays.fill(highest, Float.NEGATIVE_INFINITY);
    }

    /** @param values of the tile, NaN for missing */
    public void add(CoveredCells cells, int tile, float[] values) {
        cells.eachRun(tile, (parcel, from, count, area) -> {
            double total = 0;
            int valid = 0;
            float low = lowest[parcel];
            float high = highest[parcel];
            for (int i = from; i < from + count; i++) {
                float value = values[i];
                if (value == value) {
                    total += value;
                    valid++;
                    low = Math.min(low, value);
                    high = Math.max(high, value);
                }
            }
            sum[parcel] += area * total;
            weight[parcel] += area * valid;
            lowest[parcel] = low;
            highest[parcel] = high;
        });
    }

    /** Area of the cells with a value, km2. */
    public double weight(int parcel) {
        return weight[parcel];
    }

    /** Weighted mean; NaN without a value. */
    public double mean(int parcel) {
        return weight[parcel] > 0 ? sum[parcel] / weight[parcel] : Double.NaN;
    }

    public double lowest(int parcel) {
        return weight[parcel] > 0 ? lowest[parcel] : Double.NaN;
    }

    public double highest(int parcel) {
        return weight[parcel] > 0 ? highest[parcel] : Double.NaN;
    }
}
