package org.wintersill.hardiness.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.checks.CheckTables;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.model.ThermalTimeModel.Phase;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Values: checks/dynamic_trace.csv and checks/weather_new_york.json, computed with invented parameters (Demo-A of
 * checks/hardiness_params.csv); the weather is that of weather/new_york.csv, whose source stands beside it.
 */
class ThermalTimeModelTest {
    private static final Season WINTER = SeasonWindow.north().beginningIn(2012, CfCalendar.STANDARD);

    private static ThermalTimeModel demo(double chilling) {
        CSVRecord row = CheckTables.csv("hardiness_params.csv").stream().filter(r -> r.get("cultivar").startsWith("Demo-A"))
                .findFirst().orElseThrow();
        return new ThermalTimeModel(null, number(row, "H_initial_C"), number(row, "H_min_C"), number(row, "H_max_C"),
                new Phase(number(row, "T_endo_C"), number(row, "ka_endo"), number(row, "kd_endo")),
                new Phase(number(row, "T_eco_C"), number(row, "ka_eco"), number(row, "kd_eco")), number(row, "theta_eco"), chilling,
                -2.2, 2, 3);
    }

    private static double number(CSVRecord row, String column) {
        return Double.parseDouble(row.get(column));
    }

    /** Every day's state, sum and phase of the trace, to the last digit that the table prints. */
    @Test
    void followsTheTraceToItsLastDigit() {
        ThermalTimeTrajectory state = demo(-60).begin(WINTER, new double[1]);
        NightTolerance night = NightTolerance.of(1);
        double before = -10;
        for (CSVRecord row : CheckTables.csv("dynamic_trace.csv")) {
            int day = Integer.parseInt(row.get("day"));
            state.tolerance(day, night);
            assertEquals((float) (day > 37 ? -2 : before), night.lt50()[0], "night that ends on day " + day);
            assertEquals("eco".equals(row.get("phase_used")), state.phaseSwitch(0) <= day, "phase of day " + day);
            state.advance(day, new double[] {number(row, "tmean_C")});
            before = state.hardiness(0);
            assertEquals(number(row, "H_end_of_day_C"), before, 6e-9, "H of day " + day);
            assertEquals(number(row, "chill_sum_Cd"), state.chill(0), 0, "chill of day " + day);
        }
        assertEquals(13, state.phaseSwitch(0), "the phase changed at the end of day 12");
        assertEquals(37, state.budbreak(0));
        assertEquals(2, night.toLt10()[0]);
        assertEquals(3, night.toLt90()[0]);
    }

    /** Three winters of a real series: phase switch, budbreak, hardest day, lowest margin, states and sums. */
    @Test
    void followsThreeWintersOfNewYork() throws IOException {
        JsonNode dynamic = CheckTables.json("weather_new_york.json").get("dynamic");
        Map<String, double[]> weather = weather();
        ThermalTimeModel model = demo(-600);
        dynamic.get("winters").fields().forEachRemaining(entry -> {
            JsonNode expected = entry.getValue();
            Season season = SeasonWindow.north().beginningIn(Integer.parseInt(entry.getKey()) - 1, CfCalendar.STANDARD);
            ThermalTimeTrajectory state = model.begin(season, new double[1]);
            double hardest = 0;
            int hardestDay = -1;
            double worst = Double.POSITIVE_INFINITY;
            int worstDay = -1;
            for (int day = model.firstDay(season); day < season.days(); day++) {
                double[] range = weather.get(season.date(day).toString());
                double margin = range[0] - (state.budbreak(0) < day ? model.tender() : state.hardiness(0));
                if (margin < worst) {
                    worst = margin;
                    worstDay = day;
                }
                state.advance(day, new double[] {(range[0] + range[1]) / 2});
                if (state.hardiness(0) < hardest) {
                    hardest = state.hardiness(0);
                    hardestDay = day;
                }
                if (season.date(day).month() == 1 && season.date(day).day() == 31) {
                    assertEquals(expected.get("H_on_31_Jan").asDouble(), state.hardiness(0), 6e-9);
                }
            }
            assertEquals(expected.get("phase_switch_end_of").asText(), season.date(state.phaseSwitch(0) - 1).toString());
            assertEquals(expected.get("budbreak").asText(), season.date(state.budbreak(0)).toString());
            assertEquals(expected.get("hardest").get(0).asText(), season.date(hardestDay).toString());
            assertEquals(expected.get("hardest").get(1).asDouble(), hardest, 6e-9);
            assertEquals(expected.get("worst_margin").get(0).asText(), season.date(worstDay).toString());
            assertEquals(expected.get("worst_margin").get(1).asDouble(), worst, 6e-9);
            assertEquals(expected.get("chill_sum_to_31_May").asDouble(), state.chill(0), 1e-9);
        });
    }

