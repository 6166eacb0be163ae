/**
 * <b>Purpose.</b> The command line: commands and flags, help, messages, progress, exit codes.
 *
 * <p><b>May depend on.</b> {@code config}, {@code run}, {@code engine} (progress and cancellation), {@code problem},
 * {@code temperature} (requests); picocli.
 *
 * <p><b>Conventions.</b> The only room that prints or exits. Results go to standard output, everything else to standard error.
 * A command class turns words into a configuration and options and calls {@link org.wintersill.cli.Commands}; it does no work of
 * its own. No control codes are written but the carriage return of the progress line, and that only to a terminal. Start reading
 * in {@link org.wintersill.cli.Main}.
 */
package org.wintersill.cli;
