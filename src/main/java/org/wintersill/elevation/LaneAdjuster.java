package org.wintersill.elevation;

import java.util.Arrays;

/**
 * Brings one night's temperatures from the source grid to a lane of target rows. Run of an {@link ElevationAdjustment}, with
 * room of its own: one a worker.
 */
public final class LaneAdjuster {
    private final ElevationAdjustment adjustment;
    private final SourcePositions positions;
    private final float[] above;
    private final float[] below;
    private final float[] blended;
    private final float[] left;
    private final float[] right;
    private final float[] row;

    public LaneAdjuster(ElevationAdjustment adjustment) {
        this.adjustment = adjustment;
        positions = adjustment.positions();
        above = new float[positions.source().columns()];
        below = new float[positions.source().columns()];
        blended = new float[positions.source().columns()];
        int columns = positions.target().columns();
        left = new float[columns];
        right = new float[columns];
        row = new float[columns];
    }

    /**
     * Fills the target rows {@code firstRow} to {@code firstRow + rows - 1}.
     *
     * @param night the night's source values, NaN for missing; source cell {@code c} is at {@code offset + c}; not changed
     * @param lapse K/km of the night
     * @param out {@code [row of the lane * columns + column]}, degrees Celsius; positive infinity where there is no value
     */
    public void adjust(float[] night, int offset, double lapse, int firstRow, int rows, float[] out) {
        if (adjustment.isPassThrough()) {
            pass(night, offset + firstRow * positions.target().columns(), rows * positions.target().columns(), out);
            return;
        }
        for (int r = firstRow; r < firstRow + rows; r++) {
            int start = (r - firstRow) * positions.target().columns();
            if (positions.isSeparable()) {
                interpolateRow(night, offset, (float) lapse, r, out, start);
                mendRow(night, offset, lapse, r, out, start);
            } else {
                interpolateCells(night, offset, (float) lapse, r, 0, row.length, out, start);
                for (int column = 0; column < row.length; column++) {
                    mend(night, offset, lapse, r, column, out, start + column);
                }
            }
        }
    }

    /**
     * Fills one tile; cell by cell the same arithmetic as {@link #adjust}, and the same values.
     *
     * @param out {@code [row of the tile * columns of the tile + column]}, degrees Celsius; positive infinity where there is no value
     */
    public void adjustTile(float[] night, int offset, double lapse, TargetTile tile, float[] out) {
        int columns = tile.columns();
        for (int r = 0; r < tile.rows(); r++) {
            int targetRow = tile.firstRow() + r;
            int start = r * columns;
            if (positions.isSeparable()) {
                interpolateTileRow(night, offset, (float) lapse, tile, targetRow, out, start);
            } else {
                interpolateCells(night, offset, (float) lapse, targetRow, tile.firstColumn(), columns, out, start);
            }
            for (int i = start; i < start + columns; i++) {
                int column = tile.firstColumn() + i - start;
                if (!tile.covered() && adjustment.containing(targetRow, column) < 0) {
                    out[i] = Float.POSITIVE_INFINITY;
                } else if (out[i] != out[i]) {
                    mend(night, offset, lapse, targetRow, column, out, i);
                }
            }
        }
    }

    private void interpolateTileRow(float[] night, int offset, float lapse, TargetTile tile, int targetRow, float[] out, int start) {
        int north = positions.north(targetRow, 0);
        if (north < 0) {
            Arrays.fill(out, start, start + tile.columns(), Float.POSITIVE_INFINITY);
            return;
        }
        int columns = positions.source().columns();
        int upper = offset + north * columns;
        int lower = positions.source().rows() > 1 ? upper + columns : upper;
        float south = positions.southWeight(targetRow, 0);
        for (int k = tile.sourceColumn(); k < tile.sourceColumn() + tile.sourceColumns(); k++) {
            blended[k] = night[upper + k] + south * (night[lower + k] - night[upper + k]);
        }
        int[] west = positions.westByColumn();
        float[] weight = positions.eastWeightByColumn();
        float[] gain = adjustment.heightGain(targetRow);
        int east = columns > 1 ? 1 : 0;
        for (int i = 0; i < tile.columns(); i++) {
            int column = tile.firstColumn() + i;
            float near = blended[west[column]];
            float value = near + weight[column] * (blended[west[column] + east] - near);
            out[start + i] = gain == null ? value : value + lapse * gain[column];
        }
    }

    private static void pass(float[] night, int from, int count, float[] out) {
        for (int i = 0; i < count; i++) {
            float value = night[from + i];
            out[i] = value == value ? value : Float.POSITIVE_INFINITY;
        }
    }

