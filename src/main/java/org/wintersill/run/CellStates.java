package org.wintersill.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.engine.StateForcing;
import org.wintersill.season.Phases;
import org.wintersill.season.StateCultivar;
import org.wintersill.season.StateLane;
import org.wintersill.season.WinterValues;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/** The cultivars with state models in one cell: the readers, adjustment and lane of the main job, and what the lane sees by night. */
final class CellStates implements AutoCloseable {
    private final RunPlan plan;
    private final StateForcing forcing;
    private final int row;
    private final int column;
    private final NightReader nights;
    private final DailyTemperatureReader second;

    /**
     * The nights of one cultivar in one winter, {@code [night]}, NaN for missing.
     *
     * @param mean daily mean of the night's date, as the model was told it; degC
     * @param lt10 degC
     * @param lt50 degC
     * @param lt90 degC
     * @param spring first night of the spring phase, by the state or, where the model knows no phases, by the date; beyond the last
     *     where it does not come
     */
    record Course(float[] mean, float[] lt10, float[] lt50, float[] lt90, int spring) {
    }

    /** @param nights reader of the cell's row; null where the cell lies beyond the source */
    CellStates(RunPlan plan, NightReader nights, int row, int column) {
        this.plan = plan;
        this.nights = nights;
        this.row = row;
        this.column = column;
        forcing = plan.job().states();
        second = nights != null && forcing.hasSecond() ? forcing.second().open() : null;
    }

    /**
     * Follows the cultivars through a winter.
     *
     * @param s number of the winter
     * @param complete whether it is complete enough at the cell
     * @param values takes the winter's values
     * @return courses by number of the cultivar in the run
     */
    Map<Integer, Course> follow(int s, boolean complete, WinterValues values) {
        List<StateCultivar> cultivars = forcing.cultivars();
        if (cultivars.isEmpty()) {
            return Map.of();
        }
        Season season = plan.seasons().get(s);
        List<Course> courses = new ArrayList<>();
        Phases phases = Phases.of(season, plan.job().reckoning().south());
        int[] spring = new int[cultivars.size()];
        Arrays.setAll(spring, c -> cultivars.get(c).model().knowsPhases() ? Integer.MAX_VALUE : phases.spring());
        cultivars.forEach(cultivar -> courses.add(new Course(none(season), none(season), none(season), none(season), 0)));
        StateLane states = new StateLane(cultivars, plan.job().reckoning(), 1, (c, night, tolerance, mean, state) -> {
            Course course = courses.get(c);
            course.mean()[night] = mean[0];
            course.lt50()[night] = tolerance.lt50()[0];
            course.lt10()[night] = tolerance.lt50()[0] + tolerance.toLt10()[0];
            course.lt90()[night] = tolerance.lt50()[0] - tolerance.toLt90()[0];
            if (cultivars.get(c).model().knowsPhases()) {
                spring[c] = Math.min(spring[c], state.phaseSwitch(0));
            }
        });
        states.begin(season, forcing.firstDays().get(s), forcing.latitudes(plan.target(), row, column, 1, 1));
        DayAxis axis = plan.job().source().days();
        for (int day = states.firstDay(); day < season.days(); day++) {
            int position = nights == null ? -1 : axis.indexOf(season.firstDay() + day);
            if (position < 0) {
                states.absent();
                continue;
            }
            nights.read(position, season.date(day));
            states.minima()[0] = nights.airMinimum(row, column);
            if (second != null) {
                states.means()[0] = nights.second(second, position, forcing.kindOfSecond(), row, column);
            }
            forcing.toMeans(states.minima(), states.means(), 1);
            states.accept();
        }
        states.finish(cell -> complete, values);
        Map<Integer, Course> byCultivar = new HashMap<>();
        for (int c = 0; c < cultivars.size(); c++) {
            Course course = courses.get(c);
            byCultivar.put(cultivars.get(c).index(), new Course(course.mean(), course.lt10(), course.lt50(), course.lt90(), spring[c]));
        }
        return byCultivar;
    }

    private static float[] none(Season season) {
        float[] values = new float[season.days()];
        Arrays.fill(values, Float.NaN);
        return values;
    }

    @Override
    public void close() {
        if (second != null) {
            second.close();
        }
    }
}
