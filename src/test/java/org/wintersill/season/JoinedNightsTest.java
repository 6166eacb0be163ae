package org.wintersill.season;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Map;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.Size;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.StandardNormal;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.damage.Uncertainty;

/** Values: checks/night_combination.json (scipy quadrature, probabilities invented). */
class JoinedNightsTest {
    private static final NightJoining INDEPENDENT = new NightJoining(NightJoining.Rule.INDEPENDENT, 0);

    private static double joined(NightJoining nights, ToleranceCurve curve, double... killed) {
        DamageFold fold = new DamageFold(new DamageReckoning(nights, Uncertainty.none(), false, false), 1);
        for (double p : killed) {
            double z = curve.isProbit() ? StandardNormal.quantile(p) : Math.log(p / (1 - p));
            fold.accept(curve, new float[] {(float) -z}, 0, 1, 1);
        }
        return fold.damage(0);
    }

    private static NightJoining correlated(double rho) {
        return new NightJoining(NightJoining.Rule.CORRELATED, rho);
    }

    @Test
    void allRulesGiveTheTabledDamage() {
        for (JsonNode row : CheckTables.json("night_combination.json").get("cases")) {
            double[] killed = new double[row.get("p").size()];
            for (int i = 0; i < killed.length; i++) {
                killed[i] = row.get("p").get(i).asDouble();
            }
            for (ToleranceCurve curve : new ToleranceCurve[] {ToleranceCurve.LOGISTIC, ToleranceCurve.SPLIT_PROBIT}) {
                // margins are floats, hence 1e-6
                assertEquals(row.get("worst_night").asDouble(), joined(NightJoining.WORST_NIGHT, curve, killed), 1e-7);
                assertEquals(row.get("independent").asDouble(), joined(INDEPENDENT, curve, killed), 1e-6);
                for (Map.Entry<String, JsonNode> cell : (Iterable<Map.Entry<String, JsonNode>>) () -> row.get("gaussian_copula").fields()) {
                    assertEquals(cell.getValue().asDouble(), joined(correlated(Double.parseDouble(cell.getKey())), curve, killed), 1e-6,
                            row + " " + cell.getKey());
                }
            }
        }
    }

    @Property(tries = 200)
    void damageKeepsItsBounds(@ForAll @Size(min = 1, max = 40) double[] raw, @ForAll @DoubleRange(min = 0.01, max = 0.99) double rho) {
        double[] killed = java.util.Arrays.stream(raw).map(v -> Math.abs(Math.sin(v)) * 0.999).toArray();
        double worst = joined(NightJoining.WORST_NIGHT, ToleranceCurve.LOGISTIC, killed);
        double all = joined(INDEPENDENT, ToleranceCurve.LOGISTIC, killed);
        double between = joined(correlated(rho), ToleranceCurve.LOGISTIC, killed);
        assertTrue(worst <= between + 1e-6 && between <= all + 1e-6, worst + " " + between + " " + all);
        assertTrue(all <= Math.min(1, java.util.Arrays.stream(killed).sum()) + 1e-6);
        double fewer = joined(correlated(rho), ToleranceCurve.LOGISTIC, java.util.Arrays.copyOf(killed, killed.length - 1));
        assertTrue(fewer <= between + 1e-9, "a subset of the nights does not kill more");
    }

    @Property(tries = 100)
    void strongerCorrelationKillsFewer(@ForAll @Size(min = 2, max = 20) double[] raw, @ForAll @DoubleRange(min = 0.01, max = 0.5) double rho) {
        double[] killed = java.util.Arrays.stream(raw).map(v -> Math.abs(Math.sin(v)) * 0.9).toArray();
        assertTrue(joined(correlated(rho + 0.4), ToleranceCurve.PROBIT, killed) <= joined(correlated(rho), ToleranceCurve.PROBIT, killed) + 1e-8);
    }

    @Test
    void aNightWithoutValueChangesNothing() {
        for (NightJoining nights : new NightJoining[] {NightJoining.WORST_NIGHT, INDEPENDENT, correlated(0.6)}) {
            DamageFold fold = new DamageFold(new DamageReckoning(nights, Uncertainty.none(), false, false), 2);
            assertEquals(0, fold.damage(0), 1e-10);
            fold.accept(ToleranceCurve.SPLIT_LOGISTIC, new float[] {-21, Float.POSITIVE_INFINITY}, -20, 1, 1);
            double after = fold.damage(0);
            fold.accept(ToleranceCurve.SPLIT_LOGISTIC, new float[] {Float.POSITIVE_INFINITY, -20}, new float[] {-20, Float.NaN},
                    new float[] {1, 1}, new float[] {1, 1});
            assertEquals(after, fold.damage(0), 0);
            assertEquals(0, fold.damage(1), 1e-10);
        }
    }
}
