package org.wintersill.run.curve;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.io.chart.Chart;
import org.wintersill.problem.Problem;
import org.wintersill.run.CellExplanation;
import org.wintersill.run.CellExplanation.CultivarCourse;
import org.wintersill.run.CellExplanation.Night;
import org.wintersill.run.CellExplanation.Winter;
import org.wintersill.run.MarginChart;
import org.wintersill.season.CompletenessTally;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.season.PointCourse;
import org.wintersill.temperature.DailySeries;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Cultivars driven by the temperatures of one place, winter by winter, by the lane that a run uses.
 *
 * @param courses in the order of the cultivars; a winter's margin is the lowest of its nights that are there, valid says whether a run
 *     with the usual rule on missing days would count it
 * @param seasons the winters, in the order of each course
 * @param series what drives them
 */
public record SeriesCourse(List<CultivarCourse> courses, List<Season> seasons, DailySeries series) {

    /**
     * Follows the cultivars.
     *
     * @param winter label of one winter; empty for all that share a day with the series
     * @throws org.wintersill.problem.ProblemException when there is no such winter
     */
    public static SeriesCourse of(List<Cultivar> cultivars, SeasonWindow window, DailySeries series, double latitude,
                                  Optional<String> winter) {
        DayAxis axis = new DayAxis(series.calendar(), java.util.stream.LongStream.range(series.firstDay(),
                series.firstDay() + series.days()).toArray());
        List<Season> all = window.seasons(axis);
        List<Season> seasons = all.stream().filter(season -> winter.isEmpty() || season.label().equals(winter.get())).toList();
        if (seasons.isEmpty()) {
            throw Problem.usage(winter.isPresent() ? "the series has no winter " + winter.get() : "the series, " + series.first() + " to "
                    + series.last() + ", has no day in the winter " + window.from() + " to " + window.to(), winter.isPresent() ? "--winter"
                    : "--window", all.isEmpty() ? "Give another --window" : "Its winters are " + String.join(", ",
                    all.stream().map(Season::label).toList())).asException();
        }
        List<CultivarCourse> courses = cultivars.stream().map(cultivar -> new CultivarCourse(cultivar,
                seasons.stream().map(season -> winter(cultivar, season, window, series, latitude)).toList())).toList();
        return new SeriesCourse(courses, seasons, series);
    }

    /**
     * The only winter of the only cultivar as a picture.
     *
     * @param name of the series
     * @throws org.wintersill.problem.ProblemException when there are several cultivars
     */
    public Chart chart(String name) {
        MarginChart.checkOne(courses);
        return MarginChart.of("Temperatures of " + name, courses.get(0).cultivar(), courses.get(0).winters().get(0), seasons.get(0));
    }

    private static Winter winter(Cultivar cultivar, Season season, SeasonWindow window, DailySeries series, double latitude) {
        LethalTemperatures lethal = PointCourse.of(cultivar.model(), season, window, series, latitude);
        CompletenessTally tally = new CompletenessTally(season, MissingDayPolicy.MONTH_10_5, 1);
        List<Night> nights = new ArrayList<>();
        float margin = Float.NaN;
        double damage = Double.NaN;
        String worst = null;
        for (int n = 0; n < season.days(); n++) {
            float tmin = series.minimum(season.firstDay() + n);
            tally.accept(n, new float[] {tmin}, 0, 0, 1);
            double lt50 = lethal.lt50()[n];
            Night night = new Night(season.date(n).toString(), CellExplanation.Steps.unadjusted(tmin),
                    series.mean(season.firstDay() + n), "", lethal.lt10()[n], lt50, lethal.lt90()[n],
                    tmin - (float) lt50, cultivar.tolerance().killedFraction(tmin, lethal.lt10()[n], lt50, lethal.lt90()[n]));
            nights.add(night);
            if (night.margin() < margin || Float.isNaN(margin) && !Float.isNaN(night.margin())) {
                margin = night.margin();
                worst = night.date();
            }
            damage = night.damage() > damage || Double.isNaN(damage) ? night.damage() : damage;
        }
        return new Winter(season.label(), tally.isComplete(0), margin, (float) damage, worst, nights);
    }
}
