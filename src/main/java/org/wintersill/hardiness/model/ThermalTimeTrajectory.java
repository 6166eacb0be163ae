package org.wintersill.hardiness.model;

import java.util.Arrays;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.NightTolerance;

/**
 * State of a {@link ThermalTimeModel} in a run of cells, in double precision.
 *
 * <p>The loops hold no condition, so that the compiler makes vector code of them: phase, first cooling and budbreak are numbers, 0
 * or 1, found by lifting a difference with {@link #FAR}. Blending two values with such a number gives one of them to the last
 * bit. A power that is a
 * small multiple of a half is multiplied out.
 */
public final class ThermalTimeTrajectory implements HardinessTrajectory {
    /** Lifts any difference of two states or sums above 1: none of them is nearer to zero than 1e-20. */
    private static final double FAR = 1e30;
    /** Powers up to this one are multiplied out where they are multiples of a half; project choice. */
    private static final int LARGEST_PRODUCT = 32;

    /** Twelve numbers in double precision. */
    static final int BYTES_PER_CELL = 12 * Double.BYTES;

    private final ThermalTimeModel model;
    private final int cells;
    private final double[] hardiness;
    /** 0 in endodormancy, 1 in ecodormancy. */
    private final double[] phase;
    /** 0 until the first day below the threshold, then 1. */
    private final double[] cooled;
    private final double[] chill;
    private final double[] budbreak;
    private final double[] switched;
    private final double[] mean;
    private final double[] excess;
    private final double[] ratio;
    private final double[] powers;
    private final double[] square;
    private final double[] change;

    ThermalTimeTrajectory(ThermalTimeModel model, int cells) {
        this.model = model;
        this.cells = cells;
        hardiness = filled(model.initial());
        phase = new double[cells];
        cooled = new double[cells];
        chill = new double[cells];
        budbreak = filled(Double.POSITIVE_INFINITY);
        switched = filled(Double.POSITIVE_INFINITY);
        mean = new double[cells];
        excess = new double[cells];
        ratio = new double[cells];
        powers = new double[cells];
        square = new double[cells];
        change = new double[cells];
    }

    private double[] filled(double value) {
        double[] values = new double[cells];
        Arrays.fill(values, value);
        return values;
    }

    /** H at the end of the last day that was taken, degC, whatever budbreak did. */
    double hardiness(int cell) {
        return hardiness[cell];
    }

    /** Degree-days below 10 degC so far. */
    double chill(int cell) {
        return chill[cell];
    }

    @Override
    public int phaseSwitch(int cell) {
        return position(switched[cell]);
    }

    @Override
    public int budbreak(int cell) {
        return position(budbreak[cell]);
    }

    private static int position(double day) {
        return day < Integer.MAX_VALUE ? (int) day : Integer.MAX_VALUE;
    }

    @Override
    public void tolerance(int day, NightTolerance out) {
        Arrays.fill(out.toLt10(), 0, cells, (float) model.toLt10());
        Arrays.fill(out.toLt90(), 0, cells, (float) model.toLt90());
        float[] lt50 = out.lt50();
        for (int i = 0; i < cells; i++) {
            lt50[i] = (float) (budbreak[i] < day ? model.tender() : hardiness[i]);
        }
    }

    @Override
    public void advance(int day, float[] dayMean) {
        for (int i = 0; i < cells; i++) {
            mean[i] = dayMean[i];
        }
        advance(day, mean);
    }

    /** The same for means in double precision. */
    void advance(int day, double[] dayMean) {
        ThermalTimeModel.Phase endo = model.endodormancy();
        ThermalTimeModel.Phase eco = model.ecodormancy();
        double span = model.tender() - model.hardy();
        aboveThreshold(dayMean, phase, endo.threshold(), eco.threshold(), excess, cells);
        ratios(hardiness, model.hardy(), span, ratio, cells);
        power(model.power());
        loss(excess, phase, cooled, ratio, powers, endo.loss(), eco.loss(), change, cells);
        next(excess, phase, hardiness, change, endo.gain(), eco.gain(), model.tender(), span, ratio, cells);
        bound(ratio, model.tender(), model.hardy(), cells);
        noteBudbreak(hardiness, ratio, model.budbreak(), day, budbreak, cells);
        System.arraycopy(ratio, 0, hardiness, 0, cells);
        noteCooling(excess, cooled, cells);
        chillAndPhase(dayMean, chill, phase, model.chilling(), cells);
        noteSwitch(phase, day + 1, switched, cells);
    }

