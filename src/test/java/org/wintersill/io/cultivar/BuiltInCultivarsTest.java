package org.wintersill.io.cultivar;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.checks.CheckTables;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.Status;
import org.wintersill.hardiness.model.DatedHardinessCurve;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.hardiness.model.StageDates;
import org.wintersill.hardiness.model.ThermalTimeModel;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

/** Values: checks/critical_temps.csv, lt_tables.csv and hardiness_params.csv, each row with its source. */
class BuiltInCultivarsTest {
    @TempDir
    Path folder;

    @Test
    void everyEntryHasItsSourceAndReadsAsACultivar() {
        Set<String> ids = new HashSet<>();
        for (BuiltInCultivars.Entry entry : BuiltInCultivars.list()) {
            assertTrue(ids.add(entry.id()), entry.id());
            assertTrue(entry.source().length() > 15 && !entry.name().isEmpty() && !entry.organ().isEmpty(), entry.toString());
            if (entry.complete()) {
                Cultivar cultivar = CultivarFile.builtIn(entry.id(), "test", new Notices());
                assertEquals(entry.status(), cultivar.status().word());
                assertEquals(entry.source(), cultivar.source());
                boolean thermal = entry.model().equals("thermal-time");
                assertEquals(thermal ? Status.FROM_MEMORY : Status.PUBLISHED, cultivar.status(), "what nobody verified says so");
            } else {
                ProblemException refused = assertThrows(ProblemException.class, () -> CultivarFile.builtIn(entry.id(), "cultivars.use", new Notices()));
                assertTrue(refused.getMessage().contains("without dates"), refused.getMessage());
            }
        }
        assertEquals(20, ids.size());
        assertTrue(BuiltInCultivars.references().stream().allMatch(reference -> !reference.source().isBlank()));
    }

    /** Every stage of the table, at a date of its own, through the reader: what is printed, and what science 1.3 and 1.5 make of it. */
    @Test
    void budStagesAreThoseOfTheTables() throws Exception {
        Map<String, List<CSVRecord>> bySpecies = CheckTables.csv("critical_temps.csv").stream()
                .collect(Collectors.groupingBy(row -> row.get("species")));
        assertEquals(8, bySpecies.size());
        for (Map.Entry<String, List<CSVRecord>> species : bySpecies.entrySet()) {
            String id = species.getKey().replace(' ', '-') + "-stages";
            List<String> dates = new ArrayList<>();
            for (int i = 0; i < species.getValue().size(); i++) {
                dates.add(species.getValue().get(i).get("stage") + ": 04-" + String.format(java.util.Locale.ROOT, "%02d", 1 + 2 * i));
            }
            StageDates model = (StageDates) read("- built-in: " + id + "\n  dates: {" + String.join(", ", dates) + "}\n").model();
            assertEquals(species.getValue().size(), model.curve().rows().size(), id);
            for (int i = 0; i < species.getValue().size(); i++) {
                CSVRecord row = species.getValue().get(i);
                Row stage = model.curve().rows().get(i);
                String where = id + ", " + row.get("stage");
                assertEquals(number(row, "T10_C"), stage.lt10(), where);
                assertEquals((number(row, "T10_F") - 32) / 1.8, stage.lt10(), 5e-9, where);
                if (!row.get("T50_C").isEmpty()) {
                    assertEquals(number(row, "T50_C"), stage.lt50(), where);
                } else if (!row.get("T90_C").isEmpty()) {
                    assertEquals((number(row, "T10_C") + number(row, "T90_C")) / 2, stage.lt50(), 1e-12, where);
                }
                if (!row.get("T90_C").isEmpty()) {
                    assertEquals(number(row, "T90_C"), stage.lt90(), where);
                }
            }
        }
    }

    @Test
    void aStageWithoutLt90TakesTheSpreadOfTheNext() throws Exception {
        StageDates apricot = (StageDates) read("- built-in: apricot-stages\n  dates: {first swelling: 03-01, full bloom: 04-01}\n").model();
        // s of "tips separate": (-6.666666667 + 17.77777778) / (2 ln 9) = 2.528442
        assertEquals(-9.444444444 - 11.111111113, apricot.curve().rows().get(0).lt90(), 1e-8);
        assertEquals(-9.444444444 - 5.5555555565, apricot.curve().rows().get(0).lt50(), 1e-8);
        StageDates grape = (StageDates) read("- built-in: grapevine-stages\n  dates: {bud burst: 04-10, fourth leaf: 05-05}\n").model();
        // no later stage has LT90: that of second leaf, 3.333333334 K below LT50
        assertEquals(-2.777777778 - 3.333333334, grape.curve().rows().get(1).lt90(), 1e-8);
    }

    /** Worked check of science 1.5: peach in full bloom at -3 degC. */
    @Test
    void peachInFullBloomIsTheWorkedExample() throws Exception {
        StageDates peach = (StageDates) read("- built-in: peach-stages\n  dates: {full bloom: 04-12, post bloom: 04-25}\n").model();
        Row bloom = peach.curve().rows().get(0);
        assertEquals(-3.611111111, bloom.lt50(), 1e-9);
        assertEquals(0.3792663444, ToleranceCurve.SPLIT_LOGISTIC.warmSpread(bloom.lt10(), bloom.lt50()), 1e-9);
        assertEquals(0.1664084781, ToleranceCurve.SPLIT_LOGISTIC.killedFraction(-3, bloom.lt10(), bloom.lt50(), bloom.lt90()), 1e-9);
    }

