package org.wintersill.climatology;

import org.wintersill.layer.LayerDefinition;

/** A number a cell made from the values of all winters there. Definition: immutable, and the same for every cell. */
public interface ClimatologyStatistic {

    /** What the number is and how it looks. */
    LayerDefinition layer();

    /** Whether it belongs to the default layers, and the word that asks for it and its like. */
    default LayerGroup group() {
        return LayerGroup.DEFAULT;
    }

    /**
     * Fills a run of cells.
     *
     * @param record the winters' values
     * @param out {@code [cell]}, NaN where there is no value; whole numbers for layers of whole numbers
     * @param from first cell
     * @param to cell after the last
     */
    void summarise(WinterRecord record, float[] out, int from, int to);
}
