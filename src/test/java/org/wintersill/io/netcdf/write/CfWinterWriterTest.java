package org.wintersill.io.netcdf.write;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import ucar.ma2.Array;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;

class CfWinterWriterTest {

    @TempDir
    Path folder;

    static Path write(Path path, WinterFile file) {
        try (CfWinterWriter writer = CfWinterWriter.create(path, file)) {
            int columns = file.grid().columns();
            for (int winter = file.winters().size() - 1; winter >= 0; winter--) {
                for (int layer = 0; layer < file.layers().size(); layer++) {
                    writer.write(layer, winter, 0, 3, SampleWinters.rows(layer, winter, 0, 3, columns));
                    writer.write(layer, winter, 3, 1, SampleWinters.rows(layer, winter, 3, 1, columns));
                }
            }
            writer.finish();
        }
        return path;
    }

    private static WinterFile sample(String kind) {
        return switch (kind) {
            case "projected" -> SampleWinters.projected();
            case "geographic" -> SampleWinters.geographic();
            default -> SampleWinters.rotated();
        };
    }

    @ParameterizedTest
    @ValueSource(strings = {"projected", "geographic", "rotated"})
    void everyValueComesBackAndMissingIsTheFillValue(String kind) throws Exception {
        WinterFile file = sample(kind);
        try (NetcdfFile in = NetcdfFile.open(write(folder.resolve("a.nc"), file).toString())) {
            for (int layer = 0; layer < 3; layer++) {
                Variable variable = in.findVariable(file.layers().get(layer).column());
                double fill = variable.findAttribute("_FillValue").getNumericValue().doubleValue();
                assertEquals(file.layers().get(layer).type().nodata(), fill);
                assertEquals(variable.getDataType(), variable.findAttribute("_FillValue").getDataType());
                Array values = variable.read();
                assertEquals(2 * 4 * 6, values.getSize());
                for (int i = 0; i < values.getSize(); i++) {
                    float expected = SampleWinters.value(layer, i / 24, i % 24 / 6, i % 6);
                    assertEquals(Float.isNaN(expected) ? fill : expected, values.getDouble(i));
                }
            }
        }
    }

    @Test
    void theTimeLiesInTheYearOfTheWinterAndInsideItsBounds() throws Exception {
        WinterFile file = SampleWinters.geographic();
        try (NetcdfFile in = NetcdfFile.open(write(folder.resolve("a.nc"), file).toString())) {
            Array time = in.findVariable("time").read();
            Array bounds = in.findVariable("time_bnds").read();
            assertEquals("noleap", in.findVariable("time").findAttribute("calendar").getStringValue());
            for (int i = 0; i < 2; i++) {
                // 273 days from 1 September to 31 May without leap day.
                assertEquals(365L * (33 + i) + 243, bounds.getLong(2 * i));
                assertEquals(bounds.getLong(2 * i) + 273, bounds.getLong(2 * i + 1));
                assertEquals(file.winters().get(i).calendar().date(time.getLong(i)), file.winters().get(i).last());
                assertEquals(2004 + i, in.findVariable("winter").read().getInt(i));
            }
        }
    }

    @Test
    void coordinatesAreCellCentresFromTheNorthWest() throws Exception {
        try (NetcdfFile in = NetcdfFile.open(write(folder.resolve("a.nc"), SampleWinters.projected()).toString())) {
            assertEquals(4_000_500, in.findVariable("x").read().getDouble(0));
            assertEquals(2_899_750, in.findVariable("y").read().getDouble(0));
            assertEquals(2_898_250, in.findVariable("y").read().getDouble(3));
            assertEquals("m", in.findVariable("y").getUnitsString());
        }
    }

    @Test
    void classesAreFlags() throws Exception {
        try (NetcdfFile in = NetcdfFile.open(write(folder.resolve("a.nc"), SampleWinters.projected()).toString())) {
            Variable phase = in.findVariable("phase");
            assertEquals("autumn mid_winter", phase.findAttribute("flag_meanings").getStringValue());
            assertEquals(phase.getDataType(), phase.findAttribute("flag_values").getDataType());
            assertEquals("thematicClassification", phase.findAttribute("coverage_content_type").getStringValue());
            assertEquals("temperature: difference",
                    in.findVariable("margin").findAttribute("units_metadata").getStringValue());
        }
    }