    @Test
    void everyPublishedValueIsACultivarOrAReference() {
        Set<String> references = BuiltInCultivars.references().stream()
                .map(r -> String.join("|", r.cultivar(), r.tissue(), r.when(), r.lt10(), r.lt50(), r.lt90())).collect(Collectors.toSet());
        Set<String> curves = new HashSet<>();
        for (BuiltInCultivars.Entry entry : BuiltInCultivars.list()) {
            if (entry.model().equals("dated")) {
                ((DatedHardinessCurve) CultivarFile.builtIn(entry.id(), "test", new Notices()).model()).rows().forEach(row -> {
                    curves.add(entry.organ() + "|" + row.lt50());
                    curves.add(entry.organ() + "|" + row.lt10() + "|" + row.lt50() + "|" + row.lt90());
                });
            }
        }
        for (CSVRecord row : CheckTables.csv("lt_tables.csv")) {
            boolean whole = !row.get("LT10_C").isEmpty() && !row.get("LT50_C").isEmpty();
            boolean curve = !row.get("LT50_C").isEmpty() && curves.contains(row.get("tissue") + (whole ? "|" + number(row, "LT10_C") : "") + "|"
                    + number(row, "LT50_C") + (whole ? "|" + number(row, "LT90_C") : ""));
            boolean reference = references.contains(String.join("|", row.get("cultivar"), row.get("tissue"), row.get("when"), row.get("LT10_C"),
                    row.get("LT50_C"), row.get("LT90_C")));
            assertTrue(curve || reference, row.toString());
        }
    }

    @Test
    void thermalTimeRowsAreThoseOfTheTable() {
        int found = 0;
        for (CSVRecord row : CheckTables.csv("hardiness_params.csv")) {
            if (row.get("status").equals("invented")) {
                continue;
            }
            String id = "grapevine-" + row.get("cultivar").toLowerCase(java.util.Locale.ROOT).replace(' ', '-');
            ThermalTimeModel model = (ThermalTimeModel) CultivarFile.builtIn(id, "test", new Notices()).model();
            assertEquals(number(row, "H_initial_C"), model.initial());
            assertEquals(number(row, "H_min_C"), model.tender());
            assertEquals(number(row, "H_max_C"), model.hardy());
            assertEquals(new ThermalTimeModel.Phase(number(row, "T_endo_C"), number(row, "ka_endo"), number(row, "kd_endo")), model.endodormancy());
            assertEquals(new ThermalTimeModel.Phase(number(row, "T_eco_C"), number(row, "ka_eco"), number(row, "kd_eco")), model.ecodormancy());
            assertEquals(number(row, "theta_eco"), model.power());
            assertEquals(number(row, "EDB_Cd"), model.chilling());
            assertEquals(id.endsWith("concord") ? -6.4 : -2.2, model.budbreak(), "science 3.1, from memory");
            found++;
        }
        assertEquals(4, found);
    }

    @Test
    void anEntryMayAddToABuiltInCultivarAndItsSourceSaysSo() throws Exception {
        Cultivar mine = read("""
                - built-in: grapevine-merlot
                  id: merlot-here
                  variants: {sd: 0.8}
                  after-budbreak: {built-in: grapevine-stages, degree-days: {base: 10, at: {bud burst: 0, first leaf: 30}}}
                """);
        assertEquals("merlot-here", mine.id());
        assertEquals(Status.FROM_MEMORY, mine.status());
        assertEquals(0.8, mine.variants().sd());
        assertTrue(mine.source().contains("AJEV 65:59-71") && mine.source().contains("grape table")
                && mine.source().contains("times of the stages by the cultivar file"), mine.source());
        assertTrue(mine.model().describe().contains("after budbreak 2 bud stages from bud burst at 0.0"), mine.model().describe());
        assertFalse(read("- built-in: apple-gala-18-march\n  id: gala\n").source().contains("cultivar file"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "- built-in: grapevine-merlo | Did you mean grapevine-merlot?",
        "- built-in: quince | curves --built-in",
        "- built-in: [a] | there is no built-in cultivar a list",
        "'- {built-in: grapevine-merlot, hardy-limit: -30}' | Give source and status",
        "'- {built-in: grapevine-merlot, hardy-limit: -30, status: own data}' | Give source and status",
        "- built-in: peach-stages | no stage of peach-stages has a date",
        "'- {built-in: peach-stages, dates: {full blom: 04-10}}' | Did you mean full bloom?",
        "'- {built-in: peach-stages, dates: {full bloom: 04-31}}' | month and day",
        "'- {built-in: grapevine-merlot, after-budbreak: {built-in: nothing}}' | there is no built-in cultivar 'nothing'"})
    void whatDoesNotStandOnABuiltInCultivarIsRefused(String text, String words) throws Exception {
        ProblemException refused = assertThrows(ProblemException.class, () -> read(text));
        assertTrue(refused.getMessage().contains(words), refused.getMessage());
    }

    private Cultivar read(String text) throws Exception {
        return CultivarFile.read(Files.writeString(folder.resolve("c.yaml"), text), new Notices()).get(0);
    }

    private static double number(CSVRecord row, String column) {
        return Double.parseDouble(row.get(column));
    }
}
