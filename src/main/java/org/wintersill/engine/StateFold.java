package org.wintersill.engine;

import java.util.BitSet;
import java.util.concurrent.atomic.LongAdder;
import java.util.function.IntPredicate;
import org.wintersill.elevation.AdjustedTemperature;
import org.wintersill.elevation.NightAdjuster;
import org.wintersill.elevation.NightFields;
import org.wintersill.engine.FoldPlan.Band;
import org.wintersill.engine.FoldPlan.Batch;
import org.wintersill.engine.FoldPlan.Piece;
import org.wintersill.season.StateLane;
import org.wintersill.season.WinterValues;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/**
 * The part of a band's fold that follows state models: it decodes maxima or means beside the minima, brings both to the target
 * cells, and hands each day to a {@link StateLane}. Days before the window are taken where a model asks for them.
 */
final class StateFold implements AutoCloseable {
    private final FoldJob job;
    private final StateForcing forcing;
    private final Band band;
    private final Workers workers;
    private final SlabReader reader;
    private final float[] slab;
    private final BitSet countedRows;
    private final StateLane[] lanes;
    private final NightAdjuster[] adjusters;
    private final LongAdder swapped = new LongAdder();

    /**
     * @param lanes number of lanes that are kept at once
     * @param countedRows source rows whose values were looked at with other bands; those of this band are added
     */
    StateFold(FoldJob job, FoldPlan plan, Band band, Workers workers, int lanes, BitSet countedRows) {
        this.job = job;
        this.band = band;
        this.workers = workers;
        forcing = job.states();
        reader = forcing.hasSecond() ? new SlabReader(forcing.second(), job.window(), band, workers) : null;
        slab = reader == null ? null : new float[Math.multiplyExact(plan.batchDays(), reader.dayCells())];
        this.lanes = new StateLane[lanes];
        adjusters = new NightAdjuster[workers.threads()];
        this.countedRows = new BitSet();
        this.countedRows.set(band.sourceRow(), band.sourceEnd());
        this.countedRows.andNot(countedRows);
        countedRows.or(this.countedRows);
    }

    /** Decodes the second record for a batch and compares it with the minima. */
    void read(Batch batch, float[] minima) {
        if (reader == null) {
            return;
        }
        reader.read(batch, slab);
        if (!forcing.hasMaxima()) {
            return;
        }
        int columns = job.window().columns();
        int[] rows = countedRows.stream().toArray();
        for (Piece piece : batch.pieces()) {
            workers.forEach(piece.count(), (worker, day) -> {
                int start = (piece.first() - batch.first() + day) * reader.dayCells();
                for (int row : rows) {
                    int from = start + (row - band.sourceRow()) * columns;
                    swapped.add(below(slab, minima, from, from + columns));
                }
            });
        }
    }

    private static int below(float[] maxima, float[] minima, int from, int to) {
        int count = 0;
        for (int i = from; i < to; i++) {
            count += maxima[i] < minima[i] ? 1 : 0;
        }
        return count;
    }

    /** Takes the days of a piece into a lane. */
    void fold(Batch batch, Piece piece, int worker, int slot, int firstRow, int rows, float[] minima,
              NightSlabs fields) {
        StateLane lane = lane(slot, rows * job.targetColumns());
        Season season = job.seasons().get(piece.season());
        if (piece.opens()) {
            lane.begin(season, forcing.firstDays().get(piece.season()),
                    forcing.latitudes(job.adjustment().positions().target(), firstRow, 0, rows, job.targetColumns()));
        }
        if (adjusters[worker] == null) {
            adjusters[worker] = new NightAdjuster(job.adjustment());
        }
        NightAdjuster adjuster = adjusters[worker];
        DayAxis axis = job.source().days();
        for (int position = piece.first(); position < piece.first() + piece.count(); position++) {
            int day = (int) (axis.day(position) - season.firstDay());
            while (lane.nextDay() < day) {
                lane.absent();
            }
            NightFields night = fields.of(worker, season.date(day));
            int offset = (position - batch.first()) * dayCells() - band.sourceRow() * job.window().columns();
            adjuster.adjust(minima, offset, night, AdjustedTemperature.AIR_MINIMUM, firstRow, rows, lane.minima());
            if (reader != null) {
                adjuster.adjust(slab, offset, night, forcing.kindOfSecond(), firstRow, rows, lane.means());
            }
            forcing.toMeans(lane.minima(), lane.means(), lane.cells());
            lane.accept();
        }
    }

    private int dayCells() {
        return (band.sourceEnd() - band.sourceRow()) * job.window().columns();
    }

    private StateLane lane(int slot, int cells) {
        if (lanes[slot] == null || lanes[slot].cells() != cells) {
            lanes[slot] = new StateLane(forcing.cultivars(), job.reckoning(), cells);
        }
        return lanes[slot];
    }

    /** Ends a winter of a lane. */
    void finish(int slot, IntPredicate counts, WinterValues values) {
        lanes[slot].finish(counts, values);
    }

    /** Values of source cells, each once, with a maximum below the minimum of its day. */
    long swapped() {
        return swapped.sum();
    }

    long valuesSetAside() {
        return reader == null ? 0 : reader.valuesSetAside();
    }

    @Override
    public void close() {
        if (reader != null) {
            reader.close();
        }
    }
}
