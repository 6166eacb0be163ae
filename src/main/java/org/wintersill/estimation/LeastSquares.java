package org.wintersill.estimation;

import java.util.List;
import org.apache.commons.math3.exception.MathIllegalStateException;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresBuilder;
import org.apache.commons.math3.fitting.leastsquares.LevenbergMarquardtOptimizer;
import org.apache.commons.math3.fitting.leastsquares.MultivariateJacobianFunction;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.util.Pair;

/**
 * Weighted least squares inside ranges, by Levenberg and Marquardt's method of Commons Math: minimises the sum of w (y - f)^2. A step
 * that leaves a range ends on its edge. Slopes are differences over a small share of each range, central where both sides are
 * inside.
 */
final class LeastSquares {
    private static final int MOST_EVALUATIONS = 400;

    private final Prediction prediction;
    private final List<Parameter> parameters;
    private final double[] rootWeights;
    private final double step;

    /**
     * @param weights of the samples, positive
     * @param step share of a parameter's range over which slopes are taken; larger where predictions are in single precision
     */
    LeastSquares(Prediction prediction, List<Parameter> parameters, double[] weights, double step) {
        this.prediction = prediction;
        this.parameters = parameters;
        this.step = step;
        rootWeights = new double[weights.length];
        for (int i = 0; i < weights.length; i++) {
            rootWeights[i] = Math.sqrt(weights[i]);
        }
    }

    /** @param sum of squares, weighted */
    record Solution(double[] point, double sum) {
    }

    /** The best point that is found from a start. */
    Solution from(double[] start, double[] observed) {
        double[] target = weighted(observed);
        Solution[] best = {new Solution(clamped(start), Double.POSITIVE_INFINITY)};
        MultivariateJacobianFunction model = place -> {
            double[] point = clamped(place.toArray());
            double[] values = weighted(prediction.at(point));
            double sum = sum(values, target);
            if (sum < best[0].sum()) {
                best[0] = new Solution(point, sum);
            }
            return new Pair<>(new ArrayRealVector(values, false), new Array2DRowRealMatrix(slopes(point), false));
        };
        try {
            // slopes over wider steps cannot tell smaller gains
            double tolerance = step * step;
            new LevenbergMarquardtOptimizer().withCostRelativeTolerance(tolerance).withParameterRelativeTolerance(tolerance)
                    .optimize(new LeastSquaresBuilder().start(best[0].point()).model(model).target(target).lazyEvaluation(false)
                            .parameterValidator(place -> new ArrayRealVector(clamped(place.toArray()), false))
                            .maxEvaluations(MOST_EVALUATIONS).maxIterations(MOST_EVALUATIONS).build());
        } catch (MathIllegalStateException stopped) {
            // no further progress, or too many steps along an edge: the best point so far is kept either way
            return best[0];
        }
        return best[0];
    }

    /** Slopes of the weighted predictions, {@code [sample][parameter]}. */
    double[][] slopes(double[] point) {
        double[][] slopes = new double[rootWeights.length][point.length];
        for (int j = 0; j < point.length; j++) {
            Parameter parameter = parameters.get(j);
            double width = step * (parameter.high() - parameter.low());
            double[] lower = point.clone();
            double[] upper = point.clone();
            lower[j] = parameter.clamp(point[j] - width);
            upper[j] = parameter.clamp(point[j] + width);
            double[] below = weighted(prediction.at(lower));
            double[] above = weighted(prediction.at(upper));
            for (int i = 0; i < slopes.length; i++) {
                slopes[i][j] = (above[i] - below[i]) / (upper[j] - lower[j]);
            }
        }
        return slopes;
    }

    private double[] clamped(double[] point) {
        double[] inside = new double[point.length];
        for (int j = 0; j < point.length; j++) {
            inside[j] = parameters.get(j).clamp(point[j]);
        }
        return inside;
    }

    private double[] weighted(double[] values) {
        double[] weighted = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            weighted[i] = rootWeights[i] * values[i];
        }
        return weighted;
    }

    private static double sum(double[] values, double[] target) {
        double sum = 0;
        for (int i = 0; i < values.length; i++) {
            sum += (target[i] - values[i]) * (target[i] - values[i]);
        }
        return sum;
    }
}
