package org.wintersill.config;

import java.util.List;

/**
 * How damage is counted.
 *
 * @param nights how the nights of a winter are joined; {@code worst} in this version
 * @param levels percent of organs killed, ascending
 * @param killing percent that makes a killing winter; one of the levels
 */
public record DamageConfig(String nights, List<Integer> levels, int killing) {
    public DamageConfig {
        levels = List.copyOf(levels);
    }
}
