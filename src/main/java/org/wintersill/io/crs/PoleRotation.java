package org.wintersill.io.crs;

import org.wintersill.grid.Crs;

/**
 * Turns coordinates between a rotated pole and true longitude and latitude on a sphere.
 *
 * <p>With the grid's north pole at latitude {@code p} and longitude {@code l} (true), a rotated point (rlon, rlat) and
 * {@code n} the longitude of the true north pole in the rotated grid ({@code north_pole_grid_longitude}), let
 * {@code d = rlon - n}:
 * <pre>
 * sin lat       = sin p sin rlat + cos p cos rlat cos d
 * tan(lon - l)  = cos rlat sin d / (sin p cos rlat cos d - cos p sin rlat), lon = l + 180 + atan2(-..., -...)
 * </pre>
 * Spherical triangle of the two poles and the point (CF 1.8 appendix F gives the meaning of the three numbers).
 */
final class PoleRotation {
    private final double sinPole;
    private final double cosPole;
    private final Crs.RotatedPole pole;

    PoleRotation(Crs.RotatedPole pole) {
        this.pole = pole;
        sinPole = Math.sin(Math.toRadians(pole.latitude()));
        cosPole = Math.cos(Math.toRadians(pole.latitude()));
    }

    /** Rotated to true, in place: degrees. */
    void toTrue(double[] xy, int at) {
        double d = Math.toRadians(xy[at] - pole.gridLongitude());
        double lat = Math.toRadians(xy[at + 1]);
        turn(xy, at, lat, d);
        xy[at] = wrap(xy[at] + pole.longitude());
    }

    /** True to rotated, in place: degrees. */
    void toRotated(double[] xy, int at) {
        double d = Math.toRadians(xy[at] - pole.longitude());
        double lat = Math.toRadians(xy[at + 1]);
        turn(xy, at, lat, d);
        xy[at] = wrap(xy[at] + pole.gridLongitude());
    }

    /** The triangle is the same seen from either pole; both angles at the poles are counted from the arc between them. */
    private void turn(double[] xy, int at, double lat, double d) {
        double x = Math.cos(lat) * Math.cos(d);
        double y = Math.cos(lat) * Math.sin(d);
        double z = Math.sin(lat);
        double up = sinPole * z + cosPole * x;
        double along = cosPole * z - sinPole * x;
        xy[at] = Math.toDegrees(Math.atan2(-y, along));
        xy[at + 1] = Math.toDegrees(Math.atan2(up, Math.hypot(along, y)));
    }

    /** -180 up to, but not including, 180. */
    static double wrap(double longitude) {
        if (longitude >= -180 && longitude < 180) {
            return longitude;
        }
        double turned = longitude - 360 * Math.floor((longitude + 180) / 360);
        return turned >= 180 ? -180 : turned;
    }

    /** Reads the two forms in which WKT 2 writes a rotated pole. */
    static Crs.RotatedPole fromWkt(Wkt conversion) {
        String method = Wkt.plain(conversion.child("METHOD").map(m -> m.text(0)).orElse(""));
        if (method.equals("polerotationnetcdfcfconvention")) {
            return new Crs.RotatedPole(parameter(conversion, "gridnorthpolelatitude"),
                    parameter(conversion, "gridnorthpolelongitude"), parameter(conversion, "northpolegridlongitude"));
        }
        if (method.equals("projobtranoprojlonglat")) {
            return new Crs.RotatedPole(parameter(conversion, "olatp"), wrap(parameter(conversion, "lon0") + 180),
                    parameter(conversion, "olonp"));
        }
        throw new IllegalArgumentException("the rotation '" + conversion.child("METHOD").map(m -> m.text(0)).orElse("")
                + "' is not known");
    }

    private static double parameter(Wkt conversion, String start) {
        return conversion.all("PARAMETER").stream().filter(p -> Wkt.plain(p.text(0)).startsWith(start))
                .mapToDouble(p -> p.numberAt(1)).findFirst().orElse(0);
    }

    static void check(Crs.RotatedPole pole) {
        if (!(Math.abs(pole.latitude()) <= 90) || !(Math.abs(pole.longitude()) <= 360) || !(Math.abs(pole.gridLongitude()) <= 360)) {
            throw new IllegalArgumentException("a rotated pole at latitude " + pole.latitude() + ", longitude "
                    + pole.longitude());
        }
    }
}
