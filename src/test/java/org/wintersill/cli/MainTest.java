package org.wintersill.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.engine.CancelledException;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.ForcingVariable;

class MainTest {
    @TempDir
    Path folder;
    private final FakeCommands commands = new FakeCommands();
    private String out = "";
    private String err = "";
    private String run;

    @BeforeEach
    void makeRun() throws Exception {
        Files.createFile(folder.resolve("tmin-2001.nc"));
        Files.createFile(folder.resolve("dem.tif"));
        Files.createFile(folder.resolve("c.yaml"));
        run = Files.writeString(folder.resolve("run.yaml"), "temperature: {minimum: tmin-*.nc}\ncultivars: c.yaml\n").toString();
    }

    @ParameterizedTest
    @ValueSource(strings = {"map", "plan", "inspect", "explain"})
    void helpShowsAnExampleAndTheExitCodesOnStandardOutput(String command) {
        assertEquals(0, run(command, "--help"));
        assertTrue(out.contains("Usage: wintersill " + command), out);
        assertTrue(out.contains("wintersill " + command + (command.equals("inspect") ? " sample-grids/tmin-" : " sample-grids/run.yaml")),
                out);
        for (String code : List.of("   0  ", "   1  ", "   2  ", "   3  ", "   4  ", "   5  ", "  130  ", "  143  ")) {
            assertTrue(out.contains(code), out);
        }
        assertEquals("", err);
        assertFalse(out.contains("\u001b"));
    }

