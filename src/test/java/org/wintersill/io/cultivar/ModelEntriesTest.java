package org.wintersill.io.cultivar;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.model.FourParameterLogistic;
import org.wintersill.hardiness.model.RelaxationModel;
import org.wintersill.hardiness.model.ResponseModel;
import org.wintersill.hardiness.model.StageDegreeDays;
import org.wintersill.hardiness.model.ThermalTimeModel;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.time.MonthDay;

/** Entries of every model as people write and miswrite them; all numbers invented. */
class ModelEntriesTest {
    private static final String HEAD = "- id: a\n  source: invented here\n  status: invented\n";
    private static final String RESPONSE = HEAD + """
              model: response
              mean-days: 5
              autumn: {tender-limit: -3, hardy-limit: -25, steepness: 0.55, midpoint: 6}
              spring: {tender-limit: -2, hardy-limit: -24, steepness: 0.75, midpoint: 2}
              spring-from: {chilling: [600, 900], since: 09-15}
              lt10-above: 2.5
              lt90-below: 3
            """;
    private static final String THERMAL = HEAD + """
              model: thermal-time
              start: 09-10
              initial: -10
              hardy-limit: -24
              tender-limit: -2
              endodormancy: {threshold: 12, acclimation: 0.1, deacclimation: 0.06}
              ecodormancy: {threshold: 4, acclimation: 0.05, deacclimation: 0.12, power: 5}
              chilling: -600
              budbreak: -2.2
              spread: 1.1
            """;
    private static final String RELAXATION = HEAD + """
              model: relaxation
              initial: -8
              time-constants: [3, 7]
              target:
                level: 2
                temperature: {slope: 0.6, from: -10, to: 12}
                night: {slope: -1.2, from: 10, to: 15.5}
              spread: 1.1
            """;
    private static final String STAGE = HEAD + """
              model: stage
              before-first: hold
              degree-days: {base: 5, from: 02-01}
              stages:
                - {stage: first swelling, at: 60, lt10: -7.8, lt90: -17.2}
                - {stage: full bloom, at: 190, lt10: -2.8, lt50: -3.5, lt90: -4.4}
                - {stage: in the shuck, lt10: -2.7, lt90: -4.3}
            """;

    @TempDir
    Path folder;

    @Test
    void everyModelIsReadWithItsParameters() throws Exception {
        ResponseModel response = (ResponseModel) model(RESPONSE);
        assertEquals(new FourParameterLogistic(0.55, -3, -25, 6), response.autumn());
        assertEquals(new FourParameterLogistic(0.75, -2, -24, 2), response.spring());
        assertEquals(5, response.days());
        assertEquals(new ResponseModel.Turn(List.of(600.0, 900.0), new MonthDay(9, 15), null, null), response.turn());
        assertEquals(2.5, response.toLt10());
        assertEquals(3, response.toLt90());
        ThermalTimeModel thermal = (ThermalTimeModel) model(THERMAL);
        assertEquals(new MonthDay(9, 10), thermal.start());
        assertEquals(new ThermalTimeModel.Phase(12, 0.1, 0.06), thermal.endodormancy());
        assertEquals(new ThermalTimeModel.Phase(4, 0.05, 0.12), thermal.ecodormancy());
        assertEquals(5, thermal.power());
        assertEquals(1.1 * Math.log(9), thermal.toLt10(), 1e-12, "science 1.3: s ln 9");
        RelaxationModel relaxation = (RelaxationModel) model(RELAXATION);
        assertEquals(3, relaxation.tau1());
        assertEquals(7, relaxation.tau2());
        assertEquals(new RelaxationModel.Part(-1.2, 10, 15.5), relaxation.night());
        StageDegreeDays stage = (StageDegreeDays) model(STAGE);
        assertEquals(List.of(60.0, 190.0), stage.at(), "a stage without a time is left out");
        assertEquals(-12.5, stage.stages().get(0).lt50(), "midway");
        assertEquals(-3.5, stage.stages().get(1).lt50());
        assertTrue(stage.holdBefore());
    }

