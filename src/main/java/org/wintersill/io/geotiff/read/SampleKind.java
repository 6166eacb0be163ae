package org.wintersill.io.geotiff.read;

import java.nio.ByteBuffer;
import java.util.Optional;

/** Types of stored values: bits a sample and TIFF sample format (1 unsigned, 2 signed, 3 real). */
enum SampleKind {
    UINT8(8, 1, "UInt8"), INT8(8, 2, "Int8"), UINT16(16, 1, "UInt16"), INT16(16, 2, "Int16"), UINT32(32, 1, "UInt32"),
    INT32(32, 2, "Int32"), FLOAT32(32, 3, "Float32"), FLOAT64(64, 3, "Float64"), BIT(1, 1, "1 bit");

    private final int bits;
    private final int format;
    private final String word;

    SampleKind(int bits, int format, String word) {
        this.bits = bits;
        this.format = format;
        this.word = word;
    }

    static Optional<SampleKind> of(int bits, int format) {
        int known = format == 4 || format == 0 ? 1 : format;
        return java.util.Arrays.stream(values()).filter(k -> k.bits == bits && k.format == known).findFirst();
    }

    int bits() {
        return bits;
    }

    /** Bytes a sample; 0 for single bits. */
    int bytes() {
        return bits / 8;
    }

    String word() {
        return word;
    }

    boolean real() {
        return format == 3;
    }

    /** @param at byte position of a sample of whole bytes */
    double get(ByteBuffer raw, int at) {
        return switch (this) {
            case UINT8, BIT -> Byte.toUnsignedInt(raw.get(at));
            case INT8 -> raw.get(at);
            case UINT16 -> Short.toUnsignedInt(raw.getShort(at));
            case INT16 -> raw.getShort(at);
            case UINT32 -> Integer.toUnsignedLong(raw.getInt(at));
            case INT32 -> raw.getInt(at);
            case FLOAT32 -> raw.getFloat(at);
            case FLOAT64 -> raw.getDouble(at);
        };
    }

    /**
     * Many samples at once; a loop for each type, for this is where reading spends its time.
     *
     * @param at byte position of the first sample
     * @param step bytes from one sample to the next
     */
    void get(ByteBuffer raw, int at, int step, double[] out, int count) {
        switch (this) {
            case INT16 -> {
                for (int i = 0; i < count; i++) {
                    out[i] = raw.getShort(at + i * step);
                }
            }
            case FLOAT32 -> {
                for (int i = 0; i < count; i++) {
                    out[i] = raw.getFloat(at + i * step);
                }
            }
            case FLOAT64 -> {
                for (int i = 0; i < count; i++) {
                    out[i] = raw.getDouble(at + i * step);
                }
            }
            default -> {
                for (int i = 0; i < count; i++) {
                    out[i] = get(raw, at + i * step);
                }
            }
        }
    }

    /** A number as this type stores it, for comparison with stored values. */
    double stored(double value) {
        return this == FLOAT32 ? (float) value : value;
    }
}