    @Test
    void theSameCallsGiveTheSameBytesInAnyLocale() throws Exception {
        Path first = write(folder.resolve("first.nc"), SampleWinters.projected());
        byte[] head = Files.readAllBytes(first);
        assertEquals("CDF\2", new String(head, 0, 4, "US-ASCII"));
        Locale locale = Locale.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag("tr-TR"));
            Thread.sleep(20);
            assertEquals(-1, Files.mismatch(first, write(folder.resolve("second.nc"), SampleWinters.projected())));
        } finally {
            Locale.setDefault(locale);
        }
    }

    @Test
    void closingBeforeTheEndLeavesNothing() throws Exception {
        Path path = folder.resolve("gone.nc");
        try (CfWinterWriter writer = CfWinterWriter.create(path, SampleWinters.projected())) {
            assertTrue(Files.exists(path));
            writer.write(0, 0, 0, 1, new float[6]);
            assertThrows(IllegalStateException.class, writer::finish);
        }
        assertFalse(Files.exists(path));
    }

    @Test
    void aFolderThatIsNotThereIsOneProblem() {
        ProblemException thrown = assertThrows(ProblemException.class,
                () -> CfWinterWriter.create(folder.resolve("none").resolve("a.nc"), SampleWinters.projected()));
        assertEquals(Problem.Kind.OUTPUT, thrown.problems().get(0).kind());
    }

    @Test
    void aVariableTooLargeForTheFormatIsRefusedBeforeAnythingIsWritten() {
        WinterFile small = SampleWinters.geographic();
        Crs crs = small.grid().crs();
        WinterFile large = new WinterFile(new GridGeometry(40_000, 20_000, 0, 0, 0.001, 0.001, crs), small.globe(),
                small.winters(), small.layers(), small.gridMapping(), small.attributes());
        ProblemException thrown = assertThrows(ProblemException.class,
                () -> CfWinterWriter.create(folder.resolve("a.nc"), large));
        assertEquals(Problem.Kind.LIMIT, thrown.problems().get(0).kind());
        assertFalse(Files.exists(folder.resolve("a.nc")));
    }

    @Test
    void attributesThatCataloguesAskForMustBeGiven() {
        WinterFile file = SampleWinters.geographic();
        assertThrows(IllegalArgumentException.class, () -> new WinterFile(file.grid(), file.globe(), file.winters(),
                file.layers(), file.gridMapping(), java.util.Map.of("title", "alone")));
    }

    @Test
    void aRotatedPoleIsNotDescribedAsTheUnrotatedSystem() {
        WinterFile file = SampleWinters.rotated();
        assertThrows(IllegalArgumentException.class, () -> new WinterFile(file.grid(), file.globe(), file.winters(),
                file.layers(), java.util.Map.of("grid_mapping_name", "rotated_latitude_longitude", "crs_wkt",
                        SampleWinters.WGS84), file.attributes()));
    }

    /** Independent reading by netCDF4-python and GDAL; the script says what it compares. */
    @ParameterizedTest
    @ValueSource(strings = {"projected", "geographic", "rotated"})
    void otherProgramsReadTheSame(String kind) throws Exception {
        Path python = Path.of("/usr/bin/python3");
        Assumptions.assumeTrue(Files.isExecutable(python), "no /usr/bin/python3");
        Assumptions.assumeTrue(new ProcessBuilder(python.toString(), "-c", "import netCDF4, osgeo.gdal, xarray")
                .redirectErrorStream(true).start().waitFor() == 0, "no netCDF4, GDAL and xarray for Python");
        Path path = write(folder.resolve(kind + ".nc"), sample(kind));
        Process process = new ProcessBuilder(List.of(python.toString(), "src/test/python/check_winters.py",
                path.toString(), kind)).redirectErrorStream(true).start();
        String said = new String(process.getInputStream().readAllBytes(), "UTF-8");
        assertEquals(0, process.waitFor(), said);
    }
}
