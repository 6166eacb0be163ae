package org.wintersill.estimation;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.estimation.TrialFit.Standing;

/** The method by itself, on data and estimates from outside and on straight lines. */
class TrialFitTest {
    private static final TrialFit.Way WAY = new TrialFit.Way(6, 1e-6, 0, 0.9, 1, () -> { });

    private static double[] numbers(JsonNode list) {
        double[] numbers = new double[list.size()];
        for (int i = 0; i < numbers.length; i++) {
            numbers[i] = list.get(i).asDouble();
        }
        return numbers;
    }

    private static double[] ones(int n) {
        double[] ones = new double[n];
        Arrays.fill(ones, 1);
        return ones;
    }

    /** Four-parameter log-logistic of Ritz et al. 2015, PLoS ONE 10:e0146021; the ryegrass estimates are those of dose_response.json. */
    @Test
    void theRyegrassFitIsThatOfTheCheckTable() {
        JsonNode table = CheckTables.json("dose_response.json").get("log_logistic_LL4");
        double[] x = numbers(table.get("data").get("conc"));
        double[] y = numbers(table.get("data").get("rootl"));
        Prediction curve = p -> Arrays.stream(x).map(dose -> p[1] + (p[2] - p[1])
                / (1 + (dose == 0 ? 0 : Math.exp(p[0] * (Math.log(dose) - Math.log(p[3])))))).toArray();
        List<Parameter> parameters = List.of(new Parameter("b", "1", 0.1, 20), new Parameter("c", "cm", -1, 5),
                new Parameter("d", "cm", 3, 15), new Parameter("e", "mM", 0.1, 20));
        TrialFit fit = TrialFit.of(curve, parameters, y, ones(y.length), new double[] {1, 0, 10, 5}, WAY);
        JsonNode known = table.get("fit");
        for (TrialFit.Estimate estimate : fit.estimates()) {
            assertEquals(known.get(estimate.parameter().name()).asDouble(), estimate.value(), 2e-4, estimate.parameter().name());
            assertEquals(Standing.ESTIMATED, estimate.standing());
        }
        double sum = Arrays.stream(fit.residuals()).map(r -> r * r).sum();
        assertEquals(known.get("residual_ss").asDouble(), sum, 1e-7);
        assertEquals(known.get("residual_se_df20").asDouble(), Math.sqrt(sum / 20), 1e-8);
        assertEquals(Math.sqrt(sum / 24), fit.rmse(), 1e-12);
    }

    private static final double[] X = {0, 1, 2, 3, 4, 5, 6, 7};
    private static final double[] Y = {1.1, 2.9, 5.2, 6.8, 9.1, 11.2, 12.7, 15.1};
    private static final List<Parameter> LINE = List.of(new Parameter("a", "1", -10, 10), new Parameter("b", "1", -10, 10));
    private static final Prediction STRAIGHT = p -> Arrays.stream(X).map(x -> p[0] + p[1] * x).toArray();

    /** Ordinary least squares in closed form: b = Sxy / Sxx, a = mean y - b mean x. */
    @Test
    void aStraightLineIsThatOfTheClosedForm() {
        double[] weights = {1, 2, 1, 3, 1, 1, 2, 1};
        double w = 0;
        double mx = 0;
        double my = 0;
        for (int i = 0; i < X.length; i++) {
            w += weights[i];
            mx += weights[i] * X[i];
            my += weights[i] * Y[i];
        }
        mx /= w;
        my /= w;
        double sxy = 0;
        double sxx = 0;
        double syy = 0;
        for (int i = 0; i < X.length; i++) {
            sxy += weights[i] * (X[i] - mx) * (Y[i] - my);
            sxx += weights[i] * (X[i] - mx) * (X[i] - mx);
            syy += weights[i] * (Y[i] - my) * (Y[i] - my);
        }
        TrialFit fit = TrialFit.of(STRAIGHT, LINE, Y, weights, new double[] {0, 0}, WAY);
        assertEquals(sxy / sxx, fit.estimates().get(1).value(), 1e-9);
        assertEquals(my - sxy / sxx * mx, fit.estimates().get(0).value(), 1e-9);
        assertEquals(sxy * sxy / sxx / syy, fit.r2(), 1e-9);
    }

    /** Of a straight line the standard error is known: the interval of a normal sample is about +-1.645 of them wide at 90 %. */
    @Test
    void bootstrapIntervalsAreAsWideAsTheStandardErrorSays() {
        TrialFit.Way way = new TrialFit.Way(0, 1e-6, 2000, 0.9, 7, () -> { });
        TrialFit fit = TrialFit.of(STRAIGHT, LINE, Y, ones(Y.length), new double[] {0, 0}, way);
        double sum = Arrays.stream(fit.residuals()).map(r -> r * r).sum();
        double error = Math.sqrt(sum / (Y.length - 2) / 42);
        TrialFit.Estimate slope = fit.estimates().get(1);
        assertEquals(2 * 1.645 * error, slope.upper() - slope.lower(), 0.15 * 2 * 1.645 * error);
        assertTrue(slope.lower() < slope.value() && slope.value() < slope.upper());
        TrialFit again = TrialFit.of(STRAIGHT, LINE, Y, ones(Y.length), new double[] {0, 0}, way);
        assertEquals(fit.estimates(), again.estimates());
        assertArrayEquals(fit.fitted(), again.fitted());
    }

    @Test
    void whatTheSamplesDoNotTellIsSaid() {
        List<Parameter> parameters = List.of(new Parameter("a", "1", -10, 10), new Parameter("b", "1", -10, 1.5),
                new Parameter("idle", "1", 0, 1));
        TrialFit fit = TrialFit.of(p -> Arrays.stream(X).map(x -> p[0] + p[1] * x).toArray(), parameters, Y, ones(Y.length),
                new double[] {0, 0, 0.3}, new TrialFit.Way(3, 1e-6, 20, 0.9, 1, () -> { }));
        assertEquals(Standing.AT_BOUND, fit.estimates().get(1).standing());
        assertEquals(1.5, fit.estimates().get(1).value(), 1e-9);
        assertEquals(Standing.UNTOLD, fit.estimates().get(2).standing());
    }
}
