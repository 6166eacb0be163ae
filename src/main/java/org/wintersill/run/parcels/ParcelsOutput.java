package org.wintersill.run.parcels;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.wintersill.config.ParcelsConfig;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.geopackage.CrsRow;
import org.wintersill.io.geopackage.GeoPackageWriter;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.problem.Notices;
import org.wintersill.run.FinishedFolder;
import org.wintersill.run.InputFormats;

/** Writes everything about the parcels of a file: tables of a GeoPackage, CSV, JSON and sheets. */
public final class ParcelsOutput {
    private final FinishedRun run;
    private final ParcelsConfig config;
    private final InputFormats formats;
    private final GeoToolsCrs systems;
    private final Workers workers;
    private final Progress progress;
    private final Notices notices;

    public ParcelsOutput(FinishedFolder folder, ParcelsConfig config, InputFormats formats, GeoToolsCrs systems, Workers workers,
                         Progress progress, Notices notices) {
        run = FinishedRun.of(folder);
        this.config = config;
        this.formats = formats;
        this.systems = systems;
        this.workers = workers;
        this.progress = progress;
        this.notices = notices;
    }

    /**
     * What was written.
     *
     * @param parcels number of parcels
     * @param outside how many of them lie outside of the grid
     * @param source how the file was understood, for the record
     */
    public record Written(long parcels, long outside, Map<String, Object> source) {
    }

    /**
     * Writes.
     *
     * @param place where to write a file of a name
     * @param writer GeoPackage that gets the tables
     * @throws org.wintersill.problem.ProblemException when the parcels are refused, no parcel meets the grid, or the outputs cannot be written
     */
    public Written write(Function<String, Path> place, Optional<GeoPackageWriter> writer) {
        ParcelRun job = new ParcelRun(run, formats, systems, systems, workers, progress, notices);
        ParcelFields fields = new ParcelFields(run, job);
        try (PolygonReader reader = formats.polygons(config.polygons()); ParcelFiles files = new ParcelFiles(run, job, fields, place)) {
            Optional<ParcelTables> tables = writer.map(file -> new ParcelTables(file, run, fields, reader.crs(), CrsRow.FIRST_OWN_ID + 1));
            SheetSelection sheets = new SheetSelection(config, place, notices);
            job.describe(reader, config, parcel -> {
                files.add(parcel);
                tables.ifPresent(table -> table.add(parcel));
                sheets.add(parcel, job, run, systems.between(reader.crs(), job.grid().crs()));
            });
            tables.ifPresent(ParcelTables::style);
            sheets.finish();
            Map<String, Object> source = new LinkedHashMap<>();
            source.put("layer", reader.layer());
            source.put("id-column", reader.idColumn().isEmpty() ? "row number" : reader.idColumn());
            source.put("crs", reader.crs().label());
            source.put("parcels", job.parcels());
            return new Written(job.parcels(), job.outside(), source);
        }
    }

    /** Time that a GeoPackage of these parcels carries as its last change. */
    String lastChange() {
        return run.lastChange();
    }
}
