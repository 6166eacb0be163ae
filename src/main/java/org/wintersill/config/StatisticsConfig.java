package org.wintersill.config;

import java.util.List;

/**
 * Statistics over winters.
 *
 * @param interval probability that bounds enclose, 0..1
 * @param bounds {@code jeffreys} or {@code wilson}
 * @param targets frequencies of killing winters, or expected damages, that are still accepted, 0..1; the first decides {@code choice}
 * @param rule how required hardiness is found: {@code frequency}, {@code quantile} or {@code expected-damage}
 * @param extremes {@code auto}, {@code none}, {@code l-moments} or {@code maximum-likelihood}
 * @param returnPeriods winters, ascending
 * @param replicates number of bootstrap replicates of a fit
 * @param seed of all random streams
 * @param coldNight threshold of a cold night, degrees Celsius
 * @param falseDiscovery accepted share of false calls among the cells called significant
 */
public record StatisticsConfig(double interval, String bounds, List<Double> targets, String rule, String extremes,
                               List<Integer> returnPeriods, int replicates, int seed, double coldNight,
                               double falseDiscovery) {
    public StatisticsConfig {
        targets = List.copyOf(targets);
        returnPeriods = List.copyOf(returnPeriods);
    }

    /** The frequency that decides. */
    public double target() {
        return targets.get(0);
    }
}
