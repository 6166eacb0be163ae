package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The layer of the milder site is made of mean margins, whether these are written or not. */
class MilderSiteRunTest {
    @TempDir
    Path folder;

    @Test
    void theLayerAloneIsTheSameAsBesideOthers() {
        RunFolder run = RunFolder.of(folder, new RecordFile(ColdRecord.threeWinters(5, 6)));
        String text = "temperature: {minimum: daily}\ncultivars: cultivars.yaml\ndamage: {neighbourhood-km: 120}\n"
                + "outputs: {geopackage: false, winters: false, layers: ";
        run.text("run.yaml", text + "[milder-site-gain]}\n").map();
        float[] alone = run.raster("oat/milder-site-gain").bands()[0];
        run.text("run.yaml", text + "[milder-site-gain, margin-mean]}\n").map("--overwrite");
        float[] margins = run.raster("oat/margin-mean").bands()[0];
        float[] beside = run.raster("oat/milder-site-gain").bands()[0];
        float best = Float.NEGATIVE_INFINITY;
        float most = 0;
        for (int cell = 0; cell < alone.length; cell++) {
            assertEquals(alone[cell], beside[cell]);
            best = Math.max(best, margins[cell]);
            most = Math.max(most, alone[cell]);
        }
        float lowest = Float.POSITIVE_INFINITY;
        for (float margin : margins) {
            lowest = Math.min(lowest, margin);
        }
        // Within 120 km every cell sees most of the grid, so the worst place gains nearly all there is to gain, and none gains more.
        assertEquals(best - lowest, most, 0.5 * (best - lowest));
    }
}
