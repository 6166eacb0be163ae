package org.wintersill.engine;

import java.util.List;

/**
 * How a {@link FoldJob} is cut up.
 *
 * @param bands runs of target rows, from the north
 * @param batches runs of days, in order
 * @param laneRows target rows a lane
 * @param threads number of workers
 * @param wholeWinters whether every winter lies in one batch, so that lanes need not be kept between batches
 * @param tiled whether target rows are folded tile by tile over the nights that matter, where they are fine enough; the same values
 *     as over all nights
 * @param memory what it will take
 */
public record FoldPlan(List<Band> bands, List<Batch> batches, int laneRows, int threads, boolean wholeWinters,
                       boolean tiled, MemoryEstimate memory) {

    /** The same plan, folded over every night: the reference that tiles are held to. */
    FoldPlan plain() {
        return new FoldPlan(bands, batches, laneRows, threads, wholeWinters, false, memory);
    }

    /**
     * Target rows worked on from the first day to the last, and the rows of the source window that they need.
     *
     * @param sourceEnd row after the last; equal to {@code sourceRow} where the target lies beyond the source
     */
    public record Band(int row, int rowEnd, int sourceRow, int sourceEnd) {
    }

    /**
     * Days decoded at once.
     *
     * @param first position on the day axis
     * @param count number of positions
     * @param pieces the winters in it; summer days belong to none
     */
    public record Batch(int first, int count, List<Piece> pieces) {
    }

    /**
     * The part of a batch that belongs to one winter.
     *
     * @param season number of the winter
     * @param first position on the day axis
     * @param count number of positions
     * @param opens whether the winter begins with it
     * @param closes whether the winter ends with it
     */
    public record Piece(int season, int first, int count, boolean opens, boolean closes) {
    }

    /** Largest batch, days. */
    public int batchDays() {
        return batches.stream().mapToInt(Batch::count).max().orElse(0);
    }
}
