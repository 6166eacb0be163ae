package org.wintersill.elevation;

import java.nio.file.Path;
import java.util.Optional;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;

/** Port: a file format that ground heights come in. */
public interface ElevationFormat {

    /** Whether this format should open the file; see the twin in {@code temperature}. */
    boolean recognises(Path file, byte[] head);

    /**
     * The grid of the heights, without reading them.
     *
     * @param crs reference system for a file that carries none
     * @throws org.wintersill.problem.ProblemException when the file is refused
     */
    GridGeometry grid(Path file, Optional<String> crs, Notices notices);

    /**
     * Reads all heights in metres; feet and US survey feet are converted, voids become NaN.
     *
     * @param unit unit of the heights for a file that does not say ({@code m}, {@code ft}, {@code us-ft}); a contradiction
     *             is refused
     */
    ElevationField read(Path file, Optional<String> crs, Optional<String> unit, Notices notices);
}
