package org.wintersill.io.cultivar;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlValue;

/**
 * Writes out entries that stand on a built-in cultivar: the keys of the entry go before those of the cultivar.
 *
 * <p>An entry that changes the numbers of a published cultivar must name a source and a status of its own; times of bud stages, variants,
 * distances of LT10 and LT90 and the like may be added freely, and the source says that stages were placed by the file.
 */
final class BuiltInReference {
    static final String KEY = "built-in";
    private static final String AFTER_BUDBREAK = "after-budbreak";
    private static final Set<String> FREE = Set.of(KEY, "id", "name", "species", "organ", "outside", "dates", "degree-days", "before-first",
            "variants", "tolerance", "spread", "lt10-above", "lt90-below", "start", AFTER_BUDBREAK);

    private final YamlChecks checks;

    BuiltInReference(YamlChecks checks) {
        this.checks = checks;
    }

    /** The entry with everything it refers to; the entry itself where it refers to nothing, and after a problem. */
    YamlValue writtenOut(YamlValue entry) {
        if (!(entry instanceof YamlValue.Mapping mapping)) {
            return entry;
        }
        YamlValue.Mapping whole = mapping.entries().containsKey(KEY) ? standingOn(mapping) : mapping;
        if (!(whole.entries().get(AFTER_BUDBREAK) instanceof YamlValue.Mapping after) || !after.entries().containsKey(KEY)) {
            return whole;
        }
        YamlValue.Mapping base = base(after);
        if (base == null) {
            return whole.with(AFTER_BUDBREAK, without(after), whole.keyPlaces().get(AFTER_BUDBREAK));
        }
        YamlValue.Mapping stages = new YamlValue.Mapping(base.entries().containsKey("stages")
                ? Map.of("stages", base.entries().get("stages")) : Map.of(), Map.of(), base.place());
        return withSource(whole.with(AFTER_BUDBREAK, over(stages, after), whole.keyPlaces().get(AFTER_BUDBREAK)),
                "; stages after budbreak: " + BuiltInCultivars.text(base, "source") + ", times of the stages by the cultivar file");
    }

    private YamlValue.Mapping standingOn(YamlValue.Mapping entry) {
        YamlValue.Mapping base = base(entry);
        if (base == null) {
            return without(entry);
        }
        Set<String> own = new TreeSet<>(entry.entries().keySet());
        own.removeAll(FREE);
        boolean told = own.removeAll(List.of("source", "status")) && entry.entries().containsKey("source")
                && entry.entries().containsKey("status");
        if (!own.isEmpty() && !told) {
            checks.problem(entry.keyPlaces().get(own.iterator().next()), "", String.join(", ", own) + " of the built-in cultivar "
                    + BuiltInCultivars.text(base, "id") + " is changed, so its source and status no longer hold",
                    "Give source and status of your numbers");
        }
        YamlValue.Mapping whole = over(base, entry);
        boolean placed = entry.entries().containsKey("dates") || entry.entries().containsKey("degree-days");
        return placed && !entry.entries().containsKey("source") ? withSource(whole, "; times of the stages by the cultivar file") : whole;
    }

    private YamlValue.Mapping base(YamlValue.Mapping entry) {
        YamlValue value = entry.entries().get(KEY);
        String id = value instanceof YamlValue.Text text ? text.text() : "";
        YamlValue.Mapping base = BuiltInCultivars.mappings().get(id);
        if (base == null) {
            checks.problem(value, KEY, "there is no built-in cultivar " + YamlChecks.found(value), BuiltInCultivars.remedy(id));
        }
        return base;
    }

    private static YamlValue.Mapping without(YamlValue.Mapping entry) {
        Map<String, YamlValue> entries = new LinkedHashMap<>(entry.entries());
        Map<String, String> places = new LinkedHashMap<>(entry.keyPlaces());
        entries.remove(KEY);
        places.remove(KEY);
        return new YamlValue.Mapping(entries, places, entry.place());
    }

    private static YamlValue.Mapping over(YamlValue.Mapping base, YamlValue.Mapping entry) {
        Map<String, YamlValue> entries = new LinkedHashMap<>(base.entries());
        Map<String, String> places = new LinkedHashMap<>(base.keyPlaces());
        entries.putAll(entry.entries());
        places.putAll(entry.keyPlaces());
        entries.remove(KEY);
        places.remove(KEY);
        return new YamlValue.Mapping(entries, places, entry.place());
    }

    private static YamlValue.Mapping withSource(YamlValue.Mapping entry, String addition) {
        return entry.entries().get("source") instanceof YamlValue.Text source
                ? entry.with("source", new YamlValue.Text(source.text() + addition, true, source.place()), entry.keyPlaces().get("source"))
                : entry;
    }
}
