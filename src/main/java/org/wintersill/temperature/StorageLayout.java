package org.wintersill.temperature;

import java.io.Serializable;

/**
 * How a source is cut up on disk, so that each piece can be decoded once: size of a chunk in days, rows and columns
 * of the grid as used (north-up, west first). Reads that begin and end on chunk borders decode nothing twice.
 *
 * @param days days a chunk, at least 1
 * @param rows rows a chunk; the number of rows of the grid if a chunk spans all
 * @param columns columns a chunk
 * @param rowOffset row of the grid at which a chunk border falls, 0..rows-1: not 0 where the file is south-up and its
 *                  last chunk is cut
 */
public record StorageLayout(int days, int rows, int columns, int rowOffset) implements Serializable {

    public StorageLayout {
        if (days < 1 || rows < 1 || columns < 1 || rowOffset < 0 || rowOffset >= rows) {
            throw new IllegalArgumentException("not a layout: " + days + " " + rows + " " + columns + " " + rowOffset);
        }
    }
}
