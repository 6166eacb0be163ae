package org.wintersill.config;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import org.wintersill.io.cultivar.BuiltInCultivars;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code cultivars}, {@code outputs} and {@code limits}. */
final class OutputSections {
    private static final String AUTO = "auto";
    private static final int MOST_THREADS = 1024;
    private static final String NAME_FORM = "[a-z0-9]+(-[a-z0-9]+)*";
    private static final String CULTIVAR_FORM = "(" + BuiltInCultivars.PREFIX + ")?" + NAME_FORM;

    private OutputSections() {
    }

    static CultivarConfig cultivars(YamlValue value, YamlChecks checks, InputFinder finder, Map<String, Object> tree) {
        YamlValue.Mapping mapping = value instanceof YamlValue.Mapping given ? given
                : YamlValue.Mapping.empty(value.place()).with("files", value, value.place());
        YamlSection section = new YamlSection(mapping, "cultivars", checks);
        String key = value == mapping ? section.path("files") : "cultivars";
        List<String> use = section.value("use").filter(given -> !isWord(given, "all")).map(given -> ChoiceSections.names(given,
                section.path("use"), checks, CULTIVAR_FORM, "a cultivar id: lower-case letters, digits and hyphens, after built-in: for those "
                + "that come with the program")).orElse(List.of());
        boolean allBuiltIn = !use.isEmpty() && use.stream().allMatch(id -> id.startsWith(BuiltInCultivars.PREFIX));
        Optional<YamlValue> named = allBuiltIn ? section.value("files") : section.required("files", "Name a cultivar file");
        InputFinder.Files files = named.map(given -> finder.files(given, key, Set.of(".yaml", ".yml"), false))
                .orElse(new InputFinder.Files(List.of(), List.of()));
        section.finish();
        if (!files.given().isEmpty()) {
            tree.put("files", files.tree());
        }
        tree.put("use", use.isEmpty() ? "all" : use);
        return new CultivarConfig(files.files(), use);
    }

    static OutputConfig outputs(YamlSection section, Path base, Map<String, Object> tree) {
        String folder = section.text("folder").orElse("out");
        List<String> layers = section.value("layers").filter(value -> !isWord(value, "default")).map(value ->
                ChoiceSections.names(value, section.path("layers"), section.checks(), NAME_FORM,
                        "a layer id: lower-case letters, digits and hyphens")).orElse(List.of());
        boolean winters = section.flag("winters").orElse(true);
        boolean netcdf = section.flag("netcdf").orElse(false);
        boolean geopackage = section.flag("geopackage").orElse(true);
        boolean parts = section.flag("parts").orElse(false);
        boolean cells = section.flag("cells").orElse(false);
        boolean keepWinters = section.flag("keep-winters").orElse(false);
        section.finish();
        tree.put("folder", folder);
        tree.put("layers", layers.isEmpty() ? "default" : layers);
        tree.put("winters", winters);
        tree.put("netcdf", netcdf);
        tree.put("geopackage", geopackage);
        tree.put("parts", parts);
        tree.put("cells", cells);
        tree.put("keep-winters", keepWinters);
        return new OutputConfig(path(section, base, folder), layers, winters, netcdf, geopackage, parts, cells, keepWinters);
    }

    private static Path path(YamlSection section, Path base, String folder) {
        try {
            return base.resolve(folder).normalize();
        } catch (InvalidPathException e) {
            section.problem("folder", "'" + folder + "' cannot be a folder: " + e.getReason(), "");
            return base;
        }
    }

    static LimitConfig limits(YamlSection section, Map<String, Object> tree) {
        Optional<Integer> threads = section.value("threads").filter(value -> !isWord(value, AUTO))
                .flatMap(value -> section.checks().whole(value, section.path("threads"), 1, MOST_THREADS));
        Optional<Long> memory = section.value("memory").filter(value -> !isWord(value, AUTO))
                .flatMap(value -> section.checks().parsed(value, section.path("memory"), MemorySize::parse, MemorySize.ACCEPTED));
        section.finish();
        tree.put("threads", threads.<Object>map(number -> number).orElse(AUTO));
        tree.put("memory", memory.map(MemorySize::text).orElse(AUTO));
        return new LimitConfig(threads.map(OptionalInt::of).orElse(OptionalInt.empty()),
                memory.map(OptionalLong::of).orElse(OptionalLong.empty()));
    }

    private static boolean isWord(YamlValue value, String word) {
        return value instanceof YamlValue.Text text && text.text().equals(word);
    }
}
