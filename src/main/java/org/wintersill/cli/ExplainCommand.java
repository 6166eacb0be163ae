package org.wintersill.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wintersill.config.RunConfig;
import org.wintersill.io.chart.ChartFile;
import org.wintersill.problem.Problem;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code explain}: one cell, night by night. */
@Command(name = "explain", header = "Follow one cell through its winters, night by night.",
        description = {"Shows the temperature of the source, the adjusted minimum, the lethal temperatures, the margin and the "
                + "damage of every night, computed by the very code of map."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill explain sample-grids/run.yaml --at-lonlat -37.2,50.1 --winter 2010-11",
            "  wintersill explain sample-grids/run.yaml --at -37.2,50.1 --csv > cell.csv",
            "  wintersill explain sample-grids/run.yaml --at -37.2,50.1 --winter 2009-10 --cultivar slate --chart slate.svg",
            "  wintersill explain sample-grids/run-cold-pool.yaml --stations stations.csv"})
final class ExplainCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Mixin
    private RunArguments run;

    @Option(names = "--at", paramLabel = "X,Y", description = "The place, in the reference system of the outputs.")
    private String at;

    @Option(names = "--at-lonlat", paramLabel = "LON,LAT", description = "The place, in degrees of longitude and latitude.")
    private String atLonLat;

    @Option(names = "--winter", paramLabel = "LABEL", description = "One winter only, such as 2021-22 (2022 in the south).")
    private String winter;

    @Option(names = "--cultivar", paramLabel = "ID", description = "One cultivar only. May be given several times.")
    private List<String> cultivars = new ArrayList<>();

    @Option(names = "--json", description = "Answer with one JSON document.")
    private boolean json;

    @Option(names = "--csv", description = "Answer with a table of comma-separated values.")
    private boolean csv;

    @Option(names = "--chart", paramLabel = "FILE", description = "Draw one winter of one cultivar into FILE.svg or FILE.png: the margin "
            + "of each night, and the temperatures against the band from LT10 to LT90.")
    private String chart;

    @Option(names = "--statistics", description = "Tell of all winters together: every summary layer at the cell with its bounds, fits with "
            + "profile intervals; --chart then draws return periods.")
    private boolean statistics;

    @Option(names = "--stations", paramLabel = "FILE", description = "Compare the minima with those of stations, after each step of the "
            + "adjustment: a table with the columns id, x, y (or lon, lat), elevation, date, tmin.")
    private String stations;

    @Option(names = "--overwrite", description = "Replace a chart of that name.")
    private boolean overwrite;

    @Mixin
    private Manners manners;

    ExplainCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> {
            if (stations != null) {
                return stations(console);
            }
            ExplainOptions options = options();
            RunConfig config = run.config();
            return session.commands().explain(config, options, console);
        });
    }

    private int stations(Console console) {
        if (at != null || atLonLat != null || winter != null || !cultivars.isEmpty() || chart != null || statistics) {
            throw Problem.usage("--stations goes with no place, winter, cultivar, chart or statistics", "--stations",
                    "Compare stations in one call and follow a cell in another").asException();
        }
        return session.commands().stations(run.config(), RunArguments.path(stations), ExplainOptions.Format.of(json, csv), console);
    }

    private ExplainOptions options() {
        if ((at == null) == (atLonLat == null)) {
            throw Problem.usage(at == null ? "no place is given" : "--at and --at-lonlat are both given", "",
                    "Give either --at X,Y in the reference system of the outputs or --at-lonlat LON,LAT").asException();
        }
        ExplainOptions.Format format = ExplainOptions.Format.of(json, csv);
        Optional<Path> picture = Optional.ofNullable(chart).map(RunArguments::path);
        if (statistics && winter != null) {
            throw Problem.usage("--statistics and --winter are both given", "", "Statistics need all winters: keep one of the two").asException();
        }
        if (picture.isPresent() && winter == null && !statistics) {
            throw Problem.usage("a chart shows one winter, and --winter is not given", "--chart", "Add for example --winter 2009-10, or "
                    + "--statistics for a chart of return periods")
                    .asException();
        }
        picture.ifPresent(file -> ChartFile.check(file, overwrite));
        Place place = at == null ? Place.lonLat(atLonLat) : Place.parse(at, "--at", "X,Y");
        return new ExplainOptions(place.x(), place.y(), at == null, Optional.ofNullable(winter).map(ExplainCommand::label),
                cultivars, format, picture, overwrite, statistics);
    }

    /** A winter's label; {@code 2021-2022} and {@code 2021-23} are caught here, a winter that is not in the record later. */
    static String label(String text) {
        boolean north = text.matches("\\d{4}-\\d{2}")
                && (Integer.parseInt(text.substring(0, 4)) + 1) % 100 == Integer.parseInt(text.substring(5));
        if (!north && !text.matches("\\d{4}")) {
            throw Problem.usage("'" + text + "' is not the label of a winter", "--winter",
                    "Write 2021-22 for the winter of 2021 to 2022, or 2022 on the southern hemisphere").asException();
        }
        return text;
    }
}
