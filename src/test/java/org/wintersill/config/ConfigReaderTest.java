package org.wintersill.config;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.grid.Envelope;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.SeasonWindow.Hemisphere;

class ConfigReaderTest {
    private static final String SMALL = "temperature: {minimum: tmin-*.nc}\ncultivars: c.yaml\n";
    private static final String FULL = """
            title: Tarnmoor basin
            temperature:
              minimum: {files: [tmin-2002.nc, tmin-2001.nc], variable: tn, unit: celsius, scale: 0.1, offset: 0, first-day: 2019-02-30,
                member: 3, crs: EPSG:2056}
              maximum: tmax.nc
              unit: K
            elevation:
              dem: {file: dem.tif, crs: EPSG:2056, unit: ft}
              source-height: orog.nc
              lapse-rate: [3, 3, 4, 4, 5, 5, 5, 5, 4, 4, 3, -1.5]
            winter: {from: 10-01, to: 04-30, complete: 11-01..03-31, hemisphere: north}
            missing-days: month-5-3
            cultivars: {files: [c.yaml], use: [slate, amber]}
            damage: {nights: worst, levels: [90, 20, 50], killing: 20, uncertainty: {model: 1.0, site: 0.8}, neighbourhood-km: 2.5}
            statistics: {interval: 0.95, bounds: wilson, target: [0.2, 0.05], rule: quantile, extremes: l-moments,
              return-periods: [30, 20], bootstrap: {replicates: 99, seed: 7}, cold-night: -12.5, trend: {false-discovery: 0.05}}
            classes: [0.1, 0.2, 0.3]
            area: {bbox: [2600000, 1100000, 2700000, 1200000], polygons: {file: zones.gpkg, layer: inner, crs: EPSG:2056}}
            outputs: {folder: my out, layers: [margin-mean, suitability], winters: false, netcdf: true, geopackage: false, parts: true,
              cells: true}
            limits: {threads: 2, memory: 1.5g}
            """;
    @TempDir
    Path folder;

    @BeforeEach
    void makeFiles() throws Exception {
        for (String name : List.of("tmin-2001.nc", "tmin-2002.nc", "tmax.nc", "dem.tif", "orog.nc", "c.yaml", "zones.gpkg")) {
            Files.createFile(folder.resolve(name));
        }
    }

    @Test
    void everyDefaultIsPinned() throws Exception {
        RunConfig config = read(SMALL);
        assertEquals("Untitled run", config.title());
        assertEquals(List.of(folder.resolve("tmin-2001.nc"), folder.resolve("tmin-2002.nc")), config.temperature().minimum().files());
        assertEquals(TemperatureRequest.of(ForcingVariable.MINIMUM), config.temperature().minimum().request());
        assertEquals(Optional.empty(), config.elevation());
        assertEquals(new WinterConfig(Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty()),
                config.winter());
        assertEquals("month-10-5", config.missingDays());
        assertEquals(new CultivarConfig(List.of(folder.resolve("c.yaml")), List.of()), config.cultivars());
        assertEquals(new DamageConfig("worst", 0, List.of(10, 50, 90), 50, Map.of(), 5), config.damage());
        assertEquals(new StatisticsConfig(0.90, "jeffreys", List.of(0.10), "frequency", "auto", List.of(10, 50, 100), 200, 1, -15, 0.10), config.statistics());
        assertEquals(List.of(0.05, 0.10, 0.20), config.classes());
        assertEquals(Optional.empty(), config.area());
        assertEquals(new OutputConfig(folder.resolve("out"), List.of(), true, false, true, false, false, false), config.outputs());
        assertEquals(new LimitConfig(OptionalInt.empty(), OptionalLong.empty()), config.limits());
        RunConfig withDem = read(SMALL + "elevation: {dem: dem.tif}\n");
        assertEquals(Optional.empty(), withDem.elevation().orElseThrow().sourceHeight());
        assertEquals(4.5, withDem.elevation().orElseThrow().lapseRate()[11]);
    }

