package org.wintersill.scenario;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** What holds for any sample. */
class ScenarioLaws {
    private static Sample sample(long seed, int size, double shift) {
        Random random = new Random(seed);
        Sample sample = new Sample(size);
        for (int i = 0; i < size; i++) {
            // Tenths, so that values repeat as they do in records.
            sample.add((float) (Math.rint(80 * random.nextGaussian()) / 10 + shift));
        }
        sample.sort();
        return sample;
    }

    @Property(tries = 100)
    void probabilityInvertsTheQuantile(@ForAll long seed, @ForAll @IntRange(min = 10, max = 900) int size,
                                       @ForAll @DoubleRange(min = -30, max = 30) double x) {
        Sample sample = sample(seed, size, 0);
        double tau = sample.probability(x);
        assertTrue(tau >= 0 && tau <= 1);
        if (tau > 0 && tau < 1) {
            assertEquals(x, sample.quantile(tau), 1e-9);
        }
    }

    @Property(tries = 100)
    void aModelLikeTheObservationsChangesNothing(@ForAll long seed, @ForAll @IntRange(min = 10, max = 900) int size) {
        Sample sample = sample(seed, size, 0);
        for (double tau = 0; tau <= 1; tau += 0.01) {
            float x = (float) sample.quantile(tau);
            assertEquals(x, (float) ModelChange.quantileDelta(x, sample, sample, sample));
            assertEquals(x, (float) ModelChange.delta(x, sample, sample));
        }
    }

    @Property(tries = 100)
    void theModelsShiftIsKept(@ForAll long seed, @ForAll @IntRange(min = 10, max = 900) int size,
                              @ForAll @DoubleRange(min = -5, max = 5) double shift) {
        Sample observed = sample(seed, size, 0);
        Sample historical = sample(seed + 1, size, 3);
        Sample future = sample(seed + 1, size, 3 + shift);
        for (double tau = 0; tau <= 1; tau += 0.05) {
            double x = future.quantile(tau);
            assertEquals(observed.quantile(future.probability(x)) + shift, ModelChange.quantileDelta(x, observed, historical, future), 1e-4);
        }
    }

    @Property(tries = 50)
    void placesInTheYearMatchAcrossCalendars(@ForAll @IntRange(min = 1, max = 12) int month, @ForAll @IntRange(min = 1, max = 28) int day) {
        double standard = YearPools.place(new CfDate(2001, month, day), CfCalendar.STANDARD);
        double equalMonths = YearPools.place(new CfDate(2001, month, day), CfCalendar.DAYS_360);
        assertEquals(standard, equalMonths, 3.0 / 365);
        for (CfCalendar calendar : CfCalendar.values()) {
            int pool = YearPools.DAYS_31.poolOf(new CfDate(2001, month, day), calendar);
            assertTrue(pool >= 0 && pool < 365);
            assertTrue(YearPools.DAYS_31.holds(pool, new CfDate(2001, month, day), calendar));
        }
    }

    @Property(tries = 50)
    void sharesOfACoveredCellSumToOne(@ForAll @DoubleRange(min = 0.1, max = 5) double size, @ForAll @DoubleRange(min = 0, max = 1) double offset) {
        Crs sphere = new Crs("EPSG:4326", "degrees", "", Crs.Kind.GEOGRAPHIC, 1, null);
        GridGeometry model = new GridGeometry(40, 30, -20, 60, 1, 1, sphere);
        GridGeometry observed = new GridGeometry(4, 4, -10 + offset, 50 + offset, size, size, sphere);
        Overlaps across = Overlaps.ofColumns(observed, model);
        Overlaps down = Overlaps.ofRows(observed, model);
        for (int i = 0; i < 4; i++) {
            double columns = 0;
            for (int c = across.firstOf(i); c < across.endOf(i); c++) {
                columns += across.share(i, c);
            }
            double rows = 0;
            for (int r = down.firstOf(i); r < down.endOf(i); r++) {
                rows += down.share(i, r);
            }
            assertEquals(1, columns, 1e-9);
            assertEquals(1, rows, 1e-9);
        }
    }
}
