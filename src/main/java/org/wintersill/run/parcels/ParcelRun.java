package org.wintersill.run.parcels;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.wintersill.config.ParcelsConfig;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CellAreas;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.parcel.CellCover;
import org.wintersill.parcel.CoveredCells;
import org.wintersill.layer.LayerStyle;
import org.wintersill.parcel.Outline;
import org.wintersill.parcel.OutlinePlacement;
import org.wintersill.parcel.PolygonFeature;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.run.InputFormats;

/**
 * Describes the parcels of a file by the layers of a finished run. Parcels come in batches that fit the memory; for each batch every
 * layer is read once, tile by tile, whatever the order of the parcels in their file.
 */
final class ParcelRun {
    /** Share of the memory that the totals of a batch may take, and as much for its cells. */
    private static final int MEMORY_PART = 5;
    private static final int BYTES_A_TOTAL = 24;
    private static final int BYTES_A_RUN = 44;
    private static final int FEWEST_PARCELS = 64;
    private static final int MOST_PARCELS = 50_000;
    /** Parcels with something wrong that are told of by name. */
    private static final int MOST_NAMED = 20;

    private final FinishedRun run;
    private final InputFormats formats;
    private final CoordinateOperations operations;
    private final CrsParser parser;
    private final Workers workers;
    private final Progress progress;
    private final Notices notices;
    private final GridGeometry grid;
    private final int tile;
    private final List<List<LayerInfo>> cultivarLayers = new ArrayList<>();
    private final List<LayerInfo> sharedLayers = new ArrayList<>();
    private final Set<String> seenIds = new HashSet<>();
    private long parcels;
    private long outside;
    private long onGrid;
    private boolean anySwapped;
    private int remarks;

    /** Takes the parcels in the order of their file. */
    interface Taker {
        void take(ParcelResult parcel);
    }

    /** A parcel of the batch in work. */
    private record Waiting(PolygonFeature feature, CoveredCells.Extent extent, boolean swapped, boolean repeated) {
    }

    ParcelRun(FinishedRun run, InputFormats formats, CoordinateOperations operations, CrsParser parser, Workers workers, Progress progress,
              Notices notices) {
        this.run = run;
        this.formats = formats;
        this.operations = operations;
        this.parser = parser;
        this.workers = workers;
        this.progress = progress;
        this.notices = notices;
        requireWinters();
        for (FinishedRun.CultivarEntry cultivar : run.cultivars()) {
            cultivarLayers.add(run.summaries(cultivar.id()).stream().map(name -> LayerInfo.of(run, name, parser)).toList());
        }
        run.summaries("shared").forEach(name -> sharedLayers.add(LayerInfo.of(run, name, parser)));
        try (PlainRaster raster = PlainRaster.open(run.folder().resolve(run.winterLayer(run.cultivars().get(0).id(), "margin").orElseThrow()),
                parser)) {
            grid = raster.grid();
            tile = raster.tile();
        }
    }

    private void requireWinters() {
        for (FinishedRun.CultivarEntry cultivar : run.cultivars()) {
            for (String layer : List.of("margin", "damage")) {
                if (run.winterLayer(cultivar.id(), layer).isEmpty()) {
                    throw Problem.input("the run has no layer " + cultivar.id() + "/winters/" + layer + ", which parcels need", run.folder().toString(),
                            "Make the outputs again with outputs.winters: true and the layers margin and damage").asException();
                }
            }
        }
    }

    GridGeometry grid() {
        return grid;
    }

    /** Layers of a cultivar, in the order of {@link CultivarResult#layers}. */
    List<LayerInfo> layers(int cultivar) {
        return cultivarLayers.get(cultivar);
    }

    /** Layers of no cultivar, in the order of {@link ParcelResult#shared}. */
    List<LayerInfo> shared() {
        return sharedLayers;
    }

    /** Number of parcels so far. */
    long parcels() {
        return parcels;
    }

    /** Number of parcels so far that lie outside of the grid. */
    long outside() {
        return outside;
    }

