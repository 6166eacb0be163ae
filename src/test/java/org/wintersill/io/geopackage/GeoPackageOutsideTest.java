package org.wintersill.io.geopackage;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.grid.GridGeometry;

/** What GDAL says of the files: its conformance checker, ogrinfo, edits through it, and its own polygons of a raster. */
class GeoPackageOutsideTest {

    private static final Path PYTHON = Path.of("/usr/bin/python3");
    private static final int COLUMNS = 90;
    private static final int ROWS = 70;

    @TempDir
    Path folder;

    @Test
    void filesConformAndPartsAreThoseOfGdal() throws Exception {
        Assumptions.assumeTrue(Files.isExecutable(PYTHON), "no /usr/bin/python3");
        Assumptions.assumeTrue(new ProcessBuilder(PYTHON.toString(), "-c",
                "import osgeo.gdal, osgeo_utils.samples.validate_gpkg, subprocess; subprocess.run(['ogrinfo', '--version'])")
                .redirectErrorStream(true).start().waitFor() == 0, "no GDAL with its Python samples");
        Path sample = SampleGeoPackage.write(folder.resolve("sample.gpkg"));
        byte[] codes = noise();
        Path raw = Files.write(folder.resolve("codes"), codes);
        Path parts = folder.resolve("parts.gpkg");
        writeParts(parts, codes);
        Process process = new ProcessBuilder(List.of(PYTHON.toString(), "src/test/python/check_geopackage.py",
                sample.toString(), parts.toString(), raw.toString(), Integer.toString(COLUMNS)))
                .redirectErrorStream(true).start();
        String said = new String(process.getInputStream().readAllBytes(), "UTF-8");
        assertEquals(0, process.waitFor(), said);
    }

    private static byte[] noise() {
        Random random = new Random(20060131);
        byte[] codes = new byte[COLUMNS * ROWS];
        for (int i = 0; i < codes.length; i++) {
            codes[i] = (byte) (random.nextInt(3) == 0 || i < COLUMNS ? random.nextInt(5) : codes[i - COLUMNS]);
        }
        return codes;
    }

    private static void writeParts(Path file, byte[] codes) {
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, SampleGeoPackage.LAST_CHANGE)) {
            int srs = writer.addCrs(CrsRow.of(SampleGeoPackage.LAEA, SampleGeoPackage.LAEA_WKT2, CrsRow.FIRST_OWN_ID));
            FeatureTable table = writer.features(new TableDefinition("parts", "Parts", "connected parts", "POLYGON", srs,
                    List.of(Column.count("class_code", "Class", "class"), Column.count("part", "Part", "number"))));
            ClassPolygons polygons = new ClassPolygons(
                    new GridGeometry(COLUMNS, ROWS, 4_321_000, 3_210_000, 100, 50, SampleGeoPackage.LAEA), codes);
            for (int code : polygons.classes()) {
                polygons.parts(code, (part, polygon) -> table.add(polygon, code, part));
            }
            writer.finish();
        }
    }
}
