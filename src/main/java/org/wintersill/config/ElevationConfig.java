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
 * @param localLapse lapse rates fitted to each night; {@code lapseRate} is then their prior
 * @param coldPool cooling of low ground
 * @param water warming near water
 * @param offset K added to every minimum
 */
public record ElevationConfig(FileEntry dem, Optional<FileEntry> sourceHeight, double[] lapseRate, Optional<LocalLapseConfig> localLapse,
                              Optional<ColdPoolConfig> coldPool, Optional<WaterConfig> water, double offset) {
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
                && Arrays.equals(lapseRate, that.lapseRate) && localLapse.equals(that.localLapse) && coldPool.equals(that.coldPool)
                && water.equals(that.water) && offset == that.offset;
    }

    @Override
    public int hashCode() {
        return Objects.hash(dem, sourceHeight, Arrays.hashCode(lapseRate), localLapse, coldPool, water, offset);
    }

    @Override
    public String toString() {
        return "ElevationConfig[dem=" + dem + ", sourceHeight=" + sourceHeight + ", lapseRate=" + Arrays.toString(lapseRate)
                + ", localLapse=" + localLapse + ", coldPool=" + coldPool + ", water=" + water + ", offset=" + offset + "]";
    }
}
