package org.wintersill.elevation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;

/** Values: checks/elevation.json and the tables named in the tests, all from outside of this program. */
class LapseChecksTest {
    private static final JsonNode TABLE = CheckTables.json("elevation.json");

    private static LapseFit fit(double[] kilometres, double[] t) {
        double n = t.length;
        double[] sums = new double[5];
        for (int i = 0; i < n; i++) {
            sums[0] += kilometres[i];
            sums[1] += t[i];
            sums[2] += kilometres[i] * kilometres[i];
            sums[3] += kilometres[i] * t[i];
            sums[4] += t[i] * t[i];
        }
        return LapseFit.of(n, sums[0], sums[1], sums[2], sums[3], sums[4]);
    }

    private static double[] numbers(JsonNode list, double divisor) {
        double[] values = new double[list.size()];
        Arrays.setAll(values, i -> list.get(i).asDouble() / divisor);
        return values;
    }

    @Test
    void regressionWithShrinkageIsAsTabled() {
        JsonNode example = TABLE.get("window_regression_shrinkage");
        LapseFit fit = fit(numbers(example.get("z_m"), 1000), numbers(example.get("T"), 1));
        assertEquals(example.get("lapse_ols_K_per_km").asDouble(), fit.lapse(), 1e-8);
        assertEquals(example.get("intercept_at_sea_level").asDouble(), fit.atSeaLevel(), 1e-8);
        assertEquals(example.get("se2").asDouble(), fit.squaredError(), 1e-8);
        double priorSd = example.get("prior_sd").asDouble();
        assertEquals(example.get("weight").asDouble(), fit.weight(priorSd), 1e-8);
        assertEquals(example.get("lapse_shrunk").asDouble(), fit.shrunk(example.get("prior_lapse").asDouble(), priorSd), 1e-8);
        for (JsonNode row : TABLE.get("daily_lapse_bounds")) {
            assertEquals(row.get("used").asDouble(), LapseFit.bounded(row.get("lapse").asDouble()), 0);
        }
    }

    @Test
    void theSweepGivesTheTabledRegression() {
        JsonNode example = TABLE.get("window_regression_shrinkage");
        float[] heights = new float[9];
        float[] night = new float[9];
        for (int i = 0; i < 9; i++) {
            heights[i] = (float) example.get("z_m").get(i).asDouble();
            night[i] = (float) example.get("T").get(i).asDouble();
        }
        double[] sizes = {25_000, 25_000, 25_000};
        LocalLapse definition = new LocalLapse(50_000, LapseRates.constant(example.get("prior_lapse").asDouble()),
                example.get("prior_sd").asDouble(), sizes, sizes);
        float[] out = new float[9];
        new LapseField(definition, 3, heights).compute(night, 0, 1, 0, 3, out);
        for (float rate : out) {
            assertEquals(example.get("lapse_shrunk").asDouble(), rate, 2e-4);
        }
    }

    /** 213 stations, data set of R package fields; the figures stand in science.md 7.2. */
    @Test
    void springMinimaOfColoradoGiveTheirLapseRate() {
        List<CSVRecord> stations = CheckTables.csv("colorado_tmin_mam.csv");
        double[] z = stations.stream().mapToDouble(row -> Double.parseDouble(row.get("elev_m")) / 1000).toArray();
        double[] t = stations.stream().mapToDouble(row -> Double.parseDouble(row.get("tmin_C"))).toArray();
        LapseFit fit = fit(z, t);
        assertEquals(213, t.length);
        assertEquals(5.317607, fit.lapse(), 1e-5);
        assertEquals(0.190806, Math.sqrt(fit.squaredError()), 1e-5);
        // Independent of the sums: R^2 = 1 / (1 + (n - 2) (se / slope)^2).
        assertEquals(1 / (1 + 211 * Math.pow(0.190806 / 5.317607, 2)), fit.determination(), 1e-5);
    }

    /** The monthly rows hold results, not stations; slope, its error and r2 must agree with each other, and with our bounds and default. */
    @Test
    void monthlyRatesOfColoradoAndPublishedOnesLieWithinTheBounds() {
        double winter = 0;
        for (CSVRecord row : CheckTables.csv("lapse_colorado_monthly.csv")) {
            double lapse = Double.parseDouble(row.get("lapse_K_per_km"));
            double ratio = Double.parseDouble(row.get("se")) / lapse;
            double n = Double.parseDouble(row.get("stations"));
            assertEquals(Double.parseDouble(row.get("r2")), 1 / (1 + (n - 2) * ratio * ratio), 2e-5);
            assertEquals(lapse, LapseFit.bounded(lapse), 0);
            int month = Integer.parseInt(row.get("month"));
            winter += month <= 3 || month >= 11 ? lapse / 5 : 0;
        }
        assertEquals(LapseRates.DEFAULT, winter, 0.5);
        for (CSVRecord row : CheckTables.csv("lapse_rates.csv")) {
            // Some sources say in words how rates change, without a number.
            for (String column : List.of("lapse_K_per_km", "lapse_hi_K_per_km")) {
                if (!row.get(column).isEmpty()) {
                    double lapse = Double.parseDouble(row.get(column));
                    assertEquals(lapse, LapseFit.bounded(lapse), 0);
                }
            }
        }
    }

    @Test
    void theStandardAtmosphereIsAsTabled() {
        int checked = 0;
        for (CSVRecord row : CheckTables.csv("standard_atmosphere.csv")) {
            double geopotential = Double.parseDouble(row.get("geopotential_m"));
            if (geopotential <= 11_000) {
                assertEquals(Double.parseDouble(row.get("T_K_at_geometric")),
                        LapseRates.atHeight(288.15, LapseRates.STANDARD_ATMOSPHERE, 0, geopotential), 1e-6);
                checked++;
            }
        }
        assertTrue(checked > 3);
    }

    @Test
    void twoLayersAreAsTabled() {
        JsonNode example = TABLE.get("two_layer_inversion");
        Inversion inversion = new Inversion(example.get("z_t").asDouble(), example.get("G_inv").asDouble(), example.get("G_free").asDouble());
        for (JsonNode row : example.get("values")) {
            double z = row.get("z").asDouble();
            double t = inversion.temperature(example.get("T_top").asDouble(), z);
            assertEquals(row.get("T").asDouble(), t, 1e-9);
            double free = LapseRates.atHeight(example.get("T_top").asDouble(), inversion.free(), inversion.top(), z);
            assertEquals(t, free + inversion.excess(z), 1e-9);
        }
    }

    @Test
    void waterWarmsAsTabled() {
        for (JsonNode row : TABLE.get("lake").get("values")) {
            assertEquals(row.get("dT").asDouble(), WaterWarming.change(row.get("dT0").asDouble(), row.get("d_km").asDouble() * 1000,
                    row.get("L").asDouble() * 1000), 1e-9);
        }
    }

    @Test
    void pooledNightsAreToldByLapseRateAndByRange() {
        assertEquals(0, StableNights.ByLapse.weight(4.5, 4.5), 0);
        assertEquals(1, StableNights.ByLapse.weight(-8, 4.5), 0);
        assertEquals(0.5, StableNights.ByLapse.weight(-1.75, 4.5), 1e-7);
        assertEquals(0, StableNights.ByLapse.weight(9, 4.5), 0);
        StableNights.ByRange range = new StableNights.ByRange(5, 15);
        assertEquals(0.5f, range.weight(-10, 0), 1e-6);
        assertEquals(0, range.weight(-10, -8), 0);
        assertEquals(1, range.weight(-20, 0), 0);
        assertEquals(0, range.weight(-20, Float.NaN), 0);
    }
}
