package org.wintersill.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.wintersill.elevation.LapseField;
import org.wintersill.elevation.LocalLapse;
import org.wintersill.elevation.SourcePositions;
import org.wintersill.elevation.TargetTiles;
import org.wintersill.engine.FoldPlan.Band;
import org.wintersill.engine.FoldPlan.Batch;
import org.wintersill.engine.FoldPlan.Piece;
import org.wintersill.problem.Problem;
import org.wintersill.season.StateLane;
import org.wintersill.season.WinterLane;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/**
 * Cuts a job up so that it fits the memory and every stored chunk is decoded once where that is possible: as many days at a
 * time as fit, whole chunks of days always; bands of rows only where even one chunk's days of the whole grid are too much.
 */
public final class FoldPlanner {
    /** Item of the estimate that stays in memory until the last layer is written. */
    public static final String TARGET = "heights and positions of the target";
    /** Cells that a lane aims at: its running values and one stretch of nights stay in the processor's second-level cache. */
    private static final int LANE_CELLS = 2048;
    private static final long FLOAT = 4;
    /** Longest batch in bytes: beyond this longer batches gain nothing. */
    private static final long ENOUGH_BATCH = 1L << 28;
    private static final String SLAB = "source days in memory";

    private final FoldJob job;
    private final int threads;
    private final long budget;

    /** @param budget bytes that the fold may keep at once */
    public FoldPlanner(FoldJob job, int threads, long budget) {
        this.job = job;
        this.threads = threads;
        this.budget = budget;
    }

    /**
     * The plan.
     *
     * @throws org.wintersill.problem.ProblemException when nothing fits, naming the largest item
     */
    public FoldPlan plan() {
        StorageLayout layout = job.source().layout();
        FoldPlan smallest = null;
        for (int bandCount = 1; bandCount <= job.targetRows(); bandCount = bandCount < 16 ? bandCount + 1 : bandCount * 2) {
            List<Band> bands = bands(bandCount, layout);
            int sourceRows = bands.stream().mapToInt(band -> band.sourceEnd() - band.sourceRow()).max().orElse(0);
            long dayBytes = Math.max(1, (long) sourceRows * job.window().columns()) * FLOAT;
            List<Batch> wholeWinters = batches(longestSeason(), true);
            FoldPlan candidate = plan(bands, wholeWinters);
            if (isWithin(candidate) && candidate.batchDays() * dayBytes <= Math.max(ENOUGH_BATCH, layout.days() * dayBytes)) {
                return candidate;
            }
            long most = Math.min(ENOUGH_BATCH, budget) / dayBytes;
            for (long days = Math.min(most, longestSeason()); ; days /= 2) {
                int chunkDays = (int) Math.max(layout.days(), days / layout.days() * layout.days());
                candidate = plan(bands, batches(chunkDays, false));
                if (isWithin(candidate)) {
                    return candidate;
                }
                if (days <= layout.days()) {
                    break;
                }
            }
            smallest = candidate;
        }
        throw tooLarge(smallest);
    }

    private boolean isWithin(FoldPlan plan) {
        long slab = plan.memory().items().getOrDefault(SLAB, 0L);
        return plan.memory().total() <= budget && slab / FLOAT < Integer.MAX_VALUE - 8;
    }

    private FoldPlan plan(List<Band> bands, List<Batch> batches) {
        int columns = job.targetColumns();
        int laneRows = Math.max(1, LANE_CELLS / columns);
        boolean whole = batches.stream().flatMap(batch -> batch.pieces().stream())
                .allMatch(piece -> piece.opens() && piece.closes());
        int bandRows = bands.stream().mapToInt(band -> band.rowEnd() - band.row()).max().orElse(0);
        int sourceRows = bands.stream().mapToInt(band -> band.sourceEnd() - band.sourceRow()).max().orElse(0);
        long sourceCells = (long) sourceRows * job.window().columns();
        int batchDays = batches.stream().mapToInt(Batch::count).max().orElse(0);
        long values = FLOAT * job.planes();
        long tileRowCells = (long) Math.max(laneRows, TargetTiles.mostRows(columns)) * columns;
        // State models, joined and counted nights see every night of every cell; rows of tiles must not take the memory that days need.
        boolean tiled = job.states().isNone() && job.reckoning().nights().isWorst() && job.reckoning().coldNight().isEmpty()
                && TargetTiles.mayGain(job.adjustment())
                && threads * tileRowCells * 2 * values <= budget / 4;
        long laneCells = tiled ? tileRowCells : (long) laneRows * columns;
        long kept = whole ? (long) threads * laneRows * columns : (long) bandRows * columns;
        MemoryEstimate memory = new MemoryEstimate()
                .add(TARGET, positionBytes())
                .add(SLAB, batchDays * sourceCells * FLOAT)
                .add("missing days of source cells", 5 * sourceCells)
                .add("running values of the winter", kept * WinterLane.bytesPerCell(job.cultivars(), job.levels(), job.reckoning()))
                .add("room of the workers", threads * (laneCells * 2 * values + (long) laneRows * columns * WinterLane.STRETCH * FLOAT));
        if (job.states().hasSecond()) {
            memory.add("days of maxima or means in memory", batchDays * sourceCells * FLOAT);
        }
        if (NightSlabs.slabs(job) > 0) {
            memory.add("lapse rates and stability of the nights", NightSlabs.slabs(job) * batchDays * sourceCells * FLOAT + NightMeans.bytes(job)
                    + threads * sourceCells * LapseField.BYTES_PER_CELL);
        }
        if (!job.states().isNone()) {
            memory.add("states of the cultivars", kept * StateLane.bytesPerCell(job.states().cultivars(), job.reckoning()));
        }
        if (tiled) {
            memory.add("bounds of the nights", threads * TiledFold.bytesOfBounds(longestSeason(), columns));
        }
        return new FoldPlan(bands, batches, laneRows, threads, whole, tiled, memory);
    }

