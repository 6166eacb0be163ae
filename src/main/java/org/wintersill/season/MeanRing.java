package org.wintersill.season;

import java.util.Arrays;

/**
 * The last days of a lane, so that a missing daily mean can wait for the next one: up to {@link #LONGEST_GAP} missing days are
 * filled linearly in time between the means before and after, cell by cell; at the beginning and the end of the days that
 * a model is fed, the nearest mean is kept instead. What stands in a longer gap stays missing (science 9, project choice).
 *
 * <p>Arrays are {@code [cell]}, degrees Celsius, positive infinity for missing. Days are positions in the winter's window and come
 * one after the other. What is filled depends on the cell's own means and the days that the model is fed, on nothing else.
 */
final class MeanRing {
    /** Missing days in a row that are filled. */
    static final int LONGEST_GAP = 3;
    /** Days kept: the one that is filled, and a gap's length before and after it; a power of two. */
    private static final int DAYS = 8;
    private static final int MASK = DAYS - 1;

    private final int cells;
    private final float[][] minima;
    private final float[][] means;
    private final boolean[] gaps = new boolean[DAYS];

    MeanRing(int cells) {
        this.cells = cells;
        minima = new float[DAYS][cells];
        means = new float[DAYS][cells];
    }

    static long bytesPerCell() {
        return 2L * DAYS * Float.BYTES;
    }

    /** Room for a day's minima, and where they are found again during the next days. */
    float[] minima(int day) {
        return minima[day & MASK];
    }

    float[] means(int day) {
        return means[day & MASK];
    }

    /** A day without record. */
    void absent(int day) {
        Arrays.fill(minima(day), Float.POSITIVE_INFINITY);
        Arrays.fill(means(day), Float.POSITIVE_INFINITY);
        gaps[day & MASK] = true;
    }

    /** Called when the room of a day is filled. */
    void complete(int day) {
        float[] mean = means(day);
        int i = 0;
        while (i < cells && mean[i] < Float.POSITIVE_INFINITY) {
            i++;
        }
        gaps[day & MASK] = i < cells;
    }

    /**
     * The means of a day with short gaps filled; {@link #LONGEST_GAP} days after it must have come.
     *
     * @param first first day that the model is fed
     * @param last last day that it is fed
     * @param room overwritten where it is needed
     * @return the day's own array or {@code room}; NaN where the mean is missing
     */
    float[] filled(int day, int first, int last, float[] room) {
        float[] mean = means(day);
        if (!gaps[day & MASK]) {
            return mean;
        }
        for (int i = 0; i < cells; i++) {
            room[i] = mean[i] < Float.POSITIVE_INFINITY ? mean[i] : fill(day, first, last, i);
        }
        return room;
    }

    private float fill(int day, int first, int last, int cell) {
        int before = 1;
        while (before <= LONGEST_GAP && day - before >= first && isMissing(day - before, cell)) {
            before++;
        }
        int after = 1;
        while (after <= LONGEST_GAP && day + after <= last && isMissing(day + after, cell)) {
            after++;
        }
        if (before + after - 1 > LONGEST_GAP) {
            return Float.NaN;
        }
        boolean atStart = day - before < first;
        boolean atEnd = day + after > last;
        if (atStart || atEnd) {
            return atStart && atEnd ? Float.NaN : atStart ? means(day + after)[cell] : means(day - before)[cell];
        }
        float from = means(day - before)[cell];
        return from + (means(day + after)[cell] - from) * before / (before + after);
    }

    private boolean isMissing(int day, int cell) {
        return !(means(day)[cell] < Float.POSITIVE_INFINITY);
    }
}
