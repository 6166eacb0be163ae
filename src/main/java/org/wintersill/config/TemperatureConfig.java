package org.wintersill.config;

import java.util.Optional;

/**
 * The daily temperatures of a run.
 *
 * @param minimum daily minima
 * @param maximum daily maxima, for models that need the daily mean
 * @param mean daily means; never together with maxima
 * @param dailyRange maximum minus minimum of every day, K; never together with maxima or means
 */
public record TemperatureConfig(TemperatureEntry minimum, Optional<TemperatureEntry> maximum,
                                Optional<TemperatureEntry> mean, Optional<Double> dailyRange) {
}
