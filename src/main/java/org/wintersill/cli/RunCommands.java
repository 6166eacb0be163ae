package org.wintersill.cli;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Supplier;
import org.wintersill.config.RunConfig;
import org.wintersill.config.Setting;
import org.wintersill.engine.CancelledException;
import org.wintersill.engine.Workers;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.chart.ChartFile;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.file.NewFile;
import org.wintersill.io.json.JsonText;
import org.wintersill.io.table.SeriesFile;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;
import org.wintersill.problem.Problems;
import org.wintersill.run.Caution;
import org.wintersill.run.CellExplanation;
import org.wintersill.run.ComparisonRun;
import org.wintersill.run.CellStatistics;
import org.wintersill.run.CellStatisticsText;
import org.wintersill.run.ElevationInspection;
import org.wintersill.run.ExplanationText;
import org.wintersill.run.FinishedFolder;
import org.wintersill.run.FolderContents;
import org.wintersill.run.InputFormats;
import org.wintersill.run.Inspection;
import org.wintersill.run.InspectionText;
import org.wintersill.run.StationComparison;
import org.wintersill.run.StationText;
import org.wintersill.run.MapRun;
import org.wintersill.run.MarginChart;
import org.wintersill.run.OutputFolder;
import org.wintersill.run.PlanText;
import org.wintersill.run.ReturnPeriodChart;
import org.wintersill.run.RunPlan;
import org.wintersill.run.RunPlanner;
import org.wintersill.run.RunReport;
import org.wintersill.run.curve.BuiltInText;
import org.wintersill.run.curve.CurveSet;
import org.wintersill.run.curve.FieldFit;
import org.wintersill.run.curve.FieldFitChart;
import org.wintersill.run.curve.FieldFitText;
import org.wintersill.run.curve.SeriesCourse;
import org.wintersill.run.curve.SeriesText;
import org.wintersill.run.parcels.ParcelsJob;

/** The commands on the rooms behind them. */
final class RunCommands implements Commands {
    private static final int NIGHTS_SHOWN = 10;

    /** Made when first needed: help and mistakes in a run file must not wait for it. */
    private GeoToolsCrs crs;
    private InputFormats formats;

    private InputFormats formats() {
        if (formats == null) {
            crs = new GeoToolsCrs();
            formats = new InputFormats(crs);
        }
        return formats;
    }

    private RunPlan plan(RunConfig config, Console console) {
        return new RunPlanner(formats(), crs).plan(config, console.notices());
    }

    @Override
    public int map(RunConfig config, MapOptions options, Console console) {
        OutputFolder.check(config.outputs().folder(), options.overwrite());
        RunPlan plan = plan(config, console);
        console.detail(PlanText.text(plan));
        RunReport report;
        try {
            report = new MapRun(plan, options.overwrite(), formats(), crs, console.progress(), console.notices())
                    .withWintersFrom(options.wintersFrom()).execute(console.cancellation());
        } catch (CancelledException e) {
            console.message("stopped; nothing was left in " + config.outputs().folder());
            return ExitCode.INTERRUPTED;
        }
        if (options.json()) {
            console.result(JsonText.of(document(plan, report)));
        } else {
            console.message(report.files() + " files in " + report.folder() + "; winters " + plan.seasons().get(0).label() + " to "
                    + plan.seasons().get(plan.seasons().size() - 1).label());
            console.message(Caution.SHORT);
        }
        return ExitCode.DONE;
    }

    private static Map<String, Object> document(RunPlan plan, RunReport report) {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("folder", report.folder().toString());
        document.put("files", report.files());
        document.put("winters", plan.seasons().stream().map(season -> season.label()).toList());
        document.put("summary", report.folder().resolve("summary.json").toString());
        document.put("record", report.folder().resolve(OutputFolder.RECORD).toString());
        document.put("caution", Caution.SHORT);
        return document;
    }

    @Override
    public void check(RunConfig config, boolean overwrite) {
        OutputFolder.check(config.outputs().folder(), overwrite);
    }

    @Override
    public int plan(RunConfig config, PlanOptions options, Console console) {
        OutputFolder.check(config.outputs().folder(), true);
        RunPlan plan = plan(config, console);
        console.result(options.json() ? JsonText.of(PlanText.document(plan)) : PlanText.text(plan));
        return ExitCode.DONE;
    }

