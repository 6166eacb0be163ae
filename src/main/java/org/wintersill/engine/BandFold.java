package org.wintersill.engine;

import java.util.BitSet;
import org.wintersill.elevation.AdjustedTemperature;
import org.wintersill.elevation.NightAdjuster;
import org.wintersill.elevation.TargetTiles;
import org.wintersill.engine.FoldPlan.Band;
import org.wintersill.engine.FoldPlan.Batch;
import org.wintersill.engine.FoldPlan.Piece;
import org.wintersill.season.CompletenessTally;
import org.wintersill.season.NightCurve;
import org.wintersill.season.WinterLane;
import org.wintersill.season.WinterValues;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/** The fold of one band of target rows from its first day to its last. */
final class BandFold implements AutoCloseable {
    /** Source cells that one task of the missing-day count takes. */
    private static final int TALLY_CELLS = 8192;

    private final FoldJob job;
    private final Band band;
    private final Workers workers;
    private final WinterSink sink;
    private final Progress progress;
    private final SlabReader reader;
    private final float[] slab;
    private final boolean wholeWinters;
    private final int laneRows;
    private final int laneCount;
    /** Null where the plain loop does the work. */
    private final TiledFold tiled;
    private final WinterLane[] lanes;
    private final NightSlabs fields;
    private final NightAdjuster[] adjusters;
    private final float[][][] nights;
    /** Of the nights of a stretch in the winter's window, {@code [worker][night]}. */
    private final int[][] positions;
    /** Null where no cultivar has a state model. */
    private final StateFold states;
    private CompletenessTally tally;
    /** Position in the window of the last night that the tally has seen. */
    private int lastNight;

    /**
     * @param countedRows source rows that other bands have looked at
     * @param means told of every night
     */
    BandFold(FoldJob job, FoldPlan plan, Band band, Workers workers, WinterSink sink, Progress progress, BitSet countedRows,
             NightMeans means) {
        this.job = job;
        this.band = band;
        this.workers = workers;
        this.sink = sink;
        this.progress = progress;
        reader = new SlabReader(job.source(), job.window(), band, workers);
        slab = new float[Math.multiplyExact(plan.batchDays(), reader.dayCells())];
        wholeWinters = plan.wholeWinters();
        laneRows = plan.laneRows();
        laneCount = (band.rowEnd() - band.row() + laneRows - 1) / laneRows;
        tiled = plan.tiled() ? TargetTiles.of(job.adjustment(), band.row(), band.rowEnd())
                .map(tiles -> new TiledFold(job, tiles, workers.threads(), wholeWinters)).orElse(null) : null;
        lanes = new WinterLane[wholeWinters ? workers.threads() : laneCount];
        fields = new NightSlabs(job, plan, band, workers, means);
        adjusters = new NightAdjuster[workers.threads()];
        nights = new float[workers.threads()][][];
        positions = new int[workers.threads()][WinterLane.STRETCH];
        states = job.states().isNone() ? null : new StateFold(job, plan, band, workers, lanes.length, countedRows);
    }

    void accept(Batch batch) {
        reader.read(batch, slab);
        fields.read(batch);
        if (states != null) {
            states.read(batch, slab);
        }
        for (Piece piece : batch.pieces()) {
            if (piece.opens()) {
                tally = new CompletenessTally(job.seasons().get(piece.season()), job.policy(), Math.max(1, reader.dayCells()));
                lastNight = -1;
            }
            count(batch, piece);
            fields.take(batch, piece, slab);
            if (tiled != null) {
                foldTiles(batch, piece);
            } else {
                workers.forEach(laneCount, (worker, lane) -> {
                    fold(batch, piece, worker, lane);
                    progress.advance((long) piece.count() * rows(lane));
                });
            }
        }
        long summer = batch.count() - batch.pieces().stream().mapToLong(Piece::count).sum();
        progress.advance(summer * (band.rowEnd() - band.row()));
    }

    /** Tells the tally of every night of the piece, and of the nights without record before, between and after. */
    private void count(Batch batch, Piece piece) {
        Season season = job.seasons().get(piece.season());
        DayAxis axis = job.source().days();
        int before = lastNight;
        int cells = reader.dayCells();
        workers.forEach((cells + TALLY_CELLS - 1) / TALLY_CELLS, (worker, task) -> {
            int from = task * TALLY_CELLS;
            int to = Math.min(cells, from + TALLY_CELLS);
            int next = before + 1;
            for (int position = piece.first(); position < piece.first() + piece.count(); position++) {
                int night = (int) (axis.day(position) - season.firstDay());
                for (; next < night; next++) {
                    tally.absent(next, from, to);
                }
                tally.accept(night, slab, (position - batch.first()) * cells, from, to);
                next = night + 1;
            }
            for (; piece.closes() && next < season.days(); next++) {
                tally.absent(next, from, to);
            }
        });
        lastNight = (int) (axis.day(piece.first() + piece.count() - 1) - season.firstDay());
    }

