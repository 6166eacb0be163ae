package org.wintersill.io.crs;

/**
 * An ellipsoid of revolution.
 *
 * @param name readable name
 * @param code EPSG code, 0 for none
 * @param semiMajor equatorial radius, metres
 * @param inverseFlattening 1/f; 0 stands for a sphere
 */
record Ellipsoid(String name, int code, double semiMajor, double inverseFlattening) {

    static final Ellipsoid WGS84 = new Ellipsoid("WGS 84", 7030, 6378137, 298.257223563);
    static final Ellipsoid GRS80 = new Ellipsoid("GRS 1980", 7019, 6378137, 298.257222101);

    static Ellipsoid sphere(double radius) {
        return new Ellipsoid("sphere", 0, radius, 0);
    }

    double flattening() {
        return inverseFlattening == 0 ? 0 : 1 / inverseFlattening;
    }

    double semiMinor() {
        return semiMajor * (1 - flattening());
    }

    /** e^2 = f (2 - f). */
    double eccentricitySquared() {
        return flattening() * (2 - flattening());
    }

    /** Same figure to a tenth of a millimetre, whatever the names. */
    boolean sameFigure(Ellipsoid other) {
        return Math.abs(semiMajor - other.semiMajor) < 1e-4 && Math.abs(semiMinor() - other.semiMinor()) < 1e-4;
    }
}
