package org.wintersill.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wintersill.run.curve.FitRequest;
import org.wintersill.time.SeasonWindow;

/**
 * What {@code curves} is asked.
 *
 * @param files cultivar files
 * @param cultivars ids of the cultivars to show; empty for all
 * @param window the winter
 * @param format how to answer
 * @param chart where to draw; empty for nowhere
 * @param fit a trial fit in place of cultivar files
 * @param out where its cultivar file goes; empty for nowhere
 * @param overwrite whether files of the same names may be replaced
 */
public record CurvesOptions(List<Path> files, List<String> cultivars, SeasonWindow window, ExplainOptions.Format format,
                            Optional<Path> chart, Optional<FitRequest> fit,
                            Optional<Path> out, boolean overwrite) {

    public CurvesOptions {
        files = List.copyOf(files);
        cultivars = List.copyOf(cultivars);
    }
}
