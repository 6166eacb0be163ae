package org.wintersill.config;

import java.util.OptionalInt;
import java.util.OptionalLong;

/**
 * How much of the machine a run may use. No result depends on it.
 *
 * @param threads empty: as many as there are processors
 * @param memoryBytes empty: what Java was given
 */
public record LimitConfig(OptionalInt threads, OptionalLong memoryBytes) {
}
