package org.wintersill.elevation.terrain;

import org.wintersill.grid.Block;

/**
 * The neighbourhood of a cell: all cells whose centres lie within a radius of its own.
 *
 * <p>East-west distances are those of the cell's own row, so the window of a row is the same for all its cells and only changes
 * from row to row, with the latitude.
 *
 * @param shape what within means
 * @param radius m, positive
 */
public record Window(Shape shape, double radius) {
    /** Share of a cell that distances may exceed the radius by: a radius of three cells holds the third. */
    private static final double ROUND_OFF = 1e-9;

    /** Forms of a neighbourhood. */
    public enum Shape {
        /** Distance at most the radius. */
        DISC,
        /** East-west and north-south distances at most the radius each. */
        SQUARE
    }

    public Window {
        if (!(radius > 0)) {
            throw new IllegalArgumentException("not a radius: " + radius);
        }
    }

    /**
     * Cells to either side of the centre, for each row of the window from its north to its south; the middle entry is the
     * centre's own row.
     *
     * @param row row of the centre
     */
    int[] halfWidths(Relief relief, int row) {
        int high = cells(radius, relief.cellHeight()[row], relief.rows());
        int[] widths = new int[2 * high + 1];
        for (int dy = -high; dy <= high; dy++) {
            double across = dy * relief.cellHeight()[row];
            double reach = shape == Shape.SQUARE ? radius : Math.sqrt(Math.max(0, radius * radius - across * across));
            widths[dy + high] = cells(reach, relief.cellWidth()[row], relief.columns());
        }
        return widths;
    }

    /** Whether the window of a row holds other cells than the centre. */
    public boolean hasNeighbours(Relief relief, int row) {
        return radius >= Math.min(relief.cellWidth()[row], relief.cellHeight()[row]);
    }

    /** A block with the cells around it that its windows, and the neighbours of its cells, reach. */
    public Block around(Relief relief, Block block) {
        int high = 1;
        int wide = 1;
        for (int row = block.row(); row < block.rowEnd(); row++) {
            high = Math.max(high, rowReach(relief, row));
            wide = Math.max(wide, columnReach(relief, row));
        }
        int row = Math.max(0, block.row() - high);
        int column = Math.max(0, block.column() - wide);
        return new Block(column, row, Math.min(relief.columns(), block.columnEnd() + wide) - column,
                Math.min(relief.rows(), block.rowEnd() + high) - row);
    }

    /** Rows that the windows of a row reach to either side. */
    int rowReach(Relief relief, int row) {
        return cells(radius, relief.cellHeight()[row], relief.rows());
    }

    /** Columns that the windows of a row reach to either side. */
    int columnReach(Relief relief, int row) {
        return cells(radius, relief.cellWidth()[row], relief.columns());
    }

    private static int cells(double reach, double size, int most) {
        return (int) Math.min(most, Math.floor(reach / size + ROUND_OFF));
    }
}
