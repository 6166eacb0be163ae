/**
 * <b>Purpose.</b> Indices of the ground's form from a terrain model: slope, curvature, rank and height among the neighbours,
 * position index, the classes prone and not prone to cold air, and the distance to water.
 *
 * <p><b>May depend on.</b> {@code grid}.
 *
 * <p><b>Conventions.</b> Heights and distances in metres, NaN for a void, never sea level. Results of a {@link org.wintersill.grid.Block}
 * are {@code [row of the block * columns of the block + column of the block]}; they depend on neither the block nor the tiles it is
 * cut into, to the last bit: counts and fixed-point sums have no order. Cells beyond the terrain model are missing neighbours, on a
 * grid around the globe too. Start reading in {@link org.wintersill.elevation.terrain.LocalHeights}.
 */
package org.wintersill.elevation.terrain;
