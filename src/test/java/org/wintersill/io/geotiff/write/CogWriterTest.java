package org.wintersill.io.geotiff.write;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.TimeZone;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.grid.Crs;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.RasterWriter;
import org.wintersill.layer.SampleType;
import org.wintersill.problem.ProblemException;

class CogWriterTest {
    private final CogFormat format = new CogFormat(SyntheticLayer.KEYS);
    private final ExecutorService workers = Executors.newFixedThreadPool(2);

    @TempDir
    Path folder;

    @AfterEach
    void stop() {
        workers.shutdownNow();
    }

    private PlainTiff written(SyntheticLayer layer) throws IOException {
        Path file = folder.resolve("layer.tif");
        layer.write(format, file, workers);
        return new PlainTiff(file);
    }

    private static float[] stored(float[] values, SampleType type) {
        float[] stored = values.clone();
        for (int i = 0; i < stored.length; i++) {
            stored[i] = Float.isNaN(stored[i]) ? type.nodata() : stored[i];
        }
        return stored;
    }

    @Test
    void everyValueOfEveryTypeComesBack() throws Exception {
        for (SyntheticLayer layer : new SyntheticLayer[] {SyntheticLayer.margins(300, 515, 3),
            SyntheticLayer.years(515, 300, 2), SyntheticLayer.classes(257, 257), SyntheticLayer.margins(1, 1, 1)}) {
            PlainTiff tiff = written(layer);
            for (int band = 0; band < layer.bands().length; band++) {
                assertArrayEquals(stored(layer.bands()[band], layer.header().layer().type()), tiff.band(0, band));
            }
        }
    }

    @Test
    void theFileIsLaidOutForReadingOverANetwork() throws Exception {
        for (long limit : new long[] {CogAssembly.CLASSIC_LIMIT, 0}) {
            Path file = folder.resolve("layer" + limit + ".tif");
            SyntheticLayer.margins(1100, 700, 2).write(new CogFormat(SyntheticLayer.KEYS, limit), file, workers);
            PlainTiff tiff = new PlainTiff(file);
            assertEquals(limit == 0, tiff.big);
            assertEquals(4, tiff.directories.size()); // 1100 550 275 138
            assertEquals(138, tiff.number(3, 256));
            assertEquals(88, tiff.number(3, 257)); // 700 350 175 88
            String head = new String(tiff.bytes.array(), tiff.big ? 16 : 8, 183, StandardCharsets.US_ASCII);
            assertEquals("GDAL_STRUCTURAL_METADATA_SIZE=000140 bytes\nLAYOUT=IFDS_BEFORE_DATA\n"
                    + "BLOCK_ORDER=ROW_MAJOR\nBLOCK_LEADER=SIZE_AS_UINT4\nBLOCK_TRAILER=LAST_4_BYTES_REPEATED\n"
                    + "KNOWN_INCOMPATIBLE_EDITION=NO\n ", head);
            assertEquals((tiff.big ? 16 : 8) + 184, tiff.starts.get(0));
            long before = tiff.starts.get(tiff.starts.size() - 1);
            for (int level = 3; level >= 0; level--) {
                long[] offsets = tiff.numbers(level, 324);
                long[] lengths = tiff.numbers(level, 325);
                for (int i = 0; i < offsets.length; i++) {
                    assertTrue(offsets[i] > before, "tile after tile, the smallest level first");
                    int end = (int) (offsets[i] + lengths[i]);
                    assertEquals(lengths[i], tiff.bytes.getInt((int) offsets[i] - 4));
                    assertEquals(tiff.bytes.getInt(end - 4), tiff.bytes.getInt(end));
                    before = end + 3;
                }
            }
            assertEquals(before + 1, tiff.bytes.capacity());
        }
    }

