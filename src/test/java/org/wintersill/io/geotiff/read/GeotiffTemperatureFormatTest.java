package org.wintersill.io.geotiff.read;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.grid.Block;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;
import org.wintersill.time.CfDate;

/** Files made by GDAL with {@code src/test/python/geotiff_read_fixtures.py}, which states the formula of their values. */
class GeotiffTemperatureFormatTest {
    static final Path FILES = Path.of("src/test/resources/geotiff-read");
    private static final TemperatureRequest MINIMUM = TemperatureRequest.of(ForcingVariable.MINIMUM);

    private final GeotiffTemperatureFormat format = new GeotiffTemperatureFormat(new GeoToolsCrs());
    private final Notices notices = new Notices();

    private DailyTemperatureSource open(String name, TemperatureRequest request) {
        return format.open(FILES.resolve(name), request, notices);
    }

    private static TemperatureRequest request(TemperatureUnit unit, Double scale, String dates, CfDate first, String crs) {
        return new TemperatureRequest(ForcingVariable.MINIMUM, Optional.empty(), Optional.ofNullable(unit), Optional.ofNullable(scale),
                Optional.empty(), Optional.ofNullable(dates), Optional.ofNullable(first), Optional.empty(), Optional.ofNullable(crs));
    }

    private static float[] read(DailyTemperatureSource source, int firstDay, int days, Block block) {
        float[] out = new float[days * block.cells()];
        try (DailyTemperatureReader reader = source.open()) {
            reader.read(firstDay, days, block, out, 0, block.cells());
        }
        return out;
    }

    private static float expected(int day, int row, int column) {
        return (row + 2 * column) % 17 == 0 ? Float.NaN : (float) (-20 + 1.5 * day + 0.5 * row - 0.25 * column);
    }

