package org.wintersill.damage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;

/** Values: checks/tolerance_distributions.json, computed with scipy; temperatures from the sources named in it. */
class ToleranceCurveTest {
    /** The table's temperatures are rounded to ten digits, so the last digit of what follows from them is loose. */
    private static final double ROUNDED = 1e-8;
    private static final JsonNode TABLE = CheckTables.json("tolerance_distributions.json");

    @Test
    void splitCurvesGiveTheTabledFractions() {
        for (JsonNode triple : TABLE.get("split_cases")) {
            checkSplit(triple, triple.get("split_logistic"), ToleranceCurve.SPLIT_LOGISTIC, "s");
            checkSplit(triple, triple.get("split_normal"), ToleranceCurve.SPLIT_PROBIT, "sigma");
        }
    }

    private static void checkSplit(JsonNode triple, JsonNode split, ToleranceCurve curve, String letter) {
        double lt10 = triple.get("LT10").asDouble();
        double lt50 = triple.get("LT50").asDouble();
        double lt90 = triple.get("LT90").asDouble();
        assertEquals(split.get(letter + "_warm").asDouble(), curve.warmSpread(lt10, lt50), ROUNDED);
        assertEquals(split.get(letter + "_cold").asDouble(), curve.coldSpread(lt50, lt90), ROUNDED);
        assertEquals(7, split.get("points").size());
        for (JsonNode point : split.get("points")) {
            assertEquals(point.get("p").asDouble(), curve.killedFraction(point.get("T").asDouble(), lt10, lt50, lt90), ROUNDED);
        }
    }

    @Test
    void symmetricSpreadsAreAsTabled() {
        for (JsonNode triple : TABLE.get("split_cases")) {
            double lt10 = triple.get("LT10").asDouble();
            double lt90 = triple.get("LT90").asDouble();
            JsonNode symmetric = triple.get("symmetric_from_LT10_LT90");
            double middle = (lt10 + lt90) / 2;
            assertEquals(symmetric.get("LT50").asDouble(), middle, ROUNDED);
            assertEquals(symmetric.get("s").asDouble(), ToleranceCurve.LOGISTIC.warmSpread(lt10, middle), ROUNDED);
            assertEquals(symmetric.get("s").asDouble(), ToleranceCurve.LOGISTIC.coldSpread(middle, lt90), ROUNDED);
            assertEquals(symmetric.get("sigma").asDouble(), ToleranceCurve.PROBIT.warmSpread(lt10, middle), ROUNDED);
        }
    }

    @Test
    void theSymmetricLogisticGivesTheTabledFractionsAndTemperatures() {
        JsonNode table = TABLE.get("symmetric_logistic_invented");
        double lt50 = table.get("LT50").asDouble();
        double tenth = table.get("logistic_scale").asDouble() * ToleranceCurve.LN_9;
        for (JsonNode point : table.get("points")) {
            assertEquals(point.get("p").asDouble(),
                    ToleranceCurve.LOGISTIC.killedFraction(point.get("T").asDouble(), lt50 + tenth, lt50, lt50 - tenth), 1e-9);
        }
        for (JsonNode lethal : table.get("LT")) {
            assertEquals(lethal.get("T").asDouble(), ToleranceCurve.LOGISTIC.lethalTemperature(lethal.get("percent").asDouble(),
                    lt50 + tenth, lt50, lt50 - tenth), ROUNDED);
        }
        assertEquals(table.get("matching_probit_sigma_by_LT10_LT90").asDouble(),
                ToleranceCurve.PROBIT.warmSpread(lt50 + tenth, lt50), 1e-9);
    }

    @Test
    void twoCriticalTemperaturesMakeTheTabledCurve() {
        for (JsonNode row : TABLE.get("two_point_from_critical_temps")) {
            double lt10 = row.get("LT10").asDouble();
            double lt90 = row.get("LT90").asDouble();
            double middle = (lt10 + lt90) / 2;
            assertEquals(row.get("s").asDouble(), ToleranceCurve.LOGISTIC.warmSpread(lt10, middle), ROUNDED);
            assertEquals(row.get("p_at_minus3").asDouble(), ToleranceCurve.LOGISTIC.killedFraction(-3, lt10, middle, lt90), ROUNDED);
        }
    }

    @Property
    void theCurvePassesThroughItsThreePointsAndFallsWithTemperature(@ForAll ToleranceCurve curve,
            @ForAll @DoubleRange(min = -60, max = 0) double lt50, @ForAll @DoubleRange(min = 0.2, max = 6) double warm,
            @ForAll @DoubleRange(min = 0.2, max = 6) double cold, @ForAll @DoubleRange(min = -80, max = 20) double t,
            @ForAll @DoubleRange(min = 0, max = 20) double step) {
        double lt10 = lt50 + warm;
        double lt90 = lt50 - (curve.isSymmetric() ? warm : cold);
        assertEquals(0.1, curve.killedFraction(lt10, lt10, lt50, lt90), 1e-9);
        assertEquals(0.5, curve.killedFraction(lt50, lt10, lt50, lt90), 1e-15);
        assertEquals(0.9, curve.killedFraction(lt90, lt10, lt50, lt90), 1e-9);
        assertTrue(curve.killedFraction(t - step, lt10, lt50, lt90) >= curve.killedFraction(t, lt10, lt50, lt90));
    }

    @Property
    void theLethalTemperatureIsTheInverse(@ForAll ToleranceCurve curve, @ForAll @DoubleRange(min = 1, max = 99) double percent) {
        double t = curve.lethalTemperature(percent, -6.4444, -9.1667, -12.0556);
        assertEquals(percent / 100, curve.killedFraction(t, -6.4444, -9.1667, -12.0556), 1e-9);
    }

    @Property
    void farTailsNeitherOverflowNorLeaveTheUnitInterval(@ForAll ToleranceCurve curve) {
        assertEquals(0, curve.killedFraction(1e6, -20, -22, -24), 0);
        assertEquals(1, curve.killedFraction(-1e6, -20, -22, -24), 0);
        assertTrue(Double.isNaN(curve.killedFraction(Double.NaN, -20, -22, -24)));
        assertEquals(curve, ToleranceCurve.named(curve.key()).orElseThrow());
    }
}
