package org.wintersill.engine;

import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/**
 * Means over the nights of all winters of what nights bring beside their temperatures, by source cell of the job's window; a night counts
 * in a cell that has a temperature. Nights are added in the order of time, so the sums are the same however the work is cut.
 */
public final class NightMeans {
    private final FoldJob job;
    private final int[] count;
    private final double[] rate;
    private final double[] squaredRate;
    private final double[] weight;
    private int rowsTaken;

    public NightMeans(FoldJob job) {
        this.job = job;
        boolean kept = job.adjustment().localLapse().isPresent() || job.weighsNights();
        count = new int[kept ? job.window().cells() : 0];
        rate = new double[job.adjustment().localLapse().isPresent() ? count.length : 0];
        squaredRate = new double[rate.length];
        weight = new double[job.weighsNights() ? count.length : 0];
    }

    static long bytes(FoldJob job) {
        return NightSlabs.slabs(job) == 0 ? 0 : 28L * job.window().cells();
    }

    /** Takes the rows up to {@code end} as this band's, without those that a band before took; says where they begin. */
    int claim(int from, int end) {
        int first = Math.max(from, rowsTaken);
        rowsTaken = Math.max(rowsTaken, end);
        return Math.min(first, end);
    }

    /**
     * Takes a night of the cells {@code from} to {@code to - 1} of a slab's day.
     *
     * @param start where the day begins in the slabs
     * @param shift number of the day's first cell in the window
     */
    void take(float[] minima, float[] rates, float[] weights, int start, int from, int to, int shift) {
        for (int i = from; i < to; i++) {
            if (minima[start + i] == minima[start + i]) {
                count[shift + i]++;
                if (rates != null) {
                    rate[shift + i] += rates[start + i];
                    squaredRate[shift + i] += (double) rates[start + i] * rates[start + i];
                }
                if (weights != null) {
                    weight[shift + i] += weights[start + i];
                }
            }
        }
    }

    /** Mean lapse rate, {@code [window cell]}, K/km; NaN for a cell without a night; null where no rates are fitted. */
    public float[] meanRate() {
        return rate.length == 0 ? null : mean(rate);
    }

    /** Standard deviation of the nights' lapse rates (divisor n - 1), {@code [window cell]}, K/km; NaN with fewer than two nights. */
    public float[] spreadOfRate() {
        float[] spread = new float[rate.length];
        for (int i = 0; i < spread.length; i++) {
            double n = count[i];
            spread[i] = n < 2 ? Float.NaN : (float) Math.sqrt(Math.max(0, (squaredRate[i] - rate[i] * rate[i] / n) / (n - 1)));
        }
        return spread;
    }

    /** Mean weight of pools, {@code [window cell]}, 0..1; NaN for a cell without a night; null where every night counts fully. */
    public float[] meanWeight() {
        return weight.length == 0 ? null : mean(weight);
    }

    private float[] mean(double[] sums) {
        float[] means = new float[sums.length];
        for (int i = 0; i < means.length; i++) {
            means[i] = (float) (sums[i] / count[i]);
        }
        return means;
    }

    /** Means over the nights of all winters that have a record. */
    public record OverNights(double lapse, double openShare) {
    }

    /** Mean of the lapse rates by month, K/km, and share of the nights on which water is open. */
    public OverNights overNights() {
        ElevationAdjustment adjustment = job.adjustment();
        DayAxis axis = job.source().days();
        double lapse = 0;
        long open = 0;
        long nights = 0;
        for (Season season : job.seasons()) {
            int end = axis.firstIndexFrom(season.firstDay() + season.days());
            for (int position = axis.firstIndexFrom(season.firstDay()); position < end; position++) {
                CfDate date = season.date((int) (axis.day(position) - season.firstDay()));
                lapse += adjustment.lapseRates().ofMonth(date.month());
                open += adjustment.terms().frozen().holds(date.month(), date.day()) ? 0 : 1;
                nights++;
            }
        }
        return new OverNights(lapse / nights, (double) open / nights);
    }
}
