package org.wintersill.engine;

import java.util.Arrays;
import org.wintersill.elevation.LapseField;
import org.wintersill.elevation.LocalLapse;
import org.wintersill.elevation.NightFields;
import org.wintersill.elevation.StableNights;
import org.wintersill.engine.FoldPlan.Band;
import org.wintersill.engine.FoldPlan.Batch;
import org.wintersill.engine.FoldPlan.Piece;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;

/**
 * What the nights of a batch bring beside their temperatures, on the source rows of a band: fitted lapse rates and the weight of pools,
 * laid out as the temperatures are. Nights are worked out by all workers, each by one.
 */
final class NightSlabs implements AutoCloseable {
    /** Source cells that one task of the means takes. */
    private static final int MEAN_CELLS = 4096;

    private final FoldJob job;
    private final Band band;
    private final Workers workers;
    /** Source rows that the band's target rows lie between, without those their lapse rates look at. */
    private final int[] needed;
    private final SlabReader maximumReader;
    private final float[] maxima;
    private final float[] rates;
    private final float[] weights;
    private final LapseField[] fields;
    private final NightFields[] nights;
    private final NightMeans means;
    /** First of the needed rows that no other band has taken into the means. */
    private final int firstMeanRow;

    NightSlabs(FoldJob job, FoldPlan plan, Band band, Workers workers, NightMeans means) {
        this.job = job;
        this.band = band;
        this.workers = workers;
        this.means = means;
        needed = job.adjustment().positions().sourceRows(band.row(), band.rowEnd());
        firstMeanRow = means.claim(needed[0], needed[1]);
        int cells = Math.multiplyExact(plan.batchDays(), dayCells());
        maximumReader = job.poolMaxima().map(source -> new SlabReader(source, job.window(), band, workers)).orElse(null);
        maxima = maximumReader == null ? null : new float[cells];
        rates = job.adjustment().localLapse().isPresent() ? new float[cells] : null;
        weights = job.weighsNights() ? new float[cells] : null;
        fields = rates == null || cells == 0 ? new LapseField[0] : fields();
        nights = new NightFields[workers.threads()];
        Arrays.setAll(nights, worker -> new NightFields());
    }

    /** Slabs of this kind that a job keeps beside the minima. */
    static int slabs(FoldJob job) {
        return (job.poolMaxima().isPresent() ? 1 : 0) + (job.adjustment().localLapse().isPresent() ? 1 : 0) + (job.weighsNights() ? 1 : 0);
    }

    private int dayCells() {
        return (band.sourceEnd() - band.sourceRow()) * job.window().columns();
    }

    /** Decodes the maxima of a batch where they are needed. */
    void read(Batch batch) {
        if (maximumReader != null) {
            maximumReader.read(batch, maxima);
        }
    }

    /** Works out the nights of a piece. */
    void take(Batch batch, Piece piece, float[] minima) {
        if (dayCells() == 0 || rates == null && weights == null) {
            return;
        }
        Season season = job.seasons().get(piece.season());
        workers.forEach(piece.count(), (worker, day) -> {
            int start = (piece.first() - batch.first() + day) * dayCells();
            CfDate date = date(season, piece.first() + day);
            if (rates != null) {
                fields[worker].compute(minima, start, date.month(), needed[0] - band.sourceRow(), needed[1] - band.sourceRow(), rates);
            }
            if (weights != null) {
                weigh(start, date.month(), minima);
            }
        });
        int from = (firstMeanRow - band.sourceRow()) * job.window().columns();
        int to = (needed[1] - band.sourceRow()) * job.window().columns();
        workers.forEach((to - from + MEAN_CELLS - 1) / MEAN_CELLS, (worker, task) -> {
            int first = from + task * MEAN_CELLS;
            int end = Math.min(to, first + MEAN_CELLS);
            for (int day = 0; day < piece.count(); day++) {
                if (job.source().days().day(piece.first() + day) >= season.firstDay()) {
                    means.take(minima, rates, weights, (piece.first() - batch.first() + day) * dayCells(), first, end,
                            band.sourceRow() * job.window().columns());
                }
            }
        });
    }

    private CfDate date(Season season, int position) {
        return season.date((int) (job.source().days().day(position) - season.firstDay()));
    }

    /** One a worker; the heights of the band's windows are looked through once for all of them. */
    private LapseField[] fields() {
        LocalLapse rows = job.adjustment().localLapse().orElseThrow().rows(band.sourceRow(), band.sourceEnd());
        int columns = job.window().columns();
        LapseField[] all = new LapseField[workers.threads()];
        all[0] = new LapseField(rows, columns, Arrays.copyOfRange(job.adjustment().sourceHeights(), band.sourceRow() * columns,
                band.sourceEnd() * columns));
        for (int worker = 1; worker < all.length; worker++) {
            all[worker] = all[0].another();
        }
        return all;
    }

    private void weigh(int start, int month, float[] minima) {
        StableNights stable = job.adjustment().terms().nights();
        int end = start + dayCells();
        if (stable instanceof StableNights.ByLapse byLapse) {
            for (int i = start; i < end; i++) {
                weights[i] = byLapse.weight(rates[i], month);
            }
        } else if (stable instanceof StableNights.ByRange byRange) {
            for (int i = start; i < end; i++) {
                weights[i] = byRange.weight(minima[i], maxima[i]);
            }
        }
    }

    /** The fields of a night; the worker's own, good until it asks for the next. */
    NightFields of(int worker, CfDate date) {
        return nights[worker].of(job.adjustment(), date, rates, weights);
    }

    long valuesSetAside() {
        return maximumReader == null ? 0 : maximumReader.valuesSetAside();
    }

    @Override
    public void close() {
        if (maximumReader != null) {
            maximumReader.close();
        }
    }
}
