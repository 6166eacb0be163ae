package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code curves} and {@code explain --chart} as a user sees them. */
class CurvesTest {
    private static final String SAMPLE = "sample-grids/cultivars.yaml";

    @TempDir
    Path folder;

    private Path file(String name, String text) throws Exception {
        return Files.writeString(folder.resolve(name), text);
    }

    @Test
    void everyDayOfTheWinterInOneDocument() throws Exception {
        JsonNode document = new ObjectMapper().readTree(Program.run("curves", SAMPLE, "--json", "--cultivar", "slate").expect(0).out());
        assertEquals(1, document.get("version").asInt());
        assertTrue(document.get("caution").asText().contains("slate (invented)"));
        JsonNode curve = document.get("cultivars").get(0).get("curve");
        assertEquals(273, curve.size());
        assertEquals("09-01", curve.get(0).get("date").asText());
        assertEquals("05-31", curve.get(272).get("date").asText());
        // half way from 15 October (-9) to 15 November (-13.5), 31 days, lies day 46 + 15.5 of the window
        assertEquals(-9 - 4.5 * 15 / 31, curve.get(44 + 15).get("lt50").asDouble(), 1e-12);
    }

    @Test
    void tableAndCsvTellTheSame() {
        String table = Program.run("curves", SAMPLE).expect(0).out();
        assertTrue(table.contains("01-15  -15.00  -18.00  -20.20"), table);
        assertTrue(table.contains("no substitute for on-site loggers") && table.contains("fern (invented)"), table);
        String csv = Program.run("curves", SAMPLE, "--csv").expect(0).out();
        assertEquals(1 + 3 * 273, csv.lines().count());
        assertTrue(csv.contains("slate,dated,invented,01-15,,,-15.0,-18.0,-20.2\n"), csv);
    }

    @Test
    void aSouthernWinterBeginsInMarch() throws Exception {
        Program.Ended south = Program.run("curves", SAMPLE, "--south", "--json").expect(0);
        JsonNode curve = new ObjectMapper().readTree(south.out()).get("cultivars").get(0).get("curve");
        assertEquals("03-01", curve.get(0).get("date").asText());
        assertEquals("11-30", curve.get(curve.size() - 1).get("date").asText());
        String longer = Program.run("curves", SAMPLE, "--window", "08-15..06-15", "--csv", "--cultivar", "amber").expect(0).err();
        assertTrue(longer.contains("amber does not cover the winter 08-15 to 06-15"), longer);
    }

    @Test
    void allProblemsOfAllFilesAtOnce() throws Exception {
        Path one = file("one.yaml", "cultivars:\n  - id: a\n    model: dated\n    source: s\n    status: invented\n    curve:\n"
                + "      - {date: 02-31, lt10: -1, lt50: -2, lt90: -3}\n      - {date: 03-01, lt10: -3, lt50: -2, lt90: -1}\n");
        Path two = file("two.yaml", "cultivars:\n  - id: b\n    model: datd\n");
        Program.Ended ended = Program.run("curves", one.toString(), two.toString()).expect(3);
        for (String part : new String[] {"one.yaml:7", "one.yaml:8", "two.yaml:3", "Did you mean dated?", "problems in all"}) {
            assertTrue(ended.err().contains(part), part + " in " + ended.err());
        }
        assertEquals("", ended.out());
    }

    @Test
    void wrongCommandLinesAreExplained() {
        assertTrue(Program.run("curves").expect(2).err().contains("no cultivar file"));
        assertTrue(Program.run("curves", SAMPLE, "--cultivar", "slat").expect(2).err().contains("Did you mean slate?"));
        assertTrue(Program.run("curves", SAMPLE, "--window", "09-01").expect(2).err().contains("09-01..05-31"));
        assertTrue(Program.run("curves", SAMPLE, "--window", "13-01..05-31").expect(2).err().contains("--window"));
        assertTrue(Program.run("curves", SAMPLE, "--json", "--csv").expect(2).err().contains("both given"));
        assertTrue(Program.run("curves", SAMPLE, "--chart", "a.pdf").expect(2).err().contains(".svg or .png"));
        assertEquals(3, Program.run("curves", "no.yaml").code());
    }

