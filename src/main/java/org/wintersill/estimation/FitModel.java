package org.wintersill.estimation;

import java.util.List;
import java.util.Map;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;

/** A model of hardiness whose parameters can be fitted. */
interface FitModel {

    /**
     * A parameter as the fit sees it.
     *
     * @param start value to begin with, and the value that is kept where the parameter is not estimated
     * @param role what is done with it unless the user keeps it
     */
    record Setting(Parameter parameter, double start, Role role) {
    }

    /** How a parameter gets its value. */
    enum Role {
        /** By least squares. */
        ESTIMATED,
        /** The best of evenly spaced values, since predictions jump with it. */
        SEARCHED,
        /** It keeps its start: field samples do not tell it. */
        KEPT
    }

    /** Word of the cultivar file. */
    String word();

    /** All parameters, in the order of their values below. */
    List<Setting> settings();

    /** Whether it follows the weather. */
    boolean needsSeries();

    /**
     * The model with given values.
     *
     * @param toLt10 LT10 - LT50, K
     * @param toLt90 LT50 - LT90, K
     */
    HardinessModel model(double[] values, double toLt10, double toLt90);

    /** The keys of a cultivar file for given values, without id and source. */
    Map<String, Object> entry(double[] values, double toLt10, double toLt90);

    /** Lowest and highest LT50 of some samples. */
    static double[] range(List<MeasuredTolerance> samples) {
        double[] values = samples.stream().mapToDouble(MeasuredTolerance::lt50).sorted().toArray();
        return new double[] {values[0], values[values.length - 1]};
    }

    /** Four decimals, as many as a cultivar file needs. */
    static double rounded(double value) {
        return Math.rint(value * 1e4) / 1e4;
    }
}
