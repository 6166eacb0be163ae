package org.wintersill.elevation;

/** Plain bilinear interpolation of a source field to one target row; a missing corner gives NaN. One a worker. */
final class FieldInterpolator {
    private final SourcePositions positions;
    private final float[] above;
    private final float[] below;
    private final float[] blended;
    private final float[] left;
    private final float[] right;

    FieldInterpolator(SourcePositions positions) {
        this.positions = positions;
        above = new float[positions.source().columns()];
        below = new float[above.length];
        blended = new float[above.length];
        left = new float[positions.target().columns()];
        right = new float[left.length];
    }

    /**
     * Fills a row.
     *
     * @param field source cell {@code c} at {@code offset + c}
     * @param factor multiplies the field, source cell {@code c} at {@code c}; null for none
     * @param row values by target column; where the cell lies beyond the source anything but of no use
     */
    void row(float[] field, int offset, float[] factor, int targetRow, float[] row) {
        if (!positions.isSeparable()) {
            cells(field, offset, factor, targetRow, row);
            return;
        }
        int columns = above.length;
        int north = Math.max(0, positions.north(targetRow, 0));
        int south = positions.source().rows() > 1 ? north + 1 : north;
        take(field, offset, factor, north * columns, above);
        take(field, offset, factor, south * columns, below);
        LaneAdjuster.mix(above, below, positions.southWeight(targetRow, 0), blended, columns);
        LaneAdjuster.gather(blended, positions.westByColumn(), columns > 1 ? 1 : 0, left, right, row.length);
        LaneAdjuster.alongRow(left, right, positions.eastWeightByColumn(), row, row.length);
    }

    private static void take(float[] field, int offset, float[] factor, int start, float[] into) {
        System.arraycopy(field, offset + start, into, 0, into.length);
        if (factor != null) {
            for (int i = 0; i < into.length; i++) {
                into[i] *= factor[start + i];
            }
        }
    }

    private void cells(float[] field, int offset, float[] factor, int targetRow, float[] row) {
        int columns = above.length;
        int east = columns > 1 ? 1 : 0;
        int south = positions.source().rows() > 1 ? columns : 0;
        for (int column = 0; column < row.length; column++) {
            int west = positions.west(targetRow, column);
            int north = positions.north(targetRow, column);
            if (west < 0 || north < 0) {
                row[column] = Float.NaN;
                continue;
            }
            int corner = north * columns + west;
            float wx = positions.eastWeight(targetRow, column);
            float a = value(field, offset, factor, corner);
            float b = value(field, offset, factor, corner + east);
            float c = value(field, offset, factor, corner + south);
            float d = value(field, offset, factor, corner + south + east);
            float upper = a + wx * (b - a);
            float lower = c + wx * (d - c);
            row[column] = upper + positions.southWeight(targetRow, column) * (lower - upper);
        }
    }

    private static float value(float[] field, int offset, float[] factor, int cell) {
        return factor == null ? field[offset + cell] : field[offset + cell] * factor[cell];
    }
}
