package org.wintersill.cli;

/**
 * What {@code map} is asked beyond the configuration.
 *
 * @param overwrite whether an earlier result in the output folder may be replaced
 * @param json whether the result is told as one JSON document on standard output
 */
public record MapOptions(boolean overwrite, boolean json) {
}
