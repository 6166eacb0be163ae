package org.wintersill.config;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * How damage is counted.
 *
 * @param nights how the nights of a winter are joined: {@code worst}, {@code independent} or {@code correlated}
 * @param correlation rho of {@code correlated}; 0 otherwise
 * @param levels percent of organs killed, ascending
 * @param killing percent that makes a killing winter; one of the levels
 * @param uncertainty standard deviations of a winter's worst margin by component, K; empty for none
 * @param neighbourhoodKm how far a milder site may lie, km
 */
public record DamageConfig(String nights, double correlation, List<Integer> levels, int killing, Map<String, Double> uncertainty,
                           double neighbourhoodKm) {
    public DamageConfig {
        levels = List.copyOf(levels);
        uncertainty = Collections.unmodifiableMap(new LinkedHashMap<>(uncertainty));
    }
}