    @Test
    void hostileNamesHarmNeitherTerminalNorPicture() throws Exception {
        Path yaml = file("h.yaml", "cultivars:\n  - id: a\n    name: \"<script>x</script>\\e[31m & \\u202e\"\n    species: \"=1+1\"\n"
                + "    model: dated\n    source: \"]]> --> \\0\"\n    status: own data\n    curve:\n"
                + "      - {date: 09-01, lt50: -5, spread: 1}\n      - {date: 05-31, lt50: -5, spread: 1}\n");
        Path svg = folder.resolve("h.svg");
        String table = Program.run("curves", yaml.toString(), "--chart", svg.toString()).expect(0).out();
        assertFalse(table.contains("\u001b") || table.contains("\u202e"), table);
        assertTrue(table.contains("\\u001b[31m"), table);
        assertEquals(0, DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(svg.toFile())
                .getElementsByTagName("script").getLength());
    }

    @Test
    void chartsOfCurvesAndOfAWinter() throws Exception {
        Path svg = folder.resolve("c.svg");
        Program.run("curves", SAMPLE, "--chart", svg.toString(), "--csv").expect(0);
        String text = Files.readString(svg);
        for (String part : new String[] {"Amber (invented)", "Fern (invented)", "no substitute for", "LT10 to LT90", "<desc>"}) {
            assertTrue(text.contains(part), part);
        }
        assertEquals(4, Program.run("curves", SAMPLE, "--chart", svg.toString()).code());
        Program.run("curves", SAMPLE, "--chart", folder.resolve("c.png").toString()).expect(0);

        Path winter = folder.resolve("w.svg");
        String[] explain = {"explain", "sample-grids/run.yaml", "--at", "-37.30,50.02", "--winter", "2009-10", "--chart", winter.toString(),
            "--cultivar", "slate"};
        Program.run(explain).expect(0);
        String drawn = Files.readString(winter);
        assertTrue(drawn.contains("worst night 14 Jan 2010: \u22120.12 K") && drawn.contains("52.9 % of the buds"), "as the README says");
        assertEquals(273 + 2 + 2, drawn.split("<circle", -1).length - 1, "a drop a night, the legend's, two rings");
        explain[7] = folder.resolve("v.svg").toString();
        assertTrue(Program.run(java.util.Arrays.copyOf(explain, 8)).expect(2).err().contains("one cultivar"));
        assertTrue(Program.run("explain", "sample-grids/run.yaml", "--at", "-37.30,50.02", "--chart", explain[7]).expect(2).err()
                .contains("--winter"));
        assertFalse(Files.exists(Path.of(explain[7])));
    }

    /** The trace of science 3.1: LT50 of a night is the state at the end of the day before, 7 September being day 1. */
    @Test
    void theTraceOfTheCheckTableThroughASeries() throws Exception {
        StringBuilder series = new StringBuilder("date,tmin,tmean\n");
        java.time.LocalDate first = java.time.LocalDate.of(2019, 9, 7);
        var trace = org.wintersill.checks.CheckTables.csv("dynamic_trace.csv");
        for (var row : trace) {
            double mean = Double.parseDouble(row.get("tmean_C"));
            series.append(first.plusDays(Integer.parseInt(row.get("day")) - 1)).append(',').append(mean - 4).append(',')
                    .append(mean).append('\n');
        }
        Path yaml = file("demo.yaml", "cultivars:\n  - id: demo-a\n    model: thermal-time\n    source: Demo-A of the check table\n"
                + "    status: invented\n    initial: -10\n    tender-limit: -2\n    hardy-limit: -24\n"
                + "    endodormancy: {threshold: 12, acclimation: 0.1, deacclimation: 0.06}\n"
                + "    ecodormancy: {threshold: 4, acclimation: 0.05, deacclimation: 0.12, power: 5}\n"
                + "    chilling: -60\n    budbreak: -2.2\n    spread: 1\n");
        String json = Program.run("curves", yaml.toString(), "--series", file("s.csv", series.toString()).toString(), "--json",
                "--winter", "2019-20").expect(0).out();
        JsonNode nights = new ObjectMapper().readTree(json).get("cultivars").get(0).get("winters").get(0).get("nights");
        assertTrue(nights.get(5).get("lt50").isNull(), "before the start");
        assertEquals(-10, nights.get(6).get("lt50").asDouble(), 1e-6);
        for (int day = 1; day < 37; day++) {
            assertEquals(Double.parseDouble(trace.get(day - 1).get("H_end_of_day_C")), nights.get(6 + day).get("lt50").asDouble(), 2e-6,
                    "night after day " + day);
        }
    }

