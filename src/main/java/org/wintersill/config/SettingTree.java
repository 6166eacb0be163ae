package org.wintersill.config;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.wintersill.io.yaml.YamlReader;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/** Lays the values of the command line over those of the run file. */
final class SettingTree {
    /** Keys that may hold a plain value, and the key of the map that this value is short for. */
    private static final Map<String, String> SHORT_FOR = Map.of("temperature.minimum", "files", "temperature.maximum", "files",
            "temperature.mean", "files", "elevation.dem", "file", "elevation.source-height", "file", "missing-days", "rule",
            "cultivars", "files");
    private static final int DEEPEST_KEY = 8;

    private final Path base;

    /** @param base folder that paths of the run file are relative to */
    SettingTree(Path base) {
        this.base = base;
    }

    /** The tree with all settings, later ones over earlier ones. */
    YamlValue.Mapping apply(YamlValue.Mapping tree, List<Setting> settings, Problems problems) {
        YamlValue.Mapping result = tree;
        for (Setting setting : settings) {
            List<String> path = List.of(setting.key().split("\\."));
            if (path.size() > DEEPEST_KEY) {
                problems.add(Problem.usage("the key " + setting.key() + " is not known", setting.flag(), ""));
                continue;
            }
            try {
                result = set(result, "", path, value(setting));
            } catch (org.wintersill.problem.ProblemException e) {
                problems.addAll(e);
            }
        }
        return result;
    }

    private static YamlValue.Mapping set(YamlValue.Mapping tree, String prefix, List<String> path, YamlValue value) {
        String key = path.get(0);
        if (path.size() == 1) {
            return tree.with(key, value, value.place());
        }
        String full = prefix.isEmpty() ? key : prefix + "." + key;
        YamlValue there = tree.entries().get(key);
        YamlValue.Mapping inner = there instanceof YamlValue.Mapping mapping ? mapping : YamlValue.Mapping.empty(value.place());
        boolean given = there instanceof YamlValue.Sequence || there instanceof YamlValue.Text text && !text.absent();
        if (given && SHORT_FOR.containsKey(full)) {
            inner = inner.with(SHORT_FOR.get(full), there, there.place());
        }
        return tree.with(key, set(inner, full, path.subList(1, path.size()), value),
                tree.keyPlaces().getOrDefault(key, value.place()));
    }

    private YamlValue value(Setting setting) {
        String place = setting.kind() == Setting.Kind.AS_IN_FILE ? setting.flag() + " " + setting.key() : setting.flag();
        List<YamlValue> values = setting.values().stream().map(text -> value(setting, text, place)).toList();
        return values.size() == 1 ? values.get(0) : new YamlValue.Sequence(values, place);
    }

    private YamlValue value(Setting setting, String text, String place) {
        return switch (setting.kind()) {
            case TEXT -> new YamlValue.Text(text, true, place);
            case PATHS -> new YamlValue.Text(fromBase(text), true, place);
            case AS_IN_FILE -> isStructured(text) ? new YamlReader(Problem.Kind.USAGE).parse(text, place)
                    : new YamlValue.Text(text.trim(), false, place);
        };
    }

    /** Everything else is taken as it is, so that patterns like *.nc need no second pair of quotation marks. */
    private static boolean isStructured(String text) {
        String start = text.stripLeading();
        return start.startsWith("[") || start.startsWith("{") || start.startsWith("\"") || start.startsWith("'");
    }

    /** A path or pattern relative to the current folder, as a run file in the base folder would write it. */
    private String fromBase(String text) {
        Path current = Path.of("").toAbsolutePath();
        Path folder = base.toAbsolutePath().normalize();
        if (text.isEmpty() || folder.equals(current.normalize()) || isAbsolute(text)) {
            return text;
        }
        String way;
        try {
            way = folder.relativize(current.normalize()).toString();
        } catch (IllegalArgumentException e) {
            way = current.toString();
        }
        return (way + "/" + text).replace('\\', java.io.File.separatorChar == '\\' ? '/' : '\\');
    }

    static boolean isAbsolute(String text) {
        return text.startsWith("/") || java.io.File.separatorChar == '\\'
                && (text.startsWith("\\") || text.matches("[A-Za-z]:[/\\\\].*"));
    }
}