    @Override
    public List<Setting> settings(Path folder, Console console) {
        return FolderContents.settings(folder, formats(), console.notices());
    }

    @Override
    public int compare(CompareOptions options, Console console) {
        formats();
        OutputFolder.check(options.out(), options.overwrite());
        ComparisonRun comparison = ComparisonRun.of(FinishedFolder.open(options.base(), crs),
                options.others().stream().map(other -> FinishedFolder.open(other, crs)).toList(), options.cultivars());
        int files;
        int threads = options.threads() > 0 ? options.threads() : Runtime.getRuntime().availableProcessors();
        try (Workers workers = new Workers(threads, console.cancellation())) {
            files = comparison.execute(options.out(), options.overwrite(), crs, workers, console.progress());
        }
        if (options.json()) {
            Map<String, Object> document = new LinkedHashMap<>();
            document.put("version", 1);
            document.put("folder", options.out().toString());
            document.put("files", files);
            document.put("changes", options.out().resolve("changes.json").toString());
            document.put("caution", Caution.SHORT);
            console.result(JsonText.of(document));
        } else {
            console.message(files + " files in " + options.out());
            console.message(Caution.SHORT);
        }
        return ExitCode.DONE;
    }

    @Override
    public int inspect(InspectOptions options, Console console) {
        Problems problems = new Problems();
        List<Map<String, Object>> documents = new ArrayList<>();
        StringBuilder text = new StringBuilder();
        for (Path file : options.entry().files()) {
            problems.attempt(() -> {
                Notices notices = new Notices();
                try {
                    Inspection inspection = Inspection.of(formats().open(file, options.entry().request(), notices), notices);
                    documents.add(inspection.document());
                    text.append(InspectionText.of(inspection)).append('\n');
                } catch (ProblemException noTemperatures) {
                    ElevationInspection heights = ElevationInspection.of(formats(), file, options.entry().request().crs())
                            .orElseThrow(() -> noTemperatures);
                    documents.add(heights.document());
                    text.append(heights.text()).append('\n');
                }
            });
        }
        if (options.json()) {
            Map<String, Object> document = new LinkedHashMap<>();
            document.put("version", 1);
            document.put("files", documents);
            console.result(JsonText.of(document));
        } else if (!text.isEmpty()) {
            console.result(text.toString());
        }
        problems.throwIfAny();
        return ExitCode.DONE;
    }

    @Override
    public int stations(RunConfig config, Path table, ExplainOptions.Format format, Console console) {
        StationComparison comparison = StationComparison.of(table, () -> plan(config, console), () -> crs);
        console.result(switch (format) {
            case JSON -> StationText.json(comparison);
            case CSV -> StationText.csv(comparison);
            case TEXT -> StationText.table(comparison);
        });
        return ExitCode.DONE;
    }

    @Override
    public int explain(RunConfig config, ExplainOptions options, Console console) {
        RunPlan plan = plan(config, console);
        CellExplanation wanted = options.lonLat()
                ? CellExplanation.atLongitudeLatitude(plan, crs, options.x(), options.y(), options.winter().orElse(null))
                : CellExplanation.of(plan, options.x(), options.y(), options.winter().orElse(null));
        if (!options.cultivars().isEmpty()) {
            wanted = wanted.ofCultivars(options.cultivars());
        }
        if (options.statistics()) {
            return statistics(plan, wanted, options, console);
        }
        if (options.chart().isPresent()) {
            ChartFile.write(MarginChart.of(plan, wanted), options.chart().get(), options.overwrite());
            console.message("The chart is " + options.chart().get());
        }
        console.result(switch (options.format()) {
            case JSON -> ExplanationText.json(wanted);
            case CSV -> ExplanationText.csv(wanted);
            case TEXT -> ExplanationText.table(wanted, NIGHTS_SHOWN);
        });
        return ExitCode.DONE;
    }

