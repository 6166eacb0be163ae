package org.wintersill.engine;

import java.util.List;
import org.wintersill.elevation.TargetTile;
import org.wintersill.season.NightCurve.Measure;

/**
 * Compares marked nights of one tile node by node: the second, sharper question of {@link NightSelection}. Room of one worker.
 */
final class NightRefinement {
    private static final int MOST_NODES = 64;

    private final int[] nights;
    private final float[][] temperatures;
    private final double[] means;
    private final boolean[] takesPart;
    private final int[] nodeOffsets = new int[MOST_NODES];
    private int nodes;
    private int count;
    private double lowGain;
    private double highGain;
    private float[] lapse;
    private int[] positions;
    private TargetTile tile;

    NightRefinement(int mostNights) {
        nights = new int[mostNights];
        temperatures = new float[mostNights][];
        means = new double[mostNights];
        takesPart = new boolean[mostNights];
    }

    void begin(int t, TileBounds bounds, float[] lapseOfNight, int[] positionOfNight) {
        tile = bounds.tile(t);
        lapse = lapseOfNight;
        positions = positionOfNight;
        lowGain = bounds.lowGain()[t];
        highGain = bounds.highGain()[t];
        count = 0;
        nodes = 0;
        for (int node = 0; node < tile.nodes(); node++) {
            if ((bounds.seen(t) >>> node & 1) != 0) {
                nodeOffsets[nodes++] = node;
            }
        }
    }

    /** Takes a night all of whose seen nodes have a value. */
    void add(int night, float[] values, int offset, int sourceColumns) {
        if (temperatures[count] == null) {
            temperatures[count] = new float[MOST_NODES];
        }
        float[] here = temperatures[count];
        double sum = 0;
        for (int v = 0; v < nodes; v++) {
            int node = nodeOffsets[v];
            here[v] = values[offset + (tile.sourceRow() + node / tile.sourceColumns()) * sourceColumns + tile.sourceColumn()
                    + node % tile.sourceColumns()];
            sum += here[v];
        }
        means[count] = sum / nodes;
        nights[count++] = night;
    }

    /**
     * Takes the nights that are beaten in every measure out of {@code kept}; a night that beats others stays.
     *
     * @param slack {@code [measure][tile]}
     */
    void thin(long[] kept, List<Measure> measures, float[][] slack, int t) {
        int left = 0;
        for (int k = 0; k < count; k++) {
            takesPart[k] = (kept[nights[k] >> 6] >>> nights[k] & 1) != 0;
            left += takesPart[k] ? 1 : 0;
        }
        if (left < 2) {
            return;
        }
        int[] best = new int[measures.size()];
        for (int m = 0; m < best.length; m++) {
            best[m] = coldest(measures.get(m));
        }
        for (int k = 0; k < count; k++) {
            if (!takesPart[k]) {
                continue;
            }
            boolean beaten = true;
            for (int m = 0; m < best.length && beaten; m++) {
                beaten = k != best[m] && leastExcess(k, best[m], measures.get(m)) > slack[m][t];
            }
            if (beaten) {
                kept[nights[k] >> 6] &= ~(1L << nights[k]);
            }
        }
    }

    /** The night with the lowest measure in the middle of the tile. */
    private int coldest(Measure measure) {
        int best = -1;
        double lowest = Double.POSITIVE_INFINITY;
        for (int k = 0; k < count; k++) {
            if (takesPart[k]) {
                double value = (means[k] + lapse[nights[k]] * (lowGain + highGain) / 2 - reference(measure, k)) * factor(measure, k);
                if (value < lowest || best < 0) {
                    lowest = value;
                    best = k;
                }
            }
        }
        return best;
    }

    /** By how much the measure of night a exceeds that of night b at least, anywhere in the tile. */
    private double leastExcess(int a, int b, Measure measure) {
        double fa = factor(measure, a);
        double fb = factor(measure, b);
        float[] ta = temperatures[a];
        float[] tb = temperatures[b];
        double least = Double.POSITIVE_INFINITY;
        for (int v = 0; v < nodes; v++) {
            least = Math.min(least, ta[v] * fa - tb[v] * fb);
        }
        double slope = lapse[nights[a]] * fa - lapse[nights[b]] * fb;
        return least + Math.min(slope * lowGain, slope * highGain) - (reference(measure, a) * fa - reference(measure, b) * fb);
    }

    private double reference(Measure measure, int k) {
        return measure.reference()[positions[nights[k]]];
    }

    private double factor(Measure measure, int k) {
        return measure.factor() == null ? 1 : measure.factor()[positions[nights[k]]];
    }
}
