package org.wintersill.elevation;

import java.util.Arrays;
import java.util.BitSet;
import java.util.Optional;
import java.util.stream.IntStream;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.GridGeometry;

/**
 * Where each target cell lies in the source grid, for bilinear interpolation between source cell centres (science 16.9).
 *
 * <p>A position is the row and column of the north-western of four neighbouring centres, and the weights of the southern and
 * eastern ones. Outside the hull of the centres but inside the source's cells the border row or column is kept: its weight is
 * then 0. Beyond the source's cells there is no position.
 *
 * <p>Where both grids share a coordinate system, column and row are independent and only the two axes are stored; otherwise
 * every cell is.
 */
public final class SourcePositions {
    private final GridGeometry source;
    private final GridGeometry target;
    private final boolean separable;
    /** Column of the western centre by target column (separable) or target cell; -1 beyond the source. */
    private final int[] west;
    private final int[] westOrFirst;
    private final int[] firstColumn;
    private final float[] eastWeight;
    private final int[] north;
    private final float[] southWeight;
    private final int[] columnInside;
    private final int[] rowInside;
    /** Target cells that can have a value; null for all. */
    private final BitSet only;

    /**
     * Works the positions out; where the two systems differ the transformation is shared between threads, row by row.
     *
     * @param targetToSource coordinates of the target grid to those of the source grid; thread-safe
     */
    public SourcePositions(GridGeometry source, GridGeometry target, CoordinateOperation targetToSource) {
        this.source = source;
        this.target = target;
        separable = targetToSource.isIdentity() && IntStream.range(0, target.columns())
                .allMatch(column -> turned(target.centreX(column)) == target.centreX(column));
        int columns = separable ? target.columns() : Math.toIntExact(target.cells());
        int rows = separable ? target.rows() : columns;
        west = new int[columns];
        eastWeight = new float[columns];
        columnInside = new int[columns];
        north = new int[rows];
        southWeight = new float[rows];
        rowInside = new int[rows];
        if (separable) {
            for (int column = 0; column < columns; column++) {
                setColumn(column, target.centreX(column));
            }
            for (int row = 0; row < rows; row++) {
                setRow(row, target.centreY(row));
            }
        } else {
            IntStream.range(0, target.rows()).parallel().forEach(row -> transformRow(row, targetToSource));
        }
        westOrFirst = westOrFirst();
        firstColumn = separable ? firstColumns() : new int[0];
        only = null;
    }

    /** The same positions in a part of the source that holds all of them. */
    private SourcePositions(SourcePositions whole, Block part, BitSet only) {
        this.only = only;
        source = whole.source.crop(part);
        target = whole.target;
        separable = whole.separable;
        west = moved(whole.west, part.column());
        columnInside = moved(whole.columnInside, part.column());
        north = moved(whole.north, part.row());
        rowInside = moved(whole.rowInside, part.row());
        eastWeight = whole.eastWeight;
        southWeight = whole.southWeight;
        westOrFirst = westOrFirst();
        firstColumn = separable ? firstColumns() : new int[0];
    }

    private static int[] moved(int[] positions, int by) {
        return by == 0 ? positions : Arrays.stream(positions).map(at -> at < 0 ? at : at - by).toArray();
    }

    private int[] westOrFirst() {
        return separable ? Arrays.stream(west).map(at -> Math.max(0, at)).toArray() : west;
    }

    /** The part of the source that the positions need; empty where the target lies beyond the source. */
    public Optional<Block> window() {
        int[] columns = needed(west, source.columns());
        int[] rows = needed(north, source.rows());
        boolean meets = separable ? columns[1] > 0 && rows[1] > 0
                : IntStream.range(0, west.length).anyMatch(cell -> west[cell] >= 0 && north[cell] >= 0);
        return meets ? Optional.of(new Block(columns[0], rows[0], columns[1] - columns[0], rows[1] - rows[0])) : Optional.empty();
    }

    private static int[] needed(int[] positions, int count) {
        int first = Integer.MAX_VALUE;
        int end = 0;
        for (int at : positions) {
            if (at >= 0) {
                first = Math.min(first, at);
                end = Math.max(end, Math.min(count, at + 2));
            }
        }
        return new int[] {first, end};
    }

    /** The positions in a part of the source, which must hold all of {@link #window}. */
    public SourcePositions within(Block part) {
        return new SourcePositions(this, part, only);
    }

    /**
     * The same positions with values wanted in some target cells alone.
     *
     * @param cells {@code row * columns + column}; not copied, must not change afterwards
     */
    SourcePositions only(BitSet cells) {
        return new SourcePositions(this, source.whole(), cells);
    }

