package org.wintersill.io.geotiff.write;

import java.util.zip.Deflater;
import org.wintersill.layer.SampleType;

/**
 * Turns one tile of values into compressed bytes. Used by one thread at a time; closing frees the native memory of
 * the compressor.
 *
 * <p>Predictors: 3 for floats (a row becomes its four byte planes, most significant first, each byte less the one before;
 * TIFF Technical Note 3), 2 for 16-bit integers (each value less the one before it in its row; TIFF 6.0, section 14), none
 * for bytes.
 */
final class TileCodec implements AutoCloseable {
    /**
     * Effort of the compressor. On margins that are smooth but for the terrain, effort 3 saves 2 % of the bytes for a fifth
     * of the speed, effort 6 saves 4 % for more than half of it. See {@code TileCodecBenchmark}.
     */
    static final int EFFORT = 1;
    /**
     * Share of repeated bytes below which only their frequencies are used. Winter margins and damages have 14 to 18 %, where that costs
     * 2 to 4 % of the bytes; means over winters 25 to 29 %, where it would cost 9 to 13 %.
     */
    private static final double NOISE = 0.2;
    private static final int TILE = PyramidLevel.TILE;

    private final SampleType type;
    private final byte[] raw;
    private final byte[] packed;
    private final Deflater deflater;
    /** For tiles in which hardly a byte repeats: searching for repetitions takes half of the time and saves 2 to 4 % of the bytes. */
    private final Deflater noise;
    private int length;

    TileCodec(SampleType type) {
        this(type, EFFORT);
    }

    TileCodec(SampleType type, int effort) {
        this.type = type;
        raw = new byte[TILE * TILE * type.bytes()];
        packed = new byte[(int) largest(type)];
        deflater = new Deflater(effort);
        noise = new Deflater(effort);
        noise.setStrategy(Deflater.HUFFMAN_ONLY);
    }

    /** Most bytes that a tile of the type can have: stored blocks cost five bytes each 16 KiB, the frame a few more. */
    static long largest(SampleType type) {
        long bytes = (long) TILE * TILE * type.bytes();
        return bytes + bytes / 1000 + 64;
    }

    /** Predictor of tag 317. */
    static int predictor(SampleType type) {
        return switch (type) {
            case FLOAT32 -> 3;
            case INT16 -> 2;
            case BYTE -> 1;
        };
    }

    /** Bytes of the last {@link #pack}; valid up to {@link #length} until the next one. */
    byte[] packed() {
        return packed;
    }

    int length() {
        return length;
    }

    /**
     * Compresses a tile.
     *
     * @param values {@code [row * 256 + column]}, NaN for missing; not changed
     * @throws IllegalArgumentException when a value does not fit an integer type
     */
    void pack(float[] values) {
        for (int row = 0; row < TILE; row++) {
            switch (type) {
                case FLOAT32 -> floatRow(values, row * TILE);
                case INT16 -> shortRow(values, row * TILE);
                case BYTE -> byteRow(values, row * TILE);
            }
        }
        Deflater chosen = repeated(raw) < NOISE * raw.length ? noise : deflater;
        chosen.reset();
        chosen.setInput(raw);
        chosen.finish();
        length = 0;
        while (!chosen.finished() && length < packed.length) {
            length += chosen.deflate(packed, length, packed.length - length);
        }
        if (!chosen.finished()) {
            throw new IllegalStateException("a compressed tile outgrew its bound of " + packed.length + " bytes");
        }
    }

    /** Number of bytes that equal the one before. */
    private static int repeated(byte[] bytes) {
        int count = 0;
        for (int i = 1; i < bytes.length; i++) {
            count += bytes[i] == bytes[i - 1] ? 1 : 0;
        }
        return count;
    }

    private void floatRow(float[] values, int start) {
        int to = start * 4;
        for (int i = 0; i < TILE; i++) {
            float value = values[start + i];
            int bits = Float.floatToRawIntBits(value == value ? value : type.nodata());
            raw[to + i] = (byte) (bits >>> 24);
            raw[to + TILE + i] = (byte) (bits >>> 16);
            raw[to + 2 * TILE + i] = (byte) (bits >>> 8);
            raw[to + 3 * TILE + i] = (byte) bits;
        }
        for (int i = to + 4 * TILE - 1; i > to; i--) {
            raw[i] -= raw[i - 1];
        }
    }

    private void shortRow(float[] values, int start) {
        int before = 0;
        for (int i = start; i < start + TILE; i++) {
            int value = whole(values[i], Short.MIN_VALUE, Short.MAX_VALUE);
            int difference = value - before;
            raw[2 * i] = (byte) difference;
            raw[2 * i + 1] = (byte) (difference >> 8);
            before = value;
        }
    }

    private void byteRow(float[] values, int start) {
        for (int i = start; i < start + TILE; i++) {
            raw[i] = (byte) whole(values[i], 0, 255);
        }
    }

    private int whole(float value, int lowest, int highest) {
        if (value != value) {
            return type.nodata();
        }
        int whole = (int) value;
        if (whole != value || whole < lowest || whole > highest) {
            throw new IllegalArgumentException(value + " is not a whole number of type " + type);
        }
        return whole;
    }

    @Override
    public void close() {
        deflater.end();
        noise.end();
    }
}
