package org.wintersill.cli;

import java.util.function.BooleanSupplier;

/** Whether the user asked to stop. Set once, from any thread; the work asks often and ends soon after. */
public final class Cancellation implements BooleanSupplier {
    private volatile boolean cancelled;

    public void cancel() {
        cancelled = true;
    }

    @Override
    public boolean getAsBoolean() {
        return cancelled;
    }
}
