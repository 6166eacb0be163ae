package org.wintersill.config;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.wintersill.io.yaml.YamlText;
import org.wintersill.problem.Problem;

/** Writes a configuration as a commented run file to start from. */
public final class RunFileText {
    /** Keys whose texts are paths, in the tree of {@link RunConfig#effective()}. */
    private static final Set<String> PATH_KEYS = Set.of("minimum", "maximum", "mean", "files", "file", "dem", "source-height", "folder",
            "polygons", "parcels", "historical", "future", "mask");
    private static final Map<String, String> COMMENTS = Map.ofEntries(
            Map.entry("title", "A few words that stand in every output."),
            Map.entry("temperature", "Daily minima in netCDF or GeoTIFF: a file, a list, a folder or a pattern."),
            Map.entry("elevation", "Terrain model; lapse rate in K per km, positive where higher is colder; pools of cold air, water, offsets in K."),
            Map.entry("winter", "First and last day, and the part that must be complete; auto: by hemisphere."),
            Map.entry("missing-days", "When a month with missing days still counts: month-10-5, month-5-3 or none."),
            Map.entry("cultivars", "Cultivar files, and the ids to use."),
            Map.entry("damage", "Percents of organs killed, the one that makes a killing winter, and how nights are joined (worst, independent,\n"
                    + "# correlated with rho). Uncertainty: standard deviations in K by component, such as {model: 1.0, site: 0.8}."),
            Map.entry("statistics", "Interval of the bounds; the frequency of killing winters that is still accepted, or several of them;\n"
                    + "# fits of extremes to 20 winters or more, replicates with their seed, trends, cold nights."),
            Map.entry("classes", "Highest frequency of killing winters that is secure, workable, marginal."),
            Map.entry("area", "The part of the target grid to work on: bbox: [west, south, east, north] in its reference system, polygons: a file."),
            Map.entry("scenario", "A climate model's future in place of the minima: method, pool and the model's files."),
            Map.entry("parcels", "Polygons to describe at the end: file, layer, columns id and name, and which get a page (sheets: auto, all, none or ids)."),
            Map.entry("outputs", "What is written, and where."),
            Map.entry("limits", "How much of the machine is used; results do not depend on it."));

    private RunFileText() {
    }

    /**
     * Refuses a file that is there already.
     *
     * @throws org.wintersill.problem.ProblemException if it is
     */
    public static void checkNew(Path target) {
        if (Files.exists(target, LinkOption.NOFOLLOW_LINKS)) {
            throw exists(target).asException();
        }
    }

    /**
     * Writes a run file whose paths lead from its own folder to the same files.
     *
     * @throws org.wintersill.problem.ProblemException if it exists or cannot be written
     */
    public static void write(RunConfig config, Path target) {
        Path folder = target.toAbsolutePath().normalize().getParent();
        try {
            Files.writeString(target, of(config, folder), StandardCharsets.UTF_8, StandardOpenOption.CREATE_NEW,
                    StandardOpenOption.WRITE);
        } catch (FileAlreadyExistsException e) {
            throw exists(target).asException(e);
        } catch (IOException e) {
            throw Problem.output("the run file cannot be written", target.toString(), "Check that its folder exists and can be "
                    + "written to").asException(e);
        }
    }

    private static Problem exists(Path target) {
        return Problem.output("the file exists already", target.toString(), "Choose another name; nothing is ever replaced here");
    }

    /** The text of a run file that stands in a folder. */
    static String of(RunConfig config, Path folder) {
        Path base = config.baseFolder().toAbsolutePath().normalize();
        String way = base.equals(folder) ? "" : way(folder, base);
        @SuppressWarnings("unchecked")
        Map<String, Object> tree = (Map<String, Object>) moved("", config.effective(), way);
        StringBuilder text = new StringBuilder();
        for (String line : YamlText.of(tree).split("\n")) {
            int colon = line.indexOf(':');
            String key = colon > 0 && !line.startsWith(" ") ? line.substring(0, colon) : "";
            if (COMMENTS.containsKey(key)) {
                text.append(text.length() == 0 ? "" : "\n").append("# ").append(COMMENTS.get(key)).append('\n');
            }
            text.append(line).append('\n');
        }
        return text.toString();
    }

    private static String way(Path from, Path to) {
        try {
            return from.relativize(to).toString().replace(File.separatorChar, '/') + "/";
        } catch (IllegalArgumentException e) {
            return to.toString().replace(File.separatorChar, '/') + "/";
        }
    }

    private static Object moved(String key, Object value, String way) {
        if (value instanceof Map<?, ?> map) {
            Map<String, Object> result = new LinkedHashMap<>();
            map.forEach((inner, item) -> result.put(inner.toString(), moved(inner.toString(), item, way)));
            return result;
        }
        if (value instanceof List<?> list) {
            List<Object> result = new ArrayList<>();
            list.forEach(item -> result.add(moved(key, item, way)));
            return result;
        }
        boolean path = value instanceof String text && PATH_KEYS.contains(key)
                && !(key.equals("source-height") && text.equals("dem-mean")) && !SettingTree.isAbsolute(text);
        return path ? way + value : value;
    }
}
