package org.wintersill.io.geotiff.read;

import io.airlift.compress.zstd.ZstdDecompressor;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/** Unpacks the compressions of TIFF chunks. All methods throw {@link DamagedChunk} for bytes that do not unpack. */
final class ChunkCodec {
    private static final int NONE = 1;
    private static final int LZW = 5;
    private static final int DEFLATE = 8;
    private static final int OLD_DEFLATE = 32946;
    private static final int PACK_BITS = 32773;
    private static final int ZSTD = 50000;

    /** Bytes that are not what the compression makes. */
    static final class DamagedChunk extends Exception {
        private static final long serialVersionUID = 1L;

        DamagedChunk(String message, Throwable cause) {
            super(message, cause);
        }

        DamagedChunk(String message) {
            super(message);
        }
    }

    private ChunkCodec() {
    }

    /** Refuses, by name, what cannot be unpacked, before any value is read. */
    static void check(TiffFile file, int compression) {
        switch (compression) {
            case NONE, LZW, DEFLATE, OLD_DEFLATE, PACK_BITS, ZSTD -> {
                return;
            }
            default -> throw file.refuse("The compression " + name(compression) + " is not supported; none, LZW, Deflate, PackBits"
                    + " and ZSTD are", "Make the file anew with gdal_translate -co COMPRESS=DEFLATE");
        }
    }

    static boolean usesPredictor(int compression) {
        return compression == LZW || compression == DEFLATE || compression == OLD_DEFLATE || compression == ZSTD;
    }

    static String name(int compression) {
        return switch (compression) {
            case NONE -> "none";
            case 2, 3, 4 -> "CCITT fax";
            case LZW -> "LZW";
            case 6, 7 -> "JPEG";
            case DEFLATE, OLD_DEFLATE -> "Deflate";
            case PACK_BITS -> "PackBits";
            case 34712 -> "JPEG 2000";
            case 34887 -> "LERC";
            case 34925 -> "LZMA";
            case ZSTD -> "ZSTD";
            case 50001 -> "WebP";
            case 50002, 52546 -> "JPEG XL";
            default -> "number " + compression;
        };
    }

    /**
     * @param packed bytes of the chunk
     * @param length bytes that the chunk holds when unpacked
     * @return that many bytes
     */
    static byte[] unpack(int compression, byte[] packed, int length) throws DamagedChunk {
        return switch (compression) {
            case NONE -> plain(packed, length);
            case LZW -> LzwDecoder.decode(packed, length);
            case DEFLATE, OLD_DEFLATE -> inflate(packed, length);
            case PACK_BITS -> packBits(packed, length);
            case ZSTD -> zstd(packed, length);
            default -> throw new DamagedChunk("compression " + name(compression));
        };
    }

    private static byte[] plain(byte[] packed, int length) throws DamagedChunk {
        if (packed.length < length) {
            throw new DamagedChunk(packed.length + " bytes where " + length + " are expected");
        }
        return packed;
    }

    private static byte[] inflate(byte[] packed, int length) throws DamagedChunk {
        // Deflate packs at most 1032 to 1: anything beyond is damage, told before memory is taken for it.
        if (length / 1100 > packed.length) {
            throw new DamagedChunk(packed.length + " bytes cannot hold " + length);
        }
        Inflater inflater = new Inflater();
        try {
            inflater.setInput(packed);
            byte[] out = new byte[length];
            int at = 0;
            while (at < length) {
                int got = inflater.inflate(out, at, length - at);
                if (got == 0 && (inflater.finished() || inflater.needsInput() || inflater.needsDictionary())) {
                    throw new DamagedChunk("it ends after " + at + " of " + length + " bytes");
                }
                at += got;
            }
            return out;
        } catch (DataFormatException e) {
            throw new DamagedChunk("Deflate: " + e.getMessage(), e);
        } finally {
            inflater.end();
        }
    }

    /** TIFF 6.0 section 9. */
    private static byte[] packBits(byte[] packed, int length) throws DamagedChunk {
        if (length / 64 > packed.length) {
            throw new DamagedChunk(packed.length + " bytes cannot hold " + length);
        }
        byte[] out = new byte[length];
        int at = 0;
        int from = 0;
        while (at < length) {
            if (from >= packed.length) {
                throw new DamagedChunk("it ends after " + at + " of " + length + " bytes");
            }
            int n = packed[from++];
            if (n >= 0) {
                int count = Math.min(n + 1, length - at);
                if (from + count > packed.length) {
                    throw new DamagedChunk("it ends within a run");
                }
                System.arraycopy(packed, from, out, at, count);
                from += n + 1;
                at += count;
            } else if (n != -128) {
                if (from >= packed.length) {
                    throw new DamagedChunk("it ends within a run");
                }
                int count = Math.min(1 - n, length - at);
                java.util.Arrays.fill(out, at, at + count, packed[from++]);
                at += count;
            }
        }
        return out;
    }

    private static byte[] zstd(byte[] packed, int length) throws DamagedChunk {
        try {
            // The declared size comes first, so that a damaged one takes no memory beyond the chunk's own.
            long declared = ZstdDecompressor.getDecompressedSize(packed, 0, packed.length);
            if (declared >= 0 && declared < length) {
                throw new DamagedChunk(declared + " bytes where " + length + " are expected");
            }
            byte[] out = new byte[(int) Math.min(Integer.MAX_VALUE - 16, Math.max(length, declared))];
            int got = new ZstdDecompressor().decompress(packed, 0, packed.length, out, 0, out.length);
            if (got < length) {
                throw new DamagedChunk("it ends after " + got + " of " + length + " bytes");
            }
            return out;
        } catch (RuntimeException e) {
            throw new DamagedChunk("ZSTD: " + e.getMessage(), e);
        }
    }
}
