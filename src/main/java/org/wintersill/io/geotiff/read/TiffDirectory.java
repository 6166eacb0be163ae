package org.wintersill.io.geotiff.read;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.Map;

/** One image directory: tags whose values are read when they are asked for. */
final class TiffDirectory {
    static final int SUBFILE_TYPE = 254;
    static final int WIDTH = 256;
    static final int LENGTH = 257;
    static final int BITS = 258;
    static final int COMPRESSION = 259;
    static final int PHOTOMETRIC = 262;
    static final int FILL_ORDER = 266;
    static final int DESCRIPTION = 270;
    static final int STRIP_OFFSETS = 273;
    static final int SAMPLES = 277;
    static final int ROWS_PER_STRIP = 278;
    static final int STRIP_COUNTS = 279;
    static final int PLANAR = 284;
    static final int PREDICTOR = 317;
    static final int TILE_WIDTH = 322;
    static final int TILE_LENGTH = 323;
    static final int TILE_OFFSETS = 324;
    static final int TILE_COUNTS = 325;
    static final int SAMPLE_FORMAT = 339;
    static final int PIXEL_SCALE = 33550;
    static final int TIEPOINTS = 33922;
    static final int TRANSFORMATION = 34264;
    static final int GEO_KEYS = 34735;
    static final int GEO_DOUBLES = 34736;
    static final int GEO_ASCII = 34737;
    static final int GDAL_METADATA = 42112;
    static final int GDAL_NODATA = 42113;

    /** Bytes of a value by TIFF field type 0..18. */
    private static final int[] TYPE_BYTES = {0, 1, 1, 2, 4, 8, 1, 1, 2, 4, 8, 4, 8, 4, 0, 0, 8, 8, 8};
    private static final int MOST_VALUE_BYTES = 1 << 28;

    private record Entry(int type, long count, long at, byte[] inline) {
    }

    private final TiffFile file;
    private final Map<Integer, Entry> entries = new HashMap<>();

    TiffDirectory(TiffFile file, ByteBuffer block, int count, boolean big) {
        this.file = file;
        for (int i = 0; i < count; i++) {
            int at = i * (big ? 20 : 12);
            int valueAt = at + (big ? 12 : 8);
            long number = big ? block.getLong(at + 4) : Integer.toUnsignedLong(block.getInt(at + 4));
            byte[] inline = new byte[big ? 8 : 4];
            block.get(valueAt, inline);
            long pointer = big ? block.getLong(valueAt) : Integer.toUnsignedLong(block.getInt(valueAt));
            entries.putIfAbsent(Short.toUnsignedInt(block.getShort(at)),
                    new Entry(Short.toUnsignedInt(block.getShort(at + 2)), number, pointer, inline));
        }
    }

    boolean has(int tag) {
        return entries.containsKey(tag);
    }

    long count(int tag) {
        return has(tag) ? entries.get(tag).count : 0;
    }

    private ByteBuffer bytes(int tag, Entry entry) throws IOException {
        int each = entry.type < TYPE_BYTES.length ? TYPE_BYTES[entry.type] : 0;
        if (each == 0 || entry.count < 0 || entry.count > MOST_VALUE_BYTES / each) {
            throw file.refuse("The TIFF tag " + tag + " is damaged (type " + entry.type + ", " + entry.count + " values)",
                    "Make the file again");
        }
        int length = (int) entry.count * each;
        return length <= entry.inline.length ? ByteBuffer.wrap(entry.inline, 0, length).order(file.order())
                : file.buffer(entry.at, length);
    }

    /** Unsigned whole numbers; empty if the tag is absent. */
    long[] longs(int tag) throws IOException {
        Entry entry = entries.get(tag);
        if (entry == null) {
            return new long[0];
        }
        ByteBuffer buffer = bytes(tag, entry);
        long[] values = new long[(int) entry.count];
        for (int i = 0; i < values.length; i++) {
            values[i] = switch (entry.type) {
                case 1, 7 -> Byte.toUnsignedLong(buffer.get(i));
                case 3 -> Short.toUnsignedLong(buffer.getShort(2 * i));
                case 4, 13 -> Integer.toUnsignedLong(buffer.getInt(4 * i));
                case 16, 17, 18 -> buffer.getLong(8 * i);
                default -> throw file.refuse("The TIFF tag " + tag + " holds no whole numbers (type " + entry.type + ")",
                        "Make the file again");
            };
        }
        return values;
    }

    /** The first whole number of a tag, which must fit an int and not be negative. */
    int number(int tag, int otherwise) throws IOException {
        long[] values = longs(tag);
        if (values.length == 0) {
            return otherwise;
        }
        if (values[0] < 0 || values[0] > Integer.MAX_VALUE) {
            throw file.refuse("The TIFF tag " + tag + " holds " + Long.toUnsignedString(values[0]), "Make the file again");
        }
        return (int) values[0];
    }

    double[] doubles(int tag) throws IOException {
        Entry entry = entries.get(tag);
        if (entry == null) {
            return new double[0];
        }
        if (entry.type != 12 && entry.type != 11) {
            throw file.refuse("The TIFF tag " + tag + " holds no real numbers (type " + entry.type + ")", "Make the file again");
        }
        ByteBuffer buffer = bytes(tag, entry);
        double[] values = new double[(int) entry.count];
        for (int i = 0; i < values.length; i++) {
            values[i] = entry.type == 12 ? buffer.getDouble(8 * i) : buffer.getFloat(4 * i);
        }
        return values;
    }

    /** Text up to the first NUL; empty if the tag is absent. */
    String text(int tag) throws IOException {
        Entry entry = entries.get(tag);
        if (entry == null) {
            return "";
        }
        ByteBuffer buffer = bytes(tag, entry);
        byte[] raw = new byte[buffer.remaining()];
        buffer.get(raw);
        int end = 0;
        while (end < raw.length && raw[end] != 0) {
            end++;
        }
        return new String(raw, 0, end, StandardCharsets.UTF_8);
    }
}
