package org.wintersill.temperature;

import java.util.List;
import org.wintersill.grid.GridGeometry;
import org.wintersill.time.DayAxis;

/**
 * Definition of a daily temperature record: what it is, before any value is read. Opening it costs nothing that is
 * kept; readers hold the handles. Immutable and thread-safe: any number of readers may be open at once.
 */
public interface DailyTemperatureSource {

    /** The grid as readers deliver it: north-up, longitudes -180..180 where that is possible. */
    GridGeometry grid();

    /** The days that have a record. */
    DayAxis days();

    ForcingVariable variable();

    /** How the record is cut up on disk. */
    StorageLayout layout();

    /**
     * Position of the first day that is stored in the same chunk as the given one; days of one chunk are decoded together.
     *
     * @param position position on the day axis
     */
    default int chunkStart(int position) {
        return position - position % layout().days();
    }

    /** How each file was understood, in the order of time. */
    List<SourceFile> files();

    /**
     * Opens a reader of one's own; never shared between threads.
     *
     * @throws org.wintersill.problem.ProblemException when a file is gone or is not what it was
     */
    DailyTemperatureReader open();
}
