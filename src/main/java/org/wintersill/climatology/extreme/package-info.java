/**
 * <b>Purpose.</b> What a record of one value a winter says about winters that were not seen: distributions of extremes and their
 * fits, intervals, tests of fit, trends (science section 6.2 and 10). Start with {@link org.wintersill.climatology.extreme.Gev}
 * and {@link org.wintersill.climatology.extreme.ExtremeFit}.
 *
 * <p><b>May depend on.</b> Commons Math for distributions, special functions and optimisers; nothing else of the program but {@code damage} and
 * its own room.
 *
 * <p><b>Conventions.</b> Distributions are those of <em>maxima</em>: lowest minima and margins come in negated, and what comes out
 * is negated back by {@link org.wintersill.climatology.extreme.LowExtreme}. Shape xi is positive for a heavy tail and negative for
 * a bounded one (Hosking's k is -xi, and so is scipy's c). Equations in double precision; NaN parameters mean that there is no
 * fit, and everything computed from them is NaN. Random streams depend on seed, cell and replicate alone.
 */
package org.wintersill.climatology.extreme;
