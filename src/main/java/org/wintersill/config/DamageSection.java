package org.wintersill.config;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code damage}. */
final class DamageSection {
    private static final String WORST = "worst";
    private static final String CORRELATED = "correlated";
    private static final List<String> RULES = List.of(WORST, "independent", CORRELATED);
    /** As {@code damage.NightJoining} has it. */
    private static final double HIGHEST_CORRELATION = 0.99;
    /** Shares of the variance that are reckoned, not given. */
    private static final List<String> RECKONED = List.of("winter", "cultivar", "interaction");
    private static final double LARGEST_SD = 20;
    private static final double DEFAULT_NEIGHBOURHOOD_KM = 5;
    private static final double LARGEST_NEIGHBOURHOOD_KM = 500;

    private final YamlSection section;

    private DamageSection(YamlSection section) {
        this.section = section;
    }

    static DamageConfig read(YamlSection section, Map<String, Object> tree) {
        return new DamageSection(section).read(tree);
    }

    private DamageConfig read(Map<String, Object> tree) {
        YamlSection nights = section.value("nights").filter(value -> value instanceof YamlValue.Mapping)
                .map(value -> YamlSection.of(value, section.path("nights"), section.checks())).orElse(section);
        String key = nights == section ? "nights" : "rule";
        String rule = nights.word(key, RULES, List.of()).orElse(WORST);
        double correlation = correlation(nights, rule);
        if (nights != section) {
            nights.finish();
        }
        List<Integer> levels = section.value("levels").map(this::levels).orElse(List.of(10, 50, 90));
        int killing = section.whole("killing", 1, 99).orElse(50);
        Map<String, Double> uncertainty = section.value("uncertainty").map(this::uncertainty).orElse(Map.of());
        double kilometres = section.number("neighbourhood-km", 0, LARGEST_NEIGHBOURHOOD_KM, "km from 0 to 500")
                .orElse(DEFAULT_NEIGHBOURHOOD_KM);
        section.finish();
        if (!levels.isEmpty() && !levels.contains(killing)) {
            boolean given = section.value("killing").isPresent();
            section.problem(given ? "killing" : "levels", "a killing winter is one that kills " + killing
                    + " percent, which is not among the levels " + levels, given ? "Choose one of the levels, or add "
                    + killing + " to them" : "Add " + killing + " to the levels, or choose killing among them");
        }
        if (!rule.equals(WORST) && uncertainty.values().stream().anyMatch(sd -> sd > 0)) {
            section.problem("uncertainty", "uncertainty belongs to the worst night of a winter, and the nights are joined as " + rule,
                    "Leave uncertainty out, or write nights: worst");
        }
        tree.put("nights", rule);
        if (rule.equals(CORRELATED)) {
            tree.put("rho", correlation);
        }
        tree.put("levels", levels);
        tree.put("killing", killing);
        tree.put("uncertainty", uncertainty);
        tree.put("neighbourhood-km", kilometres);
        return new DamageConfig(rule, correlation, levels, killing, uncertainty, kilometres);
    }

    private static double correlation(YamlSection nights, String rule) {
        String accepted = "a correlation above 0 and up to " + HIGHEST_CORRELATION;
        Optional<Double> rho = nights.number("rho", Double.MIN_VALUE, HIGHEST_CORRELATION, accepted);
        boolean given = nights.value("rho").isPresent();
        if (rule.equals(CORRELATED) && !given) {
            nights.problem("rho", "correlated nights need their correlation rho", "Write nights: {rule: correlated, rho: 0.6} with "
                    + accepted + "; 0 would be independent, 1 worst");
        } else if (!rule.equals(CORRELATED) && given) {
            nights.problem("rho", "rho is given, and the nights are joined as " + rule, "Write nights: correlated, or leave rho out");
        }
        return rule.equals(CORRELATED) ? rho.orElse(HIGHEST_CORRELATION) : 0;
    }

    private List<Integer> levels(YamlValue value) {
        List<Integer> levels = new ArrayList<>();
        String key = section.path("levels");
        List<YamlValue> items = section.checks().items(value, key);
        for (YamlValue item : items) {
            section.checks().whole(item, key, 1, 99).ifPresent(level -> {
                if (levels.contains(level)) {
                    section.checks().problem(item, key, "the level " + level + " is given twice", "Keep one of the two");
                } else {
                    levels.add(level);
                }
            });
        }
        if (items.isEmpty() && value instanceof YamlValue.Sequence) {
            section.problem("levels", "the list is empty", "Give percents of organs killed, such as [10, 50, 90]");
        }
        return levels.stream().sorted().toList();
    }

    private Map<String, Double> uncertainty(YamlValue value) {
        String path = section.path("uncertainty");
        Map<String, Double> components = new LinkedHashMap<>();
        if (!(value instanceof YamlValue.Mapping mapping)) {
            section.checks().problem(value, path, "named components are needed, found " + YamlChecks.found(value),
                    "Write uncertainty: {model: 1.0, site: 0.8}, standard deviations in K");
            return components;
        }
        mapping.entries().forEach((name, sd) -> {
            if (!name.matches("[a-z][a-z0-9]*(-[a-z0-9]+)*") || RECKONED.contains(name)) {
                section.checks().problem(sd, path, "'" + name + "' cannot name a component", RECKONED.contains(name)
                        ? "That part of the variance is reckoned from the margins" : "Use lower-case letters, digits and single hyphens");
            } else {
                section.checks().number(sd, path + "." + name, 0, LARGEST_SD, "a standard deviation in K from 0 to 20")
                        .ifPresent(known -> components.put(name, known));
            }
        });
        return components;
    }
}