    @Test
    void everyKeyIsRead() throws Exception {
        RunConfig config = read(FULL);
        assertEquals("Tarnmoor basin", config.title());
        TemperatureEntry minimum = config.temperature().minimum();
        assertEquals("tmin-2002.nc, tmin-2001.nc", minimum.given());
        assertEquals(List.of(folder.resolve("tmin-2001.nc"), folder.resolve("tmin-2002.nc")), minimum.files());
        assertEquals(new TemperatureRequest(ForcingVariable.MINIMUM, Optional.of("tn"), Optional.of(TemperatureUnit.CELSIUS),
                Optional.of(0.1), Optional.of(0.0), Optional.empty(), Optional.of(new CfDate(2019, 2, 30)), Optional.of("3"),
                Optional.of("EPSG:2056")), minimum.request());
        assertEquals(Optional.of(TemperatureUnit.KELVIN), config.temperature().maximum().orElseThrow().request().unit());
        ElevationConfig elevation = config.elevation().orElseThrow();
        assertEquals(new FileEntry(folder.resolve("dem.tif"), Optional.of("EPSG:2056"), Optional.of("ft")), elevation.dem());
        assertEquals(folder.resolve("orog.nc"), elevation.sourceHeight().orElseThrow().file());
        assertArrayEquals(new double[] {3, 3, 4, 4, 5, 5, 5, 5, 4, 4, 3, -1.5}, elevation.lapseRate());
        assertEquals(new WinterConfig(Optional.of(new MonthDay(10, 1)), Optional.of(new MonthDay(4, 30)),
                Optional.of(new MonthDay(11, 1)), Optional.of(new MonthDay(3, 31)), Optional.of(Hemisphere.NORTH)), config.winter());
        assertEquals("month-5-3", config.missingDays());
        assertEquals(List.of("slate", "amber"), config.cultivars().use());
        assertEquals(new DamageConfig("worst", 0, List.of(20, 50, 90), 20, Map.of("model", 1.0, "site", 0.8), 2.5), config.damage());
        assertEquals(new StatisticsConfig(0.95, "wilson", List.of(0.2, 0.05), "quantile", "l-moments", List.of(20, 30), 99, 7, -12.5, 0.05), config.statistics());
        assertEquals(List.of(0.1, 0.2, 0.3), config.classes());
        assertEquals(new AreaConfig(Optional.of(new Envelope(2600000, 1100000, 2700000, 1200000)), Optional.of(new PolygonEntry(folder.resolve("zones.gpkg"),
                new PolygonRequest(Optional.of("inner"), Optional.empty(), Optional.empty(), Optional.of("EPSG:2056"))))), config.area().orElseThrow());
        assertEquals(new OutputConfig(folder.resolve("my out"), List.of("margin-mean", "suitability"), false, true, false, true, true, false),
                config.outputs());
        assertEquals(new LimitConfig(OptionalInt.of(2), OptionalLong.of(3L << 29)), config.limits());
    }

    @Test
    void nightsAreJoinedByAWordOrByAMap() throws Exception {
        assertEquals("independent", read(SMALL + "damage: {nights: independent}\n").damage().nights());
        for (String form : List.of("{nights: correlated, rho: 0.6}", "{nights: {rule: correlated, rho: 0.6}}")) {
            DamageConfig damage = read(SMALL + "damage: " + form + "\n").damage();
            assertEquals("correlated", damage.nights(), form);
            assertEquals(0.6, damage.correlation(), form);
        }
    }

    @ParameterizedTest
    @CsvSource({"small", "full", "dem", "correlated"})
    void theEffectiveConfigurationReadBackIsTheSame(String which) throws Exception {
        RunConfig config = read(which.equals("full") ? FULL : which.equals("dem") ? SMALL + "elevation: {dem: dem.tif}\n"
                : which.equals("correlated") ? SMALL + "damage: {nights: correlated, rho: 0.25}\n" : SMALL);
        RunConfig again = ConfigReader.read(Files.writeString(folder.resolve("run.yaml"), config.toYaml()), Map.of());
        assertEquals(config, again);
        assertEquals(config.toYaml(), again.toYaml());
    }

    @Test
    void aWrittenRunFileMeansTheSameFromAnotherFolder() throws Exception {
        RunConfig config = read(FULL);
        Path other = Files.createDirectories(folder.resolve("other/deep"));
        RunFileText.write(config, other.resolve("new.yaml"));
        RunConfig again = ConfigReader.read(other.resolve("new.yaml"), Map.of());
        assertEquals(config.temperature().minimum().files(), again.temperature().minimum().files().stream().map(Path::normalize).toList());
        assertEquals(config.outputs().folder(), again.outputs().folder().normalize());
        assertTrue(Files.readString(other.resolve("new.yaml")).contains("# Terrain model"));
        ProblemException refused = assertThrows(ProblemException.class, () -> RunFileText.write(config, other.resolve("new.yaml")));
        assertEquals(4, refused.exitCode());
    }

