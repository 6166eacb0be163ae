package org.wintersill.scenario;

import org.wintersill.engine.Workers;
import org.wintersill.grid.Block;
import org.wintersill.time.DayAxis;

/**
 * The three series and what is done with them. Immutable, thread-safe.
 *
 * @param method how the change is laid on the observations
 * @param pools which days are pooled
 */
record ScenarioSeries(ScenarioMethod method, YearPools pools, Series observed, Series historical, Series future) {
    /** Cells whose values are gathered together, so that a line of the processor's cache serves all of them. */
    private static final int TILE = 32;

    /** The days of the result. */
    DayAxis days() {
        return base().days();
    }

    /** The series whose days are changed. */
    Series base() {
        return method.hasFutureDays() ? future : observed;
    }

    /** Values that a cell takes in memory while it is worked on. */
    long valuesPerCell() {
        return (long) observed.count() + historical.count() + future.count() + base().count();
    }

    /**
     * The result in some rows of the observed grid, whole rows.
     *
     * @param workers null to work in this thread
     * @return {@code [day][row * columns + column]}, degC; NaN where the day is missing or a sample is too small
     */
    float[][] rows(Block block, Workers workers) {
        float[][] o = SeriesRows.read(observed, block, workers);
        float[][] h = SeriesRows.read(historical, block, workers);
        float[][] f = SeriesRows.read(future, block, workers);
        float[][] base = method.hasFutureDays() ? f : o;
        float[][] out = new float[base.length][block.cells()];
        int[][] inObserved = pools.values(observed.axis(), observed.first(), observed.count());
        int[][] inHistorical = pools.values(historical.axis(), historical.first(), historical.count());
        int[][] inFuture = pools.values(future.axis(), future.first(), future.count());
        int[][] results = pools.results(base().axis(), base().first(), base().count());
        int tiles = (block.cells() + TILE - 1) / TILE;
        Workers.Task task = (worker, tile) -> {
            int from = tile * TILE;
            Room room = new Room(TILE, o.length, h.length, f.length);
            for (int pool = 0; pool < pools.count(); pool++) {
                if (results[pool].length > 0) {
                    int to = Math.min(block.cells(), from + TILE);
                    fill(room.observed, o, inObserved[pool], from, to);
                    fill(room.historical, h, inHistorical[pool], from, to);
                    fill(room.future, f, inFuture[pool], from, to);
                    change(room, base, results[pool], from, to, out);
                }
            }
        };
        if (workers == null) {
            for (int tile = 0; tile < tiles; tile++) {
                task.run(0, tile);
            }
        } else {
            workers.forEach(tiles, task);
        }
        return out;
    }

    /** Samples of a tile's cells. */
    private static final class Room {
        private final Sample[] observed;
        private final Sample[] historical;
        private final Sample[] future;

        Room(int cells, int o, int h, int f) {
            observed = samples(cells, o);
            historical = samples(cells, h);
            future = samples(cells, f);
        }

        private static Sample[] samples(int cells, int most) {
            Sample[] samples = new Sample[cells];
            for (int i = 0; i < cells; i++) {
                samples[i] = new Sample(most);
            }
            return samples;
        }
    }

    private static void fill(Sample[] samples, float[][] days, int[] members, int from, int to) {
        for (int cell = from; cell < to; cell++) {
            samples[cell - from].clear();
        }
        for (int day : members) {
            float[] values = days[day];
            for (int cell = from; cell < to; cell++) {
                samples[cell - from].add(values[cell]);
            }
        }
        for (int cell = from; cell < to; cell++) {
            samples[cell - from].sort();
        }
    }

    private void change(Room room, float[][] base, int[] results, int from, int to, float[][] out) {
        for (int cell = from; cell < to; cell++) {
            Sample observed = room.observed[cell - from];
            Sample historical = room.historical[cell - from];
            Sample future = room.future[cell - from];
            boolean suffices = ModelChange.suffices(observed, historical, future);
            for (int day : results) {
                float x = base[day][cell];
                out[day][cell] = !suffices || x != x ? Float.NaN : (float) switch (method) {
                    case QUANTILE_DELTA -> ModelChange.quantileDelta(x, observed, historical, future);
                    case QUANTILE_MAPPING -> ModelChange.quantileMapping(x, observed, historical);
                    case MONTHLY_DELTA -> ModelChange.delta(x, historical, future);
                };
            }
        }
    }
}
