package org.wintersill.climatology.statistic;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.FrequencyInterval;

/** The list of summary layers, in the order in which they are written and documented. */
public final class ClimatologyStatistics {

    /**
     * What the summaries need to know of a run.
     *
     * @param levels percent of buds of each level, 50 first
     * @param killing percent that makes a killing winter, one of the levels
     * @param interval kind of bounds
     * @param confidence level of the bounds, 0..1
     * @param target share of killing winters that is accepted
     * @param classes three limits of the frequency of killing winters, ascending
     * @param years year in which each winter of the run ends, ascending; never empty
     */
    public record Choices(int[] levels, int killing, FrequencyInterval interval, double confidence, double target,
                          double[] classes, int[] years) {

        /** Position of the killing level. */
        public int killingLevel() {
            for (int i = 0; i < levels.length; i++) {
                if (levels[i] == killing) {
                    return i;
                }
            }
            throw new IllegalArgumentException(killing + " is not among the levels");
        }
    }

    private ClimatologyStatistics() {
    }

    /** Layers of one cultivar. */
    public static List<ClimatologyStatistic> ofCultivar(Choices choices) {
        double[][][] bounds = choices.interval().table(choices.years().length, choices.confidence());
        String words = (choices.interval() == FrequencyInterval.JEFFREYS ? "Jeffreys" : "Wilson") + ", "
                + Math.round(choices.confidence() * 1000) / 10.0 + " % two-sided";
        int killing = choices.killingLevel();
        List<ClimatologyStatistic> list = new ArrayList<>();
        list.add(new MarginMean());
        list.add(new MarginLow());
        list.add(new MarginWorst());
        list.add(new WorstWinter(choices.years()[0], choices.years()[choices.years().length - 1]));
        list.add(new DamageMean());
        for (int level = 0; level < choices.levels().length; level++) {
            for (DamageProbability.Part part : DamageProbability.Part.values()) {
                list.add(new DamageProbability(choices.levels()[level], level, part, bounds, words));
            }
        }
        list.add(new KillingWinterReturn(choices.killing(), killing, false, bounds, words));
        list.add(new KillingWinterReturn(choices.killing(), killing, true, bounds, words));
        list.add(new RequiredHardiness(killing, choices.target()));
        list.add(new Suitability(killing, choices.classes()));
        return list;
    }

    /** Layers that belong to no cultivar. */
    public static List<ClimatologyStatistic> shared(Choices choices) {
        return List.of(new ValidWinters(choices.years().length), new MeanMinimum());
    }
}
