package org.wintersill.parcel;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.GridGeometry;

/**
 * Brings outlines of one reference system onto a grid of another. Edges are straight in the outline's own system, so each is
 * divided until its image on the grid departs from straight pieces by less than {@value #TOLERANCE} of a cell; then points become
 * positions in columns and rows.
 *
 * <p>Within its row a position is measured by area: a point that has half of the area of the row's cells north of it lies half a row down,
 * on the ellipsoid too. A square between two columns and two row positions so covers exactly its share of the cell. For grids in the plane
 * nothing changes by this. Thread-safe.
 */
public final class OutlinePlacement {
    /** Largest departure of an edge from its straight pieces, in cells. */
    public static final double TOLERANCE = 1e-5;
    /** Each round cuts an edge in four. */
    private static final int MOST_ROUNDS = 7;
    private static final double[] QUARTERS = {0.25, 0.5, 0.75};

    private final GridGeometry grid;
    private final CoordinateOperation toGrid;
    private final DoubleUnaryOperator areaNorthward;
    private final double[] edgeAreas;
    /** Columns all around the globe; 0 where the grid is not in degrees. */
    private final double turn;

    /**
     * @param toGrid from the outlines' system to the grid's
     * @param areaNorthward area in km2 between a fixed latitude and y, for one unit of x; grows with y
     */
    public OutlinePlacement(GridGeometry grid, CoordinateOperation toGrid, DoubleUnaryOperator areaNorthward) {
        this.grid = grid;
        this.toGrid = toGrid;
        this.areaNorthward = areaNorthward;
        turn = grid.crs().angular() ? 360 / grid.cellWidth() : 0;
        edgeAreas = new double[grid.rows() + 1];
        for (int row = 0; row < edgeAreas.length; row++) {
            edgeAreas[row] = areaNorthward.applyAsDouble(grid.north() - row * grid.cellHeight());
        }
    }

    /**
     * An outline on the grid.
     *
     * @param rings column and row positions {@code c0, r0, c1, r1, ...}; where the outline crosses the seam of a grid around the globe,
     *              with copies a whole turn away
     * @param areaKm2 area of the whole outline, on the grid or not
     */
    public record Placed(List<double[]> rings, double areaKm2) {
        private static final Placed NOWHERE = new Placed(List.of(), Double.NaN);

        public Placed {
            rings = List.copyOf(rings);
        }
    }

    public GridGeometry grid() {
        return grid;
    }

    /** Area of one cell of a row, km2. */
    public double cellAreaKm2(int row) {
        return grid.cellWidth() * (edgeAreas[row] - edgeAreas[row + 1]);
    }

    /** Places an outline; without rings and with NaN for its area where a point of it has no image in the grid's system. */
    public Placed place(Outline outline) {
        List<double[]> rings = new ArrayList<>();
        double area = 0;
        for (double[] ring : outline.rings()) {
            double[] xy = refined(ring);
            if (xy == null) {
                return Placed.NOWHERE;
            }
            area += area(xy);
            double[] positions = positions(xy);
            rings.add(positions);
            addCopies(positions, rings);
        }
        return new Placed(rings, area);
    }

    /**
     * Signed area, positive for shells: the sum of -S dx over the edges, with Simpson's rule for the mean of the area S between the
     * equator and the edge.
     */
    private double area(double[] xy) {
        double area = 0;
        double origin = areaNorthward.applyAsDouble(xy[1]);
        double before = 0;
        for (int i = 2; i < xy.length; i += 2) {
            double middle = areaNorthward.applyAsDouble((xy[i - 1] + xy[i + 1]) / 2) - origin;
            double here = areaNorthward.applyAsDouble(xy[i + 1]) - origin;
            area -= (xy[i] - xy[i - 2]) * (before + 4 * middle + here) / 6;
            before = here;
        }
        return area;
    }

    private double[] positions(double[] xy) {
        double[] positions = new double[xy.length];
        for (int i = 0; i < xy.length; i += 2) {
            positions[i] = grid.columnPosition(xy[i]);
            positions[i + 1] = rowByArea(xy[i + 1]);
        }
        return positions;
    }

    private double rowByArea(double y) {
        double position = grid.rowPosition(y);
        if (!grid.crs().angular() || !(position > 0) || position >= grid.rows()) {
            return position;
        }
        int row = (int) position;
        double down = (edgeAreas[row] - areaNorthward.applyAsDouble(y)) / (edgeAreas[row] - edgeAreas[row + 1]);
        return row + Math.max(0, Math.min(1, down));
    }

