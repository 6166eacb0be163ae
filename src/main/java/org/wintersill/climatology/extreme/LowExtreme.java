package org.wintersill.climatology.extreme;

import java.util.Arrays;

/** Lows, such as winter minima and margins, by a distribution fitted to their negatives (science 6.2). */
public final class LowExtreme {
    private LowExtreme() {
    }

    /** Turns the first n lows into ascending maxima, in place. */
    public static void toSortedMaxima(double[] lows, int n) {
        for (int i = 0; i < n; i++) {
            lows[i] = -lows[i];
        }
        Arrays.sort(lows, 0, n);
    }

    /** The low that is undercut on average once in so many winters. */
    public static double returnLevel(Gev maxima, double winters) {
        return -maxima.returnLevel(winters);
    }

    /** Probability that a winter's low is at or below a value. */
    public static double probabilityAtOrBelow(Gev maxima, double low) {
        return maxima.exceedance(-low);
    }

    /** Lowest possible low; minus infinity unless the fit is bounded. */
    public static double lowest(Gev maxima) {
        return -maxima.upperEnd();
    }
}
