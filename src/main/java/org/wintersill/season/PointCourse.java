package org.wintersill.season;

import java.util.Arrays;
import java.util.List;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.StateModel;
import org.wintersill.temperature.DailySeries;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** The lethal temperatures of a model at one place through one winter, by the lane that a run uses, gaps included. */
public final class PointCourse {
    private static final double[] LEVELS = {50};

    private PointCourse() {
    }

    /**
     * Follows a winter.
     *
     * @param window of the winters; means of the winter before are not looked at
     * @param latitude degrees north
     * @return NaN where the model says nothing, or where its state is lost in a long gap
     */
    public static LethalTemperatures of(HardinessModel model, Season season, SeasonWindow window, DailySeries series,
                                        double latitude) {
        if (model instanceof CalendarModel calendarModel) {
            return calendarModel.overSeason(season);
        }
        double[] lt10 = missing(season.days());
        double[] lt50 = missing(season.days());
        double[] lt90 = missing(season.days());
        StateCultivar cultivar = new StateCultivar(0, (StateModel) model, ToleranceCurve.SPLIT_LOGISTIC, LEVELS);
        StateLane lane = new StateLane(List.of(cultivar), DamageReckoning.PLAIN, 1, (c, night, tolerance, mean, state) -> {
            lt50[night] = tolerance.lt50()[0];
            lt10[night] = lt50[night] + tolerance.toLt10()[0];
            lt90[night] = lt50[night] - tolerance.toLt90()[0];
        });
        int first = StateLane.firstTold((StateModel) model, season, window, day ->
                !Float.isNaN(series.mean(season.firstDay() + day)));
        lane.begin(season, new int[] {first}, new double[] {latitude});
        for (int day = lane.firstDay(); day < season.days(); day++) {
            long number = season.firstDay() + day;
            lane.minima()[0] = present(series.minimum(number));
            lane.means()[0] = present(series.mean(number));
            lane.accept();
        }
        lane.finish(cell -> true, new WinterValues(1, 1, DamageReckoning.PLAIN, 1));
        return new LethalTemperatures(lt10, lt50, lt90);
    }

    private static float present(float value) {
        return Float.isNaN(value) ? Float.POSITIVE_INFINITY : value;
    }

    private static double[] missing(int count) {
        double[] values = new double[count];
        Arrays.fill(values, Double.NaN);
        return values;
    }
}
