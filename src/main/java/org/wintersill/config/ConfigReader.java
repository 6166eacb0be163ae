package org.wintersill.config;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlReader;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.problem.Problems;

/**
 * Reads a run file with the settings of the command line laid over it, checks every key, and reports all problems at once.
 *
 * <p>A problem names file and line (or the flag), the key, what was found and what is accepted. Files that are missing are input
 * problems; all others are usage problems.
 */
public final class ConfigReader {
    private static final String DEFAULT_TITLE = "Untitled run";
    private static final Pattern LINE = Pattern.compile(":([0-9]{1,8})(, [^:]*)?$");

    private final Path base;
    private final Problems problems = new Problems();
    private final YamlChecks checks = new YamlChecks(Problem.Kind.USAGE, problems);
    private final InputFinder finder;
    private final Map<String, Object> effective = new LinkedHashMap<>();

    private ConfigReader(Path base) {
        this.base = base;
        this.finder = new InputFinder(base, checks);
    }

    /**
     * Reads a run file.
     *
     * @param overrides dotted keys and values as they would stand in the run file
     * @throws org.wintersill.problem.ProblemException with all problems
     */
    public static RunConfig read(Path runFile, Map<String, String> overrides) {
        List<Setting> settings = new ArrayList<>();
        overrides.forEach((key, value) -> settings.add(Setting.inFile(key, value)));
        return read(Optional.of(runFile), settings);
    }

    /**
     * Reads a run file, or settings alone.
     *
     * @param settings laid over the run file, later ones over earlier ones
     * @throws org.wintersill.problem.ProblemException with all problems
     */
    public static RunConfig read(Optional<Path> runFile, List<Setting> settings) {
        Path base = runFile.map(Path::getParent).orElse(Path.of(""));
        YamlValue given = runFile.map(new YamlReader(Problem.Kind.USAGE)::read)
                .orElseGet(() -> YamlValue.Mapping.empty("command line"));
        if (!(given instanceof YamlValue.Mapping tree)) {
            throw Problem.usage("a run file holds keys and values, found " + YamlChecks.found(given), given.place(),
                    "Begin with temperature: and cultivars:, or see wintersill map --help").asException();
        }
        return new ConfigReader(base == null ? Path.of("") : base).config(runFile.orElse(null), tree, settings);
    }

    private RunConfig config(Path runFile, YamlValue.Mapping given, List<Setting> settings) {
        YamlSection top = new YamlSection(new SettingTree(base).apply(given, settings, problems), "", checks);
        String title = top.text("title").orElse(DEFAULT_TITLE);
        effective.put("title", title);
        Optional<TemperatureConfig> temperature = top.required("temperature", runFile == null
                        ? "Say where the daily minima are: --minimum 'tmin-*.nc', or name a run file"
                        : "Say where the daily minima are: temperature: {minimum: tmin-*.nc}")
                .flatMap(value -> new TemperatureSection(finder, checks).read(YamlSection.of(value, "temperature", checks),
                        tree("temperature")));
        Optional<ElevationConfig> elevation = top.section("elevation")
                .flatMap(section -> new ElevationSection(finder, checks).read(section, tree("elevation")));
        WinterConfig winter = WinterSection.read(section(top, "winter"), tree("winter"));
        String missingDays = ChoiceSections.missingDays(top, tree("missing-days"));
        CultivarConfig cultivars = top.required("cultivars", runFile == null ? "Name a cultivar file: --cultivars cultivars.yaml"
                        : "Name a cultivar file: cultivars: cultivars.yaml")
                .map(value -> OutputSections.cultivars(value, checks, finder, tree("cultivars")))
                .orElse(new CultivarConfig(List.of(), List.of()));
        DamageConfig damage = DamageSection.read(section(top, "damage"), tree("damage"));
        StatisticsConfig statistics = StatisticsSection.read(section(top, "statistics"), damage.levels(), tree("statistics"));
        List<Double> classes = ChoiceSections.classes(top);
        effective.put("classes", classes);
        Optional<AreaConfig> area = top.section("area").flatMap(section -> AreaSection.read(section, finder, tree("area")));
        OutputConfig outputs = OutputSections.outputs(section(top, "outputs"), base, tree("outputs"));
        LimitConfig limits = OutputSections.limits(section(top, "limits"), tree("limits"));
        Optional<ScenarioConfig> scenario = top.section("scenario")
                .flatMap(section -> new ScenarioSection(base, finder, checks).read(section, tree("scenario")));
        Optional<ParcelsConfig> parcels = top.value("parcels").flatMap(value -> ParcelsSection.read(value, finder, checks, tree("parcels")));
        if (parcels.isPresent() && !outputs.winters()) {
            top.problem("parcels", "parcels are described by the winter layers, and outputs.winters is false", "Set outputs.winters: true");
        }
        top.finish();
        throwInOrder();
        return new RunConfig(runFile, base, title, temperature.orElseThrow(), elevation, winter, missingDays, cultivars, damage,
                statistics, classes, area, scenario, parcels, outputs, limits, effective);
    }

    /** All problems, those of the run file by line. */
    private void throwInOrder() {
        if (!problems.isEmpty()) {
            throw new ProblemException(problems.all().stream().sorted(Comparator.comparingInt(ConfigReader::line)).toList());
        }
    }

    private static int line(Problem problem) {
        Matcher matcher = LINE.matcher(problem.where());
        return matcher.find() ? Integer.parseInt(matcher.group(1)) : 0;
    }

    /** The section of a key; one without keys if it is not given. */
    private YamlSection section(YamlSection top, String key) {
        return top.section(key).orElseGet(() -> new YamlSection(YamlValue.Mapping.empty(top.place()), key, checks));
    }

    private Map<String, Object> tree(String key) {
        Map<String, Object> tree = new LinkedHashMap<>();
        effective.put(key, tree);
        return tree;
    }
}
