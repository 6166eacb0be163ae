package org.wintersill.io.geopackage;

import java.util.Arrays;
import java.util.BitSet;
import java.util.HashMap;
import java.util.Map;

/**
 * Walks along the edges of the cells of one class, the class on the left, so that outer rings run counter-clockwise on the
 * map and holes clockwise. Corners in the middle of a straight line are left out.
 *
 * <p>Where two cells of the class touch by a corner only, the walk stays with its own cell. A walk therefore keeps to one
 * connected part, but may come to such a corner twice; there the loop between the two visits is cut out as a ring of its
 * own. What is left are simple rings that touch each other in single points, which is what OGC 06-103r4, clause 6.1.11,
 * asks of polygons. Time grows with the number of edges.
 */
final class RingTracer {

    private static final int WEST = 0;
    private static final int SOUTH = 1;
    private static final int EAST = 2;
    private static final int NORTH = 3;
    private static final int[] COLUMN_STEP = {-1, 0, 1, 0};
    private static final int[] ROW_STEP = {0, 1, 0, -1};

    private final byte[] codes;
    private final int columns;
    private final int rows;
    private final CellParts parts;
    private final byte code;
    private final Rings rings = new Rings();
    /** Cells whose northern edge has been walked; every walk has at least one such edge. */
    private final BitSet walked;
    private int[] path = new int[1024];
    private int pathLength;

    private RingTracer(byte[] codes, int columns, CellParts parts, byte code) {
        this.codes = codes;
        this.columns = columns;
        this.rows = codes.length / columns;
        this.parts = parts;
        this.code = code;
        this.walked = new BitSet(codes.length);
    }

    /** All rings of a class; those of a part come in the order of their northernmost edges, its outer ring not always first. */
    static Rings trace(byte[] codes, int columns, CellParts parts, byte code) {
        RingTracer tracer = new RingTracer(codes, columns, parts, code);
        for (int row = 0, cell = 0; row < tracer.rows; row++) {
            for (int column = 0; column < columns; column++, cell++) {
                if (codes[cell] == code && !tracer.inClass(column, row - 1) && !tracer.walked.get(cell)) {
                    tracer.walk(column, row, parts.partOf(cell));
                }
            }
        }
        return tracer.rings;
    }

    private void walk(int startColumn, int startRow, int part) {
        int column = startColumn + 1;
        int row = startRow;
        int heading = WEST;
        // Made when first needed: most walks meet no such corner.
        Map<Long, Integer> touching = null;
        pathLength = 0;
        do {
            if (heading == WEST) {
                walked.set(row * columns + column - 1);
            }
            column += COLUMN_STEP[heading];
            row += ROW_STEP[heading];
            boolean left = aheadLeft(column, row, heading);
            boolean right = aheadRight(column, row, heading);
            if (left && !right) {
                continue;
            }
            boolean touches = !left && right;
            heading = left ? heading + 3 & 3 : heading + 1 & 3;
            if (touches) {
                touching = touching == null ? new HashMap<>() : touching;
                long corner = (long) row * (columns + 1L) + column;
                Integer seen = touching.get(corner);
                // A corner stays in the map when its loop is cut out, so what is found must still be on the path.
                if (seen != null && seen < pathLength && path[seen] == column && path[seen + 1] == row) {
                    rings.add(part, path, seen, pathLength);
                    pathLength = seen;
                }
                touching.put(corner, pathLength);
            }
            push(column, row);
        } while (column != startColumn + 1 || row != startRow || heading != WEST);
        rings.add(part, path, 0, pathLength);
    }

    private void push(int column, int row) {
        if (pathLength + 2 > path.length) {
            path = Arrays.copyOf(path, path.length * 2);
        }
        path[pathLength++] = column;
        path[pathLength++] = row;
    }

    private boolean aheadLeft(int column, int row, int heading) {
        return switch (heading) {
            case WEST -> inClass(column - 1, row);
            case SOUTH -> inClass(column, row);
            case EAST -> inClass(column, row - 1);
            default -> inClass(column - 1, row - 1);
        };
    }

    private boolean aheadRight(int column, int row, int heading) {
        return switch (heading) {
            case WEST -> inClass(column - 1, row - 1);
            case SOUTH -> inClass(column - 1, row);
            case EAST -> inClass(column, row);
            default -> inClass(column, row - 1);
        };
    }

    private boolean inClass(int column, int row) {
        return column >= 0 && row >= 0 && column < columns && row < rows && codes[row * columns + column] == code;
    }
}
