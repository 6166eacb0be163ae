package org.wintersill.io.geotiff.read;

import java.nio.file.Path;
import java.util.Optional;
import org.wintersill.grid.Block;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;

/**
 * An open GeoTIFF of plain numbers, as this program writes its layers: no unit, date or height is made of them. Missing values are
 * NaN. Used by one thread.
 */
public final class PlainRaster implements AutoCloseable {
    private final TiffFile file;
    private final GeotiffHeader header;
    private final WindowReader window;
    private final GridWindow place;

    private PlainRaster(TiffFile file, GeotiffHeader header) {
        this.file = file;
        this.header = header;
        window = new WindowReader(file, header);
        place = new GridWindow(header.place());
    }

    /**
     * Opens a file.
     *
     * @throws org.wintersill.problem.ProblemException when it is no GeoTIFF or is damaged
     */
    public static PlainRaster open(Path path, CrsParser parser) {
        TiffFile file = TiffFile.open(path);
        try {
            return new PlainRaster(file, GeotiffHeader.read(file, new CrsLookup(parser), Optional.empty()));
        } catch (RuntimeException e) {
            file.close();
            throw e;
        }
    }

    public GridGeometry grid() {
        return header.place().grid();
    }

    public int bands() {
        return header.image().samples();
    }

    /** Description of a band; empty where it has none. */
    public String bandName(int band) {
        return header.metadata().item("description", band).orElse("");
    }

    /**
     * Reads a block of a band.
     *
     * @param band from 0
     * @param out {@code [row * columns + column]} of the block
     */
    public void read(int band, Block block, float[] out) {
        place.read(window, new int[] {band}, block, (position, row, column, stored, count) -> {
            int to = (row - block.row()) * block.columns() + column - block.column();
            for (int i = 0; i < count; i++) {
                out[to + i] = (float) stored[i];
            }
        });
    }

    @Override
    public void close() {
        file.close();
    }
}
