package org.wintersill.elevation;

import org.wintersill.grid.GridGeometry;

/**
 * Ground heights on a grid. The array is shared, not copied: nobody changes it after it was read.
 *
 * @param grid the cells
 * @param metres {@code [row * columns + column]}, metres, NaN where there is no height
 * @param description where it came from, for the record
 */
public record ElevationField(GridGeometry grid, float[] metres, String description) {

    public ElevationField {
        if (metres.length != grid.cells()) {
            throw new IllegalArgumentException(metres.length + " heights for " + grid.cells() + " cells");
        }
    }
}
