package org.wintersill.elevation;

/**
 * Brings one night's temperatures from the source grid to a lane of target rows. Run of an {@link ElevationAdjustment}, with
 * room of its own: one a worker.
 */
public final class LaneAdjuster {
    private final ElevationAdjustment adjustment;
    private final SourcePositions positions;
    private final float[] blended;

    public LaneAdjuster(ElevationAdjustment adjustment) {
        this.adjustment = adjustment;
        positions = adjustment.positions();
        blended = new float[positions.source().columns()];
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
        for (int row = firstRow; row < firstRow + rows; row++) {
            int start = (row - firstRow) * positions.target().columns();
            if (positions.isSeparable()) {
                interpolateRow(night, offset, (float) lapse, row, out, start);
            } else {
                interpolateCells(night, offset, (float) lapse, row, out, start);
            }
            mend(night, offset, lapse, row, out, start);
        }
    }

    private static void pass(float[] night, int from, int count, float[] out) {
        for (int i = 0; i < count; i++) {
            float value = night[from + i];
            out[i] = value == value ? value : Float.POSITIVE_INFINITY;
        }
    }

    /** Both axes independent: blend the two source rows once, then only along the row. Missing corners give NaN. */
    private void interpolateRow(float[] night, int offset, float lapse, int row, float[] out, int start) {
        int columns = positions.source().columns();
        int targetColumns = positions.target().columns();
        int north = positions.north(row, 0);
        if (north < 0) {
            java.util.Arrays.fill(out, start, start + targetColumns, Float.NaN);
            return;
        }
        int upper = offset + north * columns;
        int lower = positions.source().rows() > 1 ? upper + columns : upper;
        float south = positions.southWeight(row, 0);
        for (int i = 0; i < columns; i++) {
            blended[i] = night[upper + i] + south * (night[lower + i] - night[upper + i]);
        }
        int east = columns > 1 ? 1 : 0;
        float[] gain = adjustment.heightGain();
        int cell = row * targetColumns;
        for (int column = 0; column < targetColumns; column++) {
            int west = positions.west(0, column);
            float value = Float.NaN;
            if (west >= 0) {
                float left = blended[west];
                value = left + positions.eastWeight(0, column) * (blended[west + east] - left);
            }
            out[start + column] = value;
        }
        if (gain != null) {
            for (int column = 0; column < targetColumns; column++) {
                out[start + column] += lapse * gain[cell + column];
            }
        }
    }

    private void interpolateCells(float[] night, int offset, float lapse, int row, float[] out, int start) {
        int columns = positions.source().columns();
        int east = columns > 1 ? 1 : 0;
        int below = positions.source().rows() > 1 ? columns : 0;
        int targetColumns = positions.target().columns();
        float[] gain = adjustment.heightGain();
        for (int column = 0; column < targetColumns; column++) {
            int west = positions.west(row, column);
            int north = positions.north(row, column);
            if (west < 0 || north < 0) {
                out[start + column] = Float.NaN;
                continue;
            }
            int corner = offset + north * columns + west;
            float wx = positions.eastWeight(row, column);
            float upper = night[corner] + wx * (night[corner + east] - night[corner]);
            float lower = night[corner + below] + wx * (night[corner + below + east] - night[corner + below]);
            float value = upper + positions.southWeight(row, column) * (lower - upper);
            out[start + column] = gain == null ? value : value + lapse * gain[row * targetColumns + column];
        }
    }

    /** Cells whose plain interpolation met a missing corner: leave it out and rescale, or call the cell missing. */
    private void mend(float[] night, int offset, double lapse, int row, float[] out, int start) {
        int targetColumns = positions.target().columns();
        for (int column = 0; column < targetColumns; column++) {
            float value = out[start + column];
            if (value != value) {
                out[start + column] = withoutMissingCorners(night, offset, lapse, row, column);
            }
        }
    }

    private float withoutMissingCorners(float[] night, int offset, double lapse, int row, int column) {
        int containing = positions.containing(row, column);
        if (containing < 0 || Float.isNaN(night[offset + containing])) {
            return Float.POSITIVE_INFINITY;
        }
        float[] heights = adjustment.sourceHeights();
        float targetHeight = adjustment.targetHeight(row * positions.target().columns() + column);
        if (heights != null && (Float.isNaN(targetHeight) || Float.isNaN(heights[containing]))) {
            return Float.POSITIVE_INFINITY;
        }
        int columns = positions.source().columns();
        int corner = positions.north(row, column) * columns + positions.west(row, column);
        double total = 0;
        double weights = 0;
        for (int k = 0; k < 4; k++) {
            double weight = adjustment.cornerWeight(row, column, k);
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