    @Test
    void versionIsTold() {
        assertEquals(0, run("--version"));
        assertEquals("wintersill development\n", out);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "''                          | no command is given",
        "mpa                         | Did you mean map?",
        "map --mininum x             | Did you mean --minimum?",
        "map --over                  | there is no flag --over of map",
        "map                         | neither a run file nor a flag",
        "map a.yaml b.yaml           | put it in quotation marks: --minimum 'tmin-*.nc'",
        "map --set title RUN         | does not have the form KEY=VALUE",
        "map --threads x RUN         | 'x' is not a number; accepted: whole numbers from 1 to 1024",
        "map --quiet --verbose RUN   | both given",
        "map none.yaml               | there is no such file",
        "map --out                   | missing",
        "map --out a --out b RUN     | only once",
        "explain RUN                 | no place is given",
        "explain RUN --at 1;2        | '1;2' is not X,Y",
        "explain RUN --at 1,2,3      | is not X,Y",
        "explain RUN --at nan,1      | is not X,Y",
        "explain RUN --at 1,2 --at-lonlat 1,2 | both given",
        "explain RUN --at-lonlat 46,-120      | Swapped?",
        "explain RUN --at 1,2 --winter 2021-23 | Write 2021-22",
        "explain RUN --at 1,2 --csv --json    | both given",
        "inspect                     | missing required parameter",
        "inspect RUN --as minimun    | Did you mean minimum?",
        "inspect RUN --unit x        | accepted: degC, K, degF",
        "inspect RUN --first-day 1   | a date such as 2019-12-01"})
    void wrongWordsEndWithTwoAndSayWhatIsAccepted(String line, String words) {
        assertEquals(2, run(arguments(line)), err);
        assertTrue(err.contains(words), err);
        assertEquals("", out);
        assertFalse(err.contains("\tat "), err);
        assertTrue(commands.called.isEmpty(), "nothing is done");
    }

    @Test
    void swappedPlacesAreOfferedTheRightWayRound() {
        assertEquals(2, run("explain", run, "--at-lonlat", "46,-120"));
        assertTrue(err.contains("--at-lonlat -120,46"), err);
    }

    @Test
    void mapGetsConfigurationAndOptions() {
        assertEquals(0, run("map", run, "--out", "made", "--set", "elevation.dem=dem.tif", "--set", "title=x", "--threads", "2",
                "--memory", "64m", "--overwrite", "--json"));
        assertEquals("map", commands.called);
        assertEquals("x", commands.config.title());
        assertEquals(2, commands.config.limits().threads().getAsInt());
        assertEquals(64L << 20, commands.config.limits().memoryBytes().getAsLong());
        assertTrue(commands.config.elevation().isPresent());
        assertEquals(Path.of("made").toAbsolutePath(), commands.config.outputs().folder().toAbsolutePath().normalize());
        assertTrue(commands.mapOptions.overwrite() && commands.mapOptions.json());
    }

    @Test
    void flagsAloneMakeARun() {
        assertEquals(0, run("map", "--minimum", folder.resolve("tmin-*.nc").toString(), "--dem", folder.resolve("dem.tif").toString(),
                "--cultivars", folder.resolve("c.yaml").toString(), "--out", "made"));
        assertEquals(List.of(folder.resolve("tmin-2001.nc")), commands.config.temperature().minimum().files());
    }

    @Test
    void aDryRunIsAPlan() {
        assertEquals(0, run("map", run, "--dry-run"));
        assertEquals("plan", commands.called);
    }

    @Test
    void thePrintedConfigurationIsARunFile() throws Exception {
        assertEquals(0, run("map", run, "--print-config", "--set", "title=x"));
        String printed = out;
        Path again = Files.writeString(folder.resolve("again.yaml"), printed);
        assertEquals(0, run("map", again.toString(), "--print-config"));
        assertEquals(printed, out);
        assertEquals("", commands.called);
    }

    @Test
    void aGoodPlanCanBeWrittenOnce() {
        String target = folder.resolve("new.yaml").toString();
        assertEquals(0, run("plan", run, "--write", target));
        assertTrue(Files.exists(Path.of(target)));
        assertEquals(4, run("plan", run, "--write", target));
        assertTrue(err.contains("exists already"), err);
        commands.answer = 3;
        assertEquals(3, run("plan", run, "--write", folder.resolve("other.yaml").toString()));
        assertFalse(Files.exists(folder.resolve("other.yaml")));
    }

    @Test
    void explainGetsPlaceAndChoice() {
        assertEquals(0, run("explain", run, "--at", "-1.5,5e2", "--winter", "1999-00", "--cultivar", "amber", "--json"));
        assertEquals(new ExplainOptions(-1.5, 500, false, Optional.of("1999-00"), List.of("amber"), ExplainOptions.Format.JSON, Optional.empty(), false, false),
                commands.explainOptions);
        assertEquals(0, run("explain", run, "--at-lonlat", "-120, 46", "--csv"));
        assertEquals(new ExplainOptions(-120, 46, true, Optional.empty(), List.of(), ExplainOptions.Format.CSV, Optional.empty(), false, false), commands.explainOptions);
    }

    @Test
    void inspectGetsFilesAndWords() {
        assertEquals(0, run("inspect", folder.resolve("tmin-*.nc").toString(), "--unit", "K", "--crs", "EPSG:2056", "--as", "mean",
                "--json"));
        assertEquals(ForcingVariable.MEAN, commands.inspectOptions.entry().request().forcing());
        assertEquals(Optional.of("EPSG:2056"), commands.inspectOptions.entry().request().crs());
        assertEquals(1, commands.inspectOptions.entry().files().size());
        assertEquals(3, run("inspect", folder.resolve("tmin-2002.nc").toString()));
        assertTrue(err.contains("Did you mean tmin-2001.nc?"), err);
    }

    @ParameterizedTest
    @CsvSource({"USAGE, 2", "INPUT, 3", "OUTPUT, 4", "LIMIT, 5"})
    void problemsHaveTheirCodeAndThreeLines(Problem.Kind kind, int code) {
        commands.work = console -> {
            throw new Problem(kind, "the unit is 'F3'", "a.nc, tmin", "Set unit").asException(new IOException("inner"));
        };
        assertEquals(code, run("map", run));
        assertEquals("error: the unit is 'F3'.\n  where:  a.nc, tmin\n  remedy: Set unit.\n", err);
        assertEquals(code, run("map", run, "--debug", "--quiet"));
        assertTrue(err.contains("inner") && err.contains("\tat "), err);
    }

    @Test
    void onlyAnInternalErrorShowsATrace() {
        commands.work = console -> {
            throw new IllegalStateException("broken");
        };
        assertEquals(1, run("map", run));
        assertTrue(err.contains("Please report it") && err.contains("\tat "), err);
    }

    @Test
    void lackOfMemoryIsALimitInWhateverThreadItShows() {
        commands.work = console -> {
            throw new OutOfMemoryError();
        };
        assertEquals(5, run("map", run));
        assertTrue(err.contains("-Xmx"), err);
        commands.work = console -> {
            throw new IllegalStateException(new OutOfMemoryError());
        };
        assertEquals(5, run("map", run));
        assertFalse(err.contains("\tat "), err);
    }

    @Test
    void aBrokenInstallationIsAnInternalError() {
        commands.work = console -> {
            throw new NoClassDefFoundError("x");
        };
        assertEquals(1, run("map", run));
        assertTrue(err.contains("Please report it"), err);
    }

    @Test
    void anInterruptedRunEndsWith130() {
        commands.work = console -> {
            throw new CancelledException();
        };
        assertEquals(130, run("map", run));
        assertTrue(err.contains("interrupted"), err);
    }

    @Test
    void notesChangeTheCodeOnlyWhenStrict() {
        commands.work = console -> {
            console.notices().add("no reference system given");
            console.notices().add("no reference system given");
            console.message("done");
            console.detail("detail");
            console.result("{}");
        };
        assertEquals(0, run("map", run));
        assertEquals("note: no reference system given\ndone\n", err);
        assertEquals("{}\n", out);
        assertEquals(0, run("map", run, "--quiet"));
        assertEquals("", err);
        assertEquals(3, run("map", run, "--strict", "--verbose"));
        assertTrue(err.contains("detail") && err.contains("--strict does not accept"), err);
    }

    @Test
    void controlCodesFromFilesNeverReachTheTerminal() {
        commands.work = console -> console.message("variable \u001b[31mred\r\u202e");
        assertEquals(0, run("map", run));
        assertEquals("variable \\u001b[31mred\\u000d\\u202e\n", err);
    }

    @Test
    void aResultThatCannotBeWrittenIsAnOutputProblem() {
        commands.work = console -> console.result("x");
        PrintStream full = new PrintStream(new OutputStream() {
            @Override
            public void write(int b) throws IOException {
                throw new IOException("no space");
            }
        });
        assertEquals(4, Main.run(new String[] {"map", run}, full, new PrintStream(new ByteArrayOutputStream()), commands));
    }

    @Test
    void namesThatLookLikeFlagsOrFilesOfArgumentsAreNames() throws Exception {
        Path odd = Files.copy(Path.of(run), folder.resolve("@run.yaml"));
        assertEquals(0, run("map", "--", odd.toString()));
        assertEquals(2, run("map", "--", "-run.yaml"));
        assertTrue(err.contains("where:  -run.yaml"), err);
    }

    private String[] arguments(String line) {
        return line.isBlank() ? new String[0]
                : Arrays.stream(line.trim().split(" +")).map(word -> word.equals("RUN") ? run : word).toArray(String[]::new);
    }

    private int run(String... arguments) {
        ByteArrayOutputStream outBytes = new ByteArrayOutputStream();
        ByteArrayOutputStream errBytes = new ByteArrayOutputStream();
        int code = Main.run(arguments, new PrintStream(outBytes, true, StandardCharsets.UTF_8),
                new PrintStream(errBytes, true, StandardCharsets.UTF_8), commands);
        out = outBytes.toString(StandardCharsets.UTF_8).replace("\r\n", "\n");
        err = errBytes.toString(StandardCharsets.UTF_8).replace("\r\n", "\n");
        return code;
    }
}
