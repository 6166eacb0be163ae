package org.wintersill.hardiness.model;

import java.io.Serializable;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
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
 * LT50 as a function of the weather of the last days, one in autumn and another in spring.
 *
 * <p>With x the mean of the daily means of days i-n .. i-1, or the exponential mean {@code x = x + (Tm - x)(1 - exp(-1 / tau))} that
 * begins with the first day's mean, the LT50 of night i is {@code (1 - w) A(x) + w S(x)}: A and S are {@link FourParameterLogistic}s,
 * w goes from 0 to 1 between two chilling sums (degree-days below 10 degC up to day i-1, counted from a date) or two dates. Nights with
 * fewer than n days of history have no value. Source: science 2.2, the form of the limbs after Ritz et al. 2015; the blend and the
 * defaults are project choices. LT10 and LT90 keep constant distances from LT50, a project choice.
 *
 * @param autumn A
 * @param spring S
 * @param days n; 0 for an exponential mean
 * @param tau time constant of the exponential mean, days; 0 for a plain mean
 * @param turn how spring takes over from autumn
 * @param toLt10 LT10 - LT50, K
 * @param toLt90 LT50 - LT90, K
 */
public record ResponseModel(FourParameterLogistic autumn, FourParameterLogistic spring, int days, double tau, Turn turn, double toLt10,
                     double toLt90) implements StateModel {
    static final String WORD = "response";
    private static final int DEFAULT_DAYS = 10;
    private static final Quantity STEEPNESS = Quantity.of("1/K", -20, 20);
    private static final Quantity TEMPERATURE = Quantity.of("degC", -60, 60);
    private static final Quantity TAU = Quantity.of("days", 1, 30);
    private static final Quantity CHILLING = Quantity.of("degree-days below 10 degC", -10_000, 10_000);
    /** After so many time constants the beginning of an exponential mean has lost its weight: exp(-10) is 5e-5. */
    private static final int FADED = 10;

    /**
     * From the autumn to the spring limb.
     *
     * @param chilling degree-days where it begins and ends, positive; null when it goes by dates
     * @param since day from which they are counted; null for 7 September in the north, 7 March in the south
     * @param from first date of the turn; null when it goes by chilling
     * @param to date of the whole turn, not before from; the same as from for a turn in one night
     */
    public record Turn(List<Double> chilling, MonthDay since, MonthDay from, MonthDay to) implements Serializable {
    }

    @Override
    public String id() {
        return WORD;
    }

    @Override
    public String describe() {
        return "response to the " + (days > 0 ? "mean of " + days + " days" : "exponential mean of " + tau + " days") + ", autumn "
                + describe(autumn) + ", spring " + describe(spring) + ", spring from " + (turn.chilling() != null
                ? turn.chilling().get(0) + " to " + turn.chilling().get(1) + " degree-days below 10 degC since "
                + (turn.since() == null ? ThermalTimeModel.NORTHERN_START + " north, " + ThermalTimeModel.SOUTHERN_START + " south"
                : turn.since()) : turn.from() + (turn.from().equals(turn.to()) ? "" : " to " + turn.to()))
                + ", LT10 " + toLt10 + " K above and LT90 " + toLt90 + " K below LT50";
    }

    private static String describe(FourParameterLogistic limb) {
        return "tender limit " + limb.c() + " hardy limit " + limb.d() + " steepness " + limb.b() + " midpoint " + limb.e();
    }

    @Override
    public Optional<String> notCovering(SeasonWindow window) {
        return Optional.empty();
    }

    /** The day from which chilling is counted; where the limbs change by date, n days before the part that must be complete. */
    @Override
    public int firstDay(Season season) {
        return turn.chilling() == null ? season.completeFrom() - days : chillingDay(season);
    }

    /** As many days before the window as the mean of its first night reaches back. */
    @Override
    public int earliestDay(Season season) {
        return Math.min(0, firstDay(season)) - (days > 0 ? days : (int) Math.ceil(FADED * tau));
    }

    private int chillingDay(Season season) {
        return StartDay.position(season, turn.since(), ThermalTimeModel.NORTHERN_START, ThermalTimeModel.SOUTHERN_START);
    }

    @Override
    public HardinessTrajectory begin(Season season, double[] latitudes) {
        return new Trajectory(this, season, latitudes.length);
    }

    @Override
    public int bytesPerCell() {
        return days * Float.BYTES + 7 * Double.BYTES;
    }

    /** Reads the parameters of an entry; empty after problems. */
    static Optional<HardinessModel> read(ModelParameters entry) {
        int before = entry.problems();
        entry.symbols(Map.of("b", "steepness", "c", "tender-limit", "d", "hardy-limit", "e", "midpoint"));
        Optional<FourParameterLogistic> autumn = limb(entry, "autumn");
        Optional<FourParameterLogistic> spring = limb(entry, "spring");
        if (entry.has("mean-days") && entry.has("mean-tau")) {
            entry.problem("mean-tau", "mean-days and mean-tau are both given", "Keep the plain or the exponential mean");
        }
        Optional<Double> tau = entry.number("mean-tau", TAU);
        Optional<Integer> days = entry.whole("mean-days", 3, 30);
        Optional<Turn> turn = entry.requiredSection("spring-from",
                "Say when the spring limb takes over: {chilling: [600, 900]} in degree-days below 10 degC, or {date: 02-01}")
                .flatMap(ResponseModel::turn);
        Optional<Distances> distances = LethalReading.distances(entry);
        if (entry.problems() > before) {
            return Optional.empty();
        }
        Distances lt = distances.orElseThrow();
        return Optional.of(new ResponseModel(autumn.orElseThrow(), spring.orElseThrow(), tau.isPresent() ? 0 : days.orElse(DEFAULT_DAYS),
                tau.orElse(0.0), turn.orElseThrow(), lt.toLt10(), lt.toLt90()));
    }

    private static Optional<FourParameterLogistic> limb(ModelParameters entry, String key) {
        Optional<ModelParameters> part = entry.requiredSection(key,
                "Give the " + key + " limb: {tender-limit: -3, hardy-limit: -25, steepness: 0.55, midpoint: 6}");
        if (part.isEmpty()) {
            return Optional.empty();
        }
        ModelParameters limb = part.get();
        Optional<Double> tender = LethalReading.requiredLethal(limb, "tender-limit");
        Optional<Double> hardy = LethalReading.requiredLethal(limb, "hardy-limit");
        Optional<Double> steepness = limb.required("steepness", STEEPNESS);
        Optional<Double> midpoint = limb.required("midpoint", TEMPERATURE);
        LethalReading.hardyBelowTender(limb, hardy, tender);
        if (steepness.isPresent() && steepness.get() <= 0) {
            limb.problem("steepness", "the steepness " + steepness.get() + " must be above zero: cold weather hardens, warm weather does not",
                    "Write " + -steepness.get() + ", or exchange tender-limit and hardy-limit if they are meant the other way round");
        }
        return steepness.flatMap(b -> tender.flatMap(c -> hardy.flatMap(d -> midpoint.map(e -> new FourParameterLogistic(b, c, d, e)))));
    }

    private static Optional<Turn> turn(ModelParameters part) {
        Optional<List<Double>> chilling = part.numbers("chilling", 2, CHILLING);
        Optional<MonthDay> since = part.date("since");
        Optional<MonthDay> date = part.date("date");
        Optional<List<MonthDay>> dates = part.dates("dates");
        long ways = List.of("chilling", "date", "dates").stream().filter(part::has).count();
        if (ways != 1) {
            part.problem("", ways == 0 ? "neither chilling nor date nor dates is given" : "more than one of chilling, date and dates is given",
                    "Give one of them");
            return Optional.empty();
        }
        if (part.has("since") && !part.has("chilling")) {
            part.problem("since", "since belongs to chilling", "Remove it");
        }
        if (chilling.isPresent()) {
            // the sum of science 3.3 is negative; both ways of writing it mean the same
            double begin = Math.abs(chilling.get().get(0));
            double end = Math.abs(chilling.get().get(1));
            if (!(begin < end) || chilling.get().get(0) * chilling.get().get(1) < 0) {
                part.problem("chilling", "the chilling sums " + chilling.get() + " do not grow", "Give the smaller one first");
                return Optional.empty();
            }
            return Optional.of(new Turn(List.of(begin, end), since.orElse(null), null, null));
        }
        return date.map(day -> new Turn(null, null, day, day))
                .or(() -> dates.map(days -> new Turn(null, null, days.get(0), days.get(1))));
    }

    /** Ring of the last days' means and their sum, or the exponential mean; chilling. */
    static final class Trajectory implements HardinessTrajectory {
        private final ResponseModel model;
        private final int cells;
        private final int chillingDay;
        private final int turnFrom;
        private final int turnTo;
        private final float[][] ring;
        private final double[] sum;
        private final double[] chill;
        private final double[] mean;
        private final double[] weight;
        private final double[] autumn;
        private final double[] spring;
        private final double[] switched;
        private int taken;

        Trajectory(ResponseModel model, Season season, int cells) {
            this.model = model;
            this.cells = cells;
            boolean byDate = model.turn.chilling() == null;
            chillingDay = byDate ? 0 : model.chillingDay(season);
            turnFrom = byDate ? StartDay.position(season, model.turn.from()) : 0;
            turnTo = byDate ? StartDay.position(season, model.turn.to()) : 0;
            ring = new float[model.days][cells];
            sum = new double[cells];
            chill = new double[cells];
            mean = new double[cells];
            weight = new double[cells];
            autumn = new double[cells];
            spring = new double[cells];
            switched = new double[cells];
            Arrays.fill(switched, Double.POSITIVE_INFINITY);
        }

        @Override
        public void tolerance(int day, NightTolerance out) {
            Arrays.fill(out.toLt10(), 0, cells, (float) model.toLt10);
            Arrays.fill(out.toLt90(), 0, cells, (float) model.toLt90);
            if (taken < Math.max(1, model.days)) {
                Arrays.fill(out.lt50(), 0, cells, Float.NaN);
                return;
            }
            lt50(day);
            for (int i = 0; i < cells; i++) {
                out.lt50()[i] = (float) spring[i];
            }
        }

        /** LT50 of a night in double precision, {@code [cell]}; to be read before the next call. */
        double[] lt50(int day) {
            mean(sum, model.days > 0 ? model.days : 1, mean, cells);
            weights(day);
            if (all(weight, 0, cells)) {
                model.autumn.at(mean, spring, cells);
            } else if (all(weight, 1, cells)) {
                model.spring.at(mean, spring, cells);
            } else {
                model.autumn.at(mean, autumn, cells);
                model.spring.at(mean, spring, cells);
                blend(autumn, spring, weight, cells);
            }
            return spring;
        }

        private void weights(int day) {
            if (model.turn.chilling() != null) {
                double begin = model.turn.chilling().get(0);
                ramp(chill, -begin, begin - model.turn.chilling().get(1), weight, cells);
            } else {
                double share = turnFrom == turnTo ? day >= turnFrom ? 1 : 0 : (double) (day - turnFrom) / (turnTo - turnFrom);
                Arrays.fill(weight, 0, cells, Math.min(1, Math.max(0, share)));
            }
        }

        @Override
        public void advance(int day, float[] dayMean) {
            if (model.days > 0) {
                float[] oldest = ring[taken % model.days];
                replace(sum, oldest, dayMean, cells);
                System.arraycopy(dayMean, 0, oldest, 0, cells);
            } else if (taken == 0) {
                for (int i = 0; i < cells; i++) {
                    sum[i] = dayMean[i];
                }
            } else {
                approach(sum, dayMean, -Math.expm1(-1 / model.tau), cells);
            }
            taken++;
            if (model.turn.chilling() != null && day >= chillingDay) {
                chill(chill, dayMean, cells);
                noteSwitch(chill, -(model.turn.chilling().get(0) + model.turn.chilling().get(1)) / 2, day + 1, switched, cells);
            }
        }

        /** The first night in which the spring limb weighs at least half. */
        @Override
        public int phaseSwitch(int cell) {
            if (model.turn.chilling() == null) {
                return turnFrom + (turnTo - turnFrom + 1) / 2;
            }
            return switched[cell] < Integer.MAX_VALUE ? (int) switched[cell] : Integer.MAX_VALUE;
        }

        private static boolean all(double[] values, double value, int cells) {
            int i = 0;
            while (i < cells && values[i] == value) {
                i++;
            }
            return i == cells;
        }

        private static void mean(double[] sum, double count, double[] mean, int cells) {
            for (int i = 0; i < cells; i++) {
                mean[i] = sum[i] / count;
            }
        }

        private static void replace(double[] sum, float[] oldest, float[] newest, int cells) {
            for (int i = 0; i < cells; i++) {
                sum[i] += (double) newest[i] - oldest[i];
            }
        }

        private static void approach(double[] state, float[] mean, double share, int cells) {
            for (int i = 0; i < cells; i++) {
                state[i] += (mean[i] - state[i]) * share;
            }
        }

        private static void chill(double[] chill, float[] mean, int cells) {
            for (int i = 0; i < cells; i++) {
                chill[i] += Chilling.degreeDays(mean[i]);
            }
        }

        private static void ramp(double[] value, double begin, double length, double[] weight, int cells) {
            for (int i = 0; i < cells; i++) {
                weight[i] = Math.min(1, Math.max(0, (value[i] - begin) / length));
            }
        }

        private static void blend(double[] autumn, double[] spring, double[] weight, int cells) {
            for (int i = 0; i < cells; i++) {
                spring[i] = (1 - weight[i]) * autumn[i] + weight[i] * spring[i];
            }
        }

        private static void noteSwitch(double[] chill, double threshold, double night, double[] switched, int cells) {
            for (int i = 0; i < cells; i++) {
                switched[i] = chill[i] <= threshold ? Math.min(switched[i], night) : switched[i];
            }
        }
    }
}
