package org.wintersill.run;

import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.climatology.statistic.Population;
import org.wintersill.config.LimitConfig;
import org.wintersill.config.OutputConfig;
import org.wintersill.engine.FoldJob;
import org.wintersill.engine.FoldPlan;
import org.wintersill.engine.FoldPlanner;
import org.wintersill.engine.WinterStore;
import org.wintersill.grid.GridGeometry;
import org.wintersill.scenario.ScenarioSource;

/**
 * What a run will take. Rates were measured on two cores (see the benchmark results in the repository) and are only good for
 * a rough answer: minutes or hours.
 */
final class Estimates {
    /** Share of the heap that a plan may fill; the rest is for the libraries, the collector and the writers' buffers. */
    private static final double HEAP_SHARE = 0.7;
    /** Decoded bytes a second and thread. */
    private static final double READ_RATE = 150e6;
    /** Cell-nights times cultivars a second and thread. */
    private static final double FOLD_RATE = 1e9;
    /** Cell-days times cultivars with a state model a second and thread. */
    private static final double STATE_RATE = 40e6;
    /** Bytes of layers a second and thread. */
    private static final double WRITE_RATE = 40e6;
    private static final double START_SECONDS = 1.5;
    private static final int TILE_ROWS = 256;
    /** A level and all its overviews, and the copy that is being compressed. */
    private static final double PYRAMID = 2.7;

    private Estimates() {
    }

    /** Bytes that the plan may fill. */
    static long budget(LimitConfig limits) {
        long heap = (long) (Runtime.getRuntime().maxMemory() * HEAP_SHARE);
        return limits.memoryBytes().isPresent() ? Math.min(limits.memoryBytes().getAsLong(), heap) : heap;
    }

    /** Classes of every cell and cultivar, kept for tables and polygons until the end. */
    static long residentBytes(GridGeometry target, int cultivars) {
        return target.cells() * cultivars;
    }

    /** Strips of tile rows of all layers of one cultivar. */
    static long writerBytes(GridGeometry target, ClimatologyStatistics.Choices choices, OutputConfig outputs) {
        LayerSelection selection = new LayerSelection(outputs.layers());
        int ofPopulation = ClimatologyStatistics.ofPopulation(choices, new Population(1, new double[0])).size();
        int layers = Math.max(selection.made(ClimatologyStatistics.ofCultivar(choices)).size() + ofPopulation,
                selection.made(ClimatologyStatistics.shared(choices)).size());
        return (long) ((double) target.columns() * TILE_ROWS * 4 * layers * PYRAMID);
    }

    static RunPlan.Estimate of(FoldJob job, FoldPlan plan, long writerBytes, OutputConfig outputs) {
        long cells = (long) job.targetRows() * job.targetColumns();
        int winters = job.seasons().size();
        int cultivars = job.cultivars();
        long working = WinterStore.bytes(job.planes(), winters, 2 * cultivars, cells)
                + (job.source() instanceof ScenarioSource scenario ? scenario.diskBytes(job.window()) : 0);
        long summaries = 4 * cells * cultivars * 18L;
        long winterLayers = outputs.winters() ? 4 * cells * winters * (1 + 3L * cultivars) : 0;
        double nights = plan.batches().stream().mapToLong(FoldPlan.Batch::count).sum();
        double seconds = START_SECONDS
                + nights * job.window().cells() * 4 * (job.states().hasSecond() ? 2 : 1) * plan.bands().size() / READ_RATE / plan.threads()
                + nights * cells * cultivars / FOLD_RATE / plan.threads()
                + nights * cells * job.states().cultivars().size() / STATE_RATE / plan.threads()
                + (summaries + winterLayers) / WRITE_RATE / plan.threads();
        long kept = plan.memory().items().getOrDefault(FoldPlanner.TARGET, 0L);
        long memory = Math.max(plan.memory().total(), kept + writerBytes) + residentBytes(job.adjustment().positions().target(), cultivars);
        return new RunPlan.Estimate(memory, working, summaries + winterLayers, seconds);
    }
}
