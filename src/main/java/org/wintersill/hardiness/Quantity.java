package org.wintersill.hardiness;

/**
 * What a parameter of a model may be.
 *
 * @param lowest accepted
 * @param highest accepted
 * @param accepted the same in words with the unit, such as {@code degC from -90 to 90}
 */
public record Quantity(double lowest, double highest, String accepted) {

    /** A quantity in a unit, from {@code lowest} to {@code highest}. */
    public static Quantity of(String unit, double lowest, double highest) {
        return new Quantity(lowest, highest, unit + " from " + plain(lowest) + " to " + plain(highest));
    }

    private static String plain(double value) {
        return value == Math.rint(value) ? Long.toString((long) value) : Double.toString(value);
    }
}
