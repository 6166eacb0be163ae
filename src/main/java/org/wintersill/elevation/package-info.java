/**
 * <b>Purpose.</b> Ground heights of source and target, lapse rates, and temperature brought from one to the other.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code temperature}, {@code problem}.
 *
 * <p><b>Conventions.</b> Heights in metres above the geoid, NaN where there is none (never sea level). Lapse rates in
 * K per km, positive when higher is colder.
 */
package org.wintersill.elevation;
