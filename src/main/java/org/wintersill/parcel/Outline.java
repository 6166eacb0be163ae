package org.wintersill.parcel;

import java.util.List;

/**
 * The outline of one or more polygons with their holes, valid in the sense of OGC 06-103r4: rings do not cross, and polygons do
 * not overlap.
 *
 * @param rings each {@code x0, y0, x1, y1, ...}, its last point equal to its first, at least four points; shells
 *              counter-clockwise, each followed by its holes, clockwise; the arrays are shared, not copied
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

    /** The same outline with x and y in each other's place. */
    public Outline swapped() {
        return new Outline(rings.stream().map(ring -> {
            double[] turned = new double[ring.length];
            for (int i = 0; i < ring.length; i += 2) {
                // Backwards, so that shells keep their sense of rotation.
                turned[i] = ring[ring.length - 1 - i];
                turned[i + 1] = ring[ring.length - 2 - i];
            }
            return turned;
        }).toList());
    }

    /** Number of points of all rings. */
    public int points() {
        return rings.stream().mapToInt(ring -> ring.length / 2).sum();
    }
}
