package org.wintersill.config;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.Problem;

/** Reads keys that name input files. What is not there is an input problem; everything else is a problem of the run file. */
final class InputFinder {
    private static final List<String> HEIGHT_UNITS = List.of("m", "ft", "us-ft");

    private final Path base;
    private final YamlChecks checks;

    InputFinder(Path base, YamlChecks checks) {
        this.base = base;
        this.checks = checks;
    }

    /**
     * Files as given and as found.
     *
     * @param given paths, folders and patterns
     * @param files each once
     */
    record Files(List<String> given, List<Path> files) {

        /** The tree value that says the same: one text, or a list. */
        Object tree() {
            return given.size() == 1 ? given.get(0) : given;
        }
    }

    /**
     * Files named by one text or a list of texts.
     *
     * @param endings endings of the files to take from a folder
     * @param byName whether the files are sorted by name over all entries, or stay in the order given
     */
    Files files(YamlValue value, String key, Set<String> endings, boolean byName) {
        List<String> given = new ArrayList<>();
        List<Path> files = new ArrayList<>();
        List<YamlValue> items = checks.items(value, key);
        if (items.isEmpty() && value instanceof YamlValue.Sequence) {
            checks.problem(value, key, "the list is empty", "Name at least one file");
        }
        for (YamlValue item : items) {
            checks.text(item, key).ifPresent(text -> {
                given.add(text);
                FilePatterns.Found found = new FilePatterns(base, endings).find(text);
                if (found.files().isEmpty()) {
                    checks.problems().add(Problem.input(found.what(), YamlChecks.where(item.place(), key), found.remedy()));
                }
                found.files().stream().filter(file -> !files.contains(file)).forEach(files::add);
            });
        }
        return new Files(given, byName ? FilePatterns.sorted(files) : List.copyOf(files));
    }

    /** A file of heights: a path, or a map of {@code file}, {@code crs} and {@code unit}. */
    Optional<FileEntry> heights(YamlValue value, String key, Map<String, Object> tree) {
        if (YamlChecks.isText(value)) {
            return checks.text(value, key).map(text -> {
                tree.put("file", text);
                return new FileEntry(existing(value, key, text), Optional.empty(), Optional.empty());
            });
        }
        YamlSection section = YamlSection.of(value, key, checks);
        Optional<YamlValue> file = section.required("file", "Name the file of the heights");
        Optional<String> path = file.flatMap(given -> checks.text(given, section.path("file")));
        Optional<String> crs = crs(section);
        Optional<String> unit = section.word("unit", HEIGHT_UNITS, List.of());
        section.finish();
        path.ifPresent(text -> tree.put("file", text));
        crs.ifPresent(text -> tree.put("crs", text));
        unit.ifPresent(text -> tree.put("unit", text));
        return path.map(text -> new FileEntry(existing(file.get(), section.path("file"), text), crs, unit));
    }

    /** A file of polygons: a path, or a map of {@code file}, {@code layer} and {@code crs}. */
    Optional<PolygonEntry> polygons(YamlValue value, String key, Map<String, Object> tree) {
        YamlValue.Mapping mapping = value instanceof YamlValue.Mapping given ? given
                : YamlValue.Mapping.empty(value.place()).with("file", value, value.place());
        YamlSection section = new YamlSection(mapping, key, checks);
        Optional<PolygonEntry> entry = polygons(section, value == mapping ? section.path("file") : key, tree);
        section.finish();
        return entry;
    }

    /** The keys of a file of polygons in a section that may have others too. */
    Optional<PolygonEntry> polygons(YamlSection section, String fileKey, Map<String, Object> tree) {
        Optional<YamlValue> file = section.required("file", "Name a GeoPackage, GeoJSON or Shapefile with polygons");
        Optional<String> path = file.flatMap(given -> checks.text(given, fileKey));
        Optional<String> layer = section.text("layer");
        Optional<String> crs = crs(section);
        path.ifPresent(text -> tree.put("file", text));
        layer.ifPresent(text -> tree.put("layer", text));
        crs.ifPresent(text -> tree.put("crs", text));
        return path.map(text -> new PolygonEntry(existing(file.get(), fileKey, text),
                new PolygonRequest(layer, Optional.empty(), Optional.empty(), crs)));
    }

    /** A reference system; whether it exists is asked when it is used. */
    static Optional<String> crs(YamlSection section) {
        return section.text("crs").filter(text -> {
            if (text.matches("\\d+")) {
                section.problem("crs", "'" + text + "' does not say whose code it is", "Write EPSG:" + text);
                return false;
            }
            return true;
        });
    }

    /** A map with a file alone, or with nothing, in its short form. */
    static Object shortest(Map<String, Object> tree, String key) {
        return tree.size() == 1 && tree.containsKey(key) ? tree.get(key) : new LinkedHashMap<>(tree);
    }

    private Path existing(YamlValue value, String key, String text) {
        FilePatterns.Found found = new FilePatterns(base, Set.of()).find(text);
        if (found.files().size() == 1) {
            return found.files().get(0);
        }
        String what = found.files().isEmpty() ? found.what() : "'" + text + "' stands for " + found.files().size() + " files";
        boolean folder = found.files().isEmpty() && what.startsWith("the folder");
        checks.problems().add(Problem.input(folder ? "'" + text + "' is a folder" : what, YamlChecks.where(value.place(), key),
                folder || !found.files().isEmpty() ? "Name one file" : found.remedy()));
        return base;
    }
}
