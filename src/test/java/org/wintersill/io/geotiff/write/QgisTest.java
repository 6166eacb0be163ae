package org.wintersill.io.geotiff.write;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.io.style.TemporalRange;
import org.wintersill.layer.LayerStyles;

/** Layers opened by headless QGIS ({@code src/test/python/open_styled.py}); skipped where it is missing. */
class QgisTest {
    private static final String PYTHON = "/usr/bin/python3";

    @TempDir
    Path folder;

    private static List<String> run(String... command) throws IOException, InterruptedException {
        Process process = new ProcessBuilder(command).redirectError(ProcessBuilder.Redirect.DISCARD).start();
        String output = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        return process.waitFor() == 0 ? output.lines().toList() : List.of();
    }

    @Test
    void layersOpenStyled() throws Exception {
        assumeTrue(Files.isExecutable(Path.of(PYTHON)) && !run(PYTHON, "-c", "import qgis.core; print(1)").isEmpty(),
                "needs python3-qgis");
        ExecutorService workers = Executors.newFixedThreadPool(2);
        CogFormat format = new CogFormat(SyntheticLayer.KEYS);
        SyntheticLayer.margins(600, 400, 1).write(format, folder.resolve("margin.tif"), workers);
        SyntheticLayer.classes(600, 400).write(format, folder.resolve("suitability.tif"), workers);
        workers.shutdown();
        TemporalRange winter = new TemporalRange(LocalDate.of(2003, 10, 1), LocalDate.of(2004, 5, 31));
        Files.writeString(folder.resolve("margin.qml"), QmlWriter.raster(LayerStyles.margin(), Optional.of(winter)));
        Files.writeString(folder.resolve("suitability.qml"),
                QmlWriter.raster(LayerStyles.suitability(), Optional.empty()));
        assertEquals(List.of("True singlebandpseudocolor ['-10 K', '-6 K', '-3 K', '-1 K', '0 K', '+1 K', '+3 K', "
                        + "'+6 K', '+10 K'] True True",
                "True paletted ['secure', 'workable', 'marginal', 'unfit'] False True"),
                run(PYTHON, "src/test/python/open_styled.py", folder.resolve("margin.tif").toString(),
                        folder.resolve("suitability.tif").toString()));
    }
}
