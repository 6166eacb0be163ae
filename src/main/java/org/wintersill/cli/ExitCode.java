package org.wintersill.cli;

import java.util.LinkedHashMap;
import java.util.Map;

/** The exit codes; they are part of the program's promise and never change their meaning. */
public final class ExitCode {
    public static final int DONE = 0;
    public static final int INTERNAL = 1;
    public static final int USAGE = 2;
    public static final int INPUT = 3;
    public static final int OUTPUT = 4;
    public static final int LIMIT = 5;
    /** 128 + SIGINT. */
    public static final int INTERRUPTED = 130;
    /** 128 + SIGTERM. */
    public static final int TERMINATED = 143;

    private ExitCode() {
    }

    /** Codes and meanings for help texts, in order. */
    static Map<String, String> meanings() {
        Map<String, String> meanings = new LinkedHashMap<>();
        meanings.put(" " + DONE, "done (notes do not change this, unless --strict)");
        meanings.put(" " + INTERNAL, "internal error: please report it");
        meanings.put(" " + USAGE, "wrong command line or run file");
        meanings.put(" " + INPUT, "an input file is missing or refused, or --strict and there were notes");
        meanings.put(" " + OUTPUT, "an output cannot be written");
        meanings.put(" " + LIMIT, "memory, disk or size limit exceeded");
        meanings.put(INTERRUPTED + "", "interrupted (Ctrl-C)");
        meanings.put(TERMINATED + "", "terminated from outside");
        return meanings;
    }
}
