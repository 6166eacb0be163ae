package org.wintersill.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.BooleanSupplier;
import java.util.function.Function;
import java.util.function.IntPredicate;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.wintersill.config.ParcelsConfig;
import org.wintersill.engine.LocalEngine;
import org.wintersill.engine.Progress;
import org.wintersill.engine.NightMeans;
import org.wintersill.elevation.terrain.PoolGround;
import org.wintersill.engine.WinterStore;
import org.wintersill.engine.Workers;
import org.wintersill.io.crs.CellAreas;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.crs.GeoKeys;
import org.wintersill.io.geotiff.write.CogFormat;
import org.wintersill.io.geotiff.write.GeoKeyTags;
import org.wintersill.io.json.JsonText;
import org.wintersill.layer.RasterFormat;
import org.wintersill.problem.Notices;
import org.wintersill.run.parcels.ParcelsOutput;
import org.wintersill.scenario.ScenarioSource;
import org.wintersill.season.WinterValues;

/** The main job: from a plan to a finished output folder. */
public final class MapRun {
    private final RunPlan plan;
    private final boolean overwrite;
    private final Progress progress;
    private final Notices notices;
    private final InputFormats formats;
    private final GeoToolsCrs systems;
    private Optional<Path> wintersFrom = Optional.empty();

    /** @param overwrite whether finished outputs in the folder may be replaced */
    public MapRun(RunPlan plan, boolean overwrite, InputFormats formats, GeoToolsCrs systems, Progress progress, Notices notices) {
        this.plan = plan;
        this.overwrite = overwrite;
        this.progress = progress;
        this.notices = notices;
        this.formats = formats;
        this.systems = systems;
    }

    /** Takes the winters that a finished run kept in its folder, where one is given, instead of folding nights. */
    public MapRun withWintersFrom(Optional<Path> folder) {
        wintersFrom = folder;
        return this;
    }

    /**
     * Runs the job.
     *
     * @param cancelled whether the user asked to stop
     * @return areas by class, one a cultivar
     * @throws org.wintersill.problem.ProblemException when an input is damaged or no winter counts anywhere, or the outputs
     *         cannot be written; nothing is left under a final name
     * @throws org.wintersill.engine.CancelledException when the user asked to stop; likewise
     */
    public RunReport execute(BooleanSupplier cancelled) {
        int cultivars = plan.cultivars().size();
        Path target = plan.config().outputs().folder();
        try (OutputFolder folder = OutputFolder.open(target, overwrite);
                Workers workers = new Workers(plan.foldPlan().threads(), cancelled);
                InputDigests digests = new InputDigests(RunRecord.inputFiles(plan));
                WinterStore store = new WinterStore(folder.unfinished("winters.tmp"),
                        plan.job().planes(), wantedPlanes(cultivars), plan.seasons().size(), plan.target().rows(),
                        plan.target().columns())) {
            Optional<NightMeans> means = Optional.empty();
            if (wintersFrom.isPresent()) {
                KeptWinters.take(wintersFrom.get(), plan, digests.await(), store);
            } else {
                prepareGround(workers);
                means = Optional.of(fold(folder, store, workers));
            }
            CountingWinters.require(plan, store);
            Map<String, Object> record = RunRecord.begin(plan, digests.await());
            RasterFormat format = new CogFormat(crs -> {
                GeoKeys keys = GeoKeys.of(crs);
                return new GeoKeyTags(keys.directory(), keys.doubles(), keys.ascii());
            });
            String digest = Digests.ofText(JsonText.of(RecordedConfiguration.of(plan.config().effective())));
            LayerOutput output = new LayerOutput(folder, format, plan.target(), plan.seasons(), digest, workers.executor());
            LayerSelection selection = new LayerSelection(plan.config().outputs().layers());
            new AdjustmentLayers(plan, means, output, selection).write(notices);
            SummaryPass summaries = new SummaryPass(plan, store, output, selection, workers, progress);
            writeLayers(summaries, cultivars);
            new SharedVariance(plan, store, output, selection, workers).write();
            for (int c = 0; c < cultivars; c++) {
                if (MilderSite.wanted(plan, selection, c)) {
                    new MilderSite(plan, store, output, workers).write(c, summaries.meanPlane(c));
                }
            }
            List<ClassAreas> areas = tables(folder, output, summaries, record, workers);
            if (plan.config().outputs().netcdf()) {
                new NetcdfOutput(plan, store, folder, systems, output.period()).write();
            }
            if (plan.config().outputs().keepWinters()) {
                store.keep(folder.unfinished(KeptWinters.FILE));
                record.put(KeptWinters.KEY, KeptWinters.fingerprint(plan, digests.await()));
            }
            store.close();
            RunRecord.complete(record, folder, notices, workers);
            LayerOutput.write(folder.unfinished(OutputFolder.RECORD), JsonText.of(record));
            workers.checkCancelled();
            int files = folder.names().size() + 1;
            folder.publish();
            return new RunReport(target, files, areas);
        }
    }