    private static Map<String, double[]> weather() throws IOException {
        Map<String, double[]> days = new HashMap<>();
        try (InputStream in = Objects.requireNonNull(ThermalTimeModelTest.class.getResourceAsStream("/weather/new_york.csv"))) {
            List<CSVRecord> rows = CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true).get()
                    .parse(new InputStreamReader(in, StandardCharsets.UTF_8)).getRecords();
            rows.forEach(row -> days.put(row.get("date"), new double[] {number(row, "temp_min"), number(row, "temp_max")}));
        }
        return days;
    }

    /** A cell's state is the same alone and among cells that are in other phases. */
    @ParameterizedTest
    @ValueSource(doubles = {1, 3, 5, 5.5, 7, 2.3, 40})
    void neighboursChangeNothing(double power) {
        ThermalTimeModel base = demo(-60);
        ThermalTimeModel model = new ThermalTimeModel(base.start(), base.initial(), base.tender(), base.hardy(), base.endodormancy(),
                base.ecodormancy(), power, base.chilling(), base.budbreak(), 2, 3);
        int cells = 67;
        ThermalTimeTrajectory together = model.begin(WINTER, new double[cells]);
        ThermalTimeTrajectory[] alone = new ThermalTimeTrajectory[cells];
        for (int day = 6; day < 200; day++) {
            float[] means = new float[cells];
            for (int i = 0; i < cells; i++) {
                if (alone[i] == null) {
                    alone[i] = model.begin(WINTER, new double[1]);
                }
                means[i] = (float) (8 * Math.sin(day * (0.03 + 0.001 * i)) + 6 * Math.sin(day * 1.7 + i));
                alone[i].advance(day, new float[] {means[i]});
            }
            together.advance(day, means);
        }
        boolean anyEco = false;
        for (int i = 0; i < cells; i++) {
            assertEquals(alone[i].hardiness(0), together.hardiness(i), 0);
            assertEquals(alone[i].phaseSwitch(0), together.phaseSwitch(i));
            assertEquals(alone[i].budbreak(0), together.budbreak(i));
            anyEco |= together.phaseSwitch(i) < 200;
        }
        assertTrue(anyEco);
    }

    /** The powers that are multiplied out are the power function's to the last digits of a double. */
    @ParameterizedTest
    @ValueSource(doubles = {1, 2.5, 7, 31.5})
    void productsArePowers(double power) {
        ThermalTimeModel model = new ThermalTimeModel(null, -10, -2, -24, new Phase(12, 0.1, 0.06), new Phase(4, 0.05, 0.12), power, -60,
                -2.2, 2, 3);
        ThermalTimeTrajectory state = model.begin(WINTER, new double[1]);
        state.advance(6, new double[] {-60});
        double before = state.hardiness(0);
        state.advance(7, new double[] {10});
        double loss = 0.12 * 6 * (1 - Math.pow((before + 24) / 22, power));
        assertEquals(Math.min(-2, before + loss), state.hardiness(0), 1e-14);
    }

    @Test
    void hasNoHardinessAfterAMissingMean() {
        ThermalTimeTrajectory state = demo(-60).begin(WINTER, new double[2]);
        NightTolerance night = NightTolerance.of(2);
        state.advance(6, new float[] {3, 3});
        state.advance(7, new float[] {Float.NaN, 3});
        state.advance(8, new float[] {3, 3});
        state.tolerance(9, night);
        assertArrayEquals(new boolean[] {true, false}, new boolean[] {Float.isNaN(night.lt50()[0]), Float.isNaN(night.lt50()[1])});
    }

    @Test
    void beginsOnItsDateWhateverTheWindow() {
        ThermalTimeModel model = demo(-60);
        assertEquals(6, model.firstDay(WINTER));
        assertEquals(6, model.firstDay(SeasonWindow.south().beginningIn(2012, CfCalendar.NOLEAP)));
        SeasonWindow late = new SeasonWindow(new MonthDay(11, 1), new MonthDay(4, 30), new MonthDay(11, 1), new MonthDay(4, 30),
                SeasonWindow.Hemisphere.NORTH);
        assertEquals(-55, model.firstDay(late.beginningIn(2012, CfCalendar.STANDARD)));
        assertEquals(-54, model.firstDay(late.beginningIn(2012, CfCalendar.DAYS_360)));
        ThermalTimeModel august = new ThermalTimeModel(new MonthDay(8, 25), -10, -2, -24, new Phase(12, 0.1, 0.06),
                new Phase(4, 0.05, 0.12), 5, -60, -2.2, 2, 3);
        assertEquals(-7, august.firstDay(WINTER));
    }

    @Test
    void refusesImpossibleParameters() {
        Phase phase = new Phase(12, 0.1, 0.06);
        assertThrows(IllegalArgumentException.class, () -> new ThermalTimeModel(null, -1, -2, -24, phase, phase, 5, -60, -2.2, 2, 3));
        assertThrows(IllegalArgumentException.class, () -> new ThermalTimeModel(null, -10, -24, -2, phase, phase, 5, -60, -2.2, 2, 3));
        assertThrows(IllegalArgumentException.class, () -> new ThermalTimeModel(null, -10, -2, -24, phase, phase, 5, 60, -2.2, 2, 3));
        assertThrows(IllegalArgumentException.class, () -> new ThermalTimeModel(null, -10, -2, -24, phase, phase, 5, -60, -2.2, 0, 3));
        assertThrows(IllegalArgumentException.class, () -> new Phase(12, -0.1, 0.06));
    }
}
