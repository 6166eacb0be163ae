package org.wintersill.config;

import java.util.Arrays;
import java.util.Objects;
import java.util.Optional;

/**
 * The adjustment to the ground height of a terrain model.
 *
 * @param dem the terrain model; its grid is the grid of the outputs
 * @param sourceHeight ground height that the temperatures stand for; empty for the mean of the terrain model in each of their cells
 * @param lapseRate K per km for each calendar month, {@code [0]} = January; positive where higher is colder
 */
public record ElevationConfig(FileEntry dem, Optional<FileEntry> sourceHeight, double[] lapseRate) {
    /** Default, K per km: project choice between night-time minima (about 3) and the free air (6.5), see science section 7.2. */
    public static final double DEFAULT_LAPSE_RATE = 4.5;
    /** K per km; a stronger inversion over a whole month is a mistake (assumed). */
    public static final double LOWEST_LAPSE_RATE = -8;
    /** K per km; the dry-adiabatic rate, g / c_p. */
    public static final double HIGHEST_LAPSE_RATE = 9.8;

    public ElevationConfig {
        lapseRate = lapseRate.clone();
        if (lapseRate.length != 12) {
            throw new IllegalArgumentException("12 lapse rates are needed, found " + lapseRate.length);
        }
    }

    @Override
    public double[] lapseRate() {
        return lapseRate.clone();
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof ElevationConfig that && dem.equals(that.dem) && sourceHeight.equals(that.sourceHeight)
                && Arrays.equals(lapseRate, that.lapseRate);
    }

    @Override
    public int hashCode() {
        return Objects.hash(dem, sourceHeight, Arrays.hashCode(lapseRate));
    }

    @Override
    public String toString() {
        return "ElevationConfig[dem=" + dem + ", sourceHeight=" + sourceHeight + ", lapseRate=" + Arrays.toString(lapseRate) + "]";
    }
}