    /** The ground under the pools, once, before nights are folded over it. */
    private void prepareGround(Workers workers) {
        if (plan.adjustment().terms().pools() instanceof PoolGround ground) {
            progress.begin("Terrain", ground.tasks());
            workers.forEach(ground.tasks(), (worker, task) -> {
                ground.prepare(task);
                progress.advance(1);
            });
            progress.end();
        }
    }

    private NightMeans fold(OutputFolder folder, WinterStore store, Workers workers) {
        if (!(plan.source() instanceof ScenarioSource scenario)) {
            return fold(store, workers);
        }
        try {
            scenario.prepare(folder.unfinished("scenario.tmp"), plan.job().window(), Estimates.budget(plan.config().limits()), workers,
                    progress);
            return fold(store, workers);
        } finally {
            scenario.release();
        }
    }

    private NightMeans fold(WinterStore store, Workers workers) {
        LocalEngine engine = new LocalEngine(plan.job(), plan.foldPlan());
        engine.run(store, workers, progress, notices);
        return engine.nightMeans();
    }

    /** Worst nights are only read again for layers with a value a winter. */
    private IntPredicate wantedPlanes(int cultivars) {
        if (plan.config().outputs().keepWinters() || plan.config().outputs().winters() || plan.config().outputs().netcdf()) {
            return plane -> true;
        }
        Set<Integer> nights = IntStream.range(0, cultivars)
                .mapToObj(cultivar -> WinterValues.worstNightPlane(cultivar, plan.job().levels())).collect(Collectors.toSet());
        return plane -> !nights.contains(plane);
    }

    private void writeLayers(SummaryPass summaries, int cultivars) {
        boolean winters = plan.config().outputs().winters();
        progress.begin("Layers", summaries.size(winters));
        for (int c = 0; c < cultivars; c++) {
            summaries.cultivar(c);
        }
        summaries.shared();
        summaries.choice();
        summaries.heights();
        if (winters) {
            summaries.winters();
        }
        progress.end();
    }

    private List<ClassAreas> tables(OutputFolder folder, LayerOutput output, SummaryPass summaries, Map<String, Object> record,
                                    Workers workers) {
        double[] rowAreas = CellAreas.rowAreasKm2(plan.target());
        List<ClassAreas> areas = new ArrayList<>();
        for (byte[] classes : summaries.classes()) {
            areas.add(ClassAreas.of(classes, plan.target().columns(), rowAreas, plan.adjustment()));
        }
        LayerOutput.write(folder.unfinished("summary.csv"), SummaryTables.csv(plan, areas));
        LayerOutput.write(folder.unfinished("summary.json"), SummaryTables.json(plan, areas));
        Optional<ParcelsOutput> parcels = plan.config().parcels().map(config -> parcels(config, folder, record, workers));
        Function<String, Path> place = name -> folder.unfinished("parcels/" + name);
        if (plan.config().outputs().geopackage()) {
            new PackageOutput(plan, summaries, rowAreas, output.period()).write(folder.unfinished("layers.gpkg"), areas, JsonText.of(record),
                    writer -> parcels.ifPresent(step -> step.write(place, Optional.of(writer))));
        } else {
            parcels.ifPresent(step -> step.write(place, Optional.empty()));
        }
        return areas;
    }

    /** Parcels read the layers back as they would from a finished folder, so the record stands there for the while, without fingerprints. */
    private ParcelsOutput parcels(ParcelsConfig config, OutputFolder folder, Map<String, Object> record, Workers workers) {
        Map<String, Object> sofar = new LinkedHashMap<>(record);
        sofar.put("outputs", folder.names().stream().map(name -> Map.of("path", name)).toList());
        Path file = folder.unfinished(OutputFolder.RECORD);
        LayerOutput.write(file, JsonText.of(sofar));
        return new ParcelsOutput(FinishedFolder.open(file.getParent(), systems), config, formats, systems, workers, progress, notices);
    }
}
