package org.wintersill.cli;

import java.nio.file.Path;
import java.util.OptionalInt;
import org.wintersill.config.ParcelsConfig;

/**
 * What {@code parcels} is asked.
 *
 * @param run folder of the finished run
 * @param out folder of the result
 * @param overwrite whether an earlier result may be replaced
 * @param parcels the polygons and which of them get a page
 * @param threads number of threads; empty for as many as there are
 * @param json whether the result is told as JSON
 */
public record ParcelsOptions(Path run, Path out, boolean overwrite, ParcelsConfig parcels, OptionalInt threads, boolean json) {
}
