package org.wintersill.climatology.extreme;

/**
 * Random numbers that depend on a key alone, so that no order of work shows in them: SplitMix64 (Steele, Lea and Flood 2014,
 * OOPSLA, from memory; the same numbers as the JDK's {@code SplittableRandom} of that seed), begun at a mixture of run seed, cell
 * and replicate.
 */
public final class RandomStream {
    private static final long GOLDEN_GAMMA = 0x9e3779b97f4a7c15L;
    private static final double TWO_TO_MINUS_53 = 0x1.0p-53;

    private long state;

    RandomStream(long state) {
        this.state = state;
    }

    /** The stream of a replicate in a cell. */
    public static RandomStream of(long seed, long cell, long replicate) {
        return new RandomStream(mix(mix(mix(seed) + cell) + replicate));
    }

    /** The next 64 bits. */
    public long nextLong() {
        state += GOLDEN_GAMMA;
        return mix(state);
    }

    private static long mix(long z) {
        long a = (z ^ (z >>> 30)) * 0xbf58476d1ce4e5b9L;
        long b = (a ^ (a >>> 27)) * 0x94d049bb133111ebL;
        return b ^ (b >>> 31);
    }

    /** Uniform in (0, 1], so that its logarithm exists. */
    public double nextUniform() {
        return ((nextLong() >>> 11) + 1) * TWO_TO_MINUS_53;
    }

    /** A whole number from 0 to bound - 1; the bias for bounds of winters is below 1e-7. */
    public int nextInt(int bound) {
        return (int) ((nextLong() >>> 32) * bound >>> 32);
    }

    /**
     * Fills an array with a sorted sample of standard exponentials, descending, without sorting: the gaps between order statistics
     * are exponential themselves (Rényi 1953, from memory).
     */
    public void descendingExponentials(double[] out, int n) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum -= Math.log(nextUniform()) / (n - i);
            out[n - 1 - i] = sum;
        }
    }
}