    @Test
    void settingsGoBeforeTheRunFile() throws Exception {
        Map<String, String> settings = new LinkedHashMap<>();
        settings.put("title", "a: b");
        settings.put("elevation.dem", "dem.tif");
        settings.put("elevation.lapse-rate", "6.5");
        settings.put("temperature.minimum.unit", "K");
        settings.put("area.bbox", "[1, 2, 3, 4]");
        settings.put("missing-days", "none");
        RunConfig config = ConfigReader.read(run(SMALL), settings);
        assertEquals("a: b", config.title());
        assertEquals(6.5, config.elevation().orElseThrow().lapseRate()[0]);
        assertEquals(2, config.temperature().minimum().files().size(), "the files stay when a unit is set beside them");
        assertEquals(Optional.of(TemperatureUnit.KELVIN), config.temperature().minimum().request().unit());
        assertEquals(4, config.area().orElseThrow().box().orElseThrow().north());
        assertEquals("none", config.missingDays());
    }

    @Test
    void aPatternInASettingNeedsNoQuotationMarksOfYaml() throws Exception {
        RunConfig config = ConfigReader.read(run(SMALL), Map.of("temperature.minimum", "*-2001.nc"));
        assertEquals(List.of(folder.resolve("tmin-2001.nc")), config.temperature().minimum().files());
    }

    @Test
    void pathsOfFlagsStartFromTheCurrentFolder() throws Exception {
        Path here = Files.createDirectories(Path.of("target/config-reader-test"));
        Files.writeString(here.resolve("one.nc"), "");
        RunConfig config = ConfigReader.read(Optional.of(run(SMALL)), List.of(
                Setting.paths("--minimum", "temperature.minimum.files", List.of("target/config-reader-test/*.nc")),
                Setting.paths("--out", "outputs.folder", List.of("target/made"))));
        assertEquals(here.resolve("one.nc").toAbsolutePath().normalize(),
                config.temperature().minimum().files().get(0).toAbsolutePath().normalize());
        assertEquals(Path.of("target/made").toAbsolutePath(), config.outputs().folder().toAbsolutePath().normalize());
    }

