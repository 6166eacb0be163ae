package org.wintersill.run;

import java.util.Optional;
import org.wintersill.config.ScenarioConfig;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.scenario.Regridding;
import org.wintersill.scenario.ScenarioMethod;
import org.wintersill.scenario.ScenarioSource;
import org.wintersill.scenario.Series;
import org.wintersill.scenario.YearPools;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.time.DayAxis;

/** Brings the observed minima and a model's two records together. */
final class ScenarioPlan {
    /** Fewer years than this give samples of little worth. */
    private static final int FEW_YEARS = 20;

    private final ScenarioConfig config;
    private final DailyTemperatureSource observed;
    private final CoordinateOperations operations;
    private final Notices notices;

    private ScenarioPlan(ScenarioConfig config, DailyTemperatureSource observed, CoordinateOperations operations, Notices notices) {
        this.config = config;
        this.observed = observed;
        this.operations = operations;
        this.notices = notices;
    }

    /**
     * The scenario's minima.
     *
     * @throws org.wintersill.problem.ProblemException where a period holds no day, or the grids do not meet
     */
    static ScenarioSource of(ScenarioConfig config, DailyTemperatureSource observed, InputFormats formats,
                             CoordinateOperations operations, Notices notices) {
        DailyTemperatureSource historical = formats.open(config.historical(), notices);
        DailyTemperatureSource future = formats.open(config.future(), notices);
        return new ScenarioPlan(config, observed, operations, notices).source(historical, future);
    }

    private ScenarioSource source(DailyTemperatureSource historical, DailyTemperatureSource future) {
        if (historical.days().calendar() != future.days().calendar()) {
            notices.add("the model's past has the calendar " + historical.days().calendar().cfName() + ", its future "
                    + future.days().calendar().cfName() + ": their days are matched by their place in the year");
        }
        if (config.reference().isEmpty()) {
            notices.add("the observations (" + span(observed.days()) + ") are compared with the whole of the model's past ("
                    + span(historical.days()) + "); scenario.reference names a common period");
        }
        ScenarioMethod method = ScenarioMethod.named(config.method()).orElseThrow();
        Series observations = series(observed, "temperature.minimum", method.hasFutureDays() ? config.reference() : Optional.empty(), false);
        Series past = series(historical, "scenario.historical", config.reference(), true);
        Series later = series(future, "scenario.future", config.period(), true);
        for (Series series : new Series[] {observations, past, later}) {
            if (series.count() < FEW_YEARS * 360) {
                notices.add("a scenario is built on fewer than " + FEW_YEARS + " years (" + span(series.days())
                        + "): its extremes rest on few days");
            }
        }
        return new ScenarioSource(method, YearPools.named(config.pool()).orElseThrow(), observations, past, later);
    }

    private static String span(DayAxis days) {
        return days.date(0) + " to " + days.date(days.size() - 1);
    }

    private Series series(DailyTemperatureSource source, String key, Optional<ScenarioConfig.Period> period, boolean model) {
        DayAxis axis = source.days();
        int first = 0;
        int end = axis.size();
        if (period.isPresent()) {
            while (first < end && !period.get().holds(axis.date(first))) {
                first++;
            }
            while (end > first && !period.get().holds(axis.date(end - 1))) {
                end--;
            }
            if (first == end) {
                throw Problem.usage("the record of " + key + " has no day in " + period.get() + "; it runs from " + span(axis),
                        key.equals("scenario.future") ? "scenario.period" : "scenario.reference",
                        "Name a period that all records of it have").asException();
            }
        }
        boolean same = source.grid().sameAs(observed.grid());
        return new Series(source, model && !same ? Optional.of(regridding(source)) : Optional.empty(), first, end - first);
    }

    private Regridding regridding(DailyTemperatureSource model) {
        CoordinateOperation toModel = observed.grid().crs().sameAs(model.grid().crs()) ? CoordinateOperation.identity()
                : operations.between(observed.grid().crs(), model.grid().crs());
        return Regridding.of(Regridding.Kind.named(config.regrid()).orElseThrow(), model.grid(), observed.grid(), toModel,
                model.files().get(0).path());
    }
}
