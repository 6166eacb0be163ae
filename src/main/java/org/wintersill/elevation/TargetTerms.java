package org.wintersill.elevation;

import java.util.Arrays;
import org.wintersill.time.MonthDay;

/**
 * What is added to the minimum of a target cell beside interpolation and height: cooling by cold-air pools, times the weight of the night;
 * warming by water, while it is open; a constant offset. Values are in K, 0 where there is nothing.
 */
public final class TargetTerms {
    private final PoolChange pool;
    private final float[][] water;
    private final double offset;
    private final StableNights nights;
    private final FrozenPeriod frozen;

    /**
     * @param pool cooling by pools; null for none
     * @param water change beside open water; null for none
     * @param offset K added to every minimum, and to nothing but the minimum
     * @param nights when pools form
     * @param frozen when water is frozen
     */
    public TargetTerms(PoolChange pool, float[][] water, double offset, StableNights nights, FrozenPeriod frozen) {
        this.pool = pool;
        this.water = water;
        this.offset = offset;
        this.nights = nights;
        this.frozen = frozen;
    }

    public static TargetTerms none() {
        return new TargetTerms(null, null, 0, new StableNights.All(), FrozenPeriod.NEVER);
    }

    /**
     * Dates between which water is frozen and warms nothing, both included, across the new year where {@code from} comes later.
     *
     * @param from null for never
     */
    public record FrozenPeriod(MonthDay from, MonthDay to) {
        public static final FrozenPeriod NEVER = new FrozenPeriod(null, null);

        public boolean holds(int month, int day) {
            if (from == null) {
                return false;
            }
            int date = 100 * month + day;
            int first = 100 * from.month() + from.day();
            int last = 100 * to.month() + to.day();
            return first <= last ? date >= first && date <= last : date >= first || date <= last;
        }
    }

    public boolean isNone() {
        return pool == null && water == null && offset == 0;
    }

    public boolean hasPools() {
        return pool != null;
    }

    public boolean hasWater() {
        return water != null;
    }

    public double offset() {
        return offset;
    }

    public StableNights nights() {
        return nights;
    }

    public FrozenPeriod frozen() {
        return frozen;
    }

    /** Cooling by pools, by row; null for none. */
    public PoolChange pools() {
        return pool;
    }

    /** Change by pools on a night of full strength, K. */
    public float pool(int row, int column) {
        return pool == null ? 0 : pool.row(row)[column];
    }

    /** Change by open water, K. */
    public float water(int row, int column) {
        return water == null ? 0 : water[row][column];
    }

    float[] poolRow(int row) {
        return pool.row(row);
    }

    float[] waterRow(int row) {
        return water[row];
    }

    /** Bytes that the terms take. */
    public long bytes() {
        return (pool == null ? 0 : pool.bytes()) + (water == null ? 0 : 4 * Arrays.stream(water).mapToLong(row -> row.length).sum());
    }
}
