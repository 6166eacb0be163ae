package org.wintersill.elevation.terrain;

import java.util.Arrays;
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

    /** The part of the relief in a block. */
    public Relief crop(Block block) {
        float[] part = new float[block.cells()];
        for (int row = 0; row < block.rows(); row++) {
            System.arraycopy(metres, (block.row() + row) * columns + block.column(), part, row * block.columns(), block.columns());
        }
        return new Relief(block.columns(), block.rows(), part, Arrays.copyOfRange(cellWidth, block.row(), block.rowEnd()),
                Arrays.copyOfRange(cellHeight, block.row(), block.rowEnd()));
    }

    Block whole() {
        return new Block(0, 0, columns, rows);
    }
}
