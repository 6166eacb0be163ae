package org.wintersill.io.geotiff.read;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** An open TIFF or BigTIFF file: its byte order, its directories, and reads that never go beyond its end. */
final class TiffFile implements AutoCloseable {
    private static final int CLASSIC = 42;
    private static final int BIG = 43;
    /** Far more than any image with overviews and masks has. */
    private static final int MOST_DIRECTORIES = 4096;
    private static final int MOST_ENTRIES = 4096;

    private final Path path;
    private final FileChannel channel;
    private final long size;
    private final ByteOrder order;
    private final boolean big;
    private final List<TiffDirectory> directories = new ArrayList<>();

    private TiffFile(Path path, FileChannel channel) throws IOException {
        this.path = path;
        this.channel = channel;
        this.size = channel.size();
        if (size == 0) {
            throw refuse("The file is empty", "Fetch or make it again");
        }
        ByteBuffer head = ByteBuffer.wrap(read(0, (int) Math.min(16, size)));
        checkKind(head);
        order = head.get(0) == 'I' ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN;
        head.order(order);
        if (size < 16) {
            throw truncated();
        }
        big = head.getShort(2) == BIG;
        if (big && (head.getShort(4) != 8 || head.getShort(6) != 0)) {
            throw refuse("The BigTIFF header is damaged", "Make the file again");
        }
        readDirectories(big ? head.getLong(8) : Integer.toUnsignedLong(head.getInt(4)));
    }

    /** @throws ProblemException when the file is absent or no sound TIFF file */
    static TiffFile open(Path path) {
        try {
            if (Files.isDirectory(path)) {
                throw Problem.input("This is a folder, not a GeoTIFF file", path.toString(), "Name the files in it").asException();
            }
            FileChannel channel = FileChannel.open(path, StandardOpenOption.READ);
            try {
                return new TiffFile(path, channel);
            } catch (IOException | RuntimeException e) {
                channel.close();
                throw e;
            }
        } catch (java.nio.file.NoSuchFileException e) {
            throw Problem.input("There is no such file", path.toString(), "Check the path").asException(e);
        } catch (IOException e) {
            throw Problem.input("The file cannot be read: " + e.getMessage(), path.toString(),
                    "Check that it is complete and may be read").asException(e);
        }
    }

    static boolean recognises(byte[] head) {
        return head.length >= 4 && (head[0] == 'I' && head[1] == 'I' && (head[2] == CLASSIC || head[2] == BIG) && head[3] == 0
                || head[0] == 'M' && head[1] == 'M' && head[2] == 0 && (head[3] == CLASSIC || head[3] == BIG));
    }

    private void checkKind(ByteBuffer head) {
        byte[] bytes = head.array();
        if (recognises(bytes)) {
            return;
        }
        String start = new String(bytes, java.nio.charset.StandardCharsets.ISO_8859_1).trim();
        if (bytes.length >= 2 && bytes[0] == (byte) 0x1f && bytes[1] == (byte) 0x8b) {
            throw refuse("The file is compressed with gzip, a GeoTIFF file is expected", "Unpack it with gunzip");
        }
        if (start.startsWith("<")) {
            throw refuse("The file is a web page or XML text, a GeoTIFF file is expected",
                    "Download it again; the server may ask for a login");
        }
        throw refuse("The file does not begin like a TIFF file", "Give a GeoTIFF file");
    }

    private void readDirectories(long first) throws IOException {
        Set<Long> seen = new HashSet<>();
        long at = first;
        while (at != 0) {
            if (!seen.add(at) || seen.size() > MOST_DIRECTORIES) {
                throw refuse("The image directories of the file run in a circle", "Make the file again");
            }
            int countBytes = big ? 8 : 2;
            ByteBuffer counter = buffer(at, countBytes);
            long entries = big ? counter.getLong() : Short.toUnsignedInt(counter.getShort());
            if (entries < 1 || entries > MOST_ENTRIES) {
                throw refuse("The image directory at byte " + at + " is damaged (" + entries + " entries)", "Make the file again");
            }
            int entryBytes = big ? 20 : 12;
            ByteBuffer block = buffer(at + countBytes, (int) entries * entryBytes + (big ? 8 : 4));
            directories.add(new TiffDirectory(this, block, (int) entries, big));
            at = big ? block.getLong((int) entries * entryBytes) : Integer.toUnsignedLong(block.getInt((int) entries * entryBytes));
        }
        if (directories.isEmpty()) {
            throw truncated();
        }
    }

    Path path() {
        return path;
    }

    long size() {
        return size;
    }

    ByteOrder order() {
        return order;
    }

    boolean big() {
        return big;
    }

    List<TiffDirectory> directories() {
        return directories;
    }

    ByteBuffer buffer(long at, int length) throws IOException {
        return ByteBuffer.wrap(read(at, length)).order(order);
    }

    /** Reads bytes that must lie inside the file. */
    byte[] read(long at, int length) throws IOException {
        if (at < 0 || length < 0 || at > size - length) {
            throw truncated();
        }
        ByteBuffer target = ByteBuffer.allocate(length);
        while (target.hasRemaining()) {
            if (channel.read(target, at + target.position()) < 0) {
                throw new EOFException("the file became shorter while it was read");
            }
        }
        return target.array();
    }

    ProblemException truncated() {
        return refuse("The file is cut off: it is " + size + " bytes long, and its directory points beyond that",
                "Fetch or make it again");
    }

    ProblemException refuse(String what, String remedy) {
        return Problem.input(what, path.toString(), remedy).asException();
    }

    @Override
    public void close() {
        try {
            channel.close();
        } catch (IOException e) {
            // nothing was written, so nothing is lost
        }
    }
}
