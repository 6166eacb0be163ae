package org.wintersill.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.wintersill.config.FileEntry;
import org.wintersill.elevation.ElevationField;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

/**
 * How a file of ground heights is understood.
 *
 * @param path path as given
 * @param description what was read and from where
 * @param grid one line on the grid
 * @param lowest lowest height, m; NaN where there is none
 * @param highest highest height, m
 * @param missingShare share of cells without height
 * @param notices assumptions made
 */
public record ElevationInspection(String path, String description, String grid, float lowest, float highest, double missingShare,
                                  List<String> notices) {

    /**
     * Looks at a file in which no temperatures were found.
     *
     * @param crs reference system for a file that carries none
     * @return empty when it holds no heights either, so that the refusal of the temperature reader is the one to show
     */
    public static Optional<ElevationInspection> of(InputFormats formats, Path file, Optional<String> crs) {
        Notices notices = new Notices();
        try {
            return Optional.of(of(file, formats.heights(new FileEntry(file, crs, Optional.empty()), notices), notices));
        } catch (ProblemException noHeights) {
            return Optional.empty();
        }
    }

    private static ElevationInspection of(Path file, ElevationField field, Notices notices) {
        float lowest = Float.NaN;
        float highest = Float.NaN;
        long missing = 0;
        for (float metres : field.metres()) {
            if (metres == metres) {
                lowest = lowest <= metres ? lowest : metres;
                highest = highest >= metres ? highest : metres;
            } else {
                missing++;
            }
        }
        return new ElevationInspection(file.toString(), field.description(), field.grid().describe(), lowest, highest,
                (double) missing / field.metres().length, new ArrayList<>(notices.counts().keySet()));
    }

    /** The inspection as an ordered document for JSON. */
    public Map<String, Object> document() {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("file", path);
        document.put("content", "ground heights");
        document.put("description", description);
        document.put("grid", grid);
        document.put("lowest-m", Float.isNaN(lowest) ? null : Double.valueOf(Float.toString(lowest)));
        document.put("highest-m", Float.isNaN(highest) ? null : Double.valueOf(Float.toString(highest)));
        document.put("missing-share", Math.rint(missingShare * 10000) / 10000);
        document.put("notices", notices);
        return document;
    }

    /** The inspection as lines for people. */
    public String text() {
        StringBuilder text = new StringBuilder(path).append('\n');
        line(text, "content", "ground heights, no daily temperatures");
        line(text, "grid", grid);
        line(text, "read from", description);
        line(text, "heights", String.format(Locale.ROOT, "%.1f to %.1f m; %.1f %% of the cells missing", lowest, highest,
                100 * missingShare));
        notices.forEach(notice -> line(text, "note", notice));
        return text.toString();
    }

    private static void line(StringBuilder text, String name, String value) {
        text.append("  ").append(String.format(Locale.ROOT, "%-13s ", name)).append(value).append('\n');
    }
}
