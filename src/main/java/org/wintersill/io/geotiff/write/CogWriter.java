package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutorService;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * One Cloud Optimized GeoTIFF under way. Used by one thread, which may itself belong to the workers. Memory: a few tiles a
 * processor and twenty bytes a tile of the file, whatever the number of bands; disk: the compressed tiles twice, and 64 KiB a tile,
 * until {@link #finish} is done.
 */
public final class CogWriter implements RasterWriter {
    private static final int TILE = PyramidLevel.TILE;

    private final Path file;
    private final RasterHeader header;
    private final GeoKeyTags keys;
    private final long classicLimit;
    private final List<PyramidLevel> levels;
    private final List<ValueStatistics> statistics = new ArrayList<>();
    private final int[] rowsWritten;
    private final TilePress press;
    private TileSpool spool;
    private long exactLength = -1;
    private boolean begun;
    private boolean finished;

    CogWriter(Path file, RasterHeader header, GeoKeyTags keys, ExecutorService workers, long classicLimit) {
        this.file = file;
        this.header = header;
        this.keys = keys;
        this.classicLimit = classicLimit;
        levels = PyramidLevel.of(header.grid().columns(), header.grid().rows());
        rowsWritten = new int[header.bands().size()];
        header.bands().forEach(band -> statistics.add(new ValueStatistics()));
        press = new TilePress(header.layer().type(), OverviewRule.Choice.of(header.layer()), workers, this::keep);
        try {
            spool = new TileSpool(file, levels, header.bands().size());
        } catch (IOException e) {
            throw failure(e);
        }
    }

    @Override
    public void write(int band, int firstRow, int rows, float[] values) {
        int columns = header.grid().columns();
        if (finished || spool == null) {
            throw new IllegalStateException("the file is closed");
        }
        if (firstRow != rowsWritten[band] || rows != Math.min(TILE, header.grid().rows() - firstRow)
                || rows < 1 || values.length < (long) rows * columns) {
            throw new IllegalArgumentException("band " + band + " wants rows from " + rowsWritten[band] + ", " + TILE
                    + " at a time, not " + rows + " from " + firstRow);
        }
        rowsWritten[band] += rows;
        PyramidLevel level = levels.get(0);
        int first = firstRow / TILE * level.tilesAcross();
        try {
            for (int tile = first; tile < first + level.tilesAcross(); tile++) {
                TileJob job = press.next();
                job.fromRows(band, tile, values, rows, columns);
                press.submit(job);
            }
        } catch (IOException e) {
            throw failure(e);
        }
    }

    private void keep(TileJob job) throws IOException {
        spool.append(job.level(), job.band(), job.tile(), job.packed(), job.length());
        if (job.level() + 1 < levels.size()) {
            spool.appendQuarter(job.level(), job.band(), job.tile(), job.quarter());
        }
        if (job.level() == 0) {
            statistics.get(job.band()).add(job.statistics());
        }
    }

    @Override
    public void finish() {
        for (int band = 0; band < rowsWritten.length; band++) {
            if (rowsWritten[band] != header.grid().rows()) {
                throw new IllegalStateException("band " + band + " has " + rowsWritten[band] + " rows of "
                        + header.grid().rows());
            }
        }
        try {
            press.drain();
            for (int level = 1; level < levels.size(); level++) {
                overview(level);
            }
            CogAssembly assembly = new CogAssembly(new CogTags(header, keys, statistics), levels,
                    header.bands().size(), spool, classicLimit);
            exactLength = assembly.length();
            begun = true;
            assembly.write(file);
            finished = true;
        } catch (IOException e) {
            throw failure(e);
        } finally {
            close();
        }
    }

    private void overview(int level) throws IOException {
        for (int band = 0; band < rowsWritten.length; band++) {
            for (int tile = 0; tile < levels.get(level).tiles(); tile++) {
                TileJob job = press.next();
                job.fromTiles(level, band, tile, levels.get(level), levels.get(level - 1), spool);
                press.submit(job);
            }
        }
        press.drain();
    }

    @Override
    public void close() {
        press.close();
        try {
            if (spool != null) {
                spool.close();
            }
            if (begun && !finished && Files.isRegularFile(file)) {
                Files.deleteIfExists(file);
            }
        } catch (IOException e) {
            throw failure(e);
        } finally {
            spool = null;
            begun = false;
        }
    }

    private ProblemException failure(IOException e) {
        String reason = reason(e);
        String needed = exactLength >= 0
                ? "it needs " + exactLength + " bytes beside the " + spoolBytes() + " of its temporary file"
                : "it needs about " + expectedLength() + " bytes, twice while it is being made";
        return Problem.output("the layer cannot be written: " + reason + "; " + needed, file.toString(),
                "Make room, or choose a folder that can be written").asException(e);
    }

    private static String reason(IOException e) {
        if (e instanceof NoSuchFileException) {
            return "there is no such folder";
        }
        if (e instanceof AccessDeniedException) {
            return "access is denied";
        }
        if (e instanceof FileSystemException f && f.getReason() != null) {
            return f.getReason();
        }
        return e.getMessage() == null ? e.getClass().getSimpleName() : e.getMessage();
    }

    private long spoolBytes() {
        return spool == null ? 0 : spool.bytes();
    }

    /** Length of the file foreseen from the tiles so far; without any, its upper bound. */
    private long expectedLength() {
        long tiles = 0;
        for (PyramidLevel level : levels) {
            tiles += (long) level.tiles() * rowsWritten.length;
        }
        if (spool == null || spool.tiles() == 0) {
            return tiles * TileCodec.largest(header.layer().type());
        }
        return (long) (tiles * ((double) spool.tileBytes() / spool.tiles()));
    }
}
