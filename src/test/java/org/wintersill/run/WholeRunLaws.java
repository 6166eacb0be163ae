package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** What must hold of whole runs whatever the weather. */
class WholeRunLaws {
    private static final ColdRecord RECORD = ColdRecord.threeWinters(5, 6);
    @TempDir
    static Path shared;
    @TempDir
    Path folder;
    private static RunFolder plain;

    @BeforeAll
    static void mapTheRecord() {
        plain = RunFolder.of(shared, new RecordFile(RECORD)).map();
    }

    private RunFolder map(ColdRecord record) {
        return RunFolder.of(folder, new RecordFile(record)).map();
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 17, 60})
    void colderIsNeverSafer(int tenths) {
        RunFolder colder = map(RECORD.changed((day, cell, value) -> day % 5 == cell % 5 ? value - tenths : value));
        for (String cultivar : List.of("oat", "rye")) {
            assertNowhere(cultivar + "/winters/margin", colder, (was, is) -> is > was);
            assertNowhere(cultivar + "/winters/damage", colder, (was, is) -> is < was);
            assertNowhere(cultivar + "/margin-mean", colder, (was, is) -> is > was);
            assertNowhere(cultivar + "/damage-probability-50", colder, (was, is) -> is < was);
        }
        assertNowhere("shared/winters/minimum", colder, (was, is) -> is > was);
    }

    private interface Bad {
        boolean is(float was, float is);
    }

    private static void assertNowhere(String layer, RunFolder other, Bad bad) {
        float[][] before = plain.raster(layer).bands();
        float[][] after = other.raster(layer).bands();
        for (int band = 0; band < before.length; band++) {
            for (int cell = 0; cell < before[band].length; cell++) {
                assertFalse(bad.is(before[band][cell], after[band][cell]), layer + " was " + before[band][cell] + ", is "
                        + after[band][cell]);
            }
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.5, 2.25, -1.1})
    void aHardierCurveRaisesEveryMarginByTheDifference(double kelvins) {
        RunFolder run = RunFolder.of(folder, new RecordFile(RECORD));
        run.text("cultivars.yaml", RunFolder.cultivars(kelvins)).map();
        for (String layer : List.of("oat/winters/margin", "rye/winters/margin", "oat/margin-mean")) {
            float[][] before = plain.raster(layer).bands();
            float[][] after = run.raster(layer).bands();
            for (int band = 0; band < before.length; band++) {
                for (int cell = 0; cell < before[band].length; cell++) {
                    assertEquals(before[band][cell] + kelvins, after[band][cell], 1e-5, layer);
                }
            }
        }
        assertTrue(RasterFile.same(plain.raster("shared/winters/minimum").bands(), run.raster("shared/winters/minimum").bands()));
    }

    @Test
    void aWarmerRecordEqualsAHardierCurve() {
        RunFolder warmer = map(RECORD.changed((day, cell, value) -> value + 20));
        RunFolder hardier = RunFolder.of(folder.resolve("hardier"), new RecordFile(RECORD));
        hardier.text("cultivars.yaml", RunFolder.cultivars(2)).map();
        for (String layer : List.of("oat/winters/margin", "rye/winters/margin", "rye/winters/damage")) {
            float[][] one = warmer.raster(layer).bands();
            float[][] other = hardier.raster(layer).bands();
            for (int band = 0; band < one.length; band++) {
                assertArrayEquals(one[band], other[band], 1e-5f, layer);
            }
        }
        assertTrue(RasterFile.same(warmer.raster("rye/damage-probability-50").bands(),
                hardier.raster("rye/damage-probability-50").bands()));
    }

    @Test
    void maskingOneCellOnAllDaysChangesNoOther() {
        int masked = 2 * 6 + 3;
        RunFolder run = map(RECORD.changed((day, cell, value) -> cell == masked ? ColdRecord.MISSING : value));
        plain.rasters().forEach((name, bands) -> {
            float[][] after = run.rasters().get(name);
            for (int band = 0; band < bands.length; band++) {
                float[] wanted = bands[band].clone();
                wanted[masked] = name.endsWith("valid-winters.tif") && after[band][masked] == 0 ? 0 : Float.NaN;
                assertArrayEquals(wanted, after[band], name);
            }
        });
    }

    @Test
    void partsOfTheAreaGiveTheValuesOfTheWhole() {
        RunFolder west = RunFolder.of(folder.resolve("west"), new RecordFile(RECORD)).map("--set", "area.bbox=[-10, 47.5, -9, 50]");
        RunFolder east = RunFolder.of(folder.resolve("east"), new RecordFile(RECORD)).map("--set", "area.bbox=[-9, 47.5, -7, 50]");
        plain.rasters().forEach((name, bands) -> {
            RasterFile whole = plain.raster(name.replace(".tif", ""));
            RasterFile left = west.raster(name.replace(".tif", ""));
            RasterFile right = east.raster(name.replace(".tif", ""));
            assertEquals(2, left.columns());
            assertEquals(4, right.columns());
            assertEquals(-9, right.west(), 1e-9);
            assertTrue(RasterFile.same(whole.part(0, 0, 5, 2), left.bands()), name);
            assertTrue(RasterFile.same(whole.part(0, 2, 5, 4), right.bands()), name);
        });
    }

    @Test
    void aMissingNightWithinTheRuleChangesNothingButWhatItDecided() {
        CfDate gone = new CfDate(2002, 1, 9);
        RunFolder run = map(RECORD.without(gone));
        float[][] before = plain.raster("oat/winters/margin").bands();
        float[][] after = run.raster("oat/winters/margin").bands();
        float[][] nights = plain.raster("oat/winters/worst-night").bands();
        float[][] nightsAfter = run.raster("oat/winters/worst-night").bands();
        int night = (int) (CfCalendar.STANDARD.dayNumber(gone) - CfCalendar.STANDARD.dayNumber(new CfDate(2001, 9, 1)));
        for (int cell = 0; cell < 30; cell++) {
            if (nights[0][cell] == night) {
                assertTrue(after[0][cell] >= before[0][cell] && nightsAfter[0][cell] != night);
            } else {
                assertEquals(before[0][cell], after[0][cell]);
                assertEquals(nights[0][cell], nightsAfter[0][cell]);
            }
            assertEquals(before[1][cell], after[1][cell]);
            assertEquals(before[2][cell], after[2][cell]);
        }
    }

    @Test
    void aGapBeyondTheRuleTakesTheWinterOutAndNoOther() {
        long first = RECORD.calendar().dayNumber(new CfDate(2003, 1, 4));
        int cell = 8;
        // five days in a row are one too many for month-10-5: in one cell masked, in the other run absent everywhere
        RunFolder masked = map(RECORD.changed((day, at, value) -> at == cell && RECORD.days()[day] >= first
                && RECORD.days()[day] < first + 5 ? ColdRecord.MISSING : value));
        float[][] before = plain.raster("rye/winters/margin").bands();
        float[][] after = masked.raster("rye/winters/margin").bands();
        for (int winter = 0; winter < 3; winter++) {
            float[] wanted = before[winter].clone();
            wanted[cell] = winter == 1 ? Float.NaN : wanted[cell];
            assertArrayEquals(wanted, after[winter]);
        }
        RunFolder absent = RunFolder.of(folder.resolve("absent"), new RecordFile(RECORD.keep(day -> RECORD.days()[day] < first
                || RECORD.days()[day] >= first + 5)));
        Program.Ended ended = absent.end().expect(0);
        assertTrue(ended.err().contains("winter 2002-03 is not used"), ended.err());
        RasterFile margin = absent.raster("rye/winters/margin");
        assertEquals(List.of("2001-02", "2003-04"), List.of(margin.names()));
        assertArrayEquals(before[0], margin.bands()[0]);
        assertArrayEquals(before[2], margin.bands()[1]);
    }

    @Test
    void southOfTheEquatorAWinterLiesInOneYear() {
        ColdRecord record = ColdRecord.made(3, 4, CfCalendar.STANDARD, new CfDate(2005, 1, 10), new CfDate(2008, 12, 20), true, 3);
        RunFolder run = map(record);
        RasterFile margin = run.raster("oat/winters/margin");
        assertEquals(List.of("2005", "2006", "2007", "2008"), List.of(margin.names()));
        assertEquals(12, margin.valid(0));
        // the invented curve is hardest at the turn of the year, so only the minima can be checked against the season
        RasterFile minimum = run.raster("shared/winters/minimum");
        for (int winter = 0; winter < 4; winter++) {
            for (int cell = 0; cell < 12; cell++) {
                int at = cell;
                int year = 2005 + winter;
                int lowest = IntStream.range(0, record.days().length).filter(day -> {
                    CfDate date = record.calendar().date(record.days()[day]);
                    return date.year() == year && date.month() >= 3 && date.month() <= 11;
                }).map(day -> record.tenths()[day][at]).min().orElseThrow();
                assertEquals((float) (lowest / 10.0), minimum.bands()[winter][cell], 1e-6f);
            }
        }
    }

    @ParameterizedTest
    @EnumSource(CfCalendar.class)
    void everyCalendarHasItsWinters(CfCalendar calendar) {
        int lastDay = calendar == CfCalendar.DAYS_360 ? 30 : 31;
        ColdRecord record = ColdRecord.made(2, 3, calendar, new CfDate(1999, 8, 1), new CfDate(2002, 7, lastDay), false, 11);
        RunFolder run = RunFolder.of(folder, new RecordFile(record)).map("--set", "outputs.netcdf=true", "--set",
                "outputs.geopackage=true", "--set", "outputs.layers=default");
        RasterFile night = run.raster("oat/winters/worst-night");
        RasterFile minimum = run.raster("shared/winters/minimum");
        RasterFile margin = run.raster("oat/winters/margin");
        assertEquals(List.of("1999-00", "2000-01", "2001-02"), List.of(night.names()));
        for (int winter = 0; winter < 3; winter++) {
            long first = calendar.dayNumber(new CfDate(1999 + winter, 9, 1));
            int lastOfMay = calendar.daysInMonth(2000 + winter, 5);
            int nights = (int) (calendar.dayNumber(new CfDate(2000 + winter, 5, lastOfMay)) - first) + 1;
            for (int cell = 0; cell < 6; cell++) {
                float worst = night.bands()[winter][cell];
                assertTrue(worst >= 0 && worst < nights, calendar + " " + worst);
                int at = cell;
                int start = record.day(new CfDate(1999 + winter, 9, 1));
                int lowest = IntStream.range(start, start + nights).map(day -> record.tenths()[day][at]).min().orElseThrow();
                assertEquals((float) (lowest / 10.0), minimum.bands()[winter][cell], 1e-6f);
                float tmin = record.tenths()[start + (int) worst][cell] / 10f;
                assertTrue(tmin >= minimum.bands()[winter][cell] - 1e-6f && !Float.isNaN(margin.bands()[winter][cell]));
            }
        }
    }

    @Test
    void aWinterMayEndOnADayThatOnlyItsCalendarHas() {
        ColdRecord record = ColdRecord.made(2, 3, CfCalendar.DAYS_360, new CfDate(1999, 8, 1), new CfDate(2002, 7, 30), false, 11);
        int last = record.day(new CfDate(2001, 2, 30));
        RunFolder run = RunFolder.of(folder, new RecordFile(record.changed((day, cell, value) -> day == last ? -900 : value)));
        run.map("--set", "winter={from: 10-30, to: 02-30, complete: 11-01..02-30}", "--set", "outputs.netcdf=true", "--set",
                "outputs.geopackage=true", "--set", "outputs.layers=default");
        RasterFile night = run.raster("oat/winters/worst-night");
        assertEquals(List.of("1999-00", "2000-01", "2001-02"), List.of(night.names()));
        for (float value : night.bands()[1]) {
            assertEquals(120, value, "from 10-30 to 02-30 are 121 days of this calendar");
        }
        String explained = Program.run("explain", run.path("run.yaml").toString(), "--at", "-9.9,49.9", "--winter", "2000-01", "--json",
                "--set", "winter={from: 10-30, to: 02-30, complete: 11-01..02-30}").expect(0).out();
        assertTrue(explained.contains("\"worst-night\" : \"2001-02-30\""), "dates are those of the file's calendar");
    }
}
