package org.wintersill.config;

/**
 * Statistics over winters.
 *
 * @param interval probability that the bounds of a frequency enclose, 0..1
 * @param bounds {@code jeffreys} or {@code wilson}
 * @param target frequency of killing winters that is still accepted, 0..1
 */
public record StatisticsConfig(double interval, String bounds, double target) {
}