    private long positionBytes() {
        long cells = (long) job.targetRows() * job.targetColumns();
        long heights = job.adjustment().hasHeights() ? 2 * FLOAT * cells : 0;
        heights += job.adjustment().isPassThrough() ? 0 : FLOAT * cells;
        heights += job.adjustment().terms().bytes();
        return heights + (job.adjustment().positions().isSeparable() ? 0 : 6 * FLOAT * cells);
    }

    /** Splits the target's rows; a target that is the source itself is split between the chunks of the file. */
    private List<Band> bands(int count, StorageLayout layout) {
        int rows = job.targetRows();
        int unit = job.adjustment().isPassThrough() && layout.rows() < rows ? layout.rows() : 1;
        int shift = unit == 1 ? 0 : Math.floorMod(layout.rowOffset() - job.window().row(), unit);
        int bandRows = Math.max(unit, (rows / count + (rows % count == 0 ? 0 : 1) + unit - 1) / unit * unit);
        SourcePositions positions = job.adjustment().positions();
        List<Band> bands = new ArrayList<>();
        int row = 0;
        while (row < rows) {
            int end = Math.min(rows, row + bandRows - (row == 0 && shift > 0 && count > 1 ? bandRows - shift : 0));
            int[] source = withHalo(positions.sourceRows(row, end));
            bands.add(new Band(row, end, source[0], source[1]));
            row = end;
        }
        return bands;
    }

    /** Source rows with those around them that their lapse rates are fitted to. */
    private int[] withHalo(int[] rows) {
        int halo = job.adjustment().localLapse().map(LocalLapse::haloRows).orElse(0);
        boolean none = rows[0] == rows[1];
        return none ? rows : new int[] {Math.max(0, rows[0] - halo), Math.min(job.window().rows(), rows[1] + halo)};
    }

    private int longestSeason() {
        return IntStream.range(0, job.seasons().size()).map(s -> job.seasons().get(s).days() - job.states().firstDay(s)).max().orElse(1);
    }

    /**
     * Batches of at most so many days. With {@code winters}, a batch is one winter unless chunks of days straddle winters.
     */
    private List<Batch> batches(int mostDays, boolean winters) {
        List<Batch> batches = new ArrayList<>();
        boolean chunked = job.source().layout().days() > 1;
        List<Piece> pieces = new ArrayList<>();
        int batchStart = -1;
        int batchEnd = -1;
        for (Piece whole : wholePieces()) {
            int position = whole.first();
            int end = whole.first() + whole.count();
            while (position < end) {
                int chunkStart = chunked ? job.source().chunkStart(position) : position;
                boolean sameChunk = chunked && batchStart >= 0 && chunkStart < batchEnd;
                boolean full = !chunked || winters && position == whole.first()
                        || chunkEnd(position) - batchStart > mostDays;
                if (batchStart >= 0 && !sameChunk && full) {
                    batches.add(new Batch(batchStart, batchEnd - batchStart, List.copyOf(pieces)));
                    pieces.clear();
                    batchStart = -1;
                }
                if (batchStart < 0) {
                    batchStart = position;
                }
                int stop = Math.min(end, chunked ? chunkEnd(position) : Math.max(position + 1, batchStart + mostDays));
                addPiece(pieces, whole, position, stop, end);
                batchEnd = stop;
                position = stop;
            }
        }
        if (batchStart >= 0) {
            batches.add(new Batch(batchStart, batchEnd - batchStart, List.copyOf(pieces)));
        }
        return batches;
    }

    /** Position after the last day that is stored in the same chunk. */
    private int chunkEnd(int position) {
        int start = job.source().chunkStart(position);
        int end = position + 1;
        while (end < job.source().days().size() && job.source().chunkStart(end) == start) {
            end++;
        }
        return end;
    }

    private static void addPiece(List<Piece> pieces, Piece whole, int from, int to, int end) {
        Piece last = pieces.isEmpty() ? null : pieces.get(pieces.size() - 1);
        if (last != null && last.season() == whole.season()) {
            pieces.set(pieces.size() - 1, new Piece(whole.season(), last.first(), to - last.first(), last.opens(), to == end));
        } else {
            pieces.add(new Piece(whole.season(), from, to - from, from == whole.first(), to == end));
        }
    }

    /** Every winter as one piece, in the order of time, with the days before its window that a state model asks for. */
    private List<Piece> wholePieces() {
        DayAxis axis = job.source().days();
        List<Piece> pieces = new ArrayList<>();
        for (int s = 0; s < job.seasons().size(); s++) {
            Season season = job.seasons().get(s);
            int first = axis.firstIndexFrom(season.firstDay() + job.states().firstDay(s));
            int end = axis.firstIndexFrom(season.firstDay() + season.days());
            pieces.add(new Piece(s, first, end - first, true, true));
        }
        return pieces;
    }

    private RuntimeException tooLarge(FoldPlan plan) {
        MemoryEstimate memory = plan.memory();
        String largest = memory.items().entrySet().stream().max(java.util.Map.Entry.comparingByValue()).orElseThrow().getKey();
        return Problem.limit("the run needs " + MemoryEstimate.text(memory.total()) + " of memory even when it is cut into "
                        + plan.bands().size() + " bands, and may use " + MemoryEstimate.text(budget)
                        + "; the largest part is " + largest,
                "limits.memory", "Start Java with a larger -Xmx, raise limits.memory, choose a smaller area or fewer cultivars")
                .asException();
    }
}
