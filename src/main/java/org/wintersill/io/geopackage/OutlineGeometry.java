package org.wintersill.io.geopackage;

import java.util.ArrayList;
import java.util.List;
import org.locationtech.jts.algorithm.Orientation;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.LinearRing;
import org.locationtech.jts.geom.MultiPolygon;
import org.locationtech.jts.geom.Polygon;
import org.locationtech.jts.geom.impl.PackedCoordinateSequence;
import org.locationtech.jts.geom.impl.PackedCoordinateSequenceFactory;
import org.wintersill.parcel.Outline;

/** Outlines as geometries of a table. */
final class OutlineGeometry {
    private static final GeometryFactory GEOMETRIES = new GeometryFactory(PackedCoordinateSequenceFactory.DOUBLE_FACTORY);

    private OutlineGeometry() {
    }

    /** The outline as a multipolygon; null where it is empty. */
    static MultiPolygon of(Outline outline) {
        if (outline.isEmpty()) {
            return null;
        }
        List<Polygon> polygons = new ArrayList<>();
        LinearRing shell = null;
        List<LinearRing> holes = new ArrayList<>();
        for (double[] xy : outline.rings()) {
            LinearRing ring = GEOMETRIES.createLinearRing(new PackedCoordinateSequence.Double(xy, 2, 0));
            if (Orientation.isCCW(ring.getCoordinateSequence())) {
                if (shell != null) {
                    polygons.add(GEOMETRIES.createPolygon(shell, holes.toArray(new LinearRing[0])));
                }
                shell = ring;
                holes.clear();
            } else {
                holes.add(ring);
            }
        }
        polygons.add(GEOMETRIES.createPolygon(shell, holes.toArray(new LinearRing[0])));
        return GEOMETRIES.createMultiPolygon(polygons.toArray(new Polygon[0]));
    }
}
