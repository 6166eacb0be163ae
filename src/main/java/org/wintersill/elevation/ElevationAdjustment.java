package org.wintersill.elevation;

import java.util.BitSet;
import java.util.Optional;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.GridGeometry;

/**
 * How temperatures of the source grid become temperatures of the target grid: reduce to sea level with the lapse rate,
 * interpolate between source cell centres, restore to the target's height (science 7.1). Definition; {@link LaneAdjuster}
 * does the work.
 *
 * <p>T = I(T_src + G z_src / 1000) - G z_dem / 1000, with I bilinear. A source cell without a height counts as missing. Without
 * heights the temperature is only interpolated; without a target grid of its own it is passed on as it is.
 */
public final class ElevationAdjustment {
    private final SourcePositions positions;
    private final float[] sourceHeights;
    private final float[] targetHeights;
    private final LapseRates lapseRates;
    private final float[][] heightGain;
    private final int[][] missingColumns;
    private final int[][] unevenColumns;
    private final Optional<LocalLapse> localLapse;
    private final TargetTerms terms;

    private ElevationAdjustment(SourcePositions positions, float[] sourceHeights, float[] targetHeights, LapseRates lapseRates) {
        this.positions = positions;
        this.sourceHeights = sourceHeights;
        this.targetHeights = targetHeights;
        this.lapseRates = lapseRates;
        heightGain = targetHeights == null ? null : heightGains();
        int rows = isPassThrough() ? 0 : positions.target().rows();
        missingColumns = new int[rows][];
        unevenColumns = new int[rows][];
        for (int r = 0; r < rows; r++) {
            int row = r;
            missingColumns[row] = columns(row, column -> containing(row, column) < 0);
            unevenColumns[row] = heightGain == null ? new int[0]
                    : columns(row, column -> containing(row, column) >= 0 && Float.isNaN(heightGain[row][column]));
        }
        localLapse = Optional.empty();
        terms = TargetTerms.none();
    }

    private ElevationAdjustment(ElevationAdjustment plain, Optional<LocalLapse> localLapse, TargetTerms terms) {
        positions = plain.positions;
        sourceHeights = plain.sourceHeights;
        targetHeights = plain.targetHeights;
        lapseRates = plain.lapseRates;
        heightGain = plain.heightGain;
        missingColumns = plain.missingColumns;
        unevenColumns = plain.unevenColumns;
        this.localLapse = localLapse;
        this.terms = terms;
    }

    /**
     * The same adjustment with lapse rates of each night and source cell, where they are given, and with what is added to the minimum of
     * a cell beside the height.
     *
     * @param localLapse its rows are those of the positions' source; the rates by month are then its prior
     */
    public ElevationAdjustment with(Optional<LocalLapse> localLapse, TargetTerms terms) {
        return new ElevationAdjustment(this, localLapse, terms);
    }

    /** The target is the source's own grid: temperatures are passed on. */
    public static ElevationAdjustment none(GridGeometry source) {
        return new ElevationAdjustment(new SourcePositions(source, source, CoordinateOperation.identity()), null, null,
                LapseRates.constant(0));
    }

    /** The target is another grid, and no heights are known: temperatures are interpolated. */
    public static ElevationAdjustment interpolation(SourcePositions positions) {
        return new ElevationAdjustment(positions, null, null, LapseRates.constant(0));
    }

    /**
     * The full adjustment.
     *
     * @param positions of the terrain model's cells in the temperatures' grid
     * @param sourceHeights {@code [source cell]}, metres, NaN for none
     * @param dem target grid with its heights
     * @param lapseRates K/km by month
     */
    public static ElevationAdjustment toHeights(SourcePositions positions, float[] sourceHeights, ElevationField dem,
                                                LapseRates lapseRates) {
        if (sourceHeights.length != positions.source().cells()) {
            throw new IllegalArgumentException(sourceHeights.length + " heights for " + positions.source().cells() + " source cells");
        }
        return new ElevationAdjustment(positions, sourceHeights, dem.metres(), lapseRates);
    }

    /**
     * The same adjustment with values in some target cells alone; the others are missing.
     *
     * @param cells {@code row * columns + column}; not copied, must not change afterwards
     */
    public ElevationAdjustment only(BitSet cells) {
        return new ElevationAdjustment(positions.only(cells), sourceHeights, targetHeights, lapseRates).with(localLapse, terms);
    }

    /**
     * Interpolated source height minus target height, {@code [row][column]}, km; NaN where a corner or the target has no height.
     * One array a row, since the day loop is only fast on arrays that begin where the lane does.
     */
    private float[][] heightGains() {
        GridGeometry target = positions.target();
        float[][] gains = new float[target.rows()][target.columns()];
        for (int row = 0; row < target.rows(); row++) {
            for (int column = 0; column < target.columns(); column++) {
                double height = interpolate(sourceHeights, row, column);
                gains[row][column] = (float) ((height - targetHeights[row * target.columns() + column]) / 1000);
            }
        }
        return gains;
    }

