package org.wintersill.season;

import java.util.Arrays;
import java.util.List;
import java.util.function.IntPredicate;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.StateModel;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * The cultivars with state models in a lane of cells through one winter: days in, the same winter values out that
 * {@link WinterLane} gives for cultivars whose curve depends on the date alone.
 *
 * <p>For each day: {@code minima(day)} and {@code means(day)} are filled, then {@link #accept} is called, or {@link #absent}. Days
 * come one after the other from {@link #firstDay} on. A day is worked on {@link #LONGEST_GAP} days later, when it is known
 * whether a missing mean can be filled. A lane belongs to one worker at a time.
 */
public final class StateLane {
    /** Missing daily means in a row that are filled. */
    public static final int LONGEST_GAP = MeanRing.LONGEST_GAP;

    private final List<StateCultivar> cultivars;
    private final DamageReckoning reckoning;
    private final int cells;
    private final MeanRing ring;
    private final NightTolerance tolerance;
    private final float[] room;
    private final StateAccumulator[] values;
    private final HardinessTrajectory[] states;
    private final int[] firstDays;
    /** {@code [cultivar][cell]}: whether the state is lost since a long gap. */
    private final boolean[][] broken;
    private final boolean[] anyBroken;
    private final Witness witness;
    private Season season;
    private int earliest;
    private int latest;

    /** Sees every night of every cultivar as the fold does, for explanations. Arrays are those of the fold: not to be changed or kept. */
    public interface Witness {
        /**
         * One night, before its mean changes the state.
         *
         * @param cultivar position in the list of the lane's cultivars
         * @param night position in the window, not negative
         * @param tolerance of the night; NaN where the model says nothing
         * @param mean daily mean of the date as the model is told it; NaN for missing
         * @param state of the cultivar at the end of the day before
         */
        void night(int cultivar, int night, NightTolerance tolerance, float[] mean, HardinessTrajectory state);
    }

    public StateLane(List<StateCultivar> cultivars, DamageReckoning reckoning, int cells) {
        this(cultivars, reckoning, cells, null);
    }

    /** @param witness told of every night; null for none */
    public StateLane(List<StateCultivar> cultivars, DamageReckoning reckoning, int cells, Witness witness) {
        this.cultivars = List.copyOf(cultivars);
        this.reckoning = reckoning;
        this.cells = cells;
        this.witness = witness;
        ring = new MeanRing(cells);
        tolerance = NightTolerance.of(cells);
        room = new float[cells];
        values = new StateAccumulator[cultivars.size()];
        for (int c = 0; c < values.length; c++) {
            values[c] = new StateAccumulator(cultivars.get(c), reckoning, cells);
        }
        states = new HardinessTrajectory[values.length];
        firstDays = new int[values.length];
        broken = new boolean[values.length][cells];
        anyBroken = new boolean[values.length];
    }

    public int cells() {
        return cells;
    }

    /** Bytes that a lane takes for each of its cells. */
    public static long bytesPerCell(List<StateCultivar> cultivars, DamageReckoning reckoning) {
        long bytes = MeanRing.bytesPerCell() + 4L * Float.BYTES + Double.BYTES;
        for (StateCultivar cultivar : cultivars) {
            bytes += StateAccumulator.bytesPerCell(cultivar.levels().length, reckoning) + Float.BYTES + 1 + cultivar.model().bytesPerCell();
        }
        return bytes;
    }

    /**
     * First day that a model is told of in a winter: its own first day, or one of the days before that it can use, as far as the
     * record reaches back after the winter before without a gap too long to be filled.
     *
     * @param window of the winters
     * @param isKnown whether the record has a mean on a day, by position in the season's window
     */
    public static int firstTold(StateModel model, Season season, SeasonWindow window, IntPredicate isKnown) {
        int first = model.firstDay(season);
        Season before = window.beginningIn(season.first().year() - 1, season.calendar());
        int bound = Math.max(model.earliestDay(season), (int) (before.firstDay() + before.days() - season.firstDay()));
        int absent = 0;
        while (absent <= LONGEST_GAP && !isKnown.test(first + absent)) {
            absent++;
        }
        int start = first;
        for (int day = first - 1; day >= bound && absent <= LONGEST_GAP; day--) {
            if (isKnown.test(day)) {
                start = day;
                absent = 0;
            } else {
                absent++;
            }
        }
        return start;
    }

    /**
     * Makes ready for a winter.
     *
     * @param first {@code [cultivar]}, first day whose mean the model is told, as a position in the window
     * @param latitudes {@code [cell]}, degrees north
     */
    public void begin(Season winter, int[] first, double[] latitudes) {
        season = winter;
        earliest = Math.min(0, Arrays.stream(first).min().orElse(0));
        latest = earliest - 1;
        Phases phases = Phases.of(winter, reckoning.south());
        for (int c = 0; c < values.length; c++) {
            firstDays[c] = first[c];
            states[c] = cultivars.get(c).model().begin(winter, latitudes);
            values[c].begin(phases);
            Arrays.fill(broken[c], false);
            anyBroken[c] = false;
        }
    }

    /** First day that is wanted, as a position in the window; not positive. */
    public int firstDay() {
        return earliest;
    }

    /** Day after the last one that was given. */
    public int nextDay() {
        return latest + 1;
    }

    /** Room for the minima of the next day: degrees Celsius, positive infinity for missing. */
    public float[] minima() {
        return ring.minima(latest + 1);
    }

    /** Room for the means of the next day. */
    public float[] means() {
        return ring.means(latest + 1);
    }

    /** The room for the next day was filled. */
    public void accept() {
        latest++;
        ring.complete(latest);
        follow(latest - LONGEST_GAP);
    }

    /** The next day has no record. */
    public void absent() {
        latest++;
        ring.absent(latest);
        follow(latest - LONGEST_GAP);
    }

    private void follow(int day) {
        if (day < earliest || day >= season.days()) {
            return;
        }
        for (int c = 0; c < states.length; c++) {
            if (day < firstDays[c]) {
                continue;
            }
            float[] mean = ring.filled(day, firstDays[c], season.days() - 1, room);
            if (day >= 0) {
                states[c].tolerance(day, tolerance);
                if (witness != null) {
                    witness.night(c, day, tolerance, mean, states[c]);
                }
                values[c].closePhases(day, states[c]);
                values[c].accept(day, ring.minima(day), tolerance, anyBroken[c] ? broken[c] : null);
            }
            states[c].advance(day, mean);
            if (mean == room) {
                noteLongGaps(c);
            }
        }
    }

    private void noteLongGaps(int cultivar) {
        for (int i = 0; i < cells; i++) {
            if (room[i] != room[i]) {
                broken[cultivar][i] = true;
                anyBroken[cultivar] = true;
            }
        }
    }

    /**
     * Ends the winter.
     *
     * @param counts whether the winter is complete enough at a cell of the lane
     * @param out takes the values of the lane's cultivars; NaN where the winter does not count
     */
    public void finish(IntPredicate counts, WinterValues out) {
        while (latest < season.days() - 1 + LONGEST_GAP) {
            absent();
        }
        boolean[] valid = new boolean[cells];
        for (int i = 0; i < cells; i++) {
            valid[i] = counts.test(i);
        }
        for (StateAccumulator cultivar : values) {
            cultivar.finish(valid, out);
        }
        Arrays.fill(states, null);
    }
}
