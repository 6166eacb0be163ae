package org.wintersill.layer;

import java.io.Serializable;

/**
 * One named output field.
 *
 * @param id file name and, with _ for -, column name: lower-case letters, digits and hyphens
 * @param title a few words for legends and tables
 * @param description one sentence: what the number means, with its sign
 * @param unit {@code K} for differences, {@code degC} for temperatures, {@code 1} for fractions, {@code m}, {@code year} ...
 * @param type how it is stored
 * @param cellMethods CF cell methods of the quantity; empty where none applies
 * @param style how it looks
 */
public record LayerDefinition(String id, String title, String description, String unit, SampleType type,
                              String cellMethods, LayerStyle style) implements Serializable {

    public LayerDefinition {
        if (!id.matches("[a-z][a-z0-9]*(-[a-z0-9]+)*")) {
            throw new IllegalArgumentException("not a layer id: " + id);
        }
    }

    /** The id as a column name. */
    public String column() {
        return id.replace('-', '_');
    }
}