    /** Columns of a target row for which something holds. */
    private int[] columns(int row, IntPredicate holds) {
        return IntStream.range(0, positions.target().columns()).filter(holds).toArray();
    }

    /** Plain bilinear value; NaN where any corner with a weight is NaN. */
    private double interpolate(float[] values, int row, int column) {
        int west = positions.west(row, column);
        int north = positions.north(row, column);
        if (west < 0 || north < 0) {
            return Double.NaN;
        }
        int columns = positions.source().columns();
        double total = 0;
        for (int corner = 0; corner < 4; corner++) {
            double weight = cornerWeight(row, column, corner);
            if (weight > 0) {
                total += weight * values[(north + corner / 2) * columns + west + corner % 2];
            }
        }
        return total;
    }

    /** Weight of a corner: 0 north-west, 1 north-east, 2 south-west, 3 south-east. */
    double cornerWeight(int row, int column, int corner) {
        double east = positions.eastWeight(row, column);
        double south = positions.southWeight(row, column);
        return (corner % 2 == 0 ? 1 - east : east) * (corner / 2 == 0 ? 1 - south : south);
    }

    public SourcePositions positions() {
        return positions;
    }

    public LapseRates lapseRates() {
        return lapseRates;
    }

    /** Lapse rates fitted to each night; empty where they follow from the month alone. */
    public Optional<LocalLapse> localLapse() {
        return localLapse;
    }

    /** What is added to the minimum beside the height. */
    public TargetTerms terms() {
        return terms;
    }

    /**
     * Whether a cell's temperature is a weighted mean of source temperatures plus a lapse rate of the month times a height gain, and
     * nothing else.
     */
    public boolean isPlain() {
        return localLapse.isEmpty() && terms.isNone();
    }

    public boolean hasHeights() {
        return targetHeights != null;
    }

    /** Whether the target grid is the source grid and nothing is changed. */
    public boolean isPassThrough() {
        return targetHeights == null && positions.isSeparable() && positions.source().equals(positions.target());
    }

    /** Height of a target cell, m; NaN where there is none or no heights are used. */
    public float targetHeight(int cell) {
        return targetHeights == null ? Float.NaN : targetHeights[cell];
    }

    /** Heights of all target cells, shared; null where no heights are used. */
    float[] targetHeights() {
        return targetHeights;
    }

    /** Source cell that contains a target cell; -1 where the target cell can have no value. */
    int containing(int row, int column) {
        int cell = positions.containing(row, column);
        boolean noHeight = targetHeights != null && (Float.isNaN(targetHeights[row * positions.target().columns() + column])
                || cell >= 0 && Float.isNaN(sourceHeights[cell]));
        return noHeight ? -1 : cell;
    }

    /** Columns of a target row that can have no value, ascending. Not for a pass-through. */
    int[] missingColumns(int row) {
        return missingColumns[row];
    }

    /** Columns of a target row that can have a value, but with a source height missing beside them. Not for a pass-through. */
    int[] unevenColumns(int row) {
        return unevenColumns[row];
    }

    /** Heights of the source cells, m, NaN for none; shared, null where no heights are used. */
    public float[] sourceHeights() {
        return sourceHeights;
    }

    /** Height gains of a target row, km; null where no heights are used. */
    float[] heightGain(int row) {
        return heightGain == null ? null : heightGain[row];
    }

    /** Whether a target cell can ever have a value: inside the source's cells, and with a height where heights are used. */
    public boolean covers(int row, int column) {
        return positions.containing(row, column) >= 0
                && (targetHeights == null || !Float.isNaN(targetHeights[row * positions.target().columns() + column]));
    }

    /**
     * Height of the target minus the height that the interpolated source temperature stands for, m: what the adjustment
     * bridges. Source corners without height are left out; NaN where the cell can have no value.
     */
    public float heightChange(int row, int column) {
        if (targetHeights == null || !covers(row, column)
                || Float.isNaN(sourceHeights[positions.containing(row, column)])) {
            return Float.NaN;
        }
        int columns = positions.source().columns();
        double total = 0;
        double weights = 0;
        for (int corner = 0; corner < 4; corner++) {
            double weight = cornerWeight(row, column, corner);
            if (weight > 0) {
                float height = sourceHeights[(positions.north(row, column) + corner / 2) * columns
                        + positions.west(row, column) + corner % 2];
                if (!Float.isNaN(height)) {
                    total += weight * height;
                    weights += weight;
                }
            }
        }
        return (float) (targetHeights[row * positions.target().columns() + column] - total / weights);
    }
}
