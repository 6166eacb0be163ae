package org.wintersill.run;

/** The caution that every page, table and file for readers carries. */
public final class Caution {
    /** One sentence, for file metadata. */
    public static final String SHORT = "Screening at the grid's scale; no substitute for on-site loggers, local rules and codes, and "
            + "advice from a licensed or certified practitioner. Daily minima carry no duration of cold.";

    private Caution() {
    }
}