    @Test
    void aSeriesDrivesEveryModel() throws Exception {
        String series = "sample-grids/series.csv";
        String csv = Program.run("curves", SAMPLE, "built-in:grapevine-concord", "--series", series, "--csv", "--winter", "2009-10")
                .expect(0).out();
        assertEquals(1 + 4 * 273, csv.lines().count());
        String table = Program.run("curves", SAMPLE, "built-in:grapevine-concord", "--series", series).expect(0).out();
        assertTrue(table.contains("grapevine-concord") && table.contains("from memory") && table.contains("2013-14"), table);
        Path svg = folder.resolve("s.svg");
        Program.run("curves", SAMPLE, "--cultivar", "slate", "--series", series, "--winter", "2009-10", "--chart", svg.toString()).expect(0);
        assertTrue(Files.readString(svg).contains("Temperatures of series.csv"));
        assertTrue(Program.run("curves", SAMPLE, "--series", series, "--winter", "1999-00").expect(2).err().contains("2013-14"));
        assertTrue(Program.run("curves", SAMPLE, "--series", series, "--chart", svg.toString(), "--overwrite").expect(2).err()
                .contains("--winter"));
        assertTrue(Program.run("curves", SAMPLE, "--winter", "2009-10").expect(2).err().contains("--series"));
    }

    @Test
    void aResponseIsShownAgainstTheMeanAsTheCheckTableHasIt() throws Exception {
        Path yaml = file("r.yaml", "cultivars:\n  - id: limb\n    model: response\n    source: invented limbs\n    status: invented\n"
                + "    autumn: {tender-limit: -3, hardy-limit: -25, steepness: 0.55, midpoint: 6}\n"
                + "    spring: {tender-limit: -3, hardy-limit: -25, steepness: 0.75, midpoint: 2}\n"
                + "    spring-from: {chilling: [600, 900]}\n    spread: 1\n");
        Path svg = folder.resolve("r.svg");
        JsonNode curve = new ObjectMapper().readTree(Program.run("curves", yaml.toString(), "--json", "--chart", svg.toString()).expect(0)
                .out()).get("cultivars").get(0).get("curve");
        JsonNode known = org.wintersill.checks.CheckTables.json("dose_response.json").get("hardiness_limbs_invented").get("values");
        int found = 0;
        for (JsonNode row : curve) {
            for (JsonNode value : known) {
                if (value.get("trailing_mean").asDouble() == row.get("mean").asDouble()) {
                    assertEquals(value.get("LT50_" + row.get("limb").asText()).asDouble(), row.get("lt50").asDouble(), 1e-8);
                    found++;
                }
            }
        }
        assertEquals(2 * known.size(), found);
        assertTrue(Files.readString(svg).contains("LT50, spring"));
        assertTrue(Program.run("curves", yaml.toString()).expect(0).out().contains("autumn limb"));
        assertTrue(Program.run("curves", yaml.toString(), SAMPLE, "--chart", svg.toString(), "--overwrite").expect(2).err()
                .contains("share no axis"));
    }

    @Test
    void whatComesWithTheProgramHasSourceAndStatus() throws Exception {
        JsonNode document = new ObjectMapper().readTree(Program.run("curves", "--built-in", "--json").expect(0).out());
        assertTrue(document.get("cultivars").size() >= 8 && document.get("published-values").size() >= 8);
        document.get("cultivars").forEach(entry -> assertTrue(!entry.get("source").asText().isEmpty() && !entry.get("status").asText()
                .isEmpty(), entry.toString()));
        assertTrue(Program.run("curves", "--built-in").expect(0).out().contains("from memory"));
        assertTrue(Program.run("curves", "--built-in", "--csv").expect(0).out().startsWith("id,name,"));
        assertEquals(2, Program.run("curves", "--built-in", SAMPLE).code());
        assertTrue(Program.run("curves", "built-in:grapevine-concrd").expect(2).err().contains("grapevine-concord"));
    }
}
