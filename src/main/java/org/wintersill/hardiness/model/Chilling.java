package org.wintersill.hardiness.model;

/**
 * Measures of chilling (science 3.3). The models here count degree-days below 10 degC; chilling hours and portions need hourly
 * temperatures, which daily grids do not have, and serve to compare.
 */
final class Chilling {
    /** Chilling is counted below this daily mean, degC (science 3.1 and 3.3). */
    private static final double BASE = 10;
    /** Limits of a chilling hour, degC, both included (grapevine; science 3.3, read in a publication). */
    private static final double COLDEST_HOUR = 0;
    private static final double WARMEST_HOUR = 7.2;

    /** Constants of the Dynamic Model, read in the documentation of a public package (science 3.3): K, 1/h, 1/h, 1, K. */
    private static final double E0 = 4153.5;
    private static final double E1 = 12888.8;
    private static final double A0 = 139_500;
    private static final double A1 = 2.567e18;
    private static final double SLOPE = 1.6;
    private static final double TURNING = 277;
    private static final double ZERO_CELSIUS = 273;

    private Chilling() {
    }

    /** Degree-days below 10 degC of a day: min(0, mean - 10), negative or zero. */
    static double degreeDays(double mean) {
        return Math.min(0, mean - BASE);
    }

    /** Number of chilling hours, 0 to 7.2 degC, among hourly temperatures in degC. */
    static int hours(double[] temperatures) {
        int hours = 0;
        for (double temperature : temperatures) {
            hours += temperature >= COLDEST_HOUR && temperature <= WARMEST_HOUR ? 1 : 0;
        }
        return hours;
    }

    /**
     * State of the Dynamic Model.
     *
     * @param done chill portions that are fixed
     * @param intermediate the product that cold makes and warmth destroys; a portion is taken from it when it reaches 1
     */
    record Portions(double done, double intermediate) {
    }

    /**
     * The Dynamic Model after one more hour (Fishman, Erez and Couvillon 1987; recursion from memory, science 3.3), with T in K:
     * {@code x = A0 / A1 exp((E1 - E0) / T)}, {@code y = x - (x - y) exp(-A1 exp(-E1 / T))}; where y reaches 1, the share
     * {@code f / (1 + f)}, {@code f = exp(SLOPE TURNING (T - TURNING) / T)}, of it becomes chill portions.
     *
     * @param temperature degC
     */
    static Portions afterHour(Portions before, double temperature) {
        double t = temperature + ZERO_CELSIUS;
        double balance = A0 / A1 * Math.exp((E1 - E0) / t);
        double intermediate = balance - (balance - before.intermediate()) * Math.exp(-A1 * Math.exp(-E1 / t));
        if (intermediate < 1) {
            return new Portions(before.done(), intermediate);
        }
        double fixed = intermediate / (1 + Math.exp(-SLOPE * TURNING * (t - TURNING) / t));
        return new Portions(before.done() + fixed, intermediate - fixed);
    }
}
