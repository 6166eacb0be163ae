package org.wintersill.hardiness;

import org.wintersill.time.Season;

/** A model that depends on the date alone. */
public interface CalendarModel extends HardinessModel {

    /** Lethal temperatures of every night of a winter; NaN where the model says nothing, see {@link #notCovering}. */
    LethalTemperatures overSeason(Season season);
}
