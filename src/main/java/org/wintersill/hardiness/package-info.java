/**
 * <b>Purpose.</b> Lethal temperatures of a cultivar through a winter: who the cultivar is, and the rule that gives its hardiness.
 *
 * <p><b>May depend on.</b> {@code time}, {@code problem}.
 *
 * <p><b>Conventions.</b> Temperatures in degrees Celsius, as {@code double}. LT10 is warmer than LT50, LT50 warmer than LT90.
 * Days of a winter are positions in its window, 0 = first day, and a value belongs to the night of that date. Definitions are
 * immutable and may travel. Start reading in {@link org.wintersill.hardiness.HardinessModel}.
 */
package org.wintersill.hardiness;
