package org.wintersill.config;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BiFunction;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code statistics}. */
final class StatisticsSection {
    private static final List<Integer> RETURN_PERIODS = List.of(10, 50, 100);
    private static final int LONGEST_PERIOD = 1000;
    private static final int MOST_REPLICATES = 10_000;
    private static final int MOST_SEED = 1_000_000_000;

    private StatisticsSection() {
    }

    /** @param levels percents of organs killed that the run keeps margins for */
    static StatisticsConfig read(YamlSection section, List<Integer> levels, Map<String, Object> tree) {
        double interval = section.number("interval", 0.5, 0.999, "from 0.5 to 0.999, such as 0.90").orElse(0.90);
        String bounds = section.word("bounds", List.of("jeffreys", "wilson"), List.of()).orElse("jeffreys");
        List<Double> targets = list(section, "target", (value, key) -> section.checks().number(value, key, 0, 0.999,
                "a frequency from 0 to below 1, such as 0.10"), "Give a frequency such as 0.10, or several").orElse(List.of(0.10));
        String rule = section.word("rule", List.of("frequency", "quantile", "expected-damage"), List.of()).orElse("frequency");
        if (rule.equals("expected-damage") && targets.contains(0.0)) {
            section.problem("target", "an expected damage of 0 needs endless hardiness", "Give a share above 0, or another rule");
        }
        if (rule.equals("expected-damage") && levels.stream().noneMatch(level -> level != 50)) {
            section.problem("rule", "the spread of the tolerance curve is needed for an expected damage, and damage.levels has 50 alone",
                    "Add a level to damage.levels, such as 10 or 90, or choose another rule");
        }
        String extremes = section.word("extremes", List.of("auto", "none", "l-moments", "maximum-likelihood"), List.of()).orElse("auto");
        List<Integer> periods = list(section, "return-periods", (value, key) -> section.checks().whole(value, key, 2, LONGEST_PERIOD),
                "Give whole numbers of winters such as [10, 50, 100]").orElse(RETURN_PERIODS).stream().sorted().toList();
        Optional<YamlSection> bootstrap = section.section("bootstrap");
        int replicates = bootstrap.flatMap(inner -> inner.whole("replicates", 20, MOST_REPLICATES)).orElse(200);
        int seed = bootstrap.flatMap(inner -> inner.whole("seed", 0, MOST_SEED)).orElse(1);
        bootstrap.ifPresent(YamlSection::finish);
        Optional<YamlSection> trend = section.section("trend");
        double falseDiscovery = trend.flatMap(inner -> inner.number("false-discovery", 0.001, 0.5, "a share from 0.001 to 0.5"))
                .orElse(0.10);
        trend.ifPresent(YamlSection::finish);
        double coldNight = section.number("cold-night", -60, 10, "degrees Celsius from -60 to 10, such as -15").orElse(-15.0);
        section.finish();
        tree.put("interval", interval);
        tree.put("bounds", bounds);
        tree.put("target", targets.size() == 1 ? targets.get(0) : targets);
        tree.put("rule", rule);
        tree.put("extremes", extremes);
        tree.put("return-periods", periods);
        Map<String, Object> draws = new LinkedHashMap<>();
        draws.put("replicates", replicates);
        draws.put("seed", seed);
        tree.put("bootstrap", draws);
        tree.put("cold-night", coldNight);
        tree.put("trend", Map.of("false-discovery", falseDiscovery));
        return new StatisticsConfig(interval, bounds, targets, rule, extremes, periods, replicates, seed, coldNight, falseDiscovery);
    }

    /** One value or a list of them, each once; empty where the key is not given or nothing of it is right. */
    private static <T> Optional<List<T>> list(YamlSection section, String key, BiFunction<YamlValue, String, Optional<T>> reader,
                                              String remedy) {
        return section.value(key).map(value -> {
            List<T> list = new ArrayList<>();
            List<YamlValue> items = section.checks().items(value, section.path(key));
            if (items.isEmpty() && value instanceof YamlValue.Sequence) {
                section.problem(key, "the list is empty", remedy);
            }
            for (YamlValue item : items) {
                reader.apply(item, section.path(key)).ifPresent(read -> {
                    if (list.contains(read)) {
                        section.checks().problem(item, section.path(key), read + " is given twice", "Keep one of the two");
                    } else {
                        list.add(read);
                    }
                });
            }
            return list;
        }).filter(list -> !list.isEmpty());
    }
}
