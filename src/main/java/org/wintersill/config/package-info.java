/**
 * <b>Purpose.</b> What a run is asked to be: the run file and the flags, as checked records.
 *
 * <p><b>May depend on.</b> {@code problem}, {@code time}, {@code temperature}, {@code io.yaml}.
 *
 * <p><b>Conventions.</b> Every default is applied here and shown by {@link org.wintersill.config.RunConfig#effective()}. Paths are
 * relative to the run file, paths of flags to the current folder. All problems are reported at once. Inputs are looked for, never
 * opened. Start reading in {@link org.wintersill.config.ConfigReader}.
 */
package org.wintersill.config;
