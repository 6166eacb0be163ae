package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.hardiness.model.Chilling.Portions;

/** Values: checks/chill.json; constants of the Dynamic Model from public package documentation, values computed. */
class ChillingTest {
    private static final JsonNode CHECKS = CheckTables.json("chill.json");

    @Test
    void aThousandHoursGiveTheTablesPortions() {
        for (JsonNode row : CHECKS.get("chill_portions_1000_hours")) {
            Portions end = afterHours(new Portions(0, 0), 1000, row.get("temp_C").asDouble());
            assertEquals(row.get("portions").asDouble(), end.done(), 5e-9);
            assertEquals(row.get("intermediate").asDouble(), end.intermediate(), 5e-9);
        }
    }

    @Test
    void warmHoursDestroyWhatIsNotFixed() {
        Portions end = afterHours(afterHours(afterHours(new Portions(0, 0), 16, 6), 8, 20), 100, 6);
        assertEquals(CHECKS.get("mixed").get("portions").asDouble(), end.done(), 5e-10);
    }

    @Test
    void chillingHoursIncludeBothLimits() {
        JsonNode check = CHECKS.get("chilling_hours_0_to_7_2");
        assertEquals(check.get("count").asInt(), Chilling.hours(doubles(check.get("temps"))));
    }

    @Test
    void degreeDaysAreBelowTen() {
        JsonNode check = CHECKS.get("base10_degree_days");
        double sum = 0;
        for (double mean : doubles(check.get("tmean"))) {
            sum += Chilling.degreeDays(mean);
        }
        assertEquals(check.get("sum").asDouble(), sum, 0);
    }

    private static Portions afterHours(Portions state, int hours, double temperature) {
        Portions now = state;
        for (int hour = 0; hour < hours; hour++) {
            now = Chilling.afterHour(now, temperature);
        }
        return now;
    }

    private static double[] doubles(JsonNode list) {
        return StreamSupport.stream(list.spliterator(), false).mapToDouble(JsonNode::asDouble).toArray();
    }
}
