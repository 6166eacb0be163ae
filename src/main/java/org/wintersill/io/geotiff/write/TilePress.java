package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.util.ArrayDeque;
import java.util.concurrent.Executor;
import java.util.concurrent.RejectedExecutionException;
import org.wintersill.layer.SampleType;

/**
 * Lets several threads compress tiles and hands the results over in the order in which the tiles were given. Memory is that
 * of two tiles a processor and two more.
 */
final class TilePress implements AutoCloseable {
    /** Receives finished tiles in order. */
    interface Taker {
        void take(TileJob job) throws IOException;
    }

    private final SampleType type;
    private final OverviewRule.Choice overviews;
    private final Executor workers;
    private final Taker taker;
    private final int most = 2 * Runtime.getRuntime().availableProcessors() + 2;
    private final ArrayDeque<TileJob> busy = new ArrayDeque<>();
    private final ArrayDeque<TileJob> idle = new ArrayDeque<>();

    TilePress(SampleType type, OverviewRule.Choice overviews, Executor workers, Taker taker) {
        this.type = type;
        this.overviews = overviews;
        this.workers = workers;
        this.taker = taker;
    }

    /** A job to fill and to {@link #submit}; the oldest one is finished first when all are busy. */
    TileJob next() throws IOException {
        if (idle.isEmpty() && busy.size() < most) {
            return new TileJob(type, overviews);
        }
        if (idle.isEmpty()) {
            takeOldest();
        }
        return idle.pop();
    }

    void submit(TileJob job) {
        busy.add(job);
        try {
            workers.execute(job.work());
        } catch (RejectedExecutionException e) {
            job.work().run();
        }
    }

    /** Waits for all tiles given so far. */
    void drain() throws IOException {
        while (!busy.isEmpty()) {
            takeOldest();
        }
    }

    private void takeOldest() throws IOException {
        TileJob job = busy.peek();
        job.complete();
        taker.take(job);
        idle.push(busy.remove());
    }

    /** Waits for what is still under way, drops it, and frees the compressors. */
    @Override
    public void close() {
        for (TileJob job : busy) {
            try {
                job.complete();
            } catch (IOException | RuntimeException e) {
                // The writer is being given up or has reported this already.
                continue;
            }
        }
        busy.forEach(TileJob::close);
        idle.forEach(TileJob::close);
        busy.clear();
        idle.clear();
    }
}
