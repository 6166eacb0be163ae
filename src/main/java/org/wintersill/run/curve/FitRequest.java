package org.wintersill.run.curve;

import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.wintersill.time.SeasonWindow;

/**
 * A trial fit that is asked for.
 *
 * @param field table of measured lethal temperatures
 * @param series temperatures; empty where the model needs none
 * @param dailyRange Tmax - Tmin, K, for a series of minima alone
 * @param model word of the model
 * @param window winters that samples belong to
 * @param latitude degrees north
 * @param kept values of parameters that are not to be estimated
 * @param replicates of the bootstrap
 * @param confidence of the two-sided intervals
 * @param seed of the random numbers
 */
public record FitRequest(Path field, Optional<Path> series, OptionalDouble dailyRange, String model, SeasonWindow window,
                         double latitude, Map<String, Double> kept, int replicates, double confidence, long seed) {
}
