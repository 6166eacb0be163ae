/**
 * <b>Purpose.</b> Summaries over winters: frequencies with their bounds, means, percentiles, worst winters, classes.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code layer}, {@code season}, {@code damage}, {@code problem}; Commons Math for
 * distributions.
 *
 * <p><b>Conventions.</b> A winter that does not count at a cell is NaN and is left out; a summary is NaN where no winter counts.
 * Winters are always taken in the order of time, so sums do not depend on how the work was cut up. Percentiles are type 7.
 */
package org.wintersill.climatology;
