package org.wintersill.run;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import org.wintersill.engine.CancelledException;

/**
 * Fingerprints of the input files, taken beside the fold: large inputs take seconds to read once more, and no step waits for
 * them but the record.
 */
final class InputDigests implements AutoCloseable {
    private final FutureTask<Map<Path, String>> task;
    private final Thread thread;

    InputDigests(List<Path> files) {
        task = new FutureTask<>(() -> {
            Map<Path, String> digests = new LinkedHashMap<>();
            for (Path file : files) {
                digests.put(file, Digests.ofFile(file));
            }
            return digests;
        });
        thread = new Thread(task, "fingerprints");
        thread.setDaemon(true);
        thread.start();
    }

    /**
     * The fingerprints by file, when all are there.
     *
     * @throws org.wintersill.problem.ProblemException when a file cannot be read any more
     */
    Map<Path, String> await() {
        try {
            return task.get();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new CancelledException();
        } catch (CancellationException e) {
            throw new CancelledException();
        } catch (ExecutionException e) {
            if (e.getCause() instanceof RuntimeException problem) {
                throw problem;
            }
            throw new IllegalStateException(e.getCause());
        }
    }

    @Override
    public void close() {
        task.cancel(true);
    }
}
