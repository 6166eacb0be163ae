package org.wintersill.cli;

import java.nio.file.Path;
import java.util.List;

/**
 * What {@code compare} is asked.
 *
 * @param base finished outputs of the base
 * @param others finished outputs that are compared with it
 * @param cultivars ids; empty for all that every folder has
 * @param out folder of the results
 * @param threads number of threads; 0 for as many as there are processors
 */
public record CompareOptions(Path base, List<Path> others, List<String> cultivars, Path out, boolean overwrite, int threads, boolean json) {
}
