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
