package org.wintersill.climatology.extreme;

/**
 * How well a distribution fits a sample (science 6.2). The parameters were estimated from the same sample, so tabled critical
 * values of the first two do not apply: {@link ParametricBootstrap} gives their p-values.
 */
public final class FitQuality {
    private FitQuality() {
    }

    /**
     * Anderson and Darling's A squared.
     *
     * @param sorted ascending; the first n count
     * @return infinite where a value is outside of the support
     */
    public static double andersonDarling(double[] sorted, int n, Gev gev) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            double below = -Math.exp(-gev.reduced(sorted[i]));
            double above = Math.log(gev.exceedance(sorted[n - 1 - i]));
            sum += (2 * i + 1) * (below + above);
        }
        double statistic = -n - sum / n;
        return statistic == statistic ? statistic : Double.POSITIVE_INFINITY;
    }

    /** Cramer and von Mises' W squared. */
    public static double cramerVonMises(double[] sorted, int n, Gev gev) {
        double sum = 1 / (12.0 * n);
        for (int i = 0; i < n; i++) {
            double difference = gev.probability(sorted[i]) - (2 * i + 1) / (2.0 * n);
            sum += difference * difference;
        }
        return sum;
    }

    /**
     * Correlation of the sorted values with the distribution's quantiles at (i - 0.4) / (n + 0.2) (Cunnane 1978, Journal of
     * Hydrology 37:205, from memory): 1 is a straight probability plot.
     */
    public static double plotCorrelation(double[] sorted, int n, Gev gev) {
        double meanX = 0;
        double meanQ = 0;
        double[] quantiles = new double[n];
        for (int i = 0; i < n; i++) {
            quantiles[i] = gev.quantile(plottingPosition(i, n));
            meanX += sorted[i] / n;
            meanQ += quantiles[i] / n;
        }
        double xx = 0;
        double qq = 0;
        double xq = 0;
        for (int i = 0; i < n; i++) {
            double dx = sorted[i] - meanX;
            double dq = quantiles[i] - meanQ;
            xx += dx * dx;
            qq += dq * dq;
            xq += dx * dq;
        }
        return xq / Math.sqrt(xx * qq);
    }

    /** Cunnane's plotting position of the value with so many below it. */
    public static double plottingPosition(int below, int n) {
        return (below + 0.6) / (n + 0.2);
    }
}
