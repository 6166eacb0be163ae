package org.wintersill.hardiness;

import java.io.Serializable;
import java.util.Optional;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/** The rule that gives the lethal temperatures of a cultivar. Immutable, may travel. */
public interface HardinessModel extends Serializable {

    /** Word of the cultivar file, such as {@code dated}. */
    String id();

    /** The rule with its parameters in one line, for records and tables. */
    String describe();

    /** Lethal temperatures of every night of a winter; NaN where the model says nothing, see {@link #notCovering}. */
    LethalTemperatures overSeason(Season season);

    /** Why the model cannot be used for a winter of this window, as part of a sentence; empty if it can. */
    Optional<String> notCovering(SeasonWindow window);
}
