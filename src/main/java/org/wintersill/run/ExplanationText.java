package org.wintersill.run;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.climatology.statistic.PhaseShare;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.run.CellExplanation.CultivarCourse;
import org.wintersill.run.CellExplanation.Night;
import org.wintersill.run.CellExplanation.Steps;
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
        winter.further().expected().ifPresent(expected -> entry.put("expected-damage", JsonText.number(expected)));
        for (int phase = 0; phase < winter.further().shares().length; phase++) {
            entry.put(PhaseShare.IDS.get(phase), JsonText.number(winter.further().shares()[phase]));
        }
        entry.put("nights", winter.nights().stream().map(ExplanationText::night).toList());
        return entry;
    }

    private static Map<String, Object> night(Night night) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("date", night.date());
        entry.put("source", JsonText.number(night.steps().source()));
        if (!Float.isNaN(night.steps().mapped())) {
            entry.put("mapped", JsonText.number(night.steps().mapped()));
        }
        entry.put("tmin", JsonText.number(night.tmin()));
        entry.put("tmean", JsonText.number(night.tmean()));
        entry.put("phase", night.phase());
        entry.put("lt10", JsonText.number(night.lt10()));
        entry.put("lt50", JsonText.number(night.lt50()));
        entry.put("lt90", JsonText.number(night.lt90()));
        entry.put("margin", JsonText.number(night.margin()));
        entry.put("damage", JsonText.number(night.damage()));
        if (!night.steps().isByHeightAlone()) {
            entry.put("steps", steps(night.steps()));
        }
        return entry;
    }

    private static Map<String, Object> steps(Steps steps) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("interpolated", JsonText.number(steps.interpolated()));
        entry.put("lapse-rate", JsonText.number(steps.lapseRate()));
        entry.put("height", JsonText.number(steps.height()));
        entry.put("pool", JsonText.number(steps.pool()));
        entry.put("water", JsonText.number(steps.water()));
        entry.put("offset", JsonText.number(steps.offset()));
        return entry;
    }

    /** One row a night and cultivar. */
    public static String csv(CellExplanation cell) {
        CsvText csv = new CsvText("cultivar", "winter", "date", "source_degc", "mapped_degc", "interpolated_degc", "lapse_rate_k_per_km",
                "height_change_m", "height_k", "pool_k", "water_k", "offset_k", "tmin_degc", "tmean_degc", "phase", "lt10_degc", "lt50_degc",
                "lt90_degc", "margin_k", "damage");
        for (CultivarCourse course : cell.cultivars()) {
            for (Winter winter : course.winters()) {
                for (Night night : winter.nights()) {
                    Steps steps = night.steps();
                    csv.row(course.cultivar().id(), winter.label(), night.date(), steps.source(), steps.mapped(), steps.interpolated(), steps.lapseRate(),
                            cell.heightChange(), steps.height(), steps.pool(), steps.water(), steps.offset(), night.tmin(), night.tmean(),
                            night.phase(), night.lt10(), night.lt50(), night.lt90(), night.margin(), night.damage());
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
                coldest(text, course.winters().get(0), nightsShown);
            }
        }
        line(text, "");
        line(text, "%s", Caution.SHORT);
        return text.toString();
    }

    /** A step that changes nothing on any of the nights has no column. */
    private static void coldest(StringBuilder text, Winter winter, int count) {
        List<Night> nights = winter.nights().stream().filter(night -> !Float.isNaN(night.margin()))
                .sorted(Comparator.comparingDouble(Night::margin).thenComparing(Night::date)).limit(count).toList();
        boolean pools = nights.stream().anyMatch(night -> night.steps().pool() != 0);
        boolean water = nights.stream().anyMatch(night -> night.steps().water() != 0);
        boolean offset = nights.stream().anyMatch(night -> night.steps().offset() != 0);
        boolean rates = nights.stream().map(night -> night.steps().lapseRate()).distinct().count() > 1;
        boolean mapped = nights.stream().anyMatch(night -> !Float.isNaN(night.steps().mapped()));
        line(text, "  nights of the lowest margins:");
        boolean means = winter.nights().stream().anyMatch(night -> !Float.isNaN(night.tmean()));
        line(text, "  date        source%s  interpolated%s  + height%s%s%s    = Tmin %s    LT10     LT50     LT90  margin K  damage%s",
                mapped ? "   mapped" : "", rates ? "  K/km" : "", pools ? "  + pool" : "", water ? "  + water" : "", offset ? "  + offset" : "",
                means ? "   Tmean " : "", means ? "  phase" : "");
        for (Night night : nights) {
            Steps steps = night.steps();
            line(text, "  %s %8.2f%s %13.2f%s %9.2f%s%s%s %9.2f %s%8.2f %8.2f %8.2f %+9.2f %7.3f%s", night.date(), steps.source(),
                    mapped ? format(" %8.2f", steps.mapped()) : "", steps.interpolated(), rates ? format(" %5.2f", steps.lapseRate()) : "", steps.height(),
                    pools ? format(" %7.2f", steps.pool()) : "", water ? format(" %8.2f", steps.water()) : "",
                    offset ? format(" %9.2f", steps.offset()) : "", night.tmin(), means ? format("%8.2f ", night.tmean()) : "", night.lt10(),
                    night.lt50(), night.lt90(), night.margin(), night.damage(), means && night.phase() != null ? "  " + night.phase() : "");
        }
    }

    private static void line(StringBuilder text, String form, Object... values) {
        text.append(format(form, values).stripTrailing()).append('\n');
    }

    private static String format(String form, Object... values) {
        return String.format(Locale.ROOT, form, values);
    }
}
