package org.wintersill.hardiness.model;

import java.io.Serializable;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.ModelParameters;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.Quantity;
import org.wintersill.hardiness.StateModel;
import org.wintersill.hardiness.model.LethalReading.Distances;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Hardiness that follows a stationary level: what the cultivar would reach if temperature and night stayed as they are.
 *
 * <pre>
 *   target = level + aT * clamp(Tm; T1..T2) + aN * clamp(night; N1..N2)       degC; Tm daily mean, night in hours
 *   first order:   H = target + (H - target) exp(-1 / tau)
 *   second order:  S = target + (S - target) exp(-1 / tau1);   H = S + (H - S) exp(-1 / tau2)
 * </pre>
 * H is LT50; H and S are {@code initial} on the start date. The step is exact for a day of constant conditions, so no tau is too short.
 *
 * <p>Source: the structure of Leinonen, Repo, Hanninen and Burr 1995 and of Leinonen, Repo and Hanninen 1996, Silva Fennica 30:159
 * (abstracts read; science 3.2). No published parameters were found. LT10 and LT90 keep constant distances from LT50, a project choice.
 *
 * @param start day on which the state begins; null for 7 September in the north, 7 March in the south
 * @param initial H on that day, degC
 * @param level target at 0 degC and no night, degC
 * @param temperature part of the daily mean, degC
 * @param night part of the length of the night, hours; null where it plays no part
 * @param tau1 time constant, days
 * @param tau2 second time constant, days; 0 for a model of first order
 * @param toLt10 LT10 - LT50, K
 * @param toLt90 LT50 - LT90, K
 */
