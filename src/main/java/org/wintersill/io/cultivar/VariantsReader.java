package org.wintersill.io.cultivar;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.Variants;
import org.wintersill.hardiness.Variants.Variant;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;

/** Reads {@code variants}: {@code {sd: K}}, or a list of {@code {id, offset}} with the offset in K, negative for hardier. */
final class VariantsReader {
    /** K; farther from the species value it is another species (assumed). */
    private static final double FARTHEST = 30;
    private static final String KEY = "variants";

    private final YamlSection entry;
    private final YamlChecks checks;

    VariantsReader(YamlSection entry) {
        this.entry = entry;
        this.checks = entry.checks();
    }

    /** None where the key is not given, and after a problem. */
    Variants read() {
        Optional<YamlValue> given = entry.value(KEY);
        if (given.isEmpty()) {
            return Variants.none();
        }
        if (given.get() instanceof YamlValue.Sequence sequence) {
            return listed(sequence);
        }
        if (given.get() instanceof YamlValue.Mapping mapping) {
            YamlSection section = new YamlSection(mapping, KEY, checks);
            Optional<Double> sd = section.required("sd", "Write variants: {sd: 1.2} in K, or a list of {id: north, offset: -1.5}")
                    .flatMap(value -> checks.number(value, section.path("sd"), 0, FARTHEST, "K from 0 to 30"));
            section.finish();
            return sd.map(Variants::ofSd).orElse(Variants.none());
        }
        checks.problem(given.get(), KEY, "a spread or a list of variants is needed, found " + YamlChecks.found(given.get()),
                "Write variants: {sd: 1.2} in K, or a list of {id: north, offset: -1.5}");
        return Variants.none();
    }

    private Variants listed(YamlValue.Sequence sequence) {
        List<Variant> members = new ArrayList<>();
        Map<String, String> places = new HashMap<>();
        for (YamlValue item : sequence.items()) {
            YamlSection section = YamlSection.of(item, KEY, checks);
            Optional<String> id = section.required("id", "Give every variant an id").flatMap(value ->
                    checks.text(value, section.path("id"))).filter(text -> isFree(text, section, places));
            Optional<Double> offset = section.required("offset", "Give the offset from the species value in K; negative is hardier")
                    .flatMap(value -> checks.number(value, section.path("offset"), -FARTHEST, FARTHEST, "K from -30 to 30"));
            section.finish();
            id.ifPresent(name -> offset.ifPresent(shift -> members.add(new Variant(name, shift))));
        }
        if (sequence.items().size() < 2) {
            checks.problem(sequence, KEY, "at least 2 variants are needed, found " + sequence.items().size(),
                    "List more, or write variants: {sd: 1.2} in K");
        }
        return members.isEmpty() ? Variants.none() : Variants.of(members);
    }

    private static boolean isFree(String id, YamlSection section, Map<String, String> places) {
        if (!Cultivar.isId(id)) {
            section.problem("id", "'" + id + "' cannot be an id; accepted: lower-case letters, digits and single hyphens in between, "
                    + "at most " + Cultivar.LONGEST_ID, "");
            return false;
        }
        String other = places.putIfAbsent(id, section.place("id"));
        if (other != null) {
            section.problem("id", "the variant '" + id + "' is already listed at " + other, "Give every variant an id of its own");
        }
        return other == null;
    }
}
