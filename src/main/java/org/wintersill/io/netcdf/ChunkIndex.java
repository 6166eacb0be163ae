package org.wintersill.io.netcdf;

/**
 * Places of the chunks of a variable: {@code [chunk]} in row-major order of the chunk grid. Immutable once filled.
 */
final class ChunkIndex {
    private static final long ABSENT = -1;

    private final int[] counts;
    private final long[] addresses;
    private final int[] sizes;
    private final int[] skippedFilters;

    /** @param counts number of chunks along each dimension; their product was checked by the caller */
    ChunkIndex(int[] counts) {
        this.counts = counts.clone();
        int total = 1;
        for (int count : counts) {
            total = Math.multiplyExact(total, count);
        }
        addresses = new long[total];
        java.util.Arrays.fill(addresses, ABSENT);
        sizes = new int[total];
        skippedFilters = new int[total];
    }

    void put(int chunk, long address, int size, int skipped) {
        addresses[chunk] = address;
        sizes[chunk] = size;
        skippedFilters[chunk] = skipped;
    }

    int total() {
        return addresses.length;
    }

    int count(int dimension) {
        return counts[dimension];
    }

    /** Whether anybody ever wrote the chunk; one that nobody wrote is all fill. */
    boolean present(int chunk) {
        return addresses[chunk] != ABSENT;
    }

    long address(int chunk) {
        return addresses[chunk];
    }

    int size(int chunk) {
        return sizes[chunk];
    }

    /** Bit i is set where filter i was left out for this chunk, as deflate is when it gains nothing. */
    int skippedFilters(int chunk) {
        return skippedFilters[chunk];
    }
}
