/**
 * <b>Purpose.</b> Single files of answers: they appear under their name whole or not at all.
 *
 * <p><b>May depend on.</b> {@code problem}.
 *
 * <p><b>Conventions.</b> Nothing is replaced unless that is asked for. Folders full of outputs are the business of
 * {@code run.OutputFolder}.
 */
package org.wintersill.io.file;
