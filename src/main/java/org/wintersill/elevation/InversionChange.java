package org.wintersill.elevation;

/**
 * What an {@link Inversion} adds to a target cell beside the lapse rate: its excess at the cell less the interpolated excess of the source
 * cells, whose temperatures already hold theirs.
 */
public final class InversionChange implements PoolChange {
    private final float[][] change;

    /** @param adjustment with heights */
    public InversionChange(Inversion inversion, ElevationAdjustment adjustment) {
        float[] excess = new float[adjustment.sourceHeights().length];
        for (int i = 0; i < excess.length; i++) {
            excess[i] = (float) inversion.excess(adjustment.sourceHeights()[i]);
        }
        int rows = adjustment.positions().target().rows();
        int columns = adjustment.positions().target().columns();
        change = new float[rows][columns];
        FieldInterpolator interpolator = new FieldInterpolator(adjustment.positions());
        for (int row = 0; row < rows; row++) {
            interpolator.row(excess, 0, null, row, change[row]);
            for (int column = 0; column < columns; column++) {
                double own = inversion.excess(adjustment.targetHeight(row * columns + column));
                float value = (float) (own - change[row][column]);
                // Beside a source cell without height nothing is known, beyond the source nothing is asked.
                change[row][column] = value == value ? value : 0;
            }
        }
    }

    @Override
    public float[] row(int targetRow) {
        return change[targetRow];
    }

    @Override
    public long bytes() {
        return 4L * change.length * (change.length == 0 ? 0 : change[0].length);
    }
}
