package org.wintersill.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.wintersill.config.RunConfig;
import org.wintersill.config.TemperatureConfig;
import org.wintersill.config.TemperatureEntry;
import org.wintersill.engine.StateForcing;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.StateModel;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.season.StateCultivar;
import org.wintersill.season.StateLane;
import org.wintersill.temperature.AlignedTemperatureSource;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Where the daily mean of a run comes from. It is only looked for where a cultivar has a state model.
 *
 * @param cultivars all of the run
 * @param window what a winter is
 * @param minimumDays days of the minima
 * @param minima the daily minima, on the days that either record has
 * @param second maxima or means on the same days; null where there are none
 * @param known days whose mean is known somewhere
 * @param dailyRange K, where there is no second record
 */
record DailyMeans(List<Cultivar> cultivars, SeasonWindow window, DayAxis minimumDays, DailyTemperatureSource minima, DailyTemperatureSource second,
                  DayAxis known, double dailyRange) {
    private static final int SHOWN_GAPS = 3;

    private static List<Cultivar> withState(List<Cultivar> cultivars) {
        return cultivars.stream().filter(cultivar -> cultivar.model() instanceof StateModel).toList();
    }

    /**
     * Refuses cultivars whose model needs the daily mean where none is given, or none that fits a scenario.
     *
     * @throws org.wintersill.problem.ProblemException naming them
     */
    static void require(List<Cultivar> cultivars, RunConfig config) {
        TemperatureConfig temperature = config.temperature();
        List<Cultivar> following = withState(cultivars);
        if (following.isEmpty()) {
            return;
        }
        boolean files = temperature.maximum().isPresent() || temperature.mean().isPresent();
        if (!files && temperature.dailyRange().isEmpty()) {
            throw Problem.usage("the daily mean temperature is needed and not given: "
                            + following.stream().map(cultivar -> "cultivar " + cultivar.id() + " has the model " + cultivar.model().id())
                            .collect(Collectors.joining(", ")), "temperature",
                    "Give temperature.maximum or temperature.mean, or temperature.daily-range, the difference of maximum and minimum"
                            + " in K").asException();
        }
        if (files && config.scenario().isPresent()) {
            throw Problem.usage("the scenario changes the daily minima only, and cultivar " + following.get(0).id() + " follows the daily"
                            + " mean", "temperature." + (temperature.maximum().isPresent() ? "maximum" : "mean"),
                    "Give temperature.daily-range in its place, so that the mean changes with the minimum").asException();
        }
    }

    /**
     * Opens what is needed.
     *
     * @param minima the daily minima
     * @throws org.wintersill.problem.ProblemException when maxima or means cannot be read or do not belong to the minima
     */
    static DailyMeans of(RunConfig run, List<Cultivar> cultivars, SeasonWindow window, DailyTemperatureSource minima,
                         InputFormats formats, Notices notices) {
        TemperatureConfig config = run.temperature();
        if (withState(cultivars).isEmpty()) {
            if (!PoolMaxima.areNeeded(run) && (config.maximum().isPresent() || config.mean().isPresent() || config.dailyRange().isPresent())) {
                notices.add("no model of this run needs the daily mean: maximum and mean temperatures are not read");
            }
            return new DailyMeans(cultivars, window, minima.days(), minima, null, minima.days(), 0);
        }
        if (config.dailyRange().isPresent()) {
            return new DailyMeans(cultivars, window, minima.days(), minima, null, minima.days(), config.dailyRange().get());
        }
        TemperatureEntry entry = config.maximum().or(config::mean).orElseThrow();
        DailyTemperatureSource second = formats.open(entry, notices);
        refuseDifference(minima, second);
        DayAxis days = AlignedTemperatureSource.union(minima.days(), second.days());
        DayAxis known = second.variable() == ForcingVariable.MEAN ? second.days() : common(minima.days(), second.days());
        return new DailyMeans(cultivars, window, minima.days(), AlignedTemperatureSource.on(days, minima),
                AlignedTemperatureSource.on(days, second), known, 0);
    }

    private static DayAxis common(DayAxis one, DayAxis other) {
        long[] days = new long[one.size()];
        int n = 0;
        for (int i = 0; i < one.size(); i++) {
            if (other.indexOf(one.day(i)) >= 0) {
                days[n++] = one.day(i);
            }
        }
        return new DayAxis(one.calendar(), Arrays.copyOf(days, n));
    }

    static void refuseDifference(DailyTemperatureSource minima, DailyTemperatureSource second) {
        Problems problems = new Problems();
        GridGeometry a = minima.grid();
        GridGeometry b = second.grid();
        if (minima.days().calendar() != second.days().calendar()) {
            problems.add(difference(minima, second, "calendar", minima.days().calendar().cfName(), second.days().calendar().cfName()));
        }
        if (!a.crs().sameAs(b.crs())) {
            problems.add(difference(minima, second, "reference system", a.crs().label(), b.crs().label()));
        } else if (!a.sameAs(b)) {
            problems.add(difference(minima, second, "grid", a.describe(), b.describe()));
        }
        problems.throwIfAny();
    }

    private static Problem difference(DailyTemperatureSource minima, DailyTemperatureSource second, String what, String a, String b) {
        String word = second.variable().word();
        return Problem.input("the " + what + " of the daily " + word + " is " + b
                        + ", that of the daily minimum is " + a, second.files().isEmpty() ? "temperature." + word : second.files().get(0).path(),
                "Give the " + word + " of the data set that the minima are from, or bring both to one grid and calendar first");
    }

    /**
     * The winters that can be used.
     *
     * @throws org.wintersill.problem.ProblemException when a model begins within the winter before
     */
    WinterSelection winters(WinterSelection all) {
        List<Cultivar> following = withState(cultivars);
        if (following.isEmpty() || all.used().isEmpty()) {
            return all;
        }
        refuseOverlap(following, all.used().get(0));
        return all.withMeansFrom(known.size() == 0 ? Long.MAX_VALUE : known.day(0), following);
    }

    private void refuseOverlap(List<Cultivar> following, Season season) {
        Season before = window.beginningIn(season.first().year() - 1, season.calendar());
        long free = before.firstDay() + before.days();
        Problems problems = new Problems();
        for (Cultivar cultivar : following) {
            int first = ((StateModel) cultivar.model()).firstDay(season);
            if (season.firstDay() + first < free) {
                problems.add(Problem.usage("cultivar " + cultivar.id() + " needs daily means from " + season.date(first)
                                + " on for the winter that begins on " + season.first() + ", and the winter before ends on " + before.last(),
                        "winter", "Let the winter begin later or end earlier, or change the first day of the cultivar's model"));
            }
        }
        problems.throwIfAny();
    }

    private int firstDay(StateModel model, Season season) {
        return StateLane.firstTold(model, season, window, day -> isKnown(season, day));
    }

    private boolean isKnown(Season season, int day) {
        return known.indexOf(season.firstDay() + day) >= 0;
    }

    /** Winters that no cell can have for a cultivar, because days in a row are absent from the whole record. */
    void tellOfGaps(List<Season> seasons, Notices notices) {
        for (Cultivar cultivar : withState(cultivars)) {
            for (Season season : seasons) {
                List<String> gaps = longGaps(season, firstDay((StateModel) cultivar.model(), season));
                if (!gaps.isEmpty()) {
                    notices.add("winter " + season.label() + " has no values for cultivar " + cultivar.id() + ": the daily mean is absent on "
                            + String.join(", ", gaps.subList(0, Math.min(SHOWN_GAPS, gaps.size())))
                            + (gaps.size() > SHOWN_GAPS ? " and more" : "") + ", which is longer than the " + StateLane.LONGEST_GAP
                            + " days that are filled");
                }
            }
        }
    }

    /** Absent days from a day on that are followed by a night with a temperature. */
    private List<String> longGaps(Season season, int first) {
        List<String> gaps = new ArrayList<>();
        int last = season.days() - 1;
        while (last > first && minimumDays.indexOf(season.firstDay() + last) < 0) {
            last--;
        }
        int start = first;
        for (int day = first; day <= last; day++) {
            if (isKnown(season, day)) {
                start = day + 1;
            } else if (day - start == StateLane.LONGEST_GAP) {
                int end = day;
                while (end < last && !isKnown(season, end + 1)) {
                    end++;
                }
                gaps.add(season.date(start) + ".." + season.date(end));
                day = end;
                start = end + 1;
            }
        }
        return gaps;
    }

    /** What the fold needs; nothing where no cultivar has a state model. */
    StateForcing forcing(List<Season> seasons, GridGeometry target, int[] levels, CoordinateOperations operations) {
        List<StateCultivar> following = new ArrayList<>();
        for (int c = 0; c < cultivars.size(); c++) {
            if (cultivars.get(c).model() instanceof StateModel model) {
                following.add(new StateCultivar(c, model, cultivars.get(c).tolerance(), Arrays.stream(levels).asDoubleStream().toArray()));
            }
        }
        List<int[]> firstDays = seasons.stream()
                .map(season -> following.stream().mapToInt(cultivar -> firstDay(cultivar.model(), season)).toArray()).toList();
        return following.isEmpty() ? StateForcing.none()
                : new StateForcing(following, firstDays, second, dailyRange, operations.between(target.crs(), operations.wgs84()));
    }
}
