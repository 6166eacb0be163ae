package org.wintersill.cli;

import java.nio.file.Path;
import java.util.Optional;

/**
 * What {@code map} is asked beyond the configuration.
 *
 * @param overwrite whether an earlier result in the output folder may be replaced
 * @param json whether the result is told as one JSON document on standard output
 * @param wintersFrom finished folder whose kept winters are taken in place of the daily temperatures
 */
public record MapOptions(boolean overwrite, boolean json, Optional<Path> wintersFrom) {
}
