package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.checks.CheckTables;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.model.RelaxationModel.Part;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Values: checks/first_second_order.json, constants invented, computed by scipy. */
class RelaxationModelTest {
    private static final JsonNode CHECKS = CheckTables.json("first_second_order.json");
    private static final Season WINTER = SeasonWindow.north().beginningIn(2013, CfCalendar.STANDARD);

    /** A target that is the day's mean itself. */
    private static RelaxationModel ofMean(double initial, double tau1, double tau2) {
        return new RelaxationModel(null, initial, 0, new Part(1, -30, 0), null, tau1, tau2, 2, 3);
    }

    @Test
    void firstOrderFollowsTheTable() {
        JsonNode check = CHECKS.get("first_order");
        steps(check, ofMean(check.get("H0").asDouble(), check.get("tau").asDouble(), 0));
    }

    @Test
    void secondOrderFollowsTheTable() {
        JsonNode check = CHECKS.get("second_order");
        steps(check, ofMean(check.get("H0").asDouble(), check.get("tau1").asDouble(), check.get("tau2").asDouble()));
    }

    private static void steps(JsonNode check, RelaxationModel model) {
        RelaxationModel.Trajectory state = (RelaxationModel.Trajectory) model.begin(WINTER, new double[1]);
        NightTolerance night = NightTolerance.of(1);
        state.tolerance(6, night);
        assertEquals(-8, night.lt50()[0], "the first night has the initial state");
        for (JsonNode step : check.get("steps")) {
            int day = 5 + step.get("day").asInt();
            state.advance(day, new float[] {(float) step.get("target").asDouble()});
            assertEquals(step.get("H").asDouble(), state.hardiness(0), 5e-9, step.toString());
            state.tolerance(day + 1, night);
            assertEquals((float) state.hardiness(0), night.lt50()[0]);
        }
    }

    /** Hours of daylight in FAO-56 table 2.7 and example 9 (20 degrees south, 3 September: 11.7; from memory), and by numpy. */
    @ParameterizedTest
    @CsvSource({"-20, 246, 12.3, 0.05", "45, 355, 15.424678997, 1e-8", "45, 172, 8.575166779, 1e-8", "60, 15, 17.631908920, 1e-8",
        "-35, 180, 14.329941739, 1e-8", "0, 50, 12, 1e-12", "80, 355, 24, 0", "80, 172, 0, 0", "90, 355, 24, 0"})
    void nightsHaveTheLengthOfTheirLatitude(double latitude, int dayOfYear, double hours, double tolerance) {
        double declination = NightLength.declination(dayOfYear);
        assertEquals(hours, NightLength.hours(latitude, declination), tolerance);
        double[] run = new double[2];
        NightLength.hours(new double[] {0, Math.tan(Math.toRadians(latitude))}, declination, run, 2);
        assertEquals(12, run[0], 1e-12);
        assertEquals(NightLength.hours(latitude, declination), run[1]);
    }

    @Test
    void daysOfA360DayYearAreStretched() {
        assertEquals(NightLength.declination(365), NightLength.declination(new CfDate(2013, 12, 30), CfCalendar.DAYS_360));
        assertEquals(NightLength.declination(365), NightLength.declination(new CfDate(2013, 12, 31), CfCalendar.NOLEAP));
    }

    @Test
    void longNightsOfTheDayOfTheMeanHarden() {
        RelaxationModel model = new RelaxationModel(null, -5, -2, new Part(0.5, -10, 10), new Part(-1.2, 10, 15), 5, 0, 2, 3);
        RelaxationModel.Trajectory state = (RelaxationModel.Trajectory) model.begin(WINTER, new double[] {45, 70});
        int day = WINTER.position(new CfDate(2013, 11, 1));
        double night = NightLength.hours(45, NightLength.declination(305));
        state.advance(day, new float[] {-4, 25});
        double target = -2 + 0.5 * -4 - 1.2 * night;
        assertEquals(target + (-5 - target) * Math.exp(-0.2), state.hardiness(0), 1e-12);
        double clamped = -2 + 0.5 * 10 - 1.2 * 15;
        assertEquals(clamped + (-5 - clamped) * Math.exp(-0.2), state.hardiness(1), 1e-12);
        state.advance(day + 1, new float[] {Float.NaN, 0});
        assertTrue(Double.isNaN(state.hardiness(0)) && Double.isFinite(state.hardiness(1)));
    }

    @Property(tries = 200)
    void theStateNeverLeavesTheRangeOfItsTargets(@ForAll @DoubleRange(min = 0.05, max = 60) double tau1,
                                                 @ForAll @DoubleRange(min = 0.05, max = 60) double tau2, @ForAll @IntRange(max = 10000) int seed) {
        RelaxationModel.Trajectory state = (RelaxationModel.Trajectory) ofMean(-8, tau1, tau2).begin(WINTER, new double[1]);
        java.util.Random random = new java.util.Random(seed);
        for (int day = 6; day < 100; day++) {
            state.advance(day, new float[] {-8 - 20 * random.nextFloat()});
            assertTrue(state.hardiness(0) <= -8 + 1e-12 && state.hardiness(0) >= -28 - 1e-12);
        }
    }
}
