package org.wintersill.run.parcels;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import org.wintersill.config.ParcelsConfig;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.geopackage.GeoPackageWriter;
import org.wintersill.io.json.JsonText;
import org.wintersill.io.json.JsonValue;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.run.Caution;
import org.wintersill.run.Digests;
import org.wintersill.run.FinishedFolder;
import org.wintersill.run.InputFormats;
import org.wintersill.run.OutputFolder;
import org.wintersill.run.RunRecord;
import org.wintersill.run.RunVersion;

/**
 * The command {@code parcels}: a folder of its own about the parcels of a file, from a finished run that stays as it is. The folder's record
 * names the run by the fingerprint of its record.
 */
public final class ParcelsJob {
    /** Name of the GeoPackage. */
    public static final String PACKAGE = "parcels.gpkg";
    private static final String VOCABULARY = "https://www.iana.org/assignments/media-types/application/json";

    private ParcelsJob() {
    }

    /**
     * What is asked for.
     *
     * @param run folder of the finished run
     * @param target folder of the outputs
     * @param overwrite whether an earlier result there may be replaced
     * @param threads number of threads
     */
    public record Request(Path run, Path target, boolean overwrite, ParcelsConfig config, int threads) {
    }

    /**
     * What was made.
     *
     * @param parcels number of parcels
     * @param outside how many of them have no values
     * @param files number of files
     */
    public record Report(long parcels, long outside, int files) {
    }

    /**
     * Does the work; nothing is left under a final name unless all of it is.
     *
     * @throws org.wintersill.problem.ProblemException when run or parcels are refused, or the outputs cannot be written
     */
    public static Report execute(Request request, InputFormats formats, GeoToolsCrs systems, Progress progress, Notices notices,
                                 BooleanSupplier cancelled) {
        FinishedFolder run = FinishedFolder.open(request.run(), systems);
        keepRunWhole(run, request);
        try (OutputFolder folder = OutputFolder.open(request.target(), request.overwrite());
                Workers workers = new Workers(request.threads(), cancelled)) {
            Map<String, Object> record = begin(run, request);
            ParcelsOutput output = new ParcelsOutput(run, request.config(), formats, systems, workers, progress, notices);
            ParcelsOutput.Written written;
            try (GeoPackageWriter writer = GeoPackageWriter.create(folder.unfinished(PACKAGE), output.lastChange())) {
                written = output.write(folder::unfinished, Optional.of(writer));
                record.put("parcels", parcels(request, written));
                writer.metadata(VOCABULARY, JsonText.of(record));
                writer.finish();
            }
            RunRecord.complete(record, folder, notices, workers);
            write(folder.unfinished(OutputFolder.RECORD), JsonText.of(record));
            workers.checkCancelled();
            int files = folder.names().size() + 1;
            folder.publish();
            return new Report(written.parcels(), written.outside(), files);
        }
    }

    /** A run that described parcels itself keeps them in its own record; they must not be replaced behind its back. */
    private static void keepRunWhole(FinishedFolder run, Request request) {
        Path target = request.target().toAbsolutePath().normalize();
        Path folder = request.run().toAbsolutePath().normalize();
        boolean belongs = target.equals(folder) || run.record().get("outputs").items().stream().map(entry -> entry.get("path").text().orElse(""))
                .anyMatch(name -> folder.resolve(name).normalize().startsWith(target));
        if (belongs) {
            throw Problem.output("the folder holds outputs of the run itself, which its record vouches for", request.target().toString(),
                    "Choose another folder with --out").asException();
        }
    }

    private static Map<String, Object> begin(FinishedFolder run, Request request) {
        Map<String, Object> record = new LinkedHashMap<>();
        record.put("version", 1);
        record.put("program", RunVersion.program());
        record.put("java", System.getProperty("java.version"));
        record.put("kind", "parcels");
        record.put("title", run.record().get("title").text().orElse(""));
        record.put("caution", Caution.SHORT);
        Map<String, Object> base = new LinkedHashMap<>();
        base.put("folder", String.valueOf(request.run().toAbsolutePath().normalize().getFileName()));
        base.put("record-sha256", Digests.ofFile(request.run().resolve(OutputFolder.RECORD)));
        base.put("winters", run.winters());
        base.put("cultivars", run.record().get("cultivars").items().stream().map(ParcelsJob::cultivar).toList());
        record.put("run", base);
        return record;
    }

    private static Map<String, Object> cultivar(JsonValue cultivar) {
        Map<String, Object> entry = new LinkedHashMap<>();
        for (String key : List.of("id", "name", "status", "source")) {
            entry.put(key, cultivar.get(key).text().orElse(""));
        }
        return entry;
    }

    private static Map<String, Object> parcels(Request request, ParcelsOutput.Written written) {
        Path file = request.config().polygons().file();
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("path", String.valueOf(file.getFileName()));
        entry.put("bytes", file.toFile().length());
        entry.put("sha256", Digests.ofFile(file));
        entry.putAll(written.source());
        return entry;
    }

    private static void write(Path file, String text) {
        try {
            Files.writeString(file, text, StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw Problem.output("the file cannot be written: " + e.getMessage(), file.toString(),
                    "Check the permissions of the folder and the free space of the disk").asException(e);
        }
    }
}