    @Test
    void aRunNeedsNoFile() throws Exception {
        String tmin = folder.resolve("tmin-*.nc").toString();
        RunConfig config = RunConfig.ofFlags(List.of(Setting.paths("--minimum", "temperature.minimum.files", List.of(tmin)),
                Setting.paths("--dem", "elevation.dem.file", List.of(folder.resolve("dem.tif").toString())),
                Setting.paths("--cultivars", "cultivars.files", List.of(folder.resolve("c.yaml").toString())),
                Setting.paths("--out", "outputs.folder", List.of("made"))));
        assertEquals(null, config.runFile());
        assertEquals(Path.of("made"), config.outputs().folder());
        assertEquals(2, config.temperature().minimum().files().size());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "titel: x                                       | 3 | the key titel is not known. Did you mean title?",
        "outputs: {folders: x}                          | 3 | Did you mean folder?",
        "scenario: {historical: tmin-1.nc}              | 3 | the key scenario.future is missing",
        "damage: {uncertainty: 1.2}                     | 3 | named components are needed",
        "damage: {uncertainty: {model: -1}}             | 3 | a standard deviation in K from 0 to 20",
        "damage: {uncertainty: {winter: 1}}             | 3 | 'winter' cannot name a component",
        "damage: {nights: correlated}                   | 3 | correlated nights need their correlation rho",
        "damage: {rho: 0.5}                             | 3 | rho is given, and the nights are joined as worst",
        "damage: {nights: {rule: correlated, rho: 1}}   | 3 | a correlation above 0 and up to 0.99",
        "damage: {nights: {rule: worst, roh: 0.5}}      | 3 | Did you mean rho?",
        "damage: {nights: independent, uncertainty: {site: 1}} | 3 | uncertainty belongs to the worst night",
        "damage: {nights: wurst}                        | 3 | Did you mean worst?",
        "damage: {levels: [10, 90]}                     | 3 | not among the levels [10, 90]. Add 50",
        "damage: {killing: 40}                          | 3 | add 40 to them",
        "damage: {levels: [50, 50]}                     | 3 | given twice",
        "damage: {levels: [50, 100]}                    | 3 | whole numbers from 1 to 99",
        "damage: {levels: [50, 10.5]}                   | 3 | is not whole",
        "elevation: {lapse-rate: 5}                     | 3 | the key elevation.dem is missing",
        "elevation: {dem: dem.tif, lapse-rate: 10}      | 3 | 10 is out of range; accepted: K per km from -8 to 9.8",
        "elevation: {dem: dem.tif, lapse-rate: -8.1}    | 3 | out of range",
        "elevation: {dem: dem.tif, lapse-rate: [1, 2]}  | 3 | twelve (January to December) are needed, found 2",
        "elevation: {dem: dem.tif, lapse-rate: {method: local}} | 3 | only daily-local is accepted",
        "elevation: {dem: dem.tif, lapse-rate: {prior: 4}} | 3 | method is missing",
        "elevation: {dem: dem.tif, lapse-rate: {method: daily-local, prior-sd: 0}} | 3 | 0 is out of range",
        "elevation: {dem: dem.tif, lapse-rate: '4,5'}   | 3 | Write 4.5 with a point",
        "elevation: {dem: dem.tif, lapse-rate: .inf}    | 3 | is not a number",
        "elevation: {dem: {file: dem.tif, unit: feet}}  | 3 | accepted: m, ft, us-ft",
        "elevation: {dem: {file: dem.tif, crs: 2056}}   | 3 | Write EPSG:2056",
        "elevation: {dem: dem.tif, cold-pool: {stength: 4}} | 3 | Did you mean strength?",
        "elevation: {dem: dem.tif, cold-pool: {top: 900}} | 3 | does not go with form: hollows",
        "elevation: {dem: dem.tif, cold-pool: {form: inversion}} | 3 | elevation.cold-pool.top is missing",
        "elevation: {dem: dem.tif, cold-pool: {range: [9, 9]}} | 3 | does not ascend",
        "elevation: {dem: dem.tif, cold-pool: {nights: clear}} | 3 | accepted: stable, all",
        "elevation: {dem: dem.tif, water: {warming: 2}}  | 3 | elevation.water.mask is missing",
        "elevation: {dem: dem.tif, water: {mask: dem.tif, frozen: January}} | 3 | or two days such as 12-20..03-10",
        "elevation: {dem: dem.tif, offsets: {bud: -1}}  | 3 | elevation.offsets.bud is not known",
        "elevation: {dem: dam.tif}                      | 3 | Did you mean dem.tif?",
        "elevation: {dem: .}                            | 3 | Name one file",
        "winter: {from: 11-31}                          | 3 | month and day such as 11-01",
        "winter: {complete: 11-01-04-30}                | 3 | two days such as 11-01..04-30",
        "winter: {from: 12-01, to: 02-28, complete: 11-01..02-01} | 3 | is not inside the winter",
        "winter: {hemisphere: noth}                     | 3 | Did you mean north?",
        "missing-days: {rule: month-5-4}                | 3 | Did you mean month-5-3?",
        "missing-days: {rul: none}                      | 3 | Did you mean rule?",
        "statistics: {interval: 90}                     | 3 | from 0.5 to 0.999",
        "statistics: {bounds: wald}                     | 3 | jeffreys, wilson",
        "statistics: {extremes: gev}                    | 3 | auto, none, l-moments, maximum-likelihood",
        "statistics: {rule: damage}                     | 3 | frequency, quantile, expected-damage",
        "statistics: {target: [0.1, 0.1]}               | 3 | 0.1 is given twice",
        "statistics: {target: [0, 0.1], rule: expected-damage} | 3 | above 0",
        "statistics: {return-periods: [1, 10]}          | 3 | whole numbers from 2 to 1000",
        "statistics: {bootstrap: {replicates: 5}}       | 3 | whole numbers from 20 to 10000",
        "statistics: {trend: {false-discovery: 0}}      | 3 | from 0.001 to 0.5",
        "classes: [0.2, 0.1, 0.3]                       | 3 | does not ascend",
        "classes: [0.1, 0.2]                            | 3 | a list of 3 numbers is needed, found a list of 2",
        "area: {bbox: [3, 2, 1, 4]}                     | 3 | west must be less than east",
        "area: {}                                       | 3 | an area needs a box or polygons",
        "outputs: {winters: yes}                        | 3 | Write true or false",
        "outputs: {layers: [../x]}                      | 3 | is not a layer id",
        "outputs: []                                    | 3 | a map of keys and values is needed, found a list",
        "limits: {threads: 0}                           | 3 | whole numbers from 1 to 1024",
        "limits: {memory: 2}                            | 3 | such as 512m or 2g"})
    void mistakesNameLineAndWhatIsAccepted(String line, int number, String words) throws Exception {
        ProblemException refused = refused(SMALL + line + "\n");
        assertEquals(1, refused.problems().size(), refused.getMessage());
        assertTrue(refused.problems().get(0).where().startsWith(folder.resolve("run.yaml") + ":" + number), refused.getMessage());
        assertTrue(refused.getMessage().contains(words), refused.getMessage());
    }

    @Test
    void anExpectedDamageNeedsASpread() throws Exception {
        ProblemException refused = refused(SMALL + "statistics: {rule: expected-damage}\ndamage: {levels: [50]}\n");
        assertEquals(1, refused.problems().size(), refused.getMessage());
        assertTrue(refused.getMessage().contains("damage.levels has 50 alone"), refused.getMessage());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "{minimum: tmin-1*.nc}                              | no file matches 'tmin-1*.nc'",
        "{minimum: []}                                      | the list is empty",
        "{}                                                 | the key temperature.minimum is missing",
        "{minimum: {unit: K}}                               | the key temperature.minimum.files is missing",
        "{minimum: tmax.nc, unit: F3}                       | accepted: degC, K, degF",
        "{minimum: tmax.nc, dates: yyMMdd}                  | yyyyMMdd, yyyy_MM or yyyyDDD",
        "{minimum: {files: tmax.nc, scale: 0}}              | a scale of 0",
        "{minimum: {files: tmax.nc, first-day: 2019-12-32}} | a date such as 2019-12-01",
        "{minimum: {files: tmax.nc, first-day: 2019-12-01, dates: yyyyMMdd}} | both given",
        "{minimum: tmax.nc, maximum: tmax.nc, daily-range: 10} | daily-range and maximum are both given",
        "{minimum: tmax.nc, maximum: tmax.nc, mean: tmax.nc} | maximum and mean are both given"})
    void mistakesAboutTemperaturesAreNamed(String temperature, String words) throws Exception {
        ProblemException refused = refused("temperature: " + temperature + "\ncultivars: c.yaml\n");
        assertEquals(1, refused.problems().size(), refused.getMessage());
        assertTrue(refused.getMessage().contains(words), refused.getMessage());
    }

    @Test
    void allProblemsComeAtOnceInTheOrderOfTheFile() throws Exception {
        ProblemException refused = refused("titel: x\ntemperature: {minimum: tmin-1.nc}\ncultivars: d.yaml\nclasses: 3\nlimits: {thread: 1}\n");
        assertEquals(List.of(1, 2, 3, 4, 5), refused.problems().stream()
                .map(problem -> Integer.parseInt(problem.where().replaceAll(".*run\\.yaml:(\\d+).*", "$1"))).toList());
        assertEquals(2, refused.exitCode());
    }

    @Test
    void aMissingInputAloneIsAnInputProblem() throws Exception {
        ProblemException refused = refused("temperature: {minimum: tmin-1.nc}\ncultivars: c.yaml\n");
        assertEquals(Problem.Kind.INPUT, refused.problems().get(0).kind());
    }

    @Test
    void mistakesInSettingsNameTheFlag() throws Exception {
        ProblemException refused = assertThrows(ProblemException.class,
                () -> ConfigReader.read(run(SMALL), Map.of("elevation.lapserate", "3", "limits.threads", "many")));
        assertTrue(refused.problems().stream().anyMatch(problem -> problem.where().equals("--set limits.threads")), refused.getMessage());
        assertTrue(refused.getMessage().contains("Did you mean lapse-rate?"), refused.getMessage());
        assertThrows(ProblemException.class, () -> Setting.assignment("title"));
        assertThrows(ProblemException.class, () -> Setting.assignment("a..b=1"));
        assertThrows(ProblemException.class, () -> Setting.assignment("=1"));
    }

    private ProblemException refused(String text) throws Exception {
        Path run = run(text);
        return assertThrows(ProblemException.class, () -> ConfigReader.read(run, Map.of()));
    }

    private RunConfig read(String text) throws Exception {
        return ConfigReader.read(run(text), Map.of());
    }

    private Path run(String text) throws Exception {
        return Files.writeString(folder.resolve("run.yaml"), text);
    }
}
