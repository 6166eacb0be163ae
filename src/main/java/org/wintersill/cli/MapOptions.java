package org.wintersill.cli;

import java.util.List;

/**
 * What {@code map} is asked beyond the configuration.
 *
 * @param overwrite whether an earlier result in the output folder may be replaced
 * @param json whether the result is told as one JSON document on standard output
 * @param arguments the command line as typed, without the program's name, for the record
 */
public record MapOptions(boolean overwrite, boolean json, List<String> arguments) {
    public MapOptions {
        arguments = List.copyOf(arguments);
    }
}