    private static int statistics(RunPlan plan, CellExplanation cell, ExplainOptions options, Console console) {
        CellStatistics statistics = CellStatistics.of(plan, cell);
        if (options.chart().isPresent()) {
            ChartFile.write(ReturnPeriodChart.of(plan, cell, statistics), options.chart().get(), options.overwrite());
            console.message("The chart is " + options.chart().get());
        }
        console.result(switch (options.format()) {
            case JSON -> CellStatisticsText.json(cell, statistics);
            case CSV -> CellStatisticsText.csv(statistics);
            case TEXT -> ExplanationText.table(cell, NIGHTS_SHOWN) + "\n" + CellStatisticsText.table(statistics);
        });
        return ExitCode.DONE;
    }

    @Override
    public int curves(CurvesOptions options, Console console) {
        if (options.fit().isPresent()) {
            return fit(options, console);
        }
        if (options.builtIn()) {
            answer(options.format(), console, BuiltInText::json, BuiltInText::csv, BuiltInText::table);
            return ExitCode.DONE;
        }
        CurveSet curves = CurveSet.read(options.files(), options.cultivars(), options.window(), console.notices());
        if (options.series().isPresent()) {
            CurvesOptions.SeriesOptions asked = options.series().get();
            SeriesCourse course = curves.over(SeriesFile.read(asked.file(), asked.dailyRange(), console.notices()), asked.latitude(),
                    asked.winter());
            draw(options, console, () -> course.chart(asked.file().getFileName().toString()));
            answer(options.format(), console, () -> SeriesText.json(course), () -> SeriesText.csv(course), () -> SeriesText.table(course));
        } else {
            draw(options, console, curves::chart);
            answer(options.format(), console, curves::json, curves::csv, curves::table);
        }
        return ExitCode.DONE;
    }

    private static void draw(CurvesOptions options, Console console, Supplier<Chart> chart) {
        options.chart().ifPresent(file -> {
            ChartFile.write(chart.get(), file, options.overwrite());
            console.message("The chart is " + file);
        });
    }

    private static void answer(ExplainOptions.Format format, Console console, Supplier<String> json, Supplier<String> csv,
                               Supplier<String> text) {
        console.result(switch (format) {
            case JSON -> json.get();
            case CSV -> csv.get();
            case TEXT -> Console.clean(text.get());
        });
    }

    private static int fit(CurvesOptions options, Console console) {
        FieldFit fit = FieldFit.of(options.fit().orElseThrow(), console.notices(), () -> {
            if (console.cancellation().getAsBoolean()) {
                throw new CancelledException();
            }
        });
        options.out().ifPresent(file -> {
            NewFile.write(file, FieldFitText.cultivarFile(fit).getBytes(StandardCharsets.UTF_8), options.overwrite());
            console.message("The cultivar file is " + file);
        });
        draw(options, console, () -> FieldFitChart.of(fit));
        answer(options.format(), console, () -> FieldFitText.json(fit), () -> FieldFitText.csv(fit), () -> FieldFitText.report(fit));
        return ExitCode.DONE;
    }

    @Override
    public int parcels(ParcelsOptions options, Console console) {
        ParcelsJob.Report report;
        try {
            report = ParcelsJob.execute(new ParcelsJob.Request(options.run(), options.out(), options.overwrite(), options.parcels(),
                    options.threads().orElse(Runtime.getRuntime().availableProcessors())), formats(), crs, console.progress(), console.notices(),
                    console.cancellation());
        } catch (CancelledException e) {
            console.message("stopped; nothing was left in " + options.out());
            return ExitCode.INTERRUPTED;
        }
        if (options.json()) {
            Map<String, Object> document = new LinkedHashMap<>();
            document.put("version", 1);
            document.put("folder", options.out().toString());
            document.put("files", report.files());
            document.put("parcels", report.parcels());
            document.put("outside", report.outside());
            document.put("geopackage", options.out().resolve(ParcelsJob.PACKAGE).toString());
            document.put("caution", Caution.SHORT);
            console.result(JsonText.of(document));
        } else {
            console.message(report.files() + " files in " + options.out() + "; " + report.parcels() + " parcels"
                    + (report.outside() > 0 ? ", " + report.outside() + " outside of the grid" : ""));
            console.message(Caution.SHORT);
        }
        return ExitCode.DONE;
    }
}
