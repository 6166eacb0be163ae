package org.wintersill.io.geotiff.write;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Files read back by GDAL and numpy ({@code src/test/python/check_geotiff.py}); skipped where these are missing. */
class GdalTest {
    private static final String PYTHON = "/usr/bin/python3";
    private static ExecutorService workers;

    @TempDir
    Path folder;

    @BeforeAll
    static void needsGdal() throws IOException, InterruptedException {
        assumeTrue(Files.isExecutable(Path.of(PYTHON)) && run(PYTHON, "-c", "import osgeo.gdal, numpy").isEmpty(),
                "needs python3-gdal and python3-numpy");
        workers = Executors.newFixedThreadPool(2);
    }

    @AfterAll
    static void stop() {
        if (workers != null) {
            workers.shutdownNow();
        }
    }

    private static String run(String... command) throws IOException, InterruptedException {
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        String output = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        int code = process.waitFor();
        return code == 0 ? output.strip() : "exit " + code + "\n" + output;
    }

    private void readsBack(SyntheticLayer layer, CogFormat format) throws IOException, InterruptedException {
        Path file = folder.resolve("layer.tif");
        layer.write(format, file, workers);
        Path values = layer.dump(folder.resolve("layer.f32"));
        assertEquals("", run(PYTHON, "src/test/python/check_geotiff.py", file.toString(), values.toString(),
                layer.header().layer().type().name()));
    }

    private void readsBack(SyntheticLayer layer) throws IOException, InterruptedException {
        readsBack(layer, new CogFormat(SyntheticLayer.KEYS));
    }

    @Test
    void valuesStatisticsAndOverviewsOfQuantities() throws Exception {
        readsBack(SyntheticLayer.margins(1100, 700, 1));
    }

    @Test
    void nineteenWintersInOneFile() throws Exception {
        readsBack(SyntheticLayer.margins(300, 270, 19));
    }

    @Test
    void oneCell() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(1, 1, 1);
        layer.bands()[0][0] = -3.25f;
        readsBack(layer);
    }

    @Test
    void oddSides() throws Exception {
        readsBack(SyntheticLayer.margins(257, 513, 2));
        readsBack(SyntheticLayer.years(513, 257, 2));
        readsBack(SyntheticLayer.classes(257, 1025));
    }

    @Test
    void oneTileExactly() throws Exception {
        readsBack(SyntheticLayer.margins(256, 256, 1));
    }

    @Test
    void nothingButMissing() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(300, 300, 2);
        Arrays.fill(layer.bands()[1], Float.NaN);
        readsBack(layer);
    }

    @Test
    void infiniteValuesAreMissing() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(300, 300, 1);
        layer.bands()[0][7] = Float.NEGATIVE_INFINITY;
        layer.bands()[0][8] = Float.POSITIVE_INFINITY;
        readsBack(layer);
    }

    @Test
    void yearsAndClasses() throws Exception {
        readsBack(SyntheticLayer.years(900, 600, 3));
        readsBack(SyntheticLayer.classes(900, 600));
        readsBack(SyntheticLayer.of(SampleType.BYTE, 600, 600, 3, SyntheticLayer.LAEA, LayerStyles.suitability()));
    }

    @Test
    void bigTiffOfAllTypes() throws Exception {
        CogFormat big = new CogFormat(SyntheticLayer.KEYS, 0);
        readsBack(SyntheticLayer.margins(600, 600, 2), big);
        readsBack(SyntheticLayer.classes(600, 600), big);
    }

    @Test
    void wordsPlaceAndColoursArrive() throws Exception {
        Path file = folder.resolve("classes.tif");
        SyntheticLayer layer = SyntheticLayer.classes(600, 600);
        layer.write(new CogFormat(SyntheticLayer.KEYS), file, workers);
        CategorySidecar.write(file, LayerStyles.suitability());
        String script = """
                import sys
                from osgeo import gdal
                ds = gdal.Open(sys.argv[1]); b = ds.GetRasterBand(1)
                print(b.GetDescription(), '|', b.GetUnitType(), '|', ds.GetMetadataItem('CULTIVAR'))
                print(ds.GetMetadataItem('TIFFTAG_DATETIME'), '|', ds.GetMetadataItem('TIFFTAG_SOFTWARE'))
                print(ds.GetMetadataItem('TIFFTAG_IMAGEDESCRIPTION'), '|', ds.GetMetadataItem('AREA_OR_POINT'))
                print(ds.GetGeoTransform(), ds.GetSpatialRef().GetAuthorityCode(None))
                print(b.GetCategoryNames(), b.GetColorTable().GetColorEntry(1), b.GetColorTable().GetColorEntry(4))
                """;
        List<String> lines = new ArrayList<>(run(PYTHON, "-c", script, file.toString()).lines().toList());
        assertEquals("Margin 1980 | 1 | " + layer.header().metadata().get("CULTIVAR"), lines.get(0));
        assertEquals("2004:05:31 23:59:59 | Wintersill 0.1.0", lines.get(1));
        assertEquals("Sample margin: lowest of Tmin - LT50, negative is dangerous | Area", lines.get(2));
        assertEquals("(4000000.0, 1000.0, 0.0, 2900000.0, 0.0, -1000.0) 3035", lines.get(3));
        assertTrue(lines.get(4).startsWith("['', 'secure', 'workable', 'marginal', 'unfit'] (29, 78, 137, 255)"),
                lines.get(4));
    }
}
