package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.run.Caution;
import org.wintersill.run.curve.CultivarCurve.Kind;
import org.wintersill.run.curve.CultivarCurve.Row;

/** Curves as a table for people, as CSV and as a JSON document. */
public final class CurveText {
    private CurveText() {
    }

    /** Who each cultivar is, and its lethal temperatures on the first and the fifteenth of each month. */
    public static String table(List<CultivarCurve> curves) {
        StringBuilder text = new StringBuilder();
        for (CultivarCurve curve : curves) {
            text.append(heading(curve.cultivar()));
            if (curve.kind() == Kind.STATE) {
                line(text, "  follows the weather: give --series SERIES.csv to see its course");
            } else if (curve.kind() == Kind.MEAN) {
                line(text, "  trailing   autumn limb               spring limb");
                line(text, "  mean          LT10    LT50    LT90      LT10    LT50    LT90   degC");
                List<Row> spring = curve.limb(CultivarCurve.SPRING);
                curve.limb(CultivarCurve.AUTUMN).stream().filter(row -> row.position() % 2 == 0).forEach(row -> {
                    Row other = spring.get((int) row.position() - CultivarCurve.COLDEST_MEAN);
                    line(text, "  %8.0f   %s %s %s   %s %s %s", row.position(), cell(row.lt10()), cell(row.lt50()), cell(row.lt90()),
                            cell(other.lt10()), cell(other.lt50()), cell(other.lt90()));
                });
            } else {
                line(text, "  date     LT10    LT50    LT90   degC");
                curve.rows().stream().filter(row -> row.at().endsWith("-01") || row.at().endsWith("-15"))
                        .forEach(row -> line(text, "  %s %s %s %s", row.at(), cell(row.lt10()), cell(row.lt50()), cell(row.lt90())));
            }
            line(text, "");
        }
        line(text, "%s", Caution.of(cultivars(curves)));
        return text.toString();
    }

    /** Name, model, source and status of a cultivar. */
    static String heading(Cultivar cultivar) {
        StringBuilder text = new StringBuilder();
        List<String> kind = new ArrayList<>(List.of(cultivar.species(), cultivar.organ()));
        kind.removeIf(String::isEmpty);
        line(text, "%s: %s%s", cultivar.id(), cultivar.name(), kind.isEmpty() ? "" : " (" + String.join(", ", kind) + ")");
        line(text, "  model   %s; tolerance %s", cultivar.model().describe(), cultivar.tolerance().key());
        line(text, "  source  %s", cultivar.source());
        line(text, "  status  %s", cultivar.status().word());
        return text.toString();
    }

    private static List<Cultivar> cultivars(List<CultivarCurve> curves) {
        return curves.stream().map(CultivarCurve::cultivar).toList();
    }

    private static String cell(double value) {
        return Double.isNaN(value) ? "      -" : String.format(Locale.ROOT, "%7.2f", value);
    }

    /** One row a cultivar and day. */
    public static String csv(List<CultivarCurve> curves) {
        CsvText csv = new CsvText("cultivar", "model", "status", "date", "limb", "mean_degc", "lt10_degc", "lt50_degc", "lt90_degc");
        for (CultivarCurve curve : curves) {
            for (Row row : curve.rows()) {
                boolean dated = curve.kind() == Kind.DATE;
                csv.row(curve.cultivar().id(), curve.cultivar().model().id(), curve.cultivar().status().word(), dated ? row.at() : "",
                        dated ? "" : row.at(), dated ? "" : row.position(), row.lt10(), row.lt50(), row.lt90());
            }
        }
        return csv.toString();
    }

    /** One document, version 1, null for missing; {@code curve} is empty for models that have none without weather. */
    public static String json(List<CultivarCurve> curves) {
        List<Map<String, Object>> entries = new ArrayList<>();
        for (CultivarCurve curve : curves) {
            Map<String, Object> entry = identity(curve.cultivar());
            entry.put("curve", curve.rows().stream().map(row -> row(curve.kind(), row)).toList());
            entries.add(entry);
        }
        return document(entries, cultivars(curves));
    }

    static String document(List<Map<String, Object>> entries, List<Cultivar> shown) {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("cultivars", entries);
        document.put("caution", Caution.of(shown));
        return JsonText.of(document);
    }

    static Map<String, Object> identity(Cultivar cultivar) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("id", cultivar.id());
        entry.put("name", cultivar.name());
        entry.put("species", cultivar.species());
        entry.put("organ", cultivar.organ());
        entry.put("model", cultivar.model().id());
        entry.put("description", cultivar.model().describe());
        entry.put("tolerance", cultivar.tolerance().key());
        entry.put("source", cultivar.source());
        entry.put("status", cultivar.status().word());
        return entry;
    }

    private static Map<String, Object> row(Kind kind, Row row) {
        Map<String, Object> cells = new LinkedHashMap<>();
        if (kind == Kind.DATE) {
            cells.put("date", row.at());
        } else {
            cells.put("limb", row.at());
            cells.put("mean", row.position());
        }
        cells.put("lt10", JsonText.number(row.lt10()));
        cells.put("lt50", JsonText.number(row.lt50()));
        cells.put("lt90", JsonText.number(row.lt90()));
        return cells;
    }

    static void line(StringBuilder text, String form, Object... values) {
        text.append(String.format(Locale.ROOT, form, values).stripTrailing()).append('\n');
    }
}
