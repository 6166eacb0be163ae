package org.wintersill.run;

import java.io.IOException;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.wintersill.config.FileEntry;
import org.wintersill.config.Setting;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.cultivar.CultivarFile;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.TemperatureRequest;

/**
 * What the files of a folder are good for, found by opening them: daily minima and maxima, a terrain model, the heights that
 * the temperatures stand for, cultivars. Subfolders are left alone. Nothing is guessed that a file contradicts; what is
 * ambiguous is decided by size and said.
 */
public final class FolderContents {
    /** Dates in names that the reader of GeoTIFF files does not take without being told. */
    private static final List<String> DATE_PATTERNS = List.of("yyyyDDD", "yyyy_MM", "yyyy-MM", "yyyyMM");
    private static final String FLAG = "the folder";

    private final InputFormats formats;
    private final Notices notices;
    private final Map<Kind, List<Path>> minima = new LinkedHashMap<>();
    private final Map<Kind, List<Path>> maxima = new LinkedHashMap<>();
    private final Map<Kind, Long> days = new LinkedHashMap<>();
    private final Map<Path, GridGeometry> heights = new LinkedHashMap<>();
    private final List<Path> cultivars = new ArrayList<>();

    /**
     * Files that may be parts of one record.
     *
     * @param dates pattern of the date in their names; empty where they say it themselves
     */
    private record Kind(String format, String variable, GridGeometry grid, Optional<String> dates) {
        String words() {
            return format + " " + variable + ", " + grid.describe();
        }
    }

    private FolderContents(InputFormats formats, Notices notices) {
        this.formats = formats;
        this.notices = notices;
    }

    /**
     * The settings of a run on the files of a folder.
     *
     * @param notices told what each file is taken for, and what is left aside
     * @throws ProblemException when the folder has no minima or no cultivars
     */
    public static List<Setting> settings(Path folder, InputFormats formats, Notices notices) {
        FolderContents contents = new FolderContents(formats, notices);
        contents.look(folder);
        return contents.settings(folder);
    }

    private void look(Path folder) {
        for (Path file : files(folder)) {
            String name = file.getFileName().toString().toLowerCase(Locale.ROOT);
            if (name.endsWith(".yaml") || name.endsWith(".yml")) {
                lookForCultivars(file);
            } else if (name.matches(".*\\.(nc|nc4|cdf|netcdf|tif|tiff)")) {
                if (!lookFor(ForcingVariable.MINIMUM, minima, file) && !lookFor(ForcingVariable.MAXIMUM, maxima, file)) {
                    lookForHeights(file);
                }
            }
        }
    }

    private static List<Path> files(Path folder) {
        List<Path> files = new ArrayList<>();
        try (DirectoryStream<Path> stream = Files.newDirectoryStream(folder, Files::isRegularFile)) {
            stream.forEach(files::add);
        } catch (IOException | DirectoryIteratorException e) {
            throw Problem.input("the folder cannot be read: " + e.getMessage(), folder.toString(), "Check its permissions").asException(e);
        }
        files.sort(Comparator.comparing(path -> path.getFileName().toString()));
        return files;
    }

    private void lookForCultivars(Path file) {
        try {
            CultivarFile.read(file, new Notices());
            cultivars.add(file);
        } catch (ProblemException noCultivars) {
            notices.add(file + " is not used: " + noCultivars.problems().get(0).what());
        }
    }

    private boolean lookFor(ForcingVariable forcing, Map<Kind, List<Path>> found, Path file) {
        List<Optional<String>> patterns = new ArrayList<>(List.of(Optional.empty()));
        if (file.getFileName().toString().toLowerCase(Locale.ROOT).matches(".*\\d{4}.*\\.tiff?")) {
            DATE_PATTERNS.forEach(pattern -> patterns.add(Optional.of(pattern)));
        }
        for (Optional<String> dates : patterns) {
            TemperatureRequest plain = TemperatureRequest.of(forcing);
            TemperatureRequest request = new TemperatureRequest(forcing, plain.variable(), plain.unit(), plain.scale(), plain.offset(),
                    dates, plain.firstDay(), plain.member(), plain.crs());
            try {
                DailyTemperatureSource source = formats.open(file, request, new Notices());
                Kind kind = new Kind(source.files().get(0).format(), source.files().get(0).variable(), source.grid(), dates);
                found.computeIfAbsent(kind, k -> new ArrayList<>()).add(file);
                days.merge(kind, (long) source.days().size(), Long::sum);
                return true;
            } catch (ProblemException notThis) {
                // Another pattern, another quantity or ground heights; a file that is nothing of these is told of at the end.
            }
        }
        return false;
    }

