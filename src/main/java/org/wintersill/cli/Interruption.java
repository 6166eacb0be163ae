package org.wintersill.cli;

import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;

/**
 * Stops the work when the process is asked to end (SIGINT, SIGTERM) and waits until it has put its files away. Java then ends
 * with 130 or 143 by itself.
 */
final class Interruption {
    /** Longest wait for the work to put its files away; afterwards unfinished files keep their temporary names. */
    private static final long PATIENCE_SECONDS = 20;

    private final Cancellation cancellation;
    private final CountDownLatch ended = new CountDownLatch(1);
    private final Thread hook = new Thread(this::stop, "stop");

    Interruption(Cancellation cancellation) {
        this.cancellation = cancellation;
    }

    /** From now on the end of the process waits for {@link #workEnded()}. */
    void watch() {
        Runtime.getRuntime().addShutdownHook(hook);
    }

    /** To be called when the work has ended, before the process is ended. */
    void workEnded() {
        ended.countDown();
    }

    private void stop() {
        if (ended.getCount() == 0) {
            return;
        }
        cancellation.cancel();
        try {
            ended.await(PATIENCE_SECONDS, TimeUnit.SECONDS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
