package org.wintersill.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import org.wintersill.climatology.FrequencyInterval;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.climatology.statistic.ExtremeChoices;
import org.wintersill.climatology.statistic.HardinessRule;
import org.wintersill.climatology.statistic.PhaseShare;
import org.wintersill.climatology.statistic.Suitability;
import org.wintersill.config.ParcelsConfig;
import org.wintersill.config.RunConfig;
import org.wintersill.config.StatisticsConfig;
import org.wintersill.config.WinterConfig;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.Uncertainty;
import org.wintersill.engine.FoldJob;
import org.wintersill.engine.FoldPlan;
import org.wintersill.engine.FoldPlanner;
import org.wintersill.engine.MemoryEstimate;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.season.NightCurve;
import org.wintersill.season.Phases;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;
import org.wintersill.time.SeasonWindow.Hemisphere;

/** Turns a configuration into a plan: opens every input, reconciles grids, calendars and curves, and refuses early. */
public final class RunPlanner {
    private final InputFormats formats;
    private final CoordinateOperations operations;

    public RunPlanner(InputFormats formats, CoordinateOperations operations) {
        this.formats = formats;
        this.operations = operations;
    }

    /**
     * The plan.
     *
     * @param notices told of every assumption
     * @throws org.wintersill.problem.ProblemException with all problems that can be found without each other
     */
    public RunPlan plan(RunConfig config, Notices notices) {
        Problems problems = new Problems();
        List<Cultivar> cultivars = new ArrayList<>();
        List<DailyTemperatureSource> opened = new ArrayList<>();
        problems.attempt(() -> cultivars.addAll(new CultivarSelection(config.cultivars()).read(notices)));
        problems.attempt(() -> opened.add(formats.open(config.temperature().minimum(), notices)));
        problems.attempt(() -> DailyMeans.require(cultivars, config));
        config.parcels().ifPresent(parcels -> problems.attempt(() -> checkParcels(parcels, config.outputs().layers())));
        problems.attempt(() -> LayerSelection.check(config.outputs().layers(),
                choices(config, new int[ExtremeFit.FEWEST_WINTERS], reckoning(config, true, false))));
        problems.throwIfAny();
        DailyTemperatureSource source = config.scenario().isPresent()
                ? ScenarioPlan.of(config.scenario().get(), opened.get(0), formats, operations, notices) : opened.get(0);
        for (Cultivar cultivar : cultivars) {
            if (!cultivar.status().dependable()) {
                notices.add("the curve of cultivar " + cultivar.id() + " is " + cultivar.status().word()
                        + ": do not plan by it");
            }
        }
        if (!config.damage().nights().equals("worst")) {
            notices.add("nights are joined as " + config.damage().nights() + ": damage and its probabilities are those of all nights, "
                    + "margins, worst night and required hardiness those of the worst night alone");
        }
        String sourceName = source.files().isEmpty() ? "the record" : source.files().get(0).path();
        TargetPlan targetPlan = TargetPlan.of(source.grid(), sourceName, config.elevation(),
                new AreaCut.Wanted(config.area(), formats, operations, notices), config.temperature().maximum().isPresent(), formats, operations, notices);
        GridGeometry target = targetPlan.target();
        SeasonWindow window = window(config.winter(), target, notices);
        MissingDayPolicy policy = MissingDayPolicy.named(config.missingDays()).orElseThrow();
        DailyMeans means = DailyMeans.of(config, cultivars, window, source, formats, notices);
        WinterSelection winters = means.winters(WinterSelection.of(source.days(), window, policy));
        checkWinters(winters, source, sourceName);
        checkCoverage(cultivars, window, config);
        tellOfWinters(winters, config, notices);
        means.tellOfGaps(winters.used(), notices);
        DamageReckoning reckoning = reckoning(config,
                PhaseShare.IDS.stream().anyMatch(new LayerSelection(config.outputs().layers())::contains), window.hemisphere() == Hemisphere.SOUTH);
        ClimatologyStatistics.Choices choices = choices(config, winters.used().stream().mapToInt(Season::year).toArray(), reckoning);
        FoldJob job = new FoldJob(means.minima(), targetPlan.window(), targetPlan.adjustment(), winters.used(), policy,
                curves(cultivars, winters.used(), choices), choices.levels().length, reckoning,
                means.forcing(winters.used(), target, choices.levels(), operations), PoolMaxima.of(config, means, formats, notices));
        int threads = config.limits().threads().orElse(Runtime.getRuntime().availableProcessors());
        long budget = Estimates.budget(config.limits());
        long writers = Estimates.writerBytes(target, choices, config.outputs());
        FoldPlan foldPlan = new FoldPlanner(job, threads, budget - Estimates.residentBytes(target, cultivars.size())).plan();
        if (writers > budget) {
            throw Problem.limit("writing the layers takes " + MemoryEstimate.text(writers)
                    + " of memory, and the run may use " + MemoryEstimate.text(budget), "limits.memory",
                    "Start Java with a larger -Xmx, raise limits.memory or choose a smaller area").asException();
        }
        return new RunPlan(config, source, target, targetPlan.adjustment(), window, winters.dropped(), cultivars, choices, job,
                foldPlan, Estimates.of(job, foldPlan, writers, config.outputs()));
    }

