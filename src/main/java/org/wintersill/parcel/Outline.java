package org.wintersill.parcel;

import java.util.List;

/**
 * The outline of one or more polygons with their holes, valid in the sense of OGC 06-103r4: rings do not cross, and polygons do
 * not overlap.
 *
 * @param rings each {@code x0, y0, x1, y1, ...}, its last point equal to its first, at least four points; shells
 *              counter-clockwise, holes clockwise; the arrays are shared, not copied
 */
public record Outline(List<double[]> rings) {
    /** No area at all. */
    public static final Outline EMPTY = new Outline(List.of());

    public Outline {
        rings = List.copyOf(rings);
    }

    public boolean isEmpty() {
        return rings.isEmpty();
    }

    /** Number of points of all rings. */
    public int points() {
        return rings.stream().mapToInt(ring -> ring.length / 2).sum();
    }
}
