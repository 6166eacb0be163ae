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

    @Test
    void theSplitLogisticGivesTheTabledFractions() {
        int points = 0;
        for (JsonNode triple : CheckTables.json("tolerance_distributions.json").get("split_cases")) {
            double lt10 = triple.get("LT10").asDouble();
            double lt50 = triple.get("LT50").asDouble();
            double lt90 = triple.get("LT90").asDouble();
            JsonNode split = triple.get("split_logistic");
            assertEquals(split.get("s_warm").asDouble(), ToleranceCurve.warmSpread(lt10, lt50), ROUNDED);
            assertEquals(split.get("s_cold").asDouble(), ToleranceCurve.coldSpread(lt50, lt90), ROUNDED);
            for (JsonNode point : split.get("points")) {
                assertEquals(point.get("p").asDouble(), ToleranceCurve.killedFraction(point.get("T").asDouble(), lt10, lt50, lt90), ROUNDED);
                points++;
            }
        }
        assertTrue(points >= 14, "points in the table: " + points);
    }

    @Property
    void theCurvePassesThroughItsThreePointsAndFallsWithTemperature(@ForAll @DoubleRange(min = -60, max = 0) double lt50,
            @ForAll @DoubleRange(min = 0.2, max = 6) double warm, @ForAll @DoubleRange(min = 0.2, max = 6) double cold,
            @ForAll @DoubleRange(min = -80, max = 20) double t, @ForAll @DoubleRange(min = 0, max = 20) double step) {
        double lt10 = lt50 + warm;
        double lt90 = lt50 - cold;
        assertEquals(0.1, ToleranceCurve.killedFraction(lt10, lt10, lt50, lt90), 1e-9);
        assertEquals(0.5, ToleranceCurve.killedFraction(lt50, lt10, lt50, lt90), 0);
        assertEquals(0.9, ToleranceCurve.killedFraction(lt90, lt10, lt50, lt90), 1e-9);
        assertTrue(ToleranceCurve.killedFraction(t - step, lt10, lt50, lt90) >= ToleranceCurve.killedFraction(t, lt10, lt50, lt90));
    }

    @Property
    void theLethalTemperatureIsTheInverse(@ForAll @DoubleRange(min = 1, max = 99) double percent) {
        double t = ToleranceCurve.lethalTemperature(percent, -6.4444, -9.1667, -12.0556);
        assertEquals(percent / 100, ToleranceCurve.killedFraction(t, -6.4444, -9.1667, -12.0556), 1e-9);
    }

    @Test
    void farTailsNeitherOverflowNorLeaveTheUnitInterval() {
        assertEquals(0, ToleranceCurve.killedFraction(1e6, -20, -22, -24), 0);
        assertEquals(1, ToleranceCurve.killedFraction(-1e6, -20, -22, -24), 0);
        assertTrue(Double.isNaN(ToleranceCurve.killedFraction(Double.NaN, -20, -22, -24)));
    }
}
