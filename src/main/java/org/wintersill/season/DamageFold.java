package org.wintersill.season;

import java.util.Arrays;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.damage.Uncertainty;

/**
 * The running damage of one cultivar in a lane of cells, night by night, for any reckoning and any hardiness model: each cell may have
 * lethal temperatures of its own. Arrays are {@code [cell of the lane]}. A night without value is positive infinity and changes
 * nothing; neither does one without lethal temperatures (NaN).
 */
final class DamageFold {
    private final int cells;
    private final double sd;
    private final float[] room;
    private final JoinedNights joined;
    /** Lowest standardised margin, (T - LT50) / spread. */
    private final float[] lowest;
    /** Margin and inverse spreads of the night of the lowest standardised margin. */
    private final float[] margin;
    private final float[] warm;
    private final float[] cold;
    private ToleranceCurve curve = ToleranceCurve.SPLIT_LOGISTIC;

    DamageFold(DamageReckoning reckoning, int cells) {
        this.cells = cells;
        sd = reckoning.uncertainty().sd();
        boolean worst = reckoning.nights().isWorst();
        joined = worst ? null : new JoinedNights(reckoning.nights(), cells);
        room = new float[worst ? 0 : cells];
        lowest = new float[worst ? cells : 0];
        int kept = reckoning.keepsExpected() ? cells : 0;
        margin = new float[kept];
        warm = new float[kept];
        cold = new float[kept];
        begin();
    }

    void begin() {
        Arrays.fill(lowest, Float.POSITIVE_INFINITY);
        if (joined != null) {
            joined.begin();
        }
    }

    /**
     * Takes one night of lethal temperatures that are the same in every cell.
     *
     * @param night degrees Celsius
     * @param warmInverse 1 / spread of the warm side, per K
     * @param coldInverse 1 / spread of the cold side, per K
     */
    void accept(ToleranceCurve tolerance, float[] night, float lt50, float warmInverse, float coldInverse) {
        curve = tolerance;
        if (joined != null) {
            for (int i = 0; i < cells; i++) {
                room[i] = standardised(night[i] - lt50, warmInverse, coldInverse);
            }
            joined.accept(tolerance, room, cells);
            return;
        }
        for (int i = 0; i < cells; i++) {
            keepLowest(i, night[i] - lt50, warmInverse, coldInverse);
        }
    }

    /** Takes one night of lethal temperatures cell by cell; arrays as the single values of the other method. */
    void accept(ToleranceCurve tolerance, float[] night, float[] lt50, float[] warmInverse, float[] coldInverse) {
        curve = tolerance;
        if (joined != null) {
            for (int i = 0; i < cells; i++) {
                room[i] = standardised(night[i] - lt50[i], warmInverse[i], coldInverse[i]);
            }
            joined.accept(tolerance, room, cells);
            return;
        }
        for (int i = 0; i < cells; i++) {
            keepLowest(i, night[i] - lt50[i], warmInverse[i], coldInverse[i]);
        }
    }

    private static float standardised(float margin, float warmInverse, float coldInverse) {
        return margin * (margin > 0 ? warmInverse : coldInverse);
    }

    private void keepLowest(int cell, float nightMargin, float warmInverse, float coldInverse) {
        float z = standardised(nightMargin, warmInverse, coldInverse);
        if (z < lowest[cell]) {
            lowest[cell] = z;
            if (margin.length > 0) {
                margin[cell] = nightMargin;
                warm[cell] = warmInverse;
                cold[cell] = coldInverse;
            }
        }
    }

    /** Fraction of buds killed so far, 0..1, without uncertainty; 0 where no night had a value. */
    double damage(int cell) {
        return joined != null ? joined.damage(cell) : curve.fractionOfDeficit(-(double) lowest[cell]);
    }

    /** The same with uncertainty, on the tolerance curve of the earliest night with the greatest fraction killed. */
    double expected(int cell) {
        return lowest[cell] == Float.POSITIVE_INFINITY ? 0
                : Uncertainty.expectedFraction(curve, margin[cell], warm[cell], cold[cell], sd);
    }
}
