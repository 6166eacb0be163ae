package org.wintersill.config;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code classes} and {@code missing-days}. */
final class ChoiceSections {
    private static final List<String> MISSING_DAY_RULES = List.of("month-10-5", "month-5-3", "none");
    private static final List<Double> DEFAULT_CLASSES = List.of(0.05, 0.10, 0.20);

    private ChoiceSections() {
    }

    static List<Double> classes(YamlSection top) {
        return top.value("classes").flatMap(value -> {
            String accepted = "frequencies between 0 and 1";
            Optional<List<Double>> limits = top.checks().numbers(value, "classes", 3, 0, 1, accepted);
            return limits.filter(list -> {
                boolean ascending = 0 < list.get(0) && list.get(0) < list.get(1) && list.get(1) < list.get(2) && list.get(2) < 1;
                if (!ascending) {
                    top.problem("classes", list + " does not ascend between 0 and 1", "Give the highest frequency of killing winters "
                            + "that is secure, workable and marginal, such as [0.05, 0.10, 0.20]");
                }
                return ascending;
            });
        }).orElse(DEFAULT_CLASSES);
    }

    static String missingDays(YamlSection top, Map<String, Object> tree) {
        String rule = MISSING_DAY_RULES.get(0);
        Optional<YamlValue> value = top.value("missing-days");
        if (value.isPresent() && YamlChecks.isText(value.get())) {
            rule = top.checks().word(value.get(), "missing-days", MISSING_DAY_RULES, List.of()).orElse(rule);
        } else if (value.isPresent()) {
            YamlSection section = YamlSection.of(value.get(), "missing-days", top.checks());
            rule = section.word("rule", MISSING_DAY_RULES, List.of()).orElse(rule);
            section.finish();
        }
        tree.put("rule", rule);
        return rule;
    }

    /** Texts of a list, each once. */
    static List<String> names(YamlValue value, String key, YamlChecks checks, String form, String accepted) {
        List<String> names = new ArrayList<>();
        Set<String> seen = new HashSet<>();
        for (YamlValue item : checks.items(value, key)) {
            checks.text(item, key).ifPresent(name -> {
                if (!name.matches(form)) {
                    checks.problem(item, key, "'" + name + "' is not " + accepted, "");
                } else if (!seen.add(name)) {
                    checks.problem(item, key, "'" + name + "' is given twice", "Keep one of the two");
                } else {
                    names.add(name);
                }
            });
        }
        return names;
    }
}
