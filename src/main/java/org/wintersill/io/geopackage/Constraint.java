package org.wintersill.io.geopackage;

import java.util.List;

/** Legal values of a column, written once a file under a name of their own. */
public sealed interface Constraint {

    /** Name in {@code gpkg_data_column_constraints}; two constraints of one name must be equal. */
    String name();

    /** Values from {@code min} to {@code max}, both included. */
    record Range(String name, double min, double max, String description) implements Constraint {
        public Range {
            TableDefinition.requireName(name);
            if (!(min < max)) {
                throw new IllegalArgumentException("range " + name + ": " + min + " to " + max);
            }
        }
    }

    /** One of the values listed. */
    record Enumeration(String name, List<Value> values) implements Constraint {
        public Enumeration {
            TableDefinition.requireName(name);
            values = List.copyOf(values);
        }
    }

    /** A legal value as text and what it stands for. */
    record Value(String value, String description) {
    }

    /** Fractions and probabilities. */
    static Range fraction() {
        return new Range("fraction", 0, 1, "a share or probability, 0 to 1");
    }
}
