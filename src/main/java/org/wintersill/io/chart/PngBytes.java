package org.wintersill.io.chart;

import java.io.ByteArrayOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.zip.CRC32;
import java.util.zip.Deflater;
import java.util.zip.DeflaterOutputStream;

/**
 * PNG files of opaque pixels (ISO/IEC 15948: 8-bit RGB, filter "sub", international text chunks). Our own, since {@code ImageIO}
 * stumbles over the plug-ins that are merged into the program's jar.
 */
public final class PngBytes {
    private static final byte[] SIGNATURE = {(byte) 0x89, 'P', 'N', 'G', 0x0d, 0x0a, 0x1a, 0x0a};
    private static final byte FILTER_SUB = 1;
    private static final int SAMPLES = 3;

    private PngBytes() {
    }

    /**
     * The bytes of a file.
     *
     * @param rgb {@code [row * width + column]}, 0xRRGGBB
     * @param texts keyword, such as {@code Title}, and text
     */
    public static byte[] of(int width, int height, int[] rgb, Map<String, String> texts) {
        try {
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            DataOutputStream out = new DataOutputStream(bytes);
            out.write(SIGNATURE);
            chunk(out, "IHDR", header(width, height));
            for (Map.Entry<String, String> text : texts.entrySet()) {
                chunk(out, "iTXt", (text.getKey() + "\0\0\0\0\0" + text.getValue()).getBytes(StandardCharsets.UTF_8));
            }
            chunk(out, "IDAT", pixels(width, height, rgb));
            chunk(out, "IEND", new byte[0]);
            return bytes.toByteArray();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static byte[] header(int width, int height) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        DataOutputStream out = new DataOutputStream(bytes);
        out.writeInt(width);
        out.writeInt(height);
        out.write(new byte[] {8, 2, 0, 0, 0});
        return bytes.toByteArray();
    }

    private static byte[] pixels(int width, int height, int[] rgb) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        Deflater deflater = new Deflater(Deflater.BEST_COMPRESSION);
        try (DeflaterOutputStream out = new DeflaterOutputStream(bytes, deflater)) {
            byte[] line = new byte[1 + SAMPLES * width];
            line[0] = FILTER_SUB;
            for (int row = 0; row < height; row++) {
                int before = 0;
                for (int column = 0; column < width; column++) {
                    int pixel = rgb[row * width + column];
                    for (int sample = 0; sample < SAMPLES; sample++) {
                        int shift = 8 * (SAMPLES - 1 - sample);
                        line[1 + SAMPLES * column + sample] = (byte) ((pixel >> shift & 0xff) - (before >> shift & 0xff));
                    }
                    before = pixel;
                }
                out.write(line);
            }
        } finally {
            deflater.end();
        }
        return bytes.toByteArray();
    }

    private static void chunk(DataOutputStream out, String type, byte[] data) throws IOException {
        byte[] name = type.getBytes(StandardCharsets.US_ASCII);
        CRC32 check = new CRC32();
        check.update(name);
        check.update(data);
        out.writeInt(data.length);
        out.write(name);
        out.write(data);
        out.writeInt((int) check.getValue());
    }
}
