package org.wintersill.season;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * When a month with missing days still counts. A winter counts if every month of its complete part counts.
 *
 * <p>Sources: WMO-No. 1203 (2017) for {@link #MONTH_10_5}; the older 3/5 rule for {@link #MONTH_5_3}; both as restated in
 * {@code checks/completeness.csv}.
 */
public enum MissingDayPolicy {
    /** At most 10 days missing and fewer than 5 in a row. */
    MONTH_10_5("month-10-5", 10, 4),
    /** At most 5 days missing and at most 3 in a row. */
    MONTH_5_3("month-5-3", 5, 3),
    /** No day missing. */
    NONE("none", 0, 0);

    private final String key;
    private final int mostMissing;
    private final int longestRun;

    MissingDayPolicy(String key, int mostMissing, int longestRun) {
        this.key = key;
        this.mostMissing = mostMissing;
        this.longestRun = longestRun;
    }

    /** Word of the run file. */
    public String key() {
        return key;
    }

    public static Optional<MissingDayPolicy> named(String key) {
        return Arrays.stream(values()).filter(policy -> policy.key.equals(key)).findFirst();
    }

    public static List<String> keys() {
        return Arrays.stream(values()).map(MissingDayPolicy::key).toList();
    }

    /**
     * Whether a month counts.
     *
     * @param missing number of missing days in the month
     * @param run longest run of missing days within the month
     */
    public boolean monthCounts(int missing, int run) {
        return missing <= mostMissing && run <= longestRun;
    }
}
