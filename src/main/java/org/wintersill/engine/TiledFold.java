package org.wintersill.engine;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.IntPredicate;
import org.wintersill.elevation.LaneAdjuster;
import org.wintersill.elevation.TargetTile;
import org.wintersill.elevation.TargetTiles;
import org.wintersill.season.NightCurve;
import org.wintersill.season.NightCurve.Measure;
import org.wintersill.season.WinterLane;
import org.wintersill.season.WinterValues;
import org.wintersill.time.Season;

/**
 * The fold of target rows that are much finer than the source, tile by tile and only over nights that can lower something
 * ({@link NightSelection}). Same arithmetic, same values as folding over all nights.
 */
final class TiledFold {
    private final FoldJob job;
    private final TargetTiles tiles;
    private final boolean wholeWinters;
    private final Room[] rooms;
    /** Running values of tiles between batches, {@code [row of tiles][tile]}; only where winters are split. */
    private final WinterLane[][] kept;
    /** {@code [season][curve]}, the last of them for the lowest minimum. */
    private final List<List<List<Measure>>> measures = new ArrayList<>();

    /** What a worker needs for itself. */
    private static final class Room {
        private final TileBounds bounds;
        private final NightSelection selection;
        private final LaneAdjuster adjuster;
        private final Map<Integer, WinterLane> lanes = new HashMap<>();
        private final int[] positions;
        private final float[] lapse;
        private final float[][] nights = new float[WinterLane.STRETCH][0];
        private final int[] chosen = new int[WinterLane.STRETCH];
        private final float[][] some = new float[WinterLane.STRETCH][];
        private final int[] somePositions = new int[WinterLane.STRETCH];
        private long cellNights;

        Room(FoldJob job) {
            int mostNights = job.seasons().stream().mapToInt(Season::days).max().orElse(0);
            bounds = new TileBounds(mostNights);
            selection = new NightSelection(job.cultivars() + 1, mostNights);
            adjuster = new LaneAdjuster(job.adjustment());
            positions = new int[mostNights];
            lapse = new float[mostNights];
        }
    }

    TiledFold(FoldJob job, TargetTiles tiles, int threads, boolean wholeWinters) {
        this.job = job;
        this.tiles = tiles;
        this.wholeWinters = wholeWinters;
        rooms = new Room[threads];
        kept = new WinterLane[wholeWinters ? 0 : tiles.rows().size()][];
        for (NightCurve[] curves : job.curves()) {
            List<List<Measure>> ofSeason = new ArrayList<>();
            for (NightCurve curve : curves) {
                ofSeason.add(curve.measures());
            }
            int nights = curves.length == 0 ? 0 : curves[0].lethal()[0].length;
            ofSeason.add(List.of(new Measure(new float[nights], null)));
            measures.add(ofSeason);
        }
    }

    /** Bytes that a worker keeps to look at the nights of a row of tiles: lowest, highest and number of nodes by night and tile. */
    static long bytesOfBounds(int nights, int targetColumns) {
        return 9L * nights * (targetColumns / TargetTiles.SHORTEST_SIDE + 1);
    }

    /** Nights that were brought to cells so far, all cells together: the work that was left. */
    long cellNights() {
        return Arrays.stream(rooms).filter(room -> room != null).mapToLong(room -> room.cellNights).sum();
    }

    /** Number of rows of tiles. */
    int rows() {
        return tiles.rows().size();
    }

    int firstRow(int row) {
        return tiles.rows().get(row).get(0).firstRow();
    }

    int targetRows(int row) {
        return tiles.rows().get(row).get(0).rows();
    }

    /**
     * Days of one winter.
     *
     * @param season number of the winter
     * @param nights positions of the days in the winter's window, ascending
     * @param slab source values
     * @param offsets where each night's source cell 0 of the window would lie in the slab
     * @param opens whether the winter begins with them
     * @param closes whether it ends with them
     */
    record Nights(int season, int[] nights, float[] slab, int[] offsets, boolean opens, boolean closes) {
    }

    /**
     * Takes days for one row of tiles.
     *
     * @param counts whether the winter counts at a cell, numbered from the first of the row of tiles, target row by target row
     * @return the winter's values where it closes, otherwise null
     */
    WinterValues accept(int worker, int row, Nights days, IntPredicate counts) {
        if (rooms[worker] == null) {
            rooms[worker] = new Room(job);
        }
        Room room = rooms[worker];
        List<TargetTile> tileRow = tiles.rows().get(row);
        look(room, tileRow, days);
        int columns = job.targetColumns();
        WinterValues whole = null;
        for (int t = 0; t < tileRow.size(); t++) {
            TargetTile tile = tileRow.get(t);
            WinterLane lane = lane(room, row, t);
            if (days.opens()) {
                lane.begin();
            }
            if (!tile.empty()) {
                foldTile(room, lane, t, days);
            }
            if (days.closes()) {
                int first = tile.firstColumn();
                WinterValues block = lane.finish(cell -> counts.test(cell / tile.columns() * columns + first + cell % tile.columns()));
                whole = whole == null ? block.room(tile.rows() * columns) : whole;
                whole.put(block, tile.rows(), tile.columns(), first, columns);
            }
        }
        return whole;
    }

