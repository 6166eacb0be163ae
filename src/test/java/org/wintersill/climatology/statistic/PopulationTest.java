package org.wintersill.climatology.statistic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.List;
import java.util.Random;
import java.util.TreeMap;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.climatology.VarianceParts;

/** Science 5 and 16.11; component shares: checks/variance_integration.json (computed, inputs invented). */
class PopulationTest {

    @Test
    void componentsHaveTheTabledShares() {
        JsonNode table = CheckTables.json("variance_integration.json").get("component_shares");
        TreeMap<String, Double> components = new TreeMap<>();
        table.get("sd").fields().forEachRemaining(entry -> components.put(entry.getKey(), entry.getValue().asDouble()));
        double sdOfCultivars = components.remove("cultivar");
        // Two winters without any difference and two cultivars of that standard deviation.
        double[][] margins = {{5 - sdOfCultivars, 5 - sdOfCultivars}, {5 + sdOfCultivars, 5 + sdOfCultivars}};
        for (VarianceShare share : VarianceShare.all(components, 0)) {
            String part = share.layer().id().substring("variance-".length());
            JsonNode expected = table.get("shares").get(part);
            assertEquals(expected == null ? 0 : expected.asDouble(), share.share(margins, 2), 1e-7, part);
        }
    }

    @Property(tries = 200)
    void partsAddUpToTheVarianceOfAllMargins(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int cultivars,
            @ForAll @IntRange(min = 1, max = 30) int winters) {
        Random random = new Random(seed);
        double[][] margins = new double[cultivars][winters];
        double sum = 0;
        double squares = 0;
        for (double[] row : margins) {
            for (int w = 0; w < winters; w++) {
                row[w] = 10 * random.nextGaussian();
                sum += row[w];
                squares += row[w] * row[w];
            }
        }
        int n = cultivars * winters;
        VarianceParts parts = VarianceParts.of(margins, winters);
        assertEquals(squares / n - sum / n * sum / n, parts.winter() + parts.cultivar() + parts.interaction(), 1e-9);
        assertTrue(parts.winter() >= 0 && parts.cultivar() >= 0 && parts.interaction() >= 0);
    }

    @Property(tries = 200)
    void variantsOfOneCultivarDoNotInteract(@ForAll long seed, @ForAll @IntRange(min = 2, max = 6) int variants) {
        Random random = new Random(seed);
        double[][] margins = new double[variants][20];
        for (int w = 0; w < 20; w++) {
            margins[0][w] = 5 * random.nextGaussian();
        }
        for (int v = 1; v < variants; v++) {
            double offset = 3 * random.nextGaussian();
            for (int w = 0; w < 20; w++) {
                margins[v][w] = margins[0][w] + offset;
            }
        }
        assertEquals(0, VarianceParts.of(margins, 20).interaction(), 1e-20 + 1e-24 * 20);
    }

    /** A normal population is the limit of many listed variants at its quantiles. */
    @Property(tries = 50)
    void aSpreadIsTheLimitOfManyVariants(@ForAll @DoubleRange(min = -6, max = 6) double margin,
            @ForAll @DoubleRange(min = 0.3, max = 3) double sd, @ForAll @DoubleRange(min = 0.5, max = 2) double uncertain) {
        double[] offsets = new double[4000];
        for (int i = 0; i < offsets.length; i++) {
            offsets[i] = sd * org.wintersill.damage.StandardNormal.quantile((i + 0.5) / offsets.length);
        }
        assertEquals(new Population(sd, offsets).shareNotAbove(margin, uncertain),
                new Population(sd, new double[0]).shareNotAbove(margin, uncertain), 1e-3);
    }

    @Test
    void hardierVariantsHaveLowerOffsets() {
        Population three = new Population(1, new double[] {1, -2, 0.5});
        assertEquals(2.5, three.hardierGain(), 1e-12);
        assertEquals(1 / 3.0, three.shareNotAbove(0.7, 0), 1e-12, "only the tenderest one, whose margin is -0.3");
        assertEquals(1.2815515655446004 * 2, new Population(2, new double[0]).hardierGain(), 1e-12);
        // The table: T -22, LT50 -23, sd of the margin 2.
        JsonNode row = CheckTables.json("variance_integration.json").get("probit_normal").get(0);
        assertEquals(row.get("prob_damage_over_half").asDouble(), new Population(1.6, new double[0]).shareNotAbove(1, 1.2), 1e-9);
    }

    @Test
    void layersAreNamedByTheirParts() {
        assertEquals(List.of("variance-winter", "variance-cultivar", "variance-interaction", "variance-model", "variance-site"),
                VarianceShare.all(new TreeMap<>(java.util.Map.of("site", 0.8, "model", 1.0)), 1).stream()
                        .map(share -> share.layer().id()).toList());
    }
}
