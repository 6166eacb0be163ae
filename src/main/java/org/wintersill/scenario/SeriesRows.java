package org.wintersill.scenario;

import java.util.Arrays;
import org.wintersill.engine.Workers;
import org.wintersill.grid.Block;
import org.wintersill.temperature.DailyTemperatureReader;

/** All days of a series in some rows of the observed grid. */
final class SeriesRows {
    /** Values that one reading may hold beside the result. */
    private static final int MOST_VALUES = 1 << 22;

    private SeriesRows() {
    }

    /**
     * Reads them, each stored chunk of days by one worker.
     *
     * @param block rows and columns of the observed grid
     * @param workers null to read in this thread
     * @return {@code [day][row * columns + column]}, degC, NaN for missing
     */
    static float[][] read(Series series, Block block, Workers workers) {
        float[][] days = new float[series.count()][block.cells()];
        int threads = workers == null ? 1 : workers.threads();
        DailyTemperatureReader[] readers = new DailyTemperatureReader[threads];
        int[] starts = starts(series, block);
        try {
            Workers.Task task = (worker, number) -> {
                if (readers[worker] == null) {
                    readers[worker] = series.source().open();
                }
                int from = starts[number];
                int to = number + 1 < starts.length ? starts[number + 1] : series.first() + series.count();
                read(series, readers[worker], block, from, to, days);
            };
            if (workers == null) {
                for (int number = 0; number < starts.length; number++) {
                    task.run(0, number);
                }
            } else {
                workers.forEach(starts.length, task);
            }
        } finally {
            for (DailyTemperatureReader reader : readers) {
                if (reader != null) {
                    reader.close();
                }
            }
        }
        return days;
    }

    /** Positions at which a reading begins: whole chunks, cut where they would hold too much. */
    private static int[] starts(Series series, Block block) {
        int end = series.first() + series.count();
        int[] starts = new int[series.count()];
        int count = 0;
        int most = Math.max(1, MOST_VALUES / block.cells());
        for (int position = series.first(); position < end; position++) {
            boolean chunk = series.source().chunkStart(position) == position;
            if (count == 0 || chunk || position - starts[count - 1] >= most) {
                starts[count++] = position;
            }
        }
        return Arrays.copyOf(starts, count);
    }

    private static void read(Series series, DailyTemperatureReader reader, Block block, int from, int to, float[][] days) {
        if (series.regridding().isEmpty()) {
            float[] slab = new float[(to - from) * block.cells()];
            reader.read(from, to - from, block, slab, 0, block.cells());
            for (int day = from; day < to; day++) {
                System.arraycopy(slab, (day - from) * block.cells(), days[day - series.first()], 0, block.cells());
            }
            return;
        }
        Regridding regridding = series.regridding().get();
        Block needed = regridding.needed(block.row(), block.rowEnd()).orElse(null);
        if (needed == null) {
            for (int day = from; day < to; day++) {
                Arrays.fill(days[day - series.first()], Float.NaN);
            }
            return;
        }
        float[] slab = new float[(to - from) * needed.cells()];
        reader.read(from, to - from, needed, slab, 0, needed.cells());
        Regridding.Rows rows = regridding.rows();
        for (int day = from; day < to; day++) {
            rows.bring(slab, (day - from) * needed.cells(), needed, block.row(), block.rowEnd(), days[day - series.first()]);
        }
    }
}
