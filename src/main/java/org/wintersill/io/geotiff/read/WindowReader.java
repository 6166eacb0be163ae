package org.wintersill.io.geotiff.read;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.util.Arrays;
import org.wintersill.io.geotiff.read.ChunkCodec.DamagedChunk;
import org.wintersill.problem.Problem;

/**
 * Reads windows of an image, chunk after chunk, and gives out each stored value once. Values that the file declares
 * missing (no-data value, internal mask, chunks that were left out, NaN) come as NaN. Used by one thread.
 */
final class WindowReader {
    /** Takes the values of a window, piece of row by piece of row. */
    interface Sink {
        /**
         * @param band position in the list of bands that was asked for
         * @param row row of the file
         * @param column column of the file of the first value
         * @param stored values as stored, before scale and offset; NaN for none; the array is used again afterwards
         * @param count number of values
         */
        void row(int band, int row, int column, double[] stored, int count);
    }

    /** Many programs write the lowest float with few digits; all of them are below this. */
    private static final double LOWEST_FLOATS = -3.4e38;

    private final TiffFile file;
    private final GeotiffHeader header;
    private final ChunkStore values;
    private final ChunkStore maskChunks;
    private final double nodata;
    private final boolean lowest;

    WindowReader(TiffFile file, GeotiffHeader header) {
        this.file = file;
        this.header = header;
        this.values = new ChunkStore(header.image());
        this.maskChunks = header.mask() == null ? null : new ChunkStore(header.mask());
        this.nodata = header.nodata().map(v -> header.image().kind().stored(v)).orElse(Double.NaN);
        this.lowest = header.nodata().filter(v -> v <= LOWEST_FLOATS).isPresent() && header.image().kind().real();
    }

    /**
     * Gives out all values of a window; the order is that of storage.
     *
     * @param bands bands from 0
     * @param row first row of the file
     * @param column first column of the file
     */
    void read(int[] bands, int row, int rows, int column, int columns, Sink sink) {
        TiffImage image = header.image();
        for (int chunkRow = row / image.chunkHeight(); chunkRow * (long) image.chunkHeight() < row + rows; chunkRow++) {
            int top = Math.max(row, chunkRow * image.chunkHeight());
            int bottom = (int) Math.min(row + rows, (chunkRow + 1L) * image.chunkHeight());
            for (int chunkColumn = column / image.chunkWidth(); chunkColumn * (long) image.chunkWidth() < column + columns; chunkColumn++) {
                int left = Math.max(column, chunkColumn * image.chunkWidth());
                int right = (int) Math.min(column + columns, (chunkColumn + 1L) * image.chunkWidth());
                for (int b = 0; b < bands.length; b++) {
                    boolean[] valid = maskChunks == null ? null : mask(bands[b], top, bottom, left, right);
                    give(b, bands[b], chunkRow, chunkColumn, top, bottom, left, right, valid, sink);
                }
            }
        }
    }

    private void give(int position, int band, int chunkRow, int chunkColumn, int top, int bottom, int left, int right,
                      boolean[] valid, Sink sink) {
        TiffImage image = header.image();
        SampleKind kind = image.kind();
        ByteBuffer raw = values.chunk(image.chunkIndex(band, chunkRow, chunkColumn), chunkRow);
        int stride = image.samplesPerChunk() * kind.bytes();
        int inChunk = image.separate() ? 0 : band * kind.bytes();
        int count = right - left;
        double[] stored = new double[count];
        for (int row = top; row < bottom; row++) {
            if (raw == null) {
                Arrays.fill(stored, Double.NaN);
            } else {
                int rowStart = (row - chunkRow * image.chunkHeight()) * (int) image.rowBytes() + inChunk;
                kind.get(raw, rowStart + (left - chunkColumn * image.chunkWidth()) * stride, stride, stored, count);
                for (int i = 0; i < count; i++) {
                    if (stored[i] == nodata || lowest && stored[i] <= LOWEST_FLOATS || valid != null && !valid[(row - top) * count + i]) {
                        stored[i] = Double.NaN;
                    }
                }
            }
            sink.row(position, row, left, stored, count);
        }
    }

    /** {@code [row][column]} of the window, flat: true where the mask lets values through. */
    private boolean[] mask(int band, int top, int bottom, int left, int right) {
        TiffImage mask = header.mask();
        boolean[] valid = new boolean[(bottom - top) * (right - left)];
        int sample = Math.min(band, mask.samples() - 1);
        for (int row = top; row < bottom; row++) {
            int chunkRow = row / mask.chunkHeight();
            for (int column = left; column < right; column++) {
                int chunkColumn = column / mask.chunkWidth();
                ByteBuffer raw = maskChunks.chunk(mask.chunkIndex(sample, chunkRow, chunkColumn), chunkRow);
                if (raw != null) {
                    int rowStart = (row - chunkRow * mask.chunkHeight()) * (int) mask.rowBytes();
                    int inRow = column - chunkColumn * mask.chunkWidth();
                    valid[(row - top) * (right - left) + column - left] = mask.kind() == SampleKind.BIT
                            ? (raw.get(rowStart + inRow / 8) >> 7 - inRow % 8 & 1) != 0
                            : raw.get(rowStart + inRow * mask.samplesPerChunk() + (mask.separate() ? 0 : sample)) != 0;
                }
            }
        }
        return valid;
    }

    /** The chunk used last, unpacked; neighbours in a window mostly lie in the same. */
    private final class ChunkStore {
        private final TiffImage image;
        private int held = -1;
        private ByteBuffer raw;

        ChunkStore(TiffImage image) {
            this.image = image;
        }

        /** Null for a chunk that the file leaves out. */
        ByteBuffer chunk(int index, int chunkRow) {
            if (index != held) {
                held = -1;
                raw = unpack(index, chunkRow);
                held = index;
            }
            return raw;
        }

        private ByteBuffer unpack(int index, int chunkRow) {
            if (image.offsets()[index] == 0 || image.counts()[index] == 0) {
                return null;
            }
            int rows = image.rowsIn(chunkRow);
            try {
                if (image.counts()[index] > Integer.MAX_VALUE - 16) {
                    throw new DamagedChunk(image.counts()[index] + " bytes long");
                }
                byte[] packed = file.read(image.offsets()[index], (int) image.counts()[index]);
                byte[] plain = ChunkCodec.unpack(image.compression(), packed, rows * (int) image.rowBytes());
                Predictors.undo(image, plain, rows, file.order());
                return ByteBuffer.wrap(plain).order(file.order());
            } catch (DamagedChunk | IOException e) {
                throw Problem.input((image.tiled() ? "Tile " : "Strip ") + index + " of the file is damaged: " + e.getMessage(),
                        file.path().toString(), "Fetch or make the file again").asException(e);
            }
        }
    }
}
