package org.wintersill.scenario;

/**
 * The value of one day after a model's change, from the samples of its time of the year in one cell (science 8). Samples are sorted;
 * where one of them has fewer than {@link #FEWEST} values there is no result.
 */
final class ModelChange {
    /** Fewest values of a sample (science 8, project choice). */
    static final int FEWEST = 10;

    private ModelChange() {
    }

    static boolean suffices(Sample observed, Sample historical, Sample future) {
        return observed.size() >= FEWEST && historical.size() >= FEWEST && future.size() >= FEWEST;
    }

    /**
     * Quantile delta mapping: tau = F_future(x), x + Q_observed(tau) - Q_historical(tau), written as Q_observed + (x - Q_historical).
     * Values beyond the future's range keep their distance, since F is 0 or 1 there.
     */
    static double quantileDelta(double x, Sample observed, Sample historical, Sample future) {
        double tau = future.probability(x);
        return observed.quantile(tau) + (x - historical.quantile(tau));
    }

    /** Quantile mapping: Q_observed(F_historical(x)); beyond the historical range the observed end. */
    static double quantileMapping(double x, Sample observed, Sample historical) {
        return observed.quantile(historical.probability(x));
    }

    /** The observed value plus the change of the mean. */
    static double delta(double observed, Sample historical, Sample future) {
        return observed + (future.mean() - historical.mean());
    }
}
