package org.wintersill.elevation;

/**
 * Two layers of air: above the top of an inversion it is colder with height, below it is colder towards the floor (science 7.4)
 * <pre>
 * T(z) = T_top - free (z - top) / 1000  above,      T_top - rise (top - z) / 1000  below
 * </pre>
 *
 * @param top height of the inversion's top, m
 * @param rise K/km by which it warms upwards below the top, positive
 * @param free lapse rate above, K/km
 */
public record Inversion(double top, double rise, double free) {

    /** Temperature at a height, degC, from that at the top. */
    public double temperature(double atTop, double z) {
        return z >= top ? LapseRates.atHeight(atTop, free, top, z) : LapseRates.atHeight(atTop, -rise, top, z);
    }

    /** What the lower layer adds to the free lapse rate at a height, K; never positive, 0 from the top upwards. */
    public double excess(double z) {
        return -(rise + free) * Math.max(0, top - z) / 1000;
    }
}
