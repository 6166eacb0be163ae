package org.wintersill.cli;

import java.util.List;
import java.util.Optional;

/**
 * What {@code explain} is asked beyond the configuration.
 *
 * @param x easting or longitude
 * @param y northing or latitude
 * @param lonLat whether x and y are WGS 84 longitude and latitude; otherwise they are in the run's target reference system
 * @param winter label of the only winter to tell of, such as {@code 2021-22}; empty for all
 * @param cultivars ids of the cultivars to tell of; empty for all of the run
 * @param format how
 */
public record ExplainOptions(double x, double y, boolean lonLat, Optional<String> winter, List<String> cultivars,
                             Format format) {

    /** Forms of the answer. */
    public enum Format { TEXT, JSON, CSV }

    public ExplainOptions {
        cultivars = List.copyOf(cultivars);
    }
}
