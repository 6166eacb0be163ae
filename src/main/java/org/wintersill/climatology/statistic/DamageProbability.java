package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.FrequencyBounds;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Probability that a winter kills at least a share of the buds: the frequency of such winters, or a bound of it
 * (science 6.1, 16.4, 16.5).
 */
public final class DamageProbability implements ClimatologyStatistic {

    /** The frequency itself or one of its bounds. */
    public enum Part {
        VALUE("", ""), LOWER("-lower", ", lower bound"), UPPER("-upper", ", upper bound");

        private final String suffix;
        private final String words;

        Part(String suffix, String words) {
            this.suffix = suffix;
            this.words = words;
        }
    }

    private final int percent;
    private final int level;
    private final Part part;
    private final FrequencyBounds bounds;

    /**
     * @param percent share of the buds
     * @param level position of that share among the record's levels
     */
    public DamageProbability(int percent, int level, Part part, FrequencyBounds bounds) {
        this.percent = percent;
        this.level = level;
        this.part = part;
        this.bounds = bounds;
    }

    /** Whether this is the frequency itself, not a bound, of the given level. */
    public boolean isFrequencyOf(int wantedLevel) {
        return part == Part.VALUE && level == wantedLevel;
    }

    @Override
    public LayerDefinition layer() {
        String about = part == Part.VALUE ? "" : " (" + bounds.words() + ")";
        return new LayerDefinition("damage-probability-" + percent + part.suffix,
                "Probability of " + percent + " % damage" + part.words,
                "Probability that a winter kills at least " + percent + " % of the buds" + part.words + about,
                "1", SampleType.FLOAT32, "", LayerStyles.probability());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        int[] counts = record.counts();
        double[] events = record.events(level);
        for (int cell = from; cell < to; cell++) {
            int n = counts[cell];
            double k = events[cell];
            out[cell] = n == 0 ? Float.NaN : (float) switch (part) {
                case VALUE -> k / n;
                case LOWER -> bounds.lower(k, n);
                case UPPER -> bounds.upper(k, n);
            };
        }
    }
}
