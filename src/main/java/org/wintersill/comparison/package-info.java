/**
 * <b>Purpose.</b> What changed between two sets of winters, cell by cell and over the map: classes of gain and loss, tests, shifts of the
 * range, the limit line, what the members of an ensemble say together.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code climatology}, {@code problem}.
 *
 * <p><b>Conventions.</b> Change is <i>other minus base</i>. NaN is missing, and a change is missing where one of the two is. Pure
 * computing: files are the business of {@code run}.
 */
package org.wintersill.comparison;
