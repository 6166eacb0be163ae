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
        assertTrue(csv.contains("slate,dated,invented,01-15,-15.0,-18.0,-20.2\n"), csv);
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
}
