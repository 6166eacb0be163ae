package org.wintersill.climatology.statistic;

import java.util.Arrays;
import java.util.concurrent.ConcurrentHashMap;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.Percentiles;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.RandomStream;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Bounds of the expected damage by drawing whole winters with replacement, 1000 times, percentiles (science 6.1). All cells with the same
 * number of winters share the draws, as one drawing of winters is one for the whole map; so neighbouring cells are bounded alike.
 */
final class DamageMeanBound implements ClimatologyStatistic {
    private static final int DRAWS = 1000;
    /** Stands in the place of a cell, so that these draws are no other's. */
    private static final long WHOLE_MAP = -1;

    private final double confidence;
    private final long seed;
    private final boolean upper;
    /** By n: how often each winter is drawn, {@code [draw][winter]}. */
    private final ConcurrentHashMap<Integer, byte[][]> draws;

    private DamageMeanBound(double confidence, long seed, boolean upper, ConcurrentHashMap<Integer, byte[][]> draws) {
        this.confidence = confidence;
        this.seed = seed;
        this.upper = upper;
        this.draws = draws;
    }

    /** Lower and upper bound, which share their draws. */
    static DamageMeanBound[] pair(double confidence, long seed) {
        ConcurrentHashMap<Integer, byte[][]> draws = new ConcurrentHashMap<>();
        return new DamageMeanBound[] {new DamageMeanBound(confidence, seed, false, draws), new DamageMeanBound(confidence, seed, true, draws)};
    }

    private record Key(double confidence) {
    }

    @Override
    public LayerDefinition layer() {
        String side = upper ? "upper" : "lower";
        return new LayerDefinition("damage-mean-" + side, "Expected damage, " + side + " bound",
                "Expected fraction of buds killed in a winter, " + side + " bound (" + Math.round(confidence * 1000) / 10.0
                        + " % two-sided, winters drawn with replacement " + DRAWS + " times)", "1", SampleType.FLOAT32, "", LayerStyles.damage());
    }

    @Override
    public LayerGroup group() {
        return LayerGroup.BOUNDS;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        float[][] bounds = record.derived(new Key(confidence), () -> bounds(record));
        System.arraycopy(bounds[upper ? 1 : 0], from, out, from, to - from);
    }

    private float[][] bounds(WinterRecord record) {
        float[][] bounds = new float[2][record.cells()];
        double[] damage = new double[record.winters()];
        double[] means = new double[DRAWS];
        double tail = (1 - confidence) / 2;
        for (int cell = 0; cell < record.cells(); cell++) {
            int n = WinterRecord.valid(record.expectedDamage(), cell, damage);
            if (n == 0) {
                bounds[0][cell] = Float.NaN;
                bounds[1][cell] = Float.NaN;
                continue;
            }
            byte[][] times = draws.computeIfAbsent(n, this::draw);
            for (int draw = 0; draw < DRAWS; draw++) {
                means[draw] = mean(times[draw], damage, n);
            }
            Arrays.sort(means);
            bounds[0][cell] = (float) Percentiles.type7(means, DRAWS, tail);
            bounds[1][cell] = (float) Percentiles.type7(means, DRAWS, 1 - tail);
        }
        return bounds;
    }

    private static double mean(byte[] times, double[] damage, int n) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += times[i] * damage[i];
        }
        return sum / n;
    }

    private byte[][] draw(int n) {
        byte[][] times = new byte[DRAWS][n];
        for (int draw = 0; draw < DRAWS; draw++) {
            RandomStream random = RandomStream.of(seed, WHOLE_MAP - n, draw);
            for (int i = 0; i < n; i++) {
                int winter = random.nextInt(n);
                times[draw][winter] = (byte) Math.min(Byte.MAX_VALUE, times[draw][winter] + 1);
            }
        }
        return times;
    }
}
