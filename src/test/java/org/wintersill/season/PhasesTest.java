package org.wintersill.season;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.checks.CheckTables;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.damage.Uncertainty;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;
import org.wintersill.time.SeasonWindow.Hemisphere;

/** Science 16.12; shares: checks/planner_layers.json, season_split_invented. */
class PhasesTest {

    @ParameterizedTest
    @CsvSource({
        "09-01, 05-31, false, 91, 181",
        "03-01, 11-30, true, 92, 184",
        "12-15, 04-30, false, 0, 76",
        "01-10, 04-30, false, 0, 50",
        "03-05, 06-10, false, 0, 0",
        "09-01, 11-15, false, 76, 76",
        "12-05, 01-31, false, 0, 58",
    })
    void boundariesAreByTheDate(String from, String to, boolean south, int midwinter, int spring) {
        MonthDay first = MonthDay.parse(from);
        MonthDay last = MonthDay.parse(to);
        Season season = new SeasonWindow(first, last, first, last, south ? Hemisphere.SOUTH : Hemisphere.NORTH)
                .beginningIn(2001, CfCalendar.STANDARD);
        assertEquals(new Phases(midwinter, spring), Phases.of(season, south));
    }

    @Test
    void aNightAddsWhatItRaisesTheRunningDamage() {
        JsonNode split = CheckTables.json("planner_layers.json").get("season_split_invented");
        List<Double> killed = new ArrayList<>();
        List<Integer> sizes = new ArrayList<>();
        for (String phase : List.of("autumn", "midwinter", "spring")) {
            split.get("p").get(phase).forEach(p -> killed.add(p.asDouble()));
            sizes.add(split.get("p").get(phase).size());
        }
        int nights = killed.size();
        double[][] lt = new double[3][nights];
        float[][] lane = new float[nights][1];
        int[] positions = new int[nights];
        for (int n = 0; n < nights; n++) {
            lt[0][n] = -20 + ToleranceCurve.LN_9;
            lt[1][n] = -20;
            lt[2][n] = -20 - ToleranceCurve.LN_9;
            lane[n][0] = (float) (-20 - Math.log(killed.get(n) / (1 - killed.get(n))));
            positions[n] = n;
        }
        NightCurve curve = NightCurve.of(new LethalTemperatures(lt[0], lt[1], lt[2]), ToleranceCurve.SPLIT_LOGISTIC, new double[0],
                new Phases(sizes.get(0), sizes.get(0) + sizes.get(1)));
        WinterAccumulator winter = new WinterAccumulator(1, new DamageReckoning(NightJoining.WORST_NIGHT, Uncertainty.none(), true, false), 1);
        winter.accept(curve, lane, nights, positions, new float[1], new float[1]);
        assertEquals(split.get("worst_night_winter").asDouble(), winter.damage(0), 1e-6);
        JsonNode shares = split.get("sequential_shares");
        assertEquals(shares.get("autumn").asDouble(), winter.damageAt(0, 0), 1e-6);
        assertEquals(shares.get("midwinter").asDouble(), winter.damageAt(1, 0) - winter.damageAt(0, 0), 1e-6);
        assertEquals(shares.get("spring").asDouble(), winter.damage(0) - winter.damageAt(1, 0), 1e-6);
        WinterAccumulator joined = new WinterAccumulator(1,
                new DamageReckoning(new NightJoining(NightJoining.Rule.INDEPENDENT, 0), Uncertainty.none(), true, false), 1);
        joined.accept(curve, lane, nights, positions, new float[1], new float[1]);
        assertEquals(split.get("independent_total").asDouble(), joined.damage(0), 1e-6);
    }
}
