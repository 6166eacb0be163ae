package org.wintersill.config;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.NearestName;
import org.wintersill.scenario.Regridding;
import org.wintersill.scenario.ScenarioMethod;
import org.wintersill.scenario.YearPools;
import org.wintersill.temperature.ForcingVariable;

/**
 * Reads {@code scenario}. File names may hold the placeholder {@value #PLACEHOLDER}: every member for which both a past and a future
 * are found is a scenario of its own.
 */
final class ScenarioSection {
    private static final String PLACEHOLDER = "<member>";
    private static final String PERIOD = "two days such as 1991-01-01..2020-12-31, the earlier one first";

    private final Path base;
    private final TemperatureSection temperatures;
    private final YamlChecks checks;

    ScenarioSection(Path base, InputFinder finder, YamlChecks checks) {
        this.base = base;
        this.checks = checks;
        temperatures = new TemperatureSection(finder, checks);
    }

    Optional<ScenarioConfig> read(YamlSection section, Map<String, Object> tree) {
        String method = section.word("method", ScenarioMethod.keys(), List.of()).orElse(ScenarioMethod.QUANTILE_DELTA.key());
        String pool = section.word("pool", YearPools.keys(), List.of()).orElse(YearPools.MONTH.key());
        String regrid = section.word("regrid", Regridding.Kind.keys(), List.of()).orElse("bilinear");
        Optional<YamlValue> historical = section.required("historical", "Name the files of the model's past");
        Optional<YamlValue> future = section.required("future", "Name the files of the model's future");
        Optional<ScenarioConfig.Period> reference = period(section, "reference");
        Optional<ScenarioConfig.Period> period = period(section, "period");
        Optional<String> member = section.text("member");
        section.finish();
        tree.put("method", method);
        tree.put("pool", pool);
        tree.put("regrid", regrid);
        if (historical.isEmpty() || future.isEmpty()) {
            return Optional.empty();
        }
        List<String> members = members(historical.get(), future.get(), section);
        member.filter(id -> !members.contains(id)).ifPresent(id -> section.problem("member", members.isEmpty()
                ? "there are no members: neither name holds " + PLACEHOLDER : "there is no member '" + id + "'",
                NearestName.of(id, members).map(near -> "Did you mean " + near + "?").orElse("Known are " + String.join(", ", members))));
        String chosen = member.filter(members::contains).orElse(members.isEmpty() ? "" : members.get(0));
        Map<String, Object> read = new LinkedHashMap<>();
        Optional<TemperatureEntry> past = entry(section, "historical", historical.get(), chosen, read);
        Optional<TemperatureEntry> later = entry(section, "future", future.get(), chosen, read);
        tree.putAll(read);
        reference.ifPresent(days -> tree.put("reference", days.toString()));
        period.ifPresent(days -> tree.put("period", days.toString()));
        member.ifPresent(id -> tree.put("member", id));
        if (past.isEmpty() || later.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(new ScenarioConfig(method, pool, regrid, past.get(), later.get(), reference, period, members, member));
    }

    private Optional<ScenarioConfig.Period> period(YamlSection section, String key) {
        return section.value(key).flatMap(value -> checks.parsed(value, section.path(key), ScenarioConfig.Period::parse, PERIOD));
    }

    /** An entry as it reads for one member; the tree keeps the placeholder, so that it reads the same again. */
    private Optional<TemperatureEntry> entry(YamlSection section, String key, YamlValue value, String member, Map<String, Object> tree) {
        Map<String, Object> given = new LinkedHashMap<>();
        Optional<TemperatureEntry> entry = temperatures.entry(replaced(value, member), section, key, ForcingVariable.MINIMUM, given);
        tree.put(key, holdsPlaceholder(value) ? plain(value) : given.get(key));
        return entry;
    }

    private static YamlValue replaced(YamlValue value, String member) {
        if (value instanceof YamlValue.Text text) {
            return new YamlValue.Text(text.text().replace(PLACEHOLDER, member), text.quoted(), text.place());
        }
        if (value instanceof YamlValue.Sequence list) {
            return new YamlValue.Sequence(list.items().stream().map(item -> replaced(item, member)).toList(), list.place());
        }
        YamlValue.Mapping map = (YamlValue.Mapping) value;
        Map<String, YamlValue> entries = new LinkedHashMap<>();
        map.entries().forEach((key, item) -> entries.put(key, replaced(item, member)));
        return new YamlValue.Mapping(entries, map.keyPlaces(), map.place());
    }

    private static Object plain(YamlValue value) {
        if (value instanceof YamlValue.Text text) {
            return text.text();
        }
        if (value instanceof YamlValue.Sequence list) {
            return list.items().stream().map(ScenarioSection::plain).toList();
        }
        Map<String, Object> plain = new LinkedHashMap<>();
        ((YamlValue.Mapping) value).entries().forEach((key, item) -> plain.put(key, plain(item)));
        return plain;
    }

    private static boolean holdsPlaceholder(YamlValue value) {
        return !patterns(value).isEmpty();
    }

    /** Texts with the placeholder. */
    private static List<String> patterns(YamlValue value) {
        List<String> patterns = new ArrayList<>();
        if (value instanceof YamlValue.Text text) {
            if (text.text().contains(PLACEHOLDER)) {
                patterns.add(text.text());
            }
        } else if (value instanceof YamlValue.Sequence list) {
            list.items().forEach(item -> patterns.addAll(patterns(item)));
        } else {
            ((YamlValue.Mapping) value).entries().values().forEach(item -> patterns.addAll(patterns(item)));
        }
        return patterns;
    }

    private List<String> members(YamlValue historical, YamlValue future, YamlSection section) {
        List<String> past = patterns(historical);
        List<String> later = patterns(future);
        if (past.isEmpty() && later.isEmpty()) {
            return List.of();
        }
        Set<String> inPast = past.isEmpty() ? null : members(past);
        Set<String> inFuture = later.isEmpty() ? null : members(later);
        Set<String> both = new TreeSet<>(inPast == null ? inFuture : inPast);
        if (inPast != null && inFuture != null) {
            both.retainAll(inFuture);
            Set<String> alone = new TreeSet<>(inPast);
            alone.addAll(inFuture);
            alone.removeAll(both);
            if (!alone.isEmpty() && !both.isEmpty()) {
                section.problem("future", "these members have only a past or only a future: " + String.join(", ", alone),
                        "Add the missing files, or name the members' files more narrowly");
            }
        }
        if (both.isEmpty()) {
            section.problem("historical", "no member has both a past and a future", "Check the names: " + PLACEHOLDER
                    + " stands for letters, digits, - and _");
        }
        return List.copyOf(both);
    }

    private Set<String> members(List<String> patterns) {
        Set<String> members = new TreeSet<>();
        for (String pattern : patterns) {
            Pattern form = form(pattern);
            for (Path file : new FilePatterns(base, Set.of()).find(pattern.replace(PLACEHOLDER, "*")).files()) {
                Matcher matcher = form.matcher(file.toString().replace('\\', '/'));
                if (matcher.find()) {
                    members.add(matcher.group("member"));
                }
            }
        }
        return members;
    }

    /** The end of a path as an expression; a member that is named several times has one name. */
    private static Pattern form(String pattern) {
        StringBuilder form = new StringBuilder();
        String text = pattern.replace('\\', '/');
        boolean named = false;
        for (int i = 0; i < text.length(); i++) {
            if (text.startsWith(PLACEHOLDER, i)) {
                form.append(named ? "\\k<member>" : "(?<member>[A-Za-z0-9_-]+)");
                named = true;
                i += PLACEHOLDER.length() - 1;
            } else {
                char c = text.charAt(i);
                form.append(c == '*' ? "[^/]*" : c == '?' ? "[^/]" : Pattern.quote(String.valueOf(c)));
            }
        }
        return Pattern.compile(form.append('$').toString());
    }
}