    private void lookForHeights(Path file) {
        try {
            heights.put(file, formats.heightGrid(new FileEntry(file, Optional.empty(), Optional.empty()), new Notices()));
        } catch (ProblemException noHeights) {
            notices.add(file + " is not used: " + noHeights.problems().get(0).what());
        }
    }

    private List<Setting> settings(Path folder) {
        if (minima.isEmpty() || cultivars.isEmpty()) {
            throw Problem.usage("the folder has no " + (minima.isEmpty() ? "daily minima that can be understood" : "cultivar file"),
                    folder.toString(), minima.isEmpty() ? "wintersill inspect FILE tells why a file is refused; or name the files with "
                            + "--minimum" : "Add one, or name it with --cultivars").asException();
        }
        List<Setting> settings = new ArrayList<>();
        Kind kind = longest(minima, "minima");
        add(settings, "temperature.minimum.files", minima.get(kind));
        kind.dates().ifPresent(dates -> settings.add(Setting.text(FLAG, "temperature.dates", dates)));
        if (!maxima.isEmpty()) {
            Kind warm = longest(maxima, "maxima");
            if (warm.grid().equals(kind.grid())) {
                add(settings, "temperature.maximum.files", maxima.get(warm));
            }
        }
        addHeights(settings, kind.grid());
        add(settings, "cultivars.files", cultivars);
        return settings;
    }

    private Kind longest(Map<Kind, List<Path>> found, String what) {
        Kind longest = found.keySet().stream().max(Comparator.comparing(days::get)).orElseThrow();
        found.keySet().stream().filter(kind -> !kind.equals(longest)).forEach(kind -> notices.add(what + " in " + names(found.get(kind))
                + " are left aside (" + kind.words() + "); " + names(found.get(longest)) + " hold more days"));
        return longest;
    }

    /** Heights on the grid of the temperatures are what these stand for; of the others the finest is the terrain model. */
    private void addHeights(List<Setting> settings, GridGeometry source) {
        heights.forEach((file, grid) -> {
            if (grid.equals(source)) {
                add(settings, "elevation.source-height.file", List.of(file));
            }
        });
        Optional<Path> finest = heights.keySet().stream().filter(file -> !heights.get(file).equals(source))
                .max(Comparator.comparing(file -> (long) heights.get(file).rows() * heights.get(file).columns()));
        if (finest.isPresent()) {
            add(settings, "elevation.dem.file", List.of(finest.get()));
        } else {
            settings.removeIf(setting -> setting.key().startsWith("elevation."));
        }
        heights.keySet().stream().filter(file -> settings.stream().noneMatch(setting -> setting.values().contains(file.toString())))
                .forEach(file -> notices.add(file + " is not used: another terrain model of the folder is finer"));
    }

    private void add(List<Setting> settings, String key, List<Path> files) {
        settings.removeIf(setting -> setting.key().equals(key));
        settings.add(Setting.paths(FLAG, key, files.stream().map(Path::toString).toList()));
        notices.add(key.replaceFirst("\\.files?$", "") + ": " + names(files));
    }

    private static String names(List<Path> files) {
        List<String> names = files.stream().map(file -> file.getFileName().toString()).toList();
        return names.size() <= 3 ? String.join(", ", names)
                : names.stream().limit(2).collect(Collectors.joining(", ")) + " ... " + names.get(names.size() - 1) + " (" + names.size()
                        + " files)";
    }
}
