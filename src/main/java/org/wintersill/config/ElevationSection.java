package org.wintersill.config;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.elevation.LapseRates;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code elevation}. */
final class ElevationSection {
    private static final String DEM_MEAN = "dem-mean";
    private static final String ACCEPTED = "K per km from -8 to 9.8, positive where higher is colder";

    private final InputFinder finder;
    private final YamlChecks checks;

    ElevationSection(InputFinder finder, YamlChecks checks) {
        this.finder = finder;
        this.checks = checks;
    }

    /** The adjustment; empty if something about it is wrong. */
    Optional<ElevationConfig> read(YamlSection section, Map<String, Object> tree) {
        Map<String, Object> demTree = new LinkedHashMap<>();
        Optional<FileEntry> dem = section.required("dem", "Name the terrain model, or leave elevation out to stay on the grid of "
                + "the temperatures").flatMap(value -> finder.heights(value, section.path("dem"), demTree));
        tree.put("dem", InputFinder.shortest(demTree, "file"));
        Optional<FileEntry> sourceHeight = section.value("source-height").flatMap(value -> sourceHeight(value, section, tree));
        tree.putIfAbsent("source-height", DEM_MEAN);
        Optional<double[]> rates = section.value("lapse-rate").map(value -> lapseRates(value, section.path("lapse-rate")))
                .orElse(Optional.of(everyMonth(LapseRates.DEFAULT)));
        rates.ifPresent(values -> tree.put("lapse-rate", tree(values)));
        section.later("cold-pool", "water");
        section.finish();
        return dem.flatMap(file -> rates.map(values -> new ElevationConfig(file, sourceHeight, values)));
    }

    private Optional<FileEntry> sourceHeight(YamlValue value, YamlSection section, Map<String, Object> tree) {
        if (value instanceof YamlValue.Text text && text.text().equals(DEM_MEAN)) {
            return Optional.empty();
        }
        Map<String, Object> fileTree = new LinkedHashMap<>();
        Optional<FileEntry> file = finder.heights(value, section.path("source-height"), fileTree);
        tree.put("source-height", InputFinder.shortest(fileTree, "file"));
        return file;
    }

    private Optional<double[]> lapseRates(YamlValue value, String key) {
        double lowest = LapseRates.LOWEST;
        double highest = LapseRates.HIGHEST;
        if (value instanceof YamlValue.Mapping) {
            checks.problem(value, key, "a method of lapse rates is not known to this version", "Give one number or twelve, in "
                    + ACCEPTED);
            return Optional.empty();
        }
        if (value instanceof YamlValue.Sequence sequence) {
            if (sequence.items().size() != 12) {
                checks.problem(value, key, "one lapse rate or twelve (January to December) are needed, found "
                        + sequence.items().size(), "");
                return Optional.empty();
            }
            return checks.numbers(value, key, 12, lowest, highest, ACCEPTED)
                    .map(list -> list.stream().mapToDouble(Double::doubleValue).toArray());
        }
        return checks.number(value, key, lowest, highest, ACCEPTED).map(ElevationSection::everyMonth);
    }

    private static double[] everyMonth(double rate) {
        double[] rates = new double[12];
        Arrays.fill(rates, rate);
        return rates;
    }

    private static Object tree(double[] rates) {
        List<Double> list = Arrays.stream(rates).boxed().toList();
        return list.stream().distinct().count() == 1 ? list.get(0) : list;
    }
}
