package org.wintersill.hardiness;

import java.io.Serializable;
import java.util.Objects;
import org.wintersill.damage.ToleranceCurve;

/**
 * A cultivar (or provenance, or a species as a whole) and its hardiness.
 *
 * @param id lower-case letters, digits and single hyphens; a folder name of the outputs
 * @param name as people say it
 * @param species botanical or common; may be empty
 * @param organ what the lethal temperatures are for, such as {@code primary bud}; may be empty
 * @param source where the numbers come from
 * @param status how far they can be relied on
 * @param model the rule that gives the lethal temperatures
 * @param tolerance form of the curve through LT10, LT50 and LT90 of a night
 * @param variants variation within the cultivar, when it stands for a species or for several provenances
 */
public record Cultivar(String id, String name, String species, String organ, String source, Status status,
                       HardinessModel model, ToleranceCurve tolerance, Variants variants) implements Serializable {

    /** Longest id, in letters. */
    public static final int LONGEST_ID = 40;

    public Cultivar {
        if (!isId(id)) {
            throw new IllegalArgumentException("not a cultivar id: " + id);
        }
        Objects.requireNonNull(name);
        Objects.requireNonNull(species);
        Objects.requireNonNull(organ);
        Objects.requireNonNull(source);
        Objects.requireNonNull(status);
        Objects.requireNonNull(model);
        Objects.requireNonNull(tolerance);
        Objects.requireNonNull(variants);
    }

    /** Whether a text has the form of an id. */
    public static boolean isId(String text) {
        return text.length() <= LONGEST_ID && text.matches("[a-z0-9]+(-[a-z0-9]+)*");
    }
}
