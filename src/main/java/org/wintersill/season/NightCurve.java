package org.wintersill.season;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.LethalTemperatures;

/**
 * The lethal temperatures of one cultivar for every night of one winter where they depend on the date alone, in the form
 * that the day loop needs: float values, and inverse spreads instead of spreads.
 *
 * @param tolerance form of the curve through the lethal temperatures
 * @param levels percent of buds of each level; the first is 50
 * @param lethal {@code [level][night]}, degrees Celsius; negative infinity on nights of which the model says nothing
 * @param warmInverse {@code [night]}, 1 / spread of the warm side, per K; 1 on such nights
 * @param coldInverse {@code [night]}, 1 / spread of the cold side, per K; 1 on such nights
 * @param phases where the phases of the winter begin
 */
public record NightCurve(ToleranceCurve tolerance, double[] levels, float[][] lethal, float[] warmInverse, float[] coldInverse,
                         Phases phases) {

    /**
     * Builds the curve.
     *
     * @param course LT10, LT50 and LT90 by night
     * @param otherLevels levels besides 50, in the order of the output
     * @param phases where the phases of the winter begin
     */
    public static NightCurve of(LethalTemperatures course, ToleranceCurve tolerance, double[] otherLevels, Phases phases) {
        int nights = course.lt50().length;
        double[] levels = new double[otherLevels.length + 1];
        levels[0] = 50;
        System.arraycopy(otherLevels, 0, levels, 1, otherLevels.length);
        float[][] lethal = new float[levels.length][nights];
        float[] warm = new float[nights];
        float[] cold = new float[nights];
        for (int night = 0; night < nights; night++) {
            if (Double.isNaN(course.lt50()[night])) {
                silence(lethal, warm, cold, night);
                continue;
            }
            double lt10 = course.lt10()[night];
            double lt50 = course.lt50()[night];
            double lt90 = course.lt90()[night];
            for (int level = 0; level < levels.length; level++) {
                lethal[level][night] = (float) tolerance.lethalTemperature(levels[level], lt10, lt50, lt90);
            }
            warm[night] = (float) (1 / tolerance.warmSpread(lt10, lt50));
            cold[night] = (float) (1 / tolerance.coldSpread(lt50, lt90));
        }
        return new NightCurve(tolerance, levels, lethal, warm, cold, phases);
    }

    /**
     * One quantity that falls with temperature and whose lowest value over the winter is kept: (T - reference) * factor.
     *
     * @param reference {@code [night]}, degrees Celsius
     * @param factor {@code [night]}, positive; null for 1
     */
    public record Measure(float[] reference, float[] factor) {
    }

    /** All that {@link WinterAccumulator} keeps the lowest value of. A night that lowers none of them need not be looked at. */
    public List<Measure> measures() {
        List<Measure> measures = new ArrayList<>();
        for (float[] temperatures : lethal) {
            measures.add(new Measure(temperatures, null));
        }
        measures.add(new Measure(lethal[0], warmInverse));
        measures.add(new Measure(lethal[0], coldInverse));
        return measures;
    }

    /** A night without hardiness: its margin is positive infinity, which never is the lowest. */
    private static void silence(float[][] lethal, float[] warm, float[] cold, int night) {
        for (float[] level : lethal) {
            level[night] = Float.NEGATIVE_INFINITY;
        }
        warm[night] = 1;
        cold[night] = 1;
    }
}