    private void foldTiles(Batch batch, Piece piece) {
        Season season = job.seasons().get(piece.season());
        int[] nights = new int[piece.count()];
        int[] offsets = new int[piece.count()];
        for (int n = 0; n < nights.length; n++) {
            nights[n] = (int) (job.source().days().day(piece.first() + n) - season.firstDay());
            offsets[n] = offset(batch, piece.first() + n);
        }
        TiledFold.Nights days = new TiledFold.Nights(piece.season(), nights, slab, offsets, piece.opens(), piece.closes());
        workers.forEach(tiled.rows(), (worker, row) -> {
            int firstRow = tiled.firstRow(row);
            WinterValues values = tiled.accept(worker, row, days, cell -> counts(firstRow, cell));
            if (values != null) {
                sink.accept(piece.season(), firstRow, values);
            }
            progress.advance((long) piece.count() * tiled.targetRows(row));
        });
    }

    /** Where the window's source cell 0 would lie in the slab: a source cell's number counts from the window's first row, the slab from the band's. */
    private int offset(Batch batch, int position) {
        return (position - batch.first()) * reader.dayCells() - band.sourceRow() * job.window().columns();
    }

    private int rows(int lane) {
        return Math.min(laneRows, band.rowEnd() - band.row() - lane * laneRows);
    }

    private void fold(Batch batch, Piece piece, int worker, int laneNumber) {
        int firstRow = band.row() + laneNumber * laneRows;
        int rows = rows(laneNumber);
        WinterLane lane = lane(worker, laneNumber, rows);
        if (piece.opens()) {
            lane.begin();
        }
        Season season = job.seasons().get(piece.season());
        NightCurve[] curves = job.curves().get(piece.season());
        DayAxis axis = job.source().days();
        // Days before the window are for state models only.
        int position = Math.max(piece.first(), axis.firstIndexFrom(season.firstDay()));
        int end = piece.first() + piece.count();
        while (position < end) {
            int first = (int) (axis.day(position) - season.firstDay());
            int count = 0;
            while (position < end && count < WinterLane.STRETCH && axis.day(position) - season.firstDay() == first + count) {
                positions[worker][count] = first + count;
                adjusters[worker].adjust(slab, offset(batch, position), fields.of(worker, season.date(first + count)),
                        AdjustedTemperature.MINIMUM, firstRow, rows, nights[worker][count]);
                position++;
                count++;
            }
            lane.accept(curves, nights[worker], count, positions[worker]);
        }
        if (states != null) {
            states.fold(batch, piece, worker, slot(worker, laneNumber), firstRow, rows, slab, fields);
        }
        if (piece.closes()) {
            WinterValues values = lane.finish(cell -> counts(firstRow, cell));
            if (states != null) {
                states.finish(slot(worker, laneNumber), cell -> counts(firstRow, cell), values);
            }
            sink.accept(piece.season(), firstRow, values);
        }
    }

    private int slot(int worker, int laneNumber) {
        return wholeWinters ? worker : laneNumber;
    }

    private WinterLane lane(int worker, int laneNumber, int rows) {
        int columns = job.targetColumns();
        if (adjusters[worker] == null) {
            adjusters[worker] = new NightAdjuster(job.adjustment());
            nights[worker] = new float[WinterLane.STRETCH][laneRows * columns];
        }
        int slot = slot(worker, laneNumber);
        int cells = rows * columns;
        if (lanes[slot] == null || lanes[slot].cells() != cells) {
            lanes[slot] = new WinterLane(job.cultivars(), job.levels(), job.reckoning(), cells);
        }
        return lanes[slot];
    }

    /** Whether the winter is complete enough in the source cell that contains a cell of a lane. */
    private boolean counts(int firstRow, int cell) {
        int columns = job.targetColumns();
        int containing = job.adjustment().positions().containing(firstRow + cell / columns, cell % columns);
        return containing >= 0 && tally.isComplete(containing - band.sourceRow() * job.window().columns());
    }

    long valuesSetAside() {
        return reader.valuesSetAside() + fields.valuesSetAside() + (states == null ? 0 : states.valuesSetAside());
    }

    /** Values of source cells with a maximum below the minimum of its day. */
    long swapped() {
        return states == null ? 0 : states.swapped();
    }

    @Override
    public void close() {
        reader.close();
        fields.close();
        if (states != null) {
            states.close();
        }
    }
}
