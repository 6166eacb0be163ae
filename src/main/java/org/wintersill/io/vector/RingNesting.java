package org.wintersill.io.vector;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.locationtech.jts.algorithm.Area;
import org.locationtech.jts.algorithm.PointLocation;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.LinearRing;
import org.locationtech.jts.geom.Location;
import org.locationtech.jts.geom.Polygon;

/**
 * Makes polygons of the loose rings of a Shapefile. Writers do not keep to the rule that shells run clockwise, so the nesting
 * decides: a ring inside an odd number of others is a hole of the smallest of them.
 */
final class RingNesting {
    private static final GeometryFactory GEOMETRIES = new GeometryFactory();

    private RingNesting() {
    }

    /** Null without rings. */
    static Geometry polygons(List<LinearRing> rings) {
        if (rings.isEmpty()) {
            return null;
        }
        List<LinearRing> bySize = new ArrayList<>(rings);
        bySize.sort(Comparator.comparingDouble((LinearRing ring) -> Area.ofRing(ring.getCoordinateSequence())).reversed());
        int n = bySize.size();
        int[] depth = new int[n];
        int[] around = new int[n];
        List<List<LinearRing>> holes = new ArrayList<>();
        for (int i = 0; i < n; i++) {
            holes.add(new ArrayList<>());
            around[i] = -1;
            for (int larger = i - 1; larger >= 0 && around[i] < 0; larger--) {
                if (contains(bySize.get(larger), bySize.get(i))) {
                    around[i] = larger;
                    depth[i] = depth[larger] + 1;
                }
            }
            if (depth[i] % 2 == 1) {
                holes.get(around[i]).add(bySize.get(i));
            }
        }
        List<Polygon> polygons = new ArrayList<>();
        for (int i = 0; i < n; i++) {
            if (depth[i] % 2 == 0) {
                polygons.add(GEOMETRIES.createPolygon(bySize.get(i), holes.get(i).toArray(new LinearRing[0])));
            }
        }
        return polygons.size() == 1 ? polygons.get(0) : GEOMETRIES.createMultiPolygon(polygons.toArray(new Polygon[0]));
    }

    /** By the first point that does not lie on the other ring; rings with all points in common contain each other. */
    private static boolean contains(LinearRing outer, LinearRing inner) {
        if (!outer.getEnvelopeInternal().contains(inner.getEnvelopeInternal())) {
            return false;
        }
        for (Coordinate point : inner.getCoordinates()) {
            int location = PointLocation.locateInRing(point, outer.getCoordinates());
            if (location != Location.BOUNDARY) {
                return location == Location.INTERIOR;
            }
        }
        return true;
    }
}
