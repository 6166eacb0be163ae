package org.wintersill.climatology.extreme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.checks.CheckTables;
import org.wintersill.damage.ToleranceCurve;

/** Values: checks/gev.json, computed with R evd and scipy on published data, with the values of Coles 2001 beside them. */
class GevCheckTest {
    private static final JsonNode CHECK = CheckTables.json("gev.json");

    private static double[] data(String name) {
        boolean venice = name.equals("venice_r1");
        return CheckTables.csv(venice ? "venice_annual_max.csv" : "port_pirie.csv").stream()
                .mapToDouble(row -> Double.parseDouble(row.get(venice ? "sea_level_cm" : "sea_level_m"))).toArray();
    }

    private static double[] sorted(String name) {
        double[] values = data(name);
        Arrays.sort(values);
        return values;
    }

    private static void assertGev(JsonNode expected, Gev gev, double tolerance) {
        assertEquals(expected.get("loc").asDouble(), gev.location(), tolerance * Math.max(1, gev.scale()));
        assertEquals(expected.get("scale").asDouble(), gev.scale(), tolerance * Math.max(1, gev.scale()));
        assertEquals(expected.get("xi").asDouble(), gev.shape(), tolerance);
    }

    @ParameterizedTest
    @CsvSource({"port_pirie", "venice_r1"})
    void momentsAndTheirFitsAreAsTabled(String name) {
        JsonNode check = CHECK.get(name);
        double[] values = sorted(name);
        LMoments moments = LMoments.of(values, values.length);
        assertEquals(check.at("/lmoments/l1").asDouble(), moments.first(), 1e-7);
        assertEquals(check.at("/lmoments/l2").asDouble(), moments.second(), 1e-8);
        assertEquals(check.at("/lmoments/t3").asDouble(), moments.skewness(), 1e-9);
        assertGev(check.get("gev_lmom_HWW1985"), moments.withShape(LMoments.twoTermShape(moments.skewness())), 1e-8);
        assertGev(check.get("gev_lmom_exact_k"), moments.gev(), 1e-5);
    }

    @ParameterizedTest
    @CsvSource({"port_pirie", "venice_r1"})
    void likelihoodFitsAreAsTabled(String name) {
        JsonNode check = CHECK.get(name);
        double[] values = data(name);
        Gev gev = MaximumLikelihood.fit(values, values.length);
        assertGev(check.get("gev_mle"), gev, 2e-4);
        assertEquals(check.at("/gev_mle/loglik").asDouble(), gev.logLikelihood(values, values.length), 1e-5);
        double[][] covariance = MaximumLikelihood.covariance(values, values.length, gev);
        String[] names = {"loc", "scale", "xi"};
        for (int i = 0; i < 3; i++) {
            double expected = check.get("mle_se").get(names[i]).asDouble();
            assertEquals(expected, Math.sqrt(covariance[i][i]), 5e-3 * expected);
        }
        check.get("return_levels").fields().forEachRemaining(level -> assertEquals(level.getValue().get("mle").asDouble(),
                gev.returnLevel(Double.parseDouble(level.getKey())), 2e-4 * gev.scale()));
    }

    @ParameterizedTest
    @CsvSource({"port_pirie", "venice_r1"})
    void returnLevelsOfTheTwoTermFitAreAsTabled(String name) {
        double[] values = sorted(name);
        LMoments moments = LMoments.of(values, values.length);
        Gev gev = moments.withShape(LMoments.twoTermShape(moments.skewness()));
        CHECK.get(name).get("return_levels").fields().forEachRemaining(level -> assertEquals(
                level.getValue().get("lmom_HWW").asDouble(), gev.returnLevel(Double.parseDouble(level.getKey())), 1e-6));
    }

