package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.estimation.CultivarFit;
import org.wintersill.estimation.TrialFit;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.io.table.FieldFile;
import org.wintersill.io.table.SeriesFile;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.temperature.DailySeries;

/**
 * Trial fits of a model to the cultivars of a field table, each by itself.
 *
 * @param request what was asked
 * @param fits by cultivar id, in the order of the table
 */
public record FieldFit(FitRequest request, Map<String, CultivarFit> fits) {
    /** Starts of each fit beside the usual one; project choice. */
    private static final int STARTS = 3;
    /** Slopes over this share of a range: lethal temperatures of a run are in single precision. */
    private static final double STEP = 2e-3;

    /**
     * Reads the tables and fits.
     *
     * @param between called between the steps of the work; may throw to end it
     * @throws org.wintersill.problem.ProblemException with all problems of the tables, or of all cultivars
     */
    public static FieldFit of(FitRequest request, Notices notices, Runnable between) {
        checkModel(request);
        Problems problems = new Problems();
        List<MeasuredTolerance> samples = new ArrayList<>();
        DailySeries[] series = new DailySeries[1];
        problems.attempt(() -> samples.addAll(FieldFile.read(request.field(), notices)));
        request.series().ifPresent(file -> problems.attempt(() -> series[0] = SeriesFile.read(file, request.dailyRange(), notices)));
        problems.throwIfAny();
        CultivarFit.Task task = new CultivarFit.Task(request.model(), request.window(), series[0], request.latitude(), request.kept());
        TrialFit.Way way = new TrialFit.Way(STARTS, STEP, request.replicates(), request.confidence(), request.seed(), between);
        Map<String, List<MeasuredTolerance>> cultivars = new LinkedHashMap<>();
        samples.forEach(sample -> cultivars.computeIfAbsent(id(sample.cultivar()), id -> new ArrayList<>()).add(sample));
        Map<String, CultivarFit> fits = new LinkedHashMap<>();
        cultivars.forEach((id, own) -> problems.attempt(() -> {
            checkName(id, own, request);
            fits.put(id, CultivarFit.of(own, task, request.field().toString(), way));
        }));
        problems.throwIfAny();
        fits.forEach((id, fit) -> fit.remarks().forEach(remark -> notices.add(id + ": " + remark.replaceFirst("\\.$", ""))));
        return new FieldFit(request, fits);
    }

    private static void checkModel(FitRequest request) {
        if (!CultivarFit.words().contains(request.model())) {
            throw Problem.usage("a trial fit of the model '" + request.model() + "' is not possible; accepted: "
                    + String.join(", ", CultivarFit.words()), "--model", NearestName.of(request.model(), CultivarFit.words())
                    .map(near -> "Did you mean " + near + "?").orElse("")).asException();
        }
        boolean dated = request.model().equals("dated");
        if (!dated && request.series().isEmpty()) {
            throw Problem.usage("the model " + request.model() + " follows the weather, and there is no series", "--series",
                    "Give --series SERIES.csv with date, tmin and tmax or tmean").asException();
        }
    }

    /** The id that a name of the table becomes. */
    static String id(String name) {
        String id = name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-|-$", "");
        return id.length() <= Cultivar.LONGEST_ID ? id : id.substring(0, Cultivar.LONGEST_ID).replaceAll("-$", "");
    }

    private static void checkName(String id, List<MeasuredTolerance> samples, FitRequest request) {
        List<String> names = samples.stream().map(MeasuredTolerance::cultivar).distinct().toList();
        if (!Cultivar.isId(id)) {
            throw Problem.input("the cultivar name '" + names.get(0) + "' has no letter or digit for an id", request.field().toString(),
                    "Use letters a to z or digits in it").asException();
        }
        if (names.size() > 1) {
            throw Problem.input("the cultivar names '" + String.join("', '", names) + "' become one id, " + id, request.field().toString(),
                    "Write the name alike in every row, or make the names differ in letters or digits").asException();
        }
    }

    /** Where the numbers of a cultivar come from, for its entry in a cultivar file. */
    String source(CultivarFit fit) {
        List<String> labels = fit.winters().stream().map(winter -> winter.label()).distinct().sorted().toList();
        return "trial fit of " + fit.word() + " to " + request.field().getFileName() + ", " + fit.samples().size() + " samples of "
                + (labels.size() == 1 ? "winter " + labels.get(0) : labels.size() + " winters " + labels.get(0) + " to "
                + labels.get(labels.size() - 1)) + ", RMSE " + String.format(Locale.ROOT, "%.2f", fit.fit().rmse()) + " K";
    }
}
