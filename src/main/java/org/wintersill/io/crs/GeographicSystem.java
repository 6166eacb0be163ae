package org.wintersill.io.crs;

import java.util.List;

/**
 * Longitude and latitude on a datum.
 *
 * @param name readable name
 * @param code EPSG code, 0 for none
 * @param datum name of the datum, EPSG spelling with blanks
 * @param datumCode EPSG code of the datum, 0 for none
 * @param ellipsoid figure of the Earth
 * @param meridianName name of the prime meridian
 * @param meridian longitude of the prime meridian east of Greenwich, degrees
 * @param toWgs84 seven parameters of the position vector transformation to WGS 84 (EPSG method 9606: metres, seconds of
 *                arc, parts in a million), or none
 */
record GeographicSystem(String name, int code, String datum, int datumCode, Ellipsoid ellipsoid, String meridianName,
                      double meridian, List<Double> toWgs84) {

    static final GeographicSystem WGS84 = greenwich("WGS 84", 4326, "World Geodetic System 1984", 6326, Ellipsoid.WGS84);
    static final GeographicSystem ETRS89 = greenwich("ETRS89", 4258, "European Terrestrial Reference System 1989", 6258,
            Ellipsoid.GRS80);
    static final GeographicSystem NAD83 = greenwich("NAD83", 4269, "North American Datum 1983", 6269, Ellipsoid.GRS80);

    GeographicSystem {
        toWgs84 = toWgs84.stream().allMatch(p -> p == 0) ? List.of() : List.copyOf(toWgs84);
    }

    static GeographicSystem greenwich(String name, int code, String datum, int datumCode, Ellipsoid ellipsoid) {
        return new GeographicSystem(name, code, datum, datumCode, ellipsoid, "Greenwich", 0, List.of());
    }

    /** A figure of the Earth without a known datum, as climate models have it. */
    static GeographicSystem on(Ellipsoid ellipsoid) {
        if (ellipsoid.sameFigure(Ellipsoid.WGS84)) {
            return WGS84;
        }
        String what = ellipsoid.inverseFlattening() == 0
                ? "Sphere of radius " + Wkt.number(ellipsoid.semiMajor()) + " m" : "Unknown datum on " + ellipsoid.name();
        return greenwich(what, 0, what, 0, ellipsoid);
    }

    boolean samePlaces(GeographicSystem other) {
        return ellipsoid.sameFigure(other.ellipsoid) && Math.abs(meridian - other.meridian) < 1e-9
                && toWgs84.equals(other.toWgs84)
                && (code == other.code || code == 0 || other.code == 0 || datumCode == other.datumCode);
    }
}
