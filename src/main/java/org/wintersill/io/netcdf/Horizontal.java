package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wintersill.grid.Crs;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * The two horizontal axes of a variable, and from them the grid.
 *
 * @param yDimension place of the dimension of rows in the variable
 * @param xDimension place of the dimension of columns
 * @param y coordinate variable of the rows
 * @param x coordinate variable of the columns
 */
record Horizontal(int yDimension, int xDimension, CdfVariable y, CdfVariable x) {
    private static final double POLE_SLACK = 1e-4;

    /** Finds the axes; refuses files that have only two-dimensional coordinates. */
    static Horizontal find(CdfHeader header, CdfVariable variable) {
        int yPlace = -1;
        int xPlace = -1;
        for (int i = 0; i < variable.rank(); i++) {
            AxisRole role = AxisRole.of(header, variable.dimensions().get(i));
            yPlace = role.isY() ? i : yPlace;
            xPlace = role.isX() ? i : xPlace;
        }
        if (yPlace < 0 || xPlace < 0) {
            throw missing(header, variable, yPlace < 0);
        }
        CdfVariable y = AxisRole.coordinate(header, variable.dimensions().get(yPlace)).orElseThrow();
        CdfVariable x = AxisRole.coordinate(header, variable.dimensions().get(xPlace)).orElseThrow();
        boolean degrees = AxisRole.of(y) == AxisRole.LATITUDE;
        boolean rotated = AxisRole.of(y) == AxisRole.ROTATED_LATITUDE;
        AxisRole fitting = degrees ? AxisRole.LONGITUDE : rotated ? AxisRole.ROTATED_LONGITUDE : AxisRole.EASTING;
        if (AxisRole.of(x) != fitting) {
            throw Problem.input("The axes do not belong together: '" + y.name() + "' is " + AxisRole.of(y) + ", '" + x.name()
                    + "' is " + AxisRole.of(x), CdfProblems.at(header.path(), variable.name()), "Correct the standard_name or"
                    + " units of the axes").asException();
        }
        return new Horizontal(yPlace, xPlace, y, x);
    }

    private static ProblemException missing(CdfHeader header, CdfVariable variable, boolean rows) {
        String where = CdfProblems.at(header.path(), variable.name());
        List<String> flat = header.all().stream().filter(Horizontal::isTwoDimensionalCoordinate).map(CdfVariable::name).toList();
        if (!flat.isEmpty()) {
            return Problem.input("The grid has only two-dimensional coordinates (" + String.join(", ", flat)
                    + "); one-dimensional axes are needed", where, "Interpolate the data to a regular grid first, for example"
                    + " with 'cdo remapbil', or add the axes of its projection").asException();
        }
        return Problem.input("No axis of " + (rows ? "latitudes or northings" : "longitudes or eastings")
                + " was found among the dimensions (" + String.join(", ", variable.dimensions()) + ")", where,
                "Give the dimension a coordinate variable with units such as degrees_north, degrees_east or m").asException();
    }

    static boolean isTwoDimensionalCoordinate(CdfVariable v) {
        String unit = v.word("units");
        return v.rank() >= 2 && (v.word("standard_name").equals("latitude") || v.word("standard_name").equals("longitude")
                || unit.matches("degrees?_?n(orth)?") || unit.matches("degrees?_?e(ast)?"));
    }

    /** The grid and how the file lies on it. */
    GridPlacement place(CdfHeader header, RawReader reader, CdfVariable variable, CrsReading crsReading, Notices notices) {
        boolean projected = AxisRole.of(y) == AxisRole.NORTHING;
        EvenAxis yAxis = axis(header, reader, y, false);
        EvenAxis xAxis = axis(header, reader, x, AxisRole.of(x) == AxisRole.LONGITUDE);
        if (xAxis.count() == 1 || yAxis.count() == 1) {
            double width = Double.isNaN(xAxis.step()) ? yAxis.size() : xAxis.size();
            double height = Double.isNaN(yAxis.step()) ? xAxis.size() : yAxis.size();
            if (Double.isNaN(width) || Double.isNaN(height)) {
                throw Problem.input("A single cell without bounds has no size", CdfProblems.at(header.path(), variable.name()),
                        "Give the axes bounds, or more than one cell").asException();
            }
            xAxis = Double.isNaN(xAxis.step()) ? xAxis.withStep(width) : xAxis;
            yAxis = Double.isNaN(yAxis.step()) ? yAxis.withStep(-height) : yAxis;
        }
        double metres = 1;
        if (projected) {
            metres = metresPerUnit(header.path(), x);
            if (metres != metresPerUnit(header.path(), y)) {
                throw Problem.input("The axes have different units: '" + y.word("units") + "' and '" + x.word("units") + "'",
                        CdfProblems.at(header.path(), variable.name()), "Give both axes the same unit").asException();
            }
        } else if (yAxis.largest() > 90 + POLE_SLACK || yAxis.smallest() < -90 - POLE_SLACK) {
            throw Problem.input("Latitudes run from " + yAxis.smallest() + " to " + yAxis.largest() + ", beyond 90",
                    CdfProblems.at(header.path(), y.name()), "Check whether longitude and latitude are swapped").asException();
        }
        Crs crs = crsReading.of(header, variable, AxisRole.of(y), metres, notices);
        if (projected) {
            double factor = metres / crs.metresPerUnit();
            xAxis = factor == 1 ? xAxis : xAxis.times(factor);
            yAxis = factor == 1 ? yAxis : yAxis.times(factor);
        }
        GridPlacement placement = GridPlacement.of(xAxis, yAxis, crs);
        placement.remarks().forEach(notices::add);
        return placement;
    }

    private static double metresPerUnit(Path path, CdfVariable axis) {
        return AxisUnit.metresPer(axis.word("units")).orElseThrow(() ->
                Problem.input("The axis has the unit '" + axis.text("units").orElse("") + "'; m and km are read",
                        CdfProblems.at(path, axis.name()), "Correct the units attribute").asException());
    }

    private static EvenAxis axis(CdfHeader header, RawReader reader, CdfVariable coordinate, boolean longitude) {
        double[] values = reader.all(coordinate);
        Packing packing = Packing.of(coordinate, Optional.empty(), Optional.empty());
        for (int i = 0; i < values.length; i++) {
            values[i] = packing.isIdentity() ? values[i] : values[i] * packing.scale() + packing.offset();
        }
        EvenAxis axis = EvenAxis.of(values, coordinate.type() == RawType.FLOAT, longitude,
                CdfProblems.at(header.path(), coordinate.name()));
        if (axis.count() == 1) {
            Optional<double[]> bounds = coordinate.text("bounds").flatMap(header::variable)
                    .filter(b -> b.rank() == 2 && b.size() == 2).map(reader::all);
            if (bounds.isPresent() && Math.abs(bounds.get()[1] - bounds.get()[0]) > 0) {
                return axis.withStep(bounds.get()[1] - bounds.get()[0]);
            }
        }
        return axis;
    }
}
