package org.wintersill.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.engine.Workers;
import org.wintersill.config.AreaConfig;
import org.wintersill.config.PolygonEntry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.problem.Notices;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.SourceFile;

/**
 * {@code record.json}: what made the outputs. No clock, user, host or absolute path, so that the same input gives the same
 * bytes; the number of threads and the memory limit stay out for the same reason, since no result depends on them.
 */
public final class RunRecord {
    private RunRecord() {
    }

    /** What is known before the outputs exist: program, configuration, inputs, winters, cultivars. */
    static Map<String, Object> begin(RunPlan plan, Map<Path, String> digests) {
        Map<String, Object> record = new LinkedHashMap<>();
        record.put("version", 1);
        record.put("program", RunVersion.program());
        record.put("java", System.getProperty("java.version"));
        record.put("title", plan.config().title());
        record.put("caution", Caution.SHORT);
        record.put("configuration", RecordedConfiguration.of(plan.config().effective()));
        record.put("inputs", inputs(plan, digests));
        record.put("grid", plan.target().describe());
        record.put("temperature-grid", plan.source().grid().describe());
        record.put("winter-window", plan.window().from() + " to " + plan.window().to() + ", complete part "
                + plan.window().completeFrom() + " to " + plan.window().completeTo());
        record.put("calendar", plan.seasons().get(0).calendar().cfName());
        record.put("winters", plan.seasons().stream().map(season -> season.label()).toList());
        record.put("winter-starts", plan.seasons().stream().map(season -> season.first().toString()).toList());
        Map<String, Object> dropped = new LinkedHashMap<>();
        plan.dropped().forEach(winter -> dropped.put(winter.label(), winter.reason()));
        record.put("winters-not-used", dropped);
        record.put("cultivars", plan.cultivars().stream().map(RunRecord::cultivar).toList());
        return record;
    }

    private static Map<String, Object> cultivar(Cultivar cultivar) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("id", cultivar.id());
        entry.put("name", cultivar.name());
        entry.put("species", cultivar.species());
        entry.put("organ", cultivar.organ());
        entry.put("status", cultivar.status().word());
        entry.put("source", cultivar.source());
        entry.put("model", cultivar.model().id());
        entry.put("tolerance", cultivar.tolerance().key());
        return entry;
    }

    private static List<Map<String, Object>> inputs(RunPlan plan, Map<Path, String> digests) {
        List<Map<String, Object>> inputs = new ArrayList<>();
        Path base = plan.config().baseFolder().toAbsolutePath().normalize();
        plan.source().files().forEach(file -> inputs.add(temperatures(base, file, plan.source(), digests)));
        if (plan.job().states().hasSecond()) {
            DailyTemperatureSource second = plan.job().states().second();
            second.files().forEach(file -> inputs.add(temperatures(base, file, second, digests)));
        }
        poolMaxima(plan).ifPresent(maxima -> maxima.files().forEach(file -> inputs.add(temperatures(base, file, maxima, digests))));
        plan.config().elevation().ifPresent(elevation -> {
            inputs.add(entry(base, elevation.dem().file(), "terrain model", digests));
            elevation.sourceHeight().ifPresent(height -> inputs.add(entry(base, height.file(), "source heights", digests)));
            elevation.water().ifPresent(water -> inputs.add(entry(base, water.file(), "water mask", digests)));
        });
        plan.config().cultivars().files().forEach(file -> inputs.add(entry(base, file, "cultivars", digests)));
        areaPolygons(plan).ifPresent(file -> inputs.add(entry(base, file, "area polygons", digests)));
        plan.config().parcels().ifPresent(parcels -> inputs.add(entry(base, parcels.polygons().file(), "parcels", digests)));
        return inputs;
    }

    private static Map<String, Object> temperatures(Path base, SourceFile file, DailyTemperatureSource source,
                                                    Map<Path, String> digests) {
        Map<String, Object> entry = entry(base, Path.of(file.path()), source.variable().word() + " temperature", digests);
        entry.put("format", file.format());
        entry.put("variable", file.variable());
        entry.put("unit", file.unit());
        entry.put("calendar", file.calendar());
        entry.put("period", file.firstDate() + " to " + file.lastDate());
        entry.put("days", file.dayCount());
        entry.put("grid", file.grid());
        return entry;
    }

    /** All input files of a run. */
    static List<Path> inputFiles(RunPlan plan) {
        List<Path> files = new ArrayList<>();
        plan.source().files().forEach(file -> files.add(Path.of(file.path())));
        if (plan.job().states().hasSecond()) {
            plan.job().states().second().files().forEach(file -> files.add(Path.of(file.path())));
        }
        poolMaxima(plan).ifPresent(maxima -> maxima.files().forEach(file -> files.add(Path.of(file.path()))));
        plan.config().elevation().ifPresent(elevation -> {
            files.add(elevation.dem().file());
            elevation.sourceHeight().ifPresent(height -> files.add(height.file()));
            elevation.water().ifPresent(water -> files.add(water.file()));
        });
        files.addAll(plan.config().cultivars().files());
        areaPolygons(plan).ifPresent(files::add);
        plan.config().parcels().ifPresent(parcels -> files.add(parcels.polygons().file()));
        return files;
    }

    /** The maxima that tell nights with pools, where they are not among the inputs already. */
    private static Optional<DailyTemperatureSource> poolMaxima(RunPlan plan) {
        return plan.job().poolMaxima().filter(maxima -> maxima != plan.job().states().second());
    }

    private static Optional<Path> areaPolygons(RunPlan plan) {
        return plan.config().area().flatMap(AreaConfig::polygons).map(PolygonEntry::file);
    }

    private static Map<String, Object> entry(Path base, Path file, String role, Map<Path, String> digests) {
        Map<String, Object> entry = new LinkedHashMap<>();
        Path absolute = file.toAbsolutePath().normalize();
        boolean sameRoot = absolute.getRoot() != null && absolute.getRoot().equals(base.getRoot());
        String name = sameRoot && absolute.startsWith(base) ? base.relativize(absolute).toString() : absolute.getFileName().toString();
        entry.put("path", name.replace('\\', '/'));
        entry.put("role", role);
        entry.put("bytes", file.toFile().length());
        entry.put("sha256", digests.get(file));
        return entry;
    }

    /** Adds what is known at the end: outputs with their fingerprints, notices with their counts. */
    public static void complete(Map<String, Object> record, OutputFolder folder, Notices notices, Workers workers) {
        List<String> names = folder.names();
        String[] digests = new String[names.size()];
        long[] sizes = new long[names.size()];
        workers.forEach(names.size(), (worker, task) -> {
            Path file = folder.unfinished(names.get(task));
            sizes[task] = file.toFile().length();
            digests[task] = Digests.ofFile(file);
        });
        List<Map<String, Object>> outputs = new ArrayList<>();
        for (int i = 0; i < digests.length; i++) {
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("path", names.get(i));
            entry.put("bytes", sizes[i]);
            entry.put("sha256", digests[i]);
            outputs.add(entry);
        }
        record.put("outputs", outputs);
        record.put("notices", notices.counts());
    }
}
