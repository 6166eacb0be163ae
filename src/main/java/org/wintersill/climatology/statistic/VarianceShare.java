package org.wintersill.climatology.statistic;

import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.VarianceParts;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Share of the variance of the winter margin that is due to winters, cultivars, their interaction, or a component of the uncertainty
 * (science 16.11): part / sum of all. Missing with fewer than two winters.
 *
 * <p>As a statistic it is that of one cultivar with variants: they differ by the same amount in every winter, so the part of the
 * cultivars is the variance of their offsets and there is no interaction.
 */
public final class VarianceShare implements ClimatologyStatistic {
    private static final int FEWEST_WINTERS = 2;
    private static final List<String> RECKONED = List.of("winter", "cultivar", "interaction");

    private final String part;
    private final SortedMap<String, Double> components;
    private final double variantSd;

    private VarianceShare(String part, SortedMap<String, Double> components, double variantSd) {
        this.part = part;
        this.components = components;
        this.variantSd = variantSd;
    }

    /**
     * One statistic a part.
     *
     * @param components standard deviations of the uncertainty, K
     * @param variantSd standard deviation of the variants' offsets, K
     */
    public static List<VarianceShare> all(SortedMap<String, Double> components, double variantSd) {
        List<String> parts = new ArrayList<>(RECKONED);
        parts.addAll(components.keySet());
        return parts.stream().map(part -> new VarianceShare(part, components, variantSd)).toList();
    }

    @Override
    public LayerDefinition layer() {
        boolean given = !RECKONED.contains(part);
        String whose = part.equals("winter") ? "differences between winters" : part.equals("cultivar")
                ? "differences between cultivars or variants" : given ? "the uncertainty of the " + part
                : "cultivars that do not differ alike in all winters";
        return new LayerDefinition("variance-" + part, "Share of the variance due to " + (given ? "uncertainty: " : "") + part,
                "Share of the variance of the winter margin that is due to " + whose, "1", SampleType.FLOAT32, "", LayerStyles.share());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        double[][] margins = new double[1][record.winters()];
        for (int cell = from; cell < to; cell++) {
            int n = WinterRecord.valid(record.margins(0), cell, margins[0]);
            out[cell] = n < FEWEST_WINTERS ? Float.NaN
                    : share(new VarianceParts(VarianceParts.of(margins, n).winter(), variantSd * variantSd, 0));
        }
    }

    /**
     * The share at a place.
     *
     * @param margins {@code [cultivar][winter]}, K; only the first {@code winters} count
     */
    public float share(double[][] margins, int winters) {
        return winters < FEWEST_WINTERS ? Float.NaN : share(VarianceParts.of(margins, winters));
    }

    private float share(VarianceParts parts) {
        double all = parts.winter() + parts.cultivar() + parts.interaction();
        for (double sd : components.values()) {
            all += sd * sd;
        }
        double mine = switch (part) {
            case "winter" -> parts.winter();
            case "cultivar" -> parts.cultivar();
            case "interaction" -> parts.interaction();
            default -> components.get(part) * components.get(part);
        };
        return all == 0 ? Float.NaN : (float) (mine / all);
    }
}
