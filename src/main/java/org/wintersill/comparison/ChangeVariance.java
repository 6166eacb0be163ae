package org.wintersill.comparison;

/**
 * How much of the spread of the changes in a cell is due to model, cultivar and way of downscaling: main effects of a full table,
 * the rest being what they do together. Population variances, as everywhere for shares (science 16.8).
 */
public final class ChangeVariance {
    private ChangeVariance() {
    }

    /**
     * Shares of the variance.
     *
     * @param changes {@code [model][cultivar][method]}, a full table without NaN
     * @return shares of model, cultivar, method and the rest, which sum to 1; NaN where nothing varies
     */
    public static double[] shares(double[][][] changes) {
        int models = changes.length;
        int cultivars = changes[0].length;
        int methods = changes[0][0].length;
        double[] byModel = new double[models];
        double[] byCultivar = new double[cultivars];
        double[] byMethod = new double[methods];
        double mean = 0;
        int count = models * cultivars * methods;
        for (int i = 0; i < models; i++) {
            for (int j = 0; j < cultivars; j++) {
                for (int m = 0; m < methods; m++) {
                    double change = changes[i][j][m];
                    byModel[i] += change / (cultivars * methods);
                    byCultivar[j] += change / (models * methods);
                    byMethod[m] += change / (models * cultivars);
                    mean += change / count;
                }
            }
        }
        double total = 0;
        for (double[][] ofModel : changes) {
            for (double[] ofCultivar : ofModel) {
                for (double change : ofCultivar) {
                    total += (change - mean) * (change - mean) / count;
                }
            }
        }
        if (!(total > 1e-12)) {
            return new double[] {Double.NaN, Double.NaN, Double.NaN, Double.NaN};
        }
        double[] shares = {variance(byModel, mean) / total, variance(byCultivar, mean) / total, variance(byMethod, mean) / total, 0};
        shares[3] = Math.max(0, 1 - shares[0] - shares[1] - shares[2]);
        return shares;
    }

    private static double variance(double[] values, double mean) {
        double sum = 0;
        for (double value : values) {
            sum += (value - mean) * (value - mean);
        }
        return sum / values.length;
    }
}
