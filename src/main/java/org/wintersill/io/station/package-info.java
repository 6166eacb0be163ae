/**
 * <b>Purpose.</b> Daily minima of stations as people keep them: comma-separated tables.
 *
 * <p><b>May depend on.</b> {@code problem}.
 *
 * <p><b>Conventions.</b> A reading keeps its date as the text of the file, {@code YYYY-MM-DD}, since only the temperature record knows the
 * calendar. Heights in metres, temperatures in degrees Celsius, NaN where the table has nothing.
 */
package org.wintersill.io.station;
