package org.wintersill.hardiness;

import java.io.Serializable;
import java.util.Optional;
import org.wintersill.time.SeasonWindow;

/**
 * The rule that gives the lethal temperatures of a cultivar. Immutable, may travel. A model is either a {@link CalendarModel},
 * the same in every cell, or a {@link StateModel}, which follows the temperatures of each cell.
 */
public interface HardinessModel extends Serializable {

    /** Word of the cultivar file, such as {@code dated}. */
    String id();

    /** The rule with its parameters in one line, for records and tables. */
    String describe();

    /** Why the model cannot be used for a winter of this window, as part of a sentence; empty if it can. */
    Optional<String> notCovering(SeasonWindow window);
}
