package org.wintersill.engine;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.engine.FoldPlan.Band;
import org.wintersill.engine.FoldPlan.Batch;
import org.wintersill.grid.Block;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.StorageLayout;

/**
 * Decodes the days of a batch for the source rows of a band, all workers at once, each stored chunk by one worker only. Every
 * worker has a reader of its own, opened at its first task and closed with this object.
 */
final class SlabReader implements AutoCloseable {
    private final DailyTemperatureSource source;
    private final Block window;
    private final Band band;
    private final Workers workers;
    private final DailyTemperatureReader[] readers;
    private final List<int[]> rowGroups = new ArrayList<>();

    /**
     * @param source record to decode
     * @param window part of its grid that the target needs
     */
    SlabReader(DailyTemperatureSource source, Block window, Band band, Workers workers) {
        this.source = source;
        this.window = window;
        this.band = band;
        this.workers = workers;
        readers = new DailyTemperatureReader[workers.threads()];
        StorageLayout layout = source.layout();
        int row = band.sourceRow();
        while (row < band.sourceEnd()) {
            int into = Math.floorMod(window.row() + row - layout.rowOffset(), layout.rows());
            int end = Math.min(band.sourceEnd(), row + layout.rows() - into);
            rowGroups.add(new int[] {row, end});
            row = end;
        }
    }

    /** Cells of a day in the slab. */
    int dayCells() {
        return (band.sourceEnd() - band.sourceRow()) * window.columns();
    }

    /** Fills {@code slab[day of the batch * dayCells + cell]}, degrees Celsius, NaN for missing. */
    void read(Batch batch, float[] slab) {
        if (dayCells() == 0) {
            return;
        }
        List<int[]> dayGroups = dayGroups(batch);
        int columns = window.columns();
        workers.forEach(dayGroups.size() * rowGroups.size(), (worker, task) -> {
            int[] days = dayGroups.get(task / rowGroups.size());
            int[] rows = rowGroups.get(task % rowGroups.size());
            Block block = new Block(window.column(), window.row() + rows[0], columns, rows[1] - rows[0]);
            int offset = (days[0] - batch.first()) * dayCells() + (rows[0] - band.sourceRow()) * columns;
            reader(worker).read(days[0], days[1] - days[0], block, slab, offset, dayCells());
        });
    }

    /** Runs of days that are stored in the same chunk: first position and the one after the last. */
    private List<int[]> dayGroups(Batch batch) {
        List<int[]> groups = new ArrayList<>();
        int position = batch.first();
        int stop = batch.first() + batch.count();
        while (position < stop) {
            int start = source.chunkStart(position);
            int end = position + 1;
            while (end < stop && source.chunkStart(end) == start) {
                end++;
            }
            groups.add(new int[] {position, end});
            position = end;
        }
        return groups;
    }

    private DailyTemperatureReader reader(int worker) {
        if (readers[worker] == null) {
            readers[worker] = source.open();
        }
        return readers[worker];
    }

    long valuesSetAside() {
        long total = 0;
        for (DailyTemperatureReader reader : readers) {
            total += reader == null ? 0 : reader.valuesSetAside();
        }
        return total;
    }

    @Override
    public void close() {
        for (DailyTemperatureReader reader : readers) {
            if (reader != null) {
                reader.close();
            }
        }
    }
}
