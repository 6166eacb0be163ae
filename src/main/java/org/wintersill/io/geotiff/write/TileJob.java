package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import org.wintersill.layer.SampleType;

/** One tile being made, with all the memory that it needs; used again for tile after tile. */
final class TileJob implements AutoCloseable {
    private static final int TILE = PyramidLevel.TILE;
    /** Cells of a halved tile. */
    private static final int QUARTER = TILE * TILE / 4;

    private final SampleType type;
    private final OverviewRule.Choice overviews;
    private final TileCodec codec;
    private final float[] values = new float[TILE * TILE];
    private final ValueStatistics statistics = new ValueStatistics();
    private final float[] half = new float[QUARTER];
    private final ByteBuffer quarter = ByteBuffer.allocate(4 * QUARTER).order(ByteOrder.nativeOrder());
    private int level;
    private int band;
    private int tile;
    private FutureTask<Void> task;

    TileJob(SampleType type, OverviewRule.Choice overviews) {
        this.type = type;
        this.overviews = overviews;
        codec = new TileCodec(type);
    }

    /** Prepares a tile of the full grid from full-width rows; cells beyond the grid become missing. */
    void fromRows(int band, int tile, float[] rows, int count, int columns) {
        begin(0, band, tile);
        int column = tile % ((columns - 1) / TILE + 1) * TILE;
        int width = Math.min(TILE, columns - column);
        Arrays.fill(values, Float.NaN);
        for (int row = 0; row < count; row++) {
            System.arraycopy(rows, row * columns + column, values, row * TILE, width);
        }
        task = new FutureTask<>(() -> {
            dropWildValues();
            statistics.of(values);
            codec.pack(values);
            halve();
            return null;
        });
    }

    /** Prepares a tile of an overview from the up to four tiles under it. */
    void fromTiles(int level, int band, int tile, PyramidLevel here, PyramidLevel under, TileSpool spool) {
        begin(level, band, tile);
        task = new FutureTask<>(() -> {
            Arrays.fill(values, Float.NaN);
            int firstRow = tile / here.tilesAcross() * 2;
            int firstColumn = tile % here.tilesAcross() * 2;
            for (int row = firstRow; row < Math.min(firstRow + 2, under.tilesDown()); row++) {
                for (int column = firstColumn; column < Math.min(firstColumn + 2, under.tilesAcross()); column++) {
                    spool.readQuarter(level - 1, band, row * under.tilesAcross() + column, quarter);
                    quarter.flip().asFloatBuffer().get(half);
                    OverviewRule.place(half, values, column > firstColumn, row > firstRow);
                }
            }
            codec.pack(values);
            halve();
            return null;
        });
    }

    private void halve() {
        OverviewRule.halve(overviews, values, half);
        quarter.clear().asFloatBuffer().put(half);
    }

    private void begin(int level, int band, int tile) {
        this.level = level;
        this.band = band;
        this.tile = tile;
    }

    /** Infinite values and the number that stands for "missing" are no values of a layer. */
    private void dropWildValues() {
        float nodata = type.nodata();
        for (int i = 0; i < values.length; i++) {
            if (!Float.isFinite(values[i]) || values[i] == nodata) {
                values[i] = Float.NaN;
            }
        }
    }

    /** The work, for a thread that has time; nothing happens where another was faster. */
    Runnable work() {
        return task;
    }

    /**
     * Waits for the work, or does it when nobody has begun: the writer cannot be locked up by a pool whose threads all wait
     * for writers.
     */
    void complete() throws IOException {
        task.run();
        boolean interrupted = false;
        try {
            while (true) {
                try {
                    task.get();
                    return;
                } catch (InterruptedException e) {
                    interrupted = true;
                } catch (ExecutionException e) {
                    rethrow(e.getCause());
                }
            }
        } finally {
            if (interrupted) {
                Thread.currentThread().interrupt();
            }
        }
    }

    private static void rethrow(Throwable cause) throws IOException {
        if (cause instanceof IOException e) {
            throw e;
        }
        if (cause instanceof RuntimeException e) {
            throw e;
        }
        if (cause instanceof Error e) {
            throw e;
        }
        throw new IllegalStateException(cause);
    }

    int level() {
        return level;
    }

    int band() {
        return band;
    }

    int tile() {
        return tile;
    }

    /** The compressed tile, and how many bytes of it count. */
    byte[] packed() {
        return codec.packed();
    }

    int length() {
        return codec.length();
    }

    /** The tile halved, for the level above: 128 x 128 floats. */
    ByteBuffer quarter() {
        return quarter;
    }

    /** Statistics of the values of a tile of the full grid. */
    ValueStatistics statistics() {
        return statistics;
    }

    @Override
    public void close() {
        codec.close();
    }
}
