package org.wintersill.run;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/** The run of the sample grids, done once for all tests that look at it. */
final class SampleRun {
    static final Path RUN_FILE = Path.of("sample-grids", "run.yaml");
    private static Path folder;
    private static final Map<String, RasterFile> RASTERS = new ConcurrentHashMap<>();

    private SampleRun() {
    }

    /** The finished output folder; nobody may change it. */
    static synchronized Path folder() {
        if (folder == null) {
            try {
                Path parent = Files.createTempDirectory("sample-run");
                Runtime.getRuntime().addShutdownHook(new Thread(() -> remove(parent)));
                Program.run("map", RUN_FILE.toString(), "--out", parent.resolve("out").toString(), "--threads", "2").expect(0);
                folder = parent.resolve("out");
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }
        return folder;
    }

    static RasterFile raster(String name) {
        Path file = folder().resolve(name + ".tif");
        return RASTERS.computeIfAbsent(name, key -> RasterFile.read(file));
    }

    private static void remove(Path root) {
        try (var walk = Files.walk(root)) {
            walk.sorted(java.util.Comparator.reverseOrder()).forEach(path -> path.toFile().delete());
        } catch (IOException e) {
            // a temporary folder that stays behind does no harm
        }
    }
}
