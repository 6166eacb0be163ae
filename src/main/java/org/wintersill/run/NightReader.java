package org.wintersill.run;

import java.util.Arrays;
import java.util.Optional;
import org.wintersill.elevation.AdjustedTemperature;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.LapseField;
import org.wintersill.elevation.LocalLapse;
import org.wintersill.elevation.NightAdjuster;
import org.wintersill.elevation.NightFields;
import org.wintersill.elevation.StableNights;
import org.wintersill.grid.Block;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.time.CfDate;

/** Single nights of a plan for a few target rows, with the reader, the fields and the adjustment of the main job. Used by one thread. */
final class NightReader implements AutoCloseable {
    private final ElevationAdjustment adjustment;
    private final Block block;
    private final int firstNeeded;
    private final int endNeeded;
    private final DailyTemperatureReader reader;
    private final Optional<DailyTemperatureReader> maximumReader;
    private final Optional<LapseField> lapseField;
    private final float[] minima;
    private final float[] maxima;
    private final float[] second;
    private final float[] rates;
    private final float[] weights;
    private final float[] lane;
    private final int shift;
    private final NightAdjuster adjuster;
    private final NightFields fields = new NightFields();

    /**
     * Opens the record for target rows that have at least one cell inside the source.
     *
     * @param row first target row
     * @param rowEnd the one after the last
     */
    NightReader(RunPlan plan, int row, int rowEnd) {
        adjustment = plan.adjustment();
        int[] rows = adjustment.positions().sourceRows(row, rowEnd);
        int halo = adjustment.localLapse().map(LocalLapse::haloRows).orElse(0);
        Block window = plan.job().window();
        int first = Math.max(0, rows[0] - halo);
        int end = Math.min(window.rows(), rows[1] + halo);
        firstNeeded = rows[0] - first;
        endNeeded = rows[1] - first;
        block = new Block(window.column(), window.row() + first, window.columns(), end - first);
        shift = -first * window.columns();
        lapseField = adjustment.localLapse().map(lapse -> new LapseField(lapse.rows(first, end), window.columns(),
                Arrays.copyOfRange(adjustment.sourceHeights(), first * window.columns(), end * window.columns())));
        minima = new float[block.cells()];
        maxima = new float[plan.job().poolMaxima().isPresent() ? minima.length : 0];
        second = new float[plan.job().states().hasSecond() ? minima.length : 0];
        rates = lapseField.isPresent() ? new float[minima.length] : null;
        weights = plan.job().weighsNights() ? new float[minima.length] : null;
        lane = new float[plan.target().columns()];
        adjuster = new NightAdjuster(adjustment);
        reader = plan.job().source().open();
        maximumReader = plan.job().poolMaxima().map(source -> source.open());
    }

    /** Number of source cells that are read. */
    int cells() {
        return minima.length;
    }

    /** The minima of the night last read, {@code [cell]}. */
    float[] minima() {
        return minima;
    }

    /** Number of a window's cell among those that are read. */
    int cell(int windowCell) {
        return shift + windowCell;
    }

    /** Reads a night and works its fields out. */
    void read(int position, CfDate date) {
        reader.read(position, 1, block, minima, 0, minima.length);
        maximumReader.ifPresent(maximum -> maximum.read(position, 1, block, maxima, 0, maxima.length));
        lapseField.ifPresent(field -> field.compute(minima, 0, date.month(), firstNeeded, endNeeded, rates));
        if (weights != null) {
            StableNights stable = adjustment.terms().nights();
            for (int i = 0; i < weights.length; i++) {
                weights[i] = stable instanceof StableNights.ByLapse byLapse ? byLapse.weight(rates[i], date.month())
                        : ((StableNights.ByRange) stable).weight(minima[i], maxima[i]);
            }
        }
        fields.of(adjustment, date, rates, weights);
    }

    /** The night last read at a target cell that lies in the source. */
    CellExplanation.Steps at(int row, int column) {
        float source = minima[cell(adjustment.positions().containing(row, column))];
        adjuster.interpolate(minima, shift, row, 1, lane);
        float interpolated = value(lane[column]);
        adjuster.adjust(minima, shift, fields, AdjustedTemperature.MINIMUM, row, 1, lane);
        float tmin = value(lane[column]);
        float pool = adjuster.poolChange(shift, fields, row, column);
        float water = adjuster.waterChange(fields, row, column);
        float offset = (float) adjustment.terms().offset();
        return new CellExplanation.Steps(source, Float.NaN, interpolated, adjuster.lapse(shift, fields, row, column),
                tmin - interpolated - pool - water - offset, pool, water, offset, tmin, adjustment.isPlain());
    }

    /** Minimum of the air on the night last read, degC; positive infinity for missing. */
    float airMinimum(int row, int column) {
        adjuster.adjust(minima, shift, fields, AdjustedTemperature.AIR_MINIMUM, row, 1, lane);
        return lane[column];
    }

    /** The same night's value of another record on the same grid and days. */
    float second(DailyTemperatureReader record, int position, AdjustedTemperature kind, int row, int column) {
        record.read(position, 1, block, second, 0, second.length);
        adjuster.adjust(second, shift, fields, kind, row, 1, lane);
        return lane[column];
    }

    private static float value(float laneValue) {
        return laneValue == Float.POSITIVE_INFINITY ? Float.NaN : laneValue;
    }

    @Override
    public void close() {
        reader.close();
        maximumReader.ifPresent(DailyTemperatureReader::close);
    }
}
