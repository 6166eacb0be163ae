package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.FitQuality;
import org.wintersill.climatology.extreme.LowExtreme;
import org.wintersill.climatology.extreme.PlotCorrelationLimit;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Where a fit should not be trusted: the correlation of its probability plot, the p-value of its distance to the record, and a class
 * of the gravest reason (science 6.2).
 */
final class FitReliability implements ClimatologyStatistic {
    /** What is told. */
    enum Part { CORRELATION, TEST, FLAG }

    /** Classes of the flag, by {@link LayerStyles#fitFlag()}. */
    private static final int SOUND = 1;
    private static final int GUMBEL = 2;
    private static final int BEYOND_END = 3;
    private static final int POOR = 4;

    private final WinterField field;
    private final ExtremeChoices choices;
    private final Part part;
    private final PlotCorrelationLimit limit;

    FitReliability(WinterField field, ExtremeChoices choices, Part part) {
        this.field = field;
        this.choices = choices;
        this.part = part;
        limit = new PlotCorrelationLimit(choices.seed());
    }

    @Override
    public LayerDefinition layer() {
        return switch (part) {
            case CORRELATION -> new LayerDefinition("fit-correlation-" + field.id(), "Straightness of the probability plot",
                    "Correlation of the sorted winters (" + field.words() + ") with the quantiles of the fitted distribution; 1 is a straight "
                            + "probability plot", "1", SampleType.FLOAT32, "", LayerStyles.fitCorrelation());
            case TEST -> new LayerDefinition("fit-test-" + field.id(), "Test of fit, p-value",
                    "Share of samples drawn from the fitted distribution of the " + field.words() + " that lie at least as far from their own fit "
                            + "(Anderson-Darling, " + choices.replicates() + " replicates)", "1", SampleType.FLOAT32, "", LayerStyles.share());
            case FLAG -> new LayerDefinition("fit-flag-" + field.id(), "Where the fit should not be trusted",
                    "Fit of the " + field.words() + ": sound; a Gumbel distribution in place of a shape beyond 0.4; "
                            + (field.level() < 0 ? "a winter of the record" : "a winter of the record, or a margin of zero,")
                            + " beyond the lowest possible value; or a probability plot less straight than in 19 of 20 samples",
                    "1", SampleType.BYTE, "", LayerStyles.fitFlag());
        };
    }

    @Override
    public LayerGroup group() {
        return part == Part.TEST ? LayerGroup.BOUNDS : choices.byDefault() ? LayerGroup.DEFAULT : LayerGroup.EXTREMES;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        if (part == Part.TEST) {
            System.arraycopy(FieldBounds.pValues(record, field, choices), from, out, from, to - from);
            return;
        }
        FieldFits fits = FieldFits.of(record, field, choices);
        for (int cell = from; cell < to; cell++) {
            ExtremeFit fit = fits.at(cell);
            if (fit.kind() == ExtremeFit.Kind.NONE) {
                out[cell] = Float.NaN;
                continue;
            }
            int n = fits.sortedMaxima(cell);
            double correlation = FitQuality.plotCorrelation(fits.room(), n, fit.gev());
            out[cell] = part == Part.CORRELATION ? (float) correlation : flag(fit, correlation, fits.room(), n);
        }
    }

    private int flag(ExtremeFit fit, double correlation, double[] sortedMaxima, int n) {
        double lowest = LowExtreme.lowest(fit.gev());
        boolean beyond = -sortedMaxima[n - 1] < lowest || field.level() >= 0 && lowest > 0;
        if (correlation < limit.of(n)) {
            return POOR;
        }
        return beyond ? BEYOND_END : fit.kind() == ExtremeFit.Kind.GUMBEL_FALLBACK ? GUMBEL : SOUND;
    }
}
