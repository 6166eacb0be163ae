package org.wintersill.scenario;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.wintersill.comparison.ChangeSignal;

/** Against {@code checks/scenario.json}: computed with numpy's quantiles of type 7 on invented data. */
class ScenarioTablesTest {
    private static final double TOLERANCE = 1e-6;
    private static JsonNode table;

    @BeforeAll
    static void read() throws Exception {
        table = new ObjectMapper().readTree(ScenarioTablesTest.class.getResourceAsStream("/checks/scenario.json"));
    }

    private static double[] numbers(JsonNode list) {
        return StreamSupport.stream(list.spliterator(), false).mapToDouble(JsonNode::doubleValue).toArray();
    }

    private static Sample sample(String name) {
        double[] values = numbers(table.get(name));
        Sample sample = new Sample(values.length);
        for (double value : values) {
            sample.add((float) value);
        }
        sample.sort();
        return sample;
    }

    private final Sample observed = sample("obs_hist");
    private final Sample historical = sample("mod_hist");
    private final Sample future = sample("mod_future");

    @Test
    void quantileDeltaMapping() {
        double[] x = numbers(table.get("mod_future"));
        for (int i = 0; i < x.length; i++) {
            assertEquals(table.get("tau").get(i).doubleValue(), future.probability(x[i]), TOLERANCE);
            assertEquals(table.get("qdm").get(i).doubleValue(), ModelChange.quantileDelta(x[i], observed, historical, future), TOLERANCE);
            assertEquals(table.get("plain_qm_clamped").get(i).doubleValue(), ModelChange.quantileMapping(x[i], observed, historical),
                    TOLERANCE);
        }
        for (JsonNode query : table.get("quantile_query")) {
            assertEquals(query.get("qdm").doubleValue(), ModelChange.quantileDelta(query.get("x").doubleValue(), observed, historical,
                    future), TOLERANCE);
        }
    }

    @Test
    void deltaOfTheMean() {
        JsonNode delta = table.get("delta_change_mean");
        assertEquals(delta.get("delta").doubleValue(), future.mean() - historical.mean(), TOLERANCE);
        for (int i = 0; i < 3; i++) {
            assertEquals(delta.get("first3").get(i).doubleValue(),
                    ModelChange.delta(table.get("obs_hist").get(i).doubleValue(), historical, future), TOLERANCE);
        }
    }

    @Test
    void classesOfAnEnsemble() {
        for (JsonNode row : table.get("ensemble")) {
            double[] changes = numbers(row.get("changes"));
            double gamma = ChangeSignal.gamma(row.get("sd_annual_hist").doubleValue());
            assertEquals(row.get("gamma").doubleValue(), gamma, TOLERANCE);
            assertEquals(row.get("frac_beyond").doubleValue(), ChangeSignal.shareBeyond(changes, gamma), TOLERANCE);
            assertEquals(row.get("frac_agree").doubleValue(), ChangeSignal.shareAgreeing(changes), TOLERANCE);
            assertEquals(row.get("category").textValue(), ChangeSignal.of(changes, gamma).words());
        }
    }
}