public record RelaxationModel(MonthDay start, double initial, double level, Part temperature, Part night, double tau1, double tau2,
                       double toLt10, double toLt90) implements StateModel {
    static final String WORD = "relaxation";
    private static final Quantity LEVEL = Quantity.of("degC", -200, 200);
    private static final Quantity TAU = Quantity.of("days", 0.05, 365);

    /**
     * A linear part of the target.
     *
     * @param slope K of LT50 a unit
     * @param from lowest value that makes a difference
     * @param to highest value
     */
    public record Part(double slope, double from, double to) implements Serializable {

        private double least() {
            return Math.min(slope * from, slope * to);
        }

        private double most() {
            return Math.max(slope * from, slope * to);
        }
    }

    @Override
    public String id() {
        return WORD;
    }

    @Override
    public String describe() {
        return (tau2 > 0 ? "relaxation of second order, " + tau1 + " and " + tau2 : "relaxation of first order, " + tau1)
                + " days, from " + (start == null ? ThermalTimeModel.NORTHERN_START + " north, " + ThermalTimeModel.SOUTHERN_START + " south"
                : start) + ", initial " + initial + ", target " + level + " + " + temperature.slope() + " x mean (" + temperature.from() + " to "
                + temperature.to() + " degC)" + (night == null ? "" : " + " + night.slope() + " x night (" + night.from() + " to " + night.to()
                + " h)") + ", LT10 " + toLt10 + " K above and LT90 " + toLt90 + " K below LT50";
    }

    @Override
    public Optional<String> notCovering(SeasonWindow window) {
        return Optional.empty();
    }

    @Override
    public boolean knowsPhases() {
        return false;
    }

    @Override
    public int firstDay(Season season) {
        return StartDay.position(season, start, ThermalTimeModel.NORTHERN_START, ThermalTimeModel.SOUTHERN_START);
    }

    @Override
    public HardinessTrajectory begin(Season season, double[] latitudes) {
        return new Trajectory(this, season, latitudes);
    }

    @Override
    public int bytesPerCell() {
        return 5 * Double.BYTES;
    }

    /** Reads the parameters of an entry; empty after problems. */
    static Optional<HardinessModel> read(ModelParameters entry) {
        int before = entry.problems();
        Optional<MonthDay> start = entry.date("start");
        Optional<Double> initial = LethalReading.requiredLethal(entry, "initial");
        List<Double> tau = entry.has("time-constants") ? entry.numbers("time-constants", 2, TAU).orElse(List.of())
                : entry.required("time-constant", TAU).map(List::of).orElse(List.of());
        if (entry.has("time-constant") && entry.has("time-constants")) {
            entry.problem("time-constants", "time-constant and time-constants are both given", "Keep one for first order, two for second");
        }
        Optional<ModelParameters> target = entry.requiredSection("target",
                "Give the stationary hardiness: {level: -12, temperature: {slope: 0.6, from: -10, to: 10}, night: {slope: -0.5, from: 10, to: 16}}");
        Optional<Double> level = target.flatMap(part -> part.required("level", LEVEL));
        Optional<Part> temperature = target.flatMap(part -> part.requiredSection("temperature", "Write temperature: {slope: 0.6, from: -10, to: 10}"))
                .flatMap(part -> part(part, 1, Quantity.of("degC", -60, 60)));
        Optional<Part> night = target.flatMap(part -> part.section("night")).flatMap(part -> part(part, -1, Quantity.of("hours", 0, 24)));
        Optional<Distances> distances = LethalReading.distances(entry);
        if (entry.problems() > before) {
            return Optional.empty();
        }
        RelaxationModel model = new RelaxationModel(start.orElse(null), initial.orElseThrow(), level.orElseThrow(), temperature.orElseThrow(),
                night.orElse(null), tau.get(0), tau.size() > 1 ? tau.get(1) : 0, distances.orElseThrow().toLt10(), distances.orElseThrow().toLt90());
        return model.believable(target.orElseThrow()) ? Optional.of(model) : Optional.empty();
    }

    /** @param sign of the slope that makes sense: warm days take hardiness, long nights give it */
    private static Optional<Part> part(ModelParameters part, int sign, Quantity unit) {
        Optional<Double> slope = part.required("slope", Quantity.of("K a unit", -50, 50));
        Optional<Double> from = part.required("from", unit);
        Optional<Double> to = part.required("to", unit);
        if (slope.isPresent() && slope.get() * sign < 0) {
            part.problem("slope", "the slope " + slope.get() + " has the wrong sign: " + (sign > 0 ? "warm days make a plant tenderer, which is "
                    + "a higher lethal temperature" : "long nights make a plant hardier, which is a lower lethal temperature"),
                    "Write " + -slope.get());
        }
        if (from.isPresent() && to.isPresent() && from.get() >= to.get()) {
            part.problem("from", "from " + from.get() + " is not below to " + to.get(), "Give the lower limit first");
        }
        return slope.flatMap(a -> from.flatMap(low -> to.map(high -> new Part(a, low, high))));
    }

    private boolean believable(ModelParameters target) {
        double lowest = level + temperature.least() + (night == null ? 0 : night.least());
        double highest = level + temperature.most() + (night == null ? 0 : night.most());
        Quantity lethal = LethalReading.LETHAL;
        if (lowest < lethal.lowest() || highest > lethal.highest()) {
            target.problem("", "the stationary hardiness reaches from " + lowest + " to " + highest + " degC, beyond " + lethal.accepted(),
                    "Check level, slopes and limits");
            return false;
        }
        return true;
    }

    /** State in double precision. */
    static final class Trajectory implements HardinessTrajectory {
        private final RelaxationModel model;
        private final Season season;
        private final int cells;
        private final double keep1;
        private final double keep2;
        private final double[] first;
        private final double[] second;
        private final double[] tangents;
        private final double[] hours;
        private final double[] target;

        Trajectory(RelaxationModel model, Season season, double[] latitudes) {
            this.model = model;
            this.season = season;
            cells = latitudes.length;
            keep1 = Math.exp(-1 / model.tau1);
            keep2 = model.tau2 > 0 ? Math.exp(-1 / model.tau2) : 0;
            first = new double[cells];
            Arrays.fill(first, model.initial);
            second = first.clone();
            tangents = Arrays.stream(latitudes).map(latitude -> Math.tan(Math.toRadians(latitude))).toArray();
            hours = new double[cells];
            target = new double[cells];
        }

        @Override
        public void tolerance(int day, NightTolerance out) {
            Arrays.fill(out.toLt10(), 0, cells, (float) model.toLt10);
            Arrays.fill(out.toLt90(), 0, cells, (float) model.toLt90);
            for (int i = 0; i < cells; i++) {
                out.lt50()[i] = (float) second[i];
            }
        }

        /** H at the end of the last day that was taken, degC. */
        double hardiness(int cell) {
            return second[cell];
        }

        @Override
        public void advance(int day, float[] mean) {
            Part warmth = model.temperature;
            ofTemperature(mean, model.level, warmth.slope(), warmth.from(), warmth.to(), target, cells);
            if (model.night != null) {
                NightLength.hours(tangents, NightLength.declination(season.date(day), season.calendar()), hours, cells);
                addNight(hours, model.night.slope(), model.night.from(), model.night.to(), target, cells);
            }
            approach(first, target, keep1, cells);
            approach(second, first, keep2, cells);
        }

        @Override
        public int phaseSwitch(int cell) {
            return Integer.MAX_VALUE;
        }

        private static void ofTemperature(float[] mean, double level, double slope, double from, double to, double[] target, int cells) {
            for (int i = 0; i < cells; i++) {
                target[i] = level + slope * Math.min(to, Math.max(from, (double) mean[i]));
            }
        }

        private static void addNight(double[] hours, double slope, double from, double to, double[] target, int cells) {
            for (int i = 0; i < cells; i++) {
                target[i] += slope * Math.min(to, Math.max(from, hours[i]));
            }
        }

        /** state = goal + (state - goal) keep; with nothing kept it is the goal, which makes the second step one of first order. */
        static void approach(double[] state, double[] goal, double keep, int cells) {
            for (int i = 0; i < cells; i++) {
                state[i] = goal[i] + (state[i] - goal[i]) * keep;
            }
        }
    }
}
