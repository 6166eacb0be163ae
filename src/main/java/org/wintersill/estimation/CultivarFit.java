package org.wintersill.estimation;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.estimation.FitModel.Role;
import org.wintersill.estimation.FitModel.Setting;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.DailySeries;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * A trial fit of one cultivar: what was estimated, searched and kept, and the model that comes out.
 *
 * @param word of the model
 * @param samples that were used
 * @param winters the winter of each of them
 * @param fit to LT50; its estimates are those of least squares
 * @param kept parameters that were not estimated by least squares, with the reason
 * @param spread distances of LT10 and LT90 from LT50
 * @param remarks what a reader must know, in sentences
 * @param model with the fitted values
 * @param entry its keys in a cultivar file
 */
public record CultivarFit(String word, List<MeasuredTolerance> samples, List<Season> winters, TrialFit fit, List<Kept> kept,
                          Spread spread, List<String> remarks, HardinessModel model, Map<String, Object> entry) {
    /** Samples beyond the number of parameters that a fit needs at least; project choice. */
    private static final int SPARE_SAMPLES = 3;
    /** Spread of a tolerance curve where only LT50 is measured, K; project choice (science 1.3). */
    private static final double DEFAULT_SPREAD = 1.2;
    /** Values that are tried for a parameter that is searched. */
    private static final int SEARCH_STEPS = 19;
    /** Samples with both distances that a spread of one's own needs; project choice. */
    private static final int SPREAD_SAMPLES = 3;

    /** A parameter with a value that is not estimated. */
    public record Kept(Parameter parameter, double value, String reason) {
    }

    /**
     * Distances of LT10 and LT90 from LT50: means over the samples that have all three.
     *
     * @param toLt10 K
     * @param toLt90 K
     * @param samples that it comes from; 0 for the default
     */
    public record Spread(double toLt10, double toLt90, int samples) {
    }

    /**
     * What is fitted, and how.
     *
     * @param word of the model
     * @param window winters that samples belong to
     * @param series temperatures; null where the model needs none
     * @param latitude degrees north
     * @param kept values of parameters that are not to be estimated, by name
     */
    public record Task(String word, SeasonWindow window, DailySeries series, double latitude, Map<String, Double> kept) {
    }

    /** Models that can be fitted. */
    public static List<String> words() {
        return List.of("dated", "response", "thermal-time");
    }

    /**
     * Fits the samples of one cultivar.
     *
     * @param where the table, for messages
     * @throws org.wintersill.problem.ProblemException when the samples are too few, or the model cannot be fitted to them
     */
    public static CultivarFit of(List<MeasuredTolerance> all, Task task, String where, TrialFit.Way way) {
        String name = all.get(0).cultivar();
        List<String> remarks = new ArrayList<>();
        List<MeasuredTolerance> samples = new ArrayList<>(all);
        List<Season> winters = new ArrayList<>();
        for (MeasuredTolerance sample : all) {
            winters.add(winter(sample, task, where));
        }
        FitModel model = switch (task.word()) {
            case "dated" -> new DatedFit(samples, winters);
            case "response" -> new ResponseFit(samples);
            default -> new ThermalTimeFit(samples);
        };
        double[] values = model.settings().stream().mapToDouble(Setting::start).toArray();
        boolean[] free = new boolean[values.length];
        int searched = roles(model, task.kept(), values, free);
        Spread spread = spread(samples);
        checkCount(name, samples.size(), count(free) + (searched >= 0 ? 1 : 0), model, where);
        leaveOutSilent(model, values, spread, task, samples, winters, remarks);
        checkCount(name, samples.size(), count(free) + (searched >= 0 ? 1 : 0), model, where);
        FitWork work = new FitWork(model, values, free, spread, task, samples, winters);
        if (searched >= 0) {
            search(work, searched, way);
        }
        TrialFit fit = TrialFit.of(work::predict, work.parameters(), work.observed(), work.weights(), work.start(), way);
        double[] solution = work.all(fit.estimates().stream().mapToDouble(TrialFit.Estimate::value).toArray());
        if (spread.samples() == 0) {
            remarks.add("LT10 and LT90 were not measured together with LT50 in " + SPREAD_SAMPLES + " samples: they are set by a spread of "
                    + DEFAULT_SPREAD + " K, an assumption of this program.");
        }
        fit.estimates().stream().filter(estimate -> !estimate.standing().words().isEmpty()).forEach(estimate -> remarks.add(
                estimate.parameter().name() + " is " + estimate.standing().words() + "."));
        return new CultivarFit(task.word(), List.copyOf(samples), List.copyOf(winters), fit, kept(model, solution, free, searched, task),
                spread, List.copyOf(remarks), model.model(solution, spread.toLt10(), spread.toLt90()),
                model.entry(solution, spread.toLt10(), spread.toLt90()));
    }

    private static Season winter(MeasuredTolerance sample, Task task, String where) {
        for (int year = sample.date().year() - 1; year <= sample.date().year(); year++) {
            Season season = task.window().beginningIn(year, org.wintersill.time.CfCalendar.STANDARD);
            int position = season.position(sample.date());
            if (position >= 0 && position < season.days()) {
                return season;
            }
        }
        throw Problem.input("the sample of " + sample.cultivar() + " on " + sample.date() + " lies outside of the winter "
                + task.window().from() + " to " + task.window().to(), where, "Leave it out, or give another --window").asException();
    }

    /** Sets the values that the user keeps and marks those that are estimated; position of the one that is searched, or -1. */
    private static int roles(FitModel model, Map<String, Double> kept, double[] values, boolean[] free) {
        List<String> names = model.settings().stream().map(setting -> setting.parameter().name()).toList();
        for (String name : kept.keySet()) {
            if (!names.contains(name)) {
                throw Problem.usage("the model " + model.word() + " has no parameter " + name, "--keep", NearestName.of(name, names)
                        .map(near -> "Did you mean " + near + "? ").orElse("") + "Its parameters are " + String.join(", ", names))
                        .asException();
            }
        }
        int searched = -1;
        for (int i = 0; i < values.length; i++) {
            Setting setting = model.settings().get(i);
            Double value = kept.get(setting.parameter().name());
            if (value != null) {
                if (value < setting.parameter().low() || value > setting.parameter().high()) {
                    throw Problem.usage(setting.parameter().name() + " " + value + " is out of its range, " + setting.parameter().low()
                            + " to " + setting.parameter().high() + " " + setting.parameter().unit(), "--keep", "").asException();
                }
                values[i] = value;
            }
            free[i] = value == null && setting.role() == Role.ESTIMATED;
            searched = value == null && setting.role() == Role.SEARCHED ? i : searched;
        }
        return searched;
    }

    private static int count(boolean[] flags) {
        int count = 0;
        for (boolean flag : flags) {
            count += flag ? 1 : 0;
        }
        return count;
    }

    private static void checkCount(String name, int samples, int parameters, FitModel model, String where) {
        if (samples < parameters + SPARE_SAMPLES || parameters < 1) {
            throw Problem.input("cultivar " + name + " has " + samples + " usable samples, too few for the " + Math.max(2, parameters)
                    + " parameters of " + model.word(), where, parameters < 1 ? "Samples of at least two days of the winter are needed"
                    : "At least " + (parameters + SPARE_SAMPLES) + " are needed; measure more, fix parameters with --keep NAME=VALUE, or "
                    + "choose a simpler --model").asException();
        }
    }

    /** Samples before which the series is missing or has a long gap. */
    private static void leaveOutSilent(FitModel model, double[] values, Spread spread, Task task, List<MeasuredTolerance> samples,
                                       List<Season> winters, List<String> remarks) {
        double[] predicted = FitWork.predict(model.model(values, spread.toLt10(), spread.toLt90()), task, samples, winters);
        List<String> dates = new ArrayList<>();
        for (int i = samples.size() - 1; i >= 0; i--) {
            if (Double.isNaN(predicted[i])) {
                dates.add(0, samples.get(i).date().toString());
                samples.remove(i);
                winters.remove(i);
            }
        }
        if (!dates.isEmpty()) {
            remarks.add("Left out for want of temperatures before them: " + dates.size() + " samples ("
                    + String.join(", ", dates.subList(0, Math.min(5, dates.size()))) + (dates.size() > 5 ? " ..." : "") + ").");
        }
    }

    private static Spread spread(List<MeasuredTolerance> samples) {
        List<MeasuredTolerance> full = samples.stream().filter(sample -> !Double.isNaN(sample.lt10() + sample.lt90())).toList();
        if (full.size() < SPREAD_SAMPLES) {
            double distance = DEFAULT_SPREAD * ToleranceCurve.LN_9;
            return new Spread(distance, distance, 0);
        }
        return new Spread(full.stream().mapToDouble(sample -> sample.lt10() - sample.lt50()).average().orElseThrow(),
                full.stream().mapToDouble(sample -> sample.lt50() - sample.lt90()).average().orElseThrow(), full.size());
    }

    /** Finds the best value of the searched parameter, each with a fit of the others from their start and from the last solution. */
    private static void search(FitWork work, int searched, TrialFit.Way way) {
        Parameter parameter = work.model().settings().get(searched).parameter();
        LeastSquares method = new LeastSquares(work::predict, work.parameters(), work.weights(), way.step());
        double best = Double.POSITIVE_INFINITY;
        double bestValue = work.values()[searched];
        double[] bestPoint = work.start();
        double[] first = work.start();
        double[] last = first;
        for (int step = 0; step < SEARCH_STEPS; step++) {
            way.between().run();
            work.values()[searched] = parameter.low() + step * (parameter.high() - parameter.low()) / (SEARCH_STEPS - 1);
            for (double[] from : last == first ? new double[][] {first} : new double[][] {first, last}) {
                LeastSquares.Solution solution = method.from(from, work.observed());
                last = solution.point();
                if (solution.sum() < best) {
                    best = solution.sum();
                    bestValue = work.values()[searched];
                    bestPoint = solution.point();
                }
            }
        }
        work.values()[searched] = bestValue;
        work.beginAt(bestPoint);
    }

    private static List<Kept> kept(FitModel model, double[] solution, boolean[] free, int searched, Task task) {
        List<Kept> kept = new ArrayList<>();
        for (int i = 0; i < free.length; i++) {
            Parameter parameter = model.settings().get(i).parameter();
            if (!free[i]) {
                kept.add(new Kept(parameter, solution[i], i == searched
                        ? "best of " + SEARCH_STEPS + " values from " + parameter.low() + " to " + parameter.high() + ", no interval"
                        : task.kept().containsKey(parameter.name()) ? "kept as asked" : "kept, not estimated"));
            }
        }
        return kept;
    }
}
