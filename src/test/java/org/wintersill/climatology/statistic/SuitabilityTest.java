package org.wintersill.climatology.statistic;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

/** Science 16.6: each limit belongs to the better class. */
class SuitabilityTest {
    private static final double[] LIMITS = {0.05, 0.10, 0.20};

    @Test
    void aFrequencyOnALimitBelongsToTheBetterClass() {
        assertEquals(1, Suitability.classOf(0, LIMITS));
        assertEquals(1, Suitability.classOf(1 / 20.0, LIMITS));
        assertEquals(1, Suitability.classOf(2 / 40.0, LIMITS));
        assertEquals(2, Suitability.classOf(3 / 30.0, LIMITS));
        assertEquals(3, Suitability.classOf(6 / 30.0, LIMITS));
        assertEquals(4, Suitability.classOf(7 / 30.0, LIMITS));
        assertEquals(4, Suitability.classOf(1, LIMITS));
    }
}
