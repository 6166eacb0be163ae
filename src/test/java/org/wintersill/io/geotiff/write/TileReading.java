package org.wintersill.io.geotiff.write;

import java.util.zip.DataFormatException;
import java.util.zip.Inflater;
import org.wintersill.layer.SampleType;

/** Undoes what {@link TileCodec} does. */
final class TileReading {
    private static final int TILE = PyramidLevel.TILE;

    private final SampleType type;
    private final byte[] raw;
    private final byte[] planes = new byte[4 * TILE];

    TileReading(SampleType type) {
        this.type = type;
        raw = new byte[TILE * TILE * type.bytes()];
    }

    /**
     * Reads a tile that {@link TileCodec#pack} made.
     *
     * @param bytes compressed tile
     * @param count number of bytes
     * @param values receives {@code [row * 256 + column]}, NaN for missing
     */
    void unpack(byte[] bytes, int count, float[] values) {
        Inflater inflater = new Inflater();
        try {
            inflater.setInput(bytes, 0, count);
            if (inflater.inflate(raw) != raw.length) {
                throw new AssertionError("the tile is too short");
            }
        } catch (DataFormatException e) {
            throw new AssertionError("the tile is damaged", e);
        } finally {
            inflater.end();
        }
        for (int row = 0; row < TILE; row++) {
            switch (type) {
                case FLOAT32 -> readFloats(values, row * TILE);
                case INT16 -> readShorts(values, row * TILE);
                case BYTE -> readBytes(values, row * TILE);
            }
        }
    }

    private void readFloats(float[] values, int start) {
        byte sum = 0;
        for (int i = 0; i < planes.length; i++) {
            sum += raw[4 * start + i];
            planes[i] = sum;
        }
        for (int i = 0; i < TILE; i++) {
            float value = Float.intBitsToFloat(planes[i] << 24 | (planes[TILE + i] & 255) << 16
                    | (planes[2 * TILE + i] & 255) << 8 | planes[3 * TILE + i] & 255);
            values[start + i] = value == type.nodata() ? Float.NaN : value;
        }
    }

    private void readShorts(float[] values, int start) {
        short value = 0;
        for (int i = start; i < start + TILE; i++) {
            value += (short) (raw[2 * i] & 255 | raw[2 * i + 1] << 8);
            values[i] = value == type.nodata() ? Float.NaN : value;
        }
    }

    private void readBytes(float[] values, int start) {
        for (int i = start; i < start + TILE; i++) {
            values[i] = raw[i] == type.nodata() ? Float.NaN : raw[i] & 255;
        }
    }
}