    @Test
    void theOtherWaysOfWritingItWorkToo() throws Exception {
        ResponseModel smooth = (ResponseModel) model(RESPONSE.replace("mean-days: 5", "mean-tau: 4").replace("{chilling: [600, 900], since: 09-15}",
                "{date: 02-01}"));
        assertEquals(0, smooth.days());
        assertEquals(4, smooth.tau());
        assertEquals(new MonthDay(2, 1), smooth.turn().from());
        assertEquals(10, ((ResponseModel) model(RESPONSE.replace("  mean-days: 5\n", ""))).days(), "science 2.2: default");
        assertEquals(List.of(600.0, 900.0), ((ResponseModel) model(RESPONSE.replace("[600, 900]", "[-600, -900]"))).turn().chilling());
        assertEquals(0, ((RelaxationModel) model(RELAXATION.replace("time-constants: [3, 7]", "time-constant: 5"))).tau2());
        String followed = THERMAL + "  after-budbreak:\n    degree-days: {base: 10}\n    stages:\n"
                + "      - {stage: bud burst, at: 0, lt10: -2.2, lt50: -3.9, lt90: -8.9}\n      - {stage: first leaf, at: 30, lt10: -1.9, lt90: -6.1}\n";
        assertTrue(model(followed).describe().contains("bud burst at 0.0 to first leaf at 30.0"), model(followed).describe());
        assertTrue(model(followed.replace("at: 0", "date: 04-20").replace("at: 30", "date: 05-05").replace("    degree-days: {base: 10}\n", ""))
                .describe().contains("bud stages at 2 dates"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "response | hardy-limit: -25 | hardy-limit: 25 | 6 | looks like Fahrenheit",
        "response | hardy-limit: -25 | hardy-limit: -2 | 6 | not colder than tender-limit",
        "response | 'hardy-limit: -25, ' | '' | 6 | hardy-limit is missing",
        "response | 'steepness: 0.55' | 'b: 0.55' | 6 | It is called steepness here",
        "response | steepness: 0.55 | steepness: -0.55 | 6 | must be above zero",
        "response | mean-days: 5 | mean-days: 2 | 5 | whole numbers from 3 to 30",
        "response | mean-days: 5 | mean-days: 4.5 | 5 | is not whole",
        "response | '[600, 900]' | '[900, 600]' | 8 | do not grow",
        "response | '[600, 900]' | '[-600, 900]' | 8 | do not grow",
        "response | '[600, 900]' | 600 | 8 | a list of 2 numbers",
        "response | 'chilling: [600, 900], since' | 'until' | 8 | neither chilling nor date",
        "response | 'since: 09-15' | 'date: 02-01' | 8 | more than one of",
        "response | 'since: 09-15' | 'since: 02-30' | 8 | no 30 February",
        "response | lt10-above: 2.5 | spread: 1 | 9 | spread and lt10-above or lt90-below are both given",
        "response | '  lt10-above: 2.5' | '' | 1 | lt10-above is missing",
        "response | lt90-below: 3 | lt90-below: 0.1 | 10 | K from 0.11 to 60",
        "response | autumn: | autum: | 6 | Did you mean autumn?",
        "thermal | hardy-limit: -24 | hardy-limit: -1 | 7 | hardiest, most negative",
        "thermal | hardy-limit: -24 | hmax: -24 | 7 | It is called hardy-limit here",
        "thermal | hardy-limit: -24 | hardy-limit: -95 | 7 | -90 to 90",
        "thermal | initial: -10 | initial: -30 | 6 | does not lie between",
        "thermal | acclimation: 0.1 | acclimation: -0.1 | 9 | wrong sign",
        "thermal | deacclimation: 0.12 | deacclimation: -0.12 | 10 | Write 0.12",
        "thermal | ', power: 5' | '' | 10 | power is missing",
        "thermal | chilling: -600 | chilling: 600 | 11 | Write -600",
        "thermal | chilling: -600 | EDB: -600 | 11 | It is called chilling here",
        "thermal | budbreak: -2.2 | budbreak: -1 | 12 | does not lie between",
        "thermal | start: 09-10 | start: 09-31 | 5 | month and day",
        "thermal | spread: 1.1 | spread: 0.01 | 13 | K from 0.05 to 30",
        "thermal | 'endodormancy: {' | 'endodormancy: {a: {b: [' | 9 | brackets",
        "relaxation | slope: 0.6 | slope: -0.6 | 9 | wrong sign",
        "relaxation | slope: -1.2 | slope: 1.2 | 10 | long nights make a plant hardier",
        "relaxation | 'from: 10, to: 15.5' | 'from: 15.5, to: 10' | 10 | is not below",
        "relaxation | '[3, 7]' | '[3]' | 6 | a list of 2 numbers",
        "relaxation | '[3, 7]' | '[3, 0]' | 6 | days from 0.05 to 365",
        "relaxation | level: 2 | level: 190 | 8 | the stationary hardiness reaches",
        "relaxation | 'temperature: ' | 'temprature: ' | 9 | Did you mean temperature?",
        "stage | 'lt10: -7.8' | 'lt10: -17.8' | 8 | out of order",
        "stage | 'lt10: -2.8' | 'lt10: 27' | 9 | looks like Fahrenheit",
        "stage | 'at: 190' | 'at: 50' | 9 | in the order of spring",
        "stage | 'at: 190' | 'date: 04-10' | 7 | some stages have dates",
        "stage | 'stage: full bloom' | 'stage: first swelling' | 9 | listed twice",
        "stage | 'base: 5, ' | '' | 6 | base is missing",
        "stage | before-first: hold | before-first: keep | 5 | accepted: none, hold"})
    void everyDoubtIsRefusedWithItsLine(String model, String from, String to, int line, String words) throws Exception {
        String text = switch (model) {
            case "response" -> RESPONSE;
            case "thermal" -> THERMAL;
            case "relaxation" -> RELAXATION;
            default -> STAGE;
        };
        assertTrue(text.contains(from), from);
        Path file = Files.writeString(folder.resolve("c.yaml"), text.replace(from, to == null ? "" : to));
        ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.read(file, new Notices()));
        assertTrue(refused.problems().stream().anyMatch(problem -> problem.toString().startsWith(file + ":" + line)
                && problem.toString().contains(words)), refused.getMessage());
        assertEquals(3, refused.exitCode());
    }

