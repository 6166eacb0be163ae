package org.wintersill.cli;

import java.io.PrintStream;
import java.util.function.LongSupplier;
import org.wintersill.engine.Progress;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;

/** Where a command speaks: the result to standard output, everything else to standard error. Safe to use from several threads. */
public final class Console {

    /** How much is said. */
    public enum Level {
        /** Problems only. */
        QUIET,
        /** Notes, progress and what was done. */
        NORMAL,
        /** Details too. */
        VERBOSE
    }

    private final PrintStream out;
    private final PrintStream err;
    private final Level level;
    private final Cancellation cancellation;
    private final ProgressDisplay display;
    private final Notices notices = new Notices(text -> message("note: " + text));

    Console(PrintStream out, PrintStream err, Level level, boolean terminal, Cancellation cancellation, LongSupplier clock) {
        this.out = out;
        this.err = err;
        this.level = level;
        this.cancellation = cancellation;
        this.display = new ProgressDisplay(err, terminal, clock);
    }

    /** A piece of the result, to standard output, with a line end. */
    public void result(String text) {
        display.around(() -> {
            out.print(text);
            if (!text.endsWith("\n")) {
                out.print('\n');
            }
            out.flush();
        });
    }

    /** A sentence about what is done; nothing when quiet. */
    public void message(String text) {
        if (level != Level.QUIET) {
            display.print(clean(text));
        }
    }

    /** A detail, said only when verbose. */
    public void detail(String text) {
        if (level == Level.VERBOSE) {
            display.print(clean(text));
        }
    }

    /** What is wrong, where and what to do: one line each. Said even when quiet. */
    void problem(Problem problem) {
        display.stop();
        err.println("error: " + clean(sentence(problem.what())));
        if (!problem.where().isEmpty()) {
            err.println("  where:  " + clean(problem.where()));
        }
        if (!problem.remedy().isEmpty()) {
            err.println("  remedy: " + clean(sentence(problem.remedy())));
        }
    }

    /** A line of an error that is no problem of the user's. */
    void error(String text) {
        display.stop();
        err.println("error: " + clean(text));
    }

    /** Takes a progress line away that is still shown. */
    void stop() {
        display.stop();
    }

    PrintStream errorStream() {
        return err;
    }

    /** Notices of this command, told as they come. */
    public Notices notices() {
        return notices;
    }

    /** Shows nothing when quiet. */
    public Progress progress() {
        return level == Level.QUIET ? Progress.silent() : display;
    }

    public Level level() {
        return level;
    }

    public Cancellation cancellation() {
        return cancellation;
    }

    private static String sentence(String text) {
        char last = text.isEmpty() ? '.' : text.charAt(text.length() - 1);
        return last == '.' || last == '?' || last == '!' ? text : text + ".";
    }

    /** Names from files may hold control codes that a terminal would obey. */
    static String clean(String text) {
        StringBuilder clean = new StringBuilder(text.length());
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            boolean control = Character.isISOControl(c) && c != '\n' && c != '\t' || c >= '\u202a' && c <= '\u202e'
                    || c >= '\u2066' && c <= '\u2069';
            clean.append(control ? String.format(java.util.Locale.ROOT, "\\u%04x", (int) c) : c);
        }
        return clean.toString();
    }
}
