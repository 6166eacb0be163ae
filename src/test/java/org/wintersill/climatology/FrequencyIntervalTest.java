package org.wintersill.climatology;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;

/** Values: checks/binomial_intervals.csv, 95 %, definitions of Brown, Cai and DasGupta 2001, computed with scipy. */
class FrequencyIntervalTest {

    @Test
    void boundsAreAsTabled() {
        for (CSVRecord row : CheckTables.csv("binomial_intervals.csv")) {
            int k = Integer.parseInt(row.get("k"));
            int n = Integer.parseInt(row.get("n"));
            double[] jeffreys = FrequencyInterval.JEFFREYS.bounds(k, n, 0.95);
            assertEquals(Double.parseDouble(row.get("jeffreys_lo")), jeffreys[0], 1e-8, row.toString());
            assertEquals(Double.parseDouble(row.get("jeffreys_hi")), jeffreys[1], 1e-8, row.toString());
            double[] wilson = FrequencyInterval.WILSON.bounds(k, n, 0.95);
            assertEquals(Double.parseDouble(row.get("wilson_lo")), wilson[0], 1e-9, row.toString());
            assertEquals(Double.parseDouble(row.get("wilson_hi")), wilson[1], 1e-9, row.toString());
        }
    }

    @Property
    void boundsEncloseTheFrequencyAndRiseWithIt(@ForAll @IntRange(min = 1, max = 60) int n, @ForAll @IntRange(min = 0, max = 59) int k) {
        int events = Math.min(k, n - 1);
        for (FrequencyInterval interval : FrequencyInterval.values()) {
            double[] bounds = interval.bounds(events, n, 0.9);
            double[] next = interval.bounds(events + 1, n, 0.9);
            assertTrue(bounds[0] <= (double) events / n && (double) events / n <= bounds[1]);
            assertTrue(bounds[0] <= next[0] && bounds[1] <= next[1]);
        }
    }
}