    /** A longitude one turn further where only that lies in the source: 182 and -178 are the same place. */
    private double turned(double x) {
        if (!source.crs().angular() || source.columnAt(x) >= 0) {
            return x;
        }
        return source.columnAt(x + 360) >= 0 ? x + 360 : source.columnAt(x - 360) >= 0 ? x - 360 : x;
    }

    /** First target column, by source column, whose centre is not west of all that the source column can reach. */
    private int[] firstColumns() {
        int[] first = new int[source.columns() + 1];
        int column = 0;
        for (int sourceColumn = 0; sourceColumn < first.length; sourceColumn++) {
            while (column < west.length && (west[column] < 0 ? target.centreX(column) < source.west() : west[column] < sourceColumn)) {
                column++;
            }
            first[sourceColumn] = column;
        }
        return first;
    }

    private void transformRow(int row, CoordinateOperation targetToSource) {
        double[] xy = new double[2 * target.columns()];
        for (int column = 0; column < target.columns(); column++) {
            xy[2 * column] = target.centreX(column);
            xy[2 * column + 1] = target.centreY(row);
        }
        targetToSource.transform(xy, target.columns());
        for (int column = 0; column < target.columns(); column++) {
            int cell = row * target.columns() + column;
            setColumn(cell, turned(xy[2 * column]));
            setRow(cell, xy[2 * column + 1]);
        }
    }

    private void setColumn(int at, double x) {
        columnInside[at] = source.columnAt(x);
        double position = clamp(source.columnPosition(x) - 0.5, source.columns());
        west[at] = columnInside[at] < 0 ? -1 : lower(position, source.columns());
        eastWeight[at] = (float) (position - west[at]);
    }

    private void setRow(int at, double y) {
        rowInside[at] = source.rowAt(y);
        double position = clamp(source.rowPosition(y) - 0.5, source.rows());
        north[at] = rowInside[at] < 0 ? -1 : lower(position, source.rows());
        southWeight[at] = (float) (position - north[at]);
    }

    private static double clamp(double position, int count) {
        return Math.max(0, Math.min(position, count - 1));
    }

    /** Index of the lower of two neighbours, so chosen that the upper one exists where there are two. */
    private static int lower(double position, int count) {
        return Math.max(0, Math.min((int) position, count - 2));
    }

    public GridGeometry source() {
        return source;
    }

    public GridGeometry target() {
        return target;
    }

    /** Whether column and row positions are independent of each other. */
    public boolean isSeparable() {
        return separable;
    }

    /** Western neighbours by target column, 0 beyond the source; only where positions are separable. Shared, not copied. */
    int[] westByColumn() {
        return westOrFirst;
    }

    /** First target column whose western neighbour is the given source column or one east of it; only where separable. */
    int firstColumnOf(int sourceColumn) {
        return firstColumn[Math.max(0, Math.min(sourceColumn, source.columns()))];
    }

    /** Weights of the eastern neighbours by target column; only where positions are separable. Shared, not copied. */
    float[] eastWeightByColumn() {
        return eastWeight;
    }

    private int columnKey(int row, int column) {
        return separable ? column : row * target.columns() + column;
    }

    private int rowKey(int row, int column) {
        return separable ? row : row * target.columns() + column;
    }

    /** Column of the western neighbour; -1 beyond the source's cells. */
    public int west(int row, int column) {
        return west[columnKey(row, column)];
    }

    /** Weight of the eastern neighbour, 0..1. */
    public float eastWeight(int row, int column) {
        return eastWeight[columnKey(row, column)];
    }

    /** Row of the northern neighbour; -1 beyond the source's cells. */
    public int north(int row, int column) {
        return north[rowKey(row, column)];
    }

    /** Weight of the southern neighbour, 0..1. */
    public float southWeight(int row, int column) {
        return southWeight[rowKey(row, column)];
    }

    /** Source cell that contains the target cell's centre; -1 beyond the source's cells and where no value is wanted. */
    public int containing(int row, int column) {
        int sourceColumn = columnInside[columnKey(row, column)];
        int sourceRow = rowInside[rowKey(row, column)];
        boolean none = sourceColumn < 0 || sourceRow < 0 || only != null && !only.get(row * target.columns() + column);
        return none ? -1 : sourceRow * source.columns() + sourceColumn;
    }

    /** First source row that the target rows from..to-1 need, and the row after the last; 0, 0 if they need none. */
    public int[] sourceRows(int from, int to) {
        int first = Integer.MAX_VALUE;
        int end = 0;
        int start = separable ? from : from * target.columns();
        int stop = separable ? to : to * target.columns();
        for (int i = start; i < stop; i++) {
            if (north[i] >= 0) {
                first = Math.min(first, north[i]);
                end = Math.max(end, Math.min(north[i] + 2, source.rows()));
            }
        }
        return end == 0 ? new int[] {0, 0} : new int[] {first, end};
    }
}
