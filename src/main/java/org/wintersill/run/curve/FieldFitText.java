package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.IntStream;
import org.wintersill.estimation.CultivarFit;
import org.wintersill.estimation.TrialFit.Estimate;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.hardiness.Status;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.io.yaml.YamlText;
import org.wintersill.run.Caution;

/** Trial fits as a report for people, a table of residuals, a JSON document and a cultivar file. */
public final class FieldFitText {
    private static final int RESIDUALS_SHOWN = 12;
    private static final String LIMITS = "A trial fit is plain least squares for one cultivar: it knows no errors of temperature, no "
            + "likeness of samples of one winter, and says nothing about weather that the samples have not seen.";

    private FieldFitText() {
    }

    /** Estimates with their intervals, what was kept, how well it fits, and the largest residuals. */
    public static String report(FieldFit field) {
        StringBuilder text = new StringBuilder();
        field.fits().forEach((id, fit) -> {
            line(text, "%s: %s", id, field.source(fit));
            line(text, "  %-30s %10s   %s interval", fit.word(), "estimate", percent(field.request().confidence()));
            for (Estimate estimate : fit.fit().estimates()) {
                String interval = Double.isNaN(estimate.lower()) ? "none"
                        : String.format(Locale.ROOT, "%.4f to %.4f", estimate.lower(), estimate.upper());
                line(text, "  %-30s %10.4f   %24s  %s%s", estimate.parameter().name(), estimate.value(), interval,
                        estimate.parameter().unit(), estimate.standing().words().isEmpty() ? ""
                                : "  (" + estimate.standing().words() + ")");
            }
            fit.kept().forEach(kept -> line(text, "  %-30s %10.4f   %s", kept.parameter().name(), kept.value(), kept.reason()));
            line(text, "  %-30s %10.4f   %s", "LT10 - LT50", fit.spread().toLt10(), spread(fit));
            line(text, "  %-30s %10.4f   K", "LT50 - LT90", fit.spread().toLt90());
            line(text, "  RMSE %.3f K, r2 %.3f, %d samples", fit.fit().rmse(), fit.fit().r2(), fit.samples().size());
            fit.remarks().forEach(remark -> line(text, "  note: %s", remark));
            residuals(text, fit);
            line(text, "");
        });
        line(text, "%s", LIMITS);
        line(text, "%s", Caution.SHORT);
        return text.toString();
    }

    private static String spread(CultivarFit fit) {
        return fit.spread().samples() == 0 ? "K, assumed" : "K, mean of " + fit.spread().samples() + " samples";
    }

    private static String percent(double share) {
        return Math.round(100 * share) + " %";
    }

    private static void residuals(StringBuilder text, CultivarFit fit) {
        double[] residuals = fit.fit().residuals();
        List<Integer> order = IntStream.range(0, residuals.length).boxed()
                .sorted(Comparator.comparingDouble((Integer i) -> -Math.abs(residuals[i])).thenComparing(i -> i)).limit(RESIDUALS_SHOWN)
                .sorted(Comparator.comparing(i -> fit.samples().get(i).date())).toList();
        line(text, order.size() < residuals.length ? "  the " + order.size() + " largest residuals (all with --csv):" : "  residuals:");
        line(text, "  date        measured    fitted  residual");
        for (int i : order) {
            line(text, "  %s %9.2f %9.2f %+9.2f", fit.samples().get(i).date(), fit.samples().get(i).lt50(), fit.fit().fitted()[i],
                    residuals[i]);
        }
    }

    /** One row a sample. */
    public static String csv(FieldFit field) {
        CsvText csv = new CsvText("cultivar", "date", "winter", "n", "lt50_degc", "fitted_degc", "residual_k");
        field.fits().forEach((id, fit) -> {
            for (int i = 0; i < fit.samples().size(); i++) {
                MeasuredTolerance sample = fit.samples().get(i);
                csv.row(id, sample.date().toString(), fit.winters().get(i).label(), sample.count(), sample.lt50(), fit.fit().fitted()[i],
                        fit.fit().residuals()[i]);
            }
        });
        return csv.toString();
    }

    /** One document, version 1. */
    public static String json(FieldFit field) {
        List<Map<String, Object>> entries = new ArrayList<>();
        field.fits().forEach((id, fit) -> {
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("id", id);
            entry.put("model", fit.word());
            entry.put("source", field.source(fit));
            entry.put("samples", fit.samples().size());
            entry.put("rmse", JsonText.number(fit.fit().rmse()));
            entry.put("r2", JsonText.number(fit.fit().r2()));
            entry.put("lt10-above", fit.spread().toLt10());
            entry.put("lt90-below", fit.spread().toLt90());
            entry.put("spread-samples", fit.spread().samples());
            entry.put("estimates", fit.fit().estimates().stream().map(FieldFitText::estimate).toList());
            entry.put("kept", fit.kept().stream().map(FieldFitText::kept).toList());
            entry.put("remarks", fit.remarks());
            entry.put("residuals", IntStream.range(0, fit.samples().size()).mapToObj(i -> residual(fit, i)).toList());
            entries.add(entry);
        });
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("interval", field.request().confidence());
        document.put("replicates", field.request().replicates());
        document.put("seed", field.request().seed());
        document.put("fits", entries);
        document.put("caution", LIMITS + " " + Caution.SHORT);
        return JsonText.of(document);
    }

    private static Map<String, Object> estimate(Estimate estimate) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("name", estimate.parameter().name());
        entry.put("unit", estimate.parameter().unit());
        entry.put("value", estimate.value());
        entry.put("lower", JsonText.number(estimate.lower()));
        entry.put("upper", JsonText.number(estimate.upper()));
        entry.put("standing", estimate.standing().name().toLowerCase(Locale.ROOT).replace('_', '-'));
        return entry;
    }

    private static Map<String, Object> kept(CultivarFit.Kept kept) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("name", kept.parameter().name());
        entry.put("unit", kept.parameter().unit());
        entry.put("value", kept.value());
        entry.put("reason", kept.reason());
        return entry;
    }

    private static Map<String, Object> residual(CultivarFit fit, int i) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("date", fit.samples().get(i).date().toString());
        entry.put("lt50", fit.samples().get(i).lt50());
        entry.put("fitted", fit.fit().fitted()[i]);
        entry.put("residual", fit.fit().residuals()[i]);
        return entry;
    }

    /** A cultivar file that {@code map} accepts. */
    public static String cultivarFile(FieldFit field) {
        List<Map<String, Object>> entries = new ArrayList<>();
        field.fits().forEach((id, fit) -> {
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("id", id);
            entry.put("name", fit.samples().get(0).cultivar());
            entry.put("model", fit.word());
            entry.put("source", field.source(fit));
            entry.put("status", Status.OWN_DATA.word());
            entry.putAll(fit.entry());
            entries.add(entry);
        });
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("cultivars", entries);
        return "# Trial fits; what was kept or assumed stands in the report of curves --fit.\n" + YamlText.of(document);
    }

    private static void line(StringBuilder text, String form, Object... values) {
        CurveText.line(text, form, values);
    }
}
