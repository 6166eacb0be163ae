package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.RankTrend;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Where the trend by ranks may be called significant when all cells of the map are tested at once (Benjamini and Hochberg). A cell
 * cannot know by itself: {@link #summarise} gives its p-value with the sign of the trend, and {@link #classOf} its class once the
 * threshold of the whole map is known.
 */
public final class TrendSignificance implements ClimatologyStatistic {
    /** Classes by {@link LayerStyles#trendSignificance()}. */
    private static final int COLDER = 1;
    private static final int UNCLEAR = 2;
    private static final int MILDER = 3;

    private final WinterField field;
    private final double falseDiscovery;

    TrendSignificance(WinterField field, double falseDiscovery) {
        this.field = field;
        this.falseDiscovery = falseDiscovery;
    }

    /** Accepted share of false calls. */
    public double falseDiscovery() {
        return falseDiscovery;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("trend-" + field.id() + "-significant", "Significant trends",
                "Whether the winters grow colder or milder beyond chance (Mann-Kendall of the "
                        + field.words() + "), with a share of false calls of at most " + falseDiscovery + " over the map (Benjamini-Hochberg)", "1", SampleType.BYTE, "", LayerStyles.trendSignificance());
    }

    @Override
    public LayerGroup group() {
        return LayerGroup.TRENDS;
    }

    /** Gives the p-value, negative where winters grow colder; never zero. */
    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        RankTrend[] trends = TrendLayer.ranks(record, field);
        for (int cell = from; cell < to; cell++) {
            RankTrend trend = trends[cell];
            out[cell] = trend == null ? Float.NaN
                    : Math.copySign(Math.max(Float.MIN_NORMAL, (float) trend.pValue()), trend.s() < 0 ? -1f : 1f);
        }
    }

    /**
     * The class of a cell.
     *
     * @param signed what {@link #summarise} gave
     * @param threshold largest p-value that is significant; 0 where none is
     */
    public static float classOf(float signed, double threshold) {
        if (signed != signed) {
            return Float.NaN;
        }
        return Math.abs(signed) > threshold ? UNCLEAR : signed < 0 ? COLDER : MILDER;
    }
}