    /** What would refuse the parcels after the fold is found before it. */
    private void checkParcels(ParcelsConfig parcels, List<String> layers) {
        formats.polygons(parcels.polygons()).close();
        LayerSelection selection = new LayerSelection(layers);
        for (String needed : List.of(WinterLayers.MARGIN.id(), WinterLayers.DAMAGE.id())) {
            if (!selection.contains(needed)) {
                throw Problem.usage("parcels are described by the layer " + needed + ", which outputs.layers leaves out", "parcels",
                        "Add " + needed + " to outputs.layers").asException();
            }
        }
    }

    private static void checkWinters(WinterSelection winters, DailyTemperatureSource source, String sourceName) {
        if (winters.used().isEmpty()) {
            String found = winters.dropped().isEmpty() ? "no day lies inside the winter window"
                    : winters.dropped().get(0).label() + ": " + winters.dropped().get(0).reason();
            throw Problem.input("no winter of the record is complete enough to be used (" + source.days().date(0) + " to "
                            + source.days().date(source.days().size() - 1) + "; " + found + ")", sourceName,
                    "Give more files, another winter window or another rule for missing-days").asException();
        }
    }

    private static void tellOfWinters(WinterSelection winters, RunConfig config, Notices notices) {
        for (RunPlan.DroppedWinter dropped : winters.dropped()) {
            notices.add("winter " + dropped.label() + " is not used: " + dropped.reason());
        }
        int n = winters.used().size();
        if (n < Suitability.FEWEST_WINTERS) {
            notices.add("only " + n + " complete winters: too few for suitability classes");
        }
        boolean named = !List.of("auto", "none").contains(config.statistics().extremes());
        if (n < ExtremeFit.FEWEST_WINTERS && (named || LayerSelection.asksForFits(config.outputs().layers()))) {
            notices.add("only " + n + " complete winters: no extreme value distribution is fitted to fewer than "
                    + ExtremeFit.FEWEST_WINTERS + ", so the layers of fits are left out");
        }
    }

    private static void checkCoverage(List<Cultivar> cultivars, SeasonWindow window, RunConfig config) {
        Problems problems = new Problems();
        for (Cultivar cultivar : cultivars) {
            cultivar.model().notCovering(window).ifPresent(reason -> problems.add(Problem.usage(
                    "the curve of cultivar " + cultivar.id() + " does not cover the winter " + window.from() + " to " + window.to()
                            + ": " + reason, String.join(", ", config.cultivars().files().stream().map(Path::toString).toList()),
                    "Add rows for the missing dates, shorten the winter, or say outside: hold in the cultivar")));
        }
        problems.throwIfAny();
    }

    private static List<NightCurve[]> curves(List<Cultivar> cultivars, List<Season> seasons, ClimatologyStatistics.Choices choices) {
        double[] others = java.util.Arrays.stream(choices.levels()).skip(1).asDoubleStream().toArray();
        List<NightCurve[]> curves = new ArrayList<>();
        for (Season season : seasons) {
            Phases phases = Phases.of(season, choices.reckoning().south());
            curves.add(cultivars.stream().map(cultivar -> cultivar.model() instanceof CalendarModel model
                            ? NightCurve.of(model.overSeason(season), cultivar.tolerance(), others, phases) : null)
                    .toArray(NightCurve[]::new));
        }
        return curves;
    }

