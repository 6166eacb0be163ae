package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.time.CfDate;

/** The way in which a record is stored never shows in the maps. */
class SameMapLaws {
    private static final ColdRecord RECORD = ColdRecord.threeWinters(5, 6);
    @TempDir
    static Path shared;
    @TempDir
    Path folder;
    private static RunFolder plain;

    @BeforeAll
    static void mapThePlainForm() {
        plain = RunFolder.of(shared, new RecordFile(RECORD)).map();
    }

    static Stream<Arguments> forms() {
        return Stream.of(form("south-up", RecordFile::southUp),
                form("time last", file -> file.order("lat", "lon", "time")),
                form("x before y", file -> file.order("time", "lon", "lat")),
                form("everything turned round", file -> file.order("lon", "lat", "time").southUp()),
                form("float", file -> file.plain(float.class, "degC")),
                form("double", file -> file.plain(double.class, "degC")),
                form("finer packing", file -> file.scale(0.05)),
                form("gregorian", file -> file.calendar("gregorian")),
                form("proleptic_gregorian", file -> file.calendar("proleptic_gregorian")),
                form("longitudes beyond 180", RecordFile::eastwards),
                form("record dimension", RecordFile::unlimited),
                form("record dimension of floats", file -> file.unlimited().plain(float.class, "degC")),
                form("hours", RecordFile::hours));
    }

