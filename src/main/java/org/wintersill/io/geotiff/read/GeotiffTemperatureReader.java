package org.wintersill.io.geotiff.read;

import java.util.Arrays;
import org.wintersill.grid.Block;
import org.wintersill.temperature.DailyTemperatureReader;

/** Reads the bands of one open file as days, turned to the grid as used and in degrees Celsius. Used by one thread. */
final class GeotiffTemperatureReader implements DailyTemperatureReader {
    private final TiffFile file;
    private final GeotiffHeader header;
    private final int[] bandOfDay;
    private final Packing packing;
    private final WindowReader window;
    private long setAside;

    GeotiffTemperatureReader(TiffFile file, GeotiffHeader header, int[] bandOfDay, Packing packing) {
        this.file = file;
        this.header = header;
        this.bandOfDay = bandOfDay;
        this.packing = packing;
        this.window = new WindowReader(file, header);
    }

    @Override
    public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
        Georeference place = header.place();
        if (block.columnEnd() > place.grid().columns() || block.rowEnd() > place.grid().rows()) {
            throw new IllegalArgumentException(block + " is not inside " + place.grid().describe());
        }
        int[] bands = Arrays.copyOfRange(bandOfDay, firstDay, firstDay + dayCount);
        new GridWindow(place).read(window, bands, block, (day, row, column, stored, count) -> {
            int to = offset + day * dayStride + (row - block.row()) * block.columns() + column - block.column();
            for (int i = 0; i < count; i++) {
                out[to + i] = celsius(bands[day], stored[i]);
            }
        });
    }

    private float celsius(int band, double stored) {
        if (Double.isNaN(stored)) {
            return Float.NaN;
        }
        double celsius = packing.celsius(band, stored);
        if (!PlausibleTemperature.is(celsius)) {
            setAside++;
            return Float.NaN;
        }
        return (float) celsius;
    }

    @Override
    public long valuesSetAside() {
        return setAside;
    }

    @Override
    public void close() {
        file.close();
    }
}
