package org.wintersill.temperature;

import java.nio.file.Path;
import org.wintersill.problem.Notices;

/** Port: a file format that daily temperatures come in. */
public interface TemperatureFormat {

    /** Name for messages. */
    String name();

    /**
     * Whether this format should open the file.
     *
     * @param file the file, for its name
     * @param head its first bytes, up to 16; shorter for a short file
     */
    boolean recognises(Path file, byte[] head);

    /**
     * Reads what the file says about itself, and no values beyond a small sample.
     *
     * @param file the file
     * @param request what the run file says about it
     * @param notices told of every assumption made
     * @throws org.wintersill.problem.ProblemException when the file is refused: what, where, what to do
     */
    DailyTemperatureSource open(Path file, TemperatureRequest request, Notices notices);
}
