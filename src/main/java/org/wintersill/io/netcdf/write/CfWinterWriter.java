package org.wintersill.io.netcdf.write;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.BitSet;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.SampleType;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.time.Season;
import ucar.ma2.Array;
import ucar.ma2.InvalidRangeException;
import ucar.nc2.NetcdfFileWriter;
import ucar.nc2.Variable;

/**
 * Writes the winter layers of one cultivar as a CF NetCDF file. Values go to disk as they come, in any order of layers and
 * winters, so memory holds one block of rows.
 *
 * <p>It is not a {@code layer.RasterWriter}: a raster file holds one layer and knows its bands by text, whereas this one
 * holds several and needs the winters as dates of a calendar.
 *
 * <p>The caller names the file (a temporary name) and renames it after {@link #finish}; closing earlier removes the file.
 * Used by one thread.
 */
public final class CfWinterWriter implements AutoCloseable {

    /** Largest variable of the classic format with 64-bit offsets, bytes: sizes are stored in 32 bits (NUG, classic format). */
    private static final long LARGEST_VARIABLE = (1L << 32) - 4;

    private final Path path;
    private final WinterFile file;
    private final NetcdfFileWriter writer;
    private final Variable[] variables;
    /** Rows written, {@code (layer * winters + winter) * rows + row}: a hole would read as zeros. */
    private final BitSet[] written;
    private boolean closed;

    private CfWinterWriter(Path path, WinterFile file, NetcdfFileWriter writer) {
        this.path = path;
        this.file = file;
        this.writer = writer;
        this.variables = new Variable[file.layers().size()];
        this.written = new BitSet[file.layers().size() * file.winters().size()];
        for (int i = 0; i < written.length; i++) {
            written[i] = new BitSet(file.grid().rows());
        }
    }

    /**
     * Begins a file; one that is there already is replaced.
     *
     * @throws ProblemException when the file cannot be made, or a layer is larger than the format allows
     */
    public static CfWinterWriter create(Path path, WinterFile file) {
        for (LayerDefinition layer : file.layers()) {
            long bytes = file.grid().cells() * file.winters().size() * layer.type().bytes();
            if (bytes > LARGEST_VARIABLE) {
                throw Problem.limit("Layer " + layer.id() + " of " + file.winters().size() + " winters takes " + bytes
                        + " bytes; a NetCDF variable holds at most " + LARGEST_VARIABLE, path.toString(),
                        "Write fewer winters, a smaller area, or GeoTIFF").asException();
            }
        }
        CfWinterWriter made = null;
        try {
            Files.deleteIfExists(path);
            NetcdfFileWriter writer = NetcdfFileWriter.createNew(NetcdfFileWriter.Version.netcdf3, path.toString());
            made = new CfWinterWriter(path, file, writer);
            made.begin();
            return made;
        } catch (IOException | InvalidRangeException | RuntimeException e) {
            if (made != null) {
                made.close();
            }
            if (e instanceof IllegalArgumentException mistake) {
                throw mistake;
            }
            throw problem(path, e);
        }
    }

    private void begin() throws IOException, InvalidRangeException {
        writer.setLargeFile(true);
        // All values are written, so filling first would only write twice.
        writer.setFill(false);
        new CfHeader(writer, file).define();
        writer.create();
        Axes axes = Axes.of(file.grid().crs());
        putDoubles(axes.y(), Axes.yValues(file.grid()), file.grid().rows());
        putDoubles(axes.x(), Axes.xValues(file.grid()), file.grid().columns());
        putDoubles(CfHeader.TIME, Axes.times(file.winters()), file.winters().size());
        putDoubles(CfHeader.TIME_BOUNDS, Axes.timeBounds(file.winters()), file.winters().size(), 2);
        int[] years = file.winters().stream().mapToInt(Season::year).toArray();
        writer.write(writer.findVariable(CfHeader.WINTER_YEAR), Array.factory(int.class, new int[] {years.length}, years));
        writer.write(writer.findVariable("crs"), Array.factory(int.class, new int[0], new int[] {0}));
        for (int i = 0; i < variables.length; i++) {
            variables[i] = writer.findVariable(file.layers().get(i).column());
        }
    }

