package org.wintersill.io.netcdf;

import java.util.List;

/** Where and how the values of a variable lie in the file. */
sealed interface Storage {

    /**
     * Values one after the other, uncompressed.
     *
     * @param begin position in the file of the first value
     * @param outerStride bytes from one index of the first dimension to the next: more than its values need where
     *                    classic record variables are interleaved
     */
    record Contiguous(long begin, long outerStride) implements Storage {
    }

    /**
     * Values in equal boxes, each compressed by itself.
     *
     * @param chunk lengths of a box, one a dimension
     * @param filters HDF5 filter numbers in the order in which the writer applied them
     * @param index where the boxes are
     */
    record Chunked(int[] chunk, int[] filters, ChunkIndex index) implements Storage {
        static final int DEFLATE = 1;
        static final int SHUFFLE = 2;
        static final int FLETCHER32 = 3;

        /** Names of the filters for people, with a comma before each. */
        String filterNames() {
            StringBuilder names = new StringBuilder();
            for (int filter : filters) {
                names.append(filter == DEFLATE ? ", deflate" : filter == SHUFFLE ? ", shuffle" : ", Fletcher-32");
            }
            return names.toString();
        }

        int cells() {
            int cells = 1;
            for (int length : chunk) {
                cells = Math.multiplyExact(cells, length);
            }
            return cells;
        }
    }

    /** Values that were part of the header. */
    record Inline(byte[] bytes) implements Storage {
    }

    /** Texts instead of numbers, short enough to be kept: names of ensemble members. */
    record Labels(List<String> texts) implements Storage {
    }

    /** Values that cannot be read, and why: a clause for a message. */
    record Unreadable(String reason) implements Storage {
    }
}
