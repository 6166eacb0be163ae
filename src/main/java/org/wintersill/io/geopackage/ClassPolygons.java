package org.wintersill.io.geopackage;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.LinearRing;
import org.locationtech.jts.geom.MultiPolygon;
import org.locationtech.jts.geom.Polygon;
import org.locationtech.jts.geom.impl.PackedCoordinateSequence;
import org.locationtech.jts.geom.impl.PackedCoordinateSequenceFactory;
import org.wintersill.grid.GridGeometry;

/**
 * A raster of classes as polygons along the edges of its cells, in the grid's coordinates, valid in the sense of OGC 06-103r4.
 * Cells that share an edge are one part; parts that touch by a corner are two polygons. Time grows with the number of
 * cells and edges; memory is 4 bytes a cell, 8 bytes a corner of the class at hand, and the geometries given out.
 */
public final class ClassPolygons {

    /** Takes the polygons of a class one by one. */
    @FunctionalInterface
    public interface PartSink {
        /**
         * @param part number of the part, as {@link ClassPolygons#part} gives it
         * @param polygon its outline with its holes
         */
        void accept(int part, Polygon polygon);
    }

    private static final GeometryFactory GEOMETRIES =
            new GeometryFactory(PackedCoordinateSequenceFactory.DOUBLE_FACTORY);

    private final GridGeometry grid;
    private final byte[] codes;
    private final CellParts parts;

    /**
     * @param grid the cells
     * @param codes {@code [row * columns + column]}, classes 1..255 as unsigned bytes, 0 for none; not copied, must not
     *              change while this object is used
     */
    public ClassPolygons(GridGeometry grid, byte[] codes) {
        if (codes.length != grid.cells()) {
            throw new IllegalArgumentException(codes.length + " codes for " + grid.cells() + " cells");
        }
        this.grid = grid;
        this.codes = codes;
        this.parts = new CellParts(codes, grid.columns());
    }

    /** The classes that occur, ascending. */
    public int[] classes() {
        boolean[] present = new boolean[256];
        for (int part = 1; part <= parts.count(); part++) {
            present[parts.classOf(part) & 255] = true;
        }
        int[] found = new int[256];
        int count = 0;
        for (int code = 1; code < 256; code++) {
            if (present[code]) {
                found[count++] = code;
            }
        }
        return Arrays.copyOf(found, count);
    }

    /** Number of parts of all classes; they are numbered from 1, row by row from the north-west. */
    public int partCount() {
        return parts.count();
    }

    /** The part that a cell belongs to, 0 for none: callers sum areas and elevations by it. */
    public int part(int cell) {
        return parts.partOf(cell);
    }

    /** Class of a part. */
    public int classOf(int part) {
        return parts.classOf(part) & 255;
    }

    /** Number of cells of a part. */
    public int cells(int part) {
        return parts.cells(part);
    }

    /** One geometry for a class; empty if the class does not occur. */
    public MultiPolygon dissolve(int code) {
        List<Polygon> polygons = new ArrayList<>();
        parts(code, (part, polygon) -> polygons.add(polygon));
        return GEOMETRIES.createMultiPolygon(polygons.toArray(new Polygon[0]));
    }

    /** Gives the connected parts of a class one by one, in the order of their numbers. */
    public void parts(int code, PartSink sink) {
        if (code < 1 || code > 255) {
            throw new IllegalArgumentException("classes are 1..255: " + code);
        }
        Rings rings = RingTracer.trace(codes, grid.columns(), parts, (byte) code);
        int[] order = byPart(rings);
        for (int from = 0, to; from < order.length; from = to) {
            int part = rings.part(order[from]);
            to = from;
            while (to < order.length && rings.part(order[to]) == part) {
                to++;
            }
            sink.accept(part, polygon(rings, order, from, to));
        }
    }

    /** The rings in the order of their parts, those of a part in the order in which they were found. */
    private int[] byPart(Rings rings) {
        int[] position = new int[parts.count() + 2];
        for (int ring = 0; ring < rings.count(); ring++) {
            position[rings.part(ring) + 1]++;
        }
        for (int part = 1; part < position.length; part++) {
            position[part] += position[part - 1];
        }
        int[] order = new int[rings.count()];
        for (int ring = 0; ring < rings.count(); ring++) {
            order[position[rings.part(ring)]++] = ring;
        }
        return order;
    }

    private Polygon polygon(Rings rings, int[] order, int from, int to) {
        LinearRing shell = null;
        LinearRing[] holes = new LinearRing[to - from - 1];
        int hole = 0;
        for (int i = from; i < to; i++) {
            LinearRing ring = ring(rings, order[i]);
            if (rings.isHole(order[i])) {
                holes[hole++] = ring;
            } else {
                shell = ring;
            }
        }
        return GEOMETRIES.createPolygon(shell, holes);
    }

    private LinearRing ring(Rings rings, int ring) {
        int size = rings.size(ring);
        double[] ordinates = new double[2 * (size + 1)];
        for (int i = 0; i <= size; i++) {
            int corner = i % size;
            ordinates[2 * i] = grid.west() + rings.column(ring, corner) * grid.cellWidth();
            ordinates[2 * i + 1] = grid.north() - rings.row(ring, corner) * grid.cellHeight();
        }
        return GEOMETRIES.createLinearRing(new PackedCoordinateSequence.Double(ordinates, 2, 0));
    }
}
