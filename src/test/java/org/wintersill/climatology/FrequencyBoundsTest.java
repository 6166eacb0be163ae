package org.wintersill.climatology;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values: scipy.stats.beta 1.10, quantiles 0.05 and 0.95 of Beta(k + 1/2, n - k + 1/2). */
class FrequencyBoundsTest {

    @ParameterizedTest
    @CsvSource({"0.3,20,0.0010887954007388304,0.12111386152352015", "2.37,20,0.038701924258005435,0.2743373592481665",
        "7.9,12,0.4227967588644348,0.8430197635072686", "4.5,5,0.5492802716530588,0.9897937816869885",
        "0.01,30,7.352132928521e-05,0.06229048272717377"})
    void boundsOfFractionsOfEventsAreThoseOfScipy(double k, int n, double lower, double upper) {
        FrequencyBounds bounds = new FrequencyBounds(FrequencyInterval.JEFFREYS, 40, 0.90);
        assertEquals(lower, bounds.lower(k, n), 1e-6);
        assertEquals(upper, bounds.upper(k, n), 1e-6);
    }

    @Property(tries = 300)
    void boundsEncloseTheFrequencyAndGrowWithIt(@ForAll FrequencyInterval interval, @ForAll @IntRange(min = 1, max = 40) int n,
            @ForAll @DoubleRange(min = 0, max = 1) double share) {
        FrequencyBounds bounds = new FrequencyBounds(interval, 40, 0.90);
        double k = share * n;
        assertTrue(bounds.lower(k, n) <= share && share <= bounds.upper(k, n) + 1e-15);
        double whole = Math.floor(k);
        double[] exact = interval.bounds(whole, n, 0.90);
        assertEquals(exact[0], bounds.lower(whole, n), 1e-12);
        assertEquals(exact[1], bounds.upper(whole, n), 1e-12);
        assertTrue(bounds.lower(k, n) >= bounds.lower(whole, n) - 1e-9 && bounds.upper(k, n) >= bounds.upper(whole, n) - 1e-9);
    }
}
