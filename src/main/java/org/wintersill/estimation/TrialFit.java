package org.wintersill.estimation;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.wintersill.climatology.Percentiles;
import org.wintersill.climatology.extreme.RandomStream;

/**
 * A fit of one cultivar: the best of several starts, and intervals by resampling residuals.
 *
 * <p>Bootstrap: the residuals times sqrt(w n / (n - p)), less their mean, are drawn with replacement, divided by sqrt(w), added to the
 * fitted values, and fitted again from the solution; bounds are percentiles (type 7) of the estimates. The residual bootstrap is a
 * textbook method (Efron 1979, Ann. Stat. 7:1, from memory); it takes residuals for alike and independent, which samples of one
 * winter are only roughly.
 *
 * @param estimates in the order of the parameters
 * @param fitted {@code [sample]}
 * @param residuals observed minus fitted
 * @param rmse root of the weighted mean square of the residuals
 * @param r2 share of the weighted variance of the observed values that the fit explains; NaN where they do not vary
 */
public record TrialFit(List<Estimate> estimates, double[] fitted, double[] residuals, double rmse, double r2) {
    /** A parameter whose whole range moves no prediction by as much, K, is not told by the samples. */
    private static final double NOTICEABLE = 0.05;
    /** Share of the range; an estimate nearer to an end is at its bound. */
    private static final double AT_END = 1e-6;
    /** Share of the range; an interval as wide says hardly more than the range itself (project choice). */
    private static final double NEARLY_ALL = 0.8;

    /** How far an estimate can be relied on. */
    public enum Standing {
        ESTIMATED(""), AT_BOUND("at the bound of its range"), HARDLY("hardly told by the samples"), UNTOLD("not told by the samples");

        private final String words;

        Standing(String words) {
            this.words = words;
        }

        public String words() {
            return words;
        }
    }

    /**
     * @param lower bound of the interval; NaN without replicates
     * @param upper likewise
     */
    public record Estimate(Parameter parameter, double value, double lower, double upper, Standing standing) {
    }

    /**
     * How a fit is done.
     *
     * @param starts points to start from beside the given one
     * @param step share of a range for slopes
     * @param replicates of the bootstrap
     * @param confidence of the two-sided intervals
     * @param seed of the random numbers
     * @param between called between the steps of the work, from several threads; may throw to end it
     */
    public record Way(int starts, double step, int replicates, double confidence, long seed, Runnable between) {
    }

    /**
     * Fits.
     *
     * @param observed {@code [sample]}, more than there are parameters
     * @param weights likewise, positive
     * @param start first point to start from
     */
    public static TrialFit of(Prediction prediction, List<Parameter> parameters, double[] observed, double[] weights, double[] start,
                              Way way) {
        LeastSquares method = new LeastSquares(prediction, parameters, weights, way.step());
        LeastSquares.Solution best = method.from(start, observed);
        for (int number = 1; number <= way.starts(); number++) {
            way.between().run();
            LeastSquares.Solution other = method.from(Parameter.start(parameters, number), observed);
            best = other.sum() < best.sum() ? other : best;
        }
        double[] fitted = prediction.at(best.point());
        double[] residuals = new double[fitted.length];
        for (int i = 0; i < fitted.length; i++) {
            residuals[i] = observed[i] - fitted[i];
        }
        double[][] replicates = replicates(method, best.point(), fitted, residuals, weights, way);
        double[][] slopes = method.slopes(best.point());
        List<Estimate> estimates = new ArrayList<>();
        for (int j = 0; j < best.point().length; j++) {
            estimates.add(estimate(parameters.get(j), best.point()[j], replicates[j], slopes, j, way.confidence()));
        }
        double total = Arrays.stream(weights).sum();
        return new TrialFit(List.copyOf(estimates), fitted, residuals, Math.sqrt(best.sum() / total),
                1 - best.sum() / variation(observed, weights));
    }

    private static Estimate estimate(Parameter parameter, double value, double[] replicates, double[][] slopes, int j, double confidence) {
        double range = parameter.high() - parameter.low();
        double lower = Double.NaN;
        double upper = Double.NaN;
        if (replicates.length > 0) {
            Arrays.sort(replicates);
            lower = Percentiles.type7(replicates, replicates.length, (1 - confidence) / 2);
            upper = Percentiles.type7(replicates, replicates.length, (1 + confidence) / 2);
        }
        double effect = Arrays.stream(slopes).mapToDouble(row -> Math.abs(row[j]) * range).max().orElse(0);
        boolean atEnd = Math.min(value - parameter.low(), parameter.high() - value) < AT_END * range;
        Standing standing = effect < NOTICEABLE ? Standing.UNTOLD : atEnd ? Standing.AT_BOUND
                : upper - lower > NEARLY_ALL * range ? Standing.HARDLY : Standing.ESTIMATED;
        return new Estimate(parameter, value, lower, upper, standing);
    }

    /** Estimates of the replicates, {@code [parameter][replicate]}. */
    private static double[][] replicates(LeastSquares method, double[] point, double[] fitted, double[] residuals, double[] weights,
                                         Way way) {
        int n = fitted.length;
        double widen = Math.sqrt((double) n / (n - point.length));
        double[] drawn = new double[n];
        double mean = 0;
        for (int i = 0; i < n; i++) {
            drawn[i] = residuals[i] * Math.sqrt(weights[i]) * widen;
            mean += drawn[i] / n;
        }
        double[][] estimates = new double[point.length][way.replicates()];
        double centre = mean;
        // each replicate has random numbers and a place of its own, so the order of the work does not show
        IntStream.range(0, way.replicates()).parallel().forEach(replicate -> {
            way.between().run();
            RandomStream random = RandomStream.of(way.seed(), 0, replicate);
            double[] observed = new double[n];
            for (int i = 0; i < n; i++) {
                observed[i] = fitted[i] + (drawn[random.nextInt(n)] - centre) / Math.sqrt(weights[i]);
            }
            double[] again = method.from(point, observed).point();
            for (int j = 0; j < again.length; j++) {
                estimates[j][replicate] = again[j];
            }
        });
        return estimates;
    }

    private static double variation(double[] observed, double[] weights) {
        double total = 0;
        double mean = 0;
        for (int i = 0; i < observed.length; i++) {
            total += weights[i];
            mean += weights[i] * observed[i];
        }
        mean /= total;
        double variation = 0;
        for (int i = 0; i < observed.length; i++) {
            variation += weights[i] * (observed[i] - mean) * (observed[i] - mean);
        }
        return variation > 0 ? variation : Double.NaN;
    }
}
