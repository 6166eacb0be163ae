package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.LocationTrend;
import org.wintersill.climatology.extreme.MaximumLikelihood;
import org.wintersill.climatology.extreme.RankTrend;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Change of a field over the years: slope of Theil and Sen with the test of Mann and Kendall, and the location trend of a GEV with its
 * likelihood ratio (science 6.2 and 10). The ranks need 10 winters, the GEV 20.
 */
final class TrendLayer implements ClimatologyStatistic {
    private static final int YEARS_OF_UNIT = 10;

    /** What is told. */
    enum Part { SLOPE, TEST, LOCATION_SLOPE, LOCATION_TEST }

    private final WinterField field;
    private final Part part;

    private record Key(int level, boolean location) {
    }

    TrendLayer(WinterField field, Part part) {
        this.field = field;
        this.part = part;
    }

    @Override
    public LayerDefinition layer() {
        String of = " of the " + field.words();
        return switch (part) {
            case SLOPE -> new LayerDefinition("trend-" + field.id(), "Trend over the winters",
                    "Median slope of all pairs of winters (Theil-Sen)" + of + "; positive is milder", "K/(10 year)", SampleType.FLOAT32, "",
                    LayerStyles.trend());
            case TEST -> new LayerDefinition("trend-" + field.id() + "-test", "Test of the trend, p-value",
                    "Two-sided p-value of the test of Mann and Kendall" + of, "1", SampleType.FLOAT32, "", LayerStyles.share());
            case LOCATION_SLOPE -> new LayerDefinition("trend-" + field.id() + "-location", "Trend of the fitted location",
                    "Slope of the location of a generalised extreme value distribution" + of + ", maximum likelihood; positive is milder",
                    "K/(10 year)", SampleType.FLOAT32, "", LayerStyles.trend());
            case LOCATION_TEST -> new LayerDefinition("trend-" + field.id() + "-location-test", "Test of the location trend, p-value",
                    "p-value of the likelihood ratio of a location trend against none, chi-squared with one degree of freedom," + of, "1",
                    SampleType.FLOAT32, "", LayerStyles.share());
        };
    }

    @Override
    public LayerGroup group() {
        return LayerGroup.TRENDS;
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        boolean location = part == Part.LOCATION_SLOPE || part == Part.LOCATION_TEST;
        for (int cell = from; cell < to; cell++) {
            if (location) {
                LocationTrend trend = locations(record, field)[cell];
                out[cell] = trend == null ? Float.NaN
                        : (float) (part == Part.LOCATION_TEST ? trend.pValue() : -YEARS_OF_UNIT * trend.slope());
            } else {
                RankTrend trend = ranks(record, field)[cell];
                out[cell] = trend == null ? Float.NaN : (float) (part == Part.TEST ? trend.pValue() : YEARS_OF_UNIT * trend.slope());
            }
        }
    }

    /** Values and years of one cell. */
    private static int series(WinterRecord record, float[][] field, int cell, double[] years, double[] values) {
        int n = 0;
        for (int winter = 0; winter < field.length; winter++) {
            float value = field[winter][cell];
            if (value == value) {
                years[n] = record.years()[winter];
                values[n++] = value;
            }
        }
        return n;
    }

    /** Trends by ranks, {@code [cell]}; null where fewer than 10 winters count. */
    static RankTrend[] ranks(WinterRecord record, WinterField field) {
        return record.derived(new Key(field.level(), false), () -> {
            RankTrend[] trends = new RankTrend[record.cells()];
            double[] years = new double[record.winters()];
            double[] values = new double[record.winters()];
            for (int cell = 0; cell < trends.length; cell++) {
                int n = series(record, field.values(record), cell, years, values);
                trends[cell] = n < RankTrend.FEWEST_VALUES ? null : RankTrend.of(years, values, n);
            }
            return trends;
        });
    }

    private static LocationTrend[] locations(WinterRecord record, WinterField field) {
        return record.derived(new Key(field.level(), true), () -> {
            LocationTrend[] trends = new LocationTrend[record.cells()];
            double[] years = new double[record.winters()];
            double[] maxima = new double[record.winters()];
            for (int cell = 0; cell < trends.length; cell++) {
                int n = series(record, field.values(record), cell, years, maxima);
                for (int i = 0; i < n; i++) {
                    maxima[i] = -maxima[i];
                }
                boolean varied = java.util.Arrays.stream(maxima, 0, n).distinct().limit(2).count() == 2;
                trends[cell] = n < ExtremeFit.FEWEST_WINTERS || !varied ? null
                        : LocationTrend.of(years, maxima, n, MaximumLikelihood.fit(maxima, n));
            }
            return trends;
        });
    }
}
