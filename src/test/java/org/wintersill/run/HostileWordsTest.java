package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.Statement;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** Whatever words a cultivar carries, every output stays well formed and inside of its folder. */
class HostileWordsTest {
    private static final ColdRecord RECORD = ColdRecord.made(3, 4, CfCalendar.STANDARD, new CfDate(2001, 9, 1),
            new CfDate(2007, 5, 31), false, 5);
    @TempDir
    Path folder;

    static List<String> words() {
        return List.of("../x", "<b>bold</b> & \"quoted\" 'too' ]]> <!-- -->", "=1+1", "@SUM(A1)", "-2+3", "+4", "a\u0007b\u001b[31mc",
                "line one\nline two\r\nand\ttab", "Ж".repeat(300), "'; DROP TABLE suitability; --", "%s %n {0} ${user.name}",
                "\u202eeht\ud83c\udf47", "{\"a\": [1}");
    }

    @ParameterizedTest
    @MethodSource("words")
    void outputsStayWellFormed(String words) throws Exception {
        RunFolder run = RunFolder.of(folder, new RecordFile(RECORD));
        String quoted = new ObjectMapper().writeValueAsString(words);
        run.text("cultivars.yaml", RunFolder.cultivars(0).replace("name: Test oat", "name: " + quoted)
                .replace("species: none", "species: " + quoted).replace("source: made up", "source: " + quoted));
        run.text("run.yaml", "title: " + quoted + "\ntemperature: {minimum: daily}\ncultivars: cultivars.yaml\n"
                + "outputs: {layers: [suitability, margin, choice], netcdf: true}\n");
        Program.Ended ended = run.end();
        assertEquals(new TreeSet<>(ended.code() == 0 ? List.of("cultivars.yaml", "daily", "out", "run.yaml")
                : List.of("cultivars.yaml", "daily", "run.yaml")), new TreeSet<>(List.of(folder.toFile().list())));
        assertFalse(ended.err().contains("\u001b") || ended.err().contains("\u0007"), "control codes reach the terminal");
        if (ended.code() != 0) {
            // a text that no format can carry may be refused, but only as input, and then nothing is written
            assertTrue((ended.code() == 2 || ended.code() == 3) && words.chars().anyMatch(Character::isISOControl), ended.err());
            return;
        }
        assertEquals(new TreeSet<>(List.of("layers.gpkg", "oat", "record.json", "rye", "shared", "summary.csv", "summary.json")),
                withoutNetcdf(run.path("out")));
        Map<String, byte[]> files = RunFolder.files(run.path("out"));
        for (Map.Entry<String, byte[]> file : files.entrySet()) {
            if (file.getKey().endsWith(".qml") || file.getKey().endsWith(".xml")) {
                assertWellFormed(file.getValue());
            }
        }
        assertEquals(words, json(files.get("record.json")).get("cultivars").get(0).get("name").asText());
        assertEquals(words, json(files.get("summary.json")).get("cultivars").get(0).get("name").asText());
        assertEquals(words, json(files.get("summary.json")).get("title").asText());
        assertGuardedTable(new String(files.get("summary.csv"), StandardCharsets.UTF_8), words);
        assertReadableRasterMetadata(run.path("out/oat/suitability.tif"));
        assertPackage(run.path("out/layers.gpkg"), words);
    }

    private static TreeSet<String> withoutNetcdf(Path out) {
        TreeSet<String> names = new TreeSet<>(List.of(out.toFile().list()));
        names.removeIf(name -> name.endsWith(".nc"));
        return names;
    }

    private static JsonNode json(byte[] bytes) throws Exception {
        return new ObjectMapper().readTree(new String(bytes, StandardCharsets.UTF_8));
    }

    private static void assertWellFormed(byte[] xml) throws Exception {
        DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
        factory.setFeature("http://apache.org/xml/features/nonvalidating/load-external-dtd", false);
        var builder = factory.newDocumentBuilder();
        builder.setErrorHandler(null);
        builder.parse(new java.io.ByteArrayInputStream(xml));
    }

    /** The raster's own metadata is XML in a tag; a second reading must be able to parse all of it. */
    private static void assertReadableRasterMetadata(Path tif) throws Exception {
        String text = new org.wintersill.io.geotiff.write.PlainTiff(tif).text(0, 42112);
        assertWellFormed(text.getBytes(StandardCharsets.UTF_8));
    }

    private static void assertGuardedTable(String csv, String words) throws JsonProcessingException {
        String first = csv.substring(csv.indexOf('\n') + 1);
        String field = first.substring("oat,".length());
        boolean formula = !words.isEmpty() && "=+-@".indexOf(words.charAt(0)) >= 0;
        String start = field.startsWith("\"") ? field.substring(1) : field;
        if (formula) {
            assertFalse("=+-@".indexOf(start.charAt(0)) >= 0, "a spreadsheet would run " + field.substring(0, 20));
        }
        try (var parser = org.apache.commons.csv.CSVParser.parse(csv, org.apache.commons.csv.CSVFormat.RFC4180)) {
            var records = parser.getRecords();
            assertEquals(9, records.size());
            records.forEach(record -> assertEquals(records.get(0).size(), record.size()));
            assertTrue(records.get(1).get(1).endsWith(words), records.get(1).get(1));
        } catch (java.io.IOException e) {
            throw new AssertionError(e);
        }
    }

    private static void assertPackage(Path file, String words) throws Exception {
        try (Connection connection = DriverManager.getConnection("jdbc:sqlite:" + file);
                Statement statement = connection.createStatement()) {
            try (ResultSet check = statement.executeQuery("PRAGMA integrity_check")) {
                assertEquals("ok", check.getString(1));
            }
            try (ResultSet row = statement.executeQuery("SELECT cultivar_name FROM suitability WHERE cultivar = 'oat'")) {
                assertTrue(row.next());
                assertEquals(words, row.getString(1));
            }
        }
        assertTrue(Files.size(file) > 0);
    }
}
