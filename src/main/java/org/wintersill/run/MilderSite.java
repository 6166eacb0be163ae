package org.wintersill.run;

import java.util.Optional;
import org.wintersill.climatology.DiscMaximum;
import org.wintersill.engine.WinterStore;
import org.wintersill.engine.Workers;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CellSizes;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.RasterWriter;
import org.wintersill.layer.SampleType;

/**
 * K gained by moving to the mildest cell, the one of the highest mean margin, within a distance: the layer {@code milder-site-gain} of a
 * cultivar. Made for cultivars with variants, where it answers the question whether a hardier variant or a milder site gains more, and
 * for all where it is asked for by name. Rows are taken a few at a time with the rows that their discs reach.
 */
final class MilderSite {
    static final String ID = "milder-site-gain";
    private static final int TASK_ROWS = 8;
    private static final double METRES_PER_KM = 1000;
    private static final double GLOBE = 360;

    private final RunPlan plan;
    private final WinterStore store;
    private final LayerOutput output;
    private final Workers workers;
    private final DiscMaximum discs;

    MilderSite(RunPlan plan, WinterStore store, LayerOutput output, Workers workers) {
        this.plan = plan;
        this.store = store;
        this.output = output;
        this.workers = workers;
        GridGeometry grid = plan.target();
        CellSizes sizes = CellSizes.of(grid);
        boolean around = grid.crs().kind() == Crs.Kind.GEOGRAPHIC && Math.abs(grid.east() - grid.west() - GLOBE) < grid.cellWidth() / 2;
        discs = new DiscMaximum(grid.columns(), plan.config().damage().neighbourhoodKm() * METRES_PER_KM, sizes.width(), sizes.height(), around);
    }

    static LayerDefinition layer(double kilometres) {
        return new LayerDefinition(ID, "Gain by a milder site",
                "Mean margin of the mildest cell within " + kilometres + " km minus that of the cell itself", "K", SampleType.FLOAT32, "",
                LayerStyles.gain());
    }

    /** Whether the layer is made for a cultivar. */
    static boolean wanted(RunPlan plan, LayerSelection selection, int cultivar) {
        return selection.names(ID) || selection.contains(ID) && Populations.of(plan.cultivars().get(cultivar)).isPresent();
    }

    /** @param plane extra plane of the store with the cultivar's mean margins */
    void write(int cultivar, int plane) {
        int rows = plan.target().rows();
        int columns = plan.target().columns();
        try (RasterWriter writer = output.summary(layer(plan.config().damage().neighbourhoodKm()), Optional.of(plan.cultivars().get(cultivar)))) {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int row = 0; row < rows; row += stripRows) {
                int first = row;
                int count = Math.min(stripRows, rows - row);
                float[] strip = new float[count * columns];
                workers.forEach((count + TASK_ROWS - 1) / TASK_ROWS, (worker, task) -> {
                    int taskRow = first + task * TASK_ROWS;
                    int taskRows = Math.min(TASK_ROWS, first + count - taskRow);
                    float[] out = new float[taskRows * columns];
                    discs.fill(taskRow, taskRows, source -> store.readExtra(plane, source, 1), out);
                    float[] own = store.readExtra(plane, taskRow, taskRows);
                    for (int i = 0; i < out.length; i++) {
                        strip[(taskRow - first) * columns + i] = out[i] - own[i];
                    }
                });
                writer.write(0, row, count, strip);
                workers.checkCancelled();
            }
            writer.finish();
        }
    }
}
