/**
 * <b>Purpose.</b> JSON and CSV texts, the same bytes on every machine; names read back from them.
 *
 * <p><b>May depend on.</b> {@code problem}; Jackson, Commons CSV.
 *
 * <p><b>Conventions.</b> Objects are ordered maps; line ends are single line feeds; numbers without a value are null in JSON and
 * empty in CSV; CSV texts that a spreadsheet would take for a formula are guarded.
 */
package org.wintersill.io.json;
