package org.wintersill.io.cultivar;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.ModelParameters;
import org.wintersill.hardiness.Quantity;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.Notices;
import org.wintersill.time.MonthDay;

/** The parameters of a model in an entry of a YAML file, or in a part of an entry. */
final class YamlParameters implements ModelParameters {
    private static final MonthDay NO_DAY = new MonthDay(2, 30);

    private final YamlSection section;
    private final YamlChecks checks;
    private final String label;
    private final ToleranceCurve tolerance;
    private final Notices notices;
    private final Map<String, String> symbols;
    /** Parts that were handed out; their own keys are checked at the end too. */
    private final List<YamlParameters> parts = new ArrayList<>();
    private final Map<String, YamlParameters> partOfKey = new HashMap<>();

    YamlParameters(YamlSection section, String label, ToleranceCurve tolerance, Notices notices) {
        this(section, label, tolerance, notices, new HashMap<>());
    }

    private YamlParameters(YamlSection section, String label, ToleranceCurve tolerance, Notices notices, Map<String, String> symbols) {
        this.section = section;
        this.checks = section.checks();
        this.label = label;
        this.tolerance = tolerance;
        this.notices = notices;
        this.symbols = symbols;
    }

    /** Reports the keys that nobody asked for, here and in all parts. */
    void finish() {
        section.finish(symbols);
        parts.forEach(YamlParameters::finish);
    }

    @Override
    public String label() {
        return label;
    }

    @Override
    public ToleranceCurve tolerance() {
        return tolerance;
    }

    @Override
    public String place() {
        return section.place();
    }

    @Override
    public int problems() {
        return checks.problems().all().size();
    }

    @Override
    public boolean has(String key) {
        return section.value(key).isPresent();
    }

    @Override
    public Optional<Double> number(String key, Quantity quantity) {
        return section.number(key, quantity.lowest(), quantity.highest(), quantity.accepted());
    }

    @Override
    public Optional<Double> required(String key, Quantity quantity) {
        return section.required(key, "Give " + key + ": " + quantity.accepted()).flatMap(value -> checks.number(value, section.path(key),
                quantity.lowest(), quantity.highest(), quantity.accepted()));
    }

    @Override
    public Optional<List<Double>> numbers(String key, int count, Quantity quantity) {
        return section.value(key).flatMap(value -> checks.numbers(value, section.path(key), count, quantity.lowest(),
                quantity.highest(), quantity.accepted()));
    }

    @Override
    public Optional<Integer> whole(String key, int lowest, int highest) {
        return section.whole(key, lowest, highest);
    }

    @Override
    public Optional<String> requiredText(String key, String remedy) {
        return section.required(key, remedy).flatMap(value -> checks.text(value, section.path(key)));
    }

    @Override
    public Optional<String> word(String key, List<String> accepted) {
        return section.word(key, accepted, List.of());
    }

    @Override
    public Optional<MonthDay> date(String key) {
        return section.value(key).flatMap(value -> date(value, section.path(key)));
    }

    @Override
    public Optional<List<MonthDay>> dates(String key) {
        return section.value(key).flatMap(value -> {
            if (!(value instanceof YamlValue.Sequence sequence) || sequence.items().size() != 2) {
                checks.problem(value, section.path(key), "two dates are needed, found " + YamlChecks.found(value),
                        "Write for example " + key + ": [01-15, 02-20]");
                return Optional.empty();
            }
            List<MonthDay> dates = new ArrayList<>();
            sequence.items().forEach(item -> date(item, section.path(key)).ifPresent(dates::add));
            return dates.size() == 2 ? Optional.of(dates) : Optional.empty();
        });
    }

    private Optional<MonthDay> date(YamlValue value, String path) {
        return checks.monthDay(value, path).filter(day -> {
            if (day.equals(NO_DAY)) {
                checks.problem(value, path, "there is no 30 February", "Write 02-28 or 02-29");
                return false;
            }
            return true;
        });
    }

    @Override
    public Optional<ModelParameters> section(String key) {
        return section.value(key).map(value -> partOf(key, value));
    }

    @Override
    public Optional<ModelParameters> requiredSection(String key, String remedy) {
        return section.required(key, remedy).map(value -> partOf(key, value));
    }

    @Override
    public List<ModelParameters> requiredRows(String key, String remedy) {
        Optional<YamlValue> value = section.required(key, remedy);
        if (value.isPresent() && !(value.get() instanceof YamlValue.Sequence)) {
            checks.problem(value.get(), section.path(key), "a list of rows is needed, found " + YamlChecks.found(value.get()),
                    "Begin each row with '- {'");
            return List.of();
        }
        Function<YamlValue, ModelParameters> row = item -> part(YamlSection.of(item, section.path(key), checks));
        List<YamlValue> items = value.map(list -> ((YamlValue.Sequence) list).items()).orElse(List.of());
        if (value.isPresent() && items.isEmpty()) {
            checks.problem(value.get(), section.path(key), "the list is empty", remedy);
        }
        return items.stream().map(row).toList();
    }

    /** The same part however often it is asked for, so that no key of it is called unknown. */
    private YamlParameters partOf(String key, YamlValue value) {
        return partOfKey.computeIfAbsent(key, name -> part(YamlSection.of(value, section.path(name), checks)));
    }

    private YamlParameters part(YamlSection of) {
        YamlParameters part = new YamlParameters(of, label, tolerance, notices, symbols);
        parts.add(part);
        return part;
    }

    @Override
    public List<String> names() {
        return section.keys();
    }

    @Override
    public void symbols(Map<String, String> keys) {
        symbols.putAll(keys);
    }

    @Override
    public void problem(String key, String what, String remedy) {
        section.problem(key, what, remedy);
    }

    @Override
    public void notice(String text) {
        notices.add(text);
    }
}
