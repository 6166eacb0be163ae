/**
 * <b>Purpose.</b> Trial fits: parameters of hardiness models from measured lethal temperatures, by least squares, with bootstrap
 * intervals.
 *
 * <p><b>May depend on.</b> {@code hardiness}, {@code season}, {@code temperature}, {@code time}, {@code damage},
 * {@code climatology} (random streams, percentiles), {@code problem}; Commons Math.
 *
 * <p><b>Conventions.</b> One cultivar at a time, nothing is shared between cultivars. Temperatures in degC, residuals are measured
 * minus fitted LT50 in K. What the samples cannot tell is said, not guessed. Nothing depends on threads, clock or locale: random numbers
 * come from a seed. Start reading in {@link org.wintersill.estimation.TrialFit}.
 */
package org.wintersill.estimation;
