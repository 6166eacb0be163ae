package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.Collection;
import java.util.Map;
import java.util.Optional;

/**
 * What a file says about itself. Immutable; the file is closed again.
 *
 * @param path the file
 * @param format name of the format for people
 * @param fileSize length in bytes when the header was read
 * @param variables by name, in file order
 */
record CdfHeader(Path path, String format, long fileSize, Map<String, CdfVariable> variables) {

    Optional<CdfVariable> variable(String name) {
        return Optional.ofNullable(variables.get(name));
    }

    Collection<CdfVariable> all() {
        return variables.values();
    }

    /** The one-dimensional variable with the name of its dimension, if the file has it. */
    Optional<CdfVariable> coordinate(String dimension) {
        return variable(dimension).filter(v -> v.rank() == 1 && v.dimensions().get(0).equals(dimension)
                && v.type().isNumeric());
    }
}
