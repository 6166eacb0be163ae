package org.wintersill.layer;

import java.nio.file.Path;
import java.util.concurrent.ExecutorService;

/** Port: a raster file format that layers are written in. */
public interface RasterFormat {

    /** File name ending with its dot, such as {@code .tif}. */
    String suffix();

    /** Rows that a writer wants at a time: the height of its tiles. */
    int rowsAtOnce();

    /**
     * Begins a file.
     *
     * @param file where it is to be; the caller has chosen a temporary name and renames afterwards
     * @param header what it will hold
     * @param workers threads that the writer may use to compress; the bytes written do not depend on how many there are
     * @throws org.wintersill.problem.ProblemException when the file cannot be made
     */
    RasterWriter create(Path file, RasterHeader header, ExecutorService workers);
}
