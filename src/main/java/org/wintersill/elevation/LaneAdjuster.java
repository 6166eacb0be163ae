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
            } else {
                interpolateCells(night, offset, (float) lapse, r, out, start);
            }
            mend(night, offset, lapse, r, out, start);
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
        int targetColumns = positions.target().columns();
        int north = positions.north(targetRow, 0);
        if (north < 0) {
            Arrays.fill(out, start, start + targetColumns, Float.NaN);
            return;
        }
        int upper = offset + north * columns;
        int lower = positions.source().rows() > 1 ? upper + columns : upper;
        blend(night, upper, lower, positions.southWeight(targetRow, 0), columns);
        gather(positions.westByColumn(), columns > 1 ? 1 : 0, targetColumns);
        alongRow(left, right, positions.eastWeightByColumn(), row, targetColumns);
        float[] gain = adjustment.heightGain(targetRow);
        if (gain != null) {
            addHeight(gain, lapse, row, targetColumns);
        }
        System.arraycopy(row, 0, out, start, targetColumns);
    }

    private void blend(float[] night, int upper, int lower, float south, int columns) {
        System.arraycopy(night, upper, above, 0, columns);
        System.arraycopy(night, lower, below, 0, columns);
        mix(above, below, south, blended, columns);
    }

    private static void mix(float[] above, float[] below, float south, float[] blended, int columns) {
        for (int i = 0; i < columns; i++) {
            blended[i] = above[i] + south * (below[i] - above[i]);
        }
    }

    /** Values of the western and eastern neighbour of every target column; of the first column beyond the source, mended later. */
    private void gather(int[] west, int east, int cells) {
        for (int i = 0; i < cells; i++) {
            int at = west[i];
            left[i] = blended[at];
            right[i] = blended[at + east];
        }
    }

    private static void alongRow(float[] left, float[] right, float[] weight, float[] row, int cells) {
        for (int i = 0; i < cells; i++) {
            row[i] = left[i] + weight[i] * (right[i] - left[i]);
        }
    }

    private static void addHeight(float[] gain, float lapse, float[] row, int cells) {
        for (int i = 0; i < cells; i++) {
            row[i] += lapse * gain[i];
        }
    }

    private void interpolateCells(float[] night, int offset, float lapse, int targetRow, float[] out, int start) {
        int columns = positions.source().columns();
        int east = columns > 1 ? 1 : 0;
        int below = positions.source().rows() > 1 ? columns : 0;
        int targetColumns = positions.target().columns();
        float[] gain = adjustment.heightGain(targetRow);
        for (int column = 0; column < targetColumns; column++) {
            int west = positions.west(targetRow, column);
            int north = positions.north(targetRow, column);
            if (west < 0 || north < 0) {
                out[start + column] = Float.NaN;
                continue;
            }
            int corner = offset + north * columns + west;
            float wx = positions.eastWeight(targetRow, column);
            float upper = night[corner] + wx * (night[corner + east] - night[corner]);
            float lower = night[corner + below] + wx * (night[corner + below + east] - night[corner + below]);
            float value = upper + positions.southWeight(targetRow, column) * (lower - upper);
            out[start + column] = gain == null ? value : value + lapse * gain[column];
        }
    }

    /**
     * Cells that can have no value become infinite; cells whose plain interpolation met a missing corner are worked out without
     * it, or are missing too.
     */
    private void mend(float[] night, int offset, double lapse, int targetRow, float[] out, int start) {
        int[] containing = adjustment.containing(targetRow);
        for (int column = 0; column < containing.length; column++) {
            int source = containing[column];
            float value = out[start + column];
            if (source < 0 || value != value) {
                boolean missing = source < 0 || Float.isNaN(night[offset + source]);
                out[start + column] = missing ? Float.POSITIVE_INFINITY
                        : withoutMissingCorners(night, offset, lapse, targetRow, column);
            }
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
