package org.wintersill.run;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.geotiff.write.CategorySidecar;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.io.style.TemporalRange;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.RasterFormat;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;
import org.wintersill.problem.Problem;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;

/**
 * Opens the raster files of a run with everything that belongs to them: header, style beside the file, category names. Knows
 * where a layer's file lies in the output folder.
 */
final class LayerOutput {
    private final OutputFolder folder;
    private final RasterFormat format;
    private final GridGeometry grid;
    private final List<Season> seasons;
    private final String digest;
    private final ExecutorService workers;

    /** @param digest fingerprint of the configuration, kept in every file */
    LayerOutput(OutputFolder folder, RasterFormat format, GridGeometry grid, List<Season> seasons, String digest,
                ExecutorService workers) {
        this.folder = folder;
        this.format = format;
        this.grid = grid;
        this.seasons = seasons;
        this.digest = digest;
        this.workers = workers;
    }

    int rowsAtOnce() {
        return format.rowsAtOnce();
    }

    GridGeometry grid() {
        return grid;
    }

    /** A summary layer of a cultivar, or of none, with one band. */
    RasterWriter summary(LayerDefinition layer, Optional<Cultivar> cultivar) {
        return open(cultivar.map(Cultivar::id).orElse("shared") + "/" + layer.id(), layer,
                List.of(new RasterHeader.Band(layer.title() + ", winters " + period(), layer.unit())), cultivar);
    }

    /** A layer with bands of its own. */
    RasterWriter bands(LayerDefinition layer, List<RasterHeader.Band> bands) {
        return open("shared/" + layer.id(), layer, bands, Optional.empty());
    }

    /** A layer with one band a winter. */
    RasterWriter winters(LayerDefinition layer, Optional<Cultivar> cultivar) {
        return open(cultivar.map(Cultivar::id).orElse("shared") + "/winters/" + layer.id(), layer,
                seasons.stream().map(season -> new RasterHeader.Band(season.label(), layer.unit())).toList(), cultivar);
    }

    private RasterWriter open(String name, LayerDefinition layer, List<RasterHeader.Band> bands, Optional<Cultivar> cultivar) {
        Path file = folder.unfinished(name + format.suffix());
        write(folder.unfinished(name + ".qml"), QmlWriter.raster(layer.style(),
                Optional.of(TemporalRange.of(seasons.get(0).first(), last().last()))));
        if (layer.style() instanceof LayerStyle.Classes classes) {
            CategorySidecar.write(file, classes);
        }
        return format.create(file, new RasterHeader(grid, layer, bands, metadata(cultivar), dateTime(), RunVersion.program()), workers);
    }

    private Map<String, String> metadata(Optional<Cultivar> cultivar) {
        Map<String, String> items = new LinkedHashMap<>();
        items.put("WINTERS", period());
        items.put("WINTER_WINDOW", seasons.get(0).first() + " to " + last().last());
        cultivar.ifPresent(known -> {
            items.put("CULTIVAR", known.id());
            items.put("CULTIVAR_NAME", known.name());
            items.put("SPECIES", known.species());
            items.put("ORGAN", known.organ());
            items.put("CURVE_STATUS", known.status().word());
            items.put("CURVE_SOURCE", known.source());
        });
        items.put("PROGRAM", RunVersion.program());
        items.put("RUN_SHA256", digest);
        items.put("CAUTION", Caution.SHORT);
        return items;
    }

    /** {@code 2003-04 to 2014-15}, or one label. */
    String period() {
        String first = seasons.get(0).label();
        return seasons.size() == 1 ? first : first + " to " + last().label();
    }

    private Season last() {
        return seasons.get(seasons.size() - 1);
    }

    /** End of the period as TIFF writes times; a day that the common calendar lacks becomes the 28th. */
    private String dateTime() {
        CfDate end = last().last();
        String month = (end.month() < 10 ? "0" : "") + end.month();
        int day = end.month() == 2 ? Math.min(28, end.day()) : Math.min(30, end.day());
        return String.format(Locale.ROOT, "%04d", end.year()) + ":" + month + ":" + (day < 10 ? "0" : "") + day + " 00:00:00";
    }

    static void write(Path file, String text) {
        try {
            Files.writeString(file, text, StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw Problem.output("the file cannot be written: " + e.getMessage(), file.toString(),
                    "Check the permissions of the folder and the free space of the disk").asException(e);
        }
    }
}
