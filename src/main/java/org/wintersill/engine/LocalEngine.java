package org.wintersill.engine;

import java.util.BitSet;
import org.wintersill.engine.FoldPlan.Band;
import org.wintersill.engine.FoldPlan.Batch;
import org.wintersill.problem.Notices;

/**
 * Does a job on one machine: band after band, batch after batch, with a fixed set of workers.
 *
 * <p>Within a batch the workers first decode days, chunk by chunk, then count missing days of source cells, then fold lanes of
 * target cells. The three steps wait for each other, so no step sees half of another's work and no result depends on timing.
 */
public final class LocalEngine {
    private final FoldJob job;
    private final FoldPlan plan;
    private final NightMeans means;

    public LocalEngine(FoldJob job, FoldPlan plan) {
        this.job = job;
        this.plan = plan;
        means = new NightMeans(job);
    }

    /** Means over the nights; complete after {@link #run}. */
    public NightMeans nightMeans() {
        return means;
    }

    /**
     * Runs the job.
     *
     * @param sink told of every finished winter and lane
     * @param notices told how many values were no air temperature
     * @throws org.wintersill.problem.ProblemException when an input turns out to be damaged or the sink cannot go on
     * @throws CancelledException when the user asked to stop
     */
    public void run(WinterSink sink, Workers workers, Progress progress, Notices notices) {
        long nights = plan.batches().stream().mapToLong(Batch::count).sum();
        progress.begin("Winters", nights * job.targetRows());
        BitSet countedRows = new BitSet();
        for (Band band : plan.bands()) {
            try (BandFold fold = new BandFold(job, plan, band, workers, sink, progress, countedRows, means)) {
                for (Batch batch : plan.batches()) {
                    fold.accept(batch);
                }
                long setAside = fold.valuesSetAside();
                if (setAside > 0) {
                    notices.add("values that no air temperature has were set aside as missing", setAside);
                }
                if (fold.swapped() > 0) {
                    notices.add("daily maxima lie below the minimum of their day; the mean is taken from them as they are", fold.swapped());
                }
            }
        }
        progress.end();
    }
}
