package org.wintersill.grid;

/** Port: turns coordinates of one coordinate reference system into those of another. Thread-safe. */
public interface CoordinateOperation {

    /**
     * Transforms points in place.
     *
     * @param xy x0, y0, x1, y1, ...; x is easting or longitude. A point that has no image becomes NaN, NaN
     * @param points number of points
     */
    void transform(double[] xy, int points);

    /** True if nothing would change, so that work can be skipped. */
    default boolean isIdentity() {
        return false;
    }

    /** The operation that changes nothing. */
    static CoordinateOperation identity() {
        return new CoordinateOperation() {
            @Override
            public void transform(double[] xy, int points) {
                // nothing to do
            }

            @Override
            public boolean isIdentity() {
                return true;
            }
        };
    }
}
