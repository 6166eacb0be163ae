package org.wintersill.io.geotiff.read;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/**
 * Undoes the differences that were taken before compression, in place: predictor 2 (TIFF 6.0 section 14, differences of
 * whole numbers of the sample's size, in the file's byte order) and predictor 3 (TIFF technical note 3: byte planes of
 * reals, most significant first whatever the byte order, then byte differences).
 *
 * <p>libtiff on little-endian machines writes the planes of big-endian files the other way round. Such files cannot be told
 * from right ones by their tags, so a chunk is turned when that makes more of its values ordinary numbers.
 */
final class Predictors {
    private Predictors() {
    }

    /** @param rows rows in the chunk */
    static void undo(TiffImage image, byte[] raw, int rows, ByteOrder order) {
        if (image.predictor() == 1) {
            return;
        }
        int rowBytes = (int) image.rowBytes();
        byte[] spare = image.predictor() == 3 ? new byte[rowBytes] : null;
        ByteBuffer buffer = ByteBuffer.wrap(raw).order(order);
        for (int row = 0; row < rows; row++) {
            if (image.predictor() == 2) {
                sum(buffer, row * rowBytes, rowBytes, image.samplesPerChunk(), image.kind().bytes());
            } else {
                planes(raw, row * rowBytes, rowBytes, image.samplesPerChunk(), image.kind().bytes(), order, spare);
            }
        }
        if (image.predictor() == 3 && order == ByteOrder.BIG_ENDIAN
                && ordinary(image.kind(), raw, rows * rowBytes, ByteOrder.LITTLE_ENDIAN) > ordinary(image.kind(), raw, rows * rowBytes, order)) {
            turn(raw, rows * rowBytes, image.kind().bytes());
        }
    }

    /** Number of values that data are likely to hold: zero, missing, or of a middling size. */
    private static int ordinary(SampleKind kind, byte[] raw, int length, ByteOrder order) {
        ByteBuffer buffer = ByteBuffer.wrap(raw).order(order);
        int count = 0;
        for (int i = 0; i < length; i += kind.bytes()) {
            double size = Math.abs(kind.get(buffer, i));
            count += size > 1e-9 && size < 1e9 || size == 0 || !(size < 3e38) ? 1 : 0;
        }
        return count;
    }

    private static void turn(byte[] raw, int length, int bytes) {
        for (int i = 0; i < length; i += bytes) {
            for (int low = i, high = i + bytes - 1; low < high; low++, high--) {
                byte held = raw[low];
                raw[low] = raw[high];
                raw[high] = held;
            }
        }
    }

    private static void sum(ByteBuffer b, int start, int length, int stride, int bytes) {
        int step = stride * bytes;
        int end = start + length - bytes;
        switch (bytes) {
            case 1 -> {
                for (int i = start + step; i <= end; i++) {
                    b.put(i, (byte) (b.get(i) + b.get(i - step)));
                }
            }
            case 2 -> {
                for (int i = start + step; i <= end; i += 2) {
                    b.putShort(i, (short) (b.getShort(i) + b.getShort(i - step)));
                }
            }
            case 4 -> {
                for (int i = start + step; i <= end; i += 4) {
                    b.putInt(i, b.getInt(i) + b.getInt(i - step));
                }
            }
            default -> {
                for (int i = start + step; i <= end; i += 8) {
                    b.putLong(i, b.getLong(i) + b.getLong(i - step));
                }
            }
        }
    }

    private static void planes(byte[] raw, int start, int length, int stride, int bytes, ByteOrder order, byte[] spare) {
        if (stride == 1) {
            // The sum stays in a register: through the array each byte would wait for the one before to be stored.
            byte sum = 0;
            for (int i = 0; i < length; i++) {
                sum += raw[start + i];
                spare[i] = sum;
            }
        } else {
            for (int i = start + stride; i < start + length; i++) {
                raw[i] += raw[i - stride];
            }
            System.arraycopy(raw, start, spare, 0, length);
        }
        int count = length / bytes;
        if (bytes == 4 && order == ByteOrder.LITTLE_ENDIAN) {
            for (int i = 0; i < count; i++) {
                int at = start + 4 * i;
                raw[at] = spare[3 * count + i];
                raw[at + 1] = spare[2 * count + i];
                raw[at + 2] = spare[count + i];
                raw[at + 3] = spare[i];
            }
            return;
        }
        for (int i = 0; i < count; i++) {
            for (int plane = 0; plane < bytes; plane++) {
                int place = order == ByteOrder.BIG_ENDIAN ? plane : bytes - 1 - plane;
                raw[start + i * bytes + place] = spare[plane * count + i];
            }
        }
    }
}
