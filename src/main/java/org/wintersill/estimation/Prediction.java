package org.wintersill.estimation;

/** What a model gives for each sample. */
@FunctionalInterface
public interface Prediction {

    /**
     * Fitted values.
     *
     * @param parameters in the order of the fit's parameters, each inside its range
     * @return {@code [sample]}
     */
    double[] at(double[] parameters);
}
