package org.wintersill.io.netcdf;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * A variable as the header describes it.
 *
 * @param name name in the root group
 * @param type type of the stored values, {@code _Unsigned} not yet applied
 * @param littleEndian byte order of the stored values
 * @param dimensions names of the dimensions, slowest first
 * @param shape lengths of the dimensions
 * @param attributes by name, in file order; a value is a String or {@link Numbers}
 * @param storage where the values are
 */
record CdfVariable(String name, RawType type, boolean littleEndian, List<String> dimensions, int[] shape,
                   Map<String, Object> attributes, Storage storage) {

    /** Value of a numeric attribute, with the type it has in the file. */
    record Numbers(RawType type, double[] values) {
    }

    int rank() {
        return shape.length;
    }

    /** Number of values; may exceed an int. */
    long size() {
        long size = 1;
        for (int length : shape) {
            size = Math.multiplyExact(size, (long) length);
        }
        return size;
    }

    /** Text of an attribute, without blanks around it; empty if absent, blank or a number. */
    Optional<String> text(String attribute) {
        return attributes.get(attribute) instanceof String text && !text.isBlank() ? Optional.of(text.trim())
                : Optional.empty();
    }

    /** Text of an attribute in lower case, empty text if there is none. */
    String word(String attribute) {
        return text(attribute).orElse("").toLowerCase(Locale.ROOT);
    }

    Optional<Numbers> numbers(String attribute) {
        return attributes.get(attribute) instanceof Numbers numbers && numbers.values().length > 0 ? Optional.of(numbers)
                : Optional.empty();
    }

    /** Whether the stored integers are to be taken as unsigned. */
    boolean saysUnsigned() {
        return word("_Unsigned").equals("true");
    }
}
