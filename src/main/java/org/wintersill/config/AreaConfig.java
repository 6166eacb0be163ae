package org.wintersill.config;

/** The part of the target grid to work on, in its reference system; x = easting or longitude, y = northing or latitude. */
public record AreaConfig(double west, double south, double east, double north) {
}
