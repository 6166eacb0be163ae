package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.StateModel;
import org.wintersill.run.RunPlan.DroppedWinter;
import org.wintersill.season.CompletenessTally;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.time.DayAxis;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * The winters of a record that can count anywhere: those whose absent days, which are absent in every cell, do not fail the
 * completeness rule already.
 *
 * @param used in the order of time
 * @param dropped with the reason
 */
record WinterSelection(List<Season> used, List<DroppedWinter> dropped) {

    static WinterSelection of(DayAxis axis, SeasonWindow window, MissingDayPolicy policy) {
        List<Season> used = new ArrayList<>();
        List<DroppedWinter> dropped = new ArrayList<>();
        for (Season season : window.seasons(axis)) {
            CompletenessTally tally = new CompletenessTally(season, policy, 1);
            float[] present = {0};
            int absent = 0;
            for (int night = 0; night < season.days(); night++) {
                if (axis.indexOf(season.firstDay() + night) >= 0) {
                    tally.accept(night, present, 0, 0, 1);
                } else {
                    tally.absent(night, 0, 1);
                    absent += night >= season.completeFrom() && night <= season.completeTo() ? 1 : 0;
                }
            }
            if (tally.isComplete(0)) {
                used.add(season);
            } else {
                dropped.add(new DroppedWinter(season.label(), absent + " of " + (season.completeTo() - season.completeFrom() + 1)
                        + " days between " + season.date(season.completeFrom()) + " and " + season.date(season.completeTo())
                        + " are absent: a month fails the rule " + policy.key()));
            }
        }
        return new WinterSelection(List.copyOf(used), List.copyOf(dropped));
    }

    /**
     * Without the winters for which the daily mean is not known from the day on that a state model begins with: they are left out for
     * all cultivars, so that every cultivar is judged by the same winters.
     *
     * @param known first day whose mean is known
     */
    WinterSelection withMeansFrom(long known, List<Cultivar> cultivars) {
        List<Season> kept = new ArrayList<>();
        List<DroppedWinter> all = new ArrayList<>(dropped);
        for (Season season : used) {
            Optional<Cultivar> early = cultivars.stream().filter(cultivar -> cultivar.model() instanceof StateModel model
                    && season.firstDay() + model.firstDay(season) < known).findFirst();
            if (early.isEmpty()) {
                kept.add(season);
            } else {
                all.add(new DroppedWinter(season.label(), "cultivar " + early.get().id() + " begins on "
                        + season.date(((StateModel) early.get().model()).firstDay(season)) + ", and the daily mean is only known from "
                        + season.calendar().date(known) + " on"));
            }
        }
        return new WinterSelection(List.copyOf(kept), List.copyOf(all));
    }
}
