package org.wintersill.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.wintersill.run.curve.FitRequest;
import org.wintersill.time.SeasonWindow;

/**
 * What {@code curves} is asked.
 *
 * @param files cultivar files, and built-in cultivars with their prefix
 * @param cultivars ids of the cultivars to show; empty for all
 * @param window the winter
 * @param format how to answer
 * @param chart where to draw; empty for nowhere
 * @param builtIn whether to list what comes with the program
 * @param series temperatures that drive the cultivars; empty for curves without weather
 * @param fit a trial fit in place of cultivar files
 * @param out where its cultivar file goes; empty for nowhere
 * @param overwrite whether files of the same names may be replaced
 */
public record CurvesOptions(List<String> files, List<String> cultivars, SeasonWindow window, ExplainOptions.Format format,
                            Optional<Path> chart, boolean builtIn,
                            Optional<SeriesOptions> series, Optional<FitRequest> fit,
                            Optional<Path> out, boolean overwrite) {

    /**
     * Temperatures of a place.
     *
     * @param file table of them
     * @param dailyRange Tmax - Tmin, K, for a table of minima alone
     * @param latitude degrees north
     * @param winter label of one winter; empty for all
     */
    public record SeriesOptions(Path file, OptionalDouble dailyRange, double latitude, Optional<String> winter) {
    }

    public CurvesOptions {
        files = List.copyOf(files);
        cultivars = List.copyOf(cultivars);
    }
}
