package org.wintersill.cli;

import java.io.PrintStream;
import java.util.Locale;
import java.util.function.LongSupplier;
import org.wintersill.engine.Progress;

/**
 * Shows how far the work is: share, rate and remaining time.
 *
 * <p>On a terminal one line is drawn over and over with a carriage return, at most five times a second. Elsewhere a plain line,
 * with the time since the start, is written when 30 s have passed or 5 % more is done, but at most one a second.
 */
final class ProgressDisplay implements Progress {
    private static final long SECOND = 1_000_000_000L;
    private static final long REDRAW = SECOND / 5;
    private static final long LINE_EVERY = 30 * SECOND;
    private static final double LINE_SHARE = 0.05;
    /** A remaining time is told from here on; before, it is a guess. */
    private static final long ESTIMATE_AFTER = 2 * SECOND;

    private final PrintStream stream;
    private final boolean terminal;
    private final LongSupplier clock;
    private final long start;
    private String phase = "";
    private long total;
    private long done;
    private long phaseStart;
    private long lastShown;
    private double lastShare;
    private boolean running;
    private int drawn;

    /**
     * @param terminal whether the stream ends in a terminal
     * @param clock nanoseconds since any moment
     */
    ProgressDisplay(PrintStream stream, boolean terminal, LongSupplier clock) {
        this.stream = stream;
        this.terminal = terminal;
        this.clock = clock;
        this.start = clock.getAsLong();
    }

    @Override
    public synchronized void begin(String name, long size) {
        phase = name;
        total = Math.max(size, 0);
        done = 0;
        phaseStart = clock.getAsLong();
        lastShown = phaseStart;
        lastShare = 0;
        running = true;
        if (terminal) {
            draw(phaseStart);
        }
    }

    @Override
    public synchronized void advance(long n) {
        if (!running) {
            return;
        }
        done += n;
        long now = clock.getAsLong();
        if (terminal) {
            if (now - lastShown >= REDRAW) {
                draw(now);
            }
        } else if (now - lastShown >= LINE_EVERY || now - lastShown >= SECOND && share() - lastShare >= LINE_SHARE) {
            show(now);
        }
    }

    @Override
    public synchronized void end() {
        if (!running) {
            return;
        }
        long now = clock.getAsLong();
        done = total;
        if (terminal) {
            clear();
        }
        if (terminal || now - phaseStart >= SECOND) {
            stream.println(stamp(now) + phase + ": done in " + time(now - phaseStart));
        }
        running = false;
    }

    /** Prints a line without tearing the progress line. */
    void print(String line) {
        around(() -> stream.println(line));
    }

    /** Prints something, here or elsewhere on the screen, without tearing the progress line. */
    synchronized void around(Runnable printing) {
        clear();
        printing.run();
        if (terminal && running) {
            draw(clock.getAsLong());
        }
    }

    /** Takes the progress line away, for good: after a failure. */
    synchronized void stop() {
        clear();
        running = false;
    }

    private void draw(long now) {
        String line = text(now);
        stream.print("\r" + line + " ".repeat(Math.max(0, drawn - line.length())));
        stream.flush();
        drawn = line.length();
        lastShown = now;
    }

    private void clear() {
        if (drawn > 0) {
            stream.print("\r" + " ".repeat(drawn) + "\r");
            stream.flush();
            drawn = 0;
        }
    }

    private void show(long now) {
        stream.println(stamp(now) + text(now));
        lastShown = now;
        lastShare = share();
    }

    private double share() {
        return total == 0 ? 1 : Math.min(1, (double) done / total);
    }

    private String text(long now) {
        long elapsed = now - phaseStart;
        StringBuilder text = new StringBuilder(phase).append(": ").append((int) Math.floor(share() * 100)).append(" %");
        if (elapsed >= ESTIMATE_AFTER && done > 0) {
            double rate = done * (double) SECOND / elapsed;
            text.append(", ").append(rate(rate)).append("/s");
            if (done < total) {
                text.append(", ").append(time((long) ((total - done) / rate * SECOND))).append(" left");
            }
        }
        return text.toString();
    }

    private String stamp(long now) {
        return "[" + time(now - start) + "] ";
    }

    /** Three figures, with the prefixes that everybody knows. */
    static String rate(double rate) {
        if (rate >= 1e9) {
            return String.format(Locale.ROOT, "%.1f G", rate / 1e9);
        }
        if (rate >= 1e6) {
            return String.format(Locale.ROOT, "%.1f M", rate / 1e6);
        }
        if (rate >= 1e4) {
            return String.format(Locale.ROOT, "%.0f k", rate / 1e3);
        }
        return String.format(Locale.ROOT, rate >= 10 ? "%.0f" : "%.1f", rate);
    }

    /** {@code 01:05}, with hours where there are any. */
    static String time(long nanos) {
        long seconds = Math.max(0, Math.round(nanos / (double) SECOND));
        long hours = seconds / 3600;
        String rest = String.format(Locale.ROOT, "%02d:%02d", seconds / 60 % 60, seconds % 60);
        return hours == 0 ? rest : hours + ":" + rest;
    }
}
