package org.wintersill.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The others of a comparison ordered by climate model and way of downscaling. */
final class ScenarioTable {
    private ScenarioTable() {
    }

    /**
     * One list a model, in it one run a method, in the order of the methods.
     *
     * @return empty where a model lacks a method or has one twice
     */
    static List<List<ComparisonRun.Other>> of(List<ComparisonRun.Other> others, List<String> methods) {
        Map<String, List<ComparisonRun.Other>> byModel = new LinkedHashMap<>();
        for (ComparisonRun.Other other : others) {
            String model = other.folder().configuration().get("scenario").get("member").text().orElse(other.name());
            byModel.computeIfAbsent(model, key -> new ArrayList<>()).add(other);
        }
        List<List<ComparisonRun.Other>> table = new ArrayList<>();
        for (List<ComparisonRun.Other> runs : byModel.values()) {
            List<ComparisonRun.Other> ordered = new ArrayList<>();
            for (String method : methods) {
                runs.stream().filter(other -> other.method().equals(method)).forEach(ordered::add);
            }
            if (ordered.size() != methods.size() || ordered.stream().map(ComparisonRun.Other::method).distinct().count() != methods.size()) {
                return List.of();
            }
            table.add(ordered);
        }
        return table;
    }
}