    @Test
    void tagsSayWhatTheHeaderSays() throws Exception {
        PlainTiff tiff = written(SyntheticLayer.margins(300, 300, 3));
        assertEquals(8, tiff.number(0, 259));
        assertEquals(3, tiff.number(0, 317));
        assertEquals(2, tiff.number(0, 284));
        assertArrayEquals(new long[] {3, 3, 3}, tiff.numbers(0, 339));
        assertArrayEquals(new long[] {0, 0}, tiff.numbers(0, 338));
        assertEquals(1, tiff.number(1, 254));
        assertEquals("-9999", tiff.text(0, 42113));
        assertEquals("-9999", tiff.text(1, 42113));
        assertEquals("2004:05:31 23:59:59", tiff.text(0, 306));
        assertEquals("Wintersill 0.1.0", tiff.text(0, 305));
        assertArrayEquals(new double[] {1 / 120.0, 1 / 120.0, 0}, (double[]) tiff.directories.get(0).get(33550));
        assertArrayEquals(new double[] {0, 0, 0, 5, 48, 0}, (double[]) tiff.directories.get(0).get(33922));
        assertNull(tiff.directories.get(0).get(34264));
        assertNull(tiff.directories.get(1).get(34735));
        String xml = tiff.text(0, 42112);
        assertTrue(xml.contains("<Item name=\"DESCRIPTION\" sample=\"2\" role=\"description\">Margin 1982</Item>"), xml);
        assertTrue(xml.contains("<Item name=\"UNITTYPE\" sample=\"0\" role=\"unittype\">K</Item>"), xml);
        assertTrue(xml.contains("<Item name=\"STATUS\">unverified</Item>"), xml);
    }

    @Test
    void classesCarryTheirColours() throws Exception {
        PlainTiff tiff = written(SyntheticLayer.classes(300, 300));
        assertEquals(3, tiff.number(0, 262));
        assertEquals(3, tiff.number(1, 262));
        long[] map = tiff.numbers(0, 320);
        LayerStyles.suitability().entries().forEach(entry -> {
            assertEquals(entry.colour().red() * 257L, map[entry.code()]);
            assertEquals(entry.colour().green() * 257L, map[256 + entry.code()]);
            assertEquals(entry.colour().blue() * 257L, map[512 + entry.code()]);
        });
        assertEquals("0", tiff.text(0, 42113));
    }

