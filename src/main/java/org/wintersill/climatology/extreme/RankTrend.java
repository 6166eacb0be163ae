package org.wintersill.climatology.extreme;

import java.util.Arrays;
import org.apache.commons.math3.special.Erf;

/**
 * Trend by ranks (science section 10): slope of Theil and Sen, the median of the slopes of all pairs, and the test of Mann and
 * Kendall, with continuity correction and the variance of ties (Sen 1968, Journal of the American Statistical Association 63:1379;
 * Mann 1945, Econometrica 13:245; from memory, values checked against scipy).
 *
 * @param slope median slope, unit of the values per unit of time
 * @param s pairs that rise minus pairs that fall
 * @param variance of s without a trend
 * @param z s in standard deviations, one step nearer to zero
 * @param pValue two-sided
 */
public record RankTrend(double slope, long s, double variance, double z, double pValue) {
    /** Fewest values for the normal approximation of the test, as is common practice. */
    public static final int FEWEST_VALUES = 10;

    /**
     * The trend of the first n values.
     *
     * @param times ascending, no two alike
     * @param values in the order of time
     * @param n at least 2
     */
    public static RankTrend of(double[] times, double[] values, int n) {
        double[] slopes = new double[n * (n - 1) / 2];
        int pairs = 0;
        long s = 0;
        for (int i = 0; i < n; i++) {
            for (int j = i + 1; j < n; j++) {
                double rise = values[j] - values[i];
                slopes[pairs++] = rise / (times[j] - times[i]);
                s += rise > 0 ? 1 : rise < 0 ? -1 : 0;
            }
        }
        Arrays.sort(slopes);
        double median = (slopes[(pairs - 1) / 2] + slopes[pairs / 2]) / 2;
        double variance = variance(values, n);
        double z = s == 0 || variance == 0 ? 0 : (s - Long.signum(s)) / Math.sqrt(variance);
        return new RankTrend(median, s, variance, z, Erf.erfc(Math.abs(z) / Math.sqrt(2)));
    }

    private static double variance(double[] values, int n) {
        double[] sorted = Arrays.copyOf(values, n);
        Arrays.sort(sorted);
        double sum = ties(n);
        int run = 1;
        for (int i = 1; i <= n; i++) {
            if (i < n && sorted[i] == sorted[i - 1]) {
                run++;
            } else {
                sum -= ties(run);
                run = 1;
            }
        }
        return sum / 18;
    }

    private static double ties(double t) {
        return t * (t - 1) * (2 * t + 5);
    }
}
