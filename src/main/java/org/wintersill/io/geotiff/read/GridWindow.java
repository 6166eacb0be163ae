package org.wintersill.io.geotiff.read;

import org.wintersill.grid.Block;

/** Turns a block of the grid as used into windows of the file: rows turned where it is south-up, columns unrolled. */
final class GridWindow {
    private final Georeference place;

    GridWindow(Georeference place) {
        this.place = place;
    }

    /** Gives out the values of a block with rows and columns of the grid instead of the file. */
    void read(WindowReader window, int[] bands, Block block, WindowReader.Sink sink) {
        int width = place.grid().columns();
        int firstRow = place.southUp() ? place.turnedRow(block.rowEnd() - 1) : block.row();
        int start = (block.column() + place.roll()) % width;
        int before = Math.min(block.columns(), width - start);
        part(window, bands, firstRow, block.rows(), start, before, block.column() - start, sink);
        if (before < block.columns()) {
            part(window, bands, firstRow, block.rows(), 0, block.columns() - before, block.column() + before, sink);
        }
    }

    /** @param shift column of the grid minus column of the file */
    private void part(WindowReader window, int[] bands, int row, int rows, int column, int columns, int shift, WindowReader.Sink sink) {
        window.read(bands, row, rows, column, columns, (band, fileRow, fileColumn, stored, count) ->
                sink.row(band, place.turnedRow(fileRow), fileColumn + shift, stored, count));
    }
}
