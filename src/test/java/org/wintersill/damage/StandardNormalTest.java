package org.wintersill.damage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values: scipy.stats.norm 1.10, cdf and ppf. */
class StandardNormalTest {

    @ParameterizedTest
    @CsvSource({"-30,4.906713927147908e-198", "-8.5,9.47953482220325e-18", "-7.2,3.010627981117422e-13", "-5,2.866515718791933e-07",
        "-1.2815515655446004,0.10000000000000009", "-0.3,0.3820885778110474", "0,0.5", "0.5,0.6914624612740131",
        "2,0.9772498680518208", "6,0.9999999990134123", "9,1.0"})
    void probabilitiesAreThoseOfScipy(double x, double expected) {
        assertEquals(expected, StandardNormal.probability(x), 4e-16);
        assertEquals(1, StandardNormal.probability(x) / expected, 1e-8);
    }

    @ParameterizedTest
    @CsvSource({"1e-300,-37.0470962993612", "1e-20,-9.262340089798409", "1e-9,-5.9978070150076865", "0.001,-3.090232306167813",
        "0.07,-1.4757910281791706", "0.08,-1.4050715603096329", "0.3,-0.5244005127080409", "0.5,0.0", "0.9,1.2815515655446004",
        "0.93,1.475791028179171", "0.999999,4.753424308817087"})
    void quantilesAreThoseOfScipy(double p, double expected) {
        assertEquals(expected, StandardNormal.quantile(p), 2e-15 * (1 + Math.abs(expected)));
    }

    @Property
    void oneIsTheInverseOfTheOther(@ForAll @DoubleRange(min = -6, max = 6) double x) {
        assertEquals(x, StandardNormal.quantile(StandardNormal.probability(x)), 1e-6);
    }

    @Test
    void endsAreInfiniteAndNothingStaysNothing() {
        assertEquals(Double.NEGATIVE_INFINITY, StandardNormal.quantile(0));
        assertEquals(Double.POSITIVE_INFINITY, StandardNormal.quantile(1));
        assertEquals(0, StandardNormal.probability(Double.NEGATIVE_INFINITY), 0);
        assertEquals(1, StandardNormal.probability(Double.POSITIVE_INFINITY), 0);
        assertTrue(Double.isNaN(StandardNormal.probability(Double.NaN)) && Double.isNaN(StandardNormal.quantile(Double.NaN)));
    }
}
