package org.wintersill.config;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.wintersill.elevation.Inversion;
import org.wintersill.elevation.LapseRates;
import org.wintersill.elevation.StableNights;
import org.wintersill.elevation.TargetTerms;
import org.wintersill.elevation.WaterWarming;
import org.wintersill.elevation.terrain.ColdPools;
import org.wintersill.elevation.terrain.Window;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.time.MonthDay;

/** Reads what {@code elevation} adds to a night beside the height: {@code cold-pool}, {@code water} and {@code offsets}. */
final class NightTermsSection {
    private static final double STRENGTH = 4;
    private static final double DEPTH = 60;
    private static final double RADIUS = 1000;
    private static final double RISE = 10;
    private static final String PRIOR = "prior";
    private static final String NEVER = "never";
    private static final List<String> HOLLOW_KEYS = List.of("strength", "depth", "radius", "window", "index", "resolved");
    private static final List<String> INVERSION_KEYS = List.of("top", "rise", "free-lapse");
    private static final List<String> POLYGON_ENDINGS = List.of(".gpkg", ".geojson", ".json", ".shp");

    private final InputFinder finder;

    NightTermsSection(InputFinder finder) {
        this.finder = finder;
    }

    /** The pools; empty if something about them is wrong. */
    Optional<ColdPoolConfig> coldPool(YamlSection section, Map<String, Object> tree) {
        String form = section.word("form", List.of("hollows", "inversion"), List.of()).orElse("hollows");
        tree.put("form", form);
        boolean byForm = form.equals("hollows");
        for (String key : byForm ? INVERSION_KEYS : HOLLOW_KEYS) {
            if (section.value(key).isPresent()) {
                section.problem(key, "the key " + section.path(key) + " does not go with form: " + form, "Remove it, or write form: "
                        + (byForm ? "inversion" : "hollows"));
            }
        }
        Optional<ColdPools> hollows = byForm ? Optional.of(hollows(section, tree)) : Optional.empty();
        Optional<Inversion> inversion = byForm ? Optional.empty() : inversion(section, tree);
        boolean evenIfResolved = byForm && word(section, "resolved", List.of("refuse", "add"), tree).equals("add");
        boolean everyNight = word(section, "nights", List.of("stable", "all"), tree).equals("all");
        StableNights.ByRange range = range(section, tree);
        Optional<Double> reference = section.value("reference-lapse").filter(value -> !isWord(value, PRIOR))
                .flatMap(value -> section.checks().number(value, section.path("reference-lapse"), -7, LapseRates.HIGHEST,
                        PRIOR + ", or K per km from -7 to " + LapseRates.HIGHEST));
        tree.put("reference-lapse", reference.<Object>map(rate -> rate).orElse(PRIOR));
        section.finish();
        return byForm || inversion.isPresent()
                ? Optional.of(new ColdPoolConfig(hollows, inversion, everyNight, range, reference, evenIfResolved)) : Optional.empty();
    }

    private static ColdPools hollows(YamlSection section, Map<String, Object> tree) {
        double strength = number(section, "strength", 0, 20, "K from 0 to 20; 2 to 6 are typical", STRENGTH, tree);
        double depth = number(section, "depth", 1, 1000, "m from 1 to 1000; 30 to 100 are typical", DEPTH, tree);
        double radius = number(section, "radius", 1, 50_000, "m from 1 to 50000; about half the distance from ridge to valley", RADIUS, tree);
        String window = word(section, "window", List.of("disc", "square"), tree);
        String index = word(section, "index", List.of("percentile", "class"), tree);
        return new ColdPools(strength, depth, new Window(Window.Shape.valueOf(window.toUpperCase(Locale.ROOT)), radius), index.equals("class"));
    }

    private static Optional<Inversion> inversion(YamlSection section, Map<String, Object> tree) {
        Optional<Double> top = section.required("top", "Give the height of the inversion's top in m")
                .flatMap(value -> section.checks().number(value, section.path("top"), -500, 9000, "m from -500 to 9000"));
        top.ifPresent(metres -> tree.put("top", metres));
        double rise = number(section, "rise", 0.1, 100, "K per km from 0.1 to 100, warmer upwards", RISE, tree);
        double free = number(section, "free-lapse", LapseRates.LOWEST, LapseRates.HIGHEST, "K per km from -8 to 9.8", LapseRates.DEFAULT, tree);
        return top.map(metres -> new Inversion(metres, rise, free));
    }