    /**
     * Describes every parcel of a file.
     *
     * @throws org.wintersill.problem.ProblemException when the file is damaged, or no parcel meets the grid
     */
    void describe(PolygonReader reader, ParcelsConfig config, Taker taker) {
        CoordinateOperation toGrid = operations.between(reader.crs(), grid.crs());
        OutlinePlacement placement = new OutlinePlacement(grid, toGrid, CellAreas.areaNorthward(grid.crs()));
        long most = mostParcels();
        long mostRuns = Runtime.getRuntime().maxMemory() / MEMORY_PART / BYTES_A_RUN;
        PolygonFeature feature = reader.next();
        while (feature != null) {
            CoveredCells cells = new CoveredCells(placement, tile);
            List<Waiting> batch = new ArrayList<>();
            while (feature != null && batch.size() < most && cells.runs() < mostRuns) {
                CoveredCells.Extent extent = cells.add(feature.outline());
                boolean swapped = extent.cells() == 0 && !feature.outline().isEmpty() && wouldMeet(placement, feature);
                batch.add(new Waiting(feature, extent, swapped, !seenIds.add(feature.id())));
                count(feature, extent, swapped);
                feature = reader.next();
            }
            workers.checkCancelled();
            describe(batch, cells, taker);
        }
        if (parcels == 0) {
            throw Problem.input("the layer " + reader.layer() + " has no rows", config.polygons().file().toString(), "Name another layer or file")
                    .asException();
        }
        if (onGrid == 0) {
            throw Problem.input("no parcel meets the grid of the run, which is " + grid.describe(), config.polygons().file().toString(),
                    anySwapped ? "x and y seem to be swapped in the parcels" : "Check the reference system of the parcels, " + reader.crs().label())
                    .asException();
        }
    }

    private void count(PolygonFeature feature, CoveredCells.Extent extent, boolean swapped) {
        parcels++;
        onGrid += extent.cells() > 0 ? 1 : 0;
        anySwapped |= swapped;
        if (extent.cells() == 0 && !feature.outline().isEmpty()) {
            outside++;
            notices.add("parcels outside of the grid have no values" + (swapped ? "; x and y seem to be swapped in some" : ""));
        }
        if (!feature.remark().isEmpty()) {
            remarks++;
            notices.add(remarks <= MOST_NAMED ? "parcel " + feature.id() + ": " + feature.remark()
                    : "further parcels were repaired or cannot be used: see the column warnings");
        }
    }

    private boolean wouldMeet(OutlinePlacement placement, PolygonFeature feature) {
        boolean[] meets = {false};
        new CellCover(grid.columns(), grid.rows()).find(placement.place(feature.outline().swapped()).rings(),
                (row, column, length, share) -> meets[0] = true);
        return meets[0];
    }

    private long mostParcels() {
        long totals = sharedLayers.size();
        for (List<LayerInfo> layers : cultivarLayers) {
            totals += layers.size() + 3L * run.winters().size();
        }
        long fit = Runtime.getRuntime().maxMemory() / MEMORY_PART / (totals * BYTES_A_TOTAL);
        return Math.max(FEWEST_PARCELS, Math.min(MOST_PARCELS, fit));
    }

    private void describe(List<Waiting> batch, CoveredCells cells, Taker taker) {
        cells.sortByTile();
        RasterPass pass = new RasterPass(grid, cells, tile, parser);
        List<RasterPass.Winters> winters = new ArrayList<>();
        List<List<RasterPass.Summary>> summaries = new ArrayList<>();
        for (int c = 0; c < run.cultivars().size(); c++) {
            String id = run.cultivars().get(c).id();
            winters.add(pass.winters(run.winters().size(), run.folder().resolve(run.winterLayer(id, "margin").orElseThrow()),
                    run.folder().resolve(run.winterLayer(id, "damage").orElseThrow()),
                    run.winterLayer(id, "worst-night").map(run.folder()::resolve).orElse(null)));
        }
        for (List<LayerInfo> layers : cultivarLayers) {
            summaries.add(layers.stream().map(pass::summary).toList());
        }
        List<RasterPass.Summary> shared = sharedLayers.stream().map(pass::summary).toList();
        ColdGround coldGround = ColdGround.plan(shared, pass);
        pass.run(workers, progress);
        ParcelResults results = new ParcelResults(run, summaries, winters, shared, coldGround);
        for (int number = 0; number < batch.size(); number++) {
            Waiting parcel = batch.get(number);
            taker.take(results.of(number, parcel.feature(), parcel.extent(), parcel.swapped(), parcel.repeated()));
        }
    }

    /** A map of a layer around an outline, as SVG. */
    String excerpt(Outline outline, CoordinateOperation toGrid, LayerInfo layer, LayerStyle.Ramp ramp, String title) {
        OutlinePlacement placement = new OutlinePlacement(grid, toGrid, y -> y);
        try (PlainRaster raster = PlainRaster.open(layer.file(), parser)) {
            return new MapExcerpt(grid, placement.place(outline).rings()).svg(raster, ramp, title);
        }
    }
}
