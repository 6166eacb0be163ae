package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code curves --fit} as a user sees it. */
class FieldFitTest {
    private static final String FIELD = "sample-grids/field.csv";
    private static final String SERIES = "sample-grids/series.csv";

    @TempDir
    Path folder;

    private Path file(String name, String text) throws Exception {
        return Files.writeString(folder.resolve(name), text);
    }

    @Test
    void aDatedFitBecomesACultivarFileThatMapAccepts() throws Exception {
        Path yaml = folder.resolve("fitted.yaml");
        Program.Ended fit = Program.run("curves", "--fit", FIELD, "--model", "dated", "--out", yaml.toString(), "--json", "--replicates",
                "20", "--chart", folder.resolve("fit.svg").toString()).expect(0);
        JsonNode ember = new ObjectMapper().readTree(fit.out()).get("fits").get(0);
        assertEquals("ember-invented", ember.get("id").asText());
        assertEquals(88, ember.get("residuals").size());
        assertEquals(8, ember.get("estimates").size());
        assertTrue(Files.readString(yaml).contains("status: own data"));
        assertTrue(Files.readString(yaml).contains("trial fit of dated to field.csv, 88 samples of 6 winters 2008-09 to 2013-14"));
        assertTrue(Files.readString(folder.resolve("fit.svg")).contains("measured = fitted"));
        Program.run("plan", "sample-grids/run.yaml", "--cultivars", yaml.toString()).expect(0);
        JsonNode curve = new ObjectMapper().readTree(Program.run("curves", yaml.toString(), "--json").expect(0).out())
                .get("cultivars").get(0).get("curve");
        double fitted = ember.get("estimates").get(3).get("value").asDouble();
        String date = ember.get("estimates").get(3).get("name").asText().substring("lt50 on ".length());
        curve.forEach(row -> {
            if (row.get("date").asText().equals(date)) {
                assertEquals(fitted, row.get("lt50").asDouble(), 1e-4);
            }
        });
        assertEquals(4, Program.run("curves", "--fit", FIELD, "--model", "dated", "--out", yaml.toString()).code());
    }

    /** The truth stands in make_sample_field.py, which has its own form of the thermal-time model. */
    @Test
    void thermalTimeFindsTheTruthOfTheSampleField() throws Exception {
        String only = Files.readString(Path.of(FIELD)).lines().filter(line -> !line.startsWith("Reed")).reduce("", (a, b) -> a + b + "\n");
        JsonNode fit = new ObjectMapper().readTree(Program.run("curves", "--fit", file("ember.csv", only).toString(), "--series", SERIES,
                "--model", "thermal-time", "--json", "--replicates", "0", "--keep", "chilling=-600").expect(0).out()).get("fits").get(0);
        double[] truth = {-24, 12, 0.1, 0.06, 4, 0.05, 0.12};
        double[] near = {0.4, 0.5, 0.012, 0.06, 0.5, 0.06, 0.015};
        for (int i = 0; i < truth.length; i++) {
            JsonNode estimate = fit.get("estimates").get(i);
            assertEquals(truth[i], estimate.get("value").asDouble(), near[i], estimate.get("name").asText());
        }
        assertTrue(fit.get("estimates").get(0).get("lower").isNull(), "no interval without replicates");
        assertEquals(0.5, fit.get("rmse").asDouble(), 0.06, "the error that was added");
    }

    @Test
    void theSameSeedGivesTheSameBytes() {
        String[] command = {"curves", "--fit", FIELD, "--model", "dated", "--replicates", "30", "--seed", "5"};
        String first = Program.run(command).expect(0).out();
        assertEquals(first, Program.run(command).expect(0).out());
        command[8] = "6";
        assertFalse(first.equals(Program.run(command).expect(0).out()));
    }