    private static void assertFormula(DailyTemperatureSource source, int days, Block block, double tolerance) {
        float[] values = read(source, 0, days, block);
        int at = 0;
        for (int day = 0; day < days; day++) {
            for (int row = block.row(); row < block.rowEnd(); row++) {
                for (int column = block.column(); column < block.columnEnd(); column++, at++) {
                    assertEquals(expected(day, row, column), values[at], tolerance, "day " + day + " row " + row + " column " + column);
                }
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"none-strips", "none-tiles-apart", "lzw-strips", "lzw-tiles-apart", "lzw2-strips", "lzw2-tiles-apart",
        "lzw3-strips", "lzw3-tiles-apart", "deflate-strips", "deflate-tiles-apart", "deflate2-strips", "deflate2-tiles-apart",
        "deflate3-strips", "deflate3-tiles-apart", "packbits-strips", "packbits-tiles-apart", "zstd-strips", "zstd-tiles-apart",
        "zstd3-strips", "zstd3-tiles-apart", "big-endian", "big-endian-lzw2", "big-endian-deflate3", "bigtiff", "bigtiff-big-endian",
        "float64", "float64-lzw2", "int16-scaled", "int16-offset", "nodata-first", "kelvin", "fahrenheit", "nodata-nan", "nodata-lowest",
        "nodata-lowest-short", "mask", "south-up", "unordered", "overviews", "pixel-is-point"})
    void everyKindOfFileHoldsTheSameTemperatures(String name) {
        DailyTemperatureSource source = open(name + ".tif", MINIMUM);
        assertEquals(40, source.grid().columns());
        assertEquals(24, source.grid().rows());
        assertEquals("EPSG:4326", source.grid().crs().code());
        assertEquals(5.0, source.grid().west(), 1e-9);
        assertEquals(48.0, source.grid().north(), 1e-9);
        assertEquals(45.6, source.grid().south(), 1e-9);
        assertEquals(3, source.days().size());
        assertEquals("2003-01-15", source.days().date(0).toString());
        double tolerance = 2e-5;
        assertFormula(source, 3, source.grid().whole(), tolerance);
        assertFormula(source, 2, new Block(13, 5, 21, 12), tolerance);
        assertFormula(source, 1, new Block(39, 23, 1, 1), tolerance);
    }

    @Test
    void offsetAndStrideAreKept() {
        DailyTemperatureSource source = open("none-tiles-apart.tif", MINIMUM);
        float[] out = new float[50];
        Arrays.fill(out, 99);
        try (DailyTemperatureReader reader = source.open()) {
            reader.read(1, 2, new Block(3, 2, 2, 2), out, 7, 20);
            assertEquals(0, reader.valuesSetAside());
        }
        assertEquals(expected(1, 2, 3), out[7]);
        assertEquals(expected(1, 3, 4), out[10]);
        assertEquals(expected(2, 2, 3), out[27]);
        assertEquals(99, out[11]);
        assertEquals(99, out[6]);
    }

    @Test
    void tilesThatAreNotInTheFileHaveNoValues() {
        float[] values = read(open("sparse.tif", MINIMUM), 0, 1, new Block(0, 0, 40, 24));
        for (int i = 0; i < values.length; i++) {
            assertEquals(i / 40 < 16 && i % 40 < 16 ? expected(0, i / 40, i % 40) : Float.NaN, values[i]);
        }
    }

    @Test
    void southUpLayoutKnowsItsCutStrip() {
        DailyTemperatureSource source = open("south-up.tif", MINIMUM);
        assertEquals(7, source.layout().rows());
        assertEquals(24 % 7, source.layout().rowOffset());
    }

    @Test
    void scaleOfTheRunFileUnpacksIntegers() {
        assertFormula(open("int16-unscaled.tif", request(null, 0.01, null, null, null)), 3, new Block(0, 0, 40, 24), 1e-5);
        refused("int16-unscaled.tif", MINIMUM, "scale: 0.1", "median");
        refused("int16-scaled.tif", request(null, 0.1, null, null, null), "scale");
    }

    @Test
    void undeclaredFillIsSetAsideAndCounted() {
        DailyTemperatureSource source = open("nodata-undeclared.tif", MINIMUM);
        assertFormula(source, 3, source.grid().whole(), 1e-5);
        try (DailyTemperatureReader reader = source.open()) {
            reader.read(0, 1, source.grid().whole(), new float[960], 0, 960);
            long holes = java.util.stream.IntStream.range(0, 960).filter(i -> (i / 40 + 2 * (i % 40)) % 17 == 0).count();
            assertEquals(holes, reader.valuesSetAside());
        }
    }

    @Test
    void globalLongitudesAreRolled() {
        DailyTemperatureSource source = open("lon-0-360.tif", MINIMUM);
        assertEquals(-180, source.grid().west(), 1e-9);
        float[] row = read(source, 0, 1, new Block(0, 4, 36, 1));
        // Column k of the file lies at longitude 10 k + 5 and holds k - 18: 185 E, the first after rolling, is k = 18.
        assertEquals(0f, row[0]);
        assertEquals(17f, row[17]);
        assertEquals(-18f, row[18]);
        assertEquals(-1f, row[35]);
        assertArrayEquals(new float[] {16, 17, -18, -17}, read(source, 0, 1, new Block(16, 0, 4, 1)));
    }

    @Test
    void datesComeFromWhereTheyAreSaid() {
        assertEquals("2001-02-27", open("no-dates.tif", request(null, null, null, new CfDate(2001, 2, 27), null)).days().date(0).toString());
        assertEquals("2001-03-01", open("no-dates.tif", request(null, null, null, new CfDate(2001, 2, 27), null)).days().date(2).toString());
        assertEquals("2003-01-15", open("tmin_20030115.tif", MINIMUM).days().date(0).toString());
        assertTrue(notices.counts().keySet().stream().anyMatch(t -> t.contains("from their names")));
        assertEquals("2003-01-15", open("tmin_20030115.tif", request(null, null, "yyyyMMdd", null, null)).days().date(0).toString());
        assertEquals("2003-01-15", open("tmin_2003015.tif", request(null, null, "yyyyDDD", null, null)).days().date(0).toString());
        DailyTemperatureSource february = open("tmin_2004_02.tif", request(null, null, "yyyy_MM", null, null));
        assertEquals(29, february.days().size());
        assertEquals("2004-02-29", february.days().date(28).toString());
    }

    @Test
    void datesThatDoNotFitAreRefused() {
        refused("tmin_2003_02.tif", request(null, null, "yyyy_MM", null, null), "2003-02", "28", "29 bands");
        refused("no-dates.tif", MINIMUM, "first-day:", "dates:");
        refused("tmin_2003015.tif", MINIMUM, "first-day:");
        refused("none-strips.tif", request(null, null, null, new CfDate(2003, 1, 14), null), "2003-01-15", "2003-01-14");
        refused("twice.tif", MINIMUM, "2003-01-15", "twice", "band 1", "band 3");
        refused("tmin_20030115.tif", request(null, null, "yyyy-mm-dd", null, null), "yyyyMMdd");
        refused("no-dates.tif", request(null, null, "yyyyMMdd", null, null), "no date");
    }

    @Test
    void unitsMustBeKnownAndFit() {
        refused("no-unit.tif", MINIMUM, "unit:");
        assertFormula(open("no-unit.tif", request(TemperatureUnit.CELSIUS, null, null, null, null)), 3, new Block(0, 0, 40, 24), 1e-5);
        refused("kelvin-as-celsius.tif", MINIMUM, "median", "degC", "unit: K");
        refused("kelvin.tif", request(TemperatureUnit.CELSIUS, null, null, null, null), "K", "degC");
        refused("dem-feet.tif", request(null, null, null, new CfDate(2003, 1, 1), null), "'ft'");
    }

    @Test
    void theSampleIsTakenFromTheFirstFileAlone() {
        open("none-strips.tif", MINIMUM);
        // Its unit is wrong, but thousands of files of one set are not all looked into.
        open("kelvin-as-celsius.tif", MINIMUM);
    }

    @Test
    void placesAndSystemsMustBeSaid() {
        refused("no-crs.tif", MINIMUM, "crs:");
        assertEquals("EPSG:4258", open("no-crs.tif", request(null, null, null, null, "EPSG:4258")).grid().crs().code());
        refused("none-strips.tif", request(null, null, null, null, "EPSG:2056"), "EPSG:4326", "EPSG:2056");
        refused("no-place.tif", MINIMUM, "georeference", ".tfw");
        refused("rotated.tif", MINIMUM, "rotated", "gdalwarp");
    }

    @Test
    void otherQuantitiesAndMembersAreRefused() {
        refused("maximum.tif", MINIMUM, "maximum", "minimum");
        refused("none-strips.tif", new TemperatureRequest(ForcingVariable.MINIMUM, Optional.empty(), Optional.empty(), Optional.empty(),
                Optional.empty(), Optional.empty(), Optional.empty(), Optional.of("3"), Optional.empty()), "member");
        refused("pages.tif", MINIMUM, "pages");
    }

    @ParameterizedTest
    @ValueSource(strings = {"LERC", "JPEG", "LZMA"})
    void compressionsThatCannotBeReadAreRefusedByName(String name) {
        refused(name.toLowerCase(java.util.Locale.ROOT) + ".tif", MINIMUM, name, "COMPRESS=DEFLATE");
    }

    @Test
    void filesThatAreNoneAreRefusedInWords(@TempDir Path folder) throws IOException {
        refused(Files.write(folder.resolve("a.tif"), new byte[0]), "empty");
        refused(Files.write(folder.resolve("b.tif"), new byte[] {0x1f, (byte) 0x8b, 8, 0, 0, 0, 0, 0, 0, 0}), "gzip", "gunzip");
        refused(Files.writeString(folder.resolve("c.tif"), "<!DOCTYPE html><html>login</html>"), "web page");
        refused(Files.writeString(folder.resolve("d.tif"), "CDF\1 something else entirely"), "TIFF");
        refused(folder.resolve("absent.tif"), "no such file");
        byte[] whole = Files.readAllBytes(FILES.resolve("deflate-strips.tif"));
        for (int length : new int[] {3, 8, 12, 100, whole.length / 2, whole.length - 10}) {
            refused(Files.write(folder.resolve("cut.tif"), Arrays.copyOf(whole, length)), "cut.tif");
        }
    }

    @Test
    void damagedBytesGiveOneProblemOrAnotherNumberButNeverAStackTrace(@TempDir Path folder) throws IOException {
        for (String name : new String[] {"lzw2-strips.tif", "deflate3-tiles-apart.tif", "packbits-strips.tif", "zstd-strips.tif", "bigtiff.tif"}) {
            byte[] whole = Files.readAllBytes(FILES.resolve(name));
            java.util.Random random = new java.util.Random(7);
            for (int i = 0; i < 150; i++) {
                byte[] damaged = whole.clone();
                for (int k = 0; k < 3; k++) {
                    damaged[random.nextInt(i % 2 == 0 ? Math.min(600, whole.length) : whole.length)] = (byte) random.nextInt();
                }
                Path file = Files.write(folder.resolve("damaged.tif"), damaged);
                try {
                    DailyTemperatureSource source = new GeotiffTemperatureFormat(new GeoToolsCrs()).open(file, MINIMUM, notices);
                    if (source.grid().cells() < 100000) {
                        read(source, 0, source.days().size(), source.grid().whole());
                    }
                } catch (ProblemException e) {
                    assertEquals(1, e.problems().size());
                }
            }
        }
    }

    @Test
    void bothByteOrdersAndBigTiffAreRecognised() throws IOException {
        for (String name : new String[] {"none-strips", "big-endian", "bigtiff", "bigtiff-big-endian"}) {
            byte[] head = Arrays.copyOf(Files.readAllBytes(FILES.resolve(name + ".tif")), 16);
            assertTrue(format.recognises(FILES.resolve(name + ".tif"), head), name);
        }
        assertTrue(!format.recognises(Path.of("a.nc"), new byte[] {'C', 'D', 'F', 1}));
        assertTrue(!format.recognises(Path.of("a.tif"), new byte[] {'I', 'I'}));
    }

    private void refused(String name, TemperatureRequest request, String... words) {
        ProblemException e = assertThrows(ProblemException.class, () -> new GeotiffTemperatureFormat(new GeoToolsCrs()).open(FILES.resolve(name), request, notices));
        check(e, name, words);
    }

    private void refused(Path file, String... words) {
        ProblemException e = assertThrows(ProblemException.class, () -> format.open(file, MINIMUM, notices));
        check(e, file.getFileName().toString(), words);
    }

    private static void check(ProblemException e, String name, String... words) {
        assertEquals(1, e.problems().size());
        assertTrue(e.problems().get(0).where().endsWith(name), e.getMessage());
        for (String word : words) {
            assertTrue(e.getMessage().contains(word), word + " is not in: " + e.getMessage());
        }
    }
}
