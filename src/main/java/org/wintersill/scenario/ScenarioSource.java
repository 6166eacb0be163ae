package org.wintersill.scenario;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.wintersill.engine.MemoryEstimate;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.grid.Block;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.SourceFile;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.time.DayAxis;

/**
 * Daily minima of a scenario on the observed grid, like any other record. A quantile of a cell needs all its days, so {@link #prepare}
 * works through the grid once and keeps the result on disk; a reader that is opened before works out the rows that it is asked for,
 * which suits a single cell.
 */
public final class ScenarioSource implements DailyTemperatureSource {
    private final ScenarioSeries series;
    private final DayAxis days;
    private ScenarioStore store;

    /**
     * @param observed on its own grid, which is the grid of the result
     * @param historical of the model
     * @param future of the same model
     */
    public ScenarioSource(ScenarioMethod method, YearPools pools, Series observed, Series historical, Series future) {
        series = new ScenarioSeries(method, pools, observed, historical, future);
        days = series.days();
    }

    @Override
    public GridGeometry grid() {
        return series.observed().source().grid();
    }

    @Override
    public DayAxis days() {
        return days;
    }

    @Override
    public ForcingVariable variable() {
        return ForcingVariable.MINIMUM;
    }

    @Override
    public StorageLayout layout() {
        return new StorageLayout(1, 1, grid().columns(), 0);
    }

    /** The files of all three series: observed, historical, future. */
    @Override
    public List<SourceFile> files() {
        List<SourceFile> files = new ArrayList<>(series.observed().source().files());
        files.addAll(series.historical().source().files());
        files.addAll(series.future().source().files());
        return files;
    }

    /** Bytes on disk that {@link #prepare} takes. */
    public long diskBytes(Block window) {
        return 4L * days.size() * window.rows() * grid().columns();
    }

    /**
     * Works out the rows of a window and keeps them in a file until {@link #release}.
     *
     * @param window part of the observed grid that will be read
     * @param budget bytes that may be held at once
     * @throws org.wintersill.problem.ProblemException when a row does not fit or the file cannot be written
     */
    public void prepare(Path file, Block window, long budget, Workers workers, Progress progress) {
        long rowBytes = 4 * series.valuesPerCell() * grid().columns();
        int rows = (int) Math.min(window.rows(), budget / rowBytes);
        if (rows < 1) {
            throw Problem.limit("a row of the scenario takes " + MemoryEstimate.text(rowBytes) + " of memory, and the run may use "
                    + MemoryEstimate.text(budget), "limits.memory", "Start Java with a larger -Xmx, raise limits.memory, or shorten the "
                    + "series with scenario.reference and scenario.period").asException();
        }
        store = new ScenarioStore(file, window.row(), window.rows(), grid().columns(), days.size());
        progress.begin("Scenario", window.rows());
        for (int row = window.row(); row < window.rowEnd(); row += rows) {
            Block block = new Block(0, row, grid().columns(), Math.min(rows, window.rowEnd() - row));
            store.write(block, series.rows(block, workers));
            progress.advance(block.rows());
        }
        progress.end();
    }

    /** Removes what {@link #prepare} kept; does nothing if there is nothing. */
    public void release() {
        if (store != null) {
            store.close();
            store = null;
        }
    }

    @Override
    public DailyTemperatureReader open() {
        return store != null ? store.reader() : new RowReader();
    }

    /**
     * The values before the change in one row: the model's future on the observed grid, or the observations for a method that changes
     * these.
     *
     * @return {@code [day][column]}
     */
    public float[][] before(int row) {
        return SeriesRows.read(series.base(), new Block(0, row, grid().columns(), 1), null);
    }

    /** Works out rows when they are asked for and remembers the last ones. */
    private final class RowReader implements DailyTemperatureReader {
        private Block block;
        private float[][] values;

        @Override
        public void read(int firstDay, int dayCount, Block wanted, float[] out, int offset, int dayStride) {
            Block rows = new Block(0, wanted.row(), grid().columns(), wanted.rows());
            if (!rows.equals(block)) {
                values = series.rows(rows, null);
                block = rows;
            }
            for (int day = 0; day < dayCount; day++) {
                for (int row = 0; row < wanted.rows(); row++) {
                    System.arraycopy(values[firstDay + day], row * grid().columns() + wanted.column(), out,
                            offset + day * dayStride + row * wanted.columns(), wanted.columns());
                }
            }
        }

        @Override
        public long valuesSetAside() {
            return 0;
        }

        @Override
        public void close() {
            values = null;
            block = null;
        }
    }
}
