package org.wintersill.config;

/**
 * Lapse rates fitted to each night; the rates by month are their prior.
 *
 * @param radius of the window, m
 * @param priorSd sd of the prior, K/km
 */
public record LocalLapseConfig(double radius, double priorSd) {
}
