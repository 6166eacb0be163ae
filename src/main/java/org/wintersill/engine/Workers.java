package org.wintersill.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.BooleanSupplier;

/**
 * A fixed number of threads that work through numbered tasks. Tasks are taken in ascending order and do not depend on each
 * other. If tasks fail, the failure of the lowest number is thrown, which is the same for any number of threads.
 */
public final class Workers implements AutoCloseable {
    private final int threads;
    private final ExecutorService executor;
    private final BooleanSupplier cancelled;

    /** @param cancelled asked before every task; true ends the work with a {@link CancelledException} */
    public Workers(int threads, BooleanSupplier cancelled) {
        this.threads = threads;
        this.cancelled = cancelled;
        AtomicInteger number = new AtomicInteger();
        executor = Executors.newFixedThreadPool(threads, runnable -> {
            Thread thread = new Thread(runnable, "worker-" + number.getAndIncrement());
            thread.setDaemon(true);
            return thread;
        });
    }

    /** One task of many. */
    public interface Task {
        /**
         * @param worker number of the worker, 0..threads-1: for room of one's own
         * @param task number of the task
         */
        void run(int worker, int task);
    }

    private record Failure(int task, Throwable cause) {
    }

    public int threads() {
        return threads;
    }

    /** The threads themselves, for writers that compress. */
    public ExecutorService executor() {
        return executor;
    }

    /** Throws if the user asked to stop. */
    public void checkCancelled() {
        if (cancelled.getAsBoolean()) {
            throw new CancelledException();
        }
    }

    /** Runs the tasks 0..count-1 and returns when all are done. */
    public void forEach(int count, Task task) {
        AtomicInteger next = new AtomicInteger();
        AtomicReference<Failure> failure = new AtomicReference<>();
        List<Future<?>> running = new ArrayList<>();
        for (int w = 0; w < Math.min(threads, count); w++) {
            int worker = w;
            running.add(executor.submit(() -> work(worker, count, task, next, failure)));
        }
        for (Future<?> future : running) {
            await(future);
        }
        checkCancelled();
        if (failure.get() != null) {
            Throwable cause = failure.get().cause();
            if (cause instanceof RuntimeException e) {
                throw e;
            }
            throw (Error) cause;
        }
    }

    private void work(int worker, int count, Task task, AtomicInteger next, AtomicReference<Failure> failure) {
        for (int number = next.getAndIncrement(); number < count; number = next.getAndIncrement()) {
            Failure known = failure.get();
            if (cancelled.getAsBoolean() || known != null && known.task() < number) {
                return;
            }
            try {
                task.run(worker, number);
            } catch (RuntimeException | Error e) {
                int failed = number;
                failure.accumulateAndGet(new Failure(failed, e), (a, b) -> a == null || b.task() < a.task() ? b : a);
                return;
            }
        }
    }

    private static void await(Future<?> future) {
        try {
            future.get();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new CancelledException();
        } catch (ExecutionException e) {
            throw new IllegalStateException(e.getCause());
        }
    }

    @Override
    public void close() {
        executor.shutdownNow();
    }
}