    /** Both axes independent: blend the two source rows once, then only along the row. Missing corners give NaN. */
    private void interpolateRow(float[] night, int offset, float lapse, int targetRow, float[] out, int start) {
        int columns = positions.source().columns();
        int north = positions.north(targetRow, 0);
        if (north < 0) {
            Arrays.fill(row, Float.POSITIVE_INFINITY);
            Arrays.fill(blended, 0);
        } else {
            int upper = offset + north * columns;
            System.arraycopy(night, upper, above, 0, columns);
            System.arraycopy(night, positions.source().rows() > 1 ? upper + columns : upper, below, 0, columns);
            mix(above, below, positions.southWeight(targetRow, 0), blended, columns);
            gather(blended, positions.westByColumn(), columns > 1 ? 1 : 0, left, right, row.length);
            alongRow(left, right, positions.eastWeightByColumn(), row, row.length);
            float[] gain = adjustment.heightGain(targetRow);
            if (gain != null) {
                addHeight(gain, lapse, row, row.length);
            }
        }
        System.arraycopy(row, 0, out, start, row.length);
    }

    /** The source row at the target row's northing. */
    static void mix(float[] above, float[] below, float south, float[] blended, int columns) {
        for (int i = 0; i < columns; i++) {
            blended[i] = above[i] + south * (below[i] - above[i]);
        }
    }

    /** Values of the western and eastern neighbour of every target column; of the first column beyond the source, mended later. */
    static void gather(float[] blended, int[] west, int east, float[] left, float[] right, int cells) {
        for (int i = 0; i < cells; i++) {
            int at = west[i];
            left[i] = blended[at];
            right[i] = blended[at + east];
        }
    }

    static void alongRow(float[] left, float[] right, float[] weight, float[] row, int cells) {
        for (int i = 0; i < cells; i++) {
            row[i] = left[i] + weight[i] * (right[i] - left[i]);
        }
    }

    private static void addHeight(float[] gain, float lapse, float[] row, int cells) {
        for (int i = 0; i < cells; i++) {
            row[i] += lapse * gain[i];
        }
    }

    private void interpolateCells(float[] night, int offset, float lapse, int targetRow, int firstColumn, int count, float[] out,
                                  int start) {
        int columns = positions.source().columns();
        int east = columns > 1 ? 1 : 0;
        int below = positions.source().rows() > 1 ? columns : 0;
        float[] gain = adjustment.heightGain(targetRow);
        for (int i = 0; i < count; i++) {
            int column = firstColumn + i;
            int west = positions.west(targetRow, column);
            int north = positions.north(targetRow, column);
            if (west < 0 || north < 0) {
                out[start + i] = Float.NaN;
                continue;
            }
            int corner = offset + north * columns + west;
            float wx = positions.eastWeight(targetRow, column);
            float upper = night[corner] + wx * (night[corner + east] - night[corner]);
            float lower = night[corner + below] + wx * (night[corner + below + east] - night[corner + below]);
            float value = upper + positions.southWeight(targetRow, column) * (lower - upper);
            out[start + i] = gain == null ? value : value + lapse * gain[column];
        }
    }

    /**
     * Cells that can have no value become infinite; cells whose plain interpolation met a missing corner are worked out without
     * it, or are missing too. Only the columns that a missing source value can reach are looked at.
     */
    private void mendRow(float[] night, int offset, double lapse, int targetRow, float[] out, int start) {
        for (int k = 0; k < blended.length; k++) {
            if (Float.isNaN(blended[k])) {
                int end = positions.firstColumnOf(k + 1);
                for (int column = positions.firstColumnOf(k - 1); column < end; column++) {
                    mend(night, offset, lapse, targetRow, column, out, start + column);
                }
            }
        }
        for (int column : adjustment.missingColumns(targetRow)) {
            out[start + column] = Float.POSITIVE_INFINITY;
        }
        // A source height may be missing where the temperature is not.
        for (int column : adjustment.unevenColumns(targetRow)) {
            mend(night, offset, lapse, targetRow, column, out, start + column);
        }
    }

    private void mend(float[] night, int offset, double lapse, int targetRow, int column, float[] out, int at) {
        if (Float.isNaN(out[at])) {
            int source = adjustment.containing(targetRow, column);
            boolean missing = source < 0 || Float.isNaN(night[offset + source]);
            out[at] = missing ? Float.POSITIVE_INFINITY : withoutMissingCorners(night, offset, lapse, targetRow, column);
        }
    }

    /** The value of a cell whose own source cell has one. */
    private float withoutMissingCorners(float[] night, int offset, double lapse, int targetRow, int column) {
        float[] heights = adjustment.sourceHeights();
        float targetHeight = adjustment.targetHeight(targetRow * positions.target().columns() + column);
        int columns = positions.source().columns();
        int corner = positions.north(targetRow, column) * columns + positions.west(targetRow, column);
        double total = 0;
        double weights = 0;
        for (int k = 0; k < 4; k++) {
            double weight = adjustment.cornerWeight(targetRow, column, k);
            if (weight == 0) {
                continue;
            }
            int source = corner + k / 2 * columns + k % 2;
            double seaLevel = heights == null ? night[offset + source]
                    : LapseRates.atHeight(night[offset + source], lapse, heights[source], 0);
            if (!Double.isNaN(seaLevel)) {
                total += weight * seaLevel;
                weights += weight;
            }
        }
        double value = total / weights;
        return (float) (heights == null ? value : LapseRates.atHeight(value, lapse, 0, targetHeight));
    }
}