    private static void aboveThreshold(double[] mean, double[] phase, double endo, double eco, double[] excess, int cells) {
        for (int i = 0; i < cells; i++) {
            excess[i] = mean[i] - (endo * (1 - phase[i]) + eco * phase[i]);
        }
    }

    private static void ratios(double[] hardiness, double hardy, double span, double[] ratio, int cells) {
        for (int i = 0; i < cells; i++) {
            ratio[i] = (hardiness[i] - hardy) / span;
        }
    }

    /**
     * powers = ratio^exponent; small multiples of a half by repeated squaring and one root, the same way for every cell. Others cost
     * a power function, so it is left out where it would be multiplied by nothing.
     */
    private void power(double exponent) {
        int whole = (int) exponent;
        boolean half = exponent == whole + 0.5;
        if (whole > LARGEST_PRODUCT || whole != exponent && !half) {
            for (int i = 0; i < cells; i++) {
                powers[i] = phase[i] > 0 && excess[i] > 0 ? Math.pow(ratio[i], exponent) : 0;
            }
            return;
        }
        Arrays.fill(powers, 1);
        if (half) {
            root(ratio, powers, cells);
        }
        System.arraycopy(ratio, 0, square, 0, cells);
        for (int rest = whole; rest > 0; rest >>= 1) {
            if ((rest & 1) == 1) {
                multiply(powers, square, cells);
            }
            square(square, cells);
        }
    }

    private static void root(double[] values, double[] roots, int cells) {
        for (int i = 0; i < cells; i++) {
            roots[i] = Math.sqrt(values[i]);
        }
    }

    private static void multiply(double[] values, double[] factors, int cells) {
        for (int i = 0; i < cells; i++) {
            values[i] *= factors[i];
        }
    }

    private static void square(double[] values, int cells) {
        for (int i = 0; i < cells; i++) {
            values[i] = values[i] * values[i];
        }
    }

    private static void loss(double[] excess, double[] phase, double[] cooled, double[] ratio, double[] powers, double endo, double eco,
                             double[] loss, int cells) {
        for (int i = 0; i < cells; i++) {
            double rate = endo * (1 - phase[i]) + eco * phase[i];
            double brake = ratio[i] * (1 - phase[i]) + powers[i] * phase[i];
            loss[i] = rate * Math.max(0, excess[i]) * (1 - brake) * cooled[i];
        }
    }

    private static void next(double[] excess, double[] phase, double[] hardiness, double[] loss, double endo, double eco, double tender,
                             double span, double[] next, int cells) {
        for (int i = 0; i < cells; i++) {
            double rate = endo * (1 - phase[i]) + eco * phase[i];
            double gain = rate * Math.min(0, excess[i]) * (1 - (tender - hardiness[i]) / span);
            next[i] = hardiness[i] + loss[i] + gain;
        }
    }

    private static void bound(double[] hardiness, double tender, double hardy, int cells) {
        for (int i = 0; i < cells; i++) {
            hardiness[i] = Math.min(tender, Math.max(hardy, hardiness[i]));
        }
    }

    private static void noteBudbreak(double[] before, double[] after, double threshold, double day, double[] budbreak, int cells) {
        for (int i = 0; i < cells; i++) {
            double below = Math.min(1, Math.max(0, (threshold - before[i]) * FAR));
            double reached = Math.max(0, 1 - Math.max(0, (threshold - after[i]) * FAR));
            budbreak[i] = Math.min(budbreak[i], day + FAR * (1 - below * reached));
        }
    }

    private static void noteCooling(double[] excess, double[] cooled, int cells) {
        for (int i = 0; i < cells; i++) {
            cooled[i] = Math.min(1, Math.max(cooled[i], -excess[i] * FAR));
        }
    }

    private static void chillAndPhase(double[] mean, double[] chill, double[] phase, double threshold, int cells) {
        for (int i = 0; i < cells; i++) {
            chill[i] += Chilling.degreeDays(mean[i]);
            phase[i] = Math.max(phase[i], 1 - Math.max(0, (chill[i] - threshold) * FAR));
        }
    }

    private static void noteSwitch(double[] phase, double day, double[] switched, int cells) {
        for (int i = 0; i < cells; i++) {
            switched[i] = Math.min(switched[i], day + FAR * (1 - phase[i]));
        }
    }
}
