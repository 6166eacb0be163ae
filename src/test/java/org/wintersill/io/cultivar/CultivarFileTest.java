package org.wintersill.io.cultivar;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.Status;
import org.wintersill.hardiness.Variants;
import org.wintersill.hardiness.Variants.Variant;
import org.wintersill.hardiness.model.DatedHardinessCurve;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

class CultivarFileTest {
    private static final String GOOD = """
            cultivars:
              - id: amber
                name: Amber
                species: Vitis
                organ: primary bud
                model: dated
                source: invented for the demonstration
                status: invented
                outside: hold
                curve:
                  - {date: 10-10, lt10: -7.5, lt50: -9, lt90: -11}
                  - {date: 02-29, lt50: -24, spread: 1.2}
            """;
    @TempDir
    Path folder;

    @Test
    void anEntryBecomesACultivar() throws Exception {
        Notices notices = new Notices();
        Cultivar amber = CultivarFile.read(file("c.yaml", GOOD), notices).get(0);
        assertEquals("amber", amber.id());
        assertEquals("primary bud", amber.organ());
        assertEquals(Status.INVENTED, amber.status());
        DatedHardinessCurve curve = (DatedHardinessCurve) amber.model();
        assertTrue(curve.holdOutside());
        assertEquals(-7.5, curve.rows().get(0).lt10());
        // science 1.3: LT10 = LT50 + s ln 9; 1.2 ln 9 = 2.636669492... (numpy)
        assertEquals(-24 + 2.6366694928034633, curve.rows().get(1).lt10(), 1e-12);
        assertEquals(-24 - 2.6366694928034633, curve.rows().get(1).lt90(), 1e-12);
        assertTrue(notices.counts().isEmpty());
    }

    @Test
    void variantsAreASpreadOrAList() throws Exception {
        String spread = GOOD.replace("organ: primary bud", "variants: {sd: 1.5}");
        assertEquals(Variants.ofSd(1.5), CultivarFile.read(file("spread.yaml", spread), new Notices()).get(0).variants());
        String list = GOOD.replace("organ: primary bud", "variants: [{id: north, offset: -2}, {id: south, offset: 1}]");
        Variants variants = CultivarFile.read(file("list.yaml", list), new Notices()).get(0).variants();
        assertEquals(List.of(new Variant("north", -2), new Variant("south", 1)), variants.members());
        assertEquals(1.5, variants.sd(), 1e-12, "mean -0.5, both 1.5 away");
        assertTrue(CultivarFile.read(file("none.yaml", GOOD), new Notices()).get(0).variants().isNone());
    }

    @Test
    void aSymmetricCurveHasLt50MidwayAndSaysSo() throws Exception {
        Notices notices = new Notices();
        String probit = GOOD.replace("    outside: hold", "    outside: hold\n    tolerance: probit");
        Cultivar amber = CultivarFile.read(file("c.yaml", probit), notices).get(0);
        assertEquals(ToleranceCurve.PROBIT, amber.tolerance());
        DatedHardinessCurve curve = (DatedHardinessCurve) amber.model();
        assertEquals(-9.25, curve.rows().get(0).lt50());
        // science 1.3: LT10 = LT50 + 1.2815516 sigma
        assertEquals(-24 + 1.2 * 1.2815515655446004, curve.rows().get(1).lt10(), 1e-12);
        assertTrue(notices.counts().keySet().stream().anyMatch(note -> note.contains("symmetric (probit): in 1 of 2 rows")), notices.counts().toString());
    }

