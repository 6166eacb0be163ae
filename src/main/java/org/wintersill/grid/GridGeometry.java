package org.wintersill.grid;

import java.io.Serializable;

/**
 * A regular, north-up grid as an immutable value: the only place that turns cells into coordinates and back.
 *
 * @param columns number of columns, at least 1
 * @param rows number of rows, at least 1
 * @param west outer edge of the westernmost cells, in units of the reference system
 * @param north outer edge of the northernmost cells
 * @param cellWidth width of a cell, positive
 * @param cellHeight height of a cell, positive
 * @param crs reference system of the coordinates
 */
public record GridGeometry(int columns, int rows, double west, double north,
                           double cellWidth, double cellHeight, Crs crs) implements Serializable {

    /** Share of a cell by which two grids may differ and still be called the same: round-off of float32 axes. */
    private static final double SAME_CELL_TOLERANCE = 1e-3;

    public GridGeometry {
        if (columns < 1 || rows < 1) {
            throw new IllegalArgumentException("a grid needs cells: " + columns + " x " + rows);
        }
        if (!(cellWidth > 0) || !(cellHeight > 0) || !Double.isFinite(west) || !Double.isFinite(north)
                || !Double.isFinite(cellWidth) || !Double.isFinite(cellHeight)) {
            throw new IllegalArgumentException("not a grid: " + west + " " + north + " " + cellWidth + " " + cellHeight);
        }
    }

    public long cells() {
        return (long) columns * rows;
    }

    public double east() {
        return west + columns * cellWidth;
    }

    public double south() {
        return north - rows * cellHeight;
    }

    public Envelope envelope() {
        return new Envelope(west, south(), east(), north);
    }

    public double centreX(int column) {
        return west + (column + 0.5) * cellWidth;
    }

    public double centreY(int row) {
        return north - (row + 0.5) * cellHeight;
    }

    /** Position of x in columns from the western edge: 0 at the edge, 0.5 at the first centre. May lie outside. */
    public double columnPosition(double x) {
        return (x - west) / cellWidth;
    }

    /** Position of y in rows from the northern edge: 0 at the edge, 0.5 at the first centre. May lie outside. */
    public double rowPosition(double y) {
        return (north - y) / cellHeight;
    }

    /** Column whose cell contains x, the outer eastern edge included; -1 outside and for NaN. */
    public int columnAt(double x) {
        return cellAt(columnPosition(x), columns);
    }

    /** Row whose cell contains y, the outer southern edge included; -1 outside and for NaN. */
    public int rowAt(double y) {
        return cellAt(rowPosition(y), rows);
    }

    private static int cellAt(double position, int count) {
        if (!(position >= 0) || position > count) {
            return -1;
        }
        return Math.min((int) position, count - 1);
    }

    public Block whole() {
        return new Block(0, 0, columns, rows);
    }

    /** The grid of a block of this grid. */
    public GridGeometry crop(Block block) {
        if (block.columnEnd() > columns || block.rowEnd() > rows) {
            throw new IllegalArgumentException(block + " is not inside a grid of " + columns + " x " + rows);
        }
        return new GridGeometry(block.columns(), block.rows(), west + block.column() * cellWidth,
                north - block.row() * cellHeight, cellWidth, cellHeight, crs);
    }

    /** Same cells in the same place: same counts and system, edges equal to a thousandth of a cell. */
    public boolean sameAs(GridGeometry other) {
        return columns == other.columns && rows == other.rows && crs.sameAs(other.crs)
                && near(west, other.west, cellWidth) && near(north, other.north, cellHeight)
                && near(east(), other.east(), cellWidth) && near(south(), other.south(), cellHeight);
    }

    private static boolean near(double a, double b, double cell) {
        return Math.abs(a - b) <= SAME_CELL_TOLERANCE * cell;
    }

    /** One line for people: size, cell, edges, system. */
    public String describe() {
        return columns + " x " + rows + " cells of " + number(cellWidth) + " x " + number(cellHeight)
                + ", west " + number(west) + " south " + number(south()) + " east " + number(east())
                + " north " + number(north) + ", " + crs.label();
    }

    private static String number(double value) {
        double rounded = Math.rint(value * 1e9) / 1e9;
        return rounded == Math.rint(rounded) && Math.abs(rounded) < 1e15
                ? Long.toString((long) rounded) : Double.toString(rounded);
    }
}
