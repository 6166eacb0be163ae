/**
 * <b>Purpose.</b> Folding the nights of one winter into its values: margins, damage, worst night, lowest minimum; and
 * judging whether a winter is complete enough to be used.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code hardiness}, {@code damage}, {@code layer}, {@code problem}.
 *
 * <p><b>Conventions.</b> A night is a position in the winter's window, 0 for its first day. Inside the running arrays a
 * night without value is positive infinity, which is never a lowest value, so the loops need no test for it; NaN
 * comes back when the winter is finished.
 */
package org.wintersill.season;