    @Test
    void anUnknownToleranceCurveIsRefusedWithTheNearestName() throws Exception {
        String wrong = GOOD.replace("    outside: hold", "    outside: hold\n    tolerance: split-probt");
        Path path = file("c.yaml", wrong);
        ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.read(path, new Notices()));
        assertTrue(refused.problems().get(0).toString().contains("split-probit"), refused.problems().toString());
        assertTrue(refused.problems().get(0).where().contains(":10"), refused.problems().toString());
    }

    @Test
    void aBareListIsReadToo() throws Exception {
        String bare = GOOD.substring(GOOD.indexOf('\n') + 1);
        assertEquals(1, CultivarFile.read(file("bare.yaml", bare), new Notices()).size());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "id: amber             | id: Amber Light          | 2  | Write amber-light",
        "id: amber             | id: ../amber             | 2  | cannot be an id",
        "id: amber             | id: con                  | 2  | Windows",
        "id: amber             | id: shared               | 2  | no cultivar",
        "id: amber             | id: abcdefghijabcdefghijabcdefghijabcdefghijx | 2 | 41 letters",
        "id: amber             | identity: amber          | 2  | key id is missing",
        "model: dated          | model: datd              | 6  | Did you mean dated?",
        "model: dated          | model: frost             | 6  | accepted: dated, response, thermal-time, relaxation, stage",
        "model: dated          | model: thermal-time      | 2  | key hardy-limit is missing",
        "status: invented      | status: guess            | 8  | published, from memory, invented, own data",
        "source: invented for the demonstration | source: | 7  | key source has no value",
        "lt10: -7.5            | lt10: -19                | 11 | out of order",
        "lt10: -7.5            | lt10: -8.95              | 11 | too close together",
        "lt90: -11             | lt90: -91                | 11 | -90 to 90",
        "lt10: -7.5            | lt10: 20                 | 11 | looks like Fahrenheit",
        "lt10: -7.5            | lt10: 20                 | 11 | write -6.7",
        "lt90: -11             | lt90: -11, spread: 1     | 11 | both given",
        ", lt90: -11           | ''                       | 11 | lt90 is missing",
        "lt90: -11             | lt99: -11                | 11 | Did you mean lt90?",
        "lt50: -9,             | lt50: -9;5,              | 11 | is not a number",
        "date: 10-10           | date: 02-30              | 11 | no 30 February",
        "date: 10-10           | date: 09-31              | 11 | month and day such as 11-01",
        "date: 02-29           | date: 10-10              | 12 | given twice",
        "spread: 1.2           | spread: 0.04             | 12 | 0.05",
        "spread: 1.2           | spread: 30.5             | 12 | 0.05 to 30",
        "outside: hold         | outside: helt            | 9  | Did you mean hold?",
        "organ: primary bud    | orgn: primary bud        | 5  | Did you mean organ?",
        "organ: primary bud    | variants: {sd: -1}       | 5  | K from 0 to 30",
        "organ: primary bud    | variants: {std: 1}       | 5  | Did you mean sd?",
        "organ: primary bud    | variants: 1.5            | 5  | a spread or a list",
        "organ: primary bud    | 'variants: [{id: a, offset: 1}]' | 5 | at least 2 variants",
        "organ: primary bud    | 'variants: [{id: a, offset: 1}, {id: a, offset: 2}]' | 5 | already listed",
        "organ: primary bud    | 'variants: [{id: A, offset: 1}, {id: b, offset: 31}]' | 5 | cannot be an id",
        "organ: primary bud    | 'variants: [{id: A, offset: 1}, {id: b, offset: 31}]' | 5 | K from -30 to 30"})
    void everyDoubtIsRefusedWithItsLine(String from, String to, int line, String words) throws Exception {
        Path file = file("bad.yaml", GOOD.replace(from.trim(), to.trim()));
        ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.read(file, new Notices()));
        assertTrue(refused.problems().stream().anyMatch(problem -> problem.toString().startsWith(file + ":" + line)
                && problem.toString().contains(words)), refused.getMessage());
        assertEquals(3, refused.exitCode());
    }

    @Test
    void datesThatGoBackAreRefused() throws Exception {
        String back = GOOD + "      - {date: 01-10, lt50: -20, spread: 1}\n";
        ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.read(file("back.yaml", back), new Notices()));
        assertTrue(refused.getMessage().contains(":13") && refused.getMessage().contains("01-10 does not follow 02-29"),
                refused.getMessage());
    }

    @Test
    void allProblemsOfAFileComeAtOnce() throws Exception {
        String bad = GOOD.replace("status: invented", "status: x").replace("lt10: -7.5", "lt10: 95").replace("id: amber", "id: A");
        ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.read(file("bad.yaml", bad), new Notices()));
        assertEquals(3, refused.problems().size(), refused.getMessage());
    }

    @Test
    void noTwoCultivarsShareAnId() throws Exception {
        String twice = GOOD + GOOD.substring(GOOD.indexOf('\n') + 1);
        ProblemException inOne = assertThrows(ProblemException.class, () -> CultivarFile.read(file("c.yaml", twice), new Notices()));
        assertTrue(inOne.getMessage().contains("already used at"), inOne.getMessage());
        List<Path> files = List.of(file("a.yaml", GOOD), file("b.yaml", GOOD));
        ProblemException inTwo = assertThrows(ProblemException.class, () -> CultivarFile.readAll(files, new Notices()));
        assertTrue(inTwo.getMessage().contains("a.yaml"), inTwo.getMessage());
    }

    @Test
    void whereOnlyLt50IsGivenTheDefaultSpreadServesAndIsTold() throws Exception {
        Notices notices = new Notices();
        String bare = GOOD.replace(", spread: 1.2", "");
        DatedHardinessCurve curve = (DatedHardinessCurve) CultivarFile.read(file("bare.yaml", bare), notices).get(0).model();
        // science 1.3: class default s = 1.2
        assertEquals(-24 + 2.6366694928034633, curve.rows().get(1).lt10(), 1e-12);
        assertTrue(notices.counts().keySet().iterator().next().contains("gives LT50 only"), notices.counts().toString());
        Notices quiet = new Notices();
        String entry = bare.replace("outside: hold", "spread: 2");
        DatedHardinessCurve wide = (DatedHardinessCurve) CultivarFile.read(file("wide.yaml", entry), quiet).get(0).model();
        assertEquals(-24 + 2 * 2.1972245773362196, wide.rows().get(1).lt10(), 1e-12);
        assertTrue(quiet.counts().isEmpty(), quiet.counts().toString());
    }

    @Test
    void oneDateNeedsToBeHeld() throws Exception {
        String one = GOOD.replace("      - {date: 02-29, lt50: -24, spread: 1.2}\n", "");
        assertEquals(1, ((DatedHardinessCurve) CultivarFile.read(file("one.yaml", one), new Notices()).get(0).model()).rows().size());
        Path strict = file("strict.yaml", one.replace("outside: hold", "outside: refuse"));
        ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.read(strict, new Notices()));
        assertTrue(refused.getMessage().contains("at least 2 rows"), refused.getMessage());
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "cultivars: []", "cultivars: amber", "id: amber\nmodel: dated", "- 1", "- [1, 2]", "cultivar: []"})
    void filesOfAnotherShapeAreRefused(String text) throws Exception {
        Path file = file("shape.yaml", text);
        assertThrows(ProblemException.class, () -> CultivarFile.read(file, new Notices()));
    }

    private Path file(String name, String text) throws Exception {
        return Files.writeString(folder.resolve(name), text);
    }
}
