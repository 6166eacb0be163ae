package org.wintersill.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.FalseDiscovery;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.climatology.statistic.DamageProbability;
import org.wintersill.climatology.statistic.MarginLow;
import org.wintersill.climatology.statistic.MarginMean;
import org.wintersill.climatology.statistic.Suitability;
import org.wintersill.climatology.statistic.TrendSignificance;
import org.wintersill.engine.Progress;
import org.wintersill.engine.WinterStore;
import org.wintersill.engine.Workers;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;
import org.wintersill.season.WinterValues;

/**
 * From the stored winters to summary layers, strip after strip of tile rows: workers fill the rows of a strip, after which every
 * layer's writer takes them. Keeps the class of every cell for tables and polygons.
 */
final class SummaryPass {
    /** Rows that a worker fills at a time, so that all winters of them fit its memory. */
    private static final int TASK_ROWS = 8;

    private final RunPlan plan;
    private final WinterStore store;
    private final LayerOutput output;
    private final LayerSelection selection;
    private final Workers workers;
    private final Progress progress;
    private final int rows;
    private final int columns;
    private final int levels;
    /** By cultivar. */
    private final List<List<ClimatologyStatistic>> ofCultivar;
    private final List<ClimatologyStatistic> ofAll;
    /** {@code [cultivar][cell]}: 1 to 4, 0 for missing. */
    private final byte[][] classes;

    SummaryPass(RunPlan plan, WinterStore store, LayerOutput output, LayerSelection selection, Workers workers, Progress progress) {
        this.plan = plan;
        this.store = store;
        this.output = output;
        this.selection = selection;
        this.workers = workers;
        this.progress = progress;
        rows = plan.target().rows();
        columns = plan.target().columns();
        levels = plan.job().levels();
        ofCultivar = plan.cultivars().stream().map(cultivar -> {
            List<ClimatologyStatistic> statistics = new ArrayList<>(ClimatologyStatistics.ofCultivar(plan.choices()));
            statistics.addAll(Populations.statistics(plan.choices(), cultivar));
            return selection.made(statistics);
        }).toList();
        ofAll = selection.made(ClimatologyStatistics.shared(plan.choices()));
        classes = new byte[plan.cultivars().size()][rows * columns];
    }

    /** Extra planes that the pass keeps in the store: frequency of killing winters and low margin of each cultivar. */
    static int extraPlanes(int cultivars) {
        return 2 * cultivars;
    }

    byte[][] classes() {
        return classes;
    }

    /** One file and the values of the strip in work. */
    private record OpenLayer(ClimatologyStatistic statistic, Optional<RasterWriter> writer, float[] strip) {
    }

    /** Writes the summary layers of a cultivar. */
    void cultivar(int cultivar) {
        write(ofCultivar.get(cultivar), Optional.of(cultivar));
    }

    /** Writes the summary layers that belong to no cultivar. */
    void shared() {
        write(ofAll, Optional.empty());
    }

    private void write(List<ClimatologyStatistic> statistics, Optional<Integer> cultivar) {
        List<OpenLayer> layers = new ArrayList<>();
        try {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (ClimatologyStatistic statistic : statistics) {
                LayerDefinition layer = statistic.layer();
                Optional<RasterWriter> writer = selection.contains(statistic) && !(statistic instanceof TrendSignificance)
                        ? Optional.of(output.summary(layer, cultivar.map(plan.cultivars()::get))) : Optional.empty();
                layers.add(new OpenLayer(statistic, writer, new float[stripRows * columns]));
            }
            for (int row = 0; row < rows; row += stripRows) {
                int count = Math.min(stripRows, rows - row);
                fill(layers, cultivar, row, count);
                for (OpenLayer layer : layers) {
                    float[] values = count == stripRows ? layer.strip() : Arrays.copyOf(layer.strip(), count * columns);
                    int firstRow = row;
                    layer.writer().ifPresent(writer -> writer.write(0, firstRow, count, values));
                }
                workers.checkCancelled();
            }
            workers.forEach(layers.size(), (worker, layer) -> layers.get(layer).writer().ifPresent(RasterWriter::finish));
        } finally {
            layers.forEach(layer -> layer.writer().ifPresent(RasterWriter::close));
        }
        statistics.stream().filter(selection::contains).filter(TrendSignificance.class::isInstance)
                .forEach(statistic -> significance((TrendSignificance) statistic, cultivar));
    }

    /** Extra plane of a cultivar's mean margins, after those of the trends. */
    int meanPlane(int cultivar) {
        int cultivars = plan.cultivars().size();
        return extraPlanes(cultivars) + cultivars + 1 + cultivar;
    }

    private int trendPlane(Optional<Integer> cultivar) {
        return extraPlanes(plan.cultivars().size()) + cultivar.orElse(plan.cultivars().size());
    }

