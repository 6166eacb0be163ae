package org.wintersill.problem;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Consumer;

/**
 * Things worth saying that do not stop a run: assumptions made, values set aside, days missing.
 *
 * <p>A text is shown once, the first time it is given; how often it came is counted for the record.
 * Thread-safe. {@link #counts()} is sorted by text so that the record does not depend on timing.
 */
public final class Notices {
    private final Map<String, Long> counts = new LinkedHashMap<>();
    private final Consumer<String> listener;

    /** Keeps the notices and shows them to nobody. */
    public Notices() {
        this(text -> { });
    }

    /** @param listener told of each new text once, in the order of arrival */
    public Notices(Consumer<String> listener) {
        this.listener = listener;
    }

    public void add(String text) {
        add(text, 1);
    }

    public synchronized void add(String text, long times) {
        if (counts.merge(text, times, Long::sum) == times) {
            listener.accept(text);
        }
    }

    /** Text and how often it was given, sorted by text. */
    public synchronized Map<String, Long> counts() {
        return new TreeMap<>(counts);
    }
}
