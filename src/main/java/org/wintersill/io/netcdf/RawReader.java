package org.wintersill.io.netcdf;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/**
 * Reads stored bytes of an open file: spans as they are, chunks with their compression undone. One thread at a time.
 * Buffers are kept from call to call; the inflater and the file are released by {@link #close()}.
 *
 * <p>Source of the filters: HDF5 file format specification 3.0, section IV.A.2.l; Fletcher-32 as in Fletcher (1982) over
 * big-endian 16-bit words.
 */
final class RawReader implements AutoCloseable {
    /** Deflate cannot do better than 1032 : 1, so a stored chunk that promises more is damaged. */
    private static final long DEFLATE_LIMIT = 1100;
    private static final int CHECKSUM = 4;
    private static final int SLACK = 64;

    private final Path path;
    private final FileChannel channel;
    private final Inflater inflater = new Inflater();
    private byte[] stored = new byte[0];
    private byte[] inflated = new byte[0];
    private byte[] unshuffled = new byte[0];
    private boolean planar;

    RawReader(CdfHeader header) {
        this.path = header.path();
        FileChannel opened = null;
        try {
            opened = FileChannel.open(path, StandardOpenOption.READ);
            if (opened.size() != header.fileSize()) {
                throw CdfProblems.changed(path);
            }
        } catch (IOException e) {
            inflater.end();
            throw CdfProblems.unreadable(path, e);
        } catch (RuntimeException e) {
            closeQuietly(opened);
            inflater.end();
            throw e;
        }
        this.channel = opened;
    }

    /** Reads consecutive bytes of the file. */
    void span(long begin, byte[] into, int length) {
        ByteBuffer buffer = ByteBuffer.wrap(into, 0, length);
        try {
            while (buffer.hasRemaining()) {
                if (channel.read(buffer, begin + buffer.position()) < 0) {
                    throw CdfProblems.truncated(path, begin + length, channel.size());
                }
            }
        } catch (IOException e) {
            throw CdfProblems.unreadable(path, e);
        }
    }

    /**
     * Decodes one chunk that is present. The bytes stay valid until the next call.
     *
     * @return the values; where {@link #planar()} says so, all first bytes come first, then all second bytes and so on
     */
    byte[] chunk(Storage.Chunked storage, int chunk, RawType type) {
        int expected = Math.multiplyExact(storage.cells(), type.bytes());
        int length = storage.index().size(chunk);
        int skipped = storage.index().skippedFilters(chunk);
        if (length * DEFLATE_LIMIT + SLACK < expected) {
            throw damaged(chunk, length + " stored bytes cannot hold " + expected, null);
        }
        stored = roomFor(stored, length);
        span(storage.index().address(chunk), stored, length);
        byte[] bytes = stored;
        planar = false;
        for (int i = storage.filters().length - 1; i >= 0; i--) {
            if ((skipped >>> i & 1) != 0) {
                continue;
            }
            switch (storage.filters()[i]) {
                case Storage.Chunked.DEFLATE -> {
                    inflated = roomFor(inflated, expected + SLACK);
                    length = inflate(chunk, bytes, length);
                    bytes = inflated;
                }
                case Storage.Chunked.FLETCHER32 -> {
                    length -= CHECKSUM;
                    if (length < 0 || !checksumHolds(bytes, length)) {
                        throw damaged(chunk, "its checksum does not fit its bytes", null);
                    }
                }
                default -> {
                    if (i == 0 && length == expected) {
                        planar = type.bytes() > 1;
                    } else {
                        unshuffled = roomFor(unshuffled, length);
                        unshuffle(bytes, length, type.bytes(), unshuffled);
                        bytes = unshuffled;
                    }
                }
            }
        }
        if (length != expected) {
            throw damaged(chunk, "it holds " + length + " bytes instead of " + expected, null);
        }
        return bytes;
    }

    /** Whether the last chunk still has its bytes sorted by significance, the last shuffle being undone by who reads it. */
    boolean planar() {
        return planar;
    }

    private int inflate(int chunk, byte[] bytes, int length) {
        inflater.reset();
        inflater.setInput(bytes, 0, length);
        try {
            int done = 0;
            while (!inflater.finished() && done < inflated.length) {
                int step = inflater.inflate(inflated, done, inflated.length - done);
                if (step == 0 && (inflater.needsInput() || inflater.needsDictionary())) {
                    throw damaged(chunk, "its compressed bytes end early", null);
                }
                done += step;
            }
            return done;
        } catch (DataFormatException e) {
            throw damaged(chunk, "its compressed bytes make no sense", e);
        }
    }

    /** Undoes the sorting of bytes by significance; bytes that make no whole number stay at the end. */
    static void unshuffle(byte[] from, int length, int width, byte[] to) {
        int count = length / width;
        for (int k = 0; k < width; k++) {
            int source = k * count;
            for (int i = 0; i < count; i++) {
                to[i * width + k] = from[source + i];
            }
        }
        System.arraycopy(from, count * width, to, count * width, length - count * width);
    }

