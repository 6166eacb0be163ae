package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Probability that a winter kills at least a share of the buds of a variant taken at random from the population: mean over winters and
 * variants, of a normal population with sqrt(sm^2 + sd^2) in place of the uncertainty sm of the margin (science 5 and 16.4).
 */
public final class PopulationDamageProbability implements ClimatologyStatistic {
    private final int percent;
    private final int level;
    private final Population population;
    private final double uncertain;

    /**
     * @param percent share of the buds
     * @param level position of that share among the record's levels
     * @param uncertain standard deviation of the uncertainty of the margin, K
     */
    public PopulationDamageProbability(int percent, int level, Population population, double uncertain) {
        this.percent = percent;
        this.level = level;
        this.population = population;
        this.uncertain = uncertain;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("population-damage-probability-" + percent, "Probability of " + percent + " % damage in the population",
                "Probability that a winter kills at least " + percent + " % of the buds of a variant, over winters and variants", "1",
                SampleType.FLOAT32, "", LayerStyles.probability());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        for (int cell = from; cell < to; cell++) {
            double sum = 0;
            int n = 0;
            for (float[] winter : record.margins(level)) {
                float margin = winter[cell];
                if (margin == margin) {
                    sum += population.shareNotAbove(margin, uncertain);
                    n++;
                }
            }
            out[cell] = n == 0 ? Float.NaN : (float) (sum / n);
        }
    }
}
