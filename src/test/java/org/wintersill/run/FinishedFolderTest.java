package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.grid.Block;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.problem.ProblemException;

class FinishedFolderTest {
    @TempDir
    Path folder;

    @Test
    void theSampleOutputsAreReadAsTheyWereWritten() {
        FinishedFolder finished = FinishedFolder.open(SampleRun.folder(), new GeoToolsCrs());
        assertEquals(List.of("amber", "slate", "fern"), finished.cultivars());
        assertEquals(240, finished.grid().columns());
        float[][] plain = RasterFile.read(SampleRun.folder().resolve("slate/winters/margin.tif")).bands();
        try (PlainRaster raster = finished.winters("slate", "margin")) {
            float[] values = new float[60];
            for (int winter = 0; winter < raster.bands(); winter++) {
                assertEquals(finished.winters().get(winter), raster.bandName(winter));
                raster.read(winter, new Block(100, 50, 20, 3), values);
                for (int i = 0; i < values.length; i++) {
                    assertEquals(plain[winter][(50 + i / 20) * 240 + 100 + i % 20], values[i]);
                }
            }
        }
        assertTrue(finished.layer("slate", "no-such-layer").isEmpty());
        assertTrue(assertThrows(ProblemException.class, () -> finished.chosen(List.of("slat"))).getMessage().contains("slate"));
    }

    @Test
    void whatIsNoFinishedFolderIsRefused() throws Exception {
        GeoToolsCrs crs = new GeoToolsCrs();
        assertThrows(ProblemException.class, () -> FinishedFolder.open(folder, crs));
        assertThrows(ProblemException.class, () -> FinishedFolder.open(folder.resolve("absent"), crs));
        for (String record : List.of("", "{", "[]", "{\"version\": 2}", "{\"version\": 1, \"cultivars\": [], \"winters\": []}",
                "{\"version\": 1, \"cultivars\": [], \"winters\": [], \"outputs\": [{\"path\": \"../x.tif\"}]}")) {
            Files.writeString(folder.resolve("record.json"), record);
            assertThrows(ProblemException.class, () -> FinishedFolder.open(folder, crs), record);
        }
    }
}
