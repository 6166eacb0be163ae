package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.hardiness.Status;
import org.wintersill.io.cultivar.BuiltInCultivars;
import org.wintersill.io.cultivar.BuiltInCultivars.Entry;
import org.wintersill.io.cultivar.BuiltInCultivars.Reference;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.run.Caution;

/** What comes with the program: cultivars and published values, each with source and status. */
public final class BuiltInText {
    private static final String REFERENCE = "published value";

    private BuiltInText() {
    }

    /** A table of the cultivars, and of the values that make no curve. */
    public static String table() {
        StringBuilder text = new StringBuilder();
        CurveText.line(text, "Cultivars, for use: [%sID] in a run file or - built-in: ID in a cultivar file", BuiltInCultivars.PREFIX);
        for (Entry entry : BuiltInCultivars.list()) {
            CurveText.line(text, "  %-26s %-13s %-12s %s%s", entry.id(), entry.model(), entry.status(), entry.name(), entry.complete() ? ""
                    : " (needs dates or degree-days of the stages)");
            CurveText.line(text, "      %s", entry.source());
        }
        CurveText.line(text, "");
        CurveText.line(text, "Published values without a course through the winter, to compare with");
        for (Reference value : BuiltInCultivars.references()) {
            CurveText.line(text, "  %s %s, %s, %s: %s", value.species(), value.cultivar(), value.tissue(), value.when(), degrees(value));
            CurveText.line(text, "      %s", value.source());
        }
        CurveText.line(text, "");
        CurveText.line(text, "%s", Caution.SHORT);
        return text.toString();
    }

    private static String degrees(Reference value) {
        List<String> parts = new ArrayList<>();
        add(parts, "LT10", value.lt10());
        add(parts, "LT50", value.lt50());
        add(parts, "LT90", value.lt90());
        return String.join(", ", parts) + " degC";
    }

    private static void add(List<String> parts, String name, String number) {
        if (!number.isEmpty()) {
            parts.add(String.format(Locale.ROOT, "%s %.1f", name, Double.valueOf(number)));
        }
    }

    /** One row a cultivar or value. */
    public static String csv() {
        CsvText csv = new CsvText("id", "name", "species", "organ", "model", "when", "lt10_degc", "lt50_degc", "lt90_degc", "status",
                "source");
        for (Entry entry : BuiltInCultivars.list()) {
            csv.row(entry.id(), entry.name(), entry.species(), entry.organ(), entry.model(), "", "", "", "", entry.status(),
                    entry.source());
        }
        for (Reference value : BuiltInCultivars.references()) {
            csv.row("", value.cultivar(), value.species(), value.tissue(), REFERENCE, value.when(), number(value.lt10()),
                    number(value.lt50()), number(value.lt90()), Status.PUBLISHED.word(), value.source());
        }
        return csv.toString();
    }

    /** A number of the resource as a number, so that a minus is none of a formula. */
    private static Object number(String text) {
        return text.isEmpty() ? "" : Double.valueOf(text);
    }

    /** One document, version 1. */
    public static String json() {
        List<Map<String, Object>> cultivars = new ArrayList<>();
        for (Entry entry : BuiltInCultivars.list()) {
            Map<String, Object> cells = new LinkedHashMap<>();
            cells.put("id", entry.id());
            cells.put("name", entry.name());
            cells.put("species", entry.species());
            cells.put("organ", entry.organ());
            cells.put("model", entry.model());
            cells.put("complete", entry.complete());
            cells.put("status", entry.status());
            cells.put("source", entry.source());
            cultivars.add(cells);
        }
        List<Map<String, Object>> values = new ArrayList<>();
        for (Reference value : BuiltInCultivars.references()) {
            Map<String, Object> cells = new LinkedHashMap<>();
            cells.put("species", value.species());
            cells.put("cultivar", value.cultivar());
            cells.put("tissue", value.tissue());
            cells.put("when", value.when());
            cells.put("lt10", value.lt10().isEmpty() ? null : Double.valueOf(value.lt10()));
            cells.put("lt50", value.lt50().isEmpty() ? null : Double.valueOf(value.lt50()));
            cells.put("lt90", value.lt90().isEmpty() ? null : Double.valueOf(value.lt90()));
            cells.put("source", value.source());
            values.add(cells);
        }
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("cultivars", cultivars);
        document.put("published-values", values);
        document.put("caution", Caution.SHORT);
        return JsonText.of(document);
    }
}