    private void addCopies(double[] positions, List<double[]> rings) {
        if (turn == 0) {
            return;
        }
        double least = Double.POSITIVE_INFINITY;
        double most = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < positions.length; i += 2) {
            least = Math.min(least, positions[i]);
            most = Math.max(most, positions[i]);
        }
        for (double shift : new double[] {-turn, turn}) {
            if (least + shift < grid.columns() && most + shift > 0) {
                double[] copy = positions.clone();
                for (int i = 0; i < copy.length; i += 2) {
                    copy[i] += shift;
                }
                rings.add(copy);
            }
        }
    }

    /** Coordinates of the grid's system, edges divided where they bend; null where a point has no image. */
    private double[] refined(double[] ring) {
        double[] source = ring;
        double[] image = source.clone();
        toGrid.transform(image, image.length / 2);
        if (hasGap(image)) {
            return null;
        }
        unwrap(image);
        if (toGrid.isIdentity() && !grid.crs().angular()) {
            return image;
        }
        boolean[] open = new boolean[source.length / 2 - 1];
        Arrays.fill(open, true);
        for (int round = 0; round < MOST_ROUNDS; round++) {
            double[] inner = quarterPoints(source, open);
            double[] innerImage = inner.clone();
            toGrid.transform(innerImage, innerImage.length / 2);
            if (hasGap(innerImage)) {
                return null;
            }
            int bent = 0;
            boolean[] bends = new boolean[open.length];
            for (int edge = 0, at = 0; edge < open.length; edge++) {
                if (open[edge]) {
                    bends[edge] = bends(image, edge, innerImage, at);
                    bent += bends[edge] ? 1 : 0;
                    at += 6;
                }
            }
            if (bent == 0) {
                break;
            }
            double[] finerSource = new double[source.length + 6 * bent];
            double[] finerImage = new double[finerSource.length];
            boolean[] finerOpen = new boolean[finerSource.length / 2 - 1];
            int to = 0;
            for (int edge = 0, at = 0; edge < open.length; edge++) {
                to = copy(source, image, 2 * edge, 2, finerSource, finerImage, to);
                if (bends[edge]) {
                    Arrays.fill(finerOpen, to / 2 - 1, to / 2 + 3, true);
                    to = copy(inner, innerImage, at, 6, finerSource, finerImage, to);
                }
                at += open[edge] ? 6 : 0;
            }
            copy(source, image, source.length - 2, 2, finerSource, finerImage, to);
            source = finerSource;
            image = finerImage;
            open = finerOpen;
        }
        return image;
    }

    private static int copy(double[] source, double[] image, int from, int count, double[] finerSource, double[] finerImage, int to) {
        System.arraycopy(source, from, finerSource, to, count);
        System.arraycopy(image, from, finerImage, to, count);
        return to + count;
    }

    private static double[] quarterPoints(double[] source, boolean[] open) {
        int count = 0;
        for (boolean edge : open) {
            count += edge ? 1 : 0;
        }
        double[] inner = new double[6 * count];
        for (int edge = 0, at = 0; edge < open.length; edge++) {
            if (open[edge]) {
                for (double share : QUARTERS) {
                    inner[at++] = source[2 * edge] + share * (source[2 * edge + 2] - source[2 * edge]);
                    inner[at++] = source[2 * edge + 1] + share * (source[2 * edge + 3] - source[2 * edge + 1]);
                }
            }
        }
        return inner;
    }

    /** Whether the images of an edge's inner points leave its chord; the points are brought to the edge's own turn of the globe. */
    private boolean bends(double[] image, int edge, double[] inner, int at) {
        double x0 = image[2 * edge];
        double y0 = image[2 * edge + 1];
        double dx = image[2 * edge + 2] - x0;
        double dy = image[2 * edge + 3] - y0;
        double row0 = rowByArea(y0);
        double rows = rowByArea(y0 + dy) - row0;
        double widest = 0;
        for (int k = 0; k < 3; k++) {
            double chordX = x0 + QUARTERS[k] * dx;
            if (turn > 0) {
                inner[at + 2 * k] += 360 * Math.rint((chordX - inner[at + 2 * k]) / 360);
            }
            widest = Math.max(widest, Math.abs(inner[at + 2 * k] - chordX) / grid.cellWidth());
            widest = Math.max(widest, Math.abs(rowByArea(inner[at + 2 * k + 1]) - row0 - QUARTERS[k] * rows));
        }
        return widest > TOLERANCE;
    }

    private static boolean hasGap(double[] xy) {
        for (double value : xy) {
            if (!Double.isFinite(value)) {
                return true;
            }
        }
        return false;
    }

    /** On the globe: no edge goes the long way round, and the ring lies in the turn that the grid lies in. */
    private void unwrap(double[] xy) {
        if (turn == 0) {
            return;
        }
        double least = xy[0];
        double most = xy[0];
        for (int i = 2; i < xy.length; i += 2) {
            if (!toGrid.isIdentity()) {
                xy[i] += 360 * Math.rint((xy[i - 2] - xy[i]) / 360);
            }
            least = Math.min(least, xy[i]);
            most = Math.max(most, xy[i]);
        }
        double shift = 360 * Math.rint(((grid.west() + grid.east()) / 2 - (least + most) / 2) / 360);
        for (int i = 0; shift != 0 && i < xy.length; i += 2) {
            xy[i] += shift;
        }
    }
}
