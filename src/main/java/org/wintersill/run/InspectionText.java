package org.wintersill.run;

import java.util.Locale;
import org.wintersill.temperature.SourceFile;

/** An inspection as lines for people. */
public final class InspectionText {
    private InspectionText() {
    }

    public static String of(Inspection inspection) {
        SourceFile file = inspection.file();
        StringBuilder text = new StringBuilder(file.path()).append('\n');
        line(text, "format", file.format());
        line(text, "variable", file.variable() + ", unit " + file.unit());
        line(text, "days", file.dayCount() + " from " + file.firstDate() + " to " + file.lastDate() + ", " + file.calendar()
                + " calendar");
        if (inspection.missingDays() > 0 && !file.details().containsKey("missing days")) {
            line(text, "missing days", inspection.missingDays() + ": " + String.join(", ", inspection.gaps()));
        }
        line(text, "grid", file.grid());
        line(text, "storage", file.storage());
        file.details().forEach((name, value) -> line(text, name, value));
        line(text, "sample", String.format(Locale.ROOT, "%d days: %.2f to %.2f degC, mean %.2f; %.1f %% of the cells missing",
                inspection.sampleDays(), inspection.lowest(), inspection.highest(), inspection.mean(),
                100 * inspection.missingShare()));
        inspection.notices().forEach(notice -> line(text, "note", notice));
        return text.toString();
    }

    private static void line(StringBuilder text, String name, String value) {
        text.append("  ").append(String.format(Locale.ROOT, "%-13s ", name)).append(value).append('\n');
    }
}
