package org.wintersill.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.concurrent.Callable;
import org.wintersill.config.ParcelsSection;
import org.wintersill.problem.Problem;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code parcels}: what a finished run says of parcels or zones. */
@Command(name = "parcels", header = "Describe parcels or zones by the layers of a finished run.",
        description = {"Reads polygons from GeoPackage, GeoJSON or Shapefile in any reference system, weights the cells of the run by the area "
                + "that each polygon covers, compares the cultivars, and writes a GeoPackage, tables and a page for each parcel. Nothing is "
                + "folded again, and the run's folder stays as it is."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill parcels sample-grids/out --parcels sample-grids/parcels.gpkg",
            "  wintersill parcels out --parcels zones.gpkg --layer municipalities --id code --sheets none --out out-zones"})
final class ParcelsCommand implements Callable<Integer>, Manners.Kept {
    private static final String FOLDER = "parcels";

    private final Session session;

    @Parameters(arity = "1", paramLabel = "OUT", description = "Output folder of a finished run of map.")
    private String run;

    @Option(names = "--parcels", required = true, paramLabel = "FILE", description = "The polygons: a GeoPackage, a GeoJSON file, or the .shp of a "
            + "Shapefile.")
    private String file;

    @Option(names = "--layer", paramLabel = "NAME", description = "Layer of a GeoPackage that has several with polygons.")
    private String layer;

    @Option(names = "--id", paramLabel = "COLUMN", description = "Column that identifies a parcel; parcel_id or id if there is one, else the row "
            + "number.")
    private String id;

    @Option(names = "--name", paramLabel = "COLUMN", description = "Column with a name for people; name if there is one.")
    private String name;

    @Option(names = "--crs", paramLabel = "CODE", description = "Reference system, such as EPSG:2056, of a file that does not say it.")
    private String crs;

    @Option(names = "--sheets", paramLabel = "WHICH", split = ",", description = "Parcels that get a page: all, none, or ids; without it the first "
            + "200.")
    private List<String> sheets = new ArrayList<>();

    @Option(names = "--out", paramLabel = "FOLDER", description = "Folder of the result; parcels inside of OUT if nothing else is said.")
    private String out;

    @Option(names = "--overwrite", description = "Replace an earlier result in that folder.")
    private boolean overwrite;

    @Option(names = "--threads", paramLabel = "N", description = "Threads to work with; results do not depend on it.")
    private Integer threads;

    @Option(names = "--json", description = "Tell the result as one JSON document on standard output.")
    private boolean json;

    @Mixin
    private Manners manners;

    ParcelsCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> {
            if (threads != null && threads < 1) {
                throw Problem.usage("--threads " + threads + " is no number of threads", "--threads", "Give 1 or more").asException();
            }
            Map<String, String> flags = new LinkedHashMap<>();
            flags.put("file", file);
            Optional.ofNullable(layer).ifPresent(text -> flags.put("layer", text));
            Optional.ofNullable(id).ifPresent(text -> flags.put("id", text));
            Optional.ofNullable(name).ifPresent(text -> flags.put("name", text));
            Optional.ofNullable(crs).ifPresent(text -> flags.put("crs", text));
            Path folder = RunArguments.path(run);
            return session.commands().parcels(new ParcelsOptions(folder, out == null ? folder.resolve(FOLDER) : RunArguments.path(out),
                    overwrite, ParcelsSection.ofFlags(flags, sheets), threads == null ? OptionalInt.empty() : OptionalInt.of(threads), json), console);
        });
    }
}
