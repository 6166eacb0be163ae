package org.wintersill.elevation.terrain;

import org.wintersill.grid.Block;

/**
 * Ground heights with the size of their cells on the ground. Arrays are shared, not copied.
 *
 * @param columns number of columns
 * @param rows number of rows
 * @param metres {@code [row * columns + column]}, north-west first, NaN for a void
 * @param cellWidth {@code [row]}, east-west size of a row's cells, m
 * @param cellHeight {@code [row]}, north-south size of a row's cells, m
 */
public record Relief(int columns, int rows, float[] metres, double[] cellWidth, double[] cellHeight) {

    public Relief {
        if (metres.length != Math.multiplyExact(columns, rows) || cellWidth.length != rows || cellHeight.length != rows) {
            throw new IllegalArgumentException("heights or cell sizes do not fit " + columns + " x " + rows + " cells");
        }
    }

    /** Height of a cell; NaN beyond the grid. */
    float at(int row, int column) {
        return row < 0 || row >= rows || column < 0 || column >= columns ? Float.NaN : metres[row * columns + column];
    }

    Block whole() {
        return new Block(0, 0, columns, rows);
    }
}
