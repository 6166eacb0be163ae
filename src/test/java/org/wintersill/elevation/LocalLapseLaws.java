package org.wintersill.elevation;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.LongRange;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/** Lapse rates of a night against a fresh regression in every window, and what they do to a target cell. */
class LocalLapseLaws {
    private static final int COLUMNS = 23;
    private static final int ROWS = 19;
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);

    private static LocalLapse definition(double radius) {
        double[] width = IntStream.range(0, ROWS).mapToDouble(row -> 4000 + 60 * row).toArray();
        double[] height = IntStream.range(0, ROWS).mapToDouble(row -> 5500 + row).toArray();
        return new LocalLapse(radius, LapseRates.constant(4.5), 1.5, width, height);
    }

    private static float[][] weather(long seed) {
        Random random = new Random(seed);
        float[] heights = new float[COLUMNS * ROWS];
        float[] night = new float[heights.length];
        for (int i = 0; i < heights.length; i++) {
            heights[i] = random.nextInt(15) == 0 ? Float.NaN : i % COLUMNS < 5 ? 200 + 20 * random.nextFloat() : 1500 * random.nextFloat();
            float z = Float.isNaN(heights[i]) ? 0 : heights[i];
            night[i] = random.nextInt(10) == 0 ? Float.NaN : (float) (-5 - (i % COLUMNS - 8) * 0.6 * z / 1000 + random.nextGaussian());
        }
        return new float[][] {heights, night};
    }

    /** By definition, in double precision, one window after the other. */
    private static double[] rates(LocalLapse definition, float[] heights, float[] night) {
        double[] rates = new double[heights.length];
        for (int i = 0; i < rates.length; i++) {
            double[] s = new double[6];
            double low = Double.POSITIVE_INFINITY;
            double high = Double.NEGATIVE_INFINITY;
            for (int j : window(definition, i)) {
                double z = heights[j] / 1000.0;
                double t = night[j];
                if (!Double.isNaN(z)) {
                    low = Math.min(low, z);
                    high = Math.max(high, z);
                }
                if (!Double.isNaN(z + t)) {
                    double[] add = {1, z, t, z * z, z * t, t * t};
                    for (int k = 0; k < 6; k++) {
                        s[k] += add[k];
                    }
                }
            }
            rates[i] = s[0] >= 8 && high - low >= 0.15 ? LapseFit.of(s[0], s[1], s[2], s[3], s[4], s[5]).shrunk(4.5, 1.5) : 4.5;
        }
        return rates;
    }

    private static int[] window(LocalLapse definition, int cell) {
        int row = cell / COLUMNS;
        int column = cell % COLUMNS;
        return IntStream.range(0, COLUMNS * ROWS).filter(other -> Math.abs(other / COLUMNS - row) <= definition.halfRows(row)
                && Math.abs(other % COLUMNS - column) <= definition.halfColumns(row)).toArray();
    }

    @Property(tries = 40)
    void carriedSumsGiveTheRegressionOfEveryWindow(@ForAll @LongRange(min = 0, max = 1 << 20) long seed,
                                                   @ForAll @IntRange(min = 1, max = 90) int kilometres) {
        LocalLapse definition = definition(1000.0 * kilometres);
        float[][] weather = weather(seed);
        float[] out = new float[COLUMNS * ROWS];
        new LapseField(definition, COLUMNS, weather[0]).compute(weather[1], 0, 1, 0, ROWS, out);
        double[] rates = rates(definition, weather[0], weather[1]);
        for (int i = 0; i < out.length; i++) {
            double[] near = IntStream.of(window(definition, i)).filter(j -> !Float.isNaN(weather[0][j] + weather[1][j]))
                    .mapToDouble(j -> rates[j]).toArray();
            assertEquals(near.length == 0 ? 4.5 : IntStream.range(0, near.length).mapToDouble(k -> near[k]).average().orElseThrow(),
                    out[i], 2e-3);
        }
    }

    @Property(tries = 40)
    void rowsAloneGiveTheSameBits(@ForAll @LongRange(min = 0, max = 1 << 20) long seed, @ForAll @IntRange(min = 8, max = 11) int row) {
        LocalLapse whole = definition(12_000);
        float[][] weather = weather(seed);
        float[] out = new float[COLUMNS * ROWS];
        new LapseField(whole, COLUMNS, weather[0]).compute(weather[1], 0, 1, 0, ROWS, out);
        int from = Math.max(0, row - whole.haloRows());
        int to = Math.min(ROWS, row + 1 + whole.haloRows());
        float[] heights = Arrays.copyOfRange(weather[0], from * COLUMNS, to * COLUMNS);
        float[] part = new float[COLUMNS * ROWS];
        new LapseField(whole.rows(from, to), COLUMNS, heights).compute(weather[1], from * COLUMNS, 1, row - from, row - from + 1, part);
        for (int column = 0; column < COLUMNS; column++) {
            assertEquals(out[row * COLUMNS + column], part[row * COLUMNS + column], 0);
        }
    }

    @Property(tries = 40)
    void targetCellsAreTheMeanOfTheirSourceCellsProfiles(@ForAll @LongRange(min = 0, max = 1 << 20) long seed) {
        float[][] weather = weather(seed);
        GridGeometry source = new GridGeometry(COLUMNS, ROWS, 0, ROWS, 1, 1, CRS);
        GridGeometry target = new GridGeometry(3 * COLUMNS, 3 * ROWS, 0, ROWS, 1 / 3.0, 1 / 3.0, CRS);
        Random random = new Random(seed);
        float[] dem = new float[target.columns() * target.rows()];
        for (int i = 0; i < dem.length; i++) {
            dem[i] = random.nextInt(20) == 0 ? Float.NaN : 1500 * random.nextFloat();
        }
        SourcePositions positions = new SourcePositions(source, target, CoordinateOperation.identity());
        float[] cooling = new float[target.columns()];
        Arrays.fill(cooling, -2);
        PoolChange pool = new PoolChange() {
            @Override
            public float[] row(int targetRow) {
                return cooling;
            }

            @Override
            public long bytes() {
                return 0;
            }
        };
        LocalLapse definition = definition(20_000);
        ElevationAdjustment adjustment = ElevationAdjustment.toHeights(positions, weather[0], new ElevationField(target, dem, ""),
                LapseRates.constant(4.5)).with(Optional.of(definition), new TargetTerms(pool, null, 0.25,
                new StableNights.ByLapse(LapseRates.constant(4.5)), TargetTerms.FrozenPeriod.NEVER));
        float[] rates = new float[COLUMNS * ROWS];
        new LapseField(definition, COLUMNS, weather[0]).compute(weather[1], 0, 1, 0, ROWS, rates);
        float[] weights = new float[rates.length];
        for (int i = 0; i < weights.length; i++) {
            weights[i] = StableNights.ByLapse.weight(rates[i], 4.5);
        }
        float[] out = new float[dem.length];
        NightFields fields = new NightFields().set(4.5, rates, weights, true);
        new NightAdjuster(adjustment).adjust(weather[1], 0, fields, AdjustedTemperature.MINIMUM, 0, target.rows(), out);
        for (int cell = 0; cell < out.length; cell++) {
            int row = cell / target.columns();
            int column = cell % target.columns();
            int containing = positions.containing(row, column);
            if (Float.isNaN(dem[cell]) || Float.isNaN(weather[0][containing] + weather[1][containing])) {
                assertEquals(Float.POSITIVE_INFINITY, out[cell], 0);
                continue;
            }
            double total = 0;
            double sum = 0;
            double weight = 0;
            for (int k = 0; k < 4; k++) {
                int s = (positions.north(row, column) + k / 2) * COLUMNS + positions.west(row, column) + k % 2;
                double w = adjustment.cornerWeight(row, column, k);
                double value = weather[1][s] + rates[s] * (weather[0][s] - dem[cell]) / 1000;
                weight += w * weights[s];
                if (w > 0 && !Double.isNaN(value)) {
                    total += w * value;
                    sum += w;
                }
            }
            assertEquals(total / sum - 2 * weight + 0.25, out[cell], 1e-4);
        }
    }
}
