package org.wintersill.climatology.statistic;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.Gev;
import org.wintersill.climatology.extreme.LowExtreme;
import org.wintersill.climatology.extreme.ParametricBootstrap;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** The list of summary layers that are made when they are asked for: bounds, fits, trends. */
final class RequestedStatistics {
    private final ClimatologyStatistics.Choices choices;
    private final ExtremeChoices extremes;
    private final String words;

    RequestedStatistics(ClimatologyStatistics.Choices choices) {
        this.choices = choices;
        extremes = choices.extremes();
        words = "parametric bootstrap, " + extremes.replicates() + " replicates, "
                + Math.round(choices.confidence() * 1000) / 10.0 + " % two-sided";
    }

    List<ClimatologyStatistic> ofCultivar() {
        List<ClimatologyStatistic> list = new ArrayList<>(List.of(DamageMeanBound.pair(choices.confidence(), extremes.seed())));
        int killing = choices.killingLevel();
        if (choices.rule() != HardinessRule.EXPECTED_DAMAGE) {
            for (boolean upper : new boolean[] {false, true}) {
                list.add(new RequiredHardinessBound(killing, choices.target(), choices.interval(), choices.confidence(), upper));
            }
        }
        WinterField margin = WinterField.margin();
        WinterField deadly = WinterField.killing(choices.killing(), killing);
        if (fitted()) {
            list.addAll(fits(margin, killing == 0 ? List.of(RequestedStatistics::killingReturn) : List.of()));
            list.addAll(killingReturns(deadly, killing == 0));
            if (choices.levels().length > 1) {
                list.add(new DamageMeanFitted(extremes, choices.levels()));
            }
        }
        list.addAll(trends(margin));
        return list;
    }

    List<ClimatologyStatistic> shared() {
        List<ClimatologyStatistic> list = new ArrayList<>();
        if (fitted()) {
            list.addAll(fits(WinterField.minimum(), List.of()));
        }
        list.addAll(trends(WinterField.minimum()));
        choices.reckoning().coldNight().ifPresent(threshold -> {
            list.add(new ColdNightsMean(threshold, false));
            list.add(new ColdNightsMean(threshold, true));
        });
        return list;
    }

    private boolean fitted() {
        return extremes.method().isPresent() && choices.years().length >= ExtremeFit.FEWEST_WINTERS;
    }

    private static double killingReturn(Gev gev) {
        return 1 / LowExtreme.probabilityAtOrBelow(gev, 0);
    }

    private List<ParametricBootstrap.Quantity> quantities(List<ParametricBootstrap.Quantity> more) {
        List<ParametricBootstrap.Quantity> quantities = new ArrayList<>();
        for (int winters : extremes.returnPeriods()) {
            quantities.add(gev -> LowExtreme.returnLevel(gev, winters));
        }
        quantities.addAll(more);
        return quantities;
    }

    private List<ClimatologyStatistic> fits(WinterField field, List<ParametricBootstrap.Quantity> more) {
        List<ClimatologyStatistic> list = new ArrayList<>();
        List<ParametricBootstrap.Quantity> quantities = quantities(more);
        for (int i = 0; i < extremes.returnPeriods().length; i++) {
            int winters = extremes.returnPeriods()[i];
            String id = "return-level-" + field.id() + "-" + winters;
            String title = capital(field.id()) + " of one winter in " + winters;
            String about = "The " + field.words() + " that is undercut on average once in " + winters + " winters, by a fitted distribution";
            list.add(new FittedLayer(layer(id, title, about, field.unit(), field.style()), field, extremes,
                    fit -> LowExtreme.returnLevel(fit.gev(), winters)));
            addBounds(list, id, title, about, field.unit(), field.style(), field, quantities, i);
        }
        list.add(new FittedLayer(layer("lowest-possible-" + field.id(), "Lowest possible " + field.id(), "The " + field.words()
                + " that the fitted distribution cannot undercut; missing where it is not bounded", field.unit(), field.style()), field, extremes,
                fit -> LowExtreme.lowest(fit.gev())));
        list.add(new FittedLayer(layer("extreme-location-" + field.id(), "Location of the fit", "Location of the fitted distribution of the "
                + field.words(), field.unit(), field.style()), field, extremes, fit -> -fit.gev().location()));
        list.add(new FittedLayer(layer("extreme-scale-" + field.id(), "Scale of the fit", "Scale of the fitted distribution of the "
                + field.words(), "K", LayerStyles.spread()), field, extremes, fit -> fit.gev().scale()));
        list.add(new FittedLayer(layer("extreme-shape-" + field.id(), "Shape of the fit", "Shape xi of the fitted distribution of the "
                + field.words() + ", as maxima of its negative; negative is bounded", "1", LayerStyles.shape()), field, extremes,
                fit -> fit.gev().shape()));
        for (FitReliability.Part part : FitReliability.Part.values()) {
            list.add(new FitReliability(field, extremes, part));
        }
        return list;
    }

    private List<ClimatologyStatistic> killingReturns(WinterField field, boolean withMargin) {
        String about = "One divided by the probability, by a fitted distribution, of a winter that kills at least " + choices.killing()
                + " % of the buds";
        List<ClimatologyStatistic> list = new ArrayList<>();
        list.add(new FittedLayer(layer("return-period-killing", "Return period of a killing winter, fitted", about, "year",
                LayerStyles.returnPeriod()), field, extremes, fit -> killingReturn(fit.gev())));
        List<ParametricBootstrap.Quantity> quantities = withMargin ? quantities(List.of(RequestedStatistics::killingReturn))
                : List.of(RequestedStatistics::killingReturn);
        addBounds(list, "return-period-killing", "Return period of a killing winter, fitted", about, "year", LayerStyles.returnPeriod(), field,
                quantities, quantities.size() - 1);
        return list;
    }

    private void addBounds(List<ClimatologyStatistic> list, String id, String title, String about, String unit, LayerStyle style,
                           WinterField field, List<ParametricBootstrap.Quantity> quantities, int quantity) {
        for (boolean upper : new boolean[] {false, true}) {
            String side = upper ? "upper" : "lower";
            list.add(new FittedBound(layer(id + "-" + side, title + ", " + side + " bound", about + ", " + side + " bound (" + words + ")", unit,
                    style), field, extremes, choices.confidence(), quantities, quantity, upper));
        }
    }

    private List<ClimatologyStatistic> trends(WinterField field) {
        List<ClimatologyStatistic> list = new ArrayList<>();
        for (TrendLayer.Part part : TrendLayer.Part.values()) {
            list.add(new TrendLayer(field, part));
        }
        list.add(new TrendSignificance(field, extremes.falseDiscovery()));
        return list;
    }

    private static LayerDefinition layer(String id, String title, String about, String unit, LayerStyle style) {
        return new LayerDefinition(id, title, about, unit, SampleType.FLOAT32, "", style);
    }

    private static String capital(String word) {
        return word.substring(0, 1).toUpperCase(Locale.ROOT) + word.substring(1);
    }
}
