package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.wintersill.grid.Block;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.temperature.TemperatureRequest;

/** Every fixture, read whole, by its layout and at random, gives what the script that made it put in (numpy, netCDF4). */
class NetcdfReadingTest {
    private static final JsonNode EXPECTED = Fixtures.expected();
    /** Half a unit of float32 at -100 degC or so, and the round-off of scale factors kept as float32. */
    private static final float TOLERANCE = 2e-5f;

    private static TemperatureRequest request(String key) {
        String member = key.contains("#") ? key.substring(key.indexOf('#') + 1) : null;
        return Fixtures.request(null, null, null, member, key.startsWith("projected-no-mapping") ? "EPSG:2056" : null);
    }

    private static DailyTemperatureSource open(String key) {
        return Fixtures.open(key.split("#")[0], request(key), new Notices());
    }

    private static Stream<String> keys() {
        return Fixtures.names(EXPECTED).stream().filter(k -> !k.startsWith("height-"));
    }

    @TestFactory
    Stream<DynamicTest> gridAndDaysAreThoseOfTheFile() {
        return keys().map(key -> DynamicTest.dynamicTest(key, () -> {
            JsonNode e = EXPECTED.get(key);
            DailyTemperatureSource source = open(key);
            GridGeometry grid = source.grid();
            GridGeometry wanted = new GridGeometry(e.get("columns").asInt(), e.get("rows").asInt(), e.get("west").asDouble(),
                    e.get("north").asDouble(), e.get("cellWidth").asDouble(), e.get("cellHeight").asDouble(), grid.crs());
            assertTrue(wanted.sameAs(grid), wanted.describe() + " / " + grid.describe());
            List<String> days = java.util.stream.IntStream.range(0, source.days().size())
                    .mapToObj(i -> source.days().date(i).toString()).toList();
            assertEquals(e.get("days").toString(), "[" + String.join(",", days.stream().map(d -> '"' + d + '"').toList()) + "]");
            assertEquals(days.size(), source.files().get(0).dayCount());
        }));
    }

    @TestFactory
    Stream<DynamicTest> wholeRecordHoldsTheTruth() {
        return keys().map(key -> DynamicTest.dynamicTest(key, () -> {
            DailyTemperatureSource source = open(key);
            int cells = (int) source.grid().cells();
            float[] out = new float[source.days().size() * cells];
            try (DailyTemperatureReader reader = source.open()) {
                reader.read(0, source.days().size(), source.grid().whole(), out, 0, cells);
                JsonNode setAside = EXPECTED.get(key).get("setAside");
                assertEquals(setAside == null ? 0 : setAside.asLong(), reader.valuesSetAside());
            }
            assertArrayEquals(Fixtures.values(EXPECTED.get(key)), out, TOLERANCE);
        }));
    }

    @TestFactory
    Stream<DynamicTest> splittingTheReadsChangesNothing() {
        return keys().map(key -> DynamicTest.dynamicTest(key, () -> {
            DailyTemperatureSource source = open(key);
            GridGeometry grid = source.grid();
            int days = source.days().size();
            float[] truth = Fixtures.values(EXPECTED.get(key));
            StorageLayout layout = source.layout();
            Random random = new Random(key.hashCode());
            try (DailyTemperatureReader reader = source.open()) {
                for (int row = 0; row < grid.rows(); row += layout.rows()) {
                    for (int column = 0; column < grid.columns(); column += layout.columns()) {
                        check(reader, truth, grid, 0, days, new Block(column, row, Math.min(layout.columns(), grid.columns()
                                - column), Math.min(layout.rows(), grid.rows() - row)), random);
                    }
                }
                for (int i = 0; i < 40; i++) {
                    int first = random.nextInt(days);
                    int column = random.nextInt(grid.columns());
                    int row = random.nextInt(grid.rows());
                    check(reader, truth, grid, first, 1 + random.nextInt(days - first), new Block(column, row,
                            1 + random.nextInt(grid.columns() - column), 1 + random.nextInt(grid.rows() - row)), random);
                }
            }
        }));
    }

    private static void check(DailyTemperatureReader reader, float[] truth, GridGeometry grid, int first, int count, Block block,
                              Random random) {
        int offset = random.nextInt(5);
        int stride = block.cells() + random.nextInt(3);
        float[] out = new float[offset + count * stride + 2];
        Arrays.fill(out, -777);
        reader.read(first, count, block, out, offset, stride);
        float[] wanted = new float[out.length];
        Arrays.fill(wanted, -777);
        for (int d = 0; d < count; d++) {
            for (int r = 0; r < block.rows(); r++) {
                for (int c = 0; c < block.columns(); c++) {
                    wanted[offset + d * stride + r * block.columns() + c] = truth[(int) ((first + d) * grid.cells())
                            + (block.row() + r) * grid.columns() + block.column() + c];
                }
            }
        }
        assertArrayEquals(wanted, out, TOLERANCE, block.toString());
    }

    @Test
    void layoutFollowsChunksOfSouthUpFiles() {
        // 20 rows in chunks of 8 from the south: borders at rows 4, 12 and 20 of the grid
        assertEquals(new StorageLayout(5, 8, 7, 4), open("pencil-chunks.nc").layout());
        assertEquals(new StorageLayout(1, 20, 24, 0), open("day-chunks.nc").layout());
        assertEquals(new StorageLayout(1, 1, 5, 0), open("classic.nc").layout());
    }

    @Test
    void layoutGivesUpColumnsThatARollCuts() {
        assertEquals(new StorageLayout(3, 2, 8, 0), open("lon-0-360-chunks.nc").layout());
    }

    @Test
    void rotatedPoleAndProjectionReachTheParser() {
        assertEquals(new Crs.RotatedPole(39.25, -162, 0), open("rotated-pole.nc").grid().crs().pole());
        assertEquals("lambert_conformal_conic50.0", open("lambert-km.nc").grid().crs().wkt());
        assertEquals("EPSG:2056", open("projected-no-mapping.nc").grid().crs().code());
    }

    @Test
    void assumptionsAreSaid() {
        Notices notices = new Notices();
        Fixtures.open("other-axis-names.nc", Fixtures.minimum(), notices);
        String said = String.join("\n", notices.counts().keySet());
        assertTrue(said.contains("assumed WGS 84"), said);
        assertTrue(said.contains("chosen by its name"), said);
        notices = new Notices();
        Fixtures.open("date-line.nc", Fixtures.minimum(), notices);
        assertTrue(String.join("\n", notices.counts().keySet()).contains("crosses the date line"));
    }

    @Test
    void valuesSetAsideAreCountedAsOftenAsTheyAreRead() {
        DailyTemperatureSource source = open("wild-chunks.nc");
        try (DailyTemperatureReader reader = source.open()) {
            float[] out = new float[20];
            reader.read(1, 1, source.grid().whole(), out, 0, 20);
            assertEquals(0, reader.valuesSetAside());
            reader.read(0, 1, new Block(0, 0, 3, 1), out, 0, 20);
            assertEquals(3, reader.valuesSetAside());
            reader.read(0, 1, source.grid().whole(), out, 0, 20);
            assertEquals(7, reader.valuesSetAside());
        }
    }
}
