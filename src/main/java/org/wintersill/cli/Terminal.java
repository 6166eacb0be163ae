package org.wintersill.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** Finds out whether standard error ends in a terminal. */
final class Terminal {
    private static final Path STANDARD_ERROR = Path.of("/proc/self/fd/2");

    private Terminal() {
    }

    /**
     * Whether lines may be drawn over. Java only tells whether input and output are both terminals, so on Linux the link behind
     * the stream is asked first. {@code TERM=dumb} counts as no terminal.
     */
    static boolean onStandardError() {
        if ("dumb".equals(System.getenv("TERM"))) {
            return false;
        }
        try {
            if (Files.isSymbolicLink(STANDARD_ERROR)) {
                String target = Files.readSymbolicLink(STANDARD_ERROR).toString();
                return target.startsWith("/dev/pts/") || target.startsWith("/dev/tty") || target.equals("/dev/console");
            }
        } catch (IOException | UnsupportedOperationException e) {
            return false;
        }
        return System.console() != null;
    }
}
