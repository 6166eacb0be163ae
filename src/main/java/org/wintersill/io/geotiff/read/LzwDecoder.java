package org.wintersill.io.geotiff.read;

import org.wintersill.io.geotiff.read.ChunkCodec.DamagedChunk;

/**
 * LZW as TIFF 6.0 section 13 has it: codes of 9 to 12 bits, highest bit first, one code earlier than in GIF.
 * The table keeps for each code its last byte, its prefix and its length; strings are written from their end.
 */
final class LzwDecoder {
    private static final int CLEAR = 256;
    private static final int END = 257;
    private static final int FIRST = 258;
    private static final int TABLE = 4096;

    private LzwDecoder() {
    }

    static byte[] decode(byte[] packed, int length) throws DamagedChunk {
        // A code of 12 bits stands for at most 4096 bytes.
        if (length / (TABLE * 2 / 3 + 1) > packed.length + 1) {
            throw new DamagedChunk(packed.length + " bytes cannot hold " + length);
        }
        byte[] out = new byte[length];
        int[] prefix = new int[TABLE];
        byte[] last = new byte[TABLE];
        byte[] start = new byte[TABLE];
        int[] size = new int[TABLE];
        for (int i = 0; i < CLEAR; i++) {
            last[i] = (byte) i;
            start[i] = (byte) i;
            size[i] = 1;
        }
        int next = FIRST;
        int width = 9;
        int previous = -1;
        int bits = 0;
        int held = 0;
        int from = 0;
        int at = 0;
        while (at < length) {
            while (bits < width) {
                if (from >= packed.length) {
                    throw new DamagedChunk("it ends after " + at + " of " + length + " bytes");
                }
                held = held << 8 | packed[from++] & 0xff;
                bits += 8;
            }
            int code = held >>> bits - width & (1 << width) - 1;
            bits -= width;
            held &= (1 << bits) - 1;
            if (code == END) {
                throw new DamagedChunk("it ends after " + at + " of " + length + " bytes");
            }
            if (code == CLEAR) {
                next = FIRST;
                width = 9;
                previous = -1;
                continue;
            }
            if (code > next || code == next && previous < 0 || code >= CLEAR && code < FIRST || code >= TABLE) {
                throw new DamagedChunk("LZW code " + code + " is not in the table");
            }
            if (previous >= 0 && next < TABLE) {
                prefix[next] = previous;
                start[next] = start[previous];
                last[next] = code == next ? start[previous] : start[code];
                size[next] = size[previous] + 1;
                next++;
            } else if (code >= next) {
                throw new DamagedChunk("LZW code " + code + " is not in the table");
            }
            at = write(out, at, code, prefix, last, size);
            previous = code;
            if (next + 1 >= 1 << width && width < 12) {
                width++;
            }
        }
        return out;
    }

    private static int write(byte[] out, int at, int code, int[] prefix, byte[] last, int[] size) {
        int end = at + size[code];
        int c = code;
        for (int i = end - 1; i >= at; i--) {
            if (i < out.length) {
                out[i] = last[c];
            }
            c = prefix[c];
        }
        return Math.min(end, out.length);
    }
}
