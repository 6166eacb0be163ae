package org.wintersill.run.parcels;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.parcel.ClassTotals;
import org.wintersill.parcel.CoveredCells;
import org.wintersill.parcel.LayerTotals;
import org.wintersill.parcel.NightOfLowest;
import org.wintersill.problem.Problem;

/**
 * One pass over the layers of a run for many parcels. Every file is one task, or one for some of its bands; it reads each tile that a
 * parcel meets once, in the order of the tiles, so that no sum depends on the number of threads.
 */
final class RasterPass {
    /** Bands of a file with one band a winter that one task takes. */
    private static final int BANDS_AT_ONCE = 6;

    /** Totals of one layer. */
    record Summary(LayerInfo layer, LayerTotals totals, ClassTotals classes) {
    }

    /** Totals of the winters of one cultivar. */
    record Winters(LayerTotals[] margin, LayerTotals[] damage, NightOfLowest[] nights) {
    }

    private final GridGeometry grid;
    private final CoveredCells cells;
    private final CrsParser parser;
    private final List<Runnable> tasks = new ArrayList<>();
    private final ThreadLocal<float[]> room;
    private final ThreadLocal<float[]> otherRoom;

    /** @param cells sorted by tile */
    RasterPass(GridGeometry grid, CoveredCells cells, int tile, CrsParser parser) {
        this.grid = grid;
        this.cells = cells;
        this.parser = parser;
        room = ThreadLocal.withInitial(() -> new float[tile * tile]);
        otherRoom = ThreadLocal.withInitial(() -> new float[tile * tile]);
    }

    /** Plans the totals of a summary layer; filled by {@link #run}. */
    Summary summary(LayerInfo layer) {
        LayerTotals totals = layer.hasClasses() ? null : new LayerTotals(cells.parcels());
        ClassTotals classes = layer.hasClasses() ? new ClassTotals(cells.parcels(), layer.classes().size() - 1) : null;
        tasks.add(() -> {
            try (PlainRaster raster = open(layer.file())) {
                eachTile(raster, 0, room.get(), (tile, values) -> {
                    if (totals == null) {
                        classes.add(cells, tile, values);
                    } else {
                        totals.add(cells, tile, values);
                    }
                });
            }
        });
        return new Summary(layer, totals, classes);
    }

    /** Plans the share of area on which a layer is at least as high as a limit: class 1 of what is given back. */
    ClassTotals atLeast(LayerInfo layer, float limit) {
        ClassTotals classes = new ClassTotals(cells.parcels(), 1);
        tasks.add(() -> {
            try (PlainRaster raster = open(layer.file())) {
                eachTile(raster, 0, room.get(), (tile, values) -> {
                    for (int i = 0; i < values.length; i++) {
                        values[i] = values[i] >= limit ? 1 : values[i] < limit ? 0 : Float.NaN;
                    }
                    classes.add(cells, tile, values);
                });
            }
        });
        return classes;
    }

    /**
     * Plans the totals of every winter of a cultivar.
     *
     * @param nights file of the worst nights; null where the run has none
     */
    Winters winters(int count, Path margin, Path damage, Path nights) {
        LayerTotals[] margins = fill(count, LayerTotals[]::new, cells.parcels());
        LayerTotals[] damages = fill(count, LayerTotals[]::new, cells.parcels());
        NightOfLowest[] worst = nights == null ? null
                : IntStream.range(0, count).mapToObj(winter -> new NightOfLowest(cells.parcels())).toArray(NightOfLowest[]::new);
        for (int from = 0; from < count; from += BANDS_AT_ONCE) {
            int first = from;
            int end = Math.min(count, from + BANDS_AT_ONCE);
            tasks.add(() -> totals(damage, first, end, damages));
            tasks.add(() -> {
                if (worst == null) {
                    totals(margin, first, end, margins);
                } else {
                    marginsAndNights(margin, nights, first, end, margins, worst);
                }
            });
        }
        return new Winters(margins, damages, worst);
    }

    private static LayerTotals[] fill(int count, IntFunction<LayerTotals[]> array, int parcels) {
        return IntStream.range(0, count).mapToObj(winter -> new LayerTotals(parcels)).toArray(array);
    }

    private void totals(Path file, int first, int end, LayerTotals[] totals) {
        try (PlainRaster raster = open(file)) {
            requireBands(raster, file, totals.length);
            for (int band = first; band < end; band++) {
                LayerTotals winter = totals[band];
                eachTile(raster, band, room.get(), (tile, values) -> winter.add(cells, tile, values));
            }
        }
    }

    private void marginsAndNights(Path margin, Path nights, int first, int end, LayerTotals[] totals, NightOfLowest[] worst) {
        try (PlainRaster margins = open(margin); PlainRaster dates = open(nights)) {
            requireBands(margins, margin, totals.length);
            requireBands(dates, nights, totals.length);
            for (int band = first; band < end; band++) {
                int winter = band;
                float[] night = otherRoom.get();
                eachTile(margins, band, room.get(), (tile, values) -> {
                    totals[winter].add(cells, tile, values);
                    dates.read(winter, cells.block(tile), night);
                    worst[winter].add(cells, tile, values, night);
                });
            }
        }
    }

    private static void requireBands(PlainRaster raster, Path file, int bands) {
        if (raster.bands() != bands) {
            throw Problem.input("the layer has " + raster.bands() + " bands, and the record names " + bands + " winters", file.toString(),
                    "Make the outputs again with map").asException();
        }
    }

    private PlainRaster open(Path file) {
        PlainRaster raster = PlainRaster.open(file, parser);
        if (!raster.grid().sameAs(grid)) {
            raster.close();
            throw Problem.input("the layer is on another grid than the others: " + raster.grid().describe(), file.toString(),
                    "Make the outputs again with map").asException();
        }
        return raster;
    }

    private interface TileTaker {
        void take(int tile, float[] values);
    }

    private void eachTile(PlainRaster raster, int band, float[] values, TileTaker taker) {
        for (int tile = 0; tile < cells.tiles(); tile++) {
            if (!cells.isEmpty(tile)) {
                raster.read(band, cells.block(tile), values);
                taker.take(tile, values);
            }
        }
    }

    /** Reads everything that was planned. */
    void run(Workers workers, Progress progress) {
        progress.begin("Layers", tasks.size());
        workers.forEach(tasks.size(), (worker, task) -> {
            tasks.get(task).run();
            progress.advance(1);
        });
        progress.end();
    }
}
