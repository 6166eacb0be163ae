package org.wintersill.climatology.extreme;

import java.util.function.DoubleToLongFunction;

/**
 * Which of many tests may be called significant when a share of false calls is accepted (Benjamini and Hochberg 1995, Journal of
 * the Royal Statistical Society B 57:289, from memory; checked against scipy and R): all p not above the largest p(i) with p(i) &lt;= q i / m.
 */
public final class FalseDiscovery {
    private FalseDiscovery() {
    }

    /**
     * The largest t with t = q (number of p not above t) / m, found from above without sorting: p-values of a whole map need not be
     * in memory, only counted a few times over. Every p up to t is significant.
     *
     * @param count how many p-values are not above a number
     * @param tests m, the number of p-values
     * @param share q, the accepted share of false discoveries, 0..1
     * @return 0 where nothing is significant
     */
    public static double threshold(DoubleToLongFunction count, long tests, double share) {
        double bound = share;
        while (tests > 0 && bound > 0) {
            double next = share * count.applyAsLong(bound) / tests;
            if (!(next < bound)) {
                return bound;
            }
            bound = next;
        }
        return 0;
    }
}
