/**
 * <b>Purpose.</b> What an output field is: its name, unit, type, missing value and looks; and the port that raster writers
 * implement.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code problem}.
 *
 * <p><b>Conventions.</b> Values travel as float arrays with NaN for "no value"; a writer turns NaN into the missing value
 * of the {@link org.wintersill.layer.SampleType}. Class breaks, colours and class names have one definition here, from
 * which every format takes them.
 */
package org.wintersill.layer;
