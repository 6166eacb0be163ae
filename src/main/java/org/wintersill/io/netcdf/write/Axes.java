package org.wintersill.io.netcdf.write;

import java.util.List;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.time.Season;

/**
 * Names, units and values of the three axes (CF 1.8, chapter 4 and appendix F).
 *
 * @param y name of the axis of rows
 * @param x name of the axis of columns
 * @param yStandardName standard name of the rows' coordinate
 * @param xStandardName standard name of the columns' coordinate
 * @param yUnits unit of the rows' coordinate
 * @param xUnits unit of the columns' coordinate
 */
record Axes(String y, String x, String yStandardName, String xStandardName, String yUnits, String xUnits) {

    /** Whole days are counted from here in every calendar. */
    static final String TIME_UNITS = "days since 1970-01-01 00:00:00";

    static Axes of(Crs crs) {
        return switch (crs.kind()) {
            case GEOGRAPHIC -> new Axes("lat", "lon", "latitude", "longitude", "degrees_north", "degrees_east");
            case ROTATED_POLE -> new Axes("rlat", "rlon", "grid_latitude", "grid_longitude", "degrees", "degrees");
            case PROJECTED -> {
                String unit = lengthUnit(crs.metresPerUnit());
                yield new Axes("y", "x", "projection_y_coordinate", "projection_x_coordinate", unit, unit);
            }
        };
    }

    /** UDUNITS reads a factor before a unit, so feet need no name of their own. */
    private static String lengthUnit(double metres) {
        return metres == 1 ? "m" : metres == 1000 ? "km" : metres + " m";
    }

    static double[] yValues(GridGeometry grid) {
        double[] values = new double[grid.rows()];
        for (int row = 0; row < values.length; row++) {
            values[row] = grid.centreY(row);
        }
        return values;
    }

    static double[] xValues(GridGeometry grid) {
        double[] values = new double[grid.columns()];
        for (int column = 0; column < values.length; column++) {
            values[column] = grid.centreX(column);
        }
        return values;
    }

    /** The last day of each winter, which lies in the year that the winter is named after. */
    static double[] times(List<Season> winters) {
        return winters.stream().mapToDouble(winter -> winter.firstDay() + winter.days() - 1).toArray();
    }

    /** {@code [winter * 2]}: beginning of the first day and end of the last. */
    static double[] timeBounds(List<Season> winters) {
        double[] bounds = new double[2 * winters.size()];
        for (int i = 0; i < winters.size(); i++) {
            bounds[2 * i] = winters.get(i).firstDay();
            bounds[2 * i + 1] = winters.get(i).firstDay() + winters.get(i).days();
        }
        return bounds;
    }
}
