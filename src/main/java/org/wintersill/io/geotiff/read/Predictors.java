package org.wintersill.io.geotiff.read;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/**
 * Undoes the differences that were taken before compression, in place: predictor 2 (TIFF 6.0 section 14, differences of
 * whole numbers of the sample's size, in the file's byte order) and predictor 3 (TIFF technical note 3: byte planes of
 * reals, most significant first whatever the byte order, then byte differences).
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
        for (int i = start + stride; i < start + length; i++) {
            raw[i] += raw[i - stride];
        }
        System.arraycopy(raw, start, spare, 0, length);
        int count = length / bytes;
        for (int i = 0; i < count; i++) {
            for (int plane = 0; plane < bytes; plane++) {
                int place = order == ByteOrder.BIG_ENDIAN ? plane : bytes - 1 - plane;
                raw[start + i * bytes + place] = spare[plane * count + i];
            }
        }
    }
}
