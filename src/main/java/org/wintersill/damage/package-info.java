/**
 * <b>Purpose.</b> From temperature and lethal temperatures to the fraction of buds killed, and to margins.
 *
 * <p><b>May depend on.</b> The JDK only.
 *
 * <p><b>Conventions.</b> Temperatures in degrees Celsius, differences in K, fractions 0..1. LT10 is warmer than
 * LT50, LT50 warmer than LT90. A margin is temperature minus lethal temperature: above zero is the safe side.
 */
package org.wintersill.damage;
