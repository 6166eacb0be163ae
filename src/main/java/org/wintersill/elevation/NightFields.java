package org.wintersill.elevation;

import org.wintersill.time.CfDate;

/**
 * What one night brings beside its temperatures. A worker keeps one and fills it night by night.
 */
public final class NightFields {
    double lapse;
    float[] lapseField;
    float[] poolWeight;
    boolean open;

    /**
     * Fills it.
     *
     * @param lapse K/km of the month: the lapse rate, or the prior where there is a field
     * @param lapseField K/km by source cell, laid out like the temperatures; null where the lapse rate is one for all
     * @param poolWeight 0..1 by source cell, laid out likewise; null where every night counts fully
     * @param open whether water is open
     */
    public NightFields set(double lapse, float[] lapseField, float[] poolWeight, boolean open) {
        this.lapse = lapse;
        this.lapseField = lapseField;
        this.poolWeight = poolWeight;
        this.open = open;
        return this;
    }

    /**
     * Fills it for a date: lapse rate of the month, water open unless the date lies in the frozen period.
     *
     * @param lapseField as in {@link #set}
     * @param poolWeight likewise
     */
    public NightFields of(ElevationAdjustment adjustment, CfDate date, float[] lapseField, float[] poolWeight) {
        return set(adjustment.lapseRates().ofMonth(date.month()), lapseField, poolWeight,
                !adjustment.terms().frozen().holds(date.month(), date.day()));
    }
}
