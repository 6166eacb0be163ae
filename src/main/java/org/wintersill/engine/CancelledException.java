package org.wintersill.engine;

/** The user asked to stop. */
public final class CancelledException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    public CancelledException() {
        super("interrupted");
    }
}
