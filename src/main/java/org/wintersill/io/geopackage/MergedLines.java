package org.wintersill.io.geopackage;

import java.util.Collection;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.LineString;
import org.locationtech.jts.operation.linemerge.LineMerger;

/** Pieces of lines, joined where their ends meet. Used by one thread. */
public final class MergedLines {
    private final GeometryFactory factory = new GeometryFactory();
    private final LineMerger merger = new LineMerger();

    /** Adds a piece; its ends are not the same place. */
    public void add(double x1, double y1, double x2, double y2) {
        merger.add(factory.createLineString(new Coordinate[] {new Coordinate(x1, y1), new Coordinate(x2, y2)}));
    }

    /** All lines as one geometry, in an order that depends on the pieces alone; null where there are none. */
    Geometry geometry() {
        @SuppressWarnings("unchecked")
        Collection<LineString> lines = merger.getMergedLineStrings();
        return lines.isEmpty() ? null : factory.createMultiLineString(lines.stream().sorted(LineString::compareTo).toArray(LineString[]::new));
    }
}
