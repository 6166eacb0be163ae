package org.wintersill.climatology.statistic;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.FrequencyBounds;
import org.wintersill.climatology.FrequencyInterval;
import org.wintersill.damage.Uncertainty;
import org.wintersill.season.DamageReckoning;

/** The list of summary layers, in the order in which they are written and documented. */
public final class ClimatologyStatistics {

    /**
     * What the summaries need to know of a run.
     *
     * @param levels percent of buds of each level, 50 first
     * @param killing percent that makes a killing winter, one of the levels
     * @param interval kind of bounds
     * @param confidence level of the bounds, 0..1
     * @param targets shares of killing winters, or expected damages, that are accepted; the first decides
     * @param rule how required hardiness is found
     * @param extremes fits, replicates and trends
     * @param classes three limits of the frequency of killing winters, ascending
     * @param years year in which each winter of the run ends, ascending; never empty
     * @param reckoning how damage is reckoned and what of it is kept
     */
    public record Choices(int[] levels, int killing, FrequencyInterval interval, double confidence, double[] targets,
                          HardinessRule rule, ExtremeChoices extremes, double[] classes, int[] years, DamageReckoning reckoning) {

        /** The share that decides. */
        public double target() {
            return targets[0];
        }

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

    /** Layers of one cultivar, those that must be asked for included. */
    public static List<ClimatologyStatistic> ofCultivar(Choices choices) {
        FrequencyBounds bounds = new FrequencyBounds(choices.interval(), choices.years().length, choices.confidence());
        int killing = choices.killingLevel();
        List<ClimatologyStatistic> list = new ArrayList<>();
        list.add(new MarginMean());
        list.add(new MarginLow());
        list.add(new MarginWorst());
        list.add(new WorstWinter(choices.years()[0], choices.years()[choices.years().length - 1]));
        list.add(new DamageMean(damageWords(choices.reckoning())));
        for (int level = 0; level < choices.levels().length; level++) {
            for (DamageProbability.Part part : DamageProbability.Part.values()) {
                list.add(new DamageProbability(choices.levels()[level], level, part, bounds));
            }
        }
        list.add(new KillingWinterReturn(choices.killing(), killing, false, bounds));
        list.add(new KillingWinterReturn(choices.killing(), killing, true, bounds));
        for (int i = 0; i < choices.targets().length; i++) {
            double target = choices.targets()[i];
            list.add(new RequiredHardiness(i == 0 ? "required-hardiness" : RequiredHardiness.idAt(target), choices.rule(), killing,
                    choices.levels(), target));
        }
        list.add(new Suitability(killing, choices.classes()));
        for (PhaseShare.Phase phase : choices.reckoning().phases() ? PhaseShare.Phase.values() : new PhaseShare.Phase[0]) {
            list.add(new PhaseShare(phase));
        }
        list.addAll(new RequestedStatistics(choices).ofCultivar());
        return list;
    }

    /**
     * Further layers of a cultivar that stands for a population. The share of it that is killed is that of the worst night, and not made
     * where nights are joined otherwise.
     */
    public static List<ClimatologyStatistic> ofPopulation(Choices choices, Population population) {
        List<ClimatologyStatistic> list = new ArrayList<>();
        Uncertainty uncertainty = choices.reckoning().uncertainty();
        for (int level = 0; choices.reckoning().nights().isWorst() && level < choices.levels().length; level++) {
            list.add(new PopulationDamageProbability(choices.levels()[level], level, population, uncertainty.sd()));
        }
        list.addAll(VarianceShare.all(uncertainty.components(), population.sd()));
        list.add(new HardierGain(population));
        return list;
    }

    private static String damageWords(DamageReckoning reckoning) {
        String nights = switch (reckoning.nights().rule()) {
            case WORST -> "the damage of the worst night";
            case INDEPENDENT -> "the damage of all nights, taken as independent";
            case CORRELATED -> "the damage of all nights, correlated by " + reckoning.nights().correlation();
        };
        return nights + (reckoning.keepsExpected() ? String.format(Locale.ROOT, ", with an uncertainty of the margin of %.3g K",
                reckoning.uncertainty().sd()) : "");
    }

    /** Layers that belong to no cultivar; likewise. */
    public static List<ClimatologyStatistic> shared(Choices choices) {
        List<ClimatologyStatistic> list = new ArrayList<>(List.of(new ValidWinters(choices.years().length), new MeanMinimum()));
        list.addAll(new RequestedStatistics(choices).shared());
        return list;
    }
}
