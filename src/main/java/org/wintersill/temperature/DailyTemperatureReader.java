package org.wintersill.temperature;

import org.wintersill.grid.Block;

/** An open record, used by one thread. */
public interface DailyTemperatureReader extends AutoCloseable {

    /**
     * Reads consecutive positions of the day axis for a block of cells.
     *
     * <p>The value of day {@code d} (from 0), row {@code r} and column {@code c} of the block goes to
     * {@code out[offset + d * dayStride + r * block.columns() + c]}, in degrees Celsius. NaN where the file has no value;
     * values that no air temperature has (not finite, or outside -90..60 after conversion) are NaN too and are counted
     * with {@link #valuesSetAside()}.
     *
     * @param firstDay position on the day axis, not a day number
     * @param dayCount number of positions; they may have gaps in time between them
     * @param block cells of the source's grid
     * @throws org.wintersill.problem.ProblemException when the file is damaged or cannot be read
     */
    void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride);

    /** Number of values so far that were not missing in the file but are no air temperature. */
    long valuesSetAside();

    @Override
    void close();
}
