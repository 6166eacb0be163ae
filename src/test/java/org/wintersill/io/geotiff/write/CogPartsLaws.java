package org.wintersill.io.geotiff.write;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.wintersill.layer.SampleType;

class CogPartsLaws {
    private static final int CELLS = 256 * 256;

    @Property(tries = 30)
    void packedTilesComeBack(@ForAll SampleType type, @ForAll long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        float[] values = new float[CELLS];
        for (int i = 0; i < CELLS; i++) {
            values[i] = random.nextInt(9) == 0 ? Float.NaN : switch (type) {
                case FLOAT32 -> (float) (random.nextDouble() * 1e3 - 500);
                case INT16 -> random.nextInt(-9998, 32768);
                case BYTE -> random.nextInt(1, 256);
            };
        }
        float[] back = new float[CELLS];
        try (TileCodec codec = new TileCodec(type)) {
            codec.pack(values);
            assertTrue(codec.length() <= TileCodec.largest(type));
            new TileReading(type).unpack(codec.packed().clone(), codec.length(), back);
        }
        for (int i = 0; i < CELLS; i++) {
            assertEquals(values[i], back[i]);
        }
    }

    @Property
    void meansStayBetweenTheirCells(@ForAll float a, @ForAll float b, @ForAll float c, @ForAll float d,
                                    @ForAll @IntRange(max = 15) int missing) {
        float[] cells = {a, b, c, d};
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < 4; i++) {
            if ((missing >> i & 1) == 1) {
                cells[i] = Float.NaN;
            } else {
                low = Math.min(low, cells[i]);
                high = Math.max(high, cells[i]);
            }
        }
        float mean = OverviewRule.mean(cells[0], cells[1], cells[2], cells[3]);
        assertEquals(missing == 15, Float.isNaN(mean));
        assertTrue(missing == 15 || mean >= low && mean <= high);
    }

    @Property
    void classesAndYearsOfOverviewsOccurBelow(@ForAll @IntRange(max = 4) int a, @ForAll @IntRange(max = 4) int b,
                                              @ForAll @IntRange(max = 4) int c, @ForAll @IntRange(max = 4) int d) {
        float[] cells = new float[4];
        int[] codes = {a, b, c, d};
        for (int i = 0; i < 4; i++) {
            cells[i] = codes[i] == 0 ? Float.NaN : codes[i];
        }
        float mode = OverviewRule.mode(cells[0], cells[1], cells[2], cells[3]);
        float first = OverviewRule.first(cells[0], cells[1], cells[2], cells[3]);
        List<Integer> valid = Stream.of(a, b, c, d).filter(code -> code > 0).toList();
        assertEquals(valid.isEmpty(), Float.isNaN(mode));
        if (!valid.isEmpty()) {
            assertEquals((float) valid.get(0), first);
            long votes = valid.stream().filter(code -> code == mode).count();
            assertTrue(votes > 0);
            valid.forEach(code -> assertTrue(valid.stream().filter(code::equals).count() <= votes));
        }
    }

    @Property(tries = 200)
    void statisticsOfPartsAreThoseOfTheWhole(@ForAll long seed, @ForAll @IntRange(min = 1, max = 40) int parts) {
        SplittableRandom random = new SplittableRandom(seed);
        ValueStatistics joined = new ValueStatistics();
        float[] all = new float[parts * 50];
        for (int part = 0; part < parts; part++) {
            float[] some = new float[50];
            for (int i = 0; i < 50; i++) {
                some[i] = random.nextInt(5) == 0 ? Float.NaN : (float) (250 + 20 * random.nextDouble());
                all[part * 50 + i] = some[i];
            }
            ValueStatistics one = new ValueStatistics();
            one.of(some);
            joined.add(one);
        }
        ValueStatistics whole = new ValueStatistics();
        whole.of(all);
        assertEquals(whole.count(), joined.count());
        if (whole.count() > 0) {
            assertEquals(whole.minimum(), joined.minimum());
            assertEquals(whole.maximum(), joined.maximum());
            assertEquals(whole.mean(), joined.mean(), 1e-10);
            assertEquals(whole.standardDeviation(), joined.standardDeviation(), 1e-9);
        }
    }

    @Property
    void theSmallestLevelFitsOneTile(@ForAll @IntRange(min = 1, max = 100_000) int columns,
                                     @ForAll @IntRange(min = 1, max = 100_000) int rows) {
        List<PyramidLevel> levels = PyramidLevel.of(columns, rows);
        assertEquals(1, levels.get(levels.size() - 1).tiles());
        for (int i = 1; i < levels.size(); i++) {
            assertEquals((levels.get(i - 1).columns() + 1) / 2, levels.get(i).columns());
            assertEquals((levels.get(i - 1).rows() + 1) / 2, levels.get(i).rows());
            assertTrue(levels.get(i - 1).tiles() > 1);
        }
    }
}
