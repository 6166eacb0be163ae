package org.wintersill.damage;

/**
 * Nodes and weights of Gauss-Hermite quadrature: integral of f(x) exp(-x^2) dx = sum of w_j f(x_j). The nodes are the roots of the
 * Hermite polynomial of that degree, found by bisection to the last digit; the weights are 1 / (n h(x_j)^2), h being the orthonormal
 * polynomial of one degree less (textbook relations; values held to numpy by a test).
 */
final class GaussHermite {
    private static final double QUARTER_ROOT_OF_PI = Math.pow(Math.PI, 0.25);
    /** Closer than any two roots of the degrees in use. */
    private static final double STEP = 0.01;

    private final double[] nodes;
    private final double[] weights;

    /** @param degree even, at most 64 */
    GaussHermite(int degree) {
        nodes = new double[degree];
        weights = new double[degree];
        int found = degree / 2;
        for (double x = 0; found < degree; x += STEP) {
            if (polynomial(degree, x) * polynomial(degree, x + STEP) < 0) {
                double root = root(degree, x, x + STEP);
                double below = polynomial(degree - 1, root);
                nodes[found] = root;
                nodes[degree - 1 - found] = -root;
                weights[found] = 1 / (degree * below * below);
                weights[degree - 1 - found] = weights[found];
                found++;
            }
        }
    }

    double[] nodes() {
        return nodes.clone();
    }

    double[] weights() {
        return weights.clone();
    }

    private static double root(int degree, double from, double to) {
        boolean rising = polynomial(degree, to) > 0;
        double low = from;
        double high = to;
        while (true) {
            double middle = (low + high) / 2;
            if (middle <= low || middle >= high) {
                return middle;
            }
            if (polynomial(degree, middle) > 0 == rising) {
                high = middle;
            } else {
                low = middle;
            }
        }
    }

    /** The orthonormal Hermite polynomial, by its recurrence. */
    private static double polynomial(int degree, double x) {
        double before = 0;
        double value = 1 / QUARTER_ROOT_OF_PI;
        for (int n = 1; n <= degree; n++) {
            double next = x * Math.sqrt(2.0 / n) * value - Math.sqrt((n - 1.0) / n) * before;
            before = value;
            value = next;
        }
        return value;
    }
}
