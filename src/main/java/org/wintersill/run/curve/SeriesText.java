package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.run.Caution;
import org.wintersill.run.CellExplanation.CultivarCourse;
import org.wintersill.run.CellExplanation.Night;
import org.wintersill.run.CellExplanation.Winter;
import org.wintersill.time.Season;

/** Cultivars driven by a series as a table for people, as CSV and as a JSON document. */
public final class SeriesText {
    private static final int NIGHTS_SHOWN = 10;

    private SeriesText() {
    }

    /** The winters of each cultivar; of a single winter also the nights of the lowest margins. */
    public static String table(SeriesCourse series) {
        StringBuilder text = new StringBuilder();
        for (CultivarCourse course : series.courses()) {
            text.append(CurveText.heading(course.cultivar()));
            CurveText.line(text, "  winter    margin K  damage  worst night");
            for (Winter winter : course.winters()) {
                if (winter.worstNight() == null) {
                    CurveText.line(text, "  %-8s  no night with a temperature and a hardiness", winter.label());
                } else {
                    CurveText.line(text, "  %-8s %+9.2f %7.3f  %s%s", winter.label(), winter.margin(), winter.damage(), winter.worstNight(),
                            winter.valid() ? "" : "  (too many days are missing for a run)");
                }
            }
            if (course.winters().size() == 1) {
                CurveText.line(text, "  nights of the lowest margins:");
                CurveText.line(text, "  date          Tmin    LT10    LT50    LT90  margin K  damage");
                course.winters().get(0).nights().stream().filter(night -> !Float.isNaN(night.margin()))
                        .sorted(Comparator.comparingDouble(Night::margin).thenComparing(Night::date)).limit(NIGHTS_SHOWN)
                        .forEach(night -> CurveText.line(text, "  %s %7.2f %7.2f %7.2f %7.2f %+9.2f %7.3f", night.date(), night.tmin(),
                                night.lt10(), night.lt50(), night.lt90(), night.margin(), night.damage()));
            }
            CurveText.line(text, "");
        }
        CurveText.line(text, "%s", Caution.of(cultivars(series)));
        return text.toString();
    }

    private static List<Cultivar> cultivars(SeriesCourse series) {
        return series.courses().stream().map(CultivarCourse::cultivar).toList();
    }

    /** One row a cultivar and night. */
    public static String csv(SeriesCourse series) {
        CsvText csv = new CsvText("cultivar", "winter", "date", "tmin_degc", "tmean_degc", "lt10_degc", "lt50_degc", "lt90_degc", "margin_k",
                "damage");
        for (CultivarCourse course : series.courses()) {
            for (int w = 0; w < course.winters().size(); w++) {
                Season season = series.seasons().get(w);
                List<Night> nights = course.winters().get(w).nights();
                for (int n = 0; n < nights.size(); n++) {
                    Night night = nights.get(n);
                    csv.row(course.cultivar().id(), season.label(), night.date(), night.tmin(),
                            series.series().mean(season.firstDay() + n), night.lt10(), night.lt50(), night.lt90(), night.margin(), night.damage());
                }
            }
        }
        return csv.toString();
    }

    /** One document, version 1, with the winters and nights of {@code explain} and the daily mean. */
    public static String json(SeriesCourse series) {
        List<Map<String, Object>> entries = new ArrayList<>();
        for (CultivarCourse course : series.courses()) {
            Map<String, Object> entry = CurveText.identity(course.cultivar());
            List<Map<String, Object>> winters = new ArrayList<>();
            for (int w = 0; w < course.winters().size(); w++) {
                winters.add(winter(series, course.winters().get(w), series.seasons().get(w)));
            }
            entry.put("winters", winters);
            entries.add(entry);
        }
        return CurveText.document(entries, cultivars(series));
    }

    private static Map<String, Object> winter(SeriesCourse series, Winter winter, Season season) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("winter", winter.label());
        entry.put("valid", winter.valid());
        entry.put("margin", JsonText.number(winter.margin()));
        entry.put("damage", JsonText.number(winter.damage()));
        entry.put("worst-night", winter.worstNight());
        List<Map<String, Object>> nights = new ArrayList<>();
        for (int n = 0; n < winter.nights().size(); n++) {
            Night night = winter.nights().get(n);
            Map<String, Object> cells = new LinkedHashMap<>();
            cells.put("date", night.date());
            cells.put("tmin", JsonText.number(night.tmin()));
            cells.put("tmean", JsonText.number(series.series().mean(season.firstDay() + n)));
            cells.put("lt10", JsonText.number(night.lt10()));
            cells.put("lt50", JsonText.number(night.lt50()));
            cells.put("lt90", JsonText.number(night.lt90()));
            cells.put("margin", JsonText.number(night.margin()));
            cells.put("damage", JsonText.number(night.damage()));
            nights.add(cells);
        }
        entry.put("nights", nights);
        return entry;
    }
}
