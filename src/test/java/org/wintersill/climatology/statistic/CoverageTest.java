package org.wintersill.climatology.statistic;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import org.junit.jupiter.api.Test;

/** A small run of {@link CoverageStudy}; the table of the large one stands in DEVELOPERS.md. */
class CoverageTest {

    @Test
    void nominalNinetyPercentIntervalsCoverAboutThat() {
        Map<String, Double> covered = new CoverageStudy(200, 5).bootstrapAndCounts();
        assertTrue(covered.size() > 20, covered.toString());
        covered.forEach((name, share) -> assertTrue(share >= 0.80 && share <= 0.995, name + ": " + share));
    }
}
