package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;

/**
 * Puts a file together once all its tiles are known: head, structural metadata, directories from the full grid to the
 * smallest overview, then the tiles from the smallest overview to the full grid. Each tile stands between its size and a
 * repetition of its last four bytes, as the structural metadata says.
 *
 * <p>All sizes are known before the first byte is written, so that the choice between the classic and the big form is exact.
 */
final class CogAssembly {
    /** A classic file may not reach 4 GiB; a little less leaves room for tools that add a tag. */
    static final long CLASSIC_LIMIT = (1L << 32) - (1L << 20);
    private static final String STRUCTURE = """
            LAYOUT=IFDS_BEFORE_DATA
            BLOCK_ORDER=ROW_MAJOR
            BLOCK_LEADER=SIZE_AS_UINT4
            BLOCK_TRAILER=LAST_4_BYTES_REPEATED
            KNOWN_INCOMPATIBLE_EDITION=NO
            \s"""; // the blank lets a later editor turn NO into YES in place
    private static final int FRAME = 8;
    private static final int BUFFER = 1 << 20;

    private final List<PyramidLevel> levels;
    private final int bands;
    private final TileSpool spool;
    private final byte[] front;
    private final long length;

    CogAssembly(CogTags tags, List<PyramidLevel> levels, int bands, TileSpool spool, long classicLimit) {
        this.levels = levels;
        this.bands = bands;
        this.spool = spool;
        long data = 0;
        for (int level = 0; level < levels.size(); level++) {
            for (int band = 0; band < bands; band++) {
                for (int tile = 0; tile < levels.get(level).tiles(); tile++) {
                    data += spool.length(level, band, tile) + FRAME;
                }
            }
        }
        boolean big = frontSize(tags, false) + data > classicLimit;
        long frontSize = frontSize(tags, big);
        length = frontSize + data;
        front = front(tags, Math.toIntExact(frontSize), big);
    }

    /** Bytes of the whole file. */
    long length() {
        return length;
    }

    private static byte[] structure() {
        byte[] lines = STRUCTURE.getBytes(StandardCharsets.US_ASCII);
        String digits = Integer.toString(lines.length);
        String head = "GDAL_STRUCTURAL_METADATA_SIZE=" + "0".repeat(6 - digits.length()) + digits + " bytes\n";
        int size = head.length() + lines.length;
        return ByteBuffer.allocate(size + size % 2).put(head.getBytes(StandardCharsets.US_ASCII)).put(lines).array();
    }

    private long frontSize(CogTags tags, boolean big) {
        long size = (big ? 16 : 8) + structure().length;
        for (int level = 0; level < levels.size(); level++) {
            int tiles = levels.get(level).tiles() * bands;
            size += tags.directory(levels.get(level), level == 0, new long[tiles], new int[tiles], big).size(big);
        }
        return size;
    }

    private byte[] front(CogTags tags, int size, boolean big) {
        TiffDirectory[] directories = new TiffDirectory[levels.size()];
        long at = size;
        for (int level = levels.size() - 1; level >= 0; level--) {
            int tiles = levels.get(level).tiles();
            long[] positions = new long[tiles * bands];
            int[] lengths = new int[tiles * bands];
            for (int i = 0; i < positions.length; i++) {
                lengths[i] = spool.length(level, i / tiles, i % tiles);
                positions[i] = at + FRAME / 2;
                at += lengths[i] + FRAME;
            }
            directories[level] = tags.directory(levels.get(level), level == 0, positions, lengths, big);
        }
        ByteBuffer bytes = ByteBuffer.allocate(size).order(ByteOrder.LITTLE_ENDIAN);
        bytes.put((byte) 'I').put((byte) 'I').putShort((short) (big ? 43 : 42));
        byte[] structure = structure();
        long start = (big ? 16 : 8) + structure.length;
        if (big) {
            bytes.putShort((short) 8).putShort((short) 0).putLong(start);
        } else {
            bytes.putInt((int) start);
        }
        bytes.put(structure);
        for (int level = 0; level < directories.length; level++) {
            long next = start + directories[level].size(big);
            directories[level].append(bytes, start, level + 1 < directories.length ? next : 0, big);
            start = next;
        }
        return bytes.array();
    }

    /** Writes the file and forces it to disk. */
    void write(Path file) throws IOException {
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.CREATE,
                StandardOpenOption.TRUNCATE_EXISTING, StandardOpenOption.WRITE)) {
            writeFully(channel, ByteBuffer.wrap(front));
            ByteBuffer buffer = ByteBuffer.allocate(BUFFER).order(ByteOrder.LITTLE_ENDIAN);
            byte[] tileBytes = new byte[BUFFER / 2];
            for (int level = levels.size() - 1; level >= 0; level--) {
                for (int band = 0; band < bands; band++) {
                    for (int tile = 0; tile < levels.get(level).tiles(); tile++) {
                        int size = spool.read(level, band, tile, tileBytes);
                        if (buffer.remaining() < size + FRAME) {
                            writeFully(channel, buffer.flip());
                            buffer.clear();
                        }
                        buffer.putInt(size).put(tileBytes, 0, size).put(tileBytes, size - 4, 4);
                    }
                }
            }
            writeFully(channel, buffer.flip());
            channel.force(true);
        }
    }

    private static void writeFully(FileChannel channel, ByteBuffer buffer) throws IOException {
        while (buffer.hasRemaining()) {
            channel.write(buffer);
        }
    }
}