    /** Looks at all nights through the source alone, and marks those that may lower something. */
    private void look(Room room, List<TargetTile> tileRow, Nights days) {
        Season winter = job.seasons().get(days.season());
        room.bounds.begin(tileRow);
        for (int n = 0; n < days.nights().length; n++) {
            room.positions[n] = days.nights()[n];
            room.lapse[n] = (float) job.adjustment().lapseRates().ofMonth(winter.date(days.nights()[n]).month());
            room.bounds.add(days.slab(), days.offsets()[n], job.window().columns());
        }
        room.bounds.complete();
        room.selection.begin(tileRow.size(), measures.get(days.season()));
        int from = 0;
        while (from < days.nights().length) {
            int to = endOfPhase(days, from);
            select(room, tileRow, days, from, to);
            from = to;
        }
    }

    /** Where values are kept at the ends of phases, a night must not be left out for one of a later phase. */
    private int endOfPhase(Nights days, int from) {
        NightCurve[] curves = job.curves().get(days.season());
        int to = days.nights().length;
        if (!job.reckoning().phases() || curves.length == 0) {
            return to;
        }
        for (int n = from + 1; n < to; n++) {
            if (curves[0].phases().of(days.nights()[n]) != curves[0].phases().of(days.nights()[from])) {
                return n;
            }
        }
        return to;
    }

    private void select(Room room, List<TargetTile> tileRow, Nights days, int from, int to) {
        List<List<Measure>> ofSeason = measures.get(days.season());
        room.selection.mark(room.bounds, ofSeason, room.positions, room.lapse, from, to);
        for (int t = 0; t < tileRow.size(); t++) {
            if (!tileRow.get(t).empty()) {
                room.selection.refine(t, room.bounds, ofSeason, room.positions, room.lapse, from, to, days.slab(), days.offsets(),
                        job.window().columns());
            }
        }
    }

    private WinterLane lane(Room room, int row, int t) {
        List<TargetTile> tileRow = tiles.rows().get(row);
        int cells = tileRow.get(t).cells();
        if (wholeWinters) {
            return room.lanes.computeIfAbsent(cells, size -> new WinterLane(job.cultivars(), job.levels(), job.reckoning(), size));
        }
        if (kept[row] == null) {
            kept[row] = new WinterLane[tileRow.size()];
        }
        if (kept[row][t] == null) {
            kept[row][t] = new WinterLane(job.cultivars(), job.levels(), job.reckoning(), cells);
        }
        return kept[row][t];
    }

    private void foldTile(Room room, WinterLane lane, int t, Nights days) {
        int count = 0;
        for (int n = room.selection.next(t, 0); n >= 0; n = room.selection.next(t, n + 1)) {
            room.chosen[count++] = n;
            if (count == WinterLane.STRETCH) {
                foldStretch(room, lane, t, days, count);
                count = 0;
            }
        }
        if (count > 0) {
            foldStretch(room, lane, t, days, count);
        }
    }

    private void foldStretch(Room room, WinterLane lane, int t, Nights days, int count) {
        TargetTile tile = room.bounds.tile(t);
        Season winter = job.seasons().get(days.season());
        for (int k = 0; k < count; k++) {
            if (room.nights[k].length < tile.cells()) {
                room.nights[k] = new float[tile.cells()];
            }
            int n = room.chosen[k];
            double lapse = job.adjustment().lapseRates().ofMonth(winter.date(days.nights()[n]).month());
            room.adjuster.adjustTile(days.slab(), days.offsets()[n], lapse, tile, room.nights[k]);
        }
        room.cellNights += (long) count * tile.cells();
        NightCurve[] curves = job.curves().get(days.season());
        for (int c = 0; c <= curves.length; c++) {
            int some = 0;
            for (int k = 0; k < count; k++) {
                if (room.selection.keeps(c, t, room.chosen[k])) {
                    room.some[some] = room.nights[k];
                    room.somePositions[some++] = room.positions[room.chosen[k]];
                }
            }
            if (some > 0 && c < curves.length) {
                lane.accept(c, curves[c], room.some, some, room.somePositions);
            } else if (some > 0) {
                lane.acceptMinimum(room.some, some);
            }
        }
    }
}
