package org.wintersill.elevation;

/**
 * How strongly pools of cold air form in a night, 0..1, cell by cell of the source grid (science 7.4). Pools form on clear calm nights
 * only; what tells such nights apart is either the lapse rate fitted to the night or the range between its minimum and the day's
 * maximum.
 * <pre>
 * by lapse rate:  min(1, max(0, (g_ref - g) / (g_ref + 8)))     g_ref K/km, no pool from there up; full at -8 K/km
 * by range:       min(1, max(0, (range - calm) / (full - calm)))
 * </pre>
 * The limits are project choices.
 */
public sealed interface StableNights {

    /** Every night counts fully. */
    record All() implements StableNights {
    }

    /** @param reference g_ref by month, K/km, above -8 */
    record ByLapse(LapseRates reference) implements StableNights {

        public float weight(float lapse, int month) {
            return weight(lapse, reference.ofMonth(month));
        }

        /** The weight for a reference in K/km. */
        public static float weight(double lapse, double reference) {
            return (float) Math.min(1, Math.max(0, (reference - lapse) / (reference - LapseRates.LOWEST)));
        }
    }

    /**
     * @param none range at which no pool forms, K
     * @param full range at which it is full, K; more than {@code none}
     */
    record ByRange(double none, double full) implements StableNights {
        /** Defaults, K (project choices). */
        public static final double NONE = 5;
        public static final double FULL = 15;

        /** 0 where one of the two is missing: nothing is known of the night. */
        public float weight(float minimum, float maximum) {
            double weight = (maximum - minimum - none) / (full - none);
            return weight == weight ? (float) Math.min(1, Math.max(0, weight)) : 0;
        }
    }
}
