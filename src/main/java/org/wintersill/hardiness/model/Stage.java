package org.wintersill.hardiness.model;

import java.io.Serializable;

/**
 * Critical temperatures of a bud stage.
 *
 * @param name such as {@code full bloom}
 * @param lt10 degC
 * @param lt50 degC
 * @param lt90 degC
 */
public record Stage(String name, double lt10, double lt50, double lt90) implements Serializable {
}
