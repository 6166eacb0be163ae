package org.wintersill.engine;

import java.util.Arrays;
import java.util.List;
import org.wintersill.season.NightCurve.Measure;

/**
 * Finds the nights that a tile must be folded over: all others are warmer everywhere in the tile, against every measure of the
 * curve, than a night that is kept, and can lower nothing.
 *
 * <p>A measure of a night is (T + lapse * gain - reference) * factor, with T a weighted mean of node temperatures: linear in the
 * weights and in the gain, so its extremes over the tile lie at nodes and ends of the gain. Night a is left out if its lowest
 * possible measure exceeds the highest possible one of a night b ({@link #mark}), or, sharper, if it exceeds that of b at every node
 * and both ends ({@link #refine}). Both are asked with {@link #SLACK} to spare, so the order also holds between the rounded values
 * that the fold computes; equal nights are kept, so the earliest of the worst nights stays the earliest.
 */
final class NightSelection {
    /**
     * Share of the largest magnitude by which measures must differ. A rounding is 2^-24 of it. The fold's value of a measure takes at
     * most 18 (two rows mixed: 3 each; along the row: 4 on top of both; height: 3; the difference: 1; the factor: 1), for two nights
     * 36, the bounds themselves 10 more. 2^-17 is 128 of them.
     */
    private static final float SLACK = 1f / (1 << 17);

    private final int curves;
    private final int words;
    /** {@code [curve][tile][word]}, one bit a night. */
    private long[][][] kept = new long[0][][];
    private float[][][] upper = new float[0][][];
    private float[][][] slack = new float[0][][];
    private float[] marginLow = new float[0];
    private float[] marginHigh = new float[0];
    private float[] scaledLow = new float[0];
    private float[] scaledHigh = new float[0];
    private float[] excess = new float[0];
    private final NightRefinement refinement;

    /** @param curves number of lists of measures */
    NightSelection(int curves, int mostNights) {
        this.curves = curves;
        words = (mostNights + 63) / 64;
        refinement = new NightRefinement(mostNights);
    }

    /** Whether a night of a tile is kept for a curve. */
    boolean keeps(int curve, int tile, int night) {
        return (kept[curve][tile][night >> 6] >>> night & 1) != 0;
    }

    /** The first night from the given one that is kept for any curve; -1 if there is none. */
    int next(int tile, int night) {
        long mask = -1L << night;
        for (int word = night >> 6; word < words; word++) {
            long any = 0;
            for (int c = 0; c < curves; c++) {
                any |= kept[c][tile][word];
            }
            any &= mask;
            if (any != 0) {
                return (word << 6) + Long.numberOfTrailingZeros(any);
            }
            mask = -1L;
        }
        return -1;
    }

    /** Begins a row of tiles: no night is kept yet. */
    void begin(int tiles, List<List<Measure>> measures) {
        if (excess.length < tiles) {
            kept = new long[curves][tiles][words];
            marginLow = new float[tiles];
            marginHigh = new float[tiles];
            scaledLow = new float[tiles];
            scaledHigh = new float[tiles];
            excess = new float[tiles];
            upper = new float[curves][0][];
            slack = new float[curves][0][];
        }
        for (int c = 0; c < curves; c++) {
            if (upper[c].length != measures.get(c).size()) {
                upper[c] = new float[measures.get(c).size()][excess.length];
                slack[c] = new float[measures.get(c).size()][excess.length];
            }
            for (long[] bits : kept[c]) {
                Arrays.fill(bits, 0);
            }
        }
    }

    /**
     * Marks the nights from..to-1 of the bounds that no other night among them makes needless.
     *
     * @param measures {@code [curve]}; references by position in the winter's window
     * @param positions {@code [night]}, position in the window
     * @param lapse {@code [night]}, K/km
     */
    void mark(TileBounds bounds, List<List<Measure>> measures, int[] positions, float[] lapse, int from, int to) {
        int tiles = bounds.tiles();
        for (float[][] measuresOfCurve : upper) {
            for (float[] values : measuresOfCurve) {
                Arrays.fill(values, Float.POSITIVE_INFINITY);
            }
        }
        for (int n = from; n < to; n++) {
            adjust(bounds, n, lapse[n], lapse[from]);
            for (int c = 0; c < curves; c++) {
                for (int m = 0; m < upper[c].length; m++) {
                    Measure measure = measures.get(c).get(m);
                    float reference = measure.reference()[positions[n]];
                    if (measure.factor() == null) {
                        lower(marginHigh, reference, 1, upper[c][m], tiles);
                    } else {
                        lower(scaledHigh, reference, measure.factor()[positions[n]], upper[c][m], tiles);
                    }
                }
            }
        }
        spare(bounds, measures, positions, lapse, from, to);
        for (int n = from; n < to; n++) {
            adjust(bounds, n, lapse[n], lapse[from]);
            for (int c = 0; c < curves; c++) {
                Arrays.fill(excess, 0, tiles, Float.POSITIVE_INFINITY);
                for (int m = 0; m < upper[c].length; m++) {
                    Measure measure = measures.get(c).get(m);
                    float reference = measure.reference()[positions[n]];
                    if (measure.factor() == null) {
                        least(marginLow, reference, 1, upper[c][m], excess, tiles);
                    } else {
                        least(scaledLow, reference, measure.factor()[positions[n]], upper[c][m], excess, tiles);
                    }
                }
                note(excess, kept[c], n, tiles);
            }
        }
    }

