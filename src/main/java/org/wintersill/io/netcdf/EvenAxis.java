package org.wintersill.io.netcdf;

import org.wintersill.problem.Problem;

/**
 * A coordinate axis with equal steps.
 *
 * @param first coordinate of the first cell's centre, in file order
 * @param step from one centre to the next, negative where the axis descends; NaN for a single cell
 * @param count number of cells
 */
record EvenAxis(double first, double step, int count) {
    /** Share of a cell by which centres may lie off the even axis. */
    private static final double TOLERANCE = 1e-3;
    /** Round-off of a float32 coordinate: half a unit in the last place, of the value and of the ends. */
    private static final double FLOAT_ULPS = 1.0;

    /**
     * Checks that centres are in order and evenly spaced; the step is taken from the ends.
     *
     * @param values centres in file order; changed in place where longitudes jump by 360
     * @param singlePrecision whether they were stored as float32, whose last digits wobble
     * @param longitude whether they are degrees that may jump by 360
     * @param where file and variable, for messages
     */
    static EvenAxis of(double[] values, boolean singlePrecision, boolean longitude, String where) {
        int count = values.length;
        if (count == 0) {
            throw Problem.input("The axis has no entries", where, "Give a file that has cells").asException();
        }
        for (int i = 0; i < count; i++) {
            if (!Double.isFinite(values[i]) || Math.abs(values[i]) > 1e12) {
                throw Problem.input("Entry " + (i + 1) + " of the axis is " + values[i] + ", which is no coordinate", where,
                        "Repair the axis").asException();
            }
        }
        if (longitude) {
            unwrap(values);
        }
        if (count == 1) {
            return new EvenAxis(values[0], Double.NaN, 1);
        }
        double step = (values[count - 1] - values[0]) / (count - 1);
        double largest = 0;
        double smallestStep = Double.POSITIVE_INFINITY;
        double largestStep = 0;
        for (int i = 1; i < count; i++) {
            double here = values[i] - values[i - 1];
            if (here == 0 || here > 0 != step > 0) {
                throw Problem.input("The axis is not monotonic: entry " + i + " is " + values[i - 1] + ", entry " + (i + 1)
                        + " is " + values[i], where, "Sort the axis and the data with it").asException();
            }
            smallestStep = Math.min(smallestStep, Math.abs(here));
            largestStep = Math.max(largestStep, Math.abs(here));
            largest = Math.max(largest, Math.abs(values[i] - values[0] - i * step));
        }
        double roundOff = singlePrecision
                ? FLOAT_ULPS * Math.ulp((float) Math.max(Math.abs(values[0]), Math.abs(values[count - 1]))) : 0;
        if (largest > Math.max(TOLERANCE * Math.abs(step), 1.5 * roundOff)) {
            throw Problem.input("The axis is uneven: its steps run from " + smallestStep + " to " + largestStep
                    + "; only even steps are read", where, "Interpolate the data to an even grid first, for example with"
                    + " 'cdo remapbil'").asException();
        }
        return new EvenAxis(values[0], step, count);
    }

    private static void unwrap(double[] values) {
        for (int i = 1; i < values.length; i++) {
            double jump = values[i] - values[i - 1];
            if (jump < -180) {
                values[i] += 360 * Math.ceil((-180 - jump) / 360);
            } else if (jump > 180) {
                values[i] -= 360 * Math.ceil((jump - 180) / 360);
            }
        }
    }

    /** The same axis with a step for its single cell. */
    EvenAxis withStep(double size) {
        return new EvenAxis(first, size, count);
    }

    EvenAxis times(double factor) {
        return new EvenAxis(first * factor, step * factor, count);
    }

    boolean descends() {
        return step < 0;
    }

    double smallest() {
        return descends() ? last() : first;
    }

    double largest() {
        return descends() ? first : last();
    }

    private double last() {
        return count == 1 ? first : first + (count - 1) * step;
    }

    double size() {
        return Math.abs(step);
    }
}
