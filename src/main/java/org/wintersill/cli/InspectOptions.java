package org.wintersill.cli;

import org.wintersill.config.TemperatureEntry;

/**
 * What {@code inspect} is asked.
 *
 * @param entry the files, and what the flags say about them
 * @param json whether the answer is one JSON document
 */
public record InspectOptions(TemperatureEntry entry, boolean json) {
}
