package org.wintersill.hardiness.model;

import java.util.Optional;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.StateModel;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * A model with budbreak, followed by bud stages: from the night after the day of budbreak the tolerance is that of the stages (science
 * 3.1 and 1.5). Stages by thermal time count their degree-days from the day after budbreak on; stages by date are read at the night's
 * date.
 *
 * @param before the model up to budbreak
 * @param stages {@link StageDegreeDays} or {@link StageDates}, with a value on every night
 */
public record StageAfterBudbreak(StateModel before, HardinessModel stages) implements StateModel {
    /** degC; adds no degree-day to any base. */
    private static final float NO_GROWTH = -1000;

    @Override
    public String id() {
        return before.id();
    }

    @Override
    public String describe() {
        return before.describe() + "; after budbreak "
                + (stages instanceof StageDegreeDays timed ? timed.describeStages() + " since budbreak" : stages.describe());
    }

    @Override
    public Optional<String> notCovering(SeasonWindow window) {
        return before.notCovering(window);
    }

    @Override
    public boolean knowsPhases() {
        return before.knowsPhases();
    }

    @Override
    public int firstDay(Season season) {
        return before.firstDay(season);
    }

    @Override
    public int earliestDay(Season season) {
        return before.earliestDay(season);
    }

    @Override
    public HardinessTrajectory begin(Season season, double[] latitudes) {
        return new Trajectory(before.begin(season, latitudes), stages instanceof CalendarModel dated ? dated.overSeason(season) : null,
                stages instanceof StageDegreeDays timed ? timed.beginAfter(latitudes.length) : null, latitudes.length);
    }

    @Override
    public int bytesPerCell() {
        return before.bytesPerCell() + (stages instanceof StateModel timed ? timed.bytesPerCell() : 0) + 4 * Float.BYTES;
    }

    /** Both states; the stages stand still until budbreak. */
    private static final class Trajectory implements HardinessTrajectory {
        private final HardinessTrajectory before;
        private final LethalTemperatures dated;
        private final HardinessTrajectory timed;
        private final NightTolerance later;
        private final float[] growth;
        /** {@code [cell]}: whether budbreak has come by the end of the last day that was taken. */
        private final boolean[] open;
        private boolean anyOpen;

        Trajectory(HardinessTrajectory before, LethalTemperatures dated, HardinessTrajectory timed, int cells) {
            this.before = before;
            this.dated = dated;
            this.timed = timed;
            later = NightTolerance.of(cells);
            growth = new float[cells];
            open = new boolean[cells];
        }

        @Override
        public void tolerance(int day, NightTolerance out) {
            before.tolerance(day, out);
            if (!anyOpen) {
                return;
            }
            if (timed != null) {
                timed.tolerance(day, later);
            }
            for (int i = 0; i < open.length; i++) {
                if (open[i] && !Float.isNaN(out.lt50()[i])) {
                    replace(day, out, i);
                }
            }
        }

        private void replace(int day, NightTolerance out, int cell) {
            if (timed != null) {
                out.lt50()[cell] = later.lt50()[cell];
                out.toLt10()[cell] = later.toLt10()[cell];
                out.toLt90()[cell] = later.toLt90()[cell];
            } else {
                out.lt50()[cell] = (float) dated.lt50()[day];
                out.toLt10()[cell] = (float) (dated.lt10()[day] - dated.lt50()[day]);
                out.toLt90()[cell] = (float) (dated.lt50()[day] - dated.lt90()[day]);
            }
        }

        @Override
        public void advance(int day, float[] mean) {
            if (timed != null && anyOpen) {
                for (int i = 0; i < growth.length; i++) {
                    growth[i] = open[i] ? mean[i] : NO_GROWTH;
                }
                timed.advance(day, growth);
            }
            before.advance(day, mean);
            for (int i = 0; i < open.length; i++) {
                open[i] = before.budbreak(i) <= day;
                anyOpen |= open[i];
            }
        }

        @Override
        public int phaseSwitch(int cell) {
            return before.phaseSwitch(cell);
        }

        @Override
        public int budbreak(int cell) {
            return before.budbreak(cell);
        }
    }
}
