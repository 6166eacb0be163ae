package org.wintersill.run;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoKeys;
import org.wintersill.io.geotiff.write.CategorySidecar;
import org.wintersill.io.geotiff.write.CogFormat;
import org.wintersill.io.geotiff.write.GeoKeyTags;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.RasterFormat;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;

/** Opens the raster files of a comparison: header, style beside the file, category names. */
final class ChangeOutput {
    private final OutputFolder folder;
    private final GridGeometry grid;
    private final String period;
    private final int lastYear;
    private final ExecutorService workers;
    private final RasterFormat format = new CogFormat(crs -> {
        GeoKeys keys = GeoKeys.of(crs);
        return new GeoKeyTags(keys.directory(), keys.doubles(), keys.ascii());
    });

    /**
     * @param period words for the two periods
     * @param lastYear year in which the last winter ends; the only time in the files
     */
    ChangeOutput(OutputFolder folder, GridGeometry grid, String period, int lastYear, ExecutorService workers) {
        this.folder = folder;
        this.grid = grid;
        this.period = period;
        this.lastYear = lastYear;
        this.workers = workers;
    }

    int rowsAtOnce() {
        return format.rowsAtOnce();
    }

    /** Time of the last change of a GeoPackage. */
    String lastChange() {
        return String.format(java.util.Locale.ROOT, "%04d-12-31T00:00:00.000Z", lastYear);
    }

    /** Where a layer is written for now. */
    Path file(String owner, LayerDefinition layer) {
        return folder.unfinished(owner + "/" + layer.id() + format.suffix());
    }

    /**
     * Opens a file.
     *
     * @param owner folder, parts separated by {@code /}
     * @param bands names of the bands; none for a single one named after the layer
     */
    RasterWriter open(String owner, LayerDefinition layer, String... bands) {
        Path file = file(owner, layer);
        LayerOutput.write(folder.unfinished(owner + "/" + layer.id() + ".qml"), QmlWriter.raster(layer.style(), Optional.empty()));
        if (layer.style() instanceof LayerStyle.Classes classes) {
            CategorySidecar.write(file, classes);
        }
        Map<String, String> items = new LinkedHashMap<>();
        items.put("PERIODS", period);
        items.put("PROGRAM", RunVersion.program());
        items.put("CAUTION", Caution.SHORT);
        List<RasterHeader.Band> headers = bands.length == 0 ? List.of(new RasterHeader.Band(layer.title(), layer.unit()))
                : List.of(bands).stream().map(name -> new RasterHeader.Band(name, layer.unit())).toList();
        return format.create(file, new RasterHeader(grid, layer, headers, items, lastYear + ":12:31 00:00:00", RunVersion.program()), workers);
    }
}
