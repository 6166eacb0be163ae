package org.wintersill.climatology.statistic;

import java.util.Optional;
import org.wintersill.climatology.extreme.ExtremeFit;

/**
 * What fits, replicates and trends need to know of a run.
 *
 * @param method estimator; empty where no distribution is to be fitted
 * @param byDefault whether layers of fits are among the default ones
 * @param returnPeriods winters, ascending
 * @param replicates number of replicates of a fit
 * @param seed of all random streams
 * @param falseDiscovery accepted share of false calls among the cells called significant
 */
public record ExtremeChoices(Optional<ExtremeFit.Method> method, boolean byDefault, int[] returnPeriods, int replicates, long seed,
                             double falseDiscovery) {
}
