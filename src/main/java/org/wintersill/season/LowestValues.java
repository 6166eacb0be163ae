package org.wintersill.season;

/**
 * The loops of the fold: lowest values over nights, cell by cell.
 *
 * <p>Temperatures of a stretch of nights are {@code nights[n][i]}, {@code i} counting the cells of the lane; missing ones are
 * positive infinity. Running values begin at positive infinity. No NaN goes in.
 *
 * <p>The nights of a stretch ascend but need not be neighbours: {@code positions[n]} is the position of night {@code n} in the
 * winter's window, by which references are found.
 *
 * <p>Four nights are taken at a time so that the running value is loaded and stored once for the four. Each night has an
 * array of its own that begins at the first cell of the lane: the compiler of JDK 17 makes vector code of such loops and of none
 * that add an offset to the index, which is ten times slower.
 */
final class LowestValues {
    /** Lifts any difference between two margins above the number of a night. */
    private static final float FAR = 1e30f;

    private LowestValues() {
    }

    /** lowest = min(lowest, t - reference[positions[n]]): the margin to a lethal temperature, K. */
    static void ofDifference(float[][] nights, int count, float[] reference, int[] positions, float[] lowest, int cells) {
        int n = 0;
        for (; n + 4 <= count; n += 4) {
            difference4(nights[n], nights[n + 1], nights[n + 2], nights[n + 3], reference[positions[n]],
                    reference[positions[n + 1]], reference[positions[n + 2]], reference[positions[n + 3]], lowest, cells);
        }
        for (; n < count; n++) {
            difference1(nights[n], reference[positions[n]], lowest, cells);
        }
    }

    private static void difference4(float[] a, float[] b, float[] c, float[] d, float ra, float rb, float rc, float rd,
                                    float[] lowest, int cells) {
        for (int i = 0; i < cells; i++) {
            float first = Math.min(a[i] - ra, b[i] - rb);
            float second = Math.min(c[i] - rc, d[i] - rd);
            lowest[i] = Math.min(lowest[i], Math.min(first, second));
        }
    }

    private static void difference1(float[] a, float ra, float[] lowest, int cells) {
        for (int i = 0; i < cells; i++) {
            lowest[i] = Math.min(lowest[i], a[i] - ra);
        }
    }

    /**
     * warm = min(warm, (t - reference[night]) * warmFactor[night]), and cold likewise: the standardised margins of both sides of the
     * curve in one go, so that temperature and difference are fetched once.
     */
    static void ofBothSides(float[][] nights, int count, float[] reference, float[] warmFactor, float[] coldFactor, int[] positions,
                            float[] warm, float[] cold, int cells) {
        for (int n = 0; n < count; n++) {
            int r = positions[n];
            bothSides1(nights[n], reference[r], warmFactor[r], coldFactor[r], warm, cold, cells);
        }
    }

    private static void bothSides1(float[] t, float reference, float warmFactor, float coldFactor, float[] warm, float[] cold,
                                   int cells) {
        for (int i = 0; i < cells; i++) {
            float margin = t[i] - reference;
            warm[i] = Math.min(warm[i], margin * warmFactor);
            cold[i] = Math.min(cold[i], margin * coldFactor);
        }
    }

    /**
     * Finds where in a stretch a value was reached: first[i] = the lowest n with nights[n][i] - reference[positions[n]] equal to
     * reached[i], exactly; a huge number where there is none.
     *
     * <p>reached is never above any of the differences, so (difference - reached) is zero on such nights and positive on all
     * others, where multiplying by {@link #FAR} lifts it above every night's number: differences of temperatures are multiples of
     * a float's last digit and never so small that this fails. Written so, it is vector code; with a comparison it would not be.
     */
    static void firstNightOf(float[] reached, float[][] nights, int count, float[] reference, int[] positions, float[] first,
                             int cells) {
        java.util.Arrays.fill(first, 0, cells, Float.POSITIVE_INFINITY);
        for (int n = 0; n < count; n++) {
            first1(reached, nights[n], reference[positions[n]], n, first, cells);
        }
    }

    private static void first1(float[] reached, float[] a, float ra, float na, float[] first, int cells) {
        for (int i = 0; i < cells; i++) {
            first[i] = Math.min(first[i], (a[i] - ra - reached[i]) * FAR + na);
        }
    }
}
