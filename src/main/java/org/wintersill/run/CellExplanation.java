package org.wintersill.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.scenario.ScenarioSource;
import org.wintersill.season.CompletenessTally;
import org.wintersill.season.NightCurve;
import org.wintersill.season.Phases;
import org.wintersill.season.WinterLane;
import org.wintersill.season.WinterValues;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;

/**
 * One target cell, night by night: the very reader, adjustment, curves, completeness rule and fold of the main job, on a lane of
 * one cell.
 *
 * @param x centre of the cell in the target's system
 * @param y likewise
 * @param crs the target's system
 * @param elevation height of the cell, m; NaN without terrain model
 * @param heightChange what the elevation adjustment bridges, m; NaN without terrain model
 * @param cultivars in the order of the run
 * @param values of each winter told of, for all cultivars of the run
 */
public record CellExplanation(double x, double y, String crs, float elevation, float heightChange, List<CultivarCourse> cultivars,
                              List<WinterValues> values) {

    /** @param winters in the order of time */
    public record CultivarCourse(Cultivar cultivar, List<Winter> winters) {
    }

    /**
     * @param valid whether the winter counts
     * @param margin lowest margin, K; NaN where the winter does not count
     * @param damage fraction of buds killed
     * @param worstNight date of the earliest night of the lowest margin; null where the winter does not count
     * @param further what the run keeps of the damage besides
     */
    public record Winter(String label, boolean valid, float margin, float damage, String worstNight, List<Night> nights,
                         WinterDamage further) {

        /** A winter of which nothing is kept besides. */
        public Winter(String label, boolean valid, float margin, float damage, String worstNight, List<Night> nights) {
            this(label, valid, margin, damage, worstNight, nights, WinterDamage.none());
        }
    }

    /**
     * @param steps from the source cell's value to the cell's own
     * @param tmean daily mean of the date as a state model is told it, degC; NaN for curves by date and where it is missing
     * @param phase {@code autumn}, {@code midwinter} or {@code spring}, which begins with the state of the cultivar (science 16.12); null for
     *     curves by date
     * @param margin with the fold's own arithmetic, so that the lowest of a winter's nights is the winter's margin to the bit
     */
    public record Night(String date, Steps steps, float tmean, String phase, double lt10, double lt50, double lt90, float margin,
                        double damage) {

        public float tmin() {
            return steps.tmin();
        }
    }

    /**
     * How a night's temperature came about; NaN for missing.
     *
     * @param source value of the source cell, degC; in a scenario the model's own future there, or the observed value
     * @param mapped what the scenario makes of it; NaN in runs without one
     * @param interpolated value between source cells, degC
     * @param lapseRate K/km of the night at the cell
     * @param height change by height, K; the others add up with it to {@code tmin - interpolated}
     * @param pool change by cold-air pools, K
     * @param water change by water, K
     * @param offset constant change, K
     * @param tmin value at the cell, degC
     * @param isByHeightAlone whether the run adjusts by height alone, with lapse rates of the month
     */
    public record Steps(float source, float mapped, float interpolated, float lapseRate, float height, float pool, float water, float offset,
                        float tmin, boolean isByHeightAlone) {
        static final Steps MISSING = new Steps(Float.NaN, Float.NaN, Float.NaN, Float.NaN, Float.NaN, Float.NaN, Float.NaN, Float.NaN,
                Float.NaN, true);

        /** The temperature of a place itself, which nothing is done to. */
        public static Steps unadjusted(float tmin) {
            return new Steps(tmin, Float.NaN, tmin, 0, 0, 0, 0, 0, tmin, true);
        }

        /** The same night of a scenario, whose source cell has the given value before the scenario. */
        Steps from(float before) {
            return new Steps(before, source, interpolated, lapseRate, height, pool, water, offset, tmin, isByHeightAlone);
        }
    }

    /** The temperatures of one winter at the cell. */
    private record Temperatures(boolean complete, Steps[] nights) {
    }

    /**
     * Explains the cell that contains a place.
     *
     * @param plan the plan of the run
     * @param x coordinate in the target's system
     * @param winter label of one winter; null for all
     * @throws org.wintersill.problem.ProblemException when the place is outside or the winter is not in the run
     */
    public static CellExplanation of(RunPlan plan, double x, double y, String winter) {
        int column = plan.target().columnAt(x);
        int row = plan.target().rowAt(y);
        if (column < 0 || row < 0) {
            boolean swapped = plan.target().columnAt(y) >= 0 && plan.target().rowAt(x) >= 0;
            throw Problem.usage("the place " + x + "," + y + " is outside of the target grid, " + plan.target().describe(), "--at",
                    swapped ? "Give x before y: the two seem to be swapped" : "Give x,y in the coordinates of "
                            + plan.target().crs().label() + ", or --at-lonlat LON,LAT").asException();
        }
        List<Integer> wanted = new ArrayList<>();
        for (int s = 0; s < plan.seasons().size(); s++) {
            if (winter == null || plan.seasons().get(s).label().equals(winter)) {
                wanted.add(s);
            }
        }
        if (wanted.isEmpty()) {
            throw Problem.usage("the run has no winter " + winter, "--winter", "Its winters are "
                    + String.join(", ", plan.seasons().stream().map(Season::label).toList())).asException();
        }
        List<List<Winter>> courses = new ArrayList<>();
        List<WinterValues> values = new ArrayList<>();
        plan.cultivars().forEach(cultivar -> courses.add(new ArrayList<>()));
        boolean inside = plan.adjustment().positions().containing(row, column) >= 0;
        try (NightReader reader = inside ? new NightReader(plan, row, row + 1) : null;
                CellStates states = new CellStates(plan, reader, row, column)) {
            for (int s : wanted) {
                Temperatures temperatures = inside ? temperatures(plan, reader, plan.seasons().get(s), row, column)
                        : new Temperatures(false, missing(plan.seasons().get(s).days()));
                values.add(addWinter(plan, s, temperatures, states, courses));
            }
        }
        List<CultivarCourse> cultivars = new ArrayList<>();
        for (int c = 0; c < courses.size(); c++) {
            cultivars.add(new CultivarCourse(plan.cultivars().get(c), courses.get(c)));
        }
        int cell = row * plan.target().columns() + column;
        return new CellExplanation(plan.target().centreX(column), plan.target().centreY(row), plan.target().crs().label(),
                plan.adjustment().targetHeight(cell), plan.adjustment().heightChange(row, column), cultivars, values);
    }

    /** The same for a place given as WGS 84 longitude and latitude. */
    public static CellExplanation atLongitudeLatitude(RunPlan plan, CoordinateOperations operations, double longitude, double latitude,
                                                      String winter) {
        double[] place = {longitude, latitude};
        operations.between(operations.wgs84(), plan.target().crs()).transform(place, 1);
        return of(plan, place[0], place[1], winter);
    }

    /**
     * The same cell with only some of its cultivars.
     *
     * @throws org.wintersill.problem.ProblemException for an id that the run does not have
     */
    public CellExplanation ofCultivars(List<String> ids) {
        List<String> known = cultivars.stream().map(course -> course.cultivar().id()).toList();
        for (String id : ids) {
            if (known.stream().noneMatch(id::equalsIgnoreCase)) {
                throw Problem.usage("the run has no cultivar " + id, "--cultivar", NearestName.of(id, known)
                        .map(name -> "Did you mean " + name + "? ").orElse("") + "Its cultivars are " + String.join(", ", known))
                        .asException();
            }
        }
        return new CellExplanation(x, y, crs, elevation, heightChange, cultivars.stream()
                .filter(course -> ids.stream().anyMatch(course.cultivar().id()::equalsIgnoreCase)).toList(), values);
    }

    private static Temperatures temperatures(RunPlan plan, NightReader reader, Season season, int row, int column) {
        Steps[] nights = missing(season.days());
        CompletenessTally tally = new CompletenessTally(season, plan.job().policy(), reader.cells());
        DayAxis axis = plan.job().source().days();
        float[] before = beforeScenario(plan, row, column);
        for (int night = 0; night < nights.length; night++) {
            int position = axis.indexOf(season.firstDay() + night);
            if (position < 0) {
                tally.absent(night, 0, reader.cells());
                continue;
            }
            reader.read(position, season.date(night));
            tally.accept(night, reader.minima(), 0, 0, reader.cells());
            Steps steps = reader.at(row, column);
            nights[night] = before.length == 0 ? steps : steps.from(before[position]);
        }
        int containing = plan.adjustment().positions().containing(row, column);
        return new Temperatures(tally.isComplete(reader.cell(containing)), nights);
    }

    /** Values of the source cell before the scenario, by position on the day axis; none in runs without one. */
    private static float[] beforeScenario(RunPlan plan, int row, int column) {
        int containing = plan.adjustment().positions().containing(row, column);
        if (!(plan.source() instanceof ScenarioSource scenario) || containing < 0) {
            return new float[0];
        }
        Block window = plan.job().window();
        float[][] days = scenario.before(window.row() + containing / window.columns());
        float[] before = new float[days.length];
        for (int day = 0; day < days.length; day++) {
            before[day] = days[day][window.column() + containing % window.columns()];
        }
        return before;
    }

    private static Steps[] missing(int count) {
        Steps[] nights = new Steps[count];
        Arrays.fill(nights, Steps.MISSING);
        return nights;
    }

    private static WinterValues addWinter(RunPlan plan, int s, Temperatures temperatures, CellStates states,
                                  List<List<Winter>> courses) {
        Season season = plan.seasons().get(s);
        NightCurve[] curves = plan.job().curves().get(s);
        WinterLane lane = new WinterLane(curves.length, plan.job().levels(), plan.job().reckoning(), 1);
        float[][] night = new float[1][1];
        for (int n = 0; n < season.days(); n++) {
            float tmin = temperatures.nights()[n].tmin();
            night[0][0] = Float.isNaN(tmin) ? Float.POSITIVE_INFINITY : tmin;
            lane.accept(curves, night, 1, new int[] {n});
        }
        WinterValues values = lane.finish(cell -> temperatures.complete());
        Map<Integer, CellStates.Course> stateCourses = states.follow(s, temperatures.complete(), values);
        for (int c = 0; c < curves.length; c++) {
            float worst = values.worstNight(c)[0];
            boolean valid = !Float.isNaN(worst);
            courses.get(c).add(new Winter(season.label(), valid, values.margin(c, 0)[0], values.damage(c)[0],
                    valid ? season.date((int) worst).toString() : null,
                    curves[c] == null ? nights(season, plan, plan.cultivars().get(c), stateCourses.get(c), temperatures)
                            : nights(season, plan, plan.cultivars().get(c), curves[c], temperatures),
                    WinterDamage.of(values, c, plan.job().reckoning())));
        }
        return values;
    }

    private static List<Night> nights(Season season, RunPlan plan, Cultivar cultivar, NightCurve curve, Temperatures temperatures) {
        LethalTemperatures course = ((CalendarModel) cultivar.model()).overSeason(season);
        List<Night> nights = new ArrayList<>();
        for (int n = 0; n < season.days(); n++) {
            double lt10 = course.lt10()[n];
            double lt50 = course.lt50()[n];
            double lt90 = course.lt90()[n];
            float tmin = temperatures.nights()[n].tmin();
            nights.add(new Night(season.date(n).toString(), temperatures.nights()[n], Float.NaN, null, lt10, lt50, lt90,
                    Double.isNaN(lt50) ? Float.NaN : tmin - curve.lethal()[0][n], cultivar.tolerance().killedFraction(tmin, lt10, lt50, lt90)));
        }
        return nights;
    }

    private static List<Night> nights(Season season, RunPlan plan, Cultivar cultivar, CellStates.Course course, Temperatures temperatures) {
        Phases byDate = Phases.of(season, plan.job().reckoning().south());
        List<Night> nights = new ArrayList<>();
        for (int n = 0; n < season.days(); n++) {
            float lt10 = course.lt10()[n];
            float lt50 = course.lt50()[n];
            float lt90 = course.lt90()[n];
            float tmin = temperatures.nights()[n].tmin();
            nights.add(new Night(season.date(n).toString(), temperatures.nights()[n], course.mean()[n], phase(byDate, n, course.spring()),
                    shortest(lt10), shortest(lt50), shortest(lt90), tmin - lt50, cultivar.tolerance().killedFraction(tmin, lt10, lt50, lt90)));
        }
        return nights;
    }

    /** Spring begins with the change of the state, but not before midwinter does (science 16.12). */
    private static String phase(Phases byDate, int night, int spring) {
        return night < byDate.midwinter() ? "autumn" : night < spring ? "midwinter" : "spring";
    }

    /** The number of the fewest digits that stands for the same float. */
    private static double shortest(float value) {
        return Double.parseDouble(Float.toString(value));
    }
}
