package org.wintersill.elevation;

/**
 * A block of target cells and the source cell centres (nodes) between which they lie. The temperature of every cell of the tile is a
 * weighted mean of node temperatures plus lapse rate times height gain, so what holds at all nodes and at both ends of the height
 * gain holds at every cell.
 *
 * @param sourceRow first row of nodes
 * @param sourceColumn first column of nodes
 * @param withHeight bit {@code r * sourceColumns + c}: whether a node has a height, or none is needed
 * @param lowGain least height gain, km, of the cells all of whose neighbours have a value; 0 where no heights are used
 * @param highGain greatest
 * @param lowWideGain least height gain where neighbours may be missing and the others stand in for them
 * @param highWideGain greatest
 * @param covered whether every cell can have a value
 * @param empty whether none can
 */
public record TargetTile(int firstRow, int rows, int firstColumn, int columns, int sourceRow, int sourceRows, int sourceColumn,
                         int sourceColumns, long withHeight, float lowGain, float highGain, float lowWideGain, float highWideGain,
                         boolean covered, boolean empty) {

    /** Number of target cells. */
    public int cells() {
        return rows * columns;
    }

    /** Number of source cell centres. */
    public int nodes() {
        return sourceRows * sourceColumns;
    }
}
