package org.wintersill.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wintersill.problem.Problem;

/**
 * What {@code explain} is asked beyond the configuration.
 *
 * @param x easting or longitude
 * @param y northing or latitude
 * @param lonLat whether x and y are WGS 84 longitude and latitude; otherwise they are in the run's target reference system
 * @param winter label of the only winter to tell of, such as {@code 2021-22}; empty for all
 * @param cultivars ids of the cultivars to tell of; empty for all of the run
 * @param format how
 * @param chart where to draw the winter of the only cultivar; empty for nowhere
 * @param overwrite whether a chart of that name may be replaced
 * @param statistics whether the winters together are told of, instead of their nights
 */
public record ExplainOptions(double x, double y, boolean lonLat, Optional<String> winter, List<String> cultivars,
                             Format format, Optional<Path> chart, boolean overwrite, boolean statistics) {

    /** Forms of the answer. */
    public enum Format {
        TEXT, JSON, CSV;

        /** The form that two flags ask for; a problem where both are given. */
        static Format of(boolean json, boolean csv) {
            if (json && csv) {
                throw Problem.usage("--json and --csv are both given", "", "Keep one of the two").asException();
            }
            return json ? JSON : csv ? CSV : TEXT;
        }
    }

    public ExplainOptions {
        cultivars = List.copyOf(cultivars);
    }
}
