package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.wintersill.checks.CheckTables;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.model.ResponseModel.Turn;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** Values: checks/dose_response.json, limbs and means invented, computed by scipy. */
class ResponseModelTest {
    private static final JsonNode CHECKS = CheckTables.json("dose_response.json");
    private static final Season WINTER = SeasonWindow.north().beginningIn(2013, CfCalendar.STANDARD);
    private static final Turn CHILLED = new Turn(List.of(600.0, 900.0), new MonthDay(9, 1), null, null);
    private static final Turn ON_1_FEBRUARY = new Turn(null, null, new MonthDay(2, 1), new MonthDay(2, 1));

    private static ResponseModel model(int days, double tau, Turn turn) {
        return new ResponseModel(FourParameterLogisticTest.limb("autumn"), FourParameterLogisticTest.limb("spring"), days, tau, turn, 2, 3);
    }

    private static ResponseModel.Trajectory begin(ResponseModel model) {
        return (ResponseModel.Trajectory) model.begin(WINTER, new double[1]);
    }

    @Test
    void aTrailingMeanCoversTheDaysBeforeTheNightAndIsNeverShortened() {
        JsonNode check = CHECKS.get("trailing_mean_invented");
        ResponseModel model = model(check.get("window_days").asInt(), 0, ON_1_FEBRUARY);
        ResponseModel.Trajectory state = begin(model);
        NightTolerance night = NightTolerance.of(1);
        JsonNode expected = check.get("value_for_day_index_i_uses_i_minus_n_to_i_minus_1");
        for (int day = 0; day < expected.size(); day++) {
            state.tolerance(day, night);
            if (expected.get(day).isNull()) {
                assertTrue(Float.isNaN(night.lt50()[0]), "night " + day);
            } else {
                double lt50 = model.autumn().at(expected.get(day).asDouble());
                assertEquals(lt50, state.lt50(day)[0], 1e-10, "night " + day);
                assertEquals((float) lt50, night.lt50()[0], 1e-6f);
                assertEquals(2, night.toLt10()[0]);
                assertEquals(3, night.toLt90()[0]);
            }
            if (day < check.get("daily_mean").size()) {
                state.advance(day, new float[] {(float) check.get("daily_mean").get(day).asDouble()});
            }
        }
    }

    @Test
    void anExponentialMeanBeginsWithTheFirstDay() {
        JsonNode check = CHECKS.get("trailing_mean_invented");
        ResponseModel model = model(0, check.get("ewma_tau_days").asDouble(), ON_1_FEBRUARY);
        ResponseModel.Trajectory state = begin(model);
        for (int day = 0; day < check.get("ewma").size(); day++) {
            state.advance(day, new float[] {(float) check.get("daily_mean").get(day).asDouble()});
            assertEquals(model.autumn().at(check.get("ewma").get(day).asDouble()), state.lt50(day + 1)[0], 5e-9, "after day " + day);
        }
    }

    @Test
    void limbsAreBlendedByChilling() {
        JsonNode check = CHECKS.get("hardiness_limbs_invented").get("blend").get("values");
        for (JsonNode row : check) {
            ResponseModel.Trajectory state = begin(model(3, 0, CHILLED));
            double left = row.get("chill").asDouble() - 3 * 6;
            int day = 0;
            for (; left > 0; day++) {
                double part = Math.min(25, left);
                state.advance(day, new float[] {(float) (10 - part)});
                left -= part;
            }
            for (int last = 0; last < 3; last++) {
                state.advance(day++, new float[] {4});
            }
            assertEquals(row.get("LT50").asDouble(), state.lt50(day)[0], 5e-9, row.toString());
        }
    }

    @Test
    void theTurnIsTheFirstNightInWhichSpringWeighsHalf() {
        HardinessTrajectory state = begin(model(3, 0, CHILLED));
        for (int day = 0; day < 80; day++) {
            state.advance(day, new float[] {0});
        }
        assertEquals(75, state.phaseSwitch(0), "750 degree-days at the end of day 74");
        assertEquals(WINTER.position(new CfDate(2014, 2, 1)), begin(model(3, 0, ON_1_FEBRUARY)).phaseSwitch(0));
    }

    @Test
    void aTurnByDatesIsLinearInTime() {
        Turn turn = new Turn(null, null, new MonthDay(1, 10), new MonthDay(1, 20));
        ResponseModel model = model(3, 0, turn);
        ResponseModel.Trajectory state = begin(model);
        for (int day = 0; day < 3; day++) {
            state.advance(day, new float[] {4});
        }
        double autumn = model.autumn().at(4);
        double spring = model.spring().at(4);
        int first = WINTER.position(new CfDate(2014, 1, 10));
        assertEquals(autumn, state.lt50(first)[0], 1e-10);
        assertEquals(0.7 * autumn + 0.3 * spring, state.lt50(first + 3)[0], 1e-10);
        assertEquals(spring, state.lt50(first + 10)[0], 1e-10);
        assertEquals(spring, state.lt50(first + 40)[0], 1e-10);
        ResponseModel.Trajectory sudden = begin(model(3, 0, ON_1_FEBRUARY));
        for (int day = 0; day < 3; day++) {
            sudden.advance(day, new float[] {4});
        }
        int february = WINTER.position(new CfDate(2014, 2, 1));
        assertEquals(autumn, sudden.lt50(february - 1)[0], 1e-10);
        assertEquals(spring, sudden.lt50(february)[0], 1e-10);
    }

    @Test
    void aLongGapEndsTheHardinessOfItsCellAlone() {
        HardinessTrajectory state = model(3, 0, CHILLED).begin(WINTER, new double[2]);
        for (int day = 0; day < 12; day++) {
            state.advance(day, new float[] {5, day == 4 ? Float.NaN : 5});
        }
        NightTolerance night = NightTolerance.of(2);
        state.tolerance(12, night);
        assertTrue(Float.isFinite(night.lt50()[0]));
        assertTrue(Float.isNaN(night.lt50()[1]));
    }

    @Test
    void historyReachesBackFromTheWindow() {
        assertEquals(6, model(10, 0, new Turn(List.of(1.0, 2.0), null, null, null)).firstDay(WINTER), "7 September");
        assertEquals(-10, model(10, 0, CHILLED).earliestDay(WINTER));
        assertEquals(61 - 10, model(10, 0, ON_1_FEBRUARY).firstDay(WINTER), "ten days before 1 November");
        assertEquals(-50, model(0, 5, CHILLED).earliestDay(WINTER));
        Season south = SeasonWindow.south().beginningIn(2013, CfCalendar.STANDARD);
        assertEquals(6, model(10, 0, new Turn(List.of(1.0, 2.0), null, null, null)).firstDay(south), "7 March");
    }

    @Test
    void cellsDoNotTouchEachOther() {
        ResponseModel model = model(4, 0, CHILLED);
        float[][] means = new float[90][3];
        for (int day = 0; day < means.length; day++) {
            for (int i = 0; i < 3; i++) {
                means[day][i] = (float) (8 * Math.sin(day * (i + 1)) - day / 9.0);
            }
        }
        NightTolerance together = NightTolerance.of(3);
        NightTolerance alone = NightTolerance.of(1);
        HardinessTrajectory all = model.begin(WINTER, new double[3]);
        HardinessTrajectory second = model.begin(WINTER, new double[1]);
        for (int day = 0; day < means.length; day++) {
            all.tolerance(day, together);
            second.tolerance(day, alone);
            assertEquals(alone.lt50()[0], together.lt50()[1]);
            all.advance(day, means[day]);
            second.advance(day, Arrays.copyOfRange(means[day], 1, 2));
        }
    }
}
