package org.wintersill.run;

import java.util.List;
import org.wintersill.hardiness.Cultivar;

/** The caution that every page, table and file for readers carries. */
public final class Caution {
    /** One sentence, for file metadata. */
    public static final String SHORT = "Screening at the grid's scale; no substitute for on-site loggers, local rules and codes, and "
            + "advice from a licensed or certified practitioner. Daily minima carry no duration of cold.";

    private Caution() {
    }

    /** The caution of a page or picture that shows these cultivars: names those whose numbers nobody has verified. */
    public static String of(List<Cultivar> shown) {
        List<String> unverified = shown.stream().filter(cultivar -> !cultivar.status().dependable())
                .map(cultivar -> cultivar.id() + " (" + cultivar.status().word() + ")").toList();
        return unverified.isEmpty() ? SHORT : SHORT + " Not verified: " + String.join(", ", unverified) + ".";
    }
}
