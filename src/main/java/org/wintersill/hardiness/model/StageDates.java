package org.wintersill.hardiness.model;

import java.util.Arrays;
import java.util.Optional;
import org.wintersill.hardiness.CalendarModel;
import org.wintersill.hardiness.LethalTemperatures;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Critical temperatures by bud stage at given dates: LT10, LT50 and LT90 linear in time between the dates of the stages (science 1.5). After
 * the last stage its values hold; before the first there are none, since a table of spring stages says nothing about a
 * dormant bud, unless it is told to hold. Both are project choices.
 *
 * @param curve the stages as rows
 * @param holdBefore whether the first stage holds before its date
 */
public record StageDates(DatedHardinessCurve curve, boolean holdBefore) implements CalendarModel {

    @Override
    public String id() {
        return StageReader.WORD;
    }

    @Override
    public String describe() {
        return "bud stages at " + curve.rows().size() + " dates from " + curve.rows().get(0).date() + " to "
                + curve.rows().get(curve.rows().size() - 1).date() + (holdBefore ? ", the first held before" : ", nothing before the first");
    }

    @Override
    public LethalTemperatures overSeason(Season season) {
        LethalTemperatures held = new DatedHardinessCurve(curve.rows(), true).overSeason(season);
        if (!holdBefore) {
            double[] between = curve.overSeason(season).lt50();
            int silent = 0;
            while (silent < between.length && Double.isNaN(between[silent])) {
                silent++;
            }
            Arrays.fill(held.lt10(), 0, silent, Double.NaN);
            Arrays.fill(held.lt50(), 0, silent, Double.NaN);
            Arrays.fill(held.lt90(), 0, silent, Double.NaN);
        }
        return held;
    }

    @Override
    public Optional<String> notCovering(SeasonWindow window) {
        return curve.rows().stream().anyMatch(row -> window.contains(row.date())) ? Optional.empty()
                : Optional.of("none of its stages lies in the winter");
    }
}
