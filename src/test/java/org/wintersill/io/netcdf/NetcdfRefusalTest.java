package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;

/** Each refusal names the file and says the essential words. */
class NetcdfRefusalTest {

    private static String refusal(String file, TemperatureRequest request) {
        ProblemException e = assertThrows(ProblemException.class, () -> Fixtures.open(file, request, new Notices()));
        assertEquals(1, e.problems().size());
        assertEquals(3, e.exitCode(), e.getMessage());
        assertTrue(e.getMessage().contains(file), e.getMessage());
        return e.getMessage();
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
            bad-maximum-only.nc | No variable says that it is a daily minimum, tasmax (time: maximum)
            bad-mean-named-tn.nc | No variable says, tn (time: mean)
            bad-monthly-mean-of-minima.nc | No variable says, mean over days
            bad-two-candidates.nc | Several variables, t_two, t_low, variable
            bad-no-units.nc | no units, K, degC, degF
            bad-units.nc | 'mK', accepted are K
            bad-kelvin-called-celsius.nc | do not fit the unit, median, look like K
            bad-celsius-called-kelvin.nc | do not fit the unit, median, look like degC
            bad-hourly.nc | 6 hours apart, sub-daily
            bad-same-day.nc | same day, 2003-01-31
            bad-monthly.nc | only daily data
            bad-months.nc | months, no fixed length
            bad-year-zero.nc | year 0, standard calendar
            bad-calendar.nc | 'lunar', 360_day
            bad-time-fill.nc | Record 3 has no date
            bad-uneven.nc | uneven, variable 'lat'
            bad-not-monotonic.nc | not monotonic, 45.5, 46.0
            bad-latitude.nc | beyond 90, swapped
            bad-levels.nc | 3 entries along 'level'
            bad-two-dimensional.nc | only two-dimensional coordinates, nav_lat
            bad-no-axes.nc | No axis of latitudes
            bad-zero-days.nc | zero days
            bad-lzf.nc | LZF, deflate
            bad-truncated-classic.nc | cut short, bytes
            bad-truncated-hdf5.nc | cut short, bytes
            bad-html.nc | web page
            bad-empty.nc | empty
            bad-gzip.nc | gzip
            bad-header.nc | damaged
            projected-no-mapping.nc | projected, crs
            members.nc | 3 members, r2i1
            """)
    void saysWhatIsWrong(String file, String words) {
        String message = refusal(file, Fixtures.minimum());
        for (String word : words.split(",\\s*")) {
            assertTrue(message.contains(word), message);
        }
    }

    @Test
    void missingFileIsNamed() {
        java.nio.file.Path nowhere = java.nio.file.Path.of("no-such-file.nc");
        ProblemException e = assertThrows(ProblemException.class, () -> new NetcdfTemperatureFormat(new StubCrsParser())
                .open(nowhere, Fixtures.minimum(), new Notices()));
        assertTrue(e.getMessage().contains("no such file"), e.getMessage());
    }

    @Test
    void requestMayNotContradictTheFile() {
        assertTrue(refusal("classic.nc", Fixtures.request(null, TemperatureUnit.CELSIUS, null, null, null))
                .contains("the run file says degC"));
        assertTrue(refusal("pencil-chunks.nc", Fixtures.request(null, null, 0.01, null, null)).contains("scale_factor"));
        assertTrue(refusal("lambert-km.nc", Fixtures.request(null, null, null, null, "EPSG:2056")).contains("EPSG:2056"));
        assertTrue(refusal("bad-maximum-only.nc", Fixtures.request("tasmax", null, null, null, null))
                .contains("no daily minimum"));
        assertTrue(refusal("classic.nc", Fixtures.request("tasmn", null, null, null, null)).contains("did you mean 'tasmin'"));
        assertTrue(refusal("classic.nc", Fixtures.request(null, null, null, "2", null)).contains("no members"));
        assertTrue(refusal("members.nc", Fixtures.request(null, null, null, "4", null)).contains("1 to 3"));
    }

    @Test
    void requestedUnitServesAFileWithoutOne() {
        Notices notices = new Notices();
        DailyTemperatureSource source = Fixtures.open("bad-no-units.nc",
                Fixtures.request(null, TemperatureUnit.CELSIUS, null, null, null), notices);
        assertEquals(6, source.days().size());
        assertTrue(notices.counts().keySet().stream().anyMatch(n -> n.contains("taken from the run file")));
    }

    private static String damage(String file) {
        DailyTemperatureSource source = Fixtures.open(file);
        ProblemException e = assertThrows(ProblemException.class, () -> {
            try (DailyTemperatureReader reader = source.open()) {
                int cells = (int) source.grid().cells();
                reader.read(0, source.days().size(), source.grid().whole(), new float[cells * source.days().size()], 0, cells);
            }
        });
        return e.getMessage();
    }

    @Test
    void damagedChunkIsRefusedWhenItIsRead() {
        assertTrue(damage("bad-chunk.nc").contains("cannot be decoded"));
        assertTrue(damage("bad-checksum.nc").contains("checksum"));
    }

    @Test
    void unknownContentIsNamedByItsFirstBytes() {
        assertTrue(UnknownContent.describe(java.nio.file.Path.of("a"), new byte[] {'P', 'K', 3, 4}).what().contains("ZIP"));
        assertTrue(UnknownContent.describe(java.nio.file.Path.of("a"), new byte[] {'G', 'R', 'I', 'B'}).what().contains("GRIB"));
        assertTrue(UnknownContent.describe(java.nio.file.Path.of("a"), new byte[] {'C', 'D', 'F', 7}).what().contains("version 7"));
    }
}
