package org.wintersill.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wintersill.time.SeasonWindow;

/**
 * What {@code curves} is asked.
 *
 * @param files cultivar files
 * @param cultivars ids of the cultivars to show; empty for all
 * @param window the winter
 * @param format how to answer
 * @param chart where to draw; empty for nowhere
 * @param overwrite whether files of the same names may be replaced
 */
public record CurvesOptions(List<Path> files, List<String> cultivars, SeasonWindow window, ExplainOptions.Format format,
                            Optional<Path> chart, boolean overwrite) {

    public CurvesOptions {
        files = List.copyOf(files);
        cultivars = List.copyOf(cultivars);
    }
}