    private void putDoubles(String name, double[] values, int... shape) throws IOException, InvalidRangeException {
        writer.write(writer.findVariable(name), Array.factory(double.class, shape, values));
    }

    /**
     * Writes full-width rows of one layer and winter.
     *
     * @param layer position in {@link WinterFile#layers}
     * @param winter position in {@link WinterFile#winters}
     * @param firstRow row of the grid of the first value, 0 in the north
     * @param rows number of rows
     * @param values {@code [row * columns + column]}, NaN for no value; not kept and not changed. For integer types the values
     *               are whole numbers
     * @throws ProblemException when the disk is full or the file cannot be written
     */
    public void write(int layer, int winter, int firstRow, int rows, float[] values) {
        requireOpen();
        int columns = file.grid().columns();
        SampleType type = file.layers().get(layer).type();
        Array block = Array.factory(CfHeader.type(type), new int[] {1, rows, columns}, stored(type, values, rows * columns));
        try {
            writer.write(variables[layer], new int[] {winter, firstRow, 0}, block);
        } catch (IOException | InvalidRangeException | RuntimeException e) {
            throw problem(path, e);
        }
        written[layer * file.winters().size() + winter].set(firstRow, firstRow + rows);
    }

    /** The values as the file's type, NaN as its missing value. */
    private static Object stored(SampleType type, float[] values, int count) {
        int nodata = type.nodata();
        switch (type) {
            case FLOAT32 -> {
                float[] floats = new float[count];
                for (int i = 0; i < count; i++) {
                    floats[i] = Float.isNaN(values[i]) ? nodata : values[i];
                }
                return floats;
            }
            case INT16 -> {
                short[] shorts = new short[count];
                for (int i = 0; i < count; i++) {
                    shorts[i] = (short) (Float.isNaN(values[i]) ? nodata : Math.round(values[i]));
                }
                return shorts;
            }
            default -> {
                byte[] bytes = new byte[count];
                for (int i = 0; i < count; i++) {
                    bytes[i] = (byte) (Float.isNaN(values[i]) ? nodata : Math.round(values[i]));
                }
                return bytes;
            }
        }
    }

    /**
     * Completes the file and forces it to disk.
     *
     * @throws IllegalStateException when rows were left out: they would read as zeros
     */
    public void finish() {
        requireOpen();
        for (int i = 0; i < written.length; i++) {
            int missing = written[i].nextClearBit(0);
            if (missing < file.grid().rows()) {
                throw new IllegalStateException("row " + missing + " of layer "
                        + file.layers().get(i / file.winters().size()).id() + " was not written");
            }
        }
        try {
            writer.close();
            try (FileChannel channel = FileChannel.open(path, StandardOpenOption.WRITE)) {
                channel.force(true);
            }
            closed = true;
        } catch (IOException | RuntimeException e) {
            close();
            throw problem(path, e);
        }
    }

    /** Ends the writer; removes the file unless it was finished. */
    @Override
    public void close() {
        if (closed) {
            return;
        }
        closed = true;
        try {
            writer.abort();
        } catch (IOException | RuntimeException e) {
            // The file goes anyway; what went wrong before has been told.
        }
        try {
            Files.deleteIfExists(path);
        } catch (IOException e) {
            throw Problem.output("The unfinished file cannot be removed", path.toString(), "Delete it").asException(e);
        }
    }

    private void requireOpen() {
        if (closed) {
            throw new IllegalStateException(path + " is closed");
        }
    }

    private static ProblemException problem(Path path, Exception e) {
        return Problem.output("The NetCDF file cannot be written: " + e.getMessage(), path.toString(),
                "Check that the folder exists, may be written to and has space").asException(e);
    }
}
