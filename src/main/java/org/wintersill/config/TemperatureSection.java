package org.wintersill.config;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;

/** Reads {@code temperature}. */
final class TemperatureSection {
    private static final Set<String> ENDINGS = Set.of(".nc", ".nc4", ".cdf", ".netcdf", ".tif", ".tiff");
    private static final Pattern DATE = Pattern.compile("(\\d{4})-(\\d{2})-(\\d{2})");
    /** One or more of the date letters, with anything that is no letter in between. */
    private static final Pattern DATE_PATTERN = Pattern.compile("[^A-Za-z]*(yyyy)[^A-Za-z]*((MM[^A-Za-z]*(dd)?)|DDD)[^A-Za-z]*");
    /** Bounds of the daily range, K: none on earth is outside of them; project choice. */
    private static final double SMALLEST_RANGE = 0.5;
    private static final double LARGEST_RANGE = 60;
    private static final String ACCEPTED_DATES = "a pattern such as yyyyMMdd, yyyy_MM or yyyyDDD";

    private final InputFinder finder;
    private final YamlChecks checks;

    TemperatureSection(InputFinder finder, YamlChecks checks) {
        this.finder = finder;
        this.checks = checks;
    }

    /** What may stand at one entry or, for all entries, beside them. */
    private record Words(Optional<String> variable, Optional<String> unit, Optional<String> member, Optional<String> dates) {
        Words orElse(Words other) {
            return new Words(variable.or(other::variable), unit.or(other::unit), member.or(other::member), dates.or(other::dates));
        }
    }

    /** The entries; empty if there is no usable minimum. */
    Optional<TemperatureConfig> read(YamlSection section, Map<String, Object> tree) {
        Optional<YamlValue> minimum = section.required("minimum", "Say where the daily minima are, for example minimum: tmin-*.nc");
        Optional<YamlValue> maximum = section.value("maximum");
        Optional<YamlValue> mean = section.value("mean");
        Words forAll = words(section);
        Optional<Double> range = section.number("daily-range", SMALLEST_RANGE, LARGEST_RANGE, "a difference in K between "
                + SMALLEST_RANGE + " and " + LARGEST_RANGE);
        section.finish();
        if (maximum.isPresent() && mean.isPresent()) {
            section.problem("mean", "maximum and mean are both given", "Keep one of the two; the mean is used as it is");
        }
        if (range.isPresent() && (maximum.isPresent() || mean.isPresent())) {
            section.problem("daily-range", "daily-range and " + (maximum.isPresent() ? "maximum" : "mean") + " are both given",
                    "Keep one of the two; with files the daily range is not needed");
        }
        Optional<TemperatureEntry> minima = minimum.flatMap(value -> entry(value, section, ForcingVariable.MINIMUM.word(), ForcingVariable.MINIMUM, forAll, tree));
        Optional<TemperatureEntry> maxima = maximum.flatMap(value -> entry(value, section, ForcingVariable.MAXIMUM.word(), ForcingVariable.MAXIMUM, forAll, tree));
        Optional<TemperatureEntry> means = mean.flatMap(value -> entry(value, section, ForcingVariable.MEAN.word(), ForcingVariable.MEAN, forAll, tree));
        range.ifPresent(number -> tree.put("daily-range", number));
        return minima.map(entry -> new TemperatureConfig(entry, maxima, means, range));
    }

