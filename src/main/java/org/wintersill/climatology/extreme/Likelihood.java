package org.wintersill.climatology.extreme;

import java.util.Arrays;
import org.apache.commons.math3.analysis.MultivariateFunction;
import org.apache.commons.math3.exception.TooManyEvaluationsException;
import org.apache.commons.math3.optim.InitialGuess;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.PointValuePair;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.nonlinear.scalar.ObjectiveFunction;
import org.apache.commons.math3.optim.nonlinear.scalar.noderiv.NelderMeadSimplex;
import org.apache.commons.math3.optim.nonlinear.scalar.noderiv.SimplexOptimizer;

/** Searches for the lowest value of a negative log-likelihood, which is infinite where parameters are impossible. */
final class Likelihood {
    private static final double TOLERANCE = 1e-11;
    private static final int MOST_EVALUATIONS = 4000;
    private static final int MOST_RESTARTS = 8;
    /** A fresh simplex that gains less than this has nothing more to find. */
    private static final double GAIN = 1e-9;

    private Likelihood() {
    }

    /**
     * Nelder and Mead's simplex, begun anew at its own result until nothing is gained.
     *
     * @param start where the function is finite; where it is not, the start is all that comes back
     * @param steps size of the first simplex along each axis
     * @return the point; its value is asked of the function
     */
    static double[] lowest(MultivariateFunction function, double[] start, double[] steps) {
        double[] best = start.clone();
        double lowest = function.value(best);
        if (Double.isInfinite(lowest)) {
            return best;
        }
        double[] size = steps.clone();
        for (int restart = 0; restart < MOST_RESTARTS; restart++) {
            double[] point = search(function, best, size);
            double value = function.value(point);
            boolean done = !(value < lowest - GAIN);
            if (value < lowest) {
                best = point;
                lowest = value;
            }
            if (done && restart > 0) {
                return best;
            }
            size = Arrays.stream(size).map(step -> step / 4).toArray();
        }
        return best;
    }

    private static double[] search(MultivariateFunction function, double[] start, double[] steps) {
        double[][] last = new double[1][];
        double[] lowest = {Double.POSITIVE_INFINITY};
        MultivariateFunction watched = point -> {
            double value = function.value(point);
            if (value < lowest[0]) {
                lowest[0] = value;
                last[0] = point.clone();
            }
            return value;
        };
        try {
            PointValuePair pair = new SimplexOptimizer(TOLERANCE, TOLERANCE).optimize(new MaxEval(MOST_EVALUATIONS),
                    new ObjectiveFunction(watched), GoalType.MINIMIZE, new InitialGuess(start), new NelderMeadSimplex(steps));
            return pair.getPoint();
        } catch (TooManyEvaluationsException e) {
            return last[0];
        }
    }
}
