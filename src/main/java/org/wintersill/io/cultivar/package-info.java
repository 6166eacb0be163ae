/**
 * <b>Purpose.</b> Cultivar files (YAML) as {@link org.wintersill.hardiness.Cultivar}s.
 *
 * <p><b>May depend on.</b> {@code hardiness}, {@code time}, {@code problem}, {@code io.yaml}.
 *
 * <p><b>Conventions.</b> Temperatures in degrees Celsius, as written. Nothing is corrected or guessed: what is doubtful is refused,
 * with file, line and key, all problems of a file at once; what only looks odd is a notice.
 */
package org.wintersill.io.cultivar;
