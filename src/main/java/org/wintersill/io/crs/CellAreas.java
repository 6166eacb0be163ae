package org.wintersill.io.crs;

import java.util.function.DoubleUnaryOperator;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/**
 * Areas of grid cells.
 *
 * <p>On an ellipsoid of semi-axes a, b and eccentricity e, the area between the equator and latitude phi over dlon
 * radians of longitude is
 * <pre>
 * A(phi) = b^2 / 2 * dlon * ( s / (1 - e^2 s^2) + ln((1 + e s) / (1 - e s)) / (2 e) ),  s = sin phi
 * </pre>
 * the integral of the product of the radii of curvature along the meridian; Snyder 1987 (USGS Professional Paper 1395,
 * equation 3-12) calls {@code 2 (1 - e^2) A / (b^2 dlon)} q, from which the authalic latitude follows. On a sphere it is
 * R^2 dlon sin phi.
 */
public final class CellAreas {
    /** Mean radius of the Earth, (2a + b) / 3 of GRS 80, km: Moritz 2000, Journal of Geodesy 74:128. */
    private static final double MEAN_RADIUS_KM = 6371.0088;

    private CellAreas() {
    }

    /**
     * Area of one cell of each row.
     *
     * <p>Longitude and latitude: exact on the ellipsoid of the system. Rotated pole: on a sphere of 6371.0088 km.
     * Projected: cell width times height in the plane of the map.
     *
     * @return {@code [row]}, km^2, north first; positive, never NaN
     */
    public static double[] rowAreasKm2(GridGeometry grid) {
        double[] areas = new double[grid.rows()];
        if (grid.crs().kind() == Crs.Kind.PROJECTED) {
            double unit = grid.crs().metresPerUnit() / 1000;
            java.util.Arrays.fill(areas, grid.cellWidth() * unit * grid.cellHeight() * unit);
            return areas;
        }
        Ellipsoid figure = figure(grid.crs());
        double width = Math.toRadians(grid.cellWidth());
        for (int row = 0; row < areas.length; row++) {
            double north = grid.north() - row * grid.cellHeight();
            double south = grid.north() - (row + 1) * grid.cellHeight();
            areas[row] = width * (zone(figure, north) - zone(figure, south));
        }
        return areas;
    }

    /**
     * Area between a fixed line and y, for one unit of x, km^2: the integral that {@link #rowAreasKm2} takes differences of. It grows
     * with y.
     */
    public static DoubleUnaryOperator areaNorthward(Crs crs) {
        if (crs.kind() == Crs.Kind.PROJECTED) {
            double unit = crs.metresPerUnit() / 1000;
            return y -> y * unit * unit;
        }
        Ellipsoid figure = figure(crs);
        double degree = Math.toRadians(1);
        return latitude -> degree * zone(figure, latitude);
    }

    private static Ellipsoid figure(Crs crs) {
        return crs.kind() == Crs.Kind.ROTATED_POLE ? Ellipsoid.sphere(MEAN_RADIUS_KM * 1000) : SystemDefinition.of(crs).base().ellipsoid();
    }

    /** Area from the equator to a latitude in degrees for one radian of longitude, km^2; negative in the south. */
    static double zone(Ellipsoid figure, double latitude) {
        double s = Math.sin(Math.toRadians(Math.max(-90, Math.min(90, latitude))));
        double b = figure.semiMinor() / 1000;
        double e = Math.sqrt(figure.eccentricitySquared());
        if (e == 0) {
            return b * b * s;
        }
        double es = e * s;
        return b * b / 2 * (s / (1 - es * es) + (Math.log1p(es) - Math.log1p(-es)) / (2 * e));
    }
}