    @Test
    void threadsLocaleAndTimeZoneChangeNoByte() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(700, 600, 3);
        Locale locale = Locale.getDefault();
        TimeZone zone = TimeZone.getDefault();
        byte[] first = null;
        try {
            for (int threads : new int[] {1, 2, 8}) {
                ExecutorService pool = Executors.newFixedThreadPool(threads);
                Locale.setDefault(threads == 2 ? Locale.forLanguageTag("tr-TR") : Locale.forLanguageTag("ar-EG-u-nu-arab"));
                TimeZone.setDefault(TimeZone.getTimeZone(threads == 8 ? "Pacific/Apia" : "UTC"));
                Path file = folder.resolve("threads" + threads + ".tif");
                layer.write(format, file, pool);
                pool.shutdown();
                byte[] bytes = Files.readAllBytes(file);
                first = first == null ? bytes : first;
                assertArrayEquals(first, bytes);
            }
        } finally {
            Locale.setDefault(locale);
            TimeZone.setDefault(zone);
        }
    }

    @Test
    void theOrderOfBandsChangesNoByte() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(300, 300, 2);
        Path interleaved = folder.resolve("interleaved.tif");
        layer.write(format, interleaved, workers);
        Path apart = folder.resolve("apart.tif");
        try (RasterWriter writer = format.create(apart, layer.header(), workers)) {
            for (int band = 1; band >= 0; band--) {
                writer.write(band, 0, 256, java.util.Arrays.copyOf(layer.bands()[band], 256 * 300));
                writer.write(band, 256, 44, java.util.Arrays.copyOfRange(layer.bands()[band], 256 * 300, 300 * 300));
            }
            writer.finish();
        }
        assertArrayEquals(Files.readAllBytes(interleaved), Files.readAllBytes(apart));
    }

    @Test
    @Timeout(value = 60, unit = TimeUnit.SECONDS)
    void aWriterInsideItsOnlyWorkerDoesNotLockUp() throws Exception {
        ExecutorService single = Executors.newSingleThreadExecutor();
        Path file = folder.resolve("single.tif");
        single.submit(() -> SyntheticLayer.margins(1000, 600, 1).write(format, file, single)).get();
        single.shutdown();
        assertEquals(1000, new PlainTiff(file).number(0, 256));
    }

    @Test
    void aRetiredPoolIsNoObstacle() throws Exception {
        ExecutorService retired = Executors.newSingleThreadExecutor();
        retired.shutdown();
        SyntheticLayer.margins(300, 300, 1).write(format, folder.resolve("retired.tif"), retired);
        assertEquals(300, new PlainTiff(folder.resolve("retired.tif")).number(0, 256));
    }

    private long filesLeft() throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.count();
        }
    }

    @Test
    void givingUpLeavesNoTrace() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(600, 600, 1);
        try (RasterWriter writer = format.create(folder.resolve("layer.tif"), layer.header(), workers)) {
            writer.write(0, 0, 256, layer.bands()[0]);
            assertEquals(1, filesLeft());
        }
        assertEquals(0, filesLeft());
    }

    @Test
    void aFinishedFileStandsAlone() throws Exception {
        SyntheticLayer.margins(600, 600, 1).write(format, folder.resolve("layer.tif"), workers);
        assertEquals(1, filesLeft());
    }

    @Test
    void theNextAttemptTakesOverWhatAKilledOneLeft() throws Exception {
        Files.writeString(folder.resolve(".layer.tif.tiles"), "left by a killed run");
        written(SyntheticLayer.margins(300, 300, 1));
        assertEquals(1, filesLeft());
    }

    @Test
    void aMissingFolderIsSaidWithTheBytesNeeded() {
        SyntheticLayer layer = SyntheticLayer.margins(10, 10, 1);
        Path file = folder.resolve("nowhere").resolve("layer.tif");
        ProblemException e = assertThrows(ProblemException.class, () -> format.create(file, layer.header(), workers));
        assertEquals(4, e.exitCode());
        assertTrue(e.getMessage().contains(file.toString()) && e.getMessage().contains("no such folder")
                && e.getMessage().contains(" bytes"), e.getMessage());
    }

    @Test
    void aTargetThatCannotBeWrittenIsSaidAndNothingStays() throws Exception {
        SyntheticLayer layer = SyntheticLayer.margins(300, 300, 1);
        Path file = Files.createDirectory(folder.resolve("layer.tif"));
        Files.writeString(file.resolve("inside"), "a folder in the way");
        ProblemException e = assertThrows(ProblemException.class, () -> layer.write(format, file, workers));
        assertEquals(4, e.exitCode());
        assertTrue(Files.exists(file.resolve("inside")));
        assertEquals(1, filesLeft());
    }

    @Test
    void rowsOutOfOrderAndMissingRowsAreMistakesOfTheCaller() {
        SyntheticLayer layer = SyntheticLayer.margins(300, 300, 1);
        try (RasterWriter writer = format.create(folder.resolve("layer.tif"), layer.header(), workers)) {
            assertThrows(IllegalArgumentException.class, () -> writer.write(0, 256, 44, layer.bands()[0]));
            assertThrows(IllegalArgumentException.class, () -> writer.write(0, 0, 100, layer.bands()[0]));
            assertThrows(IllegalStateException.class, writer::finish);
        }
        assertFalse(Files.exists(folder.resolve("layer.tif")));
    }

    @Test
    void aHalfYearIsNoYear() throws Exception {
        SyntheticLayer layer = SyntheticLayer.years(300, 300, 1);
        layer.bands()[0][5] = 1999.5f;
        assertThrows(IllegalArgumentException.class, () -> layer.write(format, folder.resolve("layer.tif"), workers));
        assertEquals(0, filesLeft());
    }

    @Test
    void aRotatedPoleIsRefused() {
        SyntheticLayer layer = SyntheticLayer.of(SampleType.FLOAT32, 4, 4, 1, new Crs("", "rotated", "",
                Crs.Kind.ROTATED_POLE, 1, new Crs.RotatedPole(39.25, -162, 0)), LayerStyles.margin());
        assertThrows(ProblemException.class, () -> format.create(folder.resolve("a.tif"), layer.header(), workers));
    }

    @Test
    void keysOfPointsAreRefused() {
        int[] points = {1, 1, 0, 1, 1025, 0, 1, 2};
        assertThrows(IllegalArgumentException.class, () -> new GeoKeyTags(points, new double[0], ""));
    }
}
