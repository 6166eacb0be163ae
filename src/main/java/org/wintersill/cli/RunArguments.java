package org.wintersill.cli;

import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.config.ConfigReader;
import org.wintersill.config.RunConfig;
import org.wintersill.config.Setting;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.problem.Problems;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** The run file and the flags that go before it. */
final class RunArguments {

    @Parameters(arity = "0..1", paramLabel = "RUN.yaml", description = "The run file. Its paths are relative to it. It may be left "
            + "out if --minimum and --cultivars are given.")
    String runFile;

    @Option(names = "--minimum", paramLabel = "FILES", description = "Daily minimum temperatures: a file, a folder, or a pattern in "
            + "quotation marks such as 'tmin-*.nc'. May be given several times.")
    List<String> minimum = new ArrayList<>();

    @Option(names = "--dem", paramLabel = "FILE", description = "Terrain model. Without it the outputs stay on the grid of the "
            + "temperatures.")
    String dem;

    @Option(names = "--cultivars", paramLabel = "FILE", description = "Cultivar file. May be given several times.")
    List<String> cultivars = new ArrayList<>();

    @Option(names = "--out", paramLabel = "FOLDER", description = "Output folder; out if nothing else is said.")
    String out;

    @Option(names = "--set", paramLabel = "KEY=VALUE", description = "Any key of the run file, such as elevation.lapse-rate=5.5. "
            + "Paths are relative to the run file. May be given several times.")
    List<String> set = new ArrayList<>();

    @Option(names = "--threads", paramLabel = "N", description = "Threads to work with; results do not depend on it.")
    String threads;

    @Option(names = "--memory", paramLabel = "SIZE", description = "Memory to work with, such as 512m or 2g.")
    String memory;

    /**
     * The configuration; flags go before --set, and --set before the run file; of several --set the last one counts.
     *
     * @throws ProblemException with all problems
     */
    RunConfig config() {
        return config(List.of());
    }

    /** Whether a folder of inputs is named in place of a run file. */
    boolean isFolder() {
        return runFile != null && Files.isDirectory(path(runFile));
    }

    Path folder() {
        return path(runFile);
    }

    /**
     * The same over settings that stand in for a run file.
     *
     * @param found what a folder of inputs holds; empty where there is a run file or flags alone
     */
    RunConfig config(List<Setting> found) {
        return config(found, List.of());
    }

    /** The same with settings laid over everything else. */
    RunConfig config(List<Setting> found, List<Setting> last) {
        Problems problems = new Problems();
        List<Setting> settings = new ArrayList<>(found);
        for (String assignment : set) {
            problems.attempt(() -> settings.add(Setting.assignment(assignment)));
        }
        paths("--minimum", "temperature.minimum.files", minimum, settings);
        paths("--dem", "elevation.dem.file", dem == null ? List.of() : List.of(dem), settings);
        paths("--cultivars", "cultivars.files", cultivars, settings);
        paths("--out", "outputs.folder", out == null ? List.of() : List.of(out), settings);
        text("--threads", "limits.threads", threads, settings);
        text("--memory", "limits.memory", memory, settings);
        settings.addAll(last);
        RunConfig[] config = new RunConfig[1];
        if (runFile == null && settings.isEmpty() && problems.isEmpty()) {
            throw Problem.usage("there is neither a run file nor a flag that names the inputs", "",
                    "Name a run file, or give --minimum and --cultivars; --help shows examples").asException();
        }
        problems.attempt(() -> config[0] = ConfigReader.read(Optional.ofNullable(found.isEmpty() ? runFile : null).map(RunArguments::path), settings));
        problems.throwIfAny();
        return config[0];
    }

    static Path path(String text) {
        try {
            return Path.of(text);
        } catch (InvalidPathException e) {
            throw Problem.usage("'" + text + "' cannot be a path: " + e.getReason(), "", "").asException(e);
        }
    }

    private static void paths(String flag, String key, List<String> values, List<Setting> settings) {
        if (!values.isEmpty()) {
            settings.add(Setting.paths(flag, key, values));
        }
    }

    private static void text(String flag, String key, String value, List<Setting> settings) {
        if (value != null) {
            settings.add(Setting.text(flag, key, value));
        }
    }
}
