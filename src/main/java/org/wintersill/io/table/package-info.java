/**
 * <b>Purpose.</b> Tables that people bring: temperatures of a station, measured lethal temperatures.
 *
 * <p><b>May depend on.</b> {@code temperature}, {@code hardiness}, {@code time}, {@code problem}; Commons CSV.
 *
 * <p><b>Conventions.</b> UTF-8, comma, decimal point, a header whose names are taken in any case, ISO dates of the standard
 * calendar. Empty cells, {@code NA} and {@code NaN} are missing. All problems of a file are told at once, with their lines.
 */
package org.wintersill.io.table;
