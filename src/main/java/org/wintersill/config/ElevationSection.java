package org.wintersill.config;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.LocalLapse;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code elevation}. */
final class ElevationSection {
    private static final String DEM_MEAN = "dem-mean";
    private static final String DAILY_LOCAL = "daily-local";
    private static final String STANDARD = "standard-atmosphere";
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
        Optional<Lapse> lapse = section.value("lapse-rate").map(value -> lapse(value, section.path("lapse-rate"), tree))
                .orElseGet(() -> constant(Optional.of(everyMonth(LapseRates.DEFAULT)), tree));
        NightTermsSection terms = new NightTermsSection(finder);
        Optional<ColdPoolConfig> coldPool = section.section("cold-pool").flatMap(part -> terms.coldPool(part, tree(tree, "cold-pool")));
        Optional<WaterConfig> water = section.section("water").flatMap(part -> terms.water(part, tree(tree, "water")));
        double offset = terms.offsets(section.section("offsets"), tree(tree, "offsets"));
        section.finish();
        return dem.flatMap(file -> lapse.map(rates -> new ElevationConfig(file, sourceHeight, rates.byMonth(), rates.local(), coldPool, water,
                offset)));
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

    /** Rates by month, and how they are fitted to each night where they are. */
    private record Lapse(double[] byMonth, Optional<LocalLapseConfig> local) {
    }

    private static Map<String, Object> tree(Map<String, Object> tree, String key) {
        Map<String, Object> part = new LinkedHashMap<>();
        tree.put(key, part);
        return part;
    }

    private static Optional<Lapse> constant(Optional<double[]> rates, Map<String, Object> tree) {
        rates.ifPresent(values -> tree.put("lapse-rate", tree(values)));
        return rates.map(values -> new Lapse(values, Optional.empty()));
    }

    private Optional<Lapse> lapse(YamlValue value, String key, Map<String, Object> tree) {
        if (value instanceof YamlValue.Text text && text.text().equals(STANDARD)) {
            tree.put("lapse-rate", STANDARD);
            return Optional.of(new Lapse(everyMonth(LapseRates.STANDARD_ATMOSPHERE), Optional.empty()));
        }
        return value instanceof YamlValue.Mapping mapping ? local(new YamlSection(mapping, key, checks), tree(tree, "lapse-rate"))
                : constant(lapseRates(value, key), tree);
    }

    private Optional<Lapse> local(YamlSection section, Map<String, Object> tree) {
        section.required("method", "Write method: " + DAILY_LOCAL + ", or one lapse rate instead of the map");
        section.word("method", List.of(DAILY_LOCAL), List.of());
        double radius = section.number("radius-km", 1, 2000, "km from 1 to 2000").orElse(LocalLapse.DEFAULT_RADIUS / 1000);
        Optional<double[]> prior = section.value("prior").map(value -> lapseRates(value, section.path("prior")))
                .orElse(Optional.of(everyMonth(LapseRates.DEFAULT)));
        double sd = section.number("prior-sd", 0.01, 100, "K per km from 0.01 to 100").orElse(LocalLapse.DEFAULT_PRIOR_SD);
        section.finish();
        tree.put("method", DAILY_LOCAL);
        tree.put("radius-km", radius);
        prior.ifPresent(values -> tree.put("prior", tree(values)));
        tree.put("prior-sd", sd);
        return prior.map(values -> new Lapse(values, Optional.of(new LocalLapseConfig(1000 * radius, sd))));
    }

    private Optional<double[]> lapseRates(YamlValue value, String key) {
        double lowest = LapseRates.LOWEST;
        double highest = LapseRates.HIGHEST;
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
