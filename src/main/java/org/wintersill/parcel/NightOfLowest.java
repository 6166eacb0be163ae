package org.wintersill.parcel;

import java.util.Arrays;

/** The worst night of one winter in every parcel: that of the cell with the lowest margin, the earliest of several alike. */
public final class NightOfLowest {
    private final float[] margin;
    private final float[] night;

    public NightOfLowest(int parcels) {
        margin = new float[parcels];
        night = new float[parcels];
        Arrays.fill(margin, Float.POSITIVE_INFINITY);
        Arrays.fill(night, Float.NaN);
    }

    /**
     * @param margins of the tile, K, NaN for missing
     * @param nights of the tile, days since the first of the window
     */
    public void add(CoveredCells cells, int tile, float[] margins, float[] nights) {
        cells.eachRun(tile, (parcel, from, count, weight) -> {
            for (int i = from; i < from + count; i++) {
                // Of cells with the same margin the earlier night counts, so that the order of tiles does not.
                if (margins[i] < margin[parcel] || margins[i] == margin[parcel] && nights[i] < night[parcel]) {
                    margin[parcel] = margins[i];
                    night[parcel] = nights[i];
                }
            }
        });
    }

    /** Days since the first of the window; NaN without a value. */
    public double night(int parcel) {
        return night[parcel];
    }
}
