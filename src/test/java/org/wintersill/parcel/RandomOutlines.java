package org.wintersill.parcel;

import java.util.Random;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.Polygon;

/** Random rings for tests, reproducible by their seed. */
final class RandomOutlines {
    private final Random random;

    RandomOutlines(long seed) {
        random = new Random(seed);
    }

    double between(double low, double high) {
        return low + random.nextDouble() * (high - low);
    }

    /** A ring that runs once around its centre, counter-clockwise where y grows upwards. */
    double[] star(double x, double y, double radius, int corners) {
        double[] ring = new double[2 * corners + 2];
        for (int i = 0; i < corners; i++) {
            double angle = 2 * Math.PI * (i + 0.8 * random.nextDouble()) / corners;
            double r = radius * between(0.2, 1);
            ring[2 * i] = x + r * Math.cos(angle);
            ring[2 * i + 1] = y + r * Math.sin(angle);
        }
        ring[2 * corners] = ring[0];
        ring[2 * corners + 1] = ring[1];
        return ring;
    }

    static Polygon polygon(double[] ring) {
        Coordinate[] points = new Coordinate[ring.length / 2];
        for (int i = 0; i < points.length; i++) {
            points[i] = new Coordinate(ring[2 * i], ring[2 * i + 1]);
        }
        return new GeometryFactory().createPolygon(points);
    }
}
