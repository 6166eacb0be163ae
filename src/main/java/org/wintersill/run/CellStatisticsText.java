package org.wintersill.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.layer.LayerStyle;
import org.wintersill.run.CellStatistics.CultivarStatistics;
import org.wintersill.run.CellStatistics.Fit;
import org.wintersill.run.CellStatistics.Value;

/** A cell's statistics as a table for people, as CSV, and as the part of a JSON document. */
public final class CellStatisticsText {
    private static final String LOWER = "-lower";
    private static final String UPPER = "-upper";

    private CellStatisticsText() {
    }

    /** The table: each layer with its bounds, then the likelihood fits. */
    public static String table(CellStatistics statistics) {
        StringBuilder text = new StringBuilder();
        line(text, "Statistics over %d winters; bounds enclose %s %%", statistics.winters(), number(100 * statistics.interval()));
        if (statistics.winters() < ExtremeFit.FEWEST_WINTERS) {
            line(text, "No extreme value distribution is fitted to fewer than %d winters: nothing here says what one winter in 50 or 100 is like.",
                    ExtremeFit.FEWEST_WINTERS);
        }
        part(text, "Minimum", statistics.shared(), statistics.minimum());
        for (CultivarStatistics cultivar : statistics.cultivars()) {
            part(text, cultivar.cultivar().name(), cultivar.values(), cultivar.margin());
        }
        line(text, "");
        line(text, "%s", Caution.of(statistics.cultivars().stream().map(CultivarStatistics::cultivar).toList()));
        return text.toString();
    }

    private static void part(StringBuilder text, String heading, List<Value> values, Optional<Fit> fit) {
        line(text, "");
        line(text, "%s", heading);
        Map<String, Value> byId = byId(values);
        for (Value value : values) {
            String id = value.layer().id();
            if (isBound(id, byId)) {
                continue;
            }
            String bounds = bounds(byId.get(id + LOWER), byId.get(id + UPPER));
            line(text, "  %-30s %10s %-11s %s", id, said(value), value.layer().unit().equals("1") ? "" : value.layer().unit(), bounds);
        }
        fit.ifPresent(known -> {
            line(text, "  maximum likelihood, profile intervals: xi %s (%s to %s), log-likelihood %s", number(known.gev().shape()),
                    number(known.shape()[0]), number(known.shape()[1]), number(known.logLikelihood()));
            known.levels().forEach((period, level) -> line(text, "    one winter in %-4d %8s (%s to %s)", period, number(level[0]),
                    number(level[1]), number(level[2])));
        });
    }

    private static Map<String, Value> byId(List<Value> values) {
        return values.stream().collect(Collectors.toMap(value -> value.layer().id(), Function.identity()));
    }

    /** Whether a layer is the bound of another one. */
    private static boolean isBound(String id, Map<String, Value> byId) {
        return (id.endsWith(LOWER) || id.endsWith(UPPER)) && byId.containsKey(id.substring(0, id.lastIndexOf('-')));
    }

    private static String bounds(Value lower, Value upper) {
        if (lower == null && upper == null) {
            return "";
        }
        return upper == null ? "hardly below " + said(lower) : "(" + end(lower) + " to " + end(upper) + ")";
    }

    private static String end(Value bound) {
        return Float.isNaN(bound.value()) ? "no bound" : said(bound);
    }

    private static String said(Value value) {
        if (Float.isNaN(value.value())) {
            return "-";
        }
        if (value.layer().style() instanceof LayerStyle.Classes classes) {
            return classes.entries().stream().filter(entry -> entry.code() == Math.round(value.value())).findFirst()
                    .map(LayerStyle.Entry::name).orElse("-");
        }
        return number(value.value());
    }

    private static String number(double value) {
        if (Double.isInfinite(value)) {
            return value > 0 ? "no bound" : "-no bound";
        }
        return value == Math.rint(value) && Math.abs(value) < 1e6 ? Long.toString(Math.round(value)) : format("%.4g", value);
    }

    /** One row a layer; bounds stand in the row of their layer. */
    public static String csv(CellStatistics statistics) {
        CsvText csv = new CsvText("cultivar", "layer", "unit", "value", "lower", "upper", "winters");
        rows(csv, "", statistics.shared(), statistics.winters());
        statistics.cultivars().forEach(cultivar -> rows(csv, cultivar.cultivar().id(), cultivar.values(), cultivar.margins().length));
        return csv.toString();
    }

    private static void rows(CsvText csv, String cultivar, List<Value> values, int winters) {
        Map<String, Value> byId = byId(values);
        for (Value value : values) {
            String id = value.layer().id();
            if (!isBound(id, byId)) {
                csv.row(cultivar, id, value.layer().unit(), value.value(), bound(byId.get(id + LOWER)), bound(byId.get(id + UPPER)), winters);
            }
        }
    }

    private static float bound(Value value) {
        return value == null ? Float.NaN : value.value();
    }

    /** The document: layers by id, null for missing. */
    public static String json(CellExplanation cell, CellStatistics statistics) {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("x", cell.x());
        document.put("y", cell.y());
        document.put("crs", cell.crs());
        document.put("winters", statistics.winters());
        document.put("interval", statistics.interval());
        document.put("layers", layers(statistics.shared()));
        document.put("minimum-fit", statistics.minimum().map(CellStatisticsText::fit).orElse(null));
        List<Map<String, Object>> cultivars = new ArrayList<>();
        for (CultivarStatistics cultivar : statistics.cultivars()) {
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("id", cultivar.cultivar().id());
            entry.put("layers", layers(cultivar.values()));
            entry.put("margin-fit", cultivar.margin().map(CellStatisticsText::fit).orElse(null));
            cultivars.add(entry);
        }
        document.put("cultivars", cultivars);
        document.put("caution", Caution.SHORT);
        return JsonText.of(document);
    }

    private static Map<String, Object> layers(List<Value> values) {
        Map<String, Object> layers = new LinkedHashMap<>();
        values.forEach(value -> layers.put(value.layer().id(), JsonText.number(value.value())));
        return layers;
    }

    private static Map<String, Object> fit(Fit fit) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("location", JsonText.number(-fit.gev().location()));
        entry.put("scale", JsonText.number(fit.gev().scale()));
        entry.put("shape", JsonText.number(fit.gev().shape()));
        entry.put("shape-interval", List.of(fit.shape()[0], fit.shape()[1]));
        entry.put("log-likelihood", JsonText.number(fit.logLikelihood()));
        Map<String, Object> levels = new LinkedHashMap<>();
        fit.levels().forEach((period, level) -> {
            Map<String, Object> one = new LinkedHashMap<>();
            one.put("level", JsonText.number(level[0]));
            one.put("lower", JsonText.number(level[1]));
            one.put("upper", JsonText.number(level[2]));
            levels.put(period.toString(), one);
        });
        entry.put("return-levels", levels);
        return entry;
    }

    private static void line(StringBuilder text, String form, Object... values) {
        text.append(format(form, values).stripTrailing()).append('\n');
    }

    private static String format(String form, Object... values) {
        return String.format(Locale.ROOT, form, values);
    }
}