    /** Bounds with the height in them; for margins only as far as the lapse rate differs from the first night's, as all have the rest. */
    private void adjust(TileBounds bounds, int night, float lapse, float lapseOfFirst) {
        addHeight(bounds.low(night), bounds.high(night), lapse - lapseOfFirst, bounds.lowGain(), bounds.highGain(), marginLow, marginHigh,
                bounds.tiles());
        addHeight(bounds.low(night), bounds.high(night), lapse, bounds.lowGain(), bounds.highGain(), scaledLow, scaledHigh, bounds.tiles());
    }

    private static void addHeight(float[] low, float[] high, float lapse, float[] lowGain, float[] highGain, float[] outLow,
                                  float[] outHigh, int tiles) {
        for (int t = 0; t < tiles; t++) {
            float a = lapse * lowGain[t];
            float b = lapse * highGain[t];
            outLow[t] = low[t] + Math.min(a, b);
            outHigh[t] = high[t] + Math.max(a, b);
        }
    }

    private static void lower(float[] high, float reference, float factor, float[] upper, int tiles) {
        for (int t = 0; t < tiles; t++) {
            upper[t] = Math.min(upper[t], (high[t] - reference) * factor);
        }
    }

    private static void least(float[] low, float reference, float factor, float[] upper, float[] excess, int tiles) {
        for (int t = 0; t < tiles; t++) {
            excess[t] = Math.min(excess[t], (low[t] - reference) * factor - upper[t]);
        }
    }

    /** Also keeps what is not a number. */
    private static void note(float[] excess, long[][] kept, int night, int tiles) {
        for (int t = 0; t < tiles; t++) {
            if (!(excess[t] > 0)) {
                kept[t][night >> 6] |= 1L << night;
            }
        }
    }

    /** Lifts the upper bounds by the slack; where no night has all nodes, every night with a value is kept. */
    private void spare(TileBounds bounds, List<List<Measure>> measures, int[] positions, float[] lapse, int from, int to) {
        float steepest = 0;
        for (int n = from; n < to; n++) {
            steepest = Math.max(steepest, Math.abs(lapse[n]));
        }
        for (int c = 0; c < curves; c++) {
            for (int m = 0; m < upper[c].length; m++) {
                Measure measure = measures.get(c).get(m);
                float reference = 0;
                float factor = measure.factor() == null ? 1 : 0;
                for (int n = from; n < to; n++) {
                    float here = Math.abs(measure.reference()[positions[n]]);
                    // Infinite on nights without hardiness, which never lower anything.
                    reference = here < Float.POSITIVE_INFINITY ? Math.max(reference, here) : reference;
                    factor = measure.factor() == null ? 1 : Math.max(factor, measure.factor()[positions[n]]);
                }
                for (int t = 0; t < bounds.tiles(); t++) {
                    float gain = Math.max(Math.abs(bounds.lowGain()[t]), Math.abs(bounds.highGain()[t]));
                    slack[c][m][t] = SLACK * factor * (bounds.largest(t) + steepest * gain + reference);
                    upper[c][m][t] = upper[c][m][t] == Float.POSITIVE_INFINITY ? Float.MAX_VALUE : upper[c][m][t] + slack[c][m][t];
                }
            }
        }
    }

    /**
     * Leaves out, in one tile, further nights of from..to-1 that were marked.
     *
     * @param values source values; those of night {@code n} begin at {@code offsets[n]}
     * @param sourceColumns columns of the source
     */
    void refine(int t, TileBounds bounds, List<List<Measure>> measures, int[] positions, float[] lapse, int from, int to, float[] values,
                int[] offsets, int sourceColumns) {
        refinement.begin(t, bounds, lapse, positions);
        for (int n = next(t, from); n >= 0 && n < to; n = next(t, n + 1)) {
            if (bounds.high(n)[t] < Float.POSITIVE_INFINITY) {
                refinement.add(n, values, offsets[n], sourceColumns);
            }
        }
        for (int c = 0; c < curves; c++) {
            refinement.thin(kept[c][t], measures.get(c), slack[c], t);
        }
    }
}
