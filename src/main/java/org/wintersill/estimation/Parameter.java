package org.wintersill.estimation;

import java.util.List;

/**
 * Something to be estimated.
 *
 * @param name its key in a cultivar file, with that of its part before a point
 * @param unit for tables
 * @param low least value that is looked at
 * @param high greatest one
 */
public record Parameter(String name, String unit, double low, double high) {
    private static final int[] PRIMES = {2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37};

    public Parameter {
        if (!(low < high)) {
            throw new IllegalArgumentException(name + " from " + low + " to " + high);
        }
    }

    double clamp(double value) {
        return Math.max(low, Math.min(high, value));
    }

    /**
     * A starting point inside all ranges; the points of rising numbers spread evenly (Halton 1960, Numer. Math. 2:84, from
     * memory: radical inverses in prime bases).
     *
     * @param number from 1
     */
    static double[] start(List<Parameter> parameters, int number) {
        double[] point = new double[parameters.size()];
        for (int i = 0; i < point.length; i++) {
            Parameter parameter = parameters.get(i);
            point[i] = parameter.low + radicalInverse(number, PRIMES[i % PRIMES.length]) * (parameter.high - parameter.low);
        }
        return point;
    }

    private static double radicalInverse(int number, int base) {
        double share = 0;
        double place = 1.0 / base;
        for (int rest = number; rest > 0; rest /= base) {
            share += rest % base * place;
            place /= base;
        }
        return share;
    }
}
