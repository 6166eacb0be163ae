package org.wintersill.config;

import java.nio.file.Path;
import java.util.List;

/**
 * The cultivars of a run.
 *
 * @param files cultivar files, in the order given
 * @param use ids of the cultivars to use, in the order of the outputs; empty for all
 */
public record CultivarConfig(List<Path> files, List<String> use) {
    public CultivarConfig {
        files = List.copyOf(files);
        use = List.copyOf(use);
    }
}
