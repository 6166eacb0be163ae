package org.wintersill.damage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.TreeMap;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;

/** Values: checks/variance_integration.json (scipy quadrature, inputs invented); nodes and weights of numpy's hermgauss(32). */
class UncertaintyTest {
    private static final JsonNode TABLE = CheckTables.json("variance_integration.json");

    @Test
    void nodesAndWeightsAreThoseOfNumpy() {
        GaussHermite rule = new GaussHermite(32);
        double[] nodes = rule.nodes();
        double[] weights = rule.weights();
        assertEquals(0.194840741569399, nodes[16], 1e-14);
        assertEquals(0.37523835259280236, weights[16], 1e-13);
        assertEquals(7.125813909830728, nodes[31], 1e-13);
        assertEquals(1, weights[31] / 7.310676427384172e-23, 1e-10);
        double sum = 0;
        for (double weight : weights) {
            sum += weight;
        }
        assertEquals(Math.sqrt(Math.PI), sum, 1e-14);
    }

    @Test
    void expectedDamageOfAProbitIsAsTabled() {
        for (JsonNode row : TABLE.get("probit_normal")) {
            double margin = row.get("T").asDouble() - row.get("LT50").asDouble();
            double inverse = 1 / row.get("sigma_bud").asDouble();
            double sd = row.get("sigma_margin").asDouble();
            assertEquals(row.get("expected_damage").asDouble(),
                    Uncertainty.expectedFraction(ToleranceCurve.PROBIT, margin, inverse, inverse, sd), 1e-7);
            assertEquals(row.get("prob_damage_over_half").asDouble(), Uncertainty.probabilityNotAbove(margin, sd), 1e-9);
        }
    }

    @Test
    void expectedDamageOfALogisticIsAsTabled() {
        for (JsonNode row : TABLE.get("logistic_normal")) {
            double margin = row.get("T").asDouble() - row.get("LT50").asDouble();
            double inverse = 1 / row.get("s").asDouble();
            assertEquals(row.get("expected_damage_exact").asDouble(), Uncertainty.expectedFraction(ToleranceCurve.LOGISTIC, margin,
                    inverse, inverse, row.get("sigma_margin").asDouble()), 1e-7);
        }
    }

    @Test
    void componentsAddUpBySquares() {
        TreeMap<String, Double> components = new TreeMap<>();
        TABLE.get("component_shares").get("sd").fields().forEachRemaining(entry -> components.put(entry.getKey(), entry.getValue().asDouble()));
        assertEquals(TABLE.get("component_shares").get("total_sd").asDouble(), new Uncertainty(components).sd(), 1e-8);
    }

    @Property
    void uncertaintyTakesDamageTowardsOneHalf(@ForAll @DoubleRange(min = 0.3, max = 20) double margin,
            @ForAll @DoubleRange(min = 0.3, max = 3) double spread, @ForAll @DoubleRange(min = 0.1, max = 2) double sd) {
        double plain = ToleranceCurve.LOGISTIC.fractionOfDeficit(-margin / spread);
        double safe = Uncertainty.expectedFraction(ToleranceCurve.LOGISTIC, margin, 1 / spread, 1 / spread, sd);
        double lost = Uncertainty.expectedFraction(ToleranceCurve.LOGISTIC, -margin, 1 / spread, 1 / spread, sd);
        assertTrue(safe >= plain - 1e-6 && safe < 0.5, safe + " of " + plain);
        assertEquals(1, safe + lost, 1e-9);
    }

    @Test
    void withoutUncertaintyAMarginOfExactlyZeroKills() {
        assertEquals(1, Uncertainty.probabilityNotAbove(0, 0));
        assertEquals(0, Uncertainty.probabilityNotAbove(Float.MIN_VALUE, 0));
        assertEquals(0.5, Uncertainty.probabilityNotAbove(0, 1), 1e-15);
    }
}
