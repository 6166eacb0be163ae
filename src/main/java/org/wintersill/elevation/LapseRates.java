package org.wintersill.elevation;

import java.io.Serializable;
import java.util.Arrays;

/**
 * Decrease of the minimum temperature with height, K per km, by calendar month; positive when higher is colder.
 *
 * <p>The default for November to March is 4.5 K/km, informed by station means of Colorado 1961-1990 and published ranges
 * (science 7.2). A night takes the rate of its own month, without smoothing between months.
 */
public final class LapseRates implements Serializable {
    private static final long serialVersionUID = 1L;

    /** Default, K/km (science 7.2, project choice). */
    public static final double DEFAULT = 4.5;
    /** Lapse rate of the standard atmosphere up to 11 km, K/km of geopotential height: ISO 2533:1975 (constants from memory). */
    public static final double STANDARD_ATMOSPHERE = 6.5;
    /** Bounds of what is accepted, K/km: a strong inversion and the dry adiabat (science 7.2). */
    public static final double LOWEST = -8;
    public static final double HIGHEST = 9.8;

    private final double[] byMonth;

    /** @param byMonth twelve rates, January first, each within the bounds */
    public LapseRates(double[] byMonth) {
        if (byMonth.length != 12 || Arrays.stream(byMonth).anyMatch(rate -> !(rate >= LOWEST && rate <= HIGHEST))) {
            throw new IllegalArgumentException("twelve lapse rates within " + LOWEST + ".." + HIGHEST + " are needed, not "
                    + Arrays.toString(byMonth));
        }
        this.byMonth = byMonth.clone();
    }

    public static LapseRates constant(double rate) {
        double[] rates = new double[12];
        Arrays.fill(rates, rate);
        return new LapseRates(rates);
    }

    /** Rate of a month 1..12, K/km. */
    public double ofMonth(int month) {
        return byMonth[month - 1];
    }

    /**
     * Temperature brought from one height to another: T + G (z_from - z_to) / 1000.
     *
     * @param t degrees Celsius
     * @param lapse K/km, positive when higher is colder
     * @param from height that t stands for, m
     * @param to height wanted, m
     */
    public static double atHeight(double t, double lapse, double from, double to) {
        return t + lapse * (from - to) / 1000;
    }
}
