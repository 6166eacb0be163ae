package org.wintersill.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wintersill.io.chart.ChartFile;
import org.wintersill.problem.Problem;
import org.wintersill.run.curve.FitRequest;
import org.wintersill.time.MonthDay;
import org.wintersill.time.SeasonWindow;
import org.wintersill.time.SeasonWindow.Hemisphere;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code curves}: cultivar files by themselves. */
@Command(name = "curves", header = "Check cultivar files, and show their curves as table or chart.",
        description = {"Tells all problems of the files at once. Of what is sound it shows LT10, LT50 and LT90 by date, on the first and "
                + "the fifteenth of each month; --csv and --json give every day.", "",
            "With --series each cultivar follows the temperatures of a place, winter by winter, as in a run: Tmin, lethal temperatures, "
                + "margin and damage of every night. A response is shown against the trailing mean where there is no series.", "",
            "With --fit it estimates the parameters of a model from measured lethal temperatures, for each cultivar by itself: plain least "
                + "squares, bootstrap intervals, residuals, and a cultivar file with --out. What the samples do not tell is said."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill curves sample-grids/cultivars.yaml",
            "  wintersill curves sample-grids/cultivars.yaml --cultivar slate --csv > slate.csv",
            "  wintersill curves sample-grids/cultivars.yaml --chart curves.svg",
            "  wintersill curves built-in:grapevine-concord --series sample-grids/series.csv --winter 2009-10 --chart w.png",
            "  wintersill curves --fit sample-grids/field.csv --model dated --out fitted.yaml"})
final class CurvesCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Parameters(arity = "0..*", paramLabel = "FILE", description = "Cultivar files; built-in:ID for a cultivar that comes with the "
            + "program.")
    private List<String> files = new ArrayList<>();

    @Option(names = "--built-in", description = "List the cultivars and published values that come with the program, with source and "
            + "status.")
    private boolean builtIn;

    @Option(names = "--cultivar", paramLabel = "ID", description = "One cultivar only. May be given several times.")
    private List<String> cultivars = new ArrayList<>();

    @Option(names = "--winter", paramLabel = "LABEL", description = "With --series: one winter only, such as 2021-22 (2022 in the south).")
    private String label;

    @Option(names = "--window", paramLabel = "FROM..TO", description = "First and last day of the winter, such as 09-01..05-31, which is "
            + "the default; 03-01..11-30 with --south.")
    private String window;

    @Option(names = "--south", description = "The winter of the southern hemisphere.")
    private boolean south;

    @Mixin
    private FitArguments fit;

    @Option(names = "--csv", description = "Answer with a table of comma-separated values, a row a day.")
    private boolean csv;

    @Option(names = "--json", description = "Answer with one JSON document.")
    private boolean json;

    @Option(names = "--chart", paramLabel = "FILE", description = "Draw the curves into FILE.svg or FILE.png.")
    private String chart;

    @Option(names = "--overwrite", description = "Replace files of the same names.")
    private boolean overwrite;

    @Mixin
    private Manners manners;

    CurvesCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> session.commands().curves(options(), console));
    }

    private CurvesOptions options() {
        SeasonWindow winter = window();
        Optional<FitRequest> request = fit.request(winter);
        if (request.isPresent() && !files.isEmpty()) {
            throw Problem.usage("--fit and cultivar files are both given", "", "Fit first, then look at the file of --out").asException();
        }
        if (builtIn && (request.isPresent() || !files.isEmpty() || chart != null)) {
            throw Problem.usage("--built-in lists what comes with the program, and nothing else goes with it", "--built-in",
                    "Look at one with curves built-in:ID").asException();
        }
        if (!builtIn && request.isEmpty() && files.isEmpty()) {
            throw Problem.usage("no cultivar file is given", "", "Name at least one, such as sample-grids/cultivars.yaml").asException();
        }
        Optional<java.nio.file.Path> picture = Optional.ofNullable(chart).map(RunArguments::path);
        picture.ifPresent(file -> ChartFile.check(file, overwrite));
        files.forEach(RunArguments::path);
        return new CurvesOptions(List.copyOf(files), cultivars, winter,
                ExplainOptions.Format.of(json, csv), picture, builtIn, series(request.isPresent(), winter), request,
                fit.out(overwrite), overwrite);
    }

    private Optional<CurvesOptions.SeriesOptions> series(boolean fitting, SeasonWindow winter) {
        Optional<CurvesOptions.SeriesOptions> series = fitting ? Optional.empty() : fit.series().map(file ->
                new CurvesOptions.SeriesOptions(file, fit.dailyRange(), fit.latitude(winter),
                        Optional.ofNullable(label).map(ExplainCommand::label)));
        if (label != null && series.isEmpty()) {
            throw Problem.usage("a winter can be chosen of a series only", "--winter", "Add --series SERIES.csv, or choose days with "
                    + "--window").asException();
        }
        if (chart != null && series.isPresent() && label == null) {
            throw Problem.usage("a chart shows one winter of the series", "--chart", "Add for example --winter 2009-10").asException();
        }
        return series;
    }

    private SeasonWindow window() {
        SeasonWindow standard = SeasonWindow.of(south ? Hemisphere.SOUTH : Hemisphere.NORTH);
        if (window == null) {
            return standard;
        }
        String[] ends = window.split("\\.\\.", -1);
        try {
            MonthDay from = MonthDay.parse(ends[0]);
            MonthDay to = MonthDay.parse(ends.length == 2 ? ends[1] : "");
            return new SeasonWindow(from, to, from, to, standard.hemisphere());
        } catch (IllegalArgumentException e) {
            throw Problem.usage("'" + window + "' is no winter", "--window", "Write two days of the year, such as 09-01..05-31")
                    .asException(e);
        }
    }
}