    @Test
    void allProblemsOfATableAtOnce() throws Exception {
        Path table = file("f.csv", "Cultivar,Date,LT50,lt10,lt90,n\nA,2010-02-30,-10,,,\nA,2010-01-15,x,,,\nA,2010-01-16,-10,-12,-14,5\n"
                + ",2010-01-17,14,,,\n");
        Program.Ended ended = Program.run("curves", "--fit", table.toString(), "--model", "dated").expect(3);
        for (String part : new String[] {"f.csv:2", "2010-02-30", "f.csv:3", "'x' is not a number", "f.csv:4", "out of order", "f.csv:5",
            "the cultivar is missing", "Fahrenheit", "n is missing here"}) {
            assertTrue(ended.err().contains(part), part + " in " + ended.err());
        }
        String header = Program.run("curves", "--fit", file("g.csv", "cultivar;date;lt50\nA;2010-01-01;-10\n").toString(), "--model", "dated")
                .expect(3).err();
        assertTrue(header.contains("semicolons"), header);
        String near = Program.run("curves", "--fit", file("h.csv", "cultivar,date,lt5O\nA,2010-01-01,-10\n").toString(), "--model", "dated")
                .expect(3).err();
        assertTrue(near.contains("'lt5O' meant"), near);
        assertEquals(3, Program.run("curves", "--fit", "no.csv", "--model", "dated").code());
    }

    @Test
    void seriesAreCheckedToo() throws Exception {
        Path series = file("s.csv", "date,tmin,tmax\n2010-01-01,-5,-9\n2010-01-01,-5,2\n2010-01-03,-95,\n");
        Program.Ended ended = Program.run("curves", "--fit", FIELD, "--model", "response", "--series", series.toString()).expect(3);
        for (String part : new String[] {"s.csv:2", "below tmin", "s.csv:3", "there twice", "s.csv:4", "-90 to 60"}) {
            assertTrue(ended.err().contains(part), part + " in " + ended.err());
        }
        String warm = Program.run("curves", "--fit", FIELD, "--model", "response", "--series",
                file("w.csv", "date,tmin,tmax\n2010-01-01,41,50\n").toString()).expect(3).err();
        assertTrue(warm.contains("Fahrenheit"), warm);
    }

    @Test
    void whatCannotBeFittedIsRefusedByName() throws Exception {
        Path few = file("few.csv", "cultivar,date,lt50\nNord,2010-01-01,-20\nNord,2010-02-01,-21\nSued,2010-01-01,-20\nSued,2010-01-01,-20\n");
        String err = Program.run("curves", "--fit", few.toString(), "--model", "dated").expect(3).err();
        assertTrue(err.contains("Nord has 2 usable samples") && err.contains("Sued has 2 usable samples"), err);
        Path summer = file("summer.csv", "cultivar,date,lt50\nNord,2010-07-15,-2\n");
        assertTrue(Program.run("curves", "--fit", summer.toString(), "--model", "dated").expect(3).err().contains("outside of the winter"));
        Path names = file("names.csv", "cultivar,date,lt50\n../x,2010-01-01,-20\n..\\x,2010-01-02,-20\n\u2603,2010-01-02,-20\n");
        String twice = Program.run("curves", "--fit", names.toString(), "--model", "dated").expect(3).err();
        assertTrue(twice.contains("become one id, x") && twice.contains("no letter or digit"), twice);
    }

    @Test
    void wrongCommandLinesAreExplained() {
        assertTrue(Program.run("curves", "--fit", FIELD).expect(2).err().contains("--model dated, response or thermal-time"));
        assertTrue(Program.run("curves", "--fit", FIELD, "--model", "respons").expect(2).err().contains("Did you mean response?"));
        assertTrue(Program.run("curves", "--fit", FIELD, "--model", "response").expect(2).err().contains("--series SERIES.csv"));
        assertTrue(Program.run("curves", "--out", "a.yaml", "sample-grids/cultivars.yaml").expect(2).err().contains("Add --fit"));
        assertTrue(Program.run("curves", "--fit", FIELD, "--model", "dated", "a.yaml").expect(2).err().contains("both given"));
        assertTrue(Program.run("curves", "--fit", FIELD, "--model", "dated", "--keep", "x").expect(2).err().contains("NAME=VALUE"));
        assertTrue(Program.run("curves", "--fit", FIELD, "--model", "dated", "--keep", "x=1").expect(2).err().contains("no parameter x"));
        assertTrue(Program.run("curves", "--fit", FIELD, "--model", "dated", "--interval", "90").expect(2).err().contains("0.01 to 0.999"));
    }
}
