package org.wintersill.io.crs;

import java.util.Arrays;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/**
 * Sizes of a grid's cells on the ground, m, by row.
 *
 * <p>Longitude and latitude: arcs through the cell's centre on the ellipsoid, width = N cos phi dlon, height = M dphi, with the radii of
 * curvature N = a / sqrt(1 - e^2 sin^2 phi) and M = a (1 - e^2) / (1 - e^2 sin^2 phi)^1.5 (Snyder 1987, USGS Professional Paper 1395,
 * equations 4-18 to 4-20). Rotated pole: on a sphere of 6371.0088 km. Projected: in the plane of the map.
 *
 * @param width {@code [row]}, east-west, positive
 * @param height {@code [row]}, north-south, positive
 */
public record CellSizes(double[] width, double[] height) {
    private static final double MEAN_RADIUS = 6_371_008.8;
    /** Cells at a pole have no width; this keeps it positive, m. */
    private static final double LEAST_WIDTH = 1e-3;

    public static CellSizes of(GridGeometry grid) {
        double[] width = new double[grid.rows()];
        double[] height = new double[grid.rows()];
        if (grid.crs().kind() == Crs.Kind.PROJECTED) {
            Arrays.fill(width, grid.cellWidth() * grid.crs().metresPerUnit());
            Arrays.fill(height, grid.cellHeight() * grid.crs().metresPerUnit());
            return new CellSizes(width, height);
        }
        Ellipsoid figure = grid.crs().kind() == Crs.Kind.ROTATED_POLE ? Ellipsoid.sphere(MEAN_RADIUS)
                : SystemDefinition.of(grid.crs()).base().ellipsoid();
        double e2 = figure.eccentricitySquared();
        for (int row = 0; row < grid.rows(); row++) {
            double phi = Math.toRadians(grid.centreY(row));
            double w2 = 1 - e2 * Math.sin(phi) * Math.sin(phi);
            double across = figure.semiMajor() / Math.sqrt(w2);
            width[row] = Math.max(LEAST_WIDTH, across * Math.cos(phi) * Math.toRadians(grid.cellWidth()));
            height[row] = across * (1 - e2) / w2 * Math.toRadians(grid.cellHeight());
        }
        return new CellSizes(width, height);
    }
}
