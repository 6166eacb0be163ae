package org.wintersill.scenario;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import org.wintersill.engine.MemoryEstimate;
import org.wintersill.grid.Block;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.DailyTemperatureReader;

/**
 * Daily values of a window of whole rows on disk, {@code [day][row][column]}, floats. Any number of threads may read and write
 * different places.
 */
final class ScenarioStore implements AutoCloseable {
    private final Path file;
    private final FileChannel channel;
    private final int firstRow;
    private final int rows;
    private final int columns;
    private final int days;

    ScenarioStore(Path file, int firstRow, int rows, int columns, int days) {
        this.file = file;
        this.firstRow = firstRow;
        this.rows = rows;
        this.columns = columns;
        this.days = days;
        try {
            channel = FileChannel.open(file, StandardOpenOption.CREATE_NEW, StandardOpenOption.READ, StandardOpenOption.WRITE);
        } catch (IOException e) {
            throw failed(e);
        }
    }

    private RuntimeException failed(IOException e) {
        return Problem.output("working data could not be kept there: " + e.getMessage(), file.toString(), "The scenario needs "
                + MemoryEstimate.text(4L * days * rows * columns) + " of free disk beside the outputs").asException(e);
    }

    private long position(int day, int row) {
        return 4L * columns * ((long) day * rows + row - firstRow);
    }

    /** Keeps whole rows, {@code [day][row * columns + column]}. */
    void write(Block block, float[][] values) {
        ByteBuffer bytes = ByteBuffer.allocate(4 * block.cells()).order(ByteOrder.LITTLE_ENDIAN);
        for (int day = 0; day < days; day++) {
            bytes.clear();
            bytes.asFloatBuffer().put(values[day]);
            try {
                long at = position(day, block.row());
                while (bytes.hasRemaining()) {
                    channel.write(bytes, at + bytes.position());
                }
            } catch (IOException e) {
                throw failed(e);
            }
        }
    }

    DailyTemperatureReader reader() {
        return new DailyTemperatureReader() {
            private ByteBuffer bytes = ByteBuffer.allocate(0);

            @Override
            public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
                int needed = 4 * block.rows() * columns;
                if (bytes.capacity() < needed) {
                    bytes = ByteBuffer.allocate(needed).order(ByteOrder.LITTLE_ENDIAN);
                }
                for (int day = 0; day < dayCount; day++) {
                    load(firstDay + day, block.row(), needed);
                    for (int row = 0; row < block.rows(); row++) {
                        bytes.position(4 * (row * columns + block.column()));
                        bytes.asFloatBuffer().get(out, offset + day * dayStride + row * block.columns(), block.columns());
                    }
                }
            }

            private void load(int day, int row, int needed) {
                bytes.clear().limit(needed);
                try {
                    while (bytes.hasRemaining() && channel.read(bytes, position(day, row) + bytes.position()) >= 0) {
                        // until full
                    }
                } catch (IOException e) {
                    throw failed(e);
                }
                if (bytes.hasRemaining()) {
                    throw new IllegalStateException("day " + day + " was never written");
                }
                bytes.clear();
            }

            @Override
            public long valuesSetAside() {
                return 0;
            }

            @Override
            public void close() {
                // the file is closed with the store
            }
        };
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
