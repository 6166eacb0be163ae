/**
 * <b>Purpose.</b> One summary layer a file: what the number is, how it looks, and the loop that makes it.
 *
 * <p><b>May depend on.</b> {@code climatology} and what that may use.
 *
 * <p><b>Conventions.</b> As in {@code climatology}. The list of what a run can make is {@link ClimatologyStatistics}, beside the
 * classes; a class that is not in the list is found by a test.
 */
package org.wintersill.climatology.statistic;
