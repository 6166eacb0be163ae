package org.wintersill.climatology;

/**
 * Parts of the variance of winter margins M_cw of cultivars c and winters w at one place, K^2 (science 16.11): over winters of the mean
 * over cultivars, over cultivars of the mean over winters, and of the rest. Sums are divided by their number. The three add up to the
 * variance of all margins.
 *
 * @param winter variance over winters of the mean over cultivars
 * @param cultivar variance over cultivars of the mean over winters
 * @param interaction variance of what is left: zero where cultivars differ by the same amount in every winter
 */
public record VarianceParts(double winter, double cultivar, double interaction) {

    /**
     * The parts.
     *
     * @param margins {@code [cultivar][winter]}, K; the first {@code winters} of each count
     * @param winters number of winters, at least 1
     */
    public static VarianceParts of(double[][] margins, int winters) {
        int cultivars = margins.length;
        double[] ofCultivar = new double[cultivars];
        double[] ofWinter = new double[winters];
        double mean = 0;
        for (int c = 0; c < cultivars; c++) {
            for (int w = 0; w < winters; w++) {
                ofCultivar[c] += margins[c][w] / winters;
                ofWinter[w] += margins[c][w] / cultivars;
            }
            mean += ofCultivar[c] / cultivars;
        }
        double rest = 0;
        for (int c = 0; c < cultivars; c++) {
            for (int w = 0; w < winters; w++) {
                double left = margins[c][w] - ofCultivar[c] - ofWinter[w] + mean;
                rest += left * left / cultivars / winters;
            }
        }
        return new VarianceParts(variance(ofWinter, mean), variance(ofCultivar, mean), rest);
    }

    private static double variance(double[] values, double mean) {
        double sum = 0;
        for (double value : values) {
            sum += (value - mean) * (value - mean);
        }
        return sum / values.length;
    }
}
