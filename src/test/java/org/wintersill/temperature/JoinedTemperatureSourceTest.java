package org.wintersill.temperature;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.wintersill.grid.Block;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.DayAxis;

class JoinedTemperatureSourceTest {
    private static final Crs WGS84 = new Crs("EPSG:4326", "WGS 84", "GEOGCS", Crs.Kind.GEOGRAPHIC, 1, null);
    private static int open;
    private static int mostOpen;

    /** A file whose every value is its day number; one value a read is set aside. */
    private record Fake(String path, long[] dayNumbers, CfCalendar calendar, double west, ForcingVariable variable,
                        StorageLayout layout) implements DailyTemperatureSource {
        Fake(String path, long... days) {
            this(path, days, CfCalendar.STANDARD, 7, ForcingVariable.MINIMUM, new StorageLayout(1, 2, 3, 0));
        }

        @Override
        public GridGeometry grid() {
            return new GridGeometry(3, 2, west, 47, 0.5, 0.5, WGS84);
        }

        @Override
        public DayAxis days() {
            return new DayAxis(calendar, dayNumbers);
        }

        @Override
        public List<SourceFile> files() {
            return List.of(new SourceFile(path, "fake", "tn", "degC", calendar.cfName(), "", "", dayNumbers.length, "", "",
                    Map.of()));
        }

        @Override
        public DailyTemperatureReader open() {
            mostOpen = Math.max(mostOpen, ++open);
            return new DailyTemperatureReader() {
                private long setAside;

                @Override
                public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
                    setAside++;
                    for (int d = 0; d < dayCount; d++) {
                        for (int i = 0; i < block.cells(); i++) {
                            out[offset + d * dayStride + i] = dayNumbers[firstDay + d];
                        }
                    }
                }

                @Override
                public long valuesSetAside() {
                    return setAside;
                }

                @Override
                public void close() {
                    open--;
                }
            };
        }
    }

    private static String refusal(DailyTemperatureSource... sources) {
        return assertThrows(ProblemException.class, () -> JoinedTemperatureSource.join(List.of(sources), new Notices()))
                .getMessage();
    }

    @Test
    void orderOfFilesChangesNothing() {
        List<DailyTemperatureSource> files = new ArrayList<>();
        for (int i = 0; i < 100; i++) {
            files.add(new Fake("f" + i, 2L * i, 2L * i + 1));
        }
        Collections.shuffle(files, new Random(3));
        DailyTemperatureSource joined = JoinedTemperatureSource.join(files, new Notices());
        assertEquals(200, joined.days().size());
        mostOpen = 0;
        float[] out = new float[200];
        try (DailyTemperatureReader reader = joined.open()) {
            reader.read(0, 200, new Block(0, 0, 1, 1), out, 0, 1);
            assertEquals(100, reader.valuesSetAside());
        }
        for (int i = 0; i < 200; i++) {
            assertEquals(i, out[i]);
        }
        assertEquals(0, open);
        assertEquals(JoinedTemperatureSource.OPEN_FILES, mostOpen);
    }

    @Test
    void daysMayInterleave() {
        Notices notices = new Notices();
        DailyTemperatureSource joined = JoinedTemperatureSource.join(List.of(new Fake("odd", 1, 3, 5), new Fake("even", 2, 4)),
                notices);
        float[] out = new float[5];
        try (DailyTemperatureReader reader = joined.open()) {
            reader.read(0, 5, new Block(0, 0, 1, 1), out, 0, 1);
        }
        assertArrayEquals(new float[] {1, 2, 3, 4, 5}, out);
        assertTrue(notices.counts().keySet().stream().anyMatch(n -> n.contains("interleave")));
    }

    @Test
    void sameDaysInTwoFilesAreRefusedAsRanges() {
        String message = refusal(new Fake("a.nc", 0, 1, 2, 3, 9), new Fake("b.nc", 1, 2, 3, 9, 10));
        assertTrue(message.contains("1970-01-02..1970-01-04, 1970-01-10 are in a.nc and b.nc"), message);
    }

    @Test
    void differencesNameBothFilesAndWhatDiffers() {
        Fake a = new Fake("a.nc", 0, 1);
        String grid = refusal(a, new Fake("b.nc", new long[] {2}, CfCalendar.STANDARD, 7.25, ForcingVariable.MINIMUM, a.layout()));
        assertTrue(grid.contains("a.nc") && grid.contains("b.nc") && grid.contains("place of the grid"), grid);
        String calendar = refusal(a, new Fake("b.nc", new long[] {2}, CfCalendar.NOLEAP, 7, ForcingVariable.MINIMUM, a.layout()));
        assertTrue(calendar.contains("calendar of a.nc is standard, that of b.nc is noleap"), calendar);
        String quantity = refusal(a, new Fake("b.nc", new long[] {2}, CfCalendar.STANDARD, 7, ForcingVariable.MEAN, a.layout()));
        assertTrue(quantity.contains("daily quantity"), quantity);
    }

    @Test
    void layoutIsCommonOrWholeMaps() {
        Fake a = new Fake("a.nc", new long[] {0}, CfCalendar.STANDARD, 7, ForcingVariable.MINIMUM, new StorageLayout(365, 1, 2, 0));
        Fake b = new Fake("b.nc", new long[] {1}, CfCalendar.STANDARD, 7, ForcingVariable.MINIMUM, new StorageLayout(366, 1, 2, 0));
        Fake c = new Fake("c.nc", new long[] {2}, CfCalendar.STANDARD, 7, ForcingVariable.MINIMUM, new StorageLayout(1, 2, 3, 0));
        assertEquals(new StorageLayout(366, 1, 2, 0), JoinedTemperatureSource.join(List.of(a, b), new Notices()).layout());
        assertEquals(new StorageLayout(1, 2, 3, 0), JoinedTemperatureSource.join(List.of(a, b, c), new Notices()).layout());
    }

    @Test
    void singleFileStaysItself() {
        Fake a = new Fake("a.nc", 0);
        assertSame(a, JoinedTemperatureSource.join(List.of(a), new Notices()));
    }
}
