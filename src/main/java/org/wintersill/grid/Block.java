package org.wintersill.grid;

import java.io.Serializable;

/**
 * A rectangle of cells of a grid.
 *
 * @param column first column, 0 in the west
 * @param row first row, 0 in the north
 * @param columns number of columns, at least 1
 * @param rows number of rows, at least 1
 */
public record Block(int column, int row, int columns, int rows) implements Serializable {

    public Block {
        if (column < 0 || row < 0 || columns < 1 || rows < 1) {
            throw new IllegalArgumentException("not a block: " + column + " " + row + " " + columns + " " + rows);
        }
    }

    /** Number of cells; a block that a program works on at once always fits an array. */
    public int cells() {
        return Math.multiplyExact(columns, rows);
    }

    /** First column east of the block. */
    public int columnEnd() {
        return column + columns;
    }

    /** First row south of the block. */
    public int rowEnd() {
        return row + rows;
    }
}
