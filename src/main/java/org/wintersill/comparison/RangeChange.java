package org.wintersill.comparison;

/** Whether a cell is part of a cultivar's range, before and after: its killing winters are no more frequent than the target. */
public enum RangeChange {
    /** In the range before and after. */
    KEPT("kept"),
    /** Only after. */
    GAINED("gained"),
    /** Only before. */
    LOST("lost"),
    /** Neither before nor after. */
    NEVER("never-suitable");

    private final String key;

    RangeChange(String key) {
        this.key = key;
    }

    /** Word of tables and legends. */
    public String key() {
        return key;
    }

    /** Number of the class in a raster, from 1. */
    public int code() {
        return ordinal() + 1;
    }

    /** The class of a cell; null where one of the frequencies is NaN. */
    public static RangeChange of(float before, float after, double target) {
        if (Float.isNaN(before) || Float.isNaN(after)) {
            return null;
        }
        boolean was = before <= (float) target;
        boolean is = after <= (float) target;
        return was ? is ? KEPT : LOST : is ? GAINED : NEVER;
    }
}
