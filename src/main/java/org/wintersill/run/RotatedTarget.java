package org.wintersill.run;

import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.GridGeometry;

/** A longitude-latitude grid for a source whose own grid no GeoTIFF can hold. */
final class RotatedTarget {
    private RotatedTarget() {
    }

    /**
     * The grid: it covers all cells of the source, its cells are as high as the source's, and as wide as they are on the
     * ground at the middle latitude, both on whole multiples of the cell.
     */
    static GridGeometry covering(GridGeometry source, CoordinateOperations operations) {
        CoordinateOperation toLongitudeLatitude = operations.between(source.crs(), operations.wgs84());
        double west = Double.POSITIVE_INFINITY;
        double east = Double.NEGATIVE_INFINITY;
        double south = Double.POSITIVE_INFINITY;
        double north = Double.NEGATIVE_INFINITY;
        double[] xy = new double[2];
        for (int row = 0; row <= source.rows(); row++) {
            int step = row == 0 || row == source.rows() ? 1 : source.columns();
            for (int column = 0; column <= source.columns(); column += step) {
                xy[0] = source.west() + column * source.cellWidth();
                xy[1] = source.north() - row * source.cellHeight();
                toLongitudeLatitude.transform(xy, 1);
                west = Math.min(west, xy[0]);
                east = Math.max(east, xy[0]);
                south = Math.min(south, xy[1]);
                north = Math.max(north, xy[1]);
            }
        }
        double height = source.cellHeight();
        double shrink = Math.max(0.1, Math.cos(Math.toRadians((south + north) / 2)));
        double width = Math.rint(source.cellWidth() / shrink / height * 4) / 4 * height;
        double left = Math.floor(west / width) * width;
        double top = Math.ceil(north / height) * height;
        return new GridGeometry((int) Math.ceil((east - left) / width), (int) Math.ceil((top - south) / height), left, top, width,
                height, operations.wgs84());
    }
}