    private static DamageReckoning reckoning(RunConfig config, boolean phases, boolean south) {
        NightJoining.Rule rule = NightJoining.Rule.valueOf(config.damage().nights().toUpperCase(Locale.ROOT));
        return new DamageReckoning(new NightJoining(rule, config.damage().correlation()),
                new Uncertainty(new TreeMap<>(config.damage().uncertainty())),
                phases, south, new LayerSelection(config.outputs().layers()).countsColdNights()
                ? Optional.of((float) config.statistics().coldNight()) : Optional.empty());
    }

    /** Levels with LT50 first, whatever the order of the run file, since every margin refers to it. */
    private static ClimatologyStatistics.Choices choices(RunConfig config, int[] years, DamageReckoning reckoning) {
        Set<Integer> seen = new HashSet<>();
        List<Integer> levels = new ArrayList<>(List.of(50));
        seen.add(50);
        for (int level : config.damage().levels()) {
            if (seen.add(level)) {
                levels.add(level);
            }
        }
        return new ClimatologyStatistics.Choices(levels.stream().mapToInt(Integer::intValue).toArray(), config.damage().killing(),
                FrequencyInterval.named(config.statistics().bounds()).orElseThrow(), config.statistics().interval(),
                config.statistics().targets().stream().mapToDouble(Double::doubleValue).toArray(),
                HardinessRule.named(config.statistics().rule()).orElseThrow(), extremes(config.statistics()), config.classes().stream().mapToDouble(Double::doubleValue).toArray(), years,
                reckoning);
    }

    private static ExtremeChoices extremes(StatisticsConfig statistics) {
        Optional<ExtremeFit.Method> method = ExtremeFit.Method.named(statistics.extremes());
        return new ExtremeChoices(method, method.isPresent() && !statistics.extremes().equals("auto"),
                statistics.returnPeriods().stream().mapToInt(Integer::intValue).toArray(), statistics.replicates(), statistics.seed(),
                statistics.falseDiscovery());
    }

    private SeasonWindow window(WinterConfig config, GridGeometry target, Notices notices) {
        Hemisphere hemisphere = config.hemisphere().orElseGet(() -> hemisphere(target, notices));
        SeasonWindow standard = SeasonWindow.of(hemisphere);
        MonthDay from = config.from().orElse(standard.from());
        MonthDay to = config.to().orElse(standard.to());
        boolean ownWindow = config.from().isPresent() || config.to().isPresent();
        SeasonWindow window = new SeasonWindow(from, to, config.completeFrom().orElse(standard.completeFrom()),
                config.completeTo().orElse(standard.completeTo()), hemisphere);
        if (!window.isConsistent() && ownWindow && config.completeFrom().isEmpty() && config.completeTo().isEmpty()) {
            window = new SeasonWindow(from, to, from, to, hemisphere);
        }
        if (!window.isConsistent()) {
            throw Problem.usage("the part that must be complete, " + window.completeFrom() + " to " + window.completeTo()
                    + ", is not inside the winter " + from + " to " + to, "winter.complete",
                    "Give a part of the winter, such as " + from + ".." + to).asException();
        }
        return window;
    }

    private Hemisphere hemisphere(GridGeometry target, Notices notices) {
        double[] centre = {(target.west() + target.east()) / 2, (target.north() + target.south()) / 2};
        if (!target.crs().sameAs(operations.wgs84())) {
            operations.between(target.crs(), operations.wgs84()).transform(centre, 1);
        }
        if (target.crs().kind() == Crs.Kind.GEOGRAPHIC && target.north() > 0 && target.south() < 0) {
            notices.add("the grid lies on both sides of the equator; one winter window is used for all of it, set "
                    + "winter.hemisphere to choose");
        }
        return centre[1] < 0 ? Hemisphere.SOUTH : Hemisphere.NORTH;
    }
}
