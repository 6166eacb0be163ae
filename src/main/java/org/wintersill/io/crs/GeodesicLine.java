package org.wintersill.io.crs;

import net.sf.geographiclib.Geodesic;
import net.sf.geographiclib.GeodesicData;

/**
 * The shortest line between two places on the WGS 84 ellipsoid.
 *
 * @param km its length
 * @param bearing direction at its start, degrees clockwise from north, 0 up to but excluding 360
 */
public record GeodesicLine(double km, double bearing) {

    /** Places in degrees. */
    public static GeodesicLine between(double longitude1, double latitude1, double longitude2, double latitude2) {
        GeodesicData line = Geodesic.WGS84.Inverse(latitude1, longitude1, latitude2, longitude2);
        double bearing = line.azi1 < 0 ? line.azi1 + 360 : line.azi1;
        return new GeodesicLine(line.s12 / 1000, bearing >= 360 ? 0 : bearing);
    }
}