    private static StableNights.ByRange range(YamlSection section, Map<String, Object> tree) {
        Optional<List<Double>> limits = section.value("range").flatMap(value -> section.checks().numbers(value, section.path("range"), 2,
                0, 60, "two ranges in K: no pool up to the first, a full one from the second"));
        double none = limits.map(list -> list.get(0)).orElse(StableNights.ByRange.NONE);
        double full = limits.map(list -> list.get(1)).orElse(StableNights.ByRange.FULL);
        if (!(none < full)) {
            section.problem("range", limits.orElseThrow() + " does not ascend", "Give the range in K at which no pool forms, then that of "
                    + "a full one, such as [5, 15]");
            full = none + 1;
        }
        tree.put("range", List.of(none, full));
        return new StableNights.ByRange(none, full);
    }

    /** The water; empty if something about it is wrong. */
    Optional<WaterConfig> water(YamlSection section, Map<String, Object> tree) {
        Map<String, Object> maskTree = new LinkedHashMap<>();
        Optional<YamlValue> mask = section.required("mask", "Name a raster with 1 on water, or a GeoPackage, GeoJSON or Shapefile of its outlines");
        boolean outlines = mask.filter(NightTermsSection::isPolygonFile).isPresent();
        Optional<PolygonEntry> polygons = mask.filter(value -> outlines).flatMap(value -> finder.polygons(value, section.path("mask"), maskTree));
        Optional<FileEntry> raster = mask.filter(value -> !outlines).flatMap(value -> finder.heights(value, section.path("mask"), maskTree));
        tree.put("mask", InputFinder.shortest(maskTree, "file"));
        double warming = number(section, "warming", 0, 20, "K from 0 to 20", WaterWarming.DEFAULT_WARMING, tree);
        double reach = number(section, "reach-km", 0.01, 1000, "km from 0.01 to 1000", WaterWarming.DEFAULT_REACH / 1000, tree);
        Optional<TargetTerms.FrozenPeriod> frozen = section.value("frozen").filter(value -> !isWord(value, NEVER))
                .flatMap(value -> section.checks().parsed(value, section.path("frozen"), NightTermsSection::period,
                        NEVER + ", or two days such as 12-20..03-10"));
        tree.put("frozen", frozen.map(period -> period.from() + ".." + period.to()).orElse(NEVER));
        section.finish();
        return polygons.isEmpty() && raster.isEmpty() ? Optional.empty()
                : Optional.of(new WaterConfig(raster, polygons, warming, 1000 * reach, frozen.orElse(TargetTerms.FrozenPeriod.NEVER)));
    }

    private static boolean isPolygonFile(YamlValue value) {
        YamlValue file = value instanceof YamlValue.Mapping mapping ? mapping.entries().get("file") : value;
        return file instanceof YamlValue.Text text
                && POLYGON_ENDINGS.stream().anyMatch(ending -> text.text().toLowerCase(Locale.ROOT).endsWith(ending));
    }

    private static TargetTerms.FrozenPeriod period(String text) {
        String[] ends = text.split("\\.\\.", -1);
        if (ends.length != 2) {
            throw new IllegalArgumentException(text);
        }
        return new TargetTerms.FrozenPeriod(MonthDay.parse(ends[0]), MonthDay.parse(ends[1]));
    }

    /** Sum of the offsets, K. */
    double offsets(Optional<YamlSection> given, Map<String, Object> tree) {
        double sum = 0;
        for (String name : List.of("exposed-bud", "site")) {
            double offset = given.flatMap(section -> section.number(name, -10, 10, "K from -10 to 10")).orElse(0.0);
            tree.put(name, offset);
            sum += offset;
        }
        given.ifPresent(YamlSection::finish);
        return sum;
    }

    private static double number(YamlSection section, String key, double lowest, double highest, String accepted, double standard,
                                 Map<String, Object> tree) {
        double value = section.number(key, lowest, highest, accepted).orElse(standard);
        tree.put(key, value);
        return value;
    }

    /** One of some words, the first if nothing is said. */
    private static String word(YamlSection section, String key, List<String> accepted, Map<String, Object> tree) {
        String word = section.word(key, accepted, List.of()).orElse(accepted.get(0));
        tree.put(key, word);
        return word;
    }

    private static boolean isWord(YamlValue value, String word) {
        return YamlChecks.isText(value) && value instanceof YamlValue.Text text && text.text().equals(word);
    }
}