    /** Compares the sum with the four bytes behind the data, in either byte order: HDF5 before 1.6.3 wrote it swapped. */
    private static boolean checksumHolds(byte[] bytes, int length) {
        int sum = fletcher32(bytes, length);
        int found = bytes[length] & 0xff | (bytes[length + 1] & 0xff) << 8 | (bytes[length + 2] & 0xff) << 16
                | bytes[length + 3] << 24;
        int swapped = (sum & 0x00ff00ff) << 8 | sum >>> 8 & 0x00ff00ff;
        return found == sum || found == swapped;
    }

    static int fletcher32(byte[] bytes, int length) {
        long first = 0;
        long second = 0;
        int words = length / 2;
        int at = 0;
        while (words > 0) {
            // 360 words are the most that cannot overflow 32 bits between two reductions
            int run = Math.min(words, 360);
            words -= run;
            for (; run > 0; run--, at += 2) {
                first += (bytes[at] & 0xff) << 8 | bytes[at + 1] & 0xff;
                second += first;
            }
            first = (first & 0xffff) + (first >>> 16);
            second = (second & 0xffff) + (second >>> 16);
        }
        if ((length & 1) != 0) {
            first += (bytes[at] & 0xff) << 8;
            second += first;
            first = (first & 0xffff) + (first >>> 16);
            second = (second & 0xffff) + (second >>> 16);
        }
        first = (first & 0xffff) + (first >>> 16);
        second = (second & 0xffff) + (second >>> 16);
        return (int) (second << 16 | first);
    }

    /** All values of a small variable, in the order of the file. */
    double[] all(CdfVariable variable) {
        int size = CdfLimits.smallSize(path, variable);
        int width = variable.type().bytes();
        byte[] bytes = new byte[Math.multiplyExact(size, width)];
        double absent = Double.NaN;
        boolean[] missing = null;
        if (variable.storage() instanceof Storage.Contiguous contiguous) {
            int outer = variable.rank() == 0 ? 1 : variable.shape()[0];
            int inner = outer == 0 ? 0 : bytes.length / outer;
            byte[] row = new byte[inner];
            for (int i = 0; i < outer; i++) {
                span(contiguous.begin() + i * contiguous.outerStride(), row, inner);
                System.arraycopy(row, 0, bytes, i * inner, inner);
            }
        } else if (variable.storage() instanceof Storage.Inline inline) {
            System.arraycopy(inline.bytes(), 0, bytes, 0, Math.min(bytes.length, inline.bytes().length));
        } else if (variable.storage() instanceof Storage.Chunked chunked) {
            missing = gather(variable, chunked, bytes);
        } else if (variable.storage() instanceof Storage.Unreadable unreadable) {
            throw CdfLimits.unreadable(path, variable, unreadable);
        }
        double[] values = RawNumbers.toDoubles(bytes, variable.saysUnsigned() ? variable.type().unsigned() : variable.type(),
                variable.littleEndian());
        for (int i = 0; missing != null && i < values.length; i++) {
            values[i] = missing[i] ? absent : values[i];
        }
        return values;
    }

    /** Puts the chunks of a variable of one or two dimensions together; says which values nobody wrote. */
    private boolean[] gather(CdfVariable variable, Storage.Chunked storage, byte[] into) {
        if (variable.rank() > 2) {
            throw CdfLimits.unreadable(path, variable, new Storage.Unreadable("it has more than two dimensions"));
        }
        int width = variable.type().bytes();
        boolean flat = variable.rank() == 1;
        int rows = flat ? 1 : variable.shape()[0];
        int columns = flat ? variable.shape()[0] : variable.shape()[1];
        int chunkRows = flat ? 1 : storage.chunk()[0];
        int chunkColumns = flat ? storage.chunk()[0] : storage.chunk()[1];
        int acrossChunks = (columns + chunkColumns - 1) / chunkColumns;
        boolean[] missing = new boolean[rows * columns];
        byte[] ordered = new byte[0];
        for (int chunk = 0; chunk < storage.index().total(); chunk++) {
            boolean present = storage.index().present(chunk);
            if (present) {
                byte[] bytes = chunk(storage, chunk, variable.type());
                ordered = roomFor(ordered, storage.cells() * width);
                if (planar) {
                    unshuffle(bytes, storage.cells() * width, width, ordered);
                } else {
                    System.arraycopy(bytes, 0, ordered, 0, storage.cells() * width);
                }
            }
            int top = chunk / acrossChunks * chunkRows;
            int left = chunk % acrossChunks * chunkColumns;
            for (int row = top; row < Math.min(rows, top + chunkRows); row++) {
                int length = Math.min(columns, left + chunkColumns) - left;
                int target = row * columns + left;
                if (present) {
                    System.arraycopy(ordered, (row - top) * chunkColumns * width, into, target * width, length * width);
                } else {
                    java.util.Arrays.fill(missing, target, target + length, true);
                }
            }
        }
        return missing;
    }

    private static byte[] roomFor(byte[] buffer, int length) {
        return buffer.length >= length ? buffer : new byte[length];
    }

    private RuntimeException damaged(int chunk, String how, Throwable cause) {
        return CdfProblems.damaged(path, "chunk " + chunk + " cannot be decoded: " + how, cause);
    }

    @Override
    public void close() {
        inflater.end();
        closeQuietly(channel);
    }

    private static void closeQuietly(FileChannel channel) {
        try {
            if (channel != null) {
                channel.close();
            }
        } catch (IOException e) {
            // nothing was written, so nothing can be lost
        }
    }
}
