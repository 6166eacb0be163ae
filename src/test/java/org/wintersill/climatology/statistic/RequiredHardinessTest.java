package org.wintersill.climatology.statistic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.Size;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.climatology.FrequencyInterval;
import org.wintersill.damage.ToleranceCurve;

/** Values: checks/required_hardiness.json, margins invented, shifts computed; the table clips at 0, the layer is signed. */
class RequiredHardinessTest {

    private static double[] margins() {
        JsonNode node = CheckTables.json("required_hardiness.json").get("margins_C");
        double[] margins = new double[node.size()];
        for (int i = 0; i < margins.length; i++) {
            margins[i] = node.get(i).asDouble();
        }
        return margins;
    }

    @Test
    void shiftsOfTheFrequencyRuleAreAsTabled() {
        JsonNode rule = CheckTables.json("required_hardiness.json").get("frequency_rule");
        int n = rule.get("n").asInt();
        for (JsonNode value : rule.get("values")) {
            double target = value.get("k").asDouble() / n;
            assertEquals(value.get("d").asDouble(), Math.max(0, RequiredHardiness.of(margins(), n, target)), 1e-12);
        }
    }

    @Test
    void shiftsOfTheQuantileRuleAreAsTabled() {
        for (JsonNode value : CheckTables.json("required_hardiness.json").get("quantile_rule_type7")) {
            assertEquals(value.get("d").asDouble(), RequiredHardiness.ofQuantile(margins(), 20, value.get("target").asDouble()), 1e-9);
        }
    }

    @Test
    void shiftsOfTheExpectedDamageRuleAreAsTabled() {
        for (JsonNode value : CheckTables.json("required_hardiness.json").get("expected_damage_rule")) {
            double[] spread = new double[20];
            java.util.Arrays.fill(spread, value.get("s").asDouble());
            assertEquals(value.get("d").asDouble(), RequiredHardiness.ofDamage(ToleranceCurve.LOGISTIC, margins(), spread, spread, 20,
                    value.get("target").asDouble()), 1e-7);
        }
        assertEquals(0, RequiredHardiness.ofDamage(ToleranceCurve.LOGISTIC, margins(), filled(1.2), filled(1.2), 20,
                CheckTables.json("required_hardiness.json").get("mean_damage_now").asDouble()), 1e-7);
    }

    private static double[] filled(double value) {
        double[] values = new double[20];
        java.util.Arrays.fill(values, value);
        return values;
    }

    @Test
    void boundsAreTheShiftsThatTheBoundsOfTheFrequencyAllow() {
        double[] margins = margins();
        int n = margins.length;
        double[] bounds = new RequiredHardinessBound(0, 0.10, FrequencyInterval.JEFFREYS, 0.90, false).of(margins.clone(), n);
        for (int step = -400; step <= 400; step++) {
            double shift = step * 0.025 + 0.0031;
            int killing = (int) java.util.Arrays.stream(margins).filter(m -> m + shift <= 0).count();
            double[] frequency = FrequencyInterval.JEFFREYS.bounds(killing, n, 0.90);
            boolean compatible = frequency[0] <= 0.10 && 0.10 <= frequency[1];
            assertEquals(compatible, shift > bounds[0] && shift <= bounds[1], "shift " + shift + " of " + java.util.Arrays.toString(bounds));
        }
        double[] few = new RequiredHardinessBound(0, 0.10, FrequencyInterval.JEFFREYS, 0.90, false).of(margins.clone(), 12);
        assertTrue(Double.isNaN(few[1]), "twelve winters do not bound the hardiness for one killing winter in ten");
    }

    @Test
    void furtherTargetsAreNamedInPercent() {
        assertEquals("required-hardiness-at-5", RequiredHardiness.idAt(0.05));
        assertEquals("required-hardiness-at-2-5", RequiredHardiness.idAt(0.025));
        assertEquals("required-hardiness-at-20", RequiredHardiness.idAt(0.2));
    }

    @Test
    void hardinessToSpareIsNegative() {
        assertEquals(-0.3, RequiredHardiness.of(margins(), 20, 0.10), 1e-12);
    }

    @Property
    void afterTheShiftTheTargetIsMetAndALittleLessWouldNotDo(@ForAll @Size(min = 5, max = 40) double[] raw,
            @ForAll @DoubleRange(min = 0, max = 0.9) double target) {
        double[] margins = java.util.Arrays.stream(raw).map(v -> v % 30).toArray();
        int n = margins.length;
        double shift = RequiredHardiness.of(margins.clone(), n, target);
        long killing = java.util.Arrays.stream(margins).filter(m -> m + shift < 0).count();
        assertTrue(killing <= target * n + 1e-6);
        long before = java.util.Arrays.stream(margins).filter(m -> m + shift - 1e-6 * (1 + Math.abs(shift)) < 0).count();
        assertTrue(before > Math.floor(target * n + 1e-9) || before == n);
    }
}
