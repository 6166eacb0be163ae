package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.climatology.statistic.VarianceShare;
import org.wintersill.engine.WinterStore;
import org.wintersill.engine.Workers;
import org.wintersill.layer.RasterWriter;
import org.wintersill.season.WinterValues;

/**
 * Shares of the variance of the winter margin over all cultivars of a run. Winters that count for every cultivar at a cell are taken; a row
 * at a time, since all margins of all cultivars are looked at together.
 */
final class SharedVariance {
    private final RunPlan plan;
    private final WinterStore store;
    private final LayerOutput output;
    private final LayerSelection selection;
    private final Workers workers;

    SharedVariance(RunPlan plan, WinterStore store, LayerOutput output, LayerSelection selection, Workers workers) {
        this.plan = plan;
        this.store = store;
        this.output = output;
        this.selection = selection;
        this.workers = workers;
    }

    /** The layers of a run; none with a single cultivar. */
    static List<VarianceShare> layers(RunPlan plan) {
        return plan.cultivars().size() < 2 ? List.of() : VarianceShare.all(plan.job().reckoning().uncertainty().components(), 0);
    }

    void write() {
        List<VarianceShare> shares = layers(plan).stream().filter(share -> selection.contains(share.layer().id())).toList();
        int rows = plan.target().rows();
        int columns = plan.target().columns();
        List<RasterWriter> writers = new ArrayList<>();
        try {
            shares.forEach(share -> writers.add(output.summary(share.layer(), Optional.empty())));
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int row = 0; row < rows && !shares.isEmpty(); row += stripRows) {
                int count = Math.min(stripRows, rows - row);
                int first = row;
                float[][] strips = new float[shares.size()][count * columns];
                workers.forEach(count, (worker, r) -> row(shares, first + r, r * columns, strips));
                for (int layer = 0; layer < strips.length; layer++) {
                    writers.get(layer).write(0, row, count, strips[layer]);
                }
                workers.checkCancelled();
            }
            writers.forEach(RasterWriter::finish);
        } finally {
            writers.forEach(RasterWriter::close);
        }
    }

    private void row(List<VarianceShare> shares, int row, int start, float[][] strips) {
        int cultivars = plan.cultivars().size();
        int winters = plan.seasons().size();
        int columns = plan.target().columns();
        float[][][] margins = new float[cultivars][winters][];
        for (int c = 0; c < cultivars; c++) {
            int plane = WinterValues.marginPlane(c, 0, plan.job().levels());
            for (int w = 0; w < winters; w++) {
                margins[c][w] = store.read(plane, w, row, 1);
            }
        }
        double[][] valid = new double[cultivars][winters];
        for (int column = 0; column < columns; column++) {
            int n = 0;
            for (int w = 0; w < winters; w++) {
                boolean all = true;
                for (int c = 0; c < cultivars; c++) {
                    valid[c][n] = margins[c][w][column];
                    all &= valid[c][n] == valid[c][n];
                }
                n += all ? 1 : 0;
            }
            for (int layer = 0; layer < shares.size(); layer++) {
                strips[layer][start + column] = shares.get(layer).share(valid, n);
            }
        }
    }
}