    /** Writes where trends are significant, now that the p-values of the whole map are known. */
    private void significance(TrendSignificance statistic, Optional<Integer> cultivar) {
        int plane = trendPlane(cultivar);
        double threshold = FalseDiscovery.threshold(bound -> count(plane, bound), count(plane, 1), statistic.falseDiscovery());
        try (RasterWriter writer = output.summary(statistic.layer(), cultivar.map(plan.cultivars()::get))) {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int row = 0; row < rows; row += stripRows) {
                int count = Math.min(stripRows, rows - row);
                float[] values = store.readExtra(plane, row, count);
                for (int i = 0; i < values.length; i++) {
                    values[i] = TrendSignificance.classOf(values[i], threshold);
                }
                writer.write(0, row, count, values);
                workers.checkCancelled();
            }
            writer.finish();
        }
    }

    /** Number of cells whose value is not beyond a bound on either side of zero. */
    private long count(int plane, double bound) {
        long count = 0;
        for (int row = 0; row < rows; row += TASK_ROWS) {
            for (float value : store.readExtra(plane, row, Math.min(TASK_ROWS, rows - row))) {
                count += Math.abs(value) <= bound ? 1 : 0;
            }
        }
        return count;
    }

    private void fill(List<OpenLayer> layers, Optional<Integer> cultivar, int firstRow, int count) {
        workers.forEach((count + TASK_ROWS - 1) / TASK_ROWS, (worker, task) -> {
            int row = firstRow + task * TASK_ROWS;
            int taskRows = Math.min(TASK_ROWS, firstRow + count - row);
            WinterRecord record = record(cultivar, row, taskRows);
            float[] out = new float[taskRows * columns];
            for (OpenLayer layer : layers) {
                if (!isNeeded(layer.statistic())) {
                    continue;
                }
                layer.statistic().summarise(record, out, 0, out.length);
                System.arraycopy(out, 0, layer.strip(), (row - firstRow) * columns, out.length);
                cultivar.ifPresent(number -> keep(number, layer.statistic(), row, out));
                if (layer.statistic() instanceof TrendSignificance) {
                    store.writeExtra(trendPlane(cultivar), row, out);
                }
            }
            // Rows of replicates take minutes: told here, not when a strip is written.
            progress.advance((long) taskRows * layers.size());
        });
    }

    /** Fits of extremes cost more than all else, so what is neither written nor used later is not worked out. */
    private boolean isNeeded(ClimatologyStatistic statistic) {
        return selection.contains(statistic) || statistic instanceof Suitability || statistic instanceof MarginLow
                || statistic instanceof MarginMean
                || statistic instanceof DamageProbability probability && probability.isFrequencyOf(plan.choices().killingLevel());
    }

    /** Keeps what later steps need: classes in memory, frequency and low margin in the store. */
    private void keep(int cultivar, ClimatologyStatistic statistic, int row, float[] values) {
        if (statistic instanceof Suitability) {
            for (int i = 0; i < values.length; i++) {
                classes[cultivar][row * columns + i] = (byte) (values[i] == values[i] ? values[i] : 0);
            }
        } else if (statistic instanceof MarginMean && MilderSite.wanted(plan, selection, cultivar)) {
            store.writeExtra(meanPlane(cultivar), row, values);
        } else if (statistic instanceof MarginLow) {
            store.writeExtra(2 * cultivar + 1, row, values);
        } else if (statistic instanceof DamageProbability probability
                && probability.isFrequencyOf(plan.choices().killingLevel())) {
            store.writeExtra(2 * cultivar, row, values);
        }
    }

    private WinterRecord record(Optional<Integer> cultivar, int row, int count) {
        return StoredWinters.record(plan, store, cultivar, row, count, (long) row * columns);
    }

    /** Takes full-width rows of all summary layers of a cultivar. */
    interface RowTaker {
        /** @param values {@code [layer][row * columns + column]} */
        void take(int firstRow, int rowCount, float[][] values);
    }

    /** The summary layers of a cultivar, in the order of {@link #eachRow}. */
    List<LayerDefinition> cultivarLayers(int cultivar) {
        return ofCultivar.get(cultivar).stream().map(ClimatologyStatistic::layer).toList();
    }

    /** Gives the summaries of a cultivar once more, from the north, a few rows at a time. */
    void eachRow(int cultivar, RowTaker taker) {
        List<ClimatologyStatistic> statistics = ofCultivar.get(cultivar);
        for (int row = 0; row < rows; row += TASK_ROWS) {
            int count = Math.min(TASK_ROWS, rows - row);
            WinterRecord record = record(Optional.of(cultivar), row, count);
            float[][] values = new float[statistics.size()][count * columns];
            for (int layer = 0; layer < values.length; layer++) {
                statistics.get(layer).summarise(record, values[layer], 0, count * columns);
            }
            taker.take(row, count, values);
            workers.checkCancelled();
        }
    }

    /** Writes how many cultivars meet the target in each cell, and the best low margin. */
    void choice() {
        double target = plan.choices().target();
        LayerDefinition layer = SharedLayers.choice(plan.cultivars().size(), target);
        if (!selection.contains(layer.id())) {
            return;
        }
        List<RasterHeader.Band> bands = List.of(new RasterHeader.Band("Cultivars that meet the target", "1"),
                new RasterHeader.Band("Best margin, one winter in ten", "K"));
        try (RasterWriter writer = output.bands(layer, bands)) {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int row = 0; row < rows; row += stripRows) {
                int count = Math.min(stripRows, rows - row);
                float[] meeting = new float[count * columns];
                float[] best = new float[count * columns];
                choose(row, count, target, meeting, best);
                writer.write(0, row, count, meeting);
                writer.write(1, row, count, best);
                progress.advance(2L * count);
            }
            writer.finish();
        }
    }

    private void choose(int row, int count, double target, float[] meeting, float[] best) {
        Arrays.fill(meeting, Float.NaN);
        Arrays.fill(best, Float.NaN);
        for (int cultivar = 0; cultivar < plan.cultivars().size(); cultivar++) {
            float[] frequency = store.readExtra(2 * cultivar, row, count);
            float[] margin = store.readExtra(2 * cultivar + 1, row, count);
            for (int i = 0; i < best.length; i++) {
                if (margin[i] == margin[i]) {
                    float meets = frequency[i] <= (float) target ? 1 : 0;
                    meeting[i] = meeting[i] == meeting[i] ? meeting[i] + meets : meets;
                    best[i] = best[i] >= margin[i] ? best[i] : margin[i];
                }
            }
        }
    }

    /** Writes the ground heights, and what the elevation adjustment bridged. */
    void heights() {
        heights(SharedLayers.elevation(), (row, column) -> plan.adjustment().covers(row, column)
                ? plan.adjustment().targetHeight(row * columns + column) : Float.NaN);
        heights(SharedLayers.heightChange(), plan.adjustment()::heightChange);
    }

    /** A value of a cell in metres. */
    private interface Height {
        float at(int row, int column);
    }

    private void heights(LayerDefinition layer, Height height) {
        if (!plan.adjustment().hasHeights() || !selection.contains(layer.id())) {
            return;
        }
        try (RasterWriter writer = output.summary(layer, Optional.empty())) {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int row = 0; row < rows; row += stripRows) {
                int count = Math.min(stripRows, rows - row);
                float[] values = new float[count * columns];
                for (int i = 0; i < values.length; i++) {
                    values[i] = height.at(row + i / columns, i % columns);
                }
                writer.write(0, row, count, values);
                progress.advance(count);
            }
            writer.finish();
        }
    }

    /** Writes the layers with one band a winter, several files at a time. */
    void winters() {
        int cultivars = plan.cultivars().size();
        Optional<Float> coldNight = plan.job().reckoning().coldNight();
        workers.forEach(1 + 3 * cultivars + (coldNight.isPresent() ? 2 : 0), (worker, task) -> {
            if (task > 3 * cultivars) {
                int plane = WinterValues.coldNightsPlane(cultivars, levels, plan.job().reckoning());
                boolean spell = task == 3 * cultivars + 2;
                LayerDefinition layer = spell ? WinterLayers.coldSpell(coldNight.get()) : WinterLayers.coldNights(coldNight.get());
                if (selection.containsSeverity(layer.id())) {
                    writeWinters(layer, Optional.empty(), spell ? plane + 1 : plane);
                }
                return;
            }
            if (task == 0) {
                winterLayer(WinterLayers.MINIMUM, Optional.empty(), WinterValues.minimumPlane());
                return;
            }
            int c = (task - 1) / 3;
            switch ((task - 1) % 3) {
                case 0 -> winterLayer(WinterLayers.MARGIN, Optional.of(c), WinterValues.marginPlane(c, 0, levels));
                case 1 -> winterLayer(WinterLayers.DAMAGE, Optional.of(c), WinterValues.damagePlane(c, levels));
                default -> winterLayer(WinterLayers.WORST_NIGHT, Optional.of(c), WinterValues.worstNightPlane(c, levels));
            }
        });
    }

    private void winterLayer(LayerDefinition layer, Optional<Integer> cultivar, int plane) {
        if (selection.contains(layer.id())) {
            writeWinters(layer, cultivar, plane);
        }
    }

    private void writeWinters(LayerDefinition layer, Optional<Integer> cultivar, int plane) {
        try (RasterWriter writer = output.winters(layer, cultivar.map(plan.cultivars()::get))) {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int winter = 0; winter < plan.seasons().size(); winter++) {
                for (int row = 0; row < rows; row += stripRows) {
                    int count = Math.min(stripRows, rows - row);
                    writer.write(winter, row, count, store.read(plane, winter, row, count));
                    progress.advance(count);
                    workers.checkCancelled();
                }
            }
            writer.finish();
        }
    }

    /** Size of the whole pass in the unit of its progress. */
    long size(boolean winterLayers) {
        long layers = ofCultivar.stream().mapToLong(List::size).sum() + ofAll.size() + 4;
        long winters = winterLayers ? plan.seasons().size() * (1L + 3L * plan.cultivars().size() + (plan.job().reckoning().coldNight().isPresent() ? 2 : 0)) : 0;
        return rows * (layers + winters);
    }
}
