package org.wintersill.config;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.temperature.ForcingVariable;

/** Temperature files named on the command line, outside any run. */
public final class InputFiles {
    private static final String COMMAND_LINE = "command line";

    private InputFiles() {
    }

    /**
     * Files and what the flags say about them.
     *
     * @param given files, folders and patterns, relative to the current folder
     * @param words keys of a temperature entry, such as {@code unit}, and their values; each came from the flag of that name
     * @throws org.wintersill.problem.ProblemException with all problems
     */
    public static TemperatureEntry entry(ForcingVariable forcing, List<String> given, Map<String, String> words) {
        Problems problems = new Problems();
        YamlChecks checks = new YamlChecks(Problem.Kind.USAGE, problems);
        List<YamlValue> files = given.stream().<YamlValue>map(file -> new YamlValue.Text(file, true, COMMAND_LINE)).toList();
        YamlValue.Mapping tree = YamlValue.Mapping.empty(COMMAND_LINE)
                .with("files", new YamlValue.Sequence(files, COMMAND_LINE), COMMAND_LINE);
        for (Map.Entry<String, String> word : words.entrySet()) {
            String flag = "--" + word.getKey();
            tree = tree.with(word.getKey(), new YamlValue.Text(word.getValue(), true, flag), flag);
        }
        TemperatureSection section = new TemperatureSection(new InputFinder(Path.of(""), checks), checks);
        Optional<TemperatureEntry> entry = section.entry(tree, forcing);
        problems.throwIfAny();
        return entry.orElseThrow();
    }
}
