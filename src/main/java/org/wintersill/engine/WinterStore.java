package org.wintersill.engine;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.function.IntPredicate;
import org.wintersill.problem.Problem;
import org.wintersill.season.WinterValues;

/**
 * Every winter's values of every target cell, kept on disk between the fold and the summaries: a percentile over winters
 * needs all of them, and memory must not grow with their number.
 *
 * <p>One file of floats, {@code [plane][winter][row][column]}, planes as numbered by {@link WinterValues}, then further
 * planes of one value a cell for results that pass from one summary to the next. Writes and reads go to places of their
 * own, so any number of threads may use it.
 */
public final class WinterStore implements WinterSink, WinterPlanes, AutoCloseable {
    private static final ThreadLocal<ByteBuffer> ROOM =
            ThreadLocal.withInitial(() -> ByteBuffer.allocateDirect(1 << 16).order(ByteOrder.LITTLE_ENDIAN));

    private final Path file;
    private final FileChannel channel;
    private final int winterPlanes;
    private final int seasons;
    private final int rows;
    private final int columns;
    private final IntPredicate wanted;

    /**
     * Opens an empty store.
     *
     * @param file where; removed when the store is closed
     * @param winterPlanes planes with a value a winter
     * @param wanted which of them will be read; the others are not kept
     * @throws org.wintersill.problem.ProblemException when the file cannot be made
     */
    public WinterStore(Path file, int winterPlanes, IntPredicate wanted, int seasons, int rows, int columns) {
        this.file = file;
        this.winterPlanes = winterPlanes;
        this.seasons = seasons;
        this.rows = rows;
        this.columns = columns;
        this.wanted = wanted;
        try {
            channel = FileChannel.open(file, StandardOpenOption.CREATE_NEW, StandardOpenOption.READ, StandardOpenOption.WRITE);
        } catch (IOException e) {
            throw failed(e);
        }
    }

    /** Bytes on disk for winter planes and extra planes. */
    public static long bytes(int winterPlanes, int seasons, int extraPlanes, long cells) {
        return 4 * cells * ((long) winterPlanes * seasons + extraPlanes);
    }

    private RuntimeException failed(IOException e) {
        return Problem.output("working data could not be kept there: " + e.getMessage(), file.toString(),
                "The run needs " + MemoryEstimate.text(bytes(winterPlanes, seasons, 0, (long) rows * columns))
                        + " of free disk beside its outputs").asException(e);
    }

    @Override
    public void accept(int season, int firstRow, WinterValues values) {
        for (int plane = 0; plane < values.planeCount(); plane++) {
            if (wanted.test(plane)) {
                write(position(plane, season, firstRow), values.plane(plane));
            }
        }
    }

    /** Keeps rows of an extra plane. */
    public void writeExtra(int plane, int firstRow, float[] values) {
        write(extraPosition(plane, firstRow), values);
    }

    /** The thread's own buffer outside the heap, as the system wants it. */
    private static ByteBuffer room(int values) {
        ByteBuffer room = ROOM.get();
        if (room.capacity() < 4 * values) {
            room = ByteBuffer.allocateDirect(Math.multiplyExact(4, values)).order(ByteOrder.LITTLE_ENDIAN);
            ROOM.set(room);
        }
        return room.clear().limit(4 * values);
    }

    private void write(long position, float[] values) {
        ByteBuffer bytes = room(values.length);
        bytes.asFloatBuffer().put(values);
        try {
            while (bytes.hasRemaining()) {
                channel.write(bytes, position + bytes.position());
            }
        } catch (IOException e) {
            throw failed(e);
        }
    }

    private long position(int plane, int season, int row) {
        return 4L * columns * (((long) plane * seasons + season) * rows + row);
    }

    private long extraPosition(int plane, int row) {
        return position(winterPlanes, 0, 0) + 4L * columns * ((long) plane * rows + row);
    }

    @Override
    public float[] read(int plane, int season, int firstRow, int rowCount) {
        return read(position(plane, season, firstRow), rowCount);
    }

    /** Rows of an extra plane. */
    public float[] readExtra(int plane, int firstRow, int rowCount) {
        return read(extraPosition(plane, firstRow), rowCount);
    }

    private float[] read(long position, int rowCount) {
        ByteBuffer bytes = room(columns * rowCount);
        try {
            while (bytes.hasRemaining() && channel.read(bytes, position + bytes.position()) >= 0) {
                // until full
            }
        } catch (IOException e) {
            throw failed(e);
        }
        if (bytes.hasRemaining()) {
            throw new IllegalStateException("rows at " + position + " were never written");
        }
        FloatBuffer floats = bytes.flip().asFloatBuffer();
        float[] values = new float[floats.remaining()];
        floats.get(values);
        return values;
    }

    /**
     * Takes the winters of a file that {@link #keep} made.
     *
     * @return false where the file has another size than the winters of this store
     */
    public boolean fill(Path kept) {
        long size = position(winterPlanes, 0, 0);
        try (FileChannel from = FileChannel.open(kept, StandardOpenOption.READ)) {
            if (from.size() != size) {
                return false;
            }
            for (long done = 0; done < size;) {
                done += from.transferTo(done, size - done, channel.position(done));
            }
            return true;
        } catch (IOException e) {
            throw failed(e);
        }
    }

    /** Closes the store and leaves its winters, all planes wanted, in a file of that name: 32-bit floats, little-endian. */
    public void keep(Path kept) {
        try {
            channel.truncate(position(winterPlanes, 0, 0));
            channel.close();
            Files.move(file, kept);
        } catch (IOException e) {
            throw failed(e);
        }
    }

    /** Removes the file; closing again does nothing. */
    @Override
    public void close() {
        try {
            channel.close();
            Files.deleteIfExists(file);
        } catch (IOException e) {
            throw failed(e);
        }
    }
}