    @Test
    void intervalsAndTestsOfFitAreAsTabled() {
        JsonNode check = CHECK.get("port_pirie");
        double[] values = sorted("port_pirie");
        int n = values.length;
        Gev gev = MaximumLikelihood.fit(values, n);
        double[][] covariance = MaximumLikelihood.covariance(values, n, gev);
        for (String winters : new String[] {"10", "100"}) {
            assertEquals(check.at("/delta_se_return_level/" + winters).asDouble(),
                    MaximumLikelihood.returnLevelError(gev, covariance, Double.parseDouble(winters)), 1e-3);
            double[] profile = new ProfileLikelihood(values, n, gev).returnLevel(Double.parseDouble(winters), 0.95);
            assertEquals(check.at("/profile95/return" + winters + "/0").asDouble(), profile[0], 1e-3);
            assertEquals(check.at("/profile95/return" + winters + "/1").asDouble(), profile[1], 1e-3);
        }
        double[] shape = new ProfileLikelihood(values, n, gev).shape(0.95);
        assertEquals(check.at("/profile95/xi/0").asDouble(), shape[0], 1e-3);
        assertEquals(check.at("/profile95/xi/1").asDouble(), shape[1], 1e-3);
        assertEquals(check.at("/goodness_of_fit_at_mle/anderson_darling").asDouble(), FitQuality.andersonDarling(values, n, gev), 2e-4);
        assertEquals(check.at("/goodness_of_fit_at_mle/cramer_von_mises").asDouble(), FitQuality.cramerVonMises(values, n, gev), 1e-4);
        double correlation = FitQuality.plotCorrelation(values, n, gev);
        assertTrue(correlation > 0.98 && correlation < 1, "Port Pirie lies on a straight plot: " + correlation);
    }

    @Test
    void trendsInLocationAreAsTabled() {
        for (String name : new String[] {"port_pirie", "venice_r1"}) {
            JsonNode check = CHECK.get(name).get("linear_trend_in_location");
            double[] values = data(name);
            int n = values.length;
            double[] times = IntStream.rangeClosed(1, n).asDoubleStream().toArray();
            LocationTrend trend = LocationTrend.of(times, values, n, MaximumLikelihood.fit(values, n));
            double unit = trend.gev().scale();
            assertEquals(check.get("loc1").asDouble(), trend.slope(), 2e-4 * Math.max(1, unit));
            assertEquals(check.get("loglik").asDouble(), trend.logLikelihood(), 1e-4);
            assertEquals(check.get("xi").asDouble(), trend.gev().shape(), 5e-4);
            if (name.equals("venice_r1")) {
                assertEquals(check.get("likelihood_ratio").asDouble(), trend.ratio(), 1e-3);
                assertEquals(check.get("p_value").asDouble(), trend.pValue(), 1e-6);
            }
        }
    }

    @Test
    void lowsAreNegatedHighs() {
        JsonNode check = CHECK.get("minima");
        double[] values = data("port_pirie");
        Gev highs = MaximumLikelihood.fit(values, values.length);
        check.get("T_year_low").fields().forEachRemaining(level -> assertEquals(level.getValue().asDouble(),
                LowExtreme.returnLevel(highs, Double.parseDouble(level.getKey())), 1e-4));
        assertEquals(check.at("/prob_min_at_or_below/-4.3").asDouble(), LowExtreme.probabilityAtOrBelow(highs, -4.3), 1e-4);
        JsonNode example = check.get("expected_annual_damage_invented");
        Gev gev = new Gev(18, 4, -0.15);
        assertEquals(example.get("killing_winter_probability_damage_ge_half").asDouble(), LowExtreme.probabilityAtOrBelow(gev, -23), 1e-9);
        assertEquals(example.get("return_period_years").asDouble(), 1 / LowExtreme.probabilityAtOrBelow(gev, -23), 1e-8);
        example.get("T_year_low").fields().forEachRemaining(level -> assertEquals(level.getValue().asDouble(),
                LowExtreme.returnLevel(gev, Double.parseDouble(level.getKey())), 1e-8));
        Gev margins = new Gev(18 - 23, 4, -0.15);
        assertEquals(example.get("expected_damage").asDouble(), FittedDamage.expected(margins, ToleranceCurve.LOGISTIC, 1.2, 1.2), 1e-8);
    }

    @Test
    void trendByRanksIsAsTabled() {
        JsonNode check = CheckTables.json("planner_layers.json").get("theil_sen");
        double[] values = {-20.0, -18.5, -19.5, -17.0, -18.0, -15.5};
        RankTrend trend = RankTrend.of(new double[] {1, 2, 3, 4, 5, 6}, values, 6);
        assertEquals(check.get("slope").asDouble(), trend.slope(), 1e-12);
        assertEquals(check.get("mann_kendall_S").asInt(), trend.s());
        assertEquals(check.get("var_S").asDouble(), trend.variance(), 1e-7);
        assertEquals(check.get("Z").asDouble(), trend.z(), 1e-8);
        assertEquals(check.get("p_two_sided").asDouble(), trend.pValue(), 1e-9);
    }
}
