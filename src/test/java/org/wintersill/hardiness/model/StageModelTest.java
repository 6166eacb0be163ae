package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.hardiness.model.ThermalTimeModel.Phase;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Stages of grapevine and peach: checks/critical_temps.csv (extension tables); dates and thermal times invented. */
class StageModelTest {
    private static final Season WINTER = SeasonWindow.north().beginningIn(2013, CfCalendar.STANDARD);
    private static final Stage BUD_BURST = new Stage("bud burst", -2.222222222, -3.888888889, -8.888888889);
    private static final Stage FIRST_LEAF = new Stage("first leaf", -1.944444444, -2.777777778, -6.111111111);
    private static final Stage SECOND_LEAF = new Stage("second leaf", -1.666666667, -2.222222222, -5.555555556);
    private static final List<Stage> STAGES = List.of(BUD_BURST, FIRST_LEAF, SECOND_LEAF);

    private static Row row(Stage stage, int month, int day) {
        return new Row(new MonthDay(month, day), stage.lt10(), stage.lt50(), stage.lt90());
    }

    @Test
    void datesAreJoinedLinearlyNothingBeforeAndTheLastHeld() {
        StageDates model = new StageDates(new DatedHardinessCurve(List.of(row(BUD_BURST, 4, 10), row(FIRST_LEAF, 4, 20)), false), false);
        LethalTemperatures course = model.overSeason(WINTER);
        int first = WINTER.position(new CfDate(2014, 4, 10));
        assertTrue(Double.isNaN(course.lt50()[0]) && Double.isNaN(course.lt50()[first - 1]) && Double.isNaN(course.lt10()[first - 1]));
        assertEquals(-3.888888889, course.lt50()[first]);
        assertEquals(-2.222222222 + 0.3 * (-1.944444444 + 2.222222222), course.lt10()[first + 3], 1e-12);
        assertEquals(-8.888888889 + 0.3 * (-6.111111111 + 8.888888889), course.lt90()[first + 3], 1e-12);
        assertEquals(-2.777777778, course.lt50()[WINTER.days() - 1]);
        LethalTemperatures held = new StageDates(model.curve(), true).overSeason(WINTER);
        assertEquals(-3.888888889, held.lt50()[0]);
        assertTrue(model.notCovering(SeasonWindow.north()).isEmpty());
        SeasonWindow autumn = new SeasonWindow(new MonthDay(9, 1), new MonthDay(12, 31), new MonthDay(11, 1), new MonthDay(12, 31),
                SeasonWindow.Hemisphere.NORTH);
        assertTrue(model.notCovering(autumn).isPresent());
    }

    @Test
    void thermalTimeCountsFromItsStartAndJoinsStagesLinearly() {
        StageDegreeDays model = new StageDegreeDays(5, new MonthDay(3, 1), STAGES, List.of(20.0, 50.0, 100.0), false);
        int start = WINTER.position(new CfDate(2014, 3, 1));
        assertEquals(start, model.firstDay(WINTER));
        StageDegreeDays.Trajectory state = (StageDegreeDays.Trajectory) model.begin(WINTER, new double[2]);
        NightTolerance night = NightTolerance.of(2);
        state.advance(start - 1, new float[] {30, 30});
        for (int day = start; day < start + 4; day++) {
            state.tolerance(day, night);
            assertEquals(day - start < 2, Float.isNaN(night.lt50()[0]), "day " + day);
            state.advance(day, new float[] {15, 4});
        }
        state.tolerance(start + 4, night);
        assertEquals(40, state.degreeDays(0));
        double share = (40 - 20) / 30.0;
        assertEquals(-3.888888889 + share * (3.888888889 - 2.777777778), night.lt50()[0], 1e-6);
        double lt10 = -2.222222222 + share * (2.222222222 - 1.944444444);
        double lt90 = -8.888888889 + share * (8.888888889 - 6.111111111);
        assertEquals(lt10 - (-3.888888889 + share * (3.888888889 - 2.777777778)), night.toLt10()[0], 1e-6);
        assertEquals(-3.888888889 + share * (3.888888889 - 2.777777778) - lt90, night.toLt90()[0], 1e-6);
        assertTrue(Float.isNaN(night.lt50()[1]), "no growth, no stage");
        for (int day = start + 4; day < start + 20; day++) {
            state.advance(day, new float[] {15, Float.NaN});
        }
        state.tolerance(start + 20, night);
        assertEquals(-2.222222222, night.lt50()[0], 1e-6, "the last stage holds");
        assertTrue(Float.isNaN(night.lt50()[1]));
        StageDegreeDays held = new StageDegreeDays(5, new MonthDay(3, 1), STAGES, List.of(20.0, 50.0, 100.0), true);
        HardinessTrajectory dormant = held.begin(WINTER, new double[2]);
        dormant.tolerance(0, night);
        assertEquals(-3.888888889f, night.lt50()[0]);
        assertEquals(0, held.earliestDay(WINTER));
    }

    @Test
    void stagesTakeOverTheNightAfterBudbreak() {
        // hardens once, then dehardens by 1 K a degree-day: budbreak when H comes from below -3 to it
        ThermalTimeModel before = new ThermalTimeModel(new MonthDay(9, 1), -5, -1, -20, new Phase(10, 0.01, 0.2), new Phase(10, 0.01, 0.2), 1,
                -10_000, -3, 2, 3);
        StageDegreeDays timed = new StageDegreeDays(10, null, STAGES, List.of(0.0, 30.0, 60.0), true);
        StageAfterBudbreak model = new StageAfterBudbreak(before, timed);
        HardinessTrajectory alone = before.begin(WINTER, new double[2]);
        HardinessTrajectory state = model.begin(WINTER, new double[2]);
        NightTolerance plain = NightTolerance.of(2);
        NightTolerance night = NightTolerance.of(2);
        double grown = 0;
        for (int day = 0; day < 40; day++) {
            alone.tolerance(day, plain);
            state.tolerance(day, night);
            int budbreak = state.budbreak(0);
            assertEquals(alone.budbreak(0), budbreak);
            if (budbreak < day) {
                double expected = grown < 30 ? -3.888888889 + grown / 30 * (3.888888889 - 2.777777778)
                        : -2.777777778 + Math.min(1, (grown - 30) / 30) * (2.777777778 - 2.222222222);
                assertEquals(expected, night.lt50()[0], 1e-6, "night " + day);
            } else {
                assertEquals(plain.lt50()[0], night.lt50()[0]);
                assertEquals(2, night.toLt10()[0]);
            }
            assertEquals(plain.lt50()[1], night.lt50()[1], "the cold cell never breaks");
            float[] mean = {day == 0 ? 8 : 14, 2};
            grown += budbreak < day ? 4 : 0;
            alone.advance(day, mean);
            state.advance(day, mean);
        }
        assertTrue(state.budbreak(0) > 1 && state.budbreak(0) < 20, "budbreak " + state.budbreak(0));
        StageDates dated = new StageDates(new DatedHardinessCurve(List.of(row(SECOND_LEAF, 9, 2), row(FIRST_LEAF, 5, 20)), false), true);
        HardinessTrajectory byDate = new StageAfterBudbreak(before, dated).begin(WINTER, new double[1]);
        for (int day = 0; day < 30; day++) {
            byDate.advance(day, new float[] {day == 0 ? 8 : 14});
        }
        byDate.tolerance(30, night);
        assertEquals((float) dated.overSeason(WINTER).lt50()[30], night.lt50()[0]);
    }
}
