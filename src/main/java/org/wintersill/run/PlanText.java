package org.wintersill.run;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.engine.MemoryEstimate;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/** A plan for people and for programs. */
public final class PlanText {
    private static final int MOST_GAPS = 20;

    private PlanText() {
    }

    /** The plan as an ordered document. */
    public static Map<String, Object> document(RunPlan plan) {
        DayAxis days = plan.source().days();
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("title", plan.config().title());
        document.put("configuration", plan.config().effective());
        document.put("temperature-grid", plan.source().grid().describe());
        document.put("target-grid", plan.target().describe());
        document.put("first-day", days.date(0).toString());
        document.put("last-day", days.date(days.size() - 1).toString());
        document.put("days", days.size());
        document.put("calendar", days.calendar().cfName());
        document.put("missing-days", days.missingCount());
        document.put("gaps", days.gaps(MOST_GAPS));
        if (!plan.job().states().isNone()) {
            document.put("daily-mean", plan.job().states().describe());
        }
        document.put("winter-window", plan.window().from() + " to " + plan.window().to());
        document.put("winters", plan.seasons().stream().map(Season::label).toList());
        Map<String, Object> dropped = new LinkedHashMap<>();
        plan.dropped().forEach(winter -> dropped.put(winter.label(), winter.reason()));
        document.put("winters-not-used", dropped);
        document.put("cultivars", plan.cultivars().stream().map(Cultivar::id).toList());
        document.put("threads", plan.foldPlan().threads());
        document.put("bands", plan.foldPlan().bands().size());
        document.put("batches", plan.foldPlan().batches().size());
        document.put("memory-bytes", plan.estimate().memoryBytes());
        document.put("memory-items", plan.foldPlan().memory().items());
        document.put("working-disk-bytes", plan.estimate().workingDiskBytes());
        document.put("output-disk-bytes-at-most", plan.estimate().outputDiskBytes());
        document.put("seconds", Math.rint(plan.estimate().seconds() * 10) / 10);
        return document;
    }

    /** The plan as lines. */
    public static String text(RunPlan plan) {
        DayAxis days = plan.source().days();
        StringBuilder text = new StringBuilder();
        text.append(plan.config().title().isEmpty() ? "Plan" : plan.config().title()).append("\n\n");
        line(text, "temperatures", plan.source().grid().describe());
        line(text, "target", plan.target().describe());
        line(text, "days", days.size() + " from " + days.date(0) + " to " + days.date(days.size() - 1) + ", "
                + days.calendar().cfName() + " calendar");
        List<String> gaps = days.gaps(MOST_GAPS);
        if (!gaps.isEmpty()) {
            line(text, "missing days", days.missingCount() + ": " + String.join(", ", gaps)
                    + (gaps.size() == MOST_GAPS ? ", ..." : ""));
        }
        if (!plan.job().states().isNone()) {
            line(text, "daily mean", plan.job().states().describe());
        }
        line(text, "winter", plan.window().from() + " to " + plan.window().to() + "; " + plan.window().completeFrom() + " to "
                + plan.window().completeTo() + " must be complete (" + plan.job().policy().key() + ")");
        line(text, "winters", plan.seasons().size() + ": " + String.join(", ", plan.seasons().stream().map(Season::label).toList()));
        plan.dropped().forEach(winter -> line(text, "not used", winter.label() + ": " + winter.reason()));
        for (Cultivar cultivar : plan.cultivars()) {
            line(text, "cultivar", cultivar.id() + " (" + cultivar.name() + ", " + cultivar.species() + "; " + cultivar.model().id()
                    + ", " + cultivar.status().word() + ")");
        }
        line(text, "work", count(plan.foldPlan().threads(), "thread") + ", " + count(plan.foldPlan().bands().size(), "band") + ", "
                + count(plan.foldPlan().batches().size(), "batch") + " of at most " + count(plan.foldPlan().batchDays(), "day"));
        line(text, "memory", "about " + MemoryEstimate.text(plan.estimate().memoryBytes()));
        line(text, "disk", MemoryEstimate.text(plan.estimate().workingDiskBytes()) + " while it runs, outputs at most "
                + MemoryEstimate.text(plan.estimate().outputDiskBytes()));
        line(text, "time", duration(plan.estimate().seconds()));
        text.append("\nConfiguration with all defaults:\n\n").append(plan.config().toYaml());
        return text.toString();
    }

    private static void line(StringBuilder text, String name, String value) {
        text.append(String.format(Locale.ROOT, "%-13s %s%n", name, value).replace(System.lineSeparator(), "\n"));
    }

    private static String count(int number, String thing) {
        return number + " " + thing + (number == 1 ? "" : thing.endsWith("ch") ? "es" : "s");
    }

    private static String duration(double seconds) {
        return seconds < 90 ? "about " + Math.max(1, Math.round(seconds)) + " s" : "about " + Math.round(seconds / 60) + " min";
    }
}
