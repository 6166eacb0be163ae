package org.wintersill.run;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;

/** A run file, two invented cultivars and the folder {@code daily} for temperature files, made in an empty folder. */
final class RunFolder {
    private static final String LAYERS = "margin, damage, worst-night, minimum, margin-mean, damage-probability-50, valid-winters";

    private final Path folder;

    RunFolder(Path folder) {
        this.folder = folder;
        try {
            Files.createDirectories(folder.resolve("daily"));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        text("cultivars.yaml", cultivars(0));
        text("run.yaml", "temperature: {minimum: daily}\ncultivars: cultivars.yaml\noutputs: {layers: [" + LAYERS + "], geopackage: false}\n");
    }

    /** Cultivars whose lethal temperatures are all lower by some kelvins. */
    static String cultivars(double hardier) {
        return "cultivars:\n" + cultivar("oat", -11.5 - hardier, 2) + cultivar("rye", -15.5 - hardier, 3);
    }

    private static String cultivar(String id, double midwinter, double spread) {
        StringBuilder text = new StringBuilder("  - {id: " + id + ", name: Test " + id + ", species: none, organ: bud, model: dated, "
                + "source: made up, status: own data, outside: hold, curve: [");
        double[] change = {9, 2, 0, 0, 3, 10};
        String[] dates = {"09-01", "11-10", "12-20", "02-10", "03-20", "05-31"};
        for (int i = 0; i < dates.length; i++) {
            double lt50 = midwinter + change[i];
            text.append(i == 0 ? "" : ", ").append("{date: ").append(dates[i]).append(", lt10: ").append(lt50 + spread / 2)
                    .append(", lt50: ").append(lt50).append(", lt90: ").append(lt50 - spread).append('}');
        }
        return text.append("]}\n").toString();
    }

    /** A run of one netCDF file of a record. */
    static RunFolder of(Path folder, RecordFile file) {
        RunFolder run = new RunFolder(folder);
        file.write(run.daily("tmin.nc"));
        return run;
    }

    Path path(String name) {
        return folder.resolve(name);
    }

    Path daily(String name) {
        return folder.resolve("daily").resolve(name);
    }

    RunFolder text(String name, String content) {
        try {
            Files.writeString(folder.resolve(name), content, StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return this;
    }

    Program.Ended end(String... more) {
        List<String> arguments = new ArrayList<>(List.of("map", folder.resolve("run.yaml").toString()));
        arguments.addAll(Arrays.asList(more));
        return Program.run(arguments.toArray(String[]::new));
    }

    /** Runs the job, which must succeed. */
    RunFolder map(String... more) {
        end(more).expect(0);
        return this;
    }

    RasterFile raster(String name) {
        return RasterFile.read(folder.resolve("out").resolve(name + ".tif"));
    }

    Map<String, float[][]> rasters() {
        Map<String, float[][]> rasters = new TreeMap<>();
        files(folder.resolve("out")).keySet().stream().filter(name -> name.endsWith(".tif"))
                .forEach(name -> rasters.put(name, RasterFile.read(folder.resolve("out").resolve(name)).bands()));
        return rasters;
    }

    /** Every output file but those that hold fingerprints of the inputs, name to content. */
    Map<String, byte[]> outputsButRecord() {
        Map<String, byte[]> files = files(folder.resolve("out"));
        files.remove("record.json");
        files.remove("layers.gpkg");
        return files;
    }

    /** Files below a folder, name to content, in order. */
    static Map<String, byte[]> files(Path root) {
        Map<String, byte[]> files = new TreeMap<>();
        if (!Files.exists(root)) {
            return files;
        }
        try (Stream<Path> walk = Files.walk(root)) {
            for (Path file : walk.filter(Files::isRegularFile).sorted(Comparator.naturalOrder()).toList()) {
                files.put(root.relativize(file).toString().replace('\\', '/'), Files.readAllBytes(file));
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return files;
    }

    /** Names of files that differ or are in one of the two only. */
    static List<String> differing(Map<String, byte[]> a, Map<String, byte[]> b) {
        List<String> names = new ArrayList<>();
        a.forEach((name, bytes) -> {
            if (!b.containsKey(name) || !Arrays.equals(bytes, b.get(name))) {
                names.add(name);
            }
        });
        b.keySet().stream().filter(name -> !a.containsKey(name)).forEach(names::add);
        return names;
    }
}
