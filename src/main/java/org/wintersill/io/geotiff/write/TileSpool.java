package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;

/**
 * Compressed tiles of all bands and levels on their way into a file, and each tile halved, as plain floats, for the level above: one hidden file beside the target, tiles in order of
 * arrival, with a list of where each of them is. Memory is twenty bytes a tile. The same name is used again by the next
 * attempt, so that a killed run leaves at most one such file and the next one takes it over.
 */
final class TileSpool implements AutoCloseable {
    private final Path file;
    private final FileChannel channel;
    /** {@code [level][band][tile]}. */
    private final long[][][] positions;
    private final int[][][] lengths;
    /** Where the halved tile lies. */
    private final long[][][] quarters;
    private long end;
    private long tileBytes;
    private long tiles;

    TileSpool(Path target, List<PyramidLevel> levels, int bands) throws IOException {
        file = target.resolveSibling("." + target.getFileName() + ".tiles");
        positions = new long[levels.size()][bands][];
        lengths = new int[levels.size()][bands][];
        quarters = new long[levels.size()][bands][];
        for (int level = 0; level < levels.size(); level++) {
            for (int band = 0; band < bands; band++) {
                positions[level][band] = new long[levels.get(level).tiles()];
                lengths[level][band] = new int[levels.get(level).tiles()];
                quarters[level][band] = new long[levels.get(level).tiles()];
            }
        }
        channel = FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.TRUNCATE_EXISTING,
                StandardOpenOption.READ, StandardOpenOption.WRITE);
    }

    /** Appends a tile. Called by one thread. */
    void append(int level, int band, int tile, byte[] bytes, int length) throws IOException {
        positions[level][band][tile] = end;
        lengths[level][band][tile] = length;
        write(ByteBuffer.wrap(bytes, 0, length));
        tileBytes += length;
        tiles++;
    }

    /** Appends a halved tile, from the buffer's start to its limit. Called by the same thread. */
    void appendQuarter(int level, int band, int tile, ByteBuffer quarter) throws IOException {
        quarters[level][band][tile] = end;
        write(quarter.duplicate().rewind());
    }

    private void write(ByteBuffer buffer) throws IOException {
        while (buffer.hasRemaining()) {
            end += channel.write(buffer, end);
        }
    }

    /** Reads a tile back into the buffer, from its start; gives the number of bytes. May be called by several threads. */
    int read(int level, int band, int tile, byte[] into) throws IOException {
        int length = lengths[level][band][tile];
        read(ByteBuffer.wrap(into, 0, length), positions[level][band][tile]);
        return length;
    }

    /** Reads a halved tile back and fills the buffer with it. May be called by several threads. */
    void readQuarter(int level, int band, int tile, ByteBuffer into) throws IOException {
        read(into.clear(), quarters[level][band][tile]);
    }

    private void read(ByteBuffer buffer, long from) throws IOException {
        long position = from;
        while (buffer.hasRemaining()) {
            int read = channel.read(buffer, position);
            if (read < 0) {
                throw new IOException("the temporary file " + file + " was cut short");
            }
            position += read;
        }
    }

    int length(int level, int band, int tile) {
        return lengths[level][band][tile];
    }

    /** Bytes held. */
    long bytes() {
        return end;
    }

    /** Bytes of the compressed tiles held. */
    long tileBytes() {
        return tileBytes;
    }

    /** Tiles held. */
    long tiles() {
        return tiles;
    }

    /** Closes and removes the file. */
    @Override
    public void close() throws IOException {
        try {
            channel.close();
        } finally {
            Files.deleteIfExists(file);
        }
    }
}
