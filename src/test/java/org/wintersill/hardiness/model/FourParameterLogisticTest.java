package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;

/** Values: checks/dose_response.json; ryegrass estimates printed in public package documentation, limbs invented, values by scipy. */
class FourParameterLogisticTest {
    private static final JsonNode CHECKS = CheckTables.json("dose_response.json");

    static FourParameterLogistic limb(String name) {
        return of(CHECKS.get("hardiness_limbs_invented").get("params").get(name));
    }

    private static FourParameterLogistic of(JsonNode p) {
        return new FourParameterLogistic(p.get("b").asDouble(), p.get("c").asDouble(), p.get("d").asDouble(), p.get("e").asDouble());
    }

    /** The log-logistic curve is this one in ln x. */
    private static FourParameterLogistic ryegrass() {
        FourParameterLogistic fit = of(CHECKS.get("log_logistic_LL4").get("fit"));
        return new FourParameterLogistic(fit.b(), fit.c(), fit.d(), Math.log(fit.e()));
    }

    @Test
    void ryegrassDataGiveThePublishedValues() {
        JsonNode check = CHECKS.get("log_logistic_LL4");
        FourParameterLogistic curve = ryegrass();
        check.get("values").forEach(row -> assertEquals(row.get("f").asDouble(), curve.at(Math.log(row.get("x").asDouble())), 5e-9));
        check.get("ED").forEach(row -> {
            double y = curve.d() - row.get("percent").asDouble() / 100 * (curve.d() - curve.c());
            assertEquals(row.get("x").asDouble(), Math.exp(curve.inverse(y)), 5e-9);
        });
        double squares = 0;
        for (int i = 0; i < check.get("data").get("conc").size(); i++) {
            double residual = check.get("data").get("rootl").get(i).asDouble()
                    - curve.at(Math.log(check.get("data").get("conc").get(i).asDouble()));
            squares += residual * residual;
        }
        assertEquals(check.get("fit").get("residual_ss").asDouble(), squares, 1e-8);
    }

    @Test
    void plainLogisticGivesTheTable() {
        FourParameterLogistic curve = of(CHECKS.get("logistic_L4").get("params"));
        CHECKS.get("logistic_L4").get("values").forEach(row -> assertEquals(row.get("f").asDouble(), curve.at(row.get("x").asDouble()), 5e-11));
    }

    @Test
    void bothLimbsGiveTheTableAndItsInverse() {
        JsonNode check = CHECKS.get("hardiness_limbs_invented");
        for (String name : new String[] {"autumn", "spring"}) {
            FourParameterLogistic limb = limb(name);
            check.get("values").forEach(row -> assertEquals(row.get("LT50_" + name).asDouble(), limb.at(row.get("trailing_mean").asDouble()), 5e-9));
            check.get("inverse").forEach(row -> assertEquals(row.get("x_" + name).asDouble(), limb.inverse(row.get("LT50").asDouble()), 5e-10));
            double slope = (limb.at(limb.e() + 1e-4) - limb.at(limb.e() - 1e-4)) / 2e-4;
            assertEquals(check.get("slope_at_e").get(name).asDouble(), slope, 1e-6);
            assertTrue(Double.isNaN(limb.inverse(-3)) && Double.isNaN(limb.inverse(-25)) && Double.isNaN(limb.inverse(0)), "no x reaches a limit");
        }
    }

    @Property(tries = 2000)
    void theLoopAgreesWithTheFormula(@ForAll @DoubleRange(min = -300, max = 300) double x, @ForAll @DoubleRange(min = 0.01, max = 20) double b,
                                     @ForAll @DoubleRange(min = -20, max = 20) double e) {
        FourParameterLogistic curve = new FourParameterLogistic(b, -2, -40, e);
        double[] values = new double[1];
        curve.at(new double[] {x}, values, 1);
        assertEquals(curve.at(x), values[0], 1e-12);
        curve.at(new double[] {Double.NaN}, values, 1);
        assertTrue(Double.isNaN(values[0]));
    }
}
