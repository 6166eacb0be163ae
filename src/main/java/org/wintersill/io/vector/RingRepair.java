package org.wintersill.io.vector;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.locationtech.jts.algorithm.Orientation;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.CoordinateSequence;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.LinearRing;
import org.locationtech.jts.geom.Polygon;
import org.locationtech.jts.geom.util.GeometryFixer;
import org.locationtech.jts.geom.util.PolygonExtracter;
import org.locationtech.jts.operation.valid.IsValidOp;
import org.locationtech.jts.operation.valid.TopologyValidationError;
import org.wintersill.parcel.Outline;

/**
 * Turns geometries as files hold them into valid outlines. Rings that cross themselves or each other are repaired by JTS's
 * {@link GeometryFixer}, which keeps every area that some ring encloses; what is no polygon, or encloses nothing, has no outline.
 */
final class RingRepair {
    /** @param remark what was done or why there is no outline; empty if the geometry was well */
    record Repaired(Outline outline, String remark) {
        static Repaired none(String why) {
            return new Repaired(Outline.EMPTY, why);
        }
    }

    private RingRepair() {
    }

    /** @param geometry as read; null for a row without one */
    static Repaired of(Geometry geometry) {
        if (geometry == null || geometry.isEmpty()) {
            return Repaired.none("no polygon is stored");
        }
        for (Coordinate point : geometry.getCoordinates()) {
            if (!Double.isFinite(point.x) || !Double.isFinite(point.y)) {
                return Repaired.none("a coordinate of the polygon is no number");
            }
        }
        if (geometry.getDimension() < 2) {
            return Repaired.none("the geometry is a " + geometry.getGeometryType() + ", no polygon");
        }
        TopologyValidationError error = new IsValidOp(geometry).getValidationError();
        if (error == null) {
            return new Repaired(outline(geometry), "");
        }
        String where = error.getCoordinate() == null ? "" : String.format(Locale.ROOT, " near %s, %s",
                plain(error.getCoordinate().x), plain(error.getCoordinate().y));
        String fault = error.getMessage().toLowerCase(Locale.ROOT) + where;
        Outline fixed = outline(GeometryFixer.fix(geometry));
        return fixed.isEmpty() ? Repaired.none("the polygon encloses nothing (" + fault + ")")
                : new Repaired(fixed, "the polygon was repaired (" + fault + ")");
    }

    private static String plain(double value) {
        return new java.math.BigDecimal(value).setScale(Math.abs(value) > 1000 ? 1 : 6, java.math.RoundingMode.HALF_EVEN)
                .stripTrailingZeros().toPlainString();
    }

    private static Outline outline(Geometry geometry) {
        List<double[]> rings = new ArrayList<>();
        for (Object part : PolygonExtracter.getPolygons(geometry)) {
            Polygon polygon = (Polygon) part;
            if (!polygon.isEmpty()) {
                rings.add(ring(polygon.getExteriorRing(), true));
                for (int hole = 0; hole < polygon.getNumInteriorRing(); hole++) {
                    rings.add(ring(polygon.getInteriorRingN(hole), false));
                }
            }
        }
        return new Outline(rings);
    }

    private static double[] ring(LinearRing ring, boolean counterClockwise) {
        CoordinateSequence points = ring.getCoordinateSequence();
        boolean asWanted = Orientation.isCCW(points) == counterClockwise;
        int n = points.size();
        double[] xy = new double[2 * n];
        for (int i = 0; i < n; i++) {
            int from = asWanted ? i : n - 1 - i;
            xy[2 * i] = points.getX(from);
            xy[2 * i + 1] = points.getY(from);
        }
        return xy;
    }
}
