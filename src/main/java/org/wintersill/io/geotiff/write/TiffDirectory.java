package org.wintersill.io.geotiff.write;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.TreeMap;

/**
 * One image file directory (TIFF 6.0, section 2) with its long values right behind it. Tags are sorted, texts are UTF-8 with
 * a final NUL.
 */
final class TiffDirectory {
    private static final int ASCII = 2;
    private static final int SHORT = 3;
    private static final int LONG = 4;
    private static final int DOUBLE = 12;
    private static final int LONG8 = 16;

    private record Field(int type, int count, byte[] bytes) {
    }

    private final Map<Integer, Field> fields = new TreeMap<>();

    TiffDirectory shorts(int tag, int... values) {
        ByteBuffer buffer = room(2 * values.length);
        for (int value : values) {
            buffer.putShort((short) value);
        }
        return put(tag, SHORT, values.length, buffer);
    }

    TiffDirectory longs(int tag, int... values) {
        ByteBuffer buffer = room(4 * values.length);
        for (int value : values) {
            buffer.putInt(value);
        }
        return put(tag, LONG, values.length, buffer);
    }

    TiffDirectory doubles(int tag, double... values) {
        ByteBuffer buffer = room(8 * values.length);
        for (double value : values) {
            buffer.putDouble(value);
        }
        return put(tag, DOUBLE, values.length, buffer);
    }

    /** A text; a NUL within it would end it early and becomes a blank. */
    TiffDirectory text(int tag, String text) {
        byte[] bytes = text.replace('\0', ' ').getBytes(StandardCharsets.UTF_8);
        return put(tag, ASCII, bytes.length + 1, room(bytes.length + 1).put(bytes));
    }

    /** Positions in the file: 4 bytes each in a classic file, 8 in a BigTIFF. */
    TiffDirectory positions(int tag, long[] values, boolean big) {
        ByteBuffer buffer = room(Math.multiplyExact(values.length, big ? 8 : 4));
        for (long value : values) {
            if (big) {
                buffer.putLong(value);
            } else {
                buffer.putInt((int) value);
            }
        }
        return put(tag, big ? LONG8 : LONG, values.length, buffer);
    }

    private static ByteBuffer room(int bytes) {
        return ByteBuffer.allocate(bytes).order(ByteOrder.LITTLE_ENDIAN);
    }

    private TiffDirectory put(int tag, int type, int count, ByteBuffer buffer) {
        fields.put(tag, new Field(type, count, buffer.array()));
        return this;
    }

    /** Bytes of the directory with its long values. */
    long size(boolean big) {
        long size = big ? 16 + 20L * fields.size() : 6 + 12L * fields.size();
        size = even(size);
        for (Field field : fields.values()) {
            if (field.bytes.length > (big ? 8 : 4)) {
                size += even(field.bytes.length);
            }
        }
        return size;
    }

    /**
     * Appends the directory.
     *
     * @param to receives {@link #size} bytes
     * @param start position in the file of the first of them; even
     * @param next position of the next directory, 0 if there is none
     */
    void append(ByteBuffer to, long start, long next, boolean big) {
        int inline = big ? 8 : 4;
        long fixed = even(big ? 16 + 20L * fields.size() : 6 + 12L * fields.size());
        long value = start + fixed;
        int begin = to.position();
        number(to, fields.size(), big ? 8 : 2);
        for (Map.Entry<Integer, Field> entry : fields.entrySet()) {
            Field field = entry.getValue();
            to.putShort((short) (int) entry.getKey()).putShort((short) field.type);
            number(to, field.count, inline);
            if (field.bytes.length > inline) {
                number(to, value, inline);
                value += even(field.bytes.length);
            } else {
                to.put(field.bytes).put(new byte[inline - field.bytes.length]);
            }
        }
        number(to, next, inline);
        to.put(new byte[(int) (fixed - (to.position() - begin))]);
        for (Field field : fields.values()) {
            if (field.bytes.length > inline) {
                to.put(field.bytes).put(new byte[field.bytes.length % 2]);
            }
        }
    }

    private static void number(ByteBuffer to, long value, int bytes) {
        switch (bytes) {
            case 2 -> to.putShort((short) value);
            case 4 -> to.putInt((int) value);
            default -> to.putLong(value);
        }
    }

    private static long even(long size) {
        return size + size % 2;
    }
}
