package org.wintersill.config;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/** Reads {@code parcels}, of a run file or from the flags of the command {@code parcels}. */
public final class ParcelsSection {
    private static final String COMMAND_LINE = "command line";

    private ParcelsSection() {
    }

    /** A path, or a map of {@code file}, {@code layer}, {@code id}, {@code name}, {@code crs} and {@code sheets}. */
    static Optional<ParcelsConfig> read(YamlValue value, InputFinder finder, YamlChecks checks, Map<String, Object> tree) {
        YamlValue.Mapping mapping = value instanceof YamlValue.Mapping given ? given
                : YamlValue.Mapping.empty(value.place()).with("file", value, value.place());
        YamlSection section = new YamlSection(mapping, "parcels", checks);
        Map<String, Object> own = new LinkedHashMap<>();
        Optional<PolygonEntry> entry = finder.polygons(section, value == mapping ? "parcels.file" : "parcels", own);
        Optional<String> id = section.text("id");
        Optional<String> name = section.text("name");
        List<String> sheets = new ArrayList<>();
        section.value("sheets").ifPresent(given -> checks.items(given, "parcels.sheets")
                .forEach(item -> checks.text(item, "parcels.sheets").ifPresent(sheets::add)));
        section.finish();
        id.ifPresent(text -> own.put("id", text));
        name.ifPresent(text -> own.put("name", text));
        own.put("sheets", sheets.isEmpty() ? "auto" : sheets.size() == 1 ? sheets.get(0) : sheets);
        tree.putAll(own);
        return entry.map(polygons -> ParcelsConfig.of(new PolygonEntry(polygons.file(),
                new PolygonRequest(polygons.request().layer(), id, name, polygons.request().crs())), sheets));
    }

    /**
     * What flags say.
     *
     * @param flags keys of the section and their values; each came from the flag of that name, the file from {@code --parcels}
     * @param sheets words of {@code --sheets}
     * @throws org.wintersill.problem.ProblemException with all problems
     */
    public static ParcelsConfig ofFlags(Map<String, String> flags, List<String> sheets) {
        Problems problems = new Problems();
        YamlChecks checks = new YamlChecks(Problem.Kind.USAGE, problems);
        YamlValue.Mapping tree = YamlValue.Mapping.empty(COMMAND_LINE);
        for (Map.Entry<String, String> flag : flags.entrySet()) {
            String place = flag.getKey().equals("file") ? "--parcels" : "--" + flag.getKey();
            tree = tree.with(flag.getKey(), new YamlValue.Text(flag.getValue(), true, place), place);
        }
        if (!sheets.isEmpty()) {
            tree = tree.with("sheets", new YamlValue.Sequence(sheets.stream().<YamlValue>map(text -> new YamlValue.Text(text, true, "--sheets"))
                    .toList(), "--sheets"), "--sheets");
        }
        Optional<ParcelsConfig> config = read(tree, new InputFinder(Path.of(""), checks), checks, new LinkedHashMap<>());
        problems.throwIfAny();
        return config.orElseThrow();
    }
}
