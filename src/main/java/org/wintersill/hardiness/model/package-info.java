/**
 * <b>Purpose.</b> One rule of cold hardiness per file.
 *
 * <p><b>May depend on.</b> {@code hardiness} and what it may use.
 *
 * <p><b>Conventions.</b> As in {@code hardiness}. Every class states its formula, symbols, units, source and what it does outside
 * its valid range.
 */
package org.wintersill.hardiness.model;
