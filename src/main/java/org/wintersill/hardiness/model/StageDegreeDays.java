package org.wintersill.hardiness.model;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.StateModel;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Critical temperatures by bud stage at given thermal times: LT10, LT50 and LT90 are linear between the stages (science 1.5) in the
 * growing degree-days {@code G = sum of max(0, Tm - base)} up to the day before the night. After the last stage its values hold; before
 * the first there are none, unless it is told to hold. Both are project choices.
 *
 * @param base degC
 * @param from day from which degree-days are counted; null for 1 January in the north, 1 July in the south (project choice)
 * @param stages at least one
 * @param at degree-days of each stage, ascending
 * @param holdBefore whether the first stage holds before its time
 */
public record StageDegreeDays(double base, MonthDay from, List<Stage> stages, List<Double> at, boolean holdBefore) implements StateModel {
    static final MonthDay NORTHERN_START = new MonthDay(1, 1);
    static final MonthDay SOUTHERN_START = new MonthDay(7, 1);

    public StageDegreeDays {
        stages = List.copyOf(stages);
        at = List.copyOf(at);
    }

    @Override
    public String id() {
        return StageReader.WORD;
    }

    @Override
    public String describe() {
        return describeStages() + " since " + (from == null ? NORTHERN_START + " north, " + SOUTHERN_START + " south" : from)
                + (holdBefore ? ", the first held before" : ", nothing before the first");
    }

    /** The same without what is counted from when. */
    String describeStages() {
        return stages.size() + " bud stages from " + stages.get(0).name() + " at " + at.get(0) + " to "
                + stages.get(stages.size() - 1).name() + " at " + at.get(at.size() - 1) + " degree-days above " + base + " degC";
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
        return StartDay.position(season, from, NORTHERN_START, SOUTHERN_START);
    }

    /** The window's first day where the first stage holds before its time. */
    @Override
    public int earliestDay(Season season) {
        return holdBefore ? Math.min(0, firstDay(season)) : firstDay(season);
    }

    @Override
    public HardinessTrajectory begin(Season season, double[] latitudes) {
        return new Trajectory(this, firstDay(season), latitudes.length);
    }

    @Override
    public int bytesPerCell() {
        return 4 * Double.BYTES;
    }

    /** Stages that wait for another model: every day that is taken counts. */
    HardinessTrajectory beginAfter(int cells) {
        return new Trajectory(this, Integer.MIN_VALUE, cells);
    }

    /** Degree-days of every cell, and the stages as sums of clamped steps, which are vector code. */
    static final class Trajectory implements HardinessTrajectory {
        private final StageDegreeDays model;
        private final int firstDay;
        private final int cells;
        private final double[] degreeDays;
        private final double[][] courses;

        Trajectory(StageDegreeDays model, int firstDay, int cells) {
            this.model = model;
            this.firstDay = firstDay;
            this.cells = cells;
            degreeDays = new double[cells];
            courses = new double[3][cells];
        }

        /** Growing degree-days so far. */
        double degreeDays(int cell) {
            return degreeDays[cell];
        }

        @Override
        public void tolerance(int day, NightTolerance out) {
            Stage first = model.stages.get(0);
            Arrays.fill(courses[0], 0, cells, first.lt10());
            Arrays.fill(courses[1], 0, cells, first.lt50());
            Arrays.fill(courses[2], 0, cells, first.lt90());
            for (int k = 1; k < model.stages.size(); k++) {
                Stage a = model.stages.get(k - 1);
                Stage b = model.stages.get(k);
                double begin = model.at.get(k - 1);
                double length = model.at.get(k) - begin;
                step(degreeDays, begin, length, (b.lt10() - a.lt10()) / length, courses[0], cells);
                step(degreeDays, begin, length, (b.lt50() - a.lt50()) / length, courses[1], cells);
                step(degreeDays, begin, length, (b.lt90() - a.lt90()) / length, courses[2], cells);
            }
            double begin = model.holdBefore ? Double.NEGATIVE_INFINITY : model.at.get(0);
            distances(courses[0], courses[1], courses[2], out.toLt10(), out.toLt90(), cells);
            lt50(courses[1], degreeDays, begin, out.lt50(), cells);
        }

        @Override
        public void advance(int day, float[] mean) {
            if (day >= firstDay) {
                add(mean, model.base, degreeDays, cells);
            }
        }

        @Override
        public int phaseSwitch(int cell) {
            return Integer.MAX_VALUE;
        }

        private static void add(float[] mean, double base, double[] degreeDays, int cells) {
            for (int i = 0; i < cells; i++) {
                degreeDays[i] += Math.max(0, mean[i] - base);
            }
        }

        private static void step(double[] degreeDays, double begin, double length, double slope, double[] course, int cells) {
            for (int i = 0; i < cells; i++) {
                course[i] += slope * Math.min(length, Math.max(0, degreeDays[i] - begin));
            }
        }

        private static void distances(double[] lt10, double[] lt50, double[] lt90, float[] toLt10, float[] toLt90, int cells) {
            for (int i = 0; i < cells; i++) {
                toLt10[i] = (float) (lt10[i] - lt50[i]);
                toLt90[i] = (float) (lt50[i] - lt90[i]);
            }
        }

        private static void lt50(double[] course, double[] degreeDays, double begin, float[] lt50, int cells) {
            for (int i = 0; i < cells; i++) {
                lt50[i] = degreeDays[i] < begin ? Float.NaN : (float) course[i];
            }
        }
    }
}
