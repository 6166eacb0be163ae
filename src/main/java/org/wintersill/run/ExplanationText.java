package org.wintersill.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.run.CellExplanation.CultivarCourse;
import org.wintersill.run.CellExplanation.Night;
import org.wintersill.run.CellExplanation.Winter;

/** A cell's explanation as a table for people, as CSV and as the JSON document that scripts rely on. */
public final class ExplanationText {
    private ExplanationText() {
    }

    /** The document of the contract: version 1, null for missing. */
    public static String json(CellExplanation cell) {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("x", cell.x());
        document.put("y", cell.y());
        document.put("crs", cell.crs());
        document.put("elevation", JsonText.number(cell.elevation()));
        List<Map<String, Object>> cultivars = new ArrayList<>();
        for (CultivarCourse course : cell.cultivars()) {
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("id", course.cultivar().id());
            entry.put("winters", course.winters().stream().map(ExplanationText::winter).toList());
            cultivars.add(entry);
        }
        document.put("cultivars", cultivars);
        return JsonText.of(document);
    }

    private static Map<String, Object> winter(Winter winter) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("winter", winter.label());
        entry.put("valid", winter.valid());
        entry.put("margin", JsonText.number(winter.margin()));
        entry.put("damage", JsonText.number(winter.damage()));
        entry.put("worst-night", winter.worstNight());
        entry.put("nights", winter.nights().stream().map(ExplanationText::night).toList());
        return entry;
    }

    private static Map<String, Object> night(Night night) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("date", night.date());
        entry.put("source", JsonText.number(night.source()));
        entry.put("tmin", JsonText.number(night.tmin()));
        entry.put("tmean", JsonText.number(night.tmean()));
        entry.put("phase", night.phase());
        entry.put("lt10", JsonText.number(night.lt10()));
        entry.put("lt50", JsonText.number(night.lt50()));
        entry.put("lt90", JsonText.number(night.lt90()));
        entry.put("margin", JsonText.number(night.margin()));
        entry.put("damage", JsonText.number(night.damage()));
        return entry;
    }

    /** One row a night and cultivar. */
    public static String csv(CellExplanation cell) {
        CsvText csv = new CsvText("cultivar", "winter", "date", "source_degc", "interpolated_degc", "lapse_rate_k_per_km",
                "height_change_m", "tmin_degc", "tmean_degc", "phase", "lt10_degc", "lt50_degc", "lt90_degc", "margin_k", "damage");
        for (CultivarCourse course : cell.cultivars()) {
            for (Winter winter : course.winters()) {
                for (Night night : winter.nights()) {
                    csv.row(course.cultivar().id(), winter.label(), night.date(), night.source(), night.interpolated(),
                            night.lapseRate(), cell.heightChange(), night.tmin(), night.tmean(), night.phase(),
                            night.lt10(), night.lt50(), night.lt90(), night.margin(), night.damage());
                }
            }
        }
        return csv.toString();
    }

    /** Winters as a table; of a single winter also its coldest nights, by margin, with each step to the margin. */
    public static String table(CellExplanation cell, int nightsShown) {
        StringBuilder text = new StringBuilder();
        line(text, "Cell at %.6f, %.6f (%s)%s", cell.x(), cell.y(), cell.crs(), Float.isNaN(cell.elevation()) ? ""
                : format(", elevation %.1f m, %+.1f m against the temperature grid", cell.elevation(), cell.heightChange()));
        for (CultivarCourse course : cell.cultivars()) {
            line(text, "");
            line(text, "%s (%s, %s; curve %s)", course.cultivar().name(), course.cultivar().species(), course.cultivar().organ(),
                    course.cultivar().status().word());
            line(text, "  winter    margin K  damage  worst night");
            for (Winter winter : course.winters()) {
                if (winter.valid()) {
                    line(text, "  %-8s %+9.2f %7.3f  %s", winter.label(), winter.margin(), winter.damage(), winter.worstNight());
                } else {
                    line(text, "  %-8s  not complete enough", winter.label());
                }
            }
            if (course.winters().size() == 1) {
                coldest(text, course.winters().get(0), nightsShown, cell.heightChange());
            }
        }
        line(text, "");
        line(text, "%s", Caution.SHORT);
        return text.toString();
    }

    private static void coldest(StringBuilder text, Winter winter, int count, float heightChange) {
        line(text, "  nights of the lowest margins:");
        boolean means = winter.nights().stream().anyMatch(night -> !Float.isNaN(night.tmean()));
        line(text, "  date        source  interpolated  + height    = Tmin %s    LT10     LT50     LT90  margin K  damage%s",
                means ? "   Tmean " : "", means ? "  phase" : "");
        winter.nights().stream().filter(night -> !Float.isNaN(night.margin()))
                .sorted(java.util.Comparator.comparingDouble(Night::margin).thenComparing(Night::date)).limit(count)
                .forEach(night -> line(text, "  %s %8.2f %13.2f %9.2f %9.2f %s%8.2f %8.2f %8.2f %+9.2f %7.3f%s", night.date(),
                        night.source(), night.interpolated(),
                        Float.isNaN(heightChange) ? 0 : -night.lapseRate() * heightChange / 1000, night.tmin(),
                        means ? format("%8.2f ", night.tmean()) : "", night.lt10(), night.lt50(), night.lt90(), night.margin(),
                        night.damage(), means && night.phase() != null ? "  " + night.phase() : ""));
    }

    private static void line(StringBuilder text, String form, Object... values) {
        text.append(format(form, values).stripTrailing()).append('\n');
    }

    private static String format(String form, Object... values) {
        return String.format(Locale.ROOT, form, values);
    }
}
