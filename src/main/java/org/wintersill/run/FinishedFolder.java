package org.wintersill.run;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.io.json.JsonValue;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;

/**
 * A finished output folder that further work is done on: its record, its layers, nothing of its inputs. Only read. Immutable and
 * thread-safe; rasters belong to who opens them.
 */
public final class FinishedFolder {
    /** Folder of the layers that belong to no cultivar. */
    static final String SHARED = "shared";
    private static final int VERSION = 1;
    /** Longest record that is read, bytes: far above what a run of thousands of files writes. */
    private static final long LONGEST_RECORD = 1L << 28;

    private final Path folder;
    private final JsonValue record;
    private final CrsParser crs;
    private final GridGeometry grid;

    private FinishedFolder(Path folder, JsonValue record, CrsParser crs) {
        this.folder = folder;
        this.record = record;
        this.crs = crs;
        this.grid = anyGrid();
    }

    /**
     * Opens a folder.
     *
     * @throws org.wintersill.problem.ProblemException when it is none, was left unfinished, or was made by another version
     */
    public static FinishedFolder open(Path folder, CrsParser crs) {
        Path file = folder.resolve(OutputFolder.RECORD);
        if (!Files.isRegularFile(file)) {
            throw Problem.input(Files.isDirectory(folder) ? "the folder holds no finished outputs: there is no " + OutputFolder.RECORD
                    : "there is no such folder", folder.toString(), "Name the output folder of a finished map run").asException();
        }
        JsonValue record = JsonValue.read(file, LONGEST_RECORD);
        boolean whole = record.get("version").number().filter(version -> version == VERSION).isPresent()
                && record.get("cultivars").isPresent() && record.get("winters").isPresent();
        if (!whole) {
            throw Problem.input("the record is not one that this version writes", file.toString(), "Make the outputs again with this "
                    + "version").asException();
        }
        return new FinishedFolder(folder, record, crs);
    }

    public Path path() {
        return folder;
    }

    /** What made the outputs; see {@code record.json}. */
    public JsonValue record() {
        return record;
    }

    /** The run file as it was understood. */
    public JsonValue configuration() {
        return record.get("configuration");
    }

    /** The grid of all layers. */
    public GridGeometry grid() {
        return grid;
    }

    private GridGeometry anyGrid() {
        for (JsonValue output : record.get("outputs").items()) {
            String path = output.get("path").text().orElse("");
            if (path.endsWith(".tif") && folder.resolve(path).normalize().startsWith(folder.normalize())) {
                try (PlainRaster raster = open(path)) {
                    return raster.grid();
                }
            }
        }
        throw Problem.input("the outputs have no layer", folder.toString(), "Make them again with outputs.layers").asException();
    }

    private PlainRaster open(String path) {
        return PlainRaster.open(folder.resolve(path), crs);
    }

    /** Ids of the cultivars, in the order of the run. */
    public List<String> cultivars() {
        List<String> ids = new ArrayList<>();
        for (JsonValue cultivar : record.get("cultivars").items()) {
            String id = cultivar.get("id").text().orElse("");
            // The id becomes a folder name: a record that somebody changed must not lead anywhere else.
            if (!Cultivar.isId(id)) {
                throw Problem.input("the record names a cultivar '" + id + "', which is no id", folder.toString(), "Make the outputs again")
                        .asException();
            }
            ids.add(id);
        }
        return ids;
    }

    /** Name, status and source of a cultivar, as the record says them. */
    public JsonValue cultivar(String id) {
        for (JsonValue cultivar : record.get("cultivars").items()) {
            if (cultivar.get("id").text().equals(Optional.of(id))) {
                return cultivar;
            }
        }
        throw new IllegalArgumentException(id);
    }

    /** Labels of the winters, in the order of time. */
    public List<String> winters() {
        return record.get("winters").items().stream().map(label -> label.text().orElse("")).toList();
    }

    /** Whether a summary layer is there. */
    public boolean has(String owner, String layer) {
        return Files.isRegularFile(folder.resolve(owner).resolve(layer + ".tif"));
    }

    /**
     * Opens a summary layer.
     *
     * @param owner id of a cultivar, or {@link #SHARED}
     * @return empty where the run did not make it
     */
    public Optional<PlainRaster> layer(String owner, String layer) {
        return has(owner, layer) ? Optional.of(open(owner + "/" + layer + ".tif")) : Optional.empty();
    }

    /**
     * Opens a layer without which nothing goes on.
     *
     * @throws org.wintersill.problem.ProblemException when the run did not make it
     */
    public PlainRaster required(String owner, String layer) {
        return layer(owner, layer).orElseThrow(() -> Problem.input("the outputs lack the layer " + layer + " of " + owner,
                folder.toString(), "Run map again with outputs.layers that include it, or default").asException());
    }

    /** Opens a layer with a band a winter, the bands in the order of {@link #winters}. */
    public PlainRaster winters(String owner, String layer) {
        String name = "winters/" + layer;
        if (!has(owner, name)) {
            throw Problem.input("the outputs lack the winters of " + layer, folder.toString(), "Run map again with outputs.winters: true")
                    .asException();
        }
        PlainRaster raster = open(owner + "/" + name + ".tif");
        if (raster.bands() != winters().size()) {
            raster.close();
            throw Problem.input("the layer has " + raster.bands() + " bands for " + winters().size() + " winters",
                    folder.resolve(owner).resolve(name + ".tif").toString(), "Make the outputs again").asException();
        }
        return raster;
    }

    /** The given ids, or all where there are none; unknown ones are refused with the nearest. */
    public List<String> chosen(List<String> ids) {
        List<String> known = cultivars();
        for (String id : ids) {
            if (!known.contains(id)) {
                throw Problem.usage("the outputs have no cultivar " + id, "--cultivar", NearestName.of(id, known)
                        .map(near -> "Did you mean " + near + "?").orElse("Known are " + String.join(", ", known))).asException();
            }
        }
        return ids.isEmpty() ? known : ids;
    }
}