    /** One entry by itself. */
    Optional<TemperatureEntry> entry(YamlValue.Mapping value, ForcingVariable forcing) {
        Words nothing = new Words(Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
        return entry(value, new YamlSection(value, "", checks), forcing.word(), forcing, nothing, new LinkedHashMap<>());
    }

    /** The entry of a key of another section. */
    Optional<TemperatureEntry> entry(YamlValue value, YamlSection parent, String key, ForcingVariable forcing, Map<String, Object> tree) {
        Words nothing = new Words(Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
        return entry(value, parent, key, forcing, nothing, tree);
    }

    private Optional<TemperatureEntry> entry(YamlValue value, YamlSection parent, String name, ForcingVariable forcing, Words forAll,
                                             Map<String, Object> parentTree) {
        String key = parent.path(name);
        YamlValue.Mapping mapping = value instanceof YamlValue.Mapping given ? given
                : YamlValue.Mapping.empty(value.place()).with("files", value, value.place());
        YamlSection section = new YamlSection(mapping, key, checks);
        String filesKey = value == mapping ? section.path("files") : key;
        InputFinder.Files files = section.required("files", "Name the files")
                .map(given -> finder.files(given, filesKey, ENDINGS, true)).orElse(new InputFinder.Files(List.of(), List.of()));
        Words words = words(section).orElse(forAll);
        Optional<Double> scale = section.number("scale", -1e9, 1e9, "a number other than 0");
        if (scale.isPresent() && scale.get() == 0) {
            section.problem("scale", "a scale of 0 makes every value the same", "Give the factor on the stored values, such as 0.1");
        }
        Optional<Double> offset = section.number("offset", -1e9, 1e9, "any number");
        Optional<CfDate> firstDay = section.value("first-day").flatMap(day ->
                checks.parsed(day, section.path("first-day"), TemperatureSection::date, "a date such as 2019-12-01"));
        Optional<String> crs = InputFinder.crs(section);
        section.finish();
        if (words.dates().isPresent() && firstDay.isPresent()) {
            section.problem("first-day", "dates and first-day are both given",
                    "Keep dates where the date is in the file name, first-day where one file holds many days");
        }
        parentTree.put(name, tree(files, words, scale, offset, firstDay, crs));
        if (files.files().isEmpty()) {
            return Optional.empty();
        }
        TemperatureRequest request = new TemperatureRequest(forcing, words.variable(),
                words.unit().flatMap(TemperatureUnit::parse), scale, offset, words.dates(), firstDay, words.member(), crs);
        return Optional.of(new TemperatureEntry(String.join(", ", files.given()), files.files(), request));
    }

    private static Object tree(InputFinder.Files files, Words words, Optional<Double> scale, Optional<Double> offset,
                               Optional<CfDate> firstDay, Optional<String> crs) {
        Map<String, Object> tree = new LinkedHashMap<>();
        tree.put("files", files.tree());
        words.variable().ifPresent(text -> tree.put("variable", text));
        words.unit().ifPresent(text -> tree.put("unit", text));
        scale.ifPresent(number -> tree.put("scale", number));
        offset.ifPresent(number -> tree.put("offset", number));
        words.dates().ifPresent(text -> tree.put("dates", text));
        firstDay.ifPresent(date -> tree.put("first-day", date.toString()));
        words.member().ifPresent(text -> tree.put("member", text));
        crs.ifPresent(text -> tree.put("crs", text));
        return InputFinder.shortest(tree, "files");
    }

    private Words words(YamlSection section) {
        Optional<String> unit = section.value("unit").flatMap(value -> unit(value, section.path("unit"), checks));
        Optional<String> dates = section.value("dates").flatMap(value ->
                checks.parsed(value, section.path("dates"), TemperatureSection::datePattern, ACCEPTED_DATES));
        return new Words(section.text("variable"), unit, section.text("member"), dates);
    }

    private static Optional<String> unit(YamlValue value, String key, YamlChecks checks) {
        return checks.text(value, key).filter(text -> {
            if (TemperatureUnit.parse(text).isEmpty()) {
                checks.problem(value, key, "'" + text + "' is not a unit of temperature; accepted: degC, K, degF", "");
                return false;
            }
            return true;
        }).map(text -> TemperatureUnit.parse(text).orElseThrow().symbol());
    }

    /** A date that some calendar may have: every month may have 30 days, as in the 360-day calendar. */
    static CfDate date(String text) {
        Matcher matcher = DATE.matcher(text.trim());
        if (!matcher.matches()) {
            throw new IllegalArgumentException(text);
        }
        MonthDay day = new MonthDay(Integer.parseInt(matcher.group(2)), Integer.parseInt(matcher.group(3)));
        return new CfDate(Integer.parseInt(matcher.group(1)), day.month(), day.day());
    }

    static String datePattern(String text) {
        if (!DATE_PATTERN.matcher(text).matches()) {
            throw new IllegalArgumentException(text);
        }
        return text;
    }
}
