package org.wintersill.run;

import java.util.List;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** The layers that a comparison writes. */
final class ChangeLayers {
    /** Layers of which an ensemble is summarised. */
    static final List<LayerDefinition> OF_MEMBERS = List.of(marginChange(), damageChange(), frequencyChange(), toleranceShift());

    private ChangeLayers() {
    }

    private static LayerDefinition real(String id, String title, String description, String unit, LayerStyle style) {
        return new LayerDefinition(id, title, description, unit, SampleType.FLOAT32, "", style);
    }

    static LayerDefinition marginChange() {
        return real("margin-change", "Change of the mean margin", "Mean of the winters' lowest margins, other minus base; positive is safer", "K",
                LayerStyles.marginChange());
    }

    static LayerDefinition damageChange() {
        return real("damage-change", "Change of the expected damage", "Expected fraction of buds killed in a winter, other minus base", "1",
                LayerStyles.shareChange());
    }

    static LayerDefinition frequencyChange() {
        return real("killing-frequency-change", "Change of killing winters", "Frequency of killing winters, other minus base", "1",
                LayerStyles.shareChange());
    }

    static LayerDefinition toleranceShift() {
        return real("tolerance-shift", "Tolerance shift", "Hardiness required in the other period minus that of the base; negative: the "
                + "cultivar may be so much more tender", "K", LayerStyles.requiredHardiness());
    }

    static LayerDefinition requiredHardiness() {
        return real("required-hardiness", "Required hardiness now and then", "How much hardier the curve must be to meet the target; negative "
                + "is hardiness to spare. Band 1 base, band 2 other", "K", LayerStyles.requiredHardiness());
    }

    static LayerDefinition significance(double share) {
        return new LayerDefinition("killing-frequency-significance", "Killing winters beyond chance", "Whether killing winters became fewer or "
                + "more beyond chance: Fisher's exact test, with a share of false discoveries over the map of at most " + share, "1",
                SampleType.BYTE, "", LayerStyles.frequencySignificance());
    }

    static LayerDefinition rangeChange(double target) {
        return new LayerDefinition("range-change", "Range", "Whether killing winters are at most as frequent as " + target
                + ", before and after", "1", SampleType.BYTE, "", LayerStyles.rangeChange());
    }

    /** A summary over the members of a layer. */
    static LayerDefinition ofMembers(LayerDefinition layer, String suffix, String words) {
        return real(layer.id() + "-" + suffix, layer.title() + ", " + words, layer.description() + "; " + words + " of the members",
                layer.unit(), layer.style());
    }

    static LayerDefinition agreement(LayerDefinition layer) {
        return real(layer.id() + "-agreement", layer.title() + ", agreement", "Share of the members that have the commoner sign; no change "
                + "counts for neither", "1", LayerStyles.share());
    }

    static LayerDefinition signal(LayerDefinition layer) {
        return new LayerDefinition(layer.id() + "-signal", layer.title() + ", signal", "Robust: at least 66 % of the members beyond natural "
                + "variability and at least 80 % of one sign (IPCC AR6, advanced approach)", "1", SampleType.BYTE, "",
                LayerStyles.changeSignal());
    }

    static LayerDefinition variance(String part, String words) {
        return real("variance-" + part, "Spread due to " + words, "Share of the variance of the changes of the mean margin over members and "
                + "cultivars that is due to " + words, "1", LayerStyles.share());
    }
}
