package org.wintersill.layer;

/** An unfinished raster file, used by one thread. Closing it before {@link #finish} removes every trace of it. */
public interface RasterWriter extends AutoCloseable {

    /**
     * Writes full-width rows of one band. Rows of a band come from north to south without gaps, {@code rowsAtOnce} at a
     * time but for the last; bands may be interleaved in any way.
     *
     * @param band position of the band from 0
     * @param firstRow row of the grid of the first value
     * @param rows number of rows
     * @param values {@code [row * columns + column]}, NaN for no value; not kept and not changed. For integer types the
     *               values are whole numbers
     * @throws org.wintersill.problem.ProblemException when the disk is full or the file cannot be written
     */
    void write(int band, int firstRow, int rows, float[] values);

    /** Completes the file and forces it to disk. */
    void finish();

    @Override
    void close();
}
