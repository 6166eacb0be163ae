package org.wintersill.elevation.terrain;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.IntStream;
import org.wintersill.grid.Block;

/**
 * Program of {@code src/test/python/check_terrain.py}: reads {@code height.f32}, {@code width.f64} and {@code tall.f64} (raw, little
 * endian) from a folder and writes the indices beside them. Arguments: folder, columns, radius in m, {@code disc} or {@code square}.
 */
public final class IndexFiles {
    private static final Tasks THREADS = (count, task) -> IntStream.range(0, count).parallel().forEach(task);

    private IndexFiles() {
    }

    public static void main(String[] arguments) throws IOException {
        Path folder = Path.of(arguments[0]);
        int columns = Integer.parseInt(arguments[1]);
        Window window = new Window(Window.Shape.valueOf(arguments[3].toUpperCase(java.util.Locale.ROOT)), Double.parseDouble(arguments[2]));
        ByteBuffer bytes = read(folder.resolve("height.f32"));
        float[] metres = new float[bytes.remaining() / 4];
        bytes.asFloatBuffer().get(metres);
        Relief relief = new Relief(columns, metres.length / columns, metres, doubles(folder.resolve("width.f64")),
                doubles(folder.resolve("tall.f64")));
        Block whole = relief.whole();
        LocalHeights heights = LocalHeights.of(relief, window, whole, THREADS);
        write(folder.resolve("percentile.f32"), heights.percentile());
        write(folder.resolve("above.f32"), heights.aboveLowest());
        write(folder.resolve("position.f32"), PositionIndex.of(relief, window, whole, THREADS));
        write(folder.resolve("slope.f32"), SurfaceForm.slope(relief, whole, THREADS));
        write(folder.resolve("curvature.f32"), SurfaceForm.curvature(relief, whole, THREADS));
        boolean[] water = new boolean[metres.length];
        for (int i = 0; i < water.length; i++) {
            water[i] = metres[i] <= 0;
        }
        write(folder.resolve("shore.f32"), DistanceToWater.of(water, columns, relief.cellWidth(), relief.cellHeight(), THREADS));
    }

    private static ByteBuffer read(Path file) throws IOException {
        return ByteBuffer.wrap(Files.readAllBytes(file)).order(ByteOrder.LITTLE_ENDIAN);
    }

    private static double[] doubles(Path file) throws IOException {
        ByteBuffer bytes = read(file);
        double[] values = new double[bytes.remaining() / 8];
        bytes.asDoubleBuffer().get(values);
        return values;
    }

    private static void write(Path file, float[] values) throws IOException {
        ByteBuffer bytes = ByteBuffer.allocate(4 * values.length).order(ByteOrder.LITTLE_ENDIAN);
        bytes.asFloatBuffer().put(values);
        Files.write(file, bytes.array());
    }
}
