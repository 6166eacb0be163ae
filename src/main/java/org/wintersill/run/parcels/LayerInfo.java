package org.wintersill.run.parcels;

import java.nio.file.Path;
import java.util.List;
import org.wintersill.grid.CrsParser;
import org.wintersill.io.geotiff.read.PlainRaster;

/**
 * A summary layer of a run, as its file describes itself.
 *
 * @param id name of the layer
 * @param file where it lies
 * @param title a few words
 * @param meaning a sentence
 * @param unit of its values
 * @param classes names of the classes by their number; empty for a layer of amounts
 */
record LayerInfo(String id, Path file, String title, String meaning, String unit, List<String> classes) {

    static LayerInfo of(FinishedRun run, String name, CrsParser parser) {
        Path file = run.folder().resolve(name);
        try (PlainRaster raster = PlainRaster.open(file, parser)) {
            String id = name.substring(name.indexOf('/') + 1, name.length() - ".tif".length());
            // The number of cultivars that fit is an amount whose mean says something.
            List<String> classes = id.equals("choice") ? List.of() : PlainRaster.classes(file);
            return new LayerInfo(id, file, raster.title(), raster.meaning(), raster.unit(), classes);
        }
    }

    boolean hasClasses() {
        return !classes.isEmpty();
    }

    /** Whether a mean of its values means anything: not of the years in which something happened. */
    boolean hasMean() {
        return !id.equals("worst-winter");
    }
}
