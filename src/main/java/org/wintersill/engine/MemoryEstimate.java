package org.wintersill.engine;

import java.util.LinkedHashMap;
import java.util.Map;

/** What a run will keep in memory, item by item, so that the largest item can be named when it is too much. */
public final class MemoryEstimate {
    private final Map<String, Long> items = new LinkedHashMap<>();

    public MemoryEstimate add(String item, long bytes) {
        items.merge(item, bytes, Long::sum);
        return this;
    }

    public long total() {
        return items.values().stream().mapToLong(Long::longValue).sum();
    }

    /** Bytes by item, in the order in which they were added. */
    public Map<String, Long> items() {
        return new LinkedHashMap<>(items);
    }

    /** A number of bytes for people: {@code 1.5 GB}, {@code 240 MB}. */
    public static String text(long bytes) {
        if (bytes >= 1_000_000_000L) {
            long tenths = (bytes + 50_000_000L) / 100_000_000L;
            return tenths / 10 + "." + tenths % 10 + " GB";
        }
        return Math.max(1, (bytes + 500_000L) / 1_000_000L) + " MB";
    }
}
