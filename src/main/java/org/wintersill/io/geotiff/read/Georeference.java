package org.wintersill.io.geotiff.read;

import java.io.IOException;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/**
 * Where the cells of a file lie, and how its rows and columns become those of the grid as it is used: north-up, and for
 * longitudes 0..360 rolled or moved to -180..180.
 *
 * @param grid the grid as used
 * @param southUp whether the first row of the file is the southernmost
 * @param roll column of the file that is the first of the grid
 * @param change what was turned round, for the record; empty if nothing
 */
record Georeference(GridGeometry grid, boolean southUp, int roll, String change) {

    private static final double SHEAR_TOLERANCE = 1e-9;
    private static final double DEGREE_TOLERANCE = 1e-6;

    static Georeference read(TiffFile file, TiffDirectory d, int width, int height, boolean pixelIsPoint, Crs crs) throws IOException {
        double[] t = affine(file, d);
        if (!java.util.Arrays.stream(t).allMatch(Double::isFinite) || t[1] == 0 || t[5] == 0) {
            throw file.refuse("The georeference is damaged: cell size " + t[1] + " x " + t[5], "Set it anew with gdal_edit.py -a_ullr");
        }
        if (t[1] < 0) {
            throw file.refuse("The columns of the file run from east to west", "Make it anew with gdalwarp");
        }
        double west = t[0] - (pixelIsPoint ? t[1] / 2 : 0);
        double top = t[3] - (pixelIsPoint ? t[5] / 2 : 0);
        boolean southUp = t[5] > 0;
        double cellHeight = Math.abs(t[5]);
        double north = southUp ? top + height * cellHeight : top;
        StringBuilder change = new StringBuilder();
        note(change, pixelIsPoint, "coordinates are those of cell centres (PixelIsPoint)");
        note(change, southUp, "rows turned, the file begins in the south");
        int roll = 0;
        if (crs.angular()) {
            checkLatitudes(file, north - cellHeight / 2, north - (height - 0.5) * cellHeight);
            if (width * t[1] > 360 + t[1] * 1.001) {
                throw file.refuse("The file spans " + width * t[1] + " degrees of longitude", "Give at most 360");
            }
            double east = west + width * t[1];
            boolean global = Math.abs(width * t[1] - 360) < t[1] * 1e-3;
            if (global && west + t[1] / 2 > -180 + t[1] * 1e-3 && east - t[1] / 2 >= 180 - t[1] * 1e-3) {
                roll = (int) Math.ceil((180 - west) / t[1] - 0.5 - 1e-3);
                west = west + roll * t[1] - 360;
                roll %= width;
                note(change, roll != 0, "columns rolled from 0..360 to -180..180");
            } else if (west >= 180 - t[1] * 0.501) {
                west -= 360;
                note(change, true, "longitudes moved by -360");
            } else if (east <= -180 + t[1] * 0.501) {
                west += 360;
                note(change, true, "longitudes moved by 360");
            }
        }
        return new Georeference(new GridGeometry(width, height, west, north, t[1], cellHeight, crs), southUp, roll, change.toString());
    }

    private static void note(StringBuilder change, boolean applies, String text) {
        if (applies) {
            change.append(change.isEmpty() ? "" : "; ").append(text);
        }
    }

    private static void checkLatitudes(TiffFile file, double firstCentre, double lastCentre) {
        if (firstCentre > 90 + DEGREE_TOLERANCE || lastCentre < -90 - DEGREE_TOLERANCE) {
            throw file.refuse("Cell centres lie at latitude " + (firstCentre > 90 ? firstCentre : lastCentre)
                    + "; -90..90 are expected", "Check the coordinate reference system of the file, or name it with crs:");
        }
    }

    /** x = t0 + t1 column + t2 row, y = t3 + t4 column + t5 row, of the corner (or centre) that the keys mean. */
    private static double[] affine(TiffFile file, TiffDirectory d) throws IOException {
        double[] scale = d.doubles(TiffDirectory.PIXEL_SCALE);
        double[] tie = d.doubles(TiffDirectory.TIEPOINTS);
        double[] matrix = d.doubles(TiffDirectory.TRANSFORMATION);
        if (scale.length >= 2 && tie.length >= 6) {
            double height = -Math.abs(scale[1]);
            return new double[] {tie[3] - tie[0] * scale[0], scale[0], 0, tie[4] - tie[1] * height, 0, height};
        }
        if (matrix.length == 16) {
            double shear = Math.max(Math.abs(matrix[1]), Math.abs(matrix[4]));
            if (shear > SHEAR_TOLERANCE * Math.max(Math.abs(matrix[0]), Math.abs(matrix[5]))) {
                throw file.refuse("The grid of the file is rotated", "Make a north-up grid with gdalwarp");
            }
            return new double[] {matrix[3], matrix[0], 0, matrix[7], 0, matrix[5]};
        }
        if (tie.length > 6) {
            throw file.refuse("The file is placed by " + tie.length / 6 + " control points, not by a regular grid", "Make a regular grid with gdalwarp");
        }
        throw file.refuse("The file does not say where its cells lie (no georeference inside; .tfw files are not read)",
                "Write it into the file with gdal_translate -a_ullr WEST NORTH EAST SOUTH");
    }

    /** Row of the file of a row of the grid; the same the other way. */
    int turnedRow(int row) {
        return southUp ? grid.rows() - 1 - row : row;
    }
}