    private static Arguments form(String name, UnaryOperator<RecordFile> change) {
        return Arguments.of(name, change);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("forms")
    void theFormOfStorageChangesNothing(String name, UnaryOperator<RecordFile> change) {
        assertSame(RunFolder.of(folder, change.apply(new RecordFile(RECORD))).map());
    }

    @Test
    void theMapIsNotEmptyAndHasKillingWinters() {
        RasterFile margin = plain.raster("oat/winters/margin");
        assertEquals(List.of("2001-02", "2002-03", "2003-04"), List.of(margin.names()));
        assertEquals(30, margin.valid(0));
        boolean killing = false;
        boolean sparing = false;
        for (float[] winter : plain.raster("oat/winters/margin").bands()) {
            for (float value : winter) {
                killing |= value < 0;
                sparing |= value > 0;
            }
        }
        assertTrue(killing && sparing, "the record tells cells and winters apart: " + Arrays.deepToString(margin.bands()));
    }

    @ParameterizedTest
    @MethodSource("units")
    void otherUnitsGiveTheSameWithinRoundOff(String unit, Class<?> type, double tolerance) {
        RunFolder run = RunFolder.of(folder, new RecordFile(RECORD).plain(type, unit)).map();
        for (String layer : List.of("oat/winters/margin", "rye/winters/margin", "shared/winters/minimum", "rye/margin-mean")) {
            float[][] expected = plain.raster(layer).bands();
            float[][] actual = run.raster(layer).bands();
            for (int band = 0; band < expected.length; band++) {
                assertArrayEquals(expected[band], actual[band], (float) tolerance, layer);
            }
        }
    }

    static Stream<Arguments> units() {
        return Stream.of(Arguments.of("K", float.class, 1e-4), Arguments.of("K", double.class, 1e-5),
                Arguments.of("degF", float.class, 1e-4), Arguments.of("degF", double.class, 1e-5));
    }

    @Test
    void severalFilesInAnyOrderAreOneRecord() {
        RunFolder run = new RunFolder(folder);
        new RecordFile(RECORD.between(new CfDate(2003, 1, 18), new CfDate(2004, 6, 10))).southUp().write(run.daily("a.nc"));
        new RecordFile(RECORD.between(new CfDate(2001, 8, 20), new CfDate(2001, 12, 31))).plain(float.class, "degC")
                .write(run.daily("z.nc"));
        new RecordFile(RECORD.between(new CfDate(2002, 1, 1), new CfDate(2003, 1, 17))).order("lat", "lon", "time")
                .write(run.daily("k.nc"));
        assertSame(run.map());
    }

    @Test
    void filesMayTakeTurns() {
        RunFolder run = new RunFolder(folder);
        new RecordFile(RECORD.keep(day -> day % 2 == 0)).write(run.daily("even.nc"));
        new RecordFile(RECORD.keep(day -> day % 2 == 1)).write(run.daily("odd.nc"));
        assertSame(run.map());
    }

    @Test
    void daysOutsideOfTheWinterChangeNothing() {
        RunFolder run = RunFolder.of(folder, new RecordFile(RECORD.keep(day -> {
            int month = RECORD.calendar().date(RECORD.days()[day]).month();
            return month < 6 || month > 8;
        })));
        assertSame(run.map());
    }

    @Test
    void anotherPlaceMovesTheMapAlong() {
        RunFolder run = RunFolder.of(folder, new RecordFile(RECORD.at(RECORD.west() + 1.5, RECORD.north() + 1, RECORD.step()))).map();
        assertSameRasters(plain.rasters(), run.rasters());
        RasterFile here = plain.raster("oat/margin-mean");
        RasterFile there = run.raster("oat/margin-mean");
        assertEquals(here.west() + 1.5, there.west(), 1e-9);
        assertEquals(here.north() + 1, there.north(), 1e-9);
    }

    @Test
    void aMissingFrameStaysMissingAndChangesNothingInside() {
        RunFolder run = RunFolder.of(folder, new RecordFile(RECORD.framed(2))).map();
        plain.rasters().forEach((name, bands) -> {
            RasterFile wide = RasterFile.read(run.path("out/" + name));
            assertTrue(RasterFile.same(bands, wide.part(2, 2, RECORD.rows(), RECORD.columns())), name);
            assertTrue(Arrays.stream(wide.part(0, 0, 2, RECORD.columns() + 4)).allMatch(SameMapLaws::isMissing)
                    || name.endsWith("valid-winters.tif"), name);
        });
    }

    private static boolean isMissing(float[] values) {
        for (float value : values) {
            if (value == value) {
                return false;
            }
        }
        return true;
    }

    @Test
    void aGlobeMayBeginAtAnyColumn() {
        ColdRecord globe = ColdRecord.threeWinters(3, 24).at(-180, 70, 15);
        RunFolder here = RunFolder.of(folder.resolve("a"), new RecordFile(globe)).map();
        RunFolder there = RunFolder.of(folder.resolve("b"), new RecordFile(globe).rolled(12)).map();
        assertEquals(List.of(), RunFolder.differing(here.outputsButRecord(), there.outputsButRecord()));
    }

    @Test
    void aGeotiffWithOneBandADayGivesTheSame() {
        RunFolder run = new RunFolder(folder);
        RecordInTiff.write(run.daily("tmin.tif"), RECORD);
        assertSame(run.map());
    }

    @Test
    void aGeotiffMayFollowANetcdf() {
        RunFolder run = new RunFolder(folder);
        new RecordFile(RECORD.between(new CfDate(2001, 1, 1), new CfDate(2003, 2, 3))).write(run.daily("tmin.nc"));
        RecordInTiff.write(run.daily("tmin.tif"), RECORD.between(new CfDate(2003, 2, 4), new CfDate(2004, 12, 31)));
        assertSame(run.map());
    }

    /** Chunks and compression of netCDF-4, written by an independent library. */
    @ParameterizedTest
    @ValueSource(strings = {"1,5,6", "40,2,4", "1000,5,6", "7,1,1"})
    void chunksAndDeflateChangeNothing(String chunks) throws Exception {
        Path python = Path.of("/usr/bin/python3");
        Assumptions.assumeTrue(Files.isExecutable(python), "no /usr/bin/python3 here");
        Assumptions.assumeTrue(new ProcessBuilder(python.toString(), "-c", "import netCDF4").start().waitFor() == 0,
                "python3 has no netCDF4 here");
        RunFolder run = new RunFolder(folder);
        new RecordFile(RECORD).write(run.path("classic.nc"));
        Process rechunk = new ProcessBuilder(python.toString(), Path.of("src/test/python/rechunk_netcdf.py").toString(),
                run.path("classic.nc").toString(), run.daily("tmin.nc").toString(), chunks).inheritIO().start();
        assertEquals(0, rechunk.waitFor());
        assertSame(run.map());
    }

    private static void assertSame(RunFolder run) {
        assertSameRasters(plain.rasters(), run.rasters());
        assertEquals(List.of(), RunFolder.differing(plain.outputsButRecord(), run.outputsButRecord()));
    }

    private static void assertSameRasters(Map<String, float[][]> expected, Map<String, float[][]> actual) {
        assertEquals(expected.keySet(), actual.keySet());
        expected.forEach((name, bands) -> assertTrue(RasterFile.same(bands, actual.get(name)), name));
    }
}
