package org.wintersill.io.crs;

import static org.wintersill.io.crs.ProjectionParameter.EASTING;
import static org.wintersill.io.crs.ProjectionParameter.LATITUDE;
import static org.wintersill.io.crs.ProjectionParameter.LONGITUDE;
import static org.wintersill.io.crs.ProjectionParameter.NORTHING;
import static org.wintersill.io.crs.ProjectionParameter.SCALE;

/**
 * Transverse Mercator by Kruger's series in the third flattening n to the sixth order, good to micrometres as far as 40
 * degrees from the central meridian; usual series in the longitude difference lose metres beyond 20, and grids of whole
 * countries reach that far.
 *
 * <p>Karney 2011, Transverse Mercator with an accuracy of a few nanometers, Journal of Geodesy 85:475-485: conformal
 * latitude by equations 7 to 9, alpha and beta by 35 and 36, rectifying radius by 14, Newton's method by 19 to 21.
 * Points 80 degrees or more from the central meridian have no image here.
 */
final class TransverseMercator implements PlaneProjection {
    private static final double FARTHEST = 80;

    private final double lon0;
    private final double e;
    private final double[] alpha;
    private final double[] beta;
    private final double radius;
    private final double easting;
    private final double northing;

    TransverseMercator(SystemDefinition system) {
        Ellipsoid figure = system.base().ellipsoid();
        double f = figure.flattening();
        double n = f / (2 - f);
        e = Math.sqrt(figure.eccentricitySquared());
        lon0 = system.value(LONGITUDE);
        radius = system.value(SCALE) * figure.semiMajor() / (1 + n) * (1 + n * n / 4 + Math.pow(n, 4) / 64 + Math.pow(n, 6) / 256);
        alpha = new double[] {
            series(n, 1, 1 / 2.0, -2 / 3.0, 5 / 16.0, 41 / 180.0, -127 / 288.0, 7891 / 37800.0),
            series(n, 2, 13 / 48.0, -3 / 5.0, 557 / 1440.0, 281 / 630.0, -1983433 / 1935360.0),
            series(n, 3, 61 / 240.0, -103 / 140.0, 15061 / 26880.0, 167603 / 181440.0),
            series(n, 4, 49561 / 161280.0, -179 / 168.0, 6601661 / 7257600.0),
            series(n, 5, 34729 / 80640.0, -3418889 / 1995840.0),
            series(n, 6, 212378941 / 319334400.0)};
        beta = new double[] {
            series(n, 1, 1 / 2.0, -2 / 3.0, 37 / 96.0, -1 / 360.0, -81 / 512.0, 96199 / 604800.0),
            series(n, 2, 1 / 48.0, 1 / 15.0, -437 / 1440.0, 46 / 105.0, -1118711 / 3870720.0),
            series(n, 3, 17 / 480.0, -37 / 840.0, -209 / 4480.0, 5569 / 90720.0),
            series(n, 4, 4397 / 161280.0, -11 / 504.0, -830251 / 7257600.0),
            series(n, 5, 4583 / 161280.0, -108847 / 3991680.0),
            series(n, 6, 20648693 / 638668800.0)};
        easting = system.value(EASTING);
        double[] origin = {lon0, system.value(LATITUDE)};
        northing = system.value(NORTHING) - toSphere(origin)[0] * radius;
    }

    /** Sum of coefficients times n^first, n^(first + 1), ... */
    private static double series(double n, int first, double... coefficients) {
        double sum = 0;
        for (int i = coefficients.length - 1; i >= 0; i--) {
            sum = sum * n + coefficients[i];
        }
        return sum * Math.pow(n, first);
    }

    /** Longitude and latitude to xi (north) and eta (east) in radii. */
    private double[] toSphere(double[] lonLat) {
        double lambda = Math.toRadians(lonLat[0] - lon0);
        double tau = Math.tan(Math.toRadians(lonLat[1]));
        double conformal = conformal(tau);
        double xi = Math.atan2(conformal, Math.cos(lambda));
        double eta = asinh(Math.sin(lambda) / Math.hypot(conformal, Math.cos(lambda)));
        double north = xi;
        double east = eta;
        for (int j = 1; j <= alpha.length; j++) {
            north += alpha[j - 1] * Math.sin(2 * j * xi) * Math.cosh(2 * j * eta);
            east += alpha[j - 1] * Math.cos(2 * j * xi) * Math.sinh(2 * j * eta);
        }
        return new double[] {north, east};
    }

    /** Tangent of the conformal latitude from that of the geographic one. */
    private double conformal(double tau) {
        double root = Math.hypot(1, tau);
        double sigma = Math.sinh(e * atanh(e * tau / root));
        return tau * Math.hypot(1, sigma) - sigma * root;
    }

    private static double asinh(double x) {
        double size = Math.abs(x);
        return Math.copySign(Math.log1p(size + size * size / (1 + Math.hypot(1, size))), x);
    }

    private static double atanh(double x) {
        return Math.log1p(2 * x / (1 - x)) / 2;
    }

    @Override
    public boolean forward(double[] xy, int at) {
        double lon = PoleRotation.wrap(xy[at] - lon0) + lon0;
        double lat = xy[at + 1];
        if (!(Math.abs(lon - lon0) < FARTHEST) || Math.abs(lat) > 90) {
            return false;
        }
        double[] plane = toSphere(new double[] {lon, lat});
        xy[at] = easting + radius * plane[1];
        xy[at + 1] = northing + radius * plane[0];
        return true;
    }

    @Override
    public boolean inverse(double[] xy, int at) {
        double xi = (xy[at + 1] - northing) / radius;
        double eta = (xy[at] - easting) / radius;
        if (!(Math.abs(xi) < Math.PI) || !(Math.abs(eta) < 3)) {
            return false;
        }
        double north = xi;
        double east = eta;
        for (int j = 1; j <= beta.length; j++) {
            north -= beta[j - 1] * Math.sin(2 * j * xi) * Math.cosh(2 * j * eta);
            east -= beta[j - 1] * Math.cos(2 * j * xi) * Math.sinh(2 * j * eta);
        }
        double target = Math.sin(north) / Math.hypot(Math.sinh(east), Math.cos(north));
        double tau = target;
        double e2 = e * e;
        for (int i = 0; i < 6; i++) {
            double now = conformal(tau);
            tau += (target - now) / Math.hypot(1, now) * (1 + (1 - e2) * tau * tau) / ((1 - e2) * Math.hypot(1, tau));
        }
        double lambda = Math.toDegrees(Math.atan2(Math.sinh(east), Math.cos(north)));
        if (!(Math.abs(lambda) < FARTHEST)) {
            return false;
        }
        xy[at] = lon0 + lambda;
        xy[at + 1] = Math.toDegrees(Math.atan(tau));
        return true;
    }
}
