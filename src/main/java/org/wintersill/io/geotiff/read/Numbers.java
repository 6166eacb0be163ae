package org.wintersill.io.geotiff.read;

/** Numbers in messages. */
final class Numbers {
    private Numbers() {
    }

    /** Whole numbers without a point. */
    static String plain(double value) {
        return value == Math.rint(value) && Math.abs(value) < 1e15 ? Long.toString((long) value) : Double.toString(value);
    }
}
