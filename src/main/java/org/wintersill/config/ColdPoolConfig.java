package org.wintersill.config;

import java.util.Optional;
import org.wintersill.elevation.Inversion;
import org.wintersill.elevation.StableNights;
import org.wintersill.elevation.terrain.ColdPools;

/**
 * Cooling of low ground on calm clear nights.
 *
 * @param hollows by the form of the ground; empty where an inversion is given instead
 * @param inversion two layers with one top for all the grid
 * @param everyNight whether every night counts fully
 * @param range when a night counts by its temperature range
 * @param reference lapse rate from which no pool forms, K/km; empty for the prior of the month
 * @param evenIfResolved whether pools are added where the temperature grid already holds the valley
 */
public record ColdPoolConfig(Optional<ColdPools> hollows, Optional<Inversion> inversion, boolean everyNight,
                             StableNights.ByRange range, Optional<Double> reference, boolean evenIfResolved) {
}
