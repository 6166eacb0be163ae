package org.wintersill.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.run.StationComparison.Group;

/** A comparison with stations as a table for people, as CSV and as a JSON document. */
public final class StationText {
    private StationText() {
    }

    /** Version 1. */
    public static String json(StationComparison comparison) {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("readings", comparison.readings());
        document.put("stations", comparison.stations());
        document.put("left-out", comparison.leftOut());
        document.put("mean-height-difference", JsonText.number(comparison.heightDifference()));
        document.put("stations-far-in-height", comparison.farInHeight());
        List<Map<String, Object>> groups = new ArrayList<>();
        for (Group group : comparison.groups()) {
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("kind", group.kind());
            entry.put("name", group.name());
            entry.put("readings", group.count());
            List<Map<String, Object>> steps = new ArrayList<>();
            for (int step = 0; step < StationComparison.STEPS.size(); step++) {
                Map<String, Object> values = new LinkedHashMap<>();
                values.put("after", StationComparison.STEPS.get(step));
                values.put("bias", JsonText.number(group.bias()[step]));
                values.put("rmse", JsonText.number(group.rmse()[step]));
                steps.add(values);
            }
            entry.put("steps", steps);
            groups.add(entry);
        }
        document.put("groups", groups);
        document.put("caution", Caution.SHORT);
        return JsonText.of(document);
    }

    /** One row a group and step; then one a reason for leaving readings out, with their number. */
    public static String csv(StationComparison comparison) {
        CsvText csv = new CsvText("kind", "name", "readings", "after", "bias_k", "rmse_k");
        for (Group group : comparison.groups()) {
            for (int step = 0; step < StationComparison.STEPS.size(); step++) {
                csv.row(group.kind(), group.name(), group.count(), StationComparison.STEPS.get(step), group.bias()[step], group.rmse()[step]);
            }
        }
        comparison.leftOut().forEach((reason, count) -> csv.row("left-out", reason, count, null, null, null));
        return csv.toString();
    }

    public static String table(StationComparison comparison) {
        StringBuilder text = new StringBuilder();
        int compared = comparison.readings() - comparison.leftOut().values().stream().mapToInt(Integer::intValue).sum();
        line(text, "%d of %d readings of %d stations compared; run minus station in K, bias and RMSE after each step", compared,
                comparison.readings(), comparison.stations());
        line(text, "  %-22s %8s  %s", "", "readings", String.join(" ", StationComparison.STEPS.stream().map(step -> format("%15s", step)).toList()));
        for (Group group : comparison.groups()) {
            StringBuilder row = new StringBuilder(format("  %-22s %8d ", group.kind().equals("all") ? "all" : group.kind() + " " + group.name(),
                    group.count()));
            for (int step = 0; step < StationComparison.STEPS.size(); step++) {
                row.append(format(" %+7.2f %7.2f", group.bias()[step], group.rmse()[step]));
            }
            line(text, "%s", row);
        }
        line(text, "left out:");
        comparison.leftOut().forEach((reason, count) -> line(text, "  %-48s %8d", reason, count));
        if (!Double.isNaN(comparison.heightDifference())) {
            line(text, "cell minus station height: mean %+.1f m; more than %.0f m at %d stations", comparison.heightDifference(),
                    StationComparison.FAR, comparison.farInHeight());
        }
        line(text, "%s", Caution.SHORT);
        return text.toString();
    }

    private static void line(StringBuilder text, String form, Object... values) {
        text.append(format(form, values).stripTrailing()).append('\n');
    }

    private static String format(String form, Object... values) {
        return String.format(Locale.ROOT, form, values);
    }
}
