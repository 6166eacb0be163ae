package org.wintersill.io.yaml;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.wintersill.problem.NearestName;
import org.wintersill.time.MonthDay;

/**
 * A map of a YAML file that is read key by key. A key that was asked for is known; {@link #finish()} reports the others with the
 * nearest known one. A key without a value counts as not given.
 */
public final class YamlSection {
    private final YamlValue.Mapping mapping;
    private final String path;
    private final YamlChecks checks;
    private final Set<String> known = new LinkedHashSet<>();

    /** @param path dotted keys that lead here; empty at the top */
    public YamlSection(YamlValue.Mapping mapping, String path, YamlChecks checks) {
        this.mapping = mapping;
        this.path = path;
        this.checks = checks;
    }

    /** The section that a value is; one without keys, and a problem, if it is no map. */
    public static YamlSection of(YamlValue value, String path, YamlChecks checks) {
        if (value instanceof YamlValue.Mapping mapping) {
            return new YamlSection(mapping, path, checks);
        }
        checks.problem(value, path, "a map of keys and values is needed, found " + YamlChecks.found(value), "");
        return new YamlSection(YamlValue.Mapping.empty(value.place()), path, checks);
    }

    public YamlChecks checks() {
        return checks;
    }

    public String place() {
        return mapping.place();
    }

    /** Dotted path of a key of this section. */
    public String path(String key) {
        return path.isEmpty() ? key : path + "." + key;
    }

    /** Where a key stands; the section's own place if it is not given. */
    public String place(String key) {
        return mapping.keyPlaces().getOrDefault(key, mapping.place());
    }

    /** The value of a key, whatever it is. */
    public Optional<YamlValue> value(String key) {
        known.add(key);
        return Optional.ofNullable(mapping.entries().get(key))
                .filter(value -> !(value instanceof YamlValue.Text text && text.absent()));
    }

    /** The value of a key without which nothing goes on; a problem if it is not given. */
    public Optional<YamlValue> required(String key, String remedy) {
        Optional<YamlValue> value = value(key);
        if (value.isEmpty()) {
            String what = mapping.entries().containsKey(key) ? "the key " + path(key) + " has no value"
                    : "the key " + path(key) + " is missing";
            checks.problem(place(key), "", what, remedy);
        }
        return value;
    }

    public Optional<String> text(String key) {
        return value(key).flatMap(value -> checks.text(value, path(key)));
    }

    public Optional<Double> number(String key, double lowest, double highest, String accepted) {
        return value(key).flatMap(value -> checks.number(value, path(key), lowest, highest, accepted));
    }

    public Optional<Integer> whole(String key, int lowest, int highest) {
        return value(key).flatMap(value -> checks.whole(value, path(key), lowest, highest));
    }

    public Optional<Boolean> flag(String key) {
        return value(key).flatMap(value -> checks.flag(value, path(key)));
    }

    public Optional<String> word(String key, List<String> accepted, List<String> later) {
        return value(key).flatMap(value -> checks.word(value, path(key), accepted, later));
    }

    public Optional<MonthDay> monthDay(String key) {
        return value(key).flatMap(value -> checks.monthDay(value, path(key)));
    }

    /** The section of a key. */
    public Optional<YamlSection> section(String key) {
        return value(key).map(value -> of(value, path(key), checks));
    }

    /** Adds a problem at a key; at the section itself where the key is empty. */
    public void problem(String key, String what, String remedy) {
        checks.problem(place(key), key.isEmpty() ? path : path(key), what, remedy);
    }

    /** The keys that are given, in the order of the file. */
    public List<String> keys() {
        return List.copyOf(mapping.keyPlaces().keySet());
    }

    /** Reports the keys that nobody asked for. */
    public void finish() {
        finish(Map.of());
    }

    /**
     * Reports the keys that nobody asked for.
     *
     * @param otherNames names of keys elsewhere, and what they are called here
     */
    public void finish(Map<String, String> otherNames) {
        for (Map.Entry<String, String> key : mapping.keyPlaces().entrySet()) {
            String name = key.getKey();
            if (known.contains(name)) {
                continue;
            }
            if (otherNames.containsKey(name)) {
                checks.problem(key.getValue(), "", "the key " + path(name) + " is not known", "It is called " + otherNames.get(name) + " here");
                continue;
            }
            String accepted = "Known here: " + String.join(", ", known);
            checks.problem(key.getValue(), "", "the key " + path(name) + " is not known", NearestName.of(name, known)
                    .map(near -> "Did you mean " + near + "?").orElse(accepted));
        }
    }
}
