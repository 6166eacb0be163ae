package org.wintersill.engine;

/** Gives the values of winters, wherever they lie; planes as numbered by {@link org.wintersill.season.WinterValues}. */
public interface WinterPlanes {

    /** Rows of a plane in one winter, {@code [row * columns + column]}, NaN for missing. */
    float[] read(int plane, int season, int firstRow, int rowCount);
}
