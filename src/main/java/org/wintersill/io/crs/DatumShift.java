package org.wintersill.io.crs;

import java.util.List;

/**
 * Longitude and latitude of one datum turned into those of another, at height 0: to geocentric coordinates, the seven
 * parameter position vector transformation to WGS 84 (EPSG method 9606, IOGP publication 373-7-2 section 4.3.3), the
 * reverse of the other datum's, and back. A datum without parameters is taken as WGS 84's: latitudes on spheres of
 * climate models are meant to be used so.
 */
final class DatumShift {
    private static final double ARC_SECOND = Math.PI / 180 / 3600;

    private final GeographicSystem from;
    private final GeographicSystem to;
    private final double[][] out;
    private final double[][] in;

    /** @param fromShift and {@code toShift}: seven parameters each or none */
    DatumShift(GeographicSystem from, List<Double> fromShift, GeographicSystem to, List<Double> toShift) {
        this.from = from;
        this.to = to;
        this.out = fromShift.isEmpty() ? null : matrix(fromShift);
        this.in = toShift.isEmpty() ? null : matrix(toShift);
    }

    boolean isIdentity() {
        return out == null && in == null;
    }

    /** Rows of the scaled rotation, each with its translation. */
    private static double[][] matrix(List<Double> p) {
        double m = 1 + p.get(6) * 1e-6;
        double rx = p.get(3) * ARC_SECOND;
        double ry = p.get(4) * ARC_SECOND;
        double rz = p.get(5) * ARC_SECOND;
        return new double[][] {{m, -m * rz, m * ry, p.get(0)}, {m * rz, m, -m * rx, p.get(1)}, {-m * ry, m * rx, m, p.get(2)}};
    }

    /** In place: degrees east of Greenwich. */
    void apply(double[] xy, int at) {
        Ellipsoid source = out == null ? Ellipsoid.WGS84 : from.ellipsoid();
        Ellipsoid target = in == null ? Ellipsoid.WGS84 : to.ellipsoid();
        double[] v = geocentric(source, Math.toRadians(xy[at]), Math.toRadians(xy[at + 1]));
        if (out != null) {
            v = new double[] {row(out[0], v), row(out[1], v), row(out[2], v)};
        }
        if (in != null) {
            v = solve(in, v);
        }
        geodetic(target, v, xy, at);
    }

    private static double row(double[] r, double[] v) {
        return r[0] * v[0] + r[1] * v[1] + r[2] * v[2] + r[3];
    }

    private static double[] solve(double[][] m, double[] v) {
        double a = v[0] - m[0][3];
        double b = v[1] - m[1][3];
        double c = v[2] - m[2][3];
        double det = det(m[0][0], m[0][1], m[0][2], m[1][0], m[1][1], m[1][2], m[2][0], m[2][1], m[2][2]);
        return new double[] {det(a, m[0][1], m[0][2], b, m[1][1], m[1][2], c, m[2][1], m[2][2]) / det,
            det(m[0][0], a, m[0][2], m[1][0], b, m[1][2], m[2][0], c, m[2][2]) / det,
            det(m[0][0], m[0][1], a, m[1][0], m[1][1], b, m[2][0], m[2][1], c) / det};
    }

    private static double det(double a, double b, double c, double d, double e, double f, double g, double h, double i) {
        return a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
    }

    private static double[] geocentric(Ellipsoid figure, double lon, double lat) {
        double e2 = figure.eccentricitySquared();
        double n = figure.semiMajor() / Math.sqrt(1 - e2 * Math.sin(lat) * Math.sin(lat));
        return new double[] {n * Math.cos(lat) * Math.cos(lon), n * Math.cos(lat) * Math.sin(lon), n * (1 - e2) * Math.sin(lat)};
    }

    /** Fixed-point iteration on the latitude; the height is near 0, so each step gains more than two digits. */
    private static void geodetic(Ellipsoid figure, double[] v, double[] xy, int at) {
        double e2 = figure.eccentricitySquared();
        double p = Math.hypot(v[0], v[1]);
        double lat = Math.atan2(v[2], p * (1 - e2));
        for (int i = 0; i < 8; i++) {
            double n = figure.semiMajor() / Math.sqrt(1 - e2 * Math.sin(lat) * Math.sin(lat));
            lat = Math.atan2(v[2] + e2 * n * Math.sin(lat), p);
        }
        xy[at] = Math.toDegrees(Math.atan2(v[1], v[0]));
        xy[at + 1] = Math.toDegrees(lat);
    }
}
