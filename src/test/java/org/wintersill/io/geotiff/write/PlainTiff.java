package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/**
 * A second reading of TIFF 6.0, BigTIFF and Technical Note 3, kept apart from the code under test: little-endian, tiled,
 * Deflate, planes apart.
 */
public final class PlainTiff {
    private static final int[] TYPE_BYTES = {0, 1, 1, 2, 4, 8, 1, 1, 2, 4, 8, 4, 8, 4, 0, 0, 8, 8, 8};

    /** Tag to its value: long[], double[] or String. */
    public final List<TreeMap<Integer, Object>> directories = new ArrayList<>();
    /** Where each directory begins. */
    final List<Long> starts = new ArrayList<>();
    final boolean big;
    final ByteBuffer bytes;

    public PlainTiff(Path file) throws IOException {
        bytes = ByteBuffer.wrap(Files.readAllBytes(file)).order(ByteOrder.LITTLE_ENDIAN);
        if (bytes.getShort(0) != 0x4949) {
            throw new IOException("not little-endian");
        }
        big = bytes.getShort(2) == 43;
        long at = big ? bytes.getLong(8) : bytes.getInt(4);
        while (at != 0) {
            starts.add(at);
            at = directory((int) at);
        }
    }

    private long directory(int at) throws IOException {
        TreeMap<Integer, Object> tags = new TreeMap<>();
        int count = (int) (big ? bytes.getLong(at) : bytes.getShort(at));
        int entry = at + (big ? 8 : 2);
        int before = -1;
        for (int i = 0; i < count; i++, entry += big ? 20 : 12) {
            int tag = bytes.getShort(entry) & 0xFFFF;
            if (tag <= before) {
                throw new IOException("tags are not in order");
            }
            before = tag;
            tags.put(tag, value(entry));
        }
        directories.add(tags);
        return big ? bytes.getLong(entry) : bytes.getInt(entry) & 0xFFFFFFFFL;
    }

    private Object value(int entry) {
        int type = bytes.getShort(entry + 2);
        int count = (int) (big ? bytes.getLong(entry + 4) : bytes.getInt(entry + 4));
        int at = entry + (big ? 12 : 8);
        if ((long) TYPE_BYTES[type] * count > (big ? 8 : 4)) {
            at = (int) (big ? bytes.getLong(at) : bytes.getInt(at));
        }
        if (type == 2) {
            return new String(bytes.array(), at, count - 1, StandardCharsets.UTF_8);
        }
        if (type == 12) {
            double[] values = new double[count];
            for (int i = 0; i < count; i++) {
                values[i] = bytes.getDouble(at + 8 * i);
            }
            return values;
        }
        long[] values = new long[count];
        for (int i = 0; i < count; i++) {
            int here = at + TYPE_BYTES[type] * i;
            values[i] = switch (TYPE_BYTES[type]) {
                case 2 -> bytes.getShort(here) & 0xFFFF;
                case 4 -> bytes.getInt(here) & 0xFFFFFFFFL;
                default -> bytes.getLong(here);
            };
        }
        return values;
    }

    public long[] numbers(int level, int tag) {
        return (long[]) directories.get(level).get(tag);
    }

    public long number(int level, int tag) {
        return numbers(level, tag)[0];
    }

    public String text(int level, int tag) {
        return (String) directories.get(level).get(tag);
    }

    /** Stored values of a band, {@code [row * columns + column]}, the missing value as it stands in the file. */
    public float[] band(int level, int band) throws DataFormatException {
        int columns = (int) number(level, 256);
        int rows = (int) number(level, 257);
        int side = (int) number(level, 322);
        int size = (int) number(level, 258) / 8;
        int across = (columns + side - 1) / side;
        int tiles = across * ((rows + side - 1) / side);
        float[] values = new float[columns * rows];
        for (int tile = 0; tile < tiles; tile++) {
            int index = band * tiles + tile;
            byte[] raw = new byte[side * side * size];
            Inflater inflater = new Inflater();
            inflater.setInput(bytes.array(), (int) numbers(level, 324)[index], (int) numbers(level, 325)[index]);
            if (inflater.inflate(raw) != raw.length || !inflater.finished()) {
                throw new DataFormatException("tile " + tile + " is not " + raw.length + " bytes");
            }
            inflater.end();
            for (int row = 0; row < side; row++) {
                undo((int) number(level, 317), raw, row * side * size, side, size);
                for (int column = 0; column < side; column++) {
                    int x = tile % across * side + column;
                    int y = tile / across * side + row;
                    if (x < columns && y < rows) {
                        values[y * columns + x] = sample(raw, (row * side + column) * size, size);
                    }
                }
            }
        }
        return values;
    }

    private static void undo(int predictor, byte[] raw, int start, int side, int size) {
        if (predictor == 2) {
            ByteBuffer row = ByteBuffer.wrap(raw, start, side * size).slice().order(ByteOrder.LITTLE_ENDIAN);
            for (int i = 1; i < side; i++) {
                row.putShort(2 * i, (short) (row.getShort(2 * i) + row.getShort(2 * i - 2)));
            }
        } else if (predictor == 3) {
            byte[] planes = new byte[side * size];
            planes[0] = raw[start];
            for (int i = 1; i < planes.length; i++) {
                planes[i] = (byte) (planes[i - 1] + raw[start + i]);
            }
            for (int i = 0; i < side; i++) {
                for (int b = 0; b < size; b++) {
                    raw[start + i * size + size - 1 - b] = planes[b * side + i];
                }
            }
        }
    }

    private static float sample(byte[] raw, int at, int size) {
        ByteBuffer buffer = ByteBuffer.wrap(raw).order(ByteOrder.LITTLE_ENDIAN);
        return switch (size) {
            case 1 -> raw[at] & 255;
            case 2 -> buffer.getShort(at);
            default -> buffer.getFloat(at);
        };
    }
}