    @Test
    void aWholeFileOfMistakesIsToldAtOnce() throws Exception {
        String all = (RESPONSE.replace("hardy-limit: -25", "hardy-limit: 25") + THERMAL.replace("chilling: -600", "chilling: 600")
                + RELAXATION.replace("slope: 0.6", "slope: -0.6") + STAGE.replace("at: 190", "at: 50"));
        ProblemException refused = assertThrows(ProblemException.class, () -> read(all));
        String told = refused.problems().stream().map(Problem::toString).collect(Collectors.joining("\n"));
        for (String words : List.of("Fahrenheit", "Write -600", "wrong sign", "order of spring", "already used at")) {
            assertTrue(told.contains(words), words + " in\n" + told);
        }
    }

    @Test
    void onlyLt50NeedsASpreadOrTakesTheDefaultAndSaysSo() throws Exception {
        Notices notices = new Notices();
        Path file = Files.writeString(folder.resolve("c.yaml"), THERMAL.replace("  spread: 1.1\n", ""));
        ThermalTimeModel model = (ThermalTimeModel) CultivarFile.read(file, notices).get(0).model();
        assertEquals(1.2 * 2.1972245773362196, model.toLt90(), 1e-12, "science 1.3: s = 1.2");
        assertTrue(notices.counts().keySet().iterator().next().contains("gives LT50 only"), notices.counts().toString());
    }

    private HardinessModel model(String text) throws Exception {
        return read(text).get(0).model();
    }

    private List<Cultivar> read(String text) throws Exception {
        return CultivarFile.read(Files.writeString(folder.resolve("c.yaml"), text), new Notices());
    }
}
