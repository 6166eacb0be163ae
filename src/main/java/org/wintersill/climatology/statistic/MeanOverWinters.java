package org.wintersill.climatology.statistic;

/** Mean of the winters that count, summed in the order of time in double precision. */
final class MeanOverWinters {
    private MeanOverWinters() {
    }

    /** @param values {@code [winter][cell]}, NaN for winters that do not count */
    static void of(float[][] values, float[] out, int from, int to) {
        for (int cell = from; cell < to; cell++) {
            double sum = 0;
            int n = 0;
            for (float[] winter : values) {
                float value = winter[cell];
                if (value == value) {
                    sum += value;
                    n++;
                }
            }
            out[cell] = n == 0 ? Float.NaN : (float) (sum / n);
        }
    }
}
